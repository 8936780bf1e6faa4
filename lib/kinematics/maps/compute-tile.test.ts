import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '../library';
import { readSpot } from '../spot';
import { DEGREE } from '../testing/chains';
import { WORKLOAD_ARM } from '../testing/grid-workload';
import { REASONS, type Arm, type MapRequest, type Vec3 } from '../types';
import { computeMapTile, makeMapComputer } from './compute-tile';

const medium = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!.arm;
const scara = BUILT_IN_ARMS.find(({ slug }) => slug === 'scara-5kg')!.arm;
const offset: Arm = { ...medium, tool: { xyz: [0.15, 0.02, 0.1], rpy: [0.1, 0.2, 0] } };

const asked = (over: Partial<MapRequest> = {}): MapRequest => ({
  grid: { origin: [-1.6, -1.6], step: 0.2, columns: 17, rows: 17 },
  toolHeight: 0.3,
  direction: { kind: 'down' },
  roll: 0,
  wrist: 'held',
  branch: 'best',
  ...over,
});

function directionAt({ direction }: MapRequest, x: number, y: number): Vec3 {
  if (direction.kind === 'down') return [0, 0, -1];
  if (direction.kind === 'vector') return direction.vector;
  const radius = Math.hypot(x, y);
  const level = Math.cos(direction.tilt);
  return [(level * x) / radius, (level * y) / radius, Math.sin(direction.tilt)];
}

describe('a map', () => {
  it.each([
    ['six-axis, held', medium, asked()],
    ['six-axis, free', medium, asked({ wrist: 'free' })],
    ['six-axis, outward and up', medium, asked({ direction: { kind: 'outward', tilt: 20 * DEGREE }, roll: 0.4 })],
    ['six-axis, slanted', medium, asked({ direction: { kind: 'vector', vector: [0.3, -0.2, -1] }, roll: 1 })],
    ['six-axis, free roll', medium, asked({ roll: 'free' })],
    ['six-axis, crooked tool', offset, asked()],
    ['SCARA', scara, asked({ grid: { origin: [-0.7, -0.7], step: 0.0973, columns: 15, rows: 15 } })],
    ['limits of every kind', WORKLOAD_ARM, asked({ wrist: 'free' })],
  ] as const)('says at each cell what the plumb says there: %s', (_, arm, request) => {
    const { grid } = request;
    const tile = computeMapTile(arm, request, 0, grid.rows);
    let reached = 0;
    for (let cell = 0; cell < grid.columns * grid.rows; cell++) {
      const x = grid.origin[0] + (cell % grid.columns) * grid.step;
      const y = grid.origin[1] + Math.floor(cell / grid.columns) * grid.step;
      if (Math.hypot(x, y) < 1e-9 && request.direction.kind === 'outward') continue;
      const target = {
        position: [x, y, request.toolHeight] as const,
        direction: directionAt(request, x, y),
        roll: request.roll,
      };
      const spot = readSpot(arm, target, request.wrist);
      expect(REASONS[tile.reason[cell]], `${x} ${y}`).toBe(spot.reason);
      if (!spot.reached) {
        expect(tile.bindingJoint[cell]).toBe(spot.joint + 1);
        continue;
      }
      reached++;
      const best = request.wrist === 'held' ? spot.postures[0].wristHeld : spot.postures[0].wristFree;
      expect(tile.inverseConditionNumber[cell]).toBeCloseTo(best.inverseConditionNumber!, 6);
      // Twins of one value may differ in their speeds, so these are checked where the best stands alone.
      const scores = spot.postures.map(({ wristHeld, wristFree }) =>
        request.wrist === 'held' ? wristHeld : wristFree,
      );
      if (scores.length > 1 && scores[0].inverseConditionNumber! - scores[1].inverseConditionNumber! < 1e-6) continue;
      expect(tile.maximumToolSpeed[cell] / best.maximumToolSpeed!).toBeCloseTo(1, 5);
      expect(tile.sureSpeed[cell] / best.sureSpeed!).toBeCloseTo(1, 5);
      expect(tile.limitShare[cell]).toBeGreaterThanOrEqual(0);
      expect(tile.limitShare[cell]).toBeLessThanOrEqual(0.5);
    }
    expect(reached).toBeGreaterThan(40);
  });

  it('is the same in one piece and in tiles', () => {
    const request = asked({ roll: 'free' });
    const whole = computeMapTile(offset, request, 0, 6);
    const parts = [computeMapTile(offset, request, 0, 1), computeMapTile(offset, request, 1, 6)];
    for (const plane of ['reason', 'bindingJoint', 'branch', 'inverseConditionNumber', 'sureSpeed'] as const)
      expect([...whole[plane]]).toEqual(parts.flatMap((part) => [...part[plane]]));
  });

  it('with a searched roll is nowhere worse than with any fixed one', () => {
    const grid = { origin: [0.3, -0.9] as const, step: 0.3, columns: 5, rows: 7 };
    const searched = computeMapTile(offset, asked({ grid, roll: 'free' }), 0, 7);
    for (const roll of [0, 1.1, -2.3]) {
      const fixed = computeMapTile(offset, asked({ grid, roll }), 0, 7);
      fixed.reason.forEach((reason, cell) => {
        if (reason !== 0) return;
        expect(searched.reason[cell]).toBe(0);
        expect(searched.inverseConditionNumber[cell]).toBeGreaterThan(fixed.inverseConditionNumber[cell] - 0.01);
      });
    }
  });

  it('turns with the base and depends on radius alone for a tool on the last axis with a free roll', () => {
    const ring = (angle: number) => {
      const at = [0.9 * Math.cos(angle), 0.9 * Math.sin(angle)] as const;
      const grid = { origin: at, step: 1, columns: 1, rows: 1 };
      return computeMapTile(medium, asked({ grid, roll: 'free' }), 0, 1);
    };
    for (let angle = -2.5; angle < 2.6; angle += 0.5) {
      expect(ring(angle).inverseConditionNumber[0]).toBeCloseTo(ring(0).inverseConditionNumber[0], 6);
      expect(ring(angle).sureSpeed[0]).toBeCloseTo(ring(0).sureSpeed[0], 6);
    }
  });

  it('keeps to a named branch, and refuses one that the arm does not have', () => {
    const { classes } = makeMapComputer(medium, asked());
    expect(classes).toHaveLength(8);
    const best = computeMapTile(medium, asked(), 0, 17);
    let union = 0;
    const named = classes.map((branch) => computeMapTile(medium, asked({ branch }), 0, 17));
    best.reason.forEach((reason, cell) => {
      const values = named.flatMap((tile) => (tile.reason[cell] === 0 ? [tile.inverseConditionNumber[cell]] : []));
      expect(values.length > 0).toBe(reason === 0);
      if (reason === 0) expect(Math.max(...values)).toBeCloseTo(best.inverseConditionNumber[cell], 6);
      union += values.length;
    });
    expect(union).toBeGreaterThan(best.reason.filter((reason) => reason === 0).length);
    expect(() => makeMapComputer(medium, asked({ branch: 'sideways' }))).toThrow(RangeError);
  });
});
