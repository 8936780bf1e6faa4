'use client';

import { ArrowDown, ArrowUp, GripVertical, Trash2 } from 'lucide-react';
import type { KeyboardEvent } from 'react';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import type { Item, SequenceStep } from '@/lib/layout/items';
import type { TimedStep } from '@/lib/layout/cycle/estimate';
import { seconds } from './seconds';
import { StepFields } from './step-fields';

interface StepRowProps {
  readonly step: SequenceStep;
  readonly index: number;
  readonly count: number;
  readonly label: string;
  readonly timed: TimedStep | null;
  readonly isFaulty: boolean;
  readonly isOpen: boolean;
  readonly locked: boolean;
  readonly isDropTarget: boolean;
  readonly zones: readonly Item[];
  readonly onOpen: () => void;
  /** To a place of the list, from 0. */
  readonly onMove: (to: number) => void;
  readonly onRemove: () => void;
  readonly onChange: (step: SequenceStep) => string | null;
  readonly onDrag: (isHeld: boolean) => void;
  readonly onDrop: () => void;
}

/** One step: what it takes, and opened, its settings. Alt with an arrow key moves it, and so does dragging. */
export function StepRow(props: StepRowProps) {
  const { step, index, count, label, timed, isOpen, locked, onMove } = props;
  const onKeyDown = (event: KeyboardEvent) => {
    if (!event.altKey || locked || (event.key !== 'ArrowUp' && event.key !== 'ArrowDown')) return;
    event.preventDefault();
    event.stopPropagation();
    onMove(index + (event.key === 'ArrowUp' ? -1 : 1));
  };
  return (
    <li
      data-step={label}
      draggable={!locked}
      onDragStart={(event) => {
        event.dataTransfer.effectAllowed = 'move';
        event.dataTransfer.setData('text/plain', label);
        props.onDrag(true);
      }}
      onDragEnd={() => props.onDrag(false)}
      onDragOver={(event) => props.isDropTarget && event.preventDefault()}
      onDrop={(event) => {
        event.preventDefault();
        props.onDrop();
      }}
      className="border-b border-hair"
    >
      <div className={classNames('flex items-center gap-1', isOpen && 'bg-petrol-wash')}>
        <GripVertical aria-hidden className="size-3.5 flex-none cursor-grab text-ink-soft" />
        <button
          type="button"
          aria-expanded={isOpen}
          aria-keyshortcuts="Alt+ArrowUp Alt+ArrowDown"
          onClick={props.onOpen}
          onKeyDown={onKeyDown}
          className="flex min-h-7 min-w-0 flex-1 items-center justify-between gap-2 text-left text-sm hover:text-petrol focus-visible:-outline-offset-2 pointer-coarse:min-h-11"
        >
          <span className={classNames('truncate', props.isFaulty && 'text-red')}>
            <span className="mr-1.5 font-mono text-[0.8125rem] text-ink-soft">{index + 1}</span>
            {label}
          </span>
          <span className="font-mono text-[0.8125rem] whitespace-nowrap text-ink-soft">{timeWords(timed)}</span>
        </button>
        <Button
          variant="quiet"
          size="icon"
          disabled={locked || index === 0}
          aria-label={`Move step ${index + 1}, ${label}, up`}
          onClick={() => onMove(index - 1)}
        >
          <ArrowUp aria-hidden className="size-3.5" />
        </Button>
        <Button
          variant="quiet"
          size="icon"
          disabled={locked || index === count - 1}
          aria-label={`Move step ${index + 1}, ${label}, down`}
          onClick={() => onMove(index + 1)}
        >
          <ArrowDown aria-hidden className="size-3.5" />
        </Button>
        <Button
          variant="quiet"
          size="icon"
          disabled={locked}
          aria-label={`Remove step ${index + 1}, ${label}`}
          onClick={props.onRemove}
        >
          <Trash2 aria-hidden className="size-3.5" />
        </Button>
      </div>
      {isOpen && (
        <div className="bg-petrol-wash px-1.5 pb-2">
          <StepFields step={step} locked={locked} zones={props.zones} onChange={props.onChange} />
          {timed && <Details timed={timed} />}
        </div>
      )}
    </li>
  );
}

/** "0.82 + 1.50 s": the move, and what it stands or runs there. */
function timeWords(timed: TimedStep | null): string {
  if (!timed) return '–';
  if (timed.kind === 'zone') return '';
  const there = timed.runS + timed.holdS;
  if (timed.kind === 'wait') return `${seconds(there)} s`;
  return there > 0 ? `${seconds(timed.moveS)} + ${seconds(there)} s` : `${seconds(timed.moveS)} s`;
}

function Details({ timed }: { readonly timed: TimedStep }) {
  const { branch, slowestJoint, lengthMm, leastSpeedMmS, crossings } = timed;
  return (
    <div className="mt-1.5 text-sm text-ink-soft">
      {branch !== '' && <p>Branch: {branch}.</p>}
      {slowestJoint !== null && <p>Waits for joint {slowestJoint}, the slowest on the way.</p>}
      {lengthMm !== null && leastSpeedMmS !== null && (
        <p>
          {Math.round(lengthMm)} mm; the joints allow {(leastSpeedMmS / 1000).toFixed(2)} m/s at its slowest place.
        </p>
      )}
      {crossings.map(({ fromMm, toMm, joint, speedMmS, changesBranch }) => (
        <p key={fromMm} className="text-red">
          Passes close to a singular posture {Math.round(fromMm)} to {Math.round(toMm)} mm along
          {joint !== null && `: joint ${joint} has to race`}, {(speedMmS / 1000).toFixed(2)} m/s at most
          {changesBranch && '; the branch changes there'}.
        </p>
      ))}
    </div>
  );
}
