import { describe, expect, it } from 'vitest';
import type { MapTile } from '@/lib/kinematics/types';
import {
  areaAtOrAboveM2,
  extremeSpots,
  floorDifference,
  floorHistogramM2,
  floorSpotAt,
  reachedAreaM2,
  sharedAreaM2,
} from './floor-figures';
import { composeFloorMap, floorGridOf, NO_ROBOT, type FloorGrid, type PlacedMap } from './floor-map';
import { itemToFloor } from './geometry';

/** A square map about the base; `valueAt` (base frame, mm) gives NaN where the robot does not reach. */
function mapOf(
  robotId: string,
  placement: PlacedMap['placement'],
  half: number,
  stepMm: number,
  valueAt: (xMm: number, yMm: number) => number,
): PlacedMap {
  const side = 2 * half + 1;
  const grid: FloorGrid = { originMm: [-half * stepMm, -half * stepMm], stepMm, columns: side, rows: side };
  const value = new Float32Array(side * side);
  const reason = new Uint8Array(side * side);
  for (let row = 0; row < side; row += 1) {
    for (let column = 0; column < side; column += 1) {
      const here = valueAt((column - half) * stepMm, (row - half) * stepMm);
      value[row * side + column] = here;
      reason[row * side + column] = Number.isNaN(here) ? 1 : 0;
    }
  }
  const tile: MapTile = {
    rowFrom: 0,
    rowTo: side,
    columns: side,
    reason,
    bindingJoint: new Uint8Array(side * side),
    branch: new Uint8Array(side * side),
    inverseConditionNumber: value,
    maximumToolSpeed: value,
    sureSpeed: value,
    limitShare: value,
    wristCoverage: Float32Array.from(reason, (code) => (code === 0 ? 1 : 0)),
  };
  return { robotId, placement, grid, tile };
}

const disc = (radiusMm: number, value: number) => (xMm: number, yMm: number) =>
  Math.hypot(xMm, yMm) <= radiusMm ? value : NaN;
const measure = 'inverseConditionNumber';

describe('one map on the floor', () => {
  it('is what it was in the base frame where the base is not turned', () => {
    const map = mapOf('a', { xMm: 1000, yMm: 2000, angleDeg: 0 }, 10, 50, (x, y) => x + 10 * y);
    const grid = floorGridOf([map], 50)!;
    const floor = composeFloorMap(grid, [map], measure);
    expect(floorSpotAt(floor, 1150, 1900)).toEqual({ xMm: 1150, yMm: 1900, value: 150 - 1000, robot: 0 });
    expect(floorSpotAt(floor, 1500, 2500)?.value).toBe(500 + 5000);
    expect(floorSpotAt(floor, 1600, 2500)).toBeNull();
    expect(reachedAreaM2(floor)).toBeCloseTo(21 * 21 * 0.0025, 12);
  });

  it('turns with the base: every floor cell carries the nearest cell of the map', () => {
    const placement = { xMm: 37, yMm: -81, angleDeg: 211.5 };
    // The value is the map cell's own x, so a floor cell tells where it came from.
    for (const axis of [0, 1]) {
      const map = mapOf('a', placement, 40, 25, (x, y) => (axis === 0 ? x : y));
      const floor = composeFloorMap(floorGridOf([map], 20)!, [map], measure);
      for (let index = 0; index < 400; index += 1) {
        const point = [((index * 7919) % 1900) - 950, ((index * 104729) % 1900) - 950] as const;
        const spot = floorSpotAt(floor, ...itemToFloor(placement, point))!;
        // Half a floor cell's and half a map cell's diagonal at most.
        expect(Math.abs(spot.value - point[axis])).toBeLessThanOrEqual((10 + 12.5) * Math.SQRT2);
      }
    }
  });

  it('keeps the area of a disc whatever the turn', () => {
    for (const angleDeg of [0, 17, 45, 90, 133.3]) {
      const map = mapOf('a', { xMm: 12.3, yMm: -45.6, angleDeg }, 60, 20, disc(1000, 1));
      const floor = composeFloorMap(floorGridOf([map], 20)!, [map], measure);
      expect(reachedAreaM2(floor)).toBeGreaterThan(Math.PI * 0.995);
      expect(reachedAreaM2(floor)).toBeLessThan(Math.PI * 1.005);
    }
  });
});

describe('several robots', () => {
  const left = mapOf('a', { xMm: 0, yMm: 0, angleDeg: 0 }, 22, 50, disc(1000, 0.3));
  const right = mapOf('b', { xMm: 1000, yMm: 0, angleDeg: 90 }, 22, 50, disc(1000, 0.6));
  const grid = floorGridOf([left, right], 50)!;

  it('show the best value and whose it is', () => {
    const floor = composeFloorMap(grid, [left, right], measure);
    expect(floorSpotAt(floor, -500, 0)).toMatchObject({ value: Math.fround(0.3), robot: 0 });
    expect(floorSpotAt(floor, 500, 0)).toMatchObject({ value: Math.fround(0.6), robot: 1 });
    expect(floorSpotAt(floor, 500, 950)).toBeNull();
    expect(floor.robot.filter((robot) => robot === NO_ROBOT)).toHaveLength(
      floor.value.filter((value) => Number.isNaN(value)).length,
    );
  });

  it('share the lens in which two discs overlap', () => {
    const floor = composeFloorMap(grid, [left, right], 'reach');
    // Two unit discs at distance 1 share 2π/3 − √3/2 (elementary geometry).
    expect(sharedAreaM2(floor)).toBeCloseTo((2 * Math.PI) / 3 - Math.sqrt(3) / 2, 1);
    expect(extremeSpots(floor)).toMatchObject({ worst: { value: 1 }, best: { value: 1 } });
  });

  it('do not depend on what the arrays held before', () => {
    const fresh = composeFloorMap(grid, [left], measure);
    const used = composeFloorMap(grid, [left], measure, composeFloorMap(grid, [right, left], 'reach'));
    expect(used.value).toEqual(fresh.value);
    expect(used.robot).toEqual(fresh.robot);
    expect(used.reachedBy).toEqual(fresh.reachedBy);
  });
});

describe('numbers of a floor', () => {
  const map = mapOf('a', { xMm: 0, yMm: 0, angleDeg: 0 }, 2, 100, (x) => 0.1 * (2 + x / 100));
  const floor = composeFloorMap(floorGridOf([map], 100)!, [map], measure);

  it('count a value equal to the threshold', () => {
    // Columns carry 0, 0.1, 0.2, 0.3, 0.4 over five rows of 0.01 m² each.
    expect(areaAtOrAboveM2(floor, 0.3)).toBeCloseTo(0.1, 12);
    expect(areaAtOrAboveM2(floor, 0.31)).toBeCloseTo(0.05, 12);
  });

  it('put every reached cell into one bar', () => {
    const bars = floorHistogramM2(floor, [0.1, 0.2, 0.3]);
    [0.1, 0.15].forEach((area, bar) => expect(bars[bar]).toBeCloseTo(area, 12));
    expect(bars.reduce((sum, area) => sum + area)).toBeCloseTo(reachedAreaM2(floor), 12);
  });

  it('find the worst and the best spot', () => {
    expect(extremeSpots(floor)).toMatchObject({ worst: { xMm: -200, value: 0 }, best: { xMm: 200 } });
  });
});

describe('two arrangements', () => {
  it('tell what the floor gains and loses', () => {
    const before = mapOf('a', { xMm: 0, yMm: 0, angleDeg: 0 }, 5, 100, () => 0.2);
    const after = mapOf('a', { xMm: 200, yMm: 0, angleDeg: 0 }, 5, 100, () => 0.5);
    const grid = floorGridOf([before, after], 100)!;
    const difference = floorDifference(
      composeFloorMap(grid, [before], measure),
      composeFloorMap(grid, [after], measure),
    );
    // A square 11 cells wide, shifted by two cells: two columns of eleven change hands.
    expect(difference.gainedM2).toBeCloseTo(0.22, 12);
    expect(difference.lostM2).toBeCloseTo(0.22, 12);
    expect(difference.betterM2).toBeCloseTo(9 * 11 * 0.01, 12);
    expect(difference.worseM2).toBe(0);
    const both = difference.value.filter((value) => !Number.isNaN(value));
    expect(both.every((value) => Math.abs(value - 0.3) < 1e-6)).toBe(true);
  });

  it('are only compared on one grid', () => {
    const map = mapOf('a', { xMm: 0, yMm: 0, angleDeg: 0 }, 5, 100, () => 0.2);
    const coarse = composeFloorMap(floorGridOf([map], 100)!, [map], measure);
    const fine = composeFloorMap(floorGridOf([map], 50)!, [map], measure);
    expect(() => floorDifference(coarse, fine)).toThrow(RangeError);
  });
});
