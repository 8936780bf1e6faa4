'use client';

import { Plus } from 'lucide-react';
import type { ReactNode } from 'react';
import { Button } from '@/components/ui/button';
import { Panel } from '@/components/ui/panel';
import { SegmentedControl } from '@/components/ui/segmented-control';
import type { DraftProblem } from '@/lib/editor/arm/check';
import type { ArmDraft } from '@/lib/editor/arm/draft';
import { addJoint, MOST_JOINTS, setFrame } from '@/lib/editor/arm/edits';
import { CouplingTables } from './coupling-tables';
import { DraftProblems } from './draft-problems';
import { DraftTable, type ChangeDraft } from './draft-table';
import { FrameRows } from './frame-rows';

interface JointsPanelProps {
  draft: ArmDraft;
  problems: readonly DraftProblem[];
  onChange: ChangeDraft;
  /** Stands between the table and what is wrong with it. */
  children?: ReactNode;
}

/** The panel in which a chain is written: rows, base and tool, coupling, and what is wrong with any of it. */
export function JointsPanel({ draft, problems, onChange, children }: JointsPanelProps) {
  const slides = draft.joints.some(({ type }) => type === 'prismatic');
  const shown = { draft, problems, onChange };
  return (
    <Panel title={jointsTitle(draft.convention)} aside={unitsOf(slides)}>
      <DraftTable {...shown} />
      <FrameRows {...shown} />
      <CouplingTables {...shown} />
      {children}
      <div className="flex flex-wrap items-center gap-x-1 gap-y-1 border-t border-hair px-1.5 py-1">
        <Button
          variant="quiet"
          size="small"
          disabled={draft.joints.length >= MOST_JOINTS}
          onClick={() => onChange(addJoint)}
        >
          <Plus aria-hidden className="size-4" />
          Add joint
        </Button>
        {(['base', 'tool'] as const).map(
          (frame) =>
            !draft[frame] && (
              <Button
                key={frame}
                variant="quiet"
                size="small"
                onClick={() => onChange((old) => setFrame(old, frame, true))}
              >
                <Plus aria-hidden className="size-4" />
                {frame === 'base' ? 'Base transform' : 'Tool transform'}
              </Button>
            ),
        )}
        <SegmentedControl
          label="Convention"
          className="ml-auto"
          value={draft.convention}
          onValueChange={(convention) => onChange((old) => ({ ...old, convention }))}
          options={[
            { value: 'standard', label: 'Standard' },
            { value: 'modified', label: 'Modified' },
          ]}
        />
      </div>
      <DraftProblems problems={problems} />
    </Panel>
  );
}

export const jointsTitle = (convention: ArmDraft['convention']): string =>
  convention === 'standard' ? 'Joints, standard DH' : 'Joints, modified DH';

export const unitsOf = (slides: boolean): string =>
  slides ? 'mm, degrees; speeds a second' : 'mm, degrees, degrees per second';
