import type { MapMeasure, MapSettings } from './map-settings';

/** How measures are named and written, the same on every sheet, table and key. */

interface MeasureWords {
  readonly name: string;
  /** Empty for a ratio. */
  readonly unit: string;
  readonly decimals: number;
  /** What dark means, for a reader who does not know the measure. */
  readonly plainly: string;
}

export const MEASURE_WORDS: Record<MapMeasure, MeasureWords> = {
  inverseConditionNumber: {
    name: 'Inverse condition number',
    unit: '',
    decimals: 2,
    plainly: 'darker = the arm moves more freely',
  },
  maximumToolSpeed: {
    name: 'Maximum tool speed',
    unit: 'm/s',
    decimals: 2,
    plainly: 'darker = the tool can go faster in its best direction',
  },
  sureSpeed: {
    name: 'Sure speed',
    unit: 'm/s',
    decimals: 2,
    plainly: 'darker = the tool can go faster in every direction',
  },
  wristCoverage: {
    name: 'Wrist coverage',
    unit: '',
    decimals: 2,
    plainly: 'darker = more of the cone of tool directions is reached',
  },
  reach: {
    name: 'Reach',
    unit: '',
    decimals: 0,
    plainly: 'coloured = an arm reaches it, darker = two arms or more do',
  },
};

/** A value with its unit, such as `0.31` or `1.38 m/s`. */
export function measureText(measure: MapMeasure, value: number): string {
  const { unit, decimals } = MEASURE_WORDS[measure];
  const figure = value.toFixed(decimals).replace('-', '−');
  return unit ? `${figure} ${unit}` : figure;
}

/** Where the tool points, such as `tool down` or `tool tilted 30° outward`. */
export function directionWords({ tiltDeg, towards, headingDeg }: MapSettings): string {
  if (tiltDeg === 0) return 'tool down';
  if (tiltDeg === 180) return 'tool up';
  const where = towards === 'outward' ? 'outward' : `to ${headingDeg}°`;
  return tiltDeg === 90 ? `tool level, ${where}` : `tool tilted ${tiltDeg}° ${where}`;
}

/** What a sheet's map was asked: `tool down, height 850 mm, best robot`. */
export function questionWords(settings: MapSettings): string {
  const { coneDeg, branch, stackMm, stackShown } = settings;
  const heights = stackMm.length > 0 && stackShown === 'worst' ? stackMm : [settings.toolHeightMm];
  const height = heights.length > 1 ? `worst of ${heights.length} heights` : `height ${heights[0]} mm`;
  const cone = coneDeg > 0 ? `, worst in a cone of ${coneDeg}°` : '';
  const posture = branch === 'best' ? '' : `, ${branch}`;
  return `${directionWords(settings)}${cone}, ${height}${posture}, best robot`;
}

export function wristWords(settings: Pick<MapSettings, 'wrist'>): string {
  return settings.wrist === 'held' ? 'wrist held' : 'wrist free';
}
