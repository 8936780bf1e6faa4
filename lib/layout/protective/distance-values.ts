import { z } from 'zod';

const gap = (defaultMm: number) => z.number().min(0, 'A length is 0 mm or more.').max(10_000).default(defaultMm);

/** Figures of standards that a sheet is measured against. Every one can be changed on the sheet; the defaults name their source. */
export const distanceValuesSchema = z.object({
  bodyMm: gap(500),
  headMm: gap(300),
  legMm: gap(180),
  footMm: gap(120),
  toesMm: gap(50),
  armMm: gap(120),
  fistMm: gap(100),
  fingerMm: gap(25),
  walkwayLeastMm: gap(600),
  walkwayBetterMm: gap(800),
  reducedSpeedMmS: z.number().positive('A speed is above zero.').max(10_000).default(250),
});

export type DistanceValues = z.infer<typeof distanceValuesSchema>;
export type DistanceValue = keyof DistanceValues;

interface ValueWords {
  readonly label: string;
  readonly source: string;
}

const GAPS = 'ISO 13854:2017';
const WAYS = 'ISO 14122-2:2016';

/** All of them from secondary sources and memory, as the panel says beside them. */
export const DISTANCE_VALUE_WORDS: Record<DistanceValue, ValueWords> = {
  bodyMm: { label: 'Body', source: GAPS },
  headMm: { label: 'Head', source: GAPS },
  legMm: { label: 'Leg', source: GAPS },
  footMm: { label: 'Foot', source: GAPS },
  toesMm: { label: 'Toes', source: GAPS },
  armMm: { label: 'Arm', source: GAPS },
  fistMm: { label: 'Hand, wrist, fist', source: GAPS },
  fingerMm: { label: 'Finger', source: GAPS },
  walkwayLeastMm: { label: 'Walkway at least', source: WAYS },
  walkwayBetterMm: { label: 'Walkway better', source: WAYS },
  reducedSpeedMmS: { label: 'Reduced speed', source: 'ISO 10218-1, edition not checked' },
};

export const isChanged = (key: DistanceValue, values: DistanceValues): boolean =>
  values[key] !== distanceValuesSchema.parse({})[key];
