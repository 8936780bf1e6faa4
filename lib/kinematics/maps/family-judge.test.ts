import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '../library';
import { makeSpotReader } from '../spot';
import type { Arm, MapRequest } from '../types';
import { makeMapComputer } from './compute-tile';

const builtIn = (slug: string): Arm => BUILT_IN_ARMS.find((entry) => entry.slug === slug)!.arm;
const SIZE = 16;

function requestOver(spanM: number, toolHeight: number, rest: Partial<MapRequest> = {}): MapRequest {
  const step = spanM / (SIZE - 1);
  return {
    grid: { origin: [-spanM / 2, -spanM / 2], step, columns: SIZE, rows: SIZE },
    toolHeight,
    direction: { kind: 'down' },
    roll: 'free',
    wrist: 'held',
    branch: 'best',
    ...rest,
  };
}

describe.each([
  ['seven axes', builtIn('seven-axis-9kg'), 1.9, 0.3],
  ['six axes on a track', builtIn('track-six-axis-30kg'), 7, 0.5],
])('the map of %s', (_, arm, span, height) => {
  const request = requestOver(span, height);
  const tile = makeMapComputer(arm, request).tile(0, SIZE);
  const { origin, step } = request.grid;

  it('reaches what the plumb reaches, and is worth as much or more there', () => {
    const read = makeSpotReader(arm, 'held');
    let reached = 0;
    for (let cell = 0; cell < SIZE * SIZE; cell++) {
      const position = [origin[0] + step * (cell % SIZE), origin[1] + step * Math.floor(cell / SIZE), height] as const;
      const spot = read({ position, direction: [0, 0, -1], roll: 'free' });
      expect(tile.reason[cell] === 0, `${position}`).toBe(spot.reached);
      if (!spot.reached) continue;
      reached++;
      const best = spot.postures[0].wristHeld.inverseConditionNumber!;
      // Each refines from its own best sample; a hundredth of the scale is far less than a band of the key.
      expect(Math.abs(tile.inverseConditionNumber[cell] - best)).toBeLessThan(0.01);
    }
    expect(reached).toBeGreaterThan(40);
    expect(reached).toBeLessThan(SIZE * SIZE);
  });

  it('is its own mirror image, as the arm is', () => {
    for (let row = 0; row < SIZE; row++)
      for (let column = 0; column < SIZE; column++) {
        const cell = row * SIZE + column;
        const mirrored = (SIZE - 1 - row) * SIZE + column;
        expect(tile.reason[cell] === 0).toBe(tile.reason[mirrored] === 0);
        if (tile.reason[cell] !== 0) continue;
        expect(tile.inverseConditionNumber[cell]).toBeCloseTo(tile.inverseConditionNumber[mirrored], 2);
        expect(tile.sureSpeed[cell]).toBeGreaterThan(0);
        expect(tile.limitShare[cell]).toBeGreaterThanOrEqual(0);
      }
  });

  it('takes one named branch, and no other', () => {
    const all = makeMapComputer(arm, request);
    const [name] = all.classes;
    const one = makeMapComputer(arm, { ...request, branch: name }).tile(0, SIZE);
    for (let cell = 0; cell < SIZE * SIZE; cell++) {
      if (one.reason[cell] !== 0) continue;
      expect(one.branch[cell]).toBe(0);
      expect(tile.reason[cell]).toBe(0);
    }
  });
});

it('the map of a palletiser names the joint that stands in the way, and needs no level tool but down', () => {
  const arm = builtIn('palletiser-130kg');
  const tile = makeMapComputer(arm, requestOver(6.4, 0.4)).tile(0, SIZE);
  const joints = new Set(Array.from(tile.bindingJoint).filter((joint, cell) => tile.reason[cell] === 3));
  expect([...joints].every((joint) => joint >= 1 && joint <= 4)).toBe(true);
  expect(joints.size).toBeGreaterThan(0);
  const level = makeMapComputer(arm, requestOver(6.4, 0.4, { direction: { kind: 'outward', tilt: 0 }, roll: 0 }));
  expect(new Set(level.tile(0, SIZE).reason)).toEqual(new Set([4]));
});
