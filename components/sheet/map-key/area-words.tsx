import { Figure } from '@/components/ui/figure';
import type { MapMeasure } from '@/lib/layout/map-settings';
import type { ValueRange } from '@/lib/layout/scales';

interface AreaWordsProps {
  readonly reached: number;
  readonly shared: number;
  /** Null where no line is set. */
  readonly above: number | null;
  readonly measure: MapMeasure;
  readonly range: ValueRange;
  readonly onThresholdChange: (threshold: number | null, settled: boolean) => void;
}

/** Where a first line is put: a quarter up the scale. */
const FIRST_LINE_SHARE = 0.25;

/** The square metres, said in words. */
export function AreaWords({ reached, shared, above, measure, range, onThresholdChange }: AreaWordsProps) {
  if (measure === 'reach') {
    return (
      <Words total={<Figure value={reached} decimals={1} />}>
        of floor reached, <Figure value={shared} decimals={1} unit="m²" /> of it by two robots or more.
      </Words>
    );
  }
  if (above === null) {
    return (
      <>
        <Words total={<Figure value={reached} decimals={1} />}>of floor reached.</Words>
        <button
          type="button"
          className="self-start text-[0.8125rem] text-petrol underline pointer-coarse:min-h-11"
          onClick={() => onThresholdChange(range.from + (range.to - range.from) * FIRST_LINE_SHARE, true)}
        >
          Set a line for what is good enough
        </button>
      </>
    );
  }
  return (
    <Words
      total={
        <>
          <Figure value={above} decimals={1} /> of <Figure value={reached} decimals={1} />
        </>
      }
    >
      of reached floor at or above the line. Drag the line to set your own.
    </Words>
  );
}

function Words({ total, children }: { readonly total: React.ReactNode; readonly children: React.ReactNode }) {
  return (
    <p className="text-[0.8125rem] leading-snug text-ink-soft">
      <span className="block text-lg leading-tight font-semibold text-ink">{total} m²</span>
      {children}
    </p>
  );
}
