'use client';

import { useBoard, useBoardSheet } from '@/components/sheet/editor/board-context';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { useUnits } from '@/lib/client/use-units';
import { put } from '@/lib/editor/changes';
import { printedFixed } from '@/lib/editor/measure-text';
import type { Item } from '@/lib/layout/items';
import type { Stand, StandingAnswer } from '@/lib/layout/standing/answer';
import type { StandingQuestion } from '@/lib/layout/standing/question';
import { Quiet } from './section';
import { useStudyStore, useStudyView, type AskedStudy } from './study-store';

interface StandingResultProps {
  readonly asked: AskedStudy<StandingQuestion>;
  readonly answer: StandingAnswer;
}

/** The best place, what it gains over the drawn one, and the button that puts the mover there. */
export function StandingResult({ asked, answer }: StandingResultProps) {
  const { sheet } = useBoard();
  const mover = useBoardSheet((state) => state.items.get(asked.moverId));
  const store = useStudyStore();
  const isShown = useStudyView().shown === 'standing';
  const { unit, figure } = useUnits();
  const { best, drawn, feasibleAreaM2 } = answer;
  const count = asked.work.length;
  if (!mover) return <Quiet>What was studied is gone from the sheet.</Quiet>;

  const place = () => {
    if (!best || (mover.kind !== 'robot' && mover.kind !== 'fixture')) return;
    const { items } = sheet.getState();
    sheet.commit(`Put ${mover.name} in the best place`, [put(items, placed(mover, best))]);
  };
  const isThere = best !== null && standsAt(mover, best);
  return (
    <div data-standing-answer className="text-sm">
      {best ? (
        <>
          <table className="w-full border-collapse">
            <caption className="sr-only">The best place beside the drawn one</caption>
            <thead>
              <tr className="text-[0.8125rem] text-ink-soft">
                <td />
                <th scope="col" className="h-6 text-right font-medium">
                  As drawn
                </th>
                <th scope="col" className="text-right font-medium">
                  Best place
                </th>
              </tr>
            </thead>
            <tbody>
              <Row label={`x, ${unit}`} cells={[figure(drawn.xMm), figure(best.xMm)]} />
              <Row label={`y, ${unit}`} cells={[figure(drawn.yMm), figure(best.yMm)]} />
              <Row label="Turn" cells={[`${printedFixed(drawn.angleDeg, 1)}°`, `${printedFixed(best.angleDeg, 1)}°`]} />
              {asked.question.mover === 'robot' && (
                <Row label={`Riser, ${unit}`} cells={[figure(drawn.riserMm), figure(best.riserMm)]} />
              )}
              <Row label="Worst 1/κ" cells={[worstOf(drawn), worstOf(best)]} strong />
              <Row label="Reached" cells={[`${drawn.reachedCount} of ${count}`, `${best.reachedCount} of ${count}`]} />
              <Row label="Met" cells={[`${drawn.metCount} of ${count}`, `${best.metCount} of ${count}`]} />
            </tbody>
          </table>
          <p className="mt-1">{gainWords(drawn, best)}</p>
        </>
      ) : (
        <Notice tone="caution">
          No free place of the grid reaches all {count} points. Give some to another robot, or try other riser heights.
        </Notice>
      )}
      <p className="mt-1 text-ink-soft">
        Every point is reached from <span className="font-mono">{feasibleAreaM2.toFixed(2)}</span> m² of floor.
      </p>
      <div className="mt-2 flex flex-wrap gap-2">
        {best && (
          <Button variant="action" size="small" disabled={isThere || mover.locked} onClick={place} data-put-there>
            {isThere ? `${mover.name} stands there` : `Put ${mover.name} there`}
          </Button>
        )}
        <Button size="small" onClick={() => store.set({ shown: isShown ? null : 'standing' })} aria-pressed={isShown}>
          {isShown ? 'Show the dexterity map' : 'Show on the floor'}
        </Button>
      </div>
      {mover.locked && <Quiet>{mover.name} is locked. Unlock it to put it elsewhere.</Quiet>}
    </div>
  );
}

function placed(mover: Extract<Item, { kind: 'robot' | 'fixture' }>, { xMm, yMm, angleDeg, riserMm }: Stand): Item {
  return mover.kind === 'robot' ? { ...mover, xMm, yMm, angleDeg, riserMm } : { ...mover, xMm, yMm, angleDeg };
}

function standsAt(mover: Item, { xMm, yMm, angleDeg, riserMm }: Stand): boolean {
  const isPlaced = mover.xMm === xMm && mover.yMm === yMm && mover.angleDeg === angleDeg;
  return isPlaced && (mover.kind !== 'robot' || mover.riserMm === riserMm);
}

const worstOf = ({ worst }: Stand): string => (worst === null ? '–' : worst.toFixed(3));

function gainWords(drawn: Stand, best: Stand): string {
  if (drawn.worst === null || best.worst === null) {
    return `From there every point is reached; as drawn ${drawn.points.length - drawn.reachedCount} are not.`;
  }
  const gain = best.worst / drawn.worst - 1;
  if (gain <= 0.001) return 'The drawn place is as good as any of the grid.';
  return `The worst point gains ${Math.round(gain * 100)} % in inverse condition number.`;
}

interface RowProps {
  readonly label: string;
  readonly cells: readonly [string, string];
  readonly strong?: boolean;
}

function Row({ label, cells, strong }: RowProps) {
  return (
    <tr className="border-t border-hair">
      <th scope="row" className="h-6 text-left font-normal">
        {label}
      </th>
      {cells.map((cell, index) => (
        <td key={index} className={`text-right font-mono tabular-nums ${strong && index === 1 ? 'font-semibold' : ''}`}>
          {cell}
        </td>
      ))}
    </tr>
  );
}
