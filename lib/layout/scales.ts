import { interpolateLab, nice, piecewise, rgb } from 'd3';
import type { MapMeasure } from './map-settings';

/**
 * Colour scales of maps: light is poor, dark is good, so a reader who sees no hue reads the same map. The stops of `tide`
 * and `plum` are our own paths through CIELAB, respaced so that neighbouring stops differ equally by CIEDE2000
 * (4.2 … 4.9 a step); scales.test.ts measures that again. The dark ends stop at L* 36 … 40 so that ink stays readable on them.
 */

export const MAP_SCALES = ['tide', 'plum', 'grey'] as const;
export type MapScale = (typeof MAP_SCALES)[number];

export const MAP_SCALE_NAMES: Record<MapScale, string> = { tide: 'Tide', plum: 'Plum', grey: 'Grey, for print' };

export const SCALE_STOPS: Record<MapScale, readonly string[]> = {
  tide: [
    '#eff5b9', '#dbf0af', '#c3eaa6', '#ace2a4', '#96daa6', '#80d2a7', '#6dc9aa', '#5cc1ad', '#4db9b0',
    '#3db1b3', '#2da8b4', '#209eb4', '#1694b2', '#0989af', '#027eaa', '#0172a2', '#006699',
  ],
  plum: [
    '#ffeec6', '#ffe2b6', '#fed4a4', '#fdc598', '#fab790', '#f7a889', '#f29a85', '#ec8d83', '#e48182',
    '#db7582', '#d06a83', '#c46184', '#b75986', '#a95286', '#994b85', '#874583', '#764081',
  ],
  grey: [
    '#ecebe7', '#ddddd9', '#cfcfcc', '#c2c2c0', '#b6b6b4', '#aaabaa', '#9fa09f', '#959696', '#8b8c8c',
    '#828384', '#797b7c', '#717374', '#686b6c', '#606264', '#57595c', '#4d5053', '#44474a',
  ],
}; // prettier-ignore

/** Less (red) over paper to more (petrol). Its middle is the sheet itself: no change is no colour. */
export const DIVERGING_STOPS = {
  day: ['#b5301a', '#d36a50', '#e7a893', '#faf8f2', '#9cc3c3', '#4c9097', '#0e5a63'],
  night: ['#f08a72', '#b25f50', '#5e3f42', '#14202d', '#2d545f', '#4a8d97', '#6cc3cb'],
} as const;

/** The colour at a share of the scale: 0 poor … 1 good; beyond the ends the end colour. */
export function scaleColour(scale: MapScale, share: number): string {
  return interpolators[scale](Math.min(1, Math.max(0, share)));
}

/** The colour of a change: −1 much less … 0 none … +1 much more. */
export function divergingColour(share: number, board: 'day' | 'night' = 'day'): string {
  return diverging[board]((Math.min(1, Math.max(-1, share)) + 1) / 2);
}

const interpolators: Record<MapScale, (share: number) => string> = {
  tide: piecewise(interpolateLab, [...SCALE_STOPS.tide]),
  plum: piecewise(interpolateLab, [...SCALE_STOPS.plum]),
  grey: piecewise(interpolateLab, [...SCALE_STOPS.grey]),
};
const diverging = {
  day: piecewise(interpolateLab, [...DIVERGING_STOPS.day]),
  night: piecewise(interpolateLab, [...DIVERGING_STOPS.night]),
};

export const TABLE_SIZE = 256;
const tables = new Map<string, Uint32Array>();

function tableOf(key: string, colour: (share: number) => string): Uint32Array {
  const known = tables.get(key);
  if (known) return known;
  const bytes = new Uint8Array(TABLE_SIZE * 4);
  for (let index = 0; index < TABLE_SIZE; index += 1) {
    const { r, g, b } = rgb(colour(index / (TABLE_SIZE - 1)));
    bytes.set([r, g, b, 255], index * 4);
  }
  const table = new Uint32Array(bytes.buffer);
  tables.set(key, table);
  return table;
}

/** 256 opaque pixels from poor to good, as a canvas's image data stores them. */
export function scaleTable(scale: MapScale): Uint32Array {
  return tableOf(scale, interpolators[scale]);
}

/** 256 opaque pixels from much less, over the sheet's own colour, to much more. */
export function divergingTable(board: 'day' | 'night' = 'day'): Uint32Array {
  return tableOf(`diverging-${board}`, diverging[board]);
}

/** Reach has no value a spot: where it stands on the scale with one robot, and where two or more can meet. */
export const REACH_SHARES = { one: 0.3, more: 0.62 } as const;

/** The values at the two ends of a scale. */
export interface ValueRange {
  readonly from: number;
  readonly to: number;
}

/** A range from zero to just above the greatest of `values` (NaN left out), on a round number. One for both of two compared maps. */
export function valueRange(measure: MapMeasure, ...values: readonly Float32Array[]): ValueRange {
  if (measure === 'reach' || measure === 'wristCoverage') return { from: 0, to: 1 };
  let greatest = 0;
  for (const array of values) {
    for (let cell = 0; cell < array.length; cell += 1) if (array[cell] > greatest) greatest = array[cell];
  }
  if (greatest === 0) return { from: 0, to: 1 };
  const [, to] = nice(0, greatest, 10);
  return { from: 0, to };
}

/** The share of the range at which a value lies; not clamped. */
export function shareOf(range: ValueRange, value: number): number {
  return (value - range.from) / (range.to - range.from || 1);
}
