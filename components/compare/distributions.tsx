import { max, scaleLinear } from 'd3';
import { formatFigure } from '@/components/ui/format-figure';
import { floorHistogramM2 } from '@/lib/layout/floor-figures';
import type { FloorMap } from '@/lib/layout/floor-map';
import { MEASURE_WORDS, measureText } from '@/lib/layout/measure-words';
import type { Comparison } from './use-comparison';

interface DistributionsProps {
  readonly comparison: Comparison;
  readonly leftName: string;
  readonly rightName: string;
}

const BARS = 48;
const WIDTH = 480;
const HEIGHT = 84;

/** Floor area by value of both sheets, drawn over each other on the common scale. */
export function Distributions({ comparison, leftName, rightName }: DistributionsProps) {
  const { leftMap, rightMap, range, measure, threshold } = comparison;
  if (measure === 'reach' || !leftMap || !rightMap) return null;
  const edges = Array.from({ length: BARS + 1 }, (_, index) => range.from + ((range.to - range.from) * index) / BARS);
  const areas = (map: FloorMap) => floorHistogramM2(map, edges);
  const [left, right] = [areas(leftMap), areas(rightMap)];
  const most = max([...left, ...right]) || 1;
  const x = scaleLinear([0, BARS], [0, WIDTH]);
  const y = scaleLinear([0, most], [HEIGHT, 2]);
  const steps = (values: readonly number[]) =>
    values.map((area, index) => `${index === 0 ? 'M' : 'L'}${x(index)} ${y(area)}H${x(index + 1)}`).join('');
  const line = threshold === null ? null : x(((threshold - range.from) / (range.to - range.from)) * BARS);
  return (
    <figure className="border-t border-hair px-3.5 py-2.5">
      <figcaption className="mb-1 flex flex-wrap justify-between gap-x-4 text-sm text-ink-soft">
        <span>
          Floor by {MEASURE_WORDS[measure].name.toLowerCase()}, up to{' '}
          <span className="font-mono text-ink">{formatFigure(most, { decimals: 2 })} m²</span> a step
        </span>
        <span>
          <span className="font-semibold text-ink-soft">━ {leftName}</span>{' '}
          <span className="ml-2 font-semibold text-petrol">━ {rightName}</span>
        </span>
      </figcaption>
      <svg
        viewBox={`0 0 ${WIDTH} ${HEIGHT}`}
        preserveAspectRatio="none"
        role="img"
        aria-label={`Distribution of ${MEASURE_WORDS[measure].name.toLowerCase()} over the floor of ${leftName} and ${rightName}`}
        className="block h-20 w-full border-b border-rule"
      >
        <path d={`${steps(left)}V${HEIGHT}H0Z`} fill="var(--ink-soft)" opacity="0.22" />
        <path
          d={steps(left)}
          fill="none"
          stroke="var(--ink-soft)"
          strokeWidth="1.5"
          vectorEffect="non-scaling-stroke"
        />
        <path d={steps(right)} fill="none" stroke="var(--petrol)" strokeWidth="2" vectorEffect="non-scaling-stroke" />
        {line !== null && line >= 0 && line <= WIDTH && (
          <path
            d={`M${line} 0V${HEIGHT}`}
            stroke="var(--red)"
            strokeDasharray="3 3"
            vectorEffect="non-scaling-stroke"
          />
        )}
      </svg>
      <div className="flex justify-between font-mono text-[0.8125rem]">
        <span>{Number(range.from.toPrecision(3))}</span>
        <span>{measureText(measure, range.to)}</span>
      </div>
    </figure>
  );
}
