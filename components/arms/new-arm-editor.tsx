'use client';

import { useRouter } from 'next/navigation';
import { useState, type ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { TitleBlock } from '@/components/ui/title-block';
import { toast } from '@/components/ui/toaster';
import { sayError } from '@/lib/client/fetcher';
import { useArmActions } from '@/lib/client/use-arms';
import type { DraftProblem } from '@/lib/editor/arm/check';
import type { ArmDraft } from '@/lib/editor/arm/draft';
import { armCells } from './arm-cells';
import { ArmLayout } from './arm-layout';
import { ChainPanel } from './chain-panel';
import { JointsPanel } from './joints-panel';
import { LeaveDialog } from './leave-dialog';
import { NamePanel } from './name-panel';
import { RampFill } from './ramp-fill';
import { reachProblems, serverProblems } from './save-problems';
import { useArmDraft } from './use-arm-draft';
import { useLeaveGuard } from './use-leave-guard';

interface NewArmEditorProps {
  start: () => ArmDraft;
  /** Over the table: where the draft comes from. */
  origin?: ReactNode;
  /** An imported draft is worth asking about before it is left, even untouched. */
  isImported?: boolean;
}

/** An arm that is not in the library yet. */
export function NewArmEditor({ start, origin, isImported = false }: NewArmEditorProps) {
  const router = useRouter();
  const actions = useArmActions();
  const { draft, change, checked, isChanged, study } = useArmDraft(start);
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const [refused, setRefused] = useState<{ draft: ArmDraft; problems: readonly DraftProblem[] } | null>(null);
  const guard = useLeaveGuard((isChanged || isImported) && !busy);
  const problems = [
    ...checked.problems,
    ...(checked.content ? reachProblems(study.facts) : []),
    ...(refused && refused.draft === draft ? refused.problems : []),
  ];

  const add = async (): Promise<void> => {
    if (!checked.content) return;
    setBusy(true);
    setFault(null);
    try {
      const arm = await actions.create(checked.content);
      toast.success(`${arm.name} is in the library`);
      router.replace(`/arms/${arm.id}`);
    } catch (error) {
      const named = serverProblems(error);
      if (named.length > 0) setRefused({ draft, problems: named });
      else setFault(sayError(error));
      setBusy(false);
    }
  };

  return (
    <>
      <TitleBlock
        cells={armCells({
          name: draft.name,
          reachMm: study.facts?.reachMm ?? null,
          payloadKg: draft.payloadKg.value,
          version: null,
        })}
        actions={
          <>
            <LinkButton href="/arms" variant="quiet">
              Cancel
            </LinkButton>
            <Button
              variant="action"
              disabled={problems.length > 0}
              busy={busy}
              busyLabel="Adding…"
              onClick={() => void add()}
            >
              Add to the library
            </Button>
          </>
        }
      />
      <ArmLayout
        study={study}
        isWhole={checked.definition !== null}
        name={draft.name}
        notice={fault && <Notice tone="trouble">{fault}</Notice>}
      >
        {origin}
        <JointsPanel draft={draft} problems={problems} onChange={change}>
          <RampFill draft={draft} onChange={change} />
        </JointsPanel>
        <NamePanel draft={draft} problems={problems} onChange={change} className="-mt-px" />
        {study.facts && <ChainPanel study={study} />}
      </ArmLayout>
      <LeaveDialog open={guard.href !== null} onStay={guard.stay} onLeave={guard.leave} />
    </>
  );
}
