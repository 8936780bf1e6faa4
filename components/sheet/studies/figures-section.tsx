'use client';

import { useBoard, useBoardSettings } from '@/components/sheet/editor/board-context';
import { ValueField } from '@/components/sheet/panels/value-field';
import {
  DISTANCE_VALUE_WORDS,
  distanceValuesSchema,
  isChanged,
  type DistanceValue,
} from '@/lib/layout/protective/distance-values';
import { Cautions } from './cautions';
import { Quiet, Section } from './section';

const KEYS = Object.keys(DISTANCE_VALUE_WORDS) as DistanceValue[];

/** The figures that everything above is measured against: each with its source, each to be changed for this sheet. */
export function FiguresSection() {
  const { settings } = useBoard();
  const { distances } = useBoardSettings();
  const change = (key: DistanceValue) => (value: number) => {
    const checked = distanceValuesSchema.safeParse({ ...distances, [key]: value });
    if (!checked.success) return 'Write a length from 0 to 10,000 mm, or a speed above zero.';
    settings.change({ distances: checked.data });
    return null;
  };
  return (
    <Section title="Figures used">
      <div className="grid grid-cols-2 gap-x-4 gap-y-2">
        {KEYS.map((key) => {
          const { label, source } = DISTANCE_VALUE_WORDS[key];
          return (
            <div key={key}>
              <ValueField
                label={label}
                kind={key === 'reducedSpeedMmS' ? 'number' : 'length'}
                unit={key === 'reducedSpeedMmS' ? 'mm/s' : undefined}
                value={distances[key]}
                step={10}
                onCommit={change(key)}
              />
              <p className="text-[0.75rem] leading-4 text-ink-soft">
                {isChanged(key, distances) ? 'Changed for this sheet' : source}
              </p>
            </div>
          );
        })}
      </div>
      <Quiet>All from secondary sources and memory.</Quiet>
      <Cautions />
    </Section>
  );
}
