import { DataCell, DataRow, DataTable, HeadCell } from '@/components/ui/data-table';
import { formatFigure } from '@/components/ui/format-figure';
import { Tag } from '@/components/ui/tag';
import type { Robot } from '@/lib/layout/items';
import { VERDICT_BANDS, type VerdictBand } from '@/lib/layout/verdict-words';
import type { PointVerdict } from '@/lib/layout/verdicts';

interface TaskPointTableProps {
  readonly verdicts: readonly PointVerdict[];
  readonly robots: readonly Robot[];
}

const BAND_NAMES: Record<VerdictBand, string> = {
  roomy: 'Roomy',
  fair: 'Fair',
  tight: 'Tight',
  pinned: 'Pinned',
  out: 'Out of reach',
};

/** Every task point with the robot that serves it best, the worst first. */
export function TaskPointTable({ verdicts, robots }: TaskPointTableProps) {
  const names = new Map(robots.map(({ id, name }) => [id, name]));
  const rank = ({ best }: PointVerdict) => (best ? VERDICT_BANDS.indexOf(best.band) : VERDICT_BANDS.length);
  const ordered = [...verdicts].sort((a, b) => rank(b) - rank(a));
  if (ordered.length === 0) return <p className="px-3.5 py-3 text-ink-soft">This sheet has no task points.</p>;
  return (
    <DataTable caption="Task points and how well they are reached">
      <thead>
        <tr>
          <HeadCell>Point</HeadCell>
          <HeadCell>Robot</HeadCell>
          <HeadCell figures>Sure speed</HeadCell>
          <HeadCell className="text-right">Verdict</HeadCell>
        </tr>
      </thead>
      <tbody>
        {ordered.map(({ pointId, pointName, best }) => (
          <DataRow key={pointId}>
            <DataCell className="h-7.5! py-0.5!">
              {pointName}
              {best?.reason && <span className="block text-[0.8125rem] leading-snug text-ink-soft">{best.reason}</span>}
            </DataCell>
            <DataCell className="h-7.5! py-0.5!">{(best?.reached && names.get(best.robotId)) || '–'}</DataCell>
            <DataCell figures className="h-7.5! py-0.5!">
              {best?.posture ? `${formatFigure(best.posture.sureSpeedMmS / 1000, { decimals: 2 })} m/s` : '–'}
            </DataCell>
            <DataCell className="h-7.5! py-0.5! text-right">
              <Tag tone={best?.band ?? 'neutral'}>{best ? BAND_NAMES[best.band] : 'No robot'}</Tag>
            </DataCell>
          </DataRow>
        ))}
      </tbody>
    </DataTable>
  );
}
