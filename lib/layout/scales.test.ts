import { lab, rgb } from 'd3';
import { describe, expect, it } from 'vitest';
import { colourDistance } from './testing/colour-distance';
import {
  divergingColour,
  DIVERGING_STOPS,
  MAP_SCALES,
  SCALE_STOPS,
  scaleColour,
  scaleTable,
  shareOf,
  TABLE_SIZE,
  valueRange,
} from './scales';

const STEPS = 64;
const samples = (scale: (typeof MAP_SCALES)[number]) =>
  Array.from({ length: STEPS + 1 }, (_, step) => lab(scaleColour(scale, step / STEPS)));

describe.each(MAP_SCALES)('scale %s', (scale) => {
  it('gets darker all the way: CIELAB lightness (CIE 15, by d3-color) falls at every step', () => {
    const lightness = samples(scale).map(({ l }) => l);
    for (let step = 1; step < lightness.length; step += 1) expect(lightness[step]).toBeLessThan(lightness[step - 1]);
    expect(lightness[0]).toBeGreaterThan(90);
    expect(lightness[STEPS]).toBeLessThan(42);
  });

  it('is even to the eye: neighbouring stops differ alike by CIEDE2000 (CIE 142-2001)', () => {
    const colours = SCALE_STOPS[scale].map((stop) => lab(stop));
    const steps = colours.slice(1).map((colour, index) => colourDistance(colours[index], colour));
    const mean = steps.reduce((sum, step) => sum + step, 0) / steps.length;
    for (const step of steps) expect(Math.abs(step - mean) / mean).toBeLessThan(0.12);
  });

  it('keeps its order for readers who confuse red and green or see no blue', () => {
    for (const kind of ['protan', 'deutan', 'tritan'] as const) {
      const lightness = samples(scale).map((colour) => lab(seenBy(kind, colour.formatHex())).l);
      for (let step = 1; step < lightness.length; step += 1) expect(lightness[step]).toBeLessThan(lightness[step - 1]);
    }
  });

  it('fills its table from poor to good in opaque pixels', () => {
    const table = scaleTable(scale);
    const bytes = new Uint8Array(table.buffer);
    const first = rgb(scaleColour(scale, 0));
    const last = rgb(scaleColour(scale, 1));
    expect(table).toHaveLength(TABLE_SIZE);
    expect([...bytes.slice(0, 4)]).toEqual([first.r, first.g, first.b, 255].map(Math.round));
    expect([...bytes.slice(-4)]).toEqual([last.r, last.g, last.b, 255].map(Math.round));
  });
});

describe('the diverging scale', () => {
  it('has the sheet itself in its middle and grows away from it on both sides', () => {
    expect(rgb(divergingColour(0)).formatHex()).toBe('#faf8f2');
    expect(DIVERGING_STOPS.day[3]).toBe('#faf8f2');
    const paper = lab('#faf8f2');
    for (const side of [-1, 1]) {
      const away = [0.25, 0.5, 0.75, 1].map((share) => colourDistance(paper, lab(divergingColour(side * share))));
      expect([...away].sort((a, b) => a - b)).toEqual(away);
      expect(away[3]).toBeGreaterThan(30);
    }
  });

  it('keeps less and more apart for readers who confuse red and green', () => {
    for (const kind of ['protan', 'deutan'] as const) {
      const less = lab(seenBy(kind, divergingColour(-1)));
      const more = lab(seenBy(kind, divergingColour(1)));
      expect(colourDistance(less, more)).toBeGreaterThan(20);
    }
  });
});

describe('the range of values', () => {
  it('runs from zero to a round number above the greatest value of all maps, whatever is not reached', () => {
    expect(valueRange('inverseConditionNumber', Float32Array.of(0.1, NaN), Float32Array.of(0.413))).toEqual({
      from: 0,
      to: 0.45,
    });
    expect(valueRange('sureSpeed', Float32Array.of(NaN))).toEqual({ from: 0, to: 1 });
    expect(valueRange('reach', Float32Array.of(1))).toEqual({ from: 0, to: 1 });
  });

  it('gives shares that leave the range where the value does', () => {
    expect(shareOf({ from: 0, to: 0.5 }, 0.25)).toBe(0.5);
    expect(shareOf({ from: 0, to: 0.5 }, 1)).toBe(2);
  });
});

/**
 * Dichromat simulation at full severity, matrices of Machado, Oliveira and Fernandes 2009 ("A Physiologically-based Model for
 * Simulation of Color Vision Deficiency"), applied to linear light; the numbers are from memory.
 */
const DICHROMATS = {
  protan: [0.152286, 1.052583, -0.204868, 0.114503, 0.786281, 0.099216, -0.003882, -0.048116, 1.051998],
  deutan: [0.367322, 0.860646, -0.227968, 0.280085, 0.672501, 0.047413, -0.01182, 0.04294, 0.968881],
  tritan: [1.255528, -0.076749, -0.178779, -0.078411, 0.930809, 0.147602, 0.004733, 0.691367, 0.3039],
} as const;

function seenBy(kind: keyof typeof DICHROMATS, colour: string): string {
  const { r, g, b } = rgb(colour);
  const linear = [r, g, b].map((channel) => {
    const share = channel / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  const m = DICHROMATS[kind];
  const seen = [0, 3, 6].map((row) => {
    const light = Math.min(1, Math.max(0, m[row] * linear[0] + m[row + 1] * linear[1] + m[row + 2] * linear[2]));
    return 255 * (light <= 0.0031308 ? 12.92 * light : 1.055 * light ** (1 / 2.4) - 0.055);
  });
  return rgb(seen[0], seen[1], seen[2]).formatHex();
}
