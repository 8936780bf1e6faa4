import { classNames } from '@/components/ui/class-names';
import { DataCell, DataRow, DataTable, HeadCell } from '@/components/ui/data-table';
import { formatFigure } from '@/components/ui/format-figure';
import { changeOf, verdictOf, type ComparedFigure } from '@/lib/layout/compared-figures';

interface FiguresTableProps {
  readonly figures: readonly ComparedFigure[];
  readonly leftName: string;
  readonly rightName: string;
  /** Up to two more sheets, each against the left one. */
  readonly others?: readonly { readonly name: string; readonly figures: readonly ComparedFigure[] }[];
}

const TONES = { better: 'text-petrol', worse: 'text-red', none: 'text-ink' } as const;
const WORDS = { better: 'better', worse: 'worse', none: '' } as const;

/** Number against number: colour says whether a change helps, the bars how much. */
export function FiguresTable({ figures, leftName, rightName, others = [] }: FiguresTableProps) {
  return (
    <DataTable caption={`Numbers of ${leftName} and ${rightName}`} className="min-w-[34rem]">
      <thead>
        <tr>
          <HeadCell>
            <span className="sr-only">Number</span>
          </HeadCell>
          <HeadCell figures>{leftName}</HeadCell>
          <HeadCell figures>{rightName}</HeadCell>
          <HeadCell>
            <span className="sr-only">Unit</span>
          </HeadCell>
          <HeadCell className="w-[22%]">
            <span className="sr-only">Both as bars</span>
          </HeadCell>
          <HeadCell figures>
            {rightName} − {leftName}
          </HeadCell>
          {others.map(({ name }) => (
            <HeadCell key={name} figures>
              {name}
            </HeadCell>
          ))}
        </tr>
      </thead>
      <tbody>
        {figures.map((figure) => (
          <FigureRow
            key={figure.label}
            figure={figure}
            others={others.flatMap(({ figures: further }) => further.find(({ label }) => label === figure.label) ?? [])}
          />
        ))}
      </tbody>
    </DataTable>
  );
}

interface FigureRowProps {
  readonly figure: ComparedFigure;
  readonly others: readonly ComparedFigure[];
}

function FigureRow({ figure, others }: FigureRowProps) {
  const { label, unit, decimals, left, right, leftOf, rightOf } = figure;
  const verdict = verdictOf(figure);
  const figureText = (value: number | null, of: number | undefined) =>
    `${formatFigure(value, { decimals })}${of === undefined ? '' : ` of ${of}`}`;
  const change = changeOf(figure);
  return (
    <DataRow>
      <th scope="row" className="h-7.5 px-3 py-0.5 pl-3.5 text-left font-normal">
        {label}
      </th>
      <DataCell figures className="h-7.5! py-0.5!">
        {figureText(left, leftOf)}
      </DataCell>
      <DataCell figures className="h-7.5! py-0.5!">
        {figureText(right, rightOf)}
      </DataCell>
      <DataCell className="h-7.5! py-0.5! pl-0! text-sm text-ink-soft">{unit}</DataCell>
      <DataCell className="h-7.5! py-0.5!">
        <Bars {...barsOf(figure)} verdict={verdict} />
      </DataCell>
      <DataCell figures className={classNames('h-7.5! py-0.5! font-medium', TONES[verdict])}>
        {formatFigure(change, { decimals, signed: true })}
        <span className="sr-only"> {WORDS[verdict]}</span>
      </DataCell>
      {others.map((other, index) => (
        <DataCell key={index} figures className={classNames('h-7.5! py-0.5!', TONES[verdictOf(other)])}>
          {figureText(other.right, other.rightOf)}
          <span className="sr-only"> {WORDS[verdictOf(other)]}</span>
        </DataCell>
      ))}
    </DataRow>
  );
}

interface BarShares {
  readonly left: number;
  readonly right: number;
}

/** Shares of the bar's full length: of the count where there is one, else of the larger value. A negative margin has no bar. */
export function barsOf({ left, right, leftOf, rightOf }: ComparedFigure): BarShares {
  const full = Math.max(leftOf ?? 0, rightOf ?? 0) || Math.max(left ?? 0, right ?? 0) || 1;
  const share = (value: number | null) => Math.min(1, Math.max(0, (value ?? 0) / full));
  return { left: share(left), right: share(right) };
}

function Bars({ left, right, verdict }: BarShares & { readonly verdict: 'better' | 'worse' | 'none' }) {
  return (
    <svg viewBox="0 0 100 14" preserveAspectRatio="none" className="block h-3.5 w-full" aria-hidden>
      <rect width="100" height="14" fill="var(--paper)" />
      <rect y="1" width={left * 100} height="5.4" fill="var(--ink-soft)" opacity="0.7" />
      <rect y="7.6" width={right * 100} height="5.4" fill={verdict === 'worse' ? 'var(--red)' : 'var(--petrol)'} />
    </svg>
  );
}
