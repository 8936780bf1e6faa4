'use client';

import { useMemo, type ReactNode } from 'react';
import { SegmentedControl } from '@/components/ui/segmented-control';
import { classNames } from '@/components/ui/class-names';
import { areaAtOrAboveM2, reachedAreaM2, sharedAreaM2 } from '@/lib/layout/floor-figures';
import type { FloorMap } from '@/lib/layout/floor-map';
import type { MapMeasure, MapSettings } from '@/lib/layout/map-settings';
import { questionWords } from '@/lib/layout/measure-words';
import type { MapScale, ValueRange } from '@/lib/layout/scales';
import { AreaWords } from './area-words';
import { FloorHistogram } from './floor-histogram';
import { MeasureChoice } from './measure-choice';
import { WorkLine } from './work-line';
import type { MapWork } from './types';

export interface MapKeyProps {
  readonly settings: MapSettings;
  readonly scale: MapScale;
  readonly range: ValueRange;
  /** What is drawn; kept while newer maps are on their way. */
  readonly map: FloorMap | null;
  readonly work: MapWork;
  readonly onMeasureChange: (measure: MapMeasure) => void;
  readonly onWristChange: (wrist: MapSettings['wrist']) => void;
  readonly onScaleChange: (scale: MapScale) => void;
  /** `settled` is false while the line is still in the hand. */
  readonly onThresholdChange: (threshold: number | null, settled: boolean) => void;
  readonly onAsk?: () => void;
  readonly onCancel?: () => void;
  readonly onRetry?: () => void;
  /** A way to change height and direction; stands beside the words that state them. */
  readonly questionAction?: ReactNode;
  /** One column, for narrow drawers. */
  readonly stacked?: boolean;
}

const WRISTS = [
  { value: 'held', label: 'Wrist held' },
  { value: 'free', label: 'Wrist free' },
] as const;

/** The map's key: what is shown, how much floor has which value, and the line that the reader sets. */
export function MapKey(props: MapKeyProps) {
  const { settings, map, stacked = false } = props;
  const { measure } = settings;
  const threshold = measure === 'reach' ? null : settings.thresholds[measure];
  const areas = useMemo(
    () =>
      map && {
        reached: reachedAreaM2(map),
        shared: sharedAreaM2(map),
        above: threshold === null || map.measure === 'reach' ? null : areaAtOrAboveM2(map, threshold),
      },
    [map, threshold],
  );
  const isDrawn = map !== null && map.measure === measure;
  return (
    <section
      aria-label="Key of the map"
      className={classNames(
        'grid border border-rule bg-sheet',
        stacked
          ? 'grid-cols-1 divide-y divide-hair'
          : 'grid-cols-[minmax(200px,1.05fr)_minmax(180px,2fr)_minmax(170px,1fr)] divide-x divide-hair',
      )}
    >
      <div className="flex min-w-0 flex-col gap-2 px-3.5 py-2.5">
        <MeasureChoice
          measure={measure}
          scale={props.scale}
          onMeasureChange={props.onMeasureChange}
          onScaleChange={props.onScaleChange}
        />
        <SegmentedControl
          label="Wrist"
          value={settings.wrist}
          onValueChange={props.onWristChange}
          options={WRISTS}
          className="self-start"
        />
        <div className="flex flex-wrap items-center gap-x-2 text-[0.8125rem] leading-tight text-ink-soft">
          <span>{questionWords(settings)}</span>
          {props.questionAction}
        </div>
      </div>
      <div className="flex min-w-0 flex-col justify-center px-3.5 py-2.5">
        {isDrawn ? (
          <FloorHistogram
            map={map}
            scale={props.scale}
            range={props.range}
            threshold={threshold}
            areaText={
              areas && areas.above !== null
                ? `${areas.above.toFixed(1)} of ${areas.reached.toFixed(1)} square metres at or above`
                : ''
            }
            onThresholdChange={props.onThresholdChange}
          />
        ) : (
          <WorkLine {...props} />
        )}
      </div>
      <div className="flex min-w-0 flex-col justify-center gap-1.5 px-3.5 py-2.5">
        {isDrawn && areas ? (
          <>
            <AreaWords {...areas} measure={measure} onThresholdChange={props.onThresholdChange} range={props.range} />
            {props.work.kind !== 'none' && <WorkLine {...props} />}
          </>
        ) : (
          <p className="text-[0.8125rem] leading-snug text-ink-soft">
            Once it is there: floor area by value, and a line to drag for what is good enough.
          </p>
        )}
      </div>
    </section>
  );
}
