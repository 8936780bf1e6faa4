'use client';

import { useBoard, useBoardSheet } from '@/components/sheet/editor/board-context';
import { useVerdicts } from '@/components/sheet/editor/readings-context';
import { classNames } from '@/components/ui/class-names';
import { Tag } from '@/components/ui/tag';
import type { PointVerdict } from '@/lib/layout/verdicts';
import { BAND_WORDS, worstFirst } from './verdict-order';

/** Every task point with its verdict, the worst first. A row chooses its point; the plumb then hangs there. */
export function VerdictTable() {
  const { sheet } = useBoard();
  const { verdicts } = useVerdicts();
  const items = useBoardSheet((state) => state.items);
  const chosenId = useBoardSheet((state) => state.selection.taskPointId);
  const choose = ({ fixtureId, pointId }: PointVerdict) =>
    sheet.select({ itemIds: [fixtureId], taskPointId: pointId === chosenId ? null : pointId });
  return (
    <section aria-labelledby="points-title" className="border-b border-rule pt-3 pb-2.5">
      <h2 id="points-title" className="px-3.5 text-[0.8125rem] font-medium text-ink-soft">
        Task points
      </h2>
      {verdicts.length === 0 ? (
        <p className="mt-1 px-3.5 text-sm text-ink-soft">
          None yet. Place a fixture and put task points on it; each gets its verdict here.
        </p>
      ) : (
        <table className="mt-0.5 w-full border-collapse text-[0.9375rem]">
          <thead>
            <tr className="text-[0.8125rem] text-ink-soft">
              <Head className="pl-3.5 text-left">Point</Head>
              <Head className="text-right">Robot</Head>
              <Head className="text-right">
                <abbr title="inverse condition number" className="no-underline">
                  1/κ
                </abbr>
              </Head>
              <Head className="text-right">
                <abbr title="speed in every direction, m/s" className="no-underline">
                  Speed
                </abbr>
              </Head>
              <Head className="pr-3.5 text-right">
                <span className="sr-only">Verdict</span>
              </Head>
            </tr>
          </thead>
          <tbody>
            {[...verdicts].sort(worstFirst).map((verdict) => (
              <Row
                key={verdict.pointId}
                verdict={verdict}
                robotName={items.get(verdict.best?.robotId ?? '')?.name ?? '–'}
                isChosen={verdict.pointId === chosenId}
                onChoose={() => choose(verdict)}
              />
            ))}
          </tbody>
        </table>
      )}
      <p className="px-3.5 pt-2.5 text-[0.8125rem] leading-4.5 text-ink-soft">
        Planning figures from the data typed in. Guarding and stopping distances need a risk assessment, measured
        stopping times and local rules.
      </p>
    </section>
  );
}

function Head({ className, children }: { readonly className?: string; readonly children: React.ReactNode }) {
  return (
    <th scope="col" className={classNames('h-7 px-1.5 font-medium', className)}>
      {children}
    </th>
  );
}

interface RowProps {
  readonly verdict: PointVerdict;
  readonly robotName: string;
  readonly isChosen: boolean;
  readonly onChoose: () => void;
}

function Row({ verdict, robotName, isChosen, onChoose }: RowProps) {
  const { best, pointName, wantedSpeedMmS } = verdict;
  const band = best?.band ?? null;
  const figures = 'px-1.5 text-right font-mono text-sm tabular-nums whitespace-nowrap';
  const isSlow = best !== null && best.reached && !best.met;
  return (
    <>
      <tr
        data-verdict={band ?? 'none'}
        data-point={pointName}
        className={classNames('border-t border-hair', isChosen ? 'bg-petrol-wash' : 'hover:bg-petrol-wash')}
      >
        <th scope="row" className="h-[1.72rem] max-w-28 pl-3.5 text-left font-normal">
          <button
            type="button"
            aria-pressed={isChosen}
            onClick={onChoose}
            className="block w-full truncate text-left hover:text-petrol pointer-coarse:min-h-11"
          >
            {pointName}
          </button>
        </th>
        <td className="px-1.5 text-right">{robotName}</td>
        <td className={figures}>{best?.posture ? best.posture.inverseConditionNumber.toFixed(2) : '–'}</td>
        <td className={classNames(figures, isSlow && 'text-red')}>
          {best?.posture ? (best.posture.sureSpeedMmS / 1000).toFixed(2) : '–'}
        </td>
        <td className="pr-3.5 pl-1.5 text-right">
          {band ? <Tag tone={band}>{BAND_WORDS[band]}</Tag> : <Tag>No robot</Tag>}
        </td>
      </tr>
      {isChosen && best?.reason && (
        <tr className="bg-petrol-wash">
          <td colSpan={5} className="px-3.5 pb-1.5 text-sm text-red">
            {best.reason}
            {isSlow && wantedSpeedMmS !== null && ` Wanted: ${(wantedSpeedMmS / 1000).toFixed(2)} m/s.`}
          </td>
        </tr>
      )}
    </>
  );
}
