import { ScaleBar } from '@/components/sheet/map-key/scale-bar';
import { formatFigure } from '@/components/ui/format-figure';
import type { MapMeasure } from '@/lib/layout/map-settings';
import { MEASURE_WORDS, measureText } from '@/lib/layout/measure-words';
import { divergingColour, type MapScale, type ValueRange } from '@/lib/layout/scales';
import type { Comparison } from './use-comparison';

interface ScaleKeyProps {
  readonly measure: MapMeasure;
  readonly scale: MapScale;
  readonly range: ValueRange;
}

/** The one scale of both sheets. */
export function ScaleKey({ measure, scale, range }: ScaleKeyProps) {
  if (measure === 'reach') return <span>{MEASURE_WORDS.reach.plainly}</span>;
  return (
    <>
      <span className="font-mono text-ink">{Number(range.from.toPrecision(3))}</span>
      <ScaleBar scale={scale} className="h-2.5 min-w-0 flex-1" />
      <span className="font-mono whitespace-nowrap text-ink">{measureText(measure, range.to)}</span>
    </>
  );
}

/** The diverging scale, and the floor that is won or lost altogether. */
export function DifferenceKey({ comparison }: { readonly comparison: Comparison }) {
  const { difference, limit, measure } = comparison;
  if (!difference) return <span>Drawn as soon as all maps of both sheets are there.</span>;
  const end = formatFigure(limit, { decimals: MEASURE_WORDS[measure].decimals });
  return (
    <>
      {measure !== 'reach' && (
        <>
          <span className="font-mono text-ink">−{end}</span>
          <DivergingBar />
          <span className="font-mono text-ink">+{end}</span>
        </>
      )}
      <span className="ml-auto whitespace-nowrap">
        hatched: won <span className="font-mono text-ink">{formatFigure(difference.gainedM2, { decimals: 1 })}</span>,
        lost <span className="font-mono text-ink">{formatFigure(difference.lostM2, { decimals: 1 })} m²</span>
      </span>
    </>
  );
}

const STEPS = 21;
const SHARES = Array.from({ length: STEPS }, (_, step) => (2 * step) / (STEPS - 1) - 1);

function DivergingBar() {
  // Both boards are drawn; the stylesheet shows the one that is in use.
  return (['day', 'night'] as const).map((board) => (
    <svg
      key={board}
      viewBox={`0 0 ${STEPS} 1`}
      preserveAspectRatio="none"
      shapeRendering="crispEdges"
      aria-hidden
      className={`h-2.5 min-w-10 flex-1 ${board === 'day' ? 'dark:hidden' : 'hidden dark:block'}`}
    >
      {SHARES.map((share, step) => (
        <rect key={share} x={step} width="1.02" height="1" fill={divergingColour(share, board)} />
      ))}
    </svg>
  ));
}
