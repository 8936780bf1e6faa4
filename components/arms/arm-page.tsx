'use client';

import { useMemo } from 'react';
import { SubjectFault } from '@/components/shell/subject-fault';
import { formatFigure } from '@/components/ui/figure';
import { LinkButton } from '@/components/ui/link-button';
import { LoadingLine } from '@/components/ui/loading-line';
import { Page } from '@/components/ui/page';
import { Panel } from '@/components/ui/panel';
import { TitleBlock, type TitleBlockCell } from '@/components/ui/title-block';
import { useArm } from '@/lib/client/use-arms';
import type { LibraryArm } from '@/lib/contracts/arms';
import { sayChain } from '@/lib/layout/chain-words';
import { JointsTable } from './joints-table';
import { SectionDrawing } from './section-drawing';

const NO_BREAK_SPACE = '\u00a0';

function cellsOf(arm: LibraryArm | undefined): TitleBlockCell[] {
  const measure = (value: number | null | undefined, unit: string): string =>
    value === null || value === undefined ? '–' : `${formatFigure(value)}${NO_BREAK_SPACE}${unit}`;
  return [
    { label: 'Arm', value: arm?.name ?? '…', heading: true },
    { label: 'Reach', value: measure(arm?.reachMm, 'mm'), kind: 'figure' },
    { label: 'Payload', value: measure(arm?.payloadKg, 'kg'), kind: 'figure' },
    { label: 'Version', value: arm?.version ?? '–', kind: 'figure', wideOnly: true },
  ];
}

/** One version of an arm: its joints, how it is solved, and its section. */
export function ArmPage({ armId }: { armId: string }) {
  const { data: arm, error, mutate } = useArm(armId);
  if (error && !arm) return <SubjectFault what="This arm" error={error} onRetry={() => void mutate()} />;
  return (
    <>
      <TitleBlock
        cells={cellsOf(arm)}
        actions={
          <LinkButton href="/arms" variant="quiet">
            All arms
          </LinkButton>
        }
      />
      {arm ? <ArmSheet arm={arm} /> : <LoadingLine label="Loading the arm" />}
    </>
  );
}

function ArmSheet({ arm }: { arm: LibraryArm }) {
  const { definition } = arm;
  const chain = useMemo(() => sayChain(definition), [definition]);
  const hasSlide = definition.joints.some((joint) => joint.type === 'prismatic');
  return (
    <Page className="grid items-start gap-4 lg:grid-cols-[minmax(0,1fr)_29rem]">
      <div className="min-w-0">
        <Panel
          title={definition.convention === 'standard' ? 'Joints, standard DH' : 'Joints, modified DH'}
          aside={hasSlide ? 'mm, degrees; speeds a second' : 'mm, degrees, degrees per second'}
        >
          <JointsTable joints={definition.joints} />
        </Panel>
        <Panel title="What the chain is" padded className="-mt-px">
          <div className="flex max-w-prose flex-col gap-1">
            {arm.description && <p>{arm.description}</p>}
            <p>{chain.method}</p>
            <p>{chain.controls}</p>
            <p>
              Used in{' '}
              <strong className="font-semibold">
                {arm.layoutCount === 1 ? '1 layout' : `${arm.layoutCount} layouts`}
              </strong>
              ; their maps stay with the version that made them.
            </p>
            {!arm.latest && <p className="text-amber">There is a newer version of this arm.</p>}
          </div>
        </Panel>
      </div>
      <Panel title="Section through the first axis" aside="tool down, wrist held">
        <SectionDrawing arm={arm} />
      </Panel>
    </Page>
  );
}
