'use client';

import { X } from 'lucide-react';
import { Button } from '@/components/ui/button';
import type { DraftProblem } from '@/lib/editor/arm/check';
import type { ArmDraft, FrameName } from '@/lib/editor/arm/draft';
import { setCell, setFrame } from '@/lib/editor/arm/edits';
import { DraftCellInput } from './draft-cell-input';
import { invalidFields, type ChangeDraft } from './draft-table';

interface FrameRowsProps {
  draft: ArmDraft;
  problems: readonly DraftProblem[];
  onChange: ChangeDraft;
}

const CELLS = [
  ['xyz.0', 'x', 'mm'],
  ['xyz.1', 'y', 'mm'],
  ['xyz.2', 'z', 'mm'],
  ['rpy.0', 'roll', '°'],
  ['rpy.1', 'pitch', '°'],
  ['rpy.2', 'yaw', '°'],
] as const;
const TITLES: Record<FrameName, string> = { base: 'Base', tool: 'Tool' };

/** Where the first row starts and where the tool point lies behind the last one, as far as the arm says so. */
export function FrameRows({ draft, problems, onChange }: FrameRowsProps) {
  return (['base', 'tool'] as const).map((frame) => {
    const cells = draft[frame];
    const wrong = invalidFields(problems, `${frame}.`).split(' ');
    return (
      cells && (
        <div key={frame} className="flex items-center gap-x-3 border-t border-hair py-0.5 pr-1 pl-3.5">
          <span className="w-12 font-semibold">{TITLES[frame]}</span>
          <div className="grid flex-1 grid-cols-3 gap-x-3 sm:grid-cols-6">
            {CELLS.map(([path, word, unit], index) => (
              <label key={path} className="flex min-w-0 items-center gap-1 text-sm text-ink-soft">
                {word}
                <DraftCellInput
                  path={`${frame}.${path}`}
                  label={`${TITLES[frame]}, ${word} (${unit === '°' ? 'degrees' : unit})`}
                  cell={cells[index]}
                  invalid={wrong.includes(path)}
                  onText={(at, text) => onChange((old) => setCell(old, at, text))}
                />
                {unit}
              </label>
            ))}
          </div>
          <Button
            variant="quiet"
            size="icon"
            aria-label={`Take the ${frame} transform away`}
            onClick={() => onChange((old) => setFrame(old, frame, false))}
          >
            <X aria-hidden className="size-4" />
          </Button>
        </div>
      )
    );
  });
}
