'use client';

import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { Panel } from '@/components/ui/panel';
import { TitleBlock } from '@/components/ui/title-block';
import { useArmVersions } from '@/lib/client/use-arms';
import type { LibraryArm } from '@/lib/contracts/arms';
import { ArmActions } from './arm-actions';
import { armCells } from './arm-cells';
import { ArmLayout } from './arm-layout';
import { ChainPanel, UsedIn } from './chain-panel';
import { jointsTitle, unitsOf } from './joints-panel';
import { JointsTable } from './joints-table';
import { useArmStudy } from './use-arm-study';
import { VersionsPanel } from './versions-panel';

/** A version of an arm to read. */
export function ArmSheet({ arm }: { arm: LibraryArm }) {
  const { definition } = arm;
  const study = useArmStudy(definition);
  const slides = definition.joints.some((joint) => joint.type === 'prismatic');
  return (
    <>
      <TitleBlock cells={armCells(arm)} actions={<ArmActions arm={arm} />} />
      <ArmLayout
        study={study}
        name={arm.name}
        notice={<StateNotice arm={arm} />}
        aside={<VersionsPanel key={arm.id} arm={arm} />}
      >
        <Panel title={jointsTitle(definition.convention)} aside={unitsOf(slides)}>
          <JointsTable joints={definition.joints} />
        </Panel>
        <ChainPanel study={study} description={arm.description}>
          <UsedIn count={arm.layoutCount} />
        </ChainPanel>
      </ArmLayout>
    </>
  );
}

/** Why there is nothing to edit here. */
function StateNotice({ arm }: { arm: LibraryArm }) {
  const { data } = useArmVersions(arm.id);
  const newest = data?.arms[0];
  if (arm.archivedAt)
    return (
      <Notice tone="caution" title="This arm is archived">
        It is not offered for placing any more. Layouts that use it keep it.
      </Notice>
    );
  if (arm.latest) return null;
  return (
    <Notice
      tone="note"
      title="There is a newer version of this arm"
      action={
        newest && (
          <LinkButton size="small" href={`/arms/${newest.id}`}>
            Open version {newest.version}
          </LinkButton>
        )
      }
    >
      A version never changes: layouts and maps that name this one stay as they are.
    </Notice>
  );
}
