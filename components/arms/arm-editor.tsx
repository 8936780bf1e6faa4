'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { TitleBlock } from '@/components/ui/title-block';
import { toast } from '@/components/ui/toaster';
import { useAccount } from '@/lib/client/account-context';
import { sayError } from '@/lib/client/fetcher';
import { keptDraft } from '@/lib/client/kept-draft';
import { newerVersionOf, useArmActions } from '@/lib/client/use-arms';
import type { LibraryArm } from '@/lib/contracts/arms';
import { draftOf } from '@/lib/editor/arm/draft';
import { readKeptDraft, writeKeptDraft } from '@/lib/editor/arm/kept';
import { ArmActions } from './arm-actions';
import { armCells } from './arm-cells';
import { ArmLayout } from './arm-layout';
import { ChainPanel, UsedIn } from './chain-panel';
import { JointsPanel } from './joints-panel';
import { LeaveDialog } from './leave-dialog';
import { NamePanel } from './name-panel';
import { reachProblems, serverProblems } from './save-problems';
import { StaleDialog } from './stale-dialog';
import { useArmDraft } from './use-arm-draft';
import { useLeaveGuard } from './use-leave-guard';
import { VersionsPanel } from './versions-panel';
import type { DraftProblem } from '@/lib/editor/arm/check';

/** The newest version of an arm under the pencil of somebody who may save the next one. */
export function ArmEditor({ arm }: { arm: LibraryArm }) {
  const router = useRouter();
  const actions = useArmActions();
  const { id: userId } = useAccount();
  const [kept] = useState(() => keptDraft(userId, `arm.${arm.id}`));
  const [found] = useState(() => readKeptDraft(kept.read()));
  const [showsFound, setShowsFound] = useState(found !== null);
  const { draft, change, checked, isChanged, study, restart } = useArmDraft(() => draftOf(arm), found ?? undefined);
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const [refused, setRefused] = useState<{ text: typeof draft; problems: readonly DraftProblem[] } | null>(null);
  const [newest, setNewest] = useState<LibraryArm | null>(null);
  const guard = useLeaveGuard(isChanged && !busy);
  useEffect(() => kept.write(isChanged ? writeKeptDraft(draft) : null), [kept, draft, isChanged]);

  const problems = [
    ...checked.problems,
    ...(checked.content ? reachProblems(study.facts) : []),
    // What the server refused stands until the draft is another one.
    ...(refused && refused.text === draft ? refused.problems : []),
  ];

  const save = async (baseVersion: number): Promise<void> => {
    if (!checked.content) return;
    setBusy(true);
    setFault(null);
    setNewest(null);
    try {
      const saved = await actions.saveVersion(arm.id, { ...checked.content, baseVersion });
      kept.write(null);
      toast.success(`Version ${saved.version} is saved`);
      router.replace(`/arms/${saved.id}`);
    } catch (error) {
      const newer = newerVersionOf(error);
      const named = serverProblems(error);
      if (newer) setNewest(newer);
      else if (named.length > 0) setRefused({ text: draft, problems: named });
      else setFault(sayError(error));
      setBusy(false);
    }
  };

  const discard = (): void => {
    kept.write(null);
    setShowsFound(false);
    restart(draftOf(arm));
  };

  return (
    <>
      <TitleBlock
        cells={armCells({
          name: draft.name,
          reachMm: study.facts?.reachMm ?? arm.reachMm,
          payloadKg: draft.payloadKg.value,
          version: arm.version,
        })}
        actions={
          <ArmActions arm={arm}>
            <Button
              variant="action"
              disabled={!isChanged || problems.length > 0}
              busy={busy}
              busyLabel="Saving…"
              onClick={() => void save(arm.version)}
            >
              Save as version {arm.version + 1}
            </Button>
          </ArmActions>
        }
      />
      <ArmLayout
        study={study}
        name={draft.name}
        notice={
          (fault || (showsFound && isChanged)) && (
            <div className="flex flex-col gap-2">
              {fault && <Notice tone="trouble">{fault}</Notice>}
              {showsFound && isChanged && (
                <Notice
                  action={
                    <Button size="small" onClick={discard}>
                      Let them go
                    </Button>
                  }
                >
                  The edits that you had not saved are back.
                </Notice>
              )}
            </div>
          )
        }
        aside={<VersionsPanel arm={arm} />}
      >
        <JointsPanel draft={draft} problems={problems} onChange={change} />
        <ChainPanel study={study}>
          <UsedIn count={arm.layoutCount} />
        </ChainPanel>
        <NamePanel draft={draft} problems={problems} onChange={change} className="-mt-px" />
      </ArmLayout>
      {newest && (
        <StaleDialog
          base={arm}
          newest={newest}
          onKeep={() => void save(newest.version)}
          onTake={() => {
            kept.write(null);
            router.replace(`/arms/${newest.id}`);
          }}
          onClose={() => setNewest(null)}
        />
      )}
      <LeaveDialog
        open={guard.href !== null}
        onStay={guard.stay}
        onLeave={() => {
          kept.write(null);
          guard.leave();
        }}
      />
    </>
  );
}
