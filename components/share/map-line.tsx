import { ScaleBar } from '@/components/sheet/map-key/scale-bar';
import { directionWords, MEASURE_WORDS, measureText, wristWords } from '@/lib/layout/measure-words';
import type { MapSettings } from '@/lib/layout/map-settings';
import type { ReviewMap } from './use-review-map';

interface MapLineProps {
  readonly settings: MapSettings;
  readonly reviewMap: ReviewMap;
  /** Why there is no map, or none yet. */
  readonly absence: string | null;
}

/** The key of the map in a sentence, for a reader who has never seen one. */
export function MapLine({ settings, reviewMap, absence }: MapLineProps) {
  if (absence) return <p className="px-3.5 py-2.5 text-ink-soft">{absence}</p>;
  const { measure } = settings;
  const { threshold } = reviewMap;
  return (
    <div className="px-3.5 py-2.5">
      <div className="flex items-center gap-3">
        <ScaleBar scale="tide" className="h-3 w-22 shrink-0 border border-rule" />
        <p className="leading-snug">
          {MEASURE_WORDS[measure].plainly}. Bare paper = not reached.
          {threshold !== null && ` Hatched = below ${measureText(measure, threshold)}.`}
        </p>
      </div>
      <p className="mt-1 text-sm text-ink-soft">
        {MEASURE_WORDS[measure].name}, {directionWords(settings)}, height {settings.toolHeightMm} mm,{' '}
        {wristWords(settings)}
      </p>
    </div>
  );
}
