'use client';

import { useMemo } from 'react';
import { useBoard, useBoardSheet } from '@/components/sheet/editor/board-context';
import { useVerdicts } from '@/components/sheet/editor/readings-context';
import { classNames } from '@/components/ui/class-names';
import { Tag } from '@/components/ui/tag';
import { taskRows, type TaskRow } from '@/lib/layout/judging/task-rows';
import { BAND_WORDS, kindOfTask, marginWords } from './verdict-order';

/** Every task with its verdict, the worst first. A row chooses its task; the plumb then hangs there, or at its worst place. */
export function VerdictTable() {
  const { sheet } = useBoard();
  const { cell } = useVerdicts();
  const items = useBoardSheet((state) => state.items);
  const chosenId = useBoardSheet((state) => state.selection.taskPointId);
  const rows = useMemo(() => taskRows(cell), [cell]);
  const choose = ({ fixtureId, id }: TaskRow) =>
    sheet.select({ itemIds: [fixtureId], taskPointId: id === chosenId ? null : id });
  return (
    <section aria-labelledby="points-title" className="border-b border-rule pt-3 pb-2.5">
      <h2 id="points-title" className="px-3.5 text-[0.8125rem] font-medium text-ink-soft">
        Task points
      </h2>
      {rows.length === 0 ? (
        <p className="mt-1 px-3.5 text-sm text-ink-soft">
          None yet. Place a fixture and put task points on it; each gets its verdict here.
        </p>
      ) : (
        <table className="mt-0.5 w-full border-collapse text-[0.9375rem]">
          <caption className="sr-only">Task points, paths and patterns with their verdicts, the worst first</caption>
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
                <abbr title="speed in every direction, or along a path, m/s" className="no-underline">
                  Speed
                </abbr>
              </Head>
              <Head className="pr-3.5 text-right">
                <span className="sr-only">Verdict</span>
              </Head>
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <Row
                key={row.id}
                row={row}
                robotName={items.get(row.robotId ?? '')?.name ?? '–'}
                isChosen={row.id === chosenId}
                onChoose={() => choose(row)}
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
  readonly row: TaskRow;
  readonly robotName: string;
  readonly isChosen: boolean;
  readonly onChoose: () => void;
}

function Row({ row, robotName, isChosen, onChoose }: RowProps) {
  const { band, name } = row;
  const figures = 'px-1.5 text-right font-mono text-sm tabular-nums whitespace-nowrap';
  const isSlow = row.marginMmS !== null && row.marginMmS < 0;
  const kind = kindOfTask(row.kind);
  const margin = marginWords(row);
  return (
    <>
      <tr
        data-verdict={band ?? 'none'}
        data-point={name}
        className={classNames('border-t border-hair', isChosen ? 'bg-petrol-wash' : 'hover:bg-petrol-wash')}
      >
        <th scope="row" className="h-[1.72rem] max-w-28 pl-3.5 text-left font-normal">
          <button
            type="button"
            aria-pressed={isChosen}
            onClick={onChoose}
            title={name}
            className="block w-full truncate text-left hover:text-petrol pointer-coarse:min-h-11"
          >
            {name}
            {kind && <span className="sr-only">, {kind}</span>}
          </button>
        </th>
        <td className="px-1.5 text-right whitespace-nowrap">
          {robotName}
          {row.assignment === 'by hand' && (
            <>
              <span aria-hidden title="Given to this robot by hand">
                *
              </span>
              <span className="sr-only"> by hand</span>
            </>
          )}
        </td>
        <td className={figures}>{row.inverseConditionNumber?.toFixed(2) ?? '–'}</td>
        <td className={classNames(figures, isSlow && 'text-red')}>
          {row.speedMmS === null ? '–' : (row.speedMmS / 1000).toFixed(2)}
        </td>
        <td className="pr-3.5 pl-1.5 text-right">
          {band ? <Tag tone={band}>{BAND_WORDS[band]}</Tag> : <Tag>No robot</Tag>}
        </td>
      </tr>
      {isChosen && (
        <tr className="bg-petrol-wash">
          <td colSpan={5} className="px-3.5 pb-1.5 text-sm">
            {row.reason && <p className="text-red">{row.reason}</p>}
            {margin && <p>{margin}</p>}
            {row.notes.map((note) => (
              <p key={note} className="text-ink-soft">
                {note}
              </p>
            ))}
          </td>
        </tr>
      )}
    </>
  );
}
