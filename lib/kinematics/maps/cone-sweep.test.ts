import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '../library';
import { spreadDirections } from '../measures/wrist-coverage';
import { readSpot } from '../spot';
import { DEGREE } from '../testing/chains';
import type { Arm, MapRequest, Vec3 } from '../types';
import { branchNames, computeMapTile, makeMapComputer } from './compute-tile';
import { decodeMapTile, encodeMapTile } from './tile-codec';

const armOf = (slug: string) => BUILT_IN_ARMS.find((arm) => arm.slug === slug)!.arm;
const medium = armOf('six-axis-12kg');
const crooked: Arm = { ...medium, tool: { xyz: [0.1, 0.02, 0.1], rpy: [0.1, 0.2, 0] } };

const asked = (over: Partial<MapRequest> = {}): MapRequest => ({
  grid: { origin: [-1.5, -1.5], step: 0.3, columns: 11, rows: 11 },
  toolHeight: 0.3,
  direction: { kind: 'down' },
  roll: 'free',
  wrist: 'held',
  branch: 'best',
  cone: { halfAngle: 25 * DEGREE, samples: 6 },
  ...over,
});

describe('a map of a cone of directions', () => {
  // Each direction by itself through `reach`, which maps do not go through; directions of a cone about ±z need no turning.
  it.each([
    ['down, free roll', medium, asked(), -1],
    [
      'up, fixed roll',
      medium,
      asked({ direction: { kind: 'vector', vector: [0, 0, 1] }, roll: 0.3, toolHeight: 0.9 }),
      1,
    ],
    ['crooked tool, fixed roll', crooked, asked({ roll: 0.3, wrist: 'free' }), -1],
  ] as const)('has the share reached and the worst value: %s', (_, arm, request, up) => {
    const tile = computeMapTile(arm, request, 0, request.grid.rows);
    const cone = request.cone!;
    const raw = spreadDirections({ kind: 'cone', axis: [0, 0, 1], halfAngle: cone.halfAngle }, cone.samples);
    // The map's tool axes at roll 0 over an upright direction: x along x, y = z × x.
    const directions = raw.map(([x, y, z]): Vec3 => [
      Math.cos(request.roll === 'free' ? 0 : request.roll) * x -
        Math.sin(request.roll === 'free' ? 0 : request.roll) * y,
      up *
        (Math.sin(request.roll === 'free' ? 0 : request.roll) * x +
          Math.cos(request.roll === 'free' ? 0 : request.roll) * y),
      up * z,
    ]);
    const shares = new Set<number>();
    for (let cell = 0; cell < tile.reason.length; cell++) {
      const x = request.grid.origin[0] + (cell % 11) * request.grid.step;
      const y = request.grid.origin[1] + Math.floor(cell / 11) * request.grid.step;
      const spots = directions.map((direction) =>
        readSpot(arm, { position: [x, y, request.toolHeight], direction, roll: request.roll }, request.wrist),
      );
      const share = spots.filter(({ reached }) => reached).length / spots.length;
      shares.add(share);
      expect(tile.wristCoverage[cell], `${x} ${y}`).toBeCloseTo(share, 6);
      expect(tile.reason[cell] === 0).toBe(share === 1);
      if (share < 1) {
        expect(tile.inverseConditionNumber[cell]).toBeNaN();
        continue;
      }
      const best = spots.map(({ postures: [{ wristHeld, wristFree }] }) =>
        request.wrist === 'held' ? wristHeld.inverseConditionNumber! : wristFree.inverseConditionNumber!,
      );
      expect(tile.inverseConditionNumber[cell]).toBeCloseTo(Math.min(...best), 6);
    }
    expect(shares.has(0) && shares.has(1) && shares.size > 2).toBe(true);
  });

  it('loses ground as it opens, and comes to the single direction as it closes', () => {
    const shut = computeMapTile(medium, asked({ cone: undefined }), 0, 11);
    const tiles = [1e-9, 10 * DEGREE, 85 * DEGREE].map((halfAngle) =>
      computeMapTile(medium, asked({ cone: { halfAngle, samples: 12 } }), 0, 11),
    );
    const reached = tiles.map(({ reason }) => reason.filter((code) => code === 0).length);
    expect(Array.from(tiles[0].reason)).toEqual(Array.from(shut.reason));
    expect(reached[0]).toBeGreaterThanOrEqual(reached[1]);
    expect(reached[1]).toBeGreaterThan(reached[2]);
    tiles[0].inverseConditionNumber.forEach((value, i) => {
      if (shut.reason[i] === 0) expect(value).toBeCloseTo(shut.inverseConditionNumber[i], 6);
    });
  });

  it('agrees on the quick path and the reference', () => {
    const request = asked({
      direction: { kind: 'outward', tilt: -0.5 },
      grid: { origin: [-1.45, -1.4], step: 0.13, columns: 23, rows: 23 },
    });
    const quick = makeMapComputer(medium, request).tile(0, 23);
    const reference = makeMapComputer(medium, request, 'reference').tile(0, 23);
    expect(Array.from(quick.wristCoverage)).toEqual(Array.from(reference.wristCoverage));
    quick.inverseConditionNumber.forEach((value, i) => {
      if (quick.reason[i] === 0) expect(value).toBeCloseTo(reference.inverseConditionNumber[i], 6);
    });
  });

  it('keeps its coverage in the stored form, and refuses a cone that is none', () => {
    const tile = computeMapTile(medium, asked(), 0, 11);
    expect(Array.from(decodeMapTile(encodeMapTile(tile)).wristCoverage)).toEqual(Array.from(tile.wristCoverage));
    expect(() => computeMapTile(medium, asked({ cone: { halfAngle: 0, samples: 6 } }), 0, 1)).toThrow(RangeError);
    expect(() => computeMapTile(medium, asked({ cone: { halfAngle: 4, samples: 6 } }), 0, 1)).toThrow(RangeError);
  });
});

describe('a map of one branch', () => {
  it('has every class of the arm within the best of all', () => {
    const best = computeMapTile(medium, asked({ cone: undefined }), 0, 11);
    const covered = new Uint8Array(121);
    for (const branch of branchNames(medium)) {
      const tile = computeMapTile(medium, asked({ cone: undefined, branch }), 0, 11);
      tile.reason.forEach((code, i) => {
        if (code !== 0) return;
        covered[i] = 1;
        expect(tile.inverseConditionNumber[i]).toBeLessThanOrEqual(best.inverseConditionNumber[i] + 1e-6);
      });
    }
    expect(Array.from(covered)).toEqual(Array.from(best.reason, (code) => (code === 0 ? 1 : 0)));
  });
});
