import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { calibrate, floorToPicture, pictureToFloor } from './calibrate';
import type { CalibrationRequest } from './calibration';

/** Source: tests/fixtures/floor-plans/truth.json, pixels of the bay's corners and its true size of 9000 × 5700 mm. */
type Corner = [number, number];
interface Truth {
  mmPerPx: number;
  bay_left_bottom: Corner;
  bay_right_bottom: Corner;
  bay_right_top: Corner;
}
const truth = JSON.parse(
  readFileSync(fileURLToPath(new URL('../../tests/fixtures/floor-plans/truth.json', import.meta.url)), 'utf8'),
) as Record<string, Truth>;

function bayRequest(plan: Truth): CalibrationRequest {
  return {
    scale: { fromPx: plan.bay_left_bottom, toPx: plan.bay_right_bottom, distanceMm: 9000 },
    check: { fromPx: plan.bay_right_bottom, toPx: plan.bay_right_top, distanceMm: 5700 },
    level: { fromPx: plan.bay_left_bottom, toPx: plan.bay_right_bottom },
    originPx: plan.bay_left_bottom,
  };
}

describe.each(['plan-clean.png', 'plan-negative.webp', 'plan-scan.jpg'])('%s', (file) => {
  const plan = truth[file];
  const calibration = calibrate(bayRequest(plan));

  it('gets its true scale and a check error within half a percent', () => {
    expect(Math.abs(calibration.mmPerPx / plan.mmPerPx - 1)).toBeLessThan(0.005);
    expect(Math.abs(calibration.checkError ?? 1)).toBeLessThan(0.005);
  });

  it('puts every corner of the bay within 15 mm of the truth', () => {
    const corners: [Corner, Corner][] = [
      [plan.bay_left_bottom, [0, 0]],
      [plan.bay_right_bottom, [9000, 0]],
      [plan.bay_right_top, [9000, 5700]],
    ];
    for (const [px, [xMm, yMm]] of corners) {
      const [x, y] = pictureToFloor(calibration, px);
      expect(Math.hypot(x - xMm, y - yMm)).toBeLessThan(15);
    }
  });
});

describe('a crooked scan', () => {
  it('is turned counter-clockwise by as much as it lies clockwise', () => {
    // Source: turnedDegClockwise of plan-scan.jpg in truth.json.
    expect(calibrate(bayRequest(truth['plan-scan.jpg'])).rotationDeg).toBeCloseTo(1.3, 1);
  });

  it('turned by a quarter comes upright', () => {
    const calibration = calibrate({
      scale: { fromPx: [0, 0], toPx: [0, 100], distanceMm: 1000 },
      check: null,
      level: { fromPx: [50, 0], toPx: [50, 80] },
      originPx: [0, 0],
    });
    expect(calibration.rotationDeg).toBe(90);
    const [x, y] = pictureToFloor(calibration, [0, 100]);
    expect(x).toBeCloseTo(1000, 9);
    expect(y).toBeCloseTo(0, 9);
  });
});

describe('the check distance', () => {
  const request = bayRequest(truth['plan-clean.png']);

  it('tells the error with its sign: measured less stated', () => {
    const check = { fromPx: [0, 0] as [number, number], toPx: [0, 101] as [number, number], distanceMm: 1000 };
    const scale = { fromPx: [0, 0] as [number, number], toPx: [100, 0] as [number, number], distanceMm: 1000 };
    expect(calibrate({ ...request, scale, check }).checkError).toBeCloseTo(0.01, 12);
  });

  it('may be left out, as may the level line', () => {
    const { checkError, rotationDeg } = calibrate({ ...request, check: null, level: null });
    expect(checkError).toBeNull();
    expect(rotationDeg).toBe(0);
  });
});

describe('points that coincide', () => {
  const request = bayRequest(truth['plan-clean.png']);
  const spot: [number, number] = [700, 700];

  it.each(['scale', 'check', 'level'] as const)('are refused for the %s', (path) => {
    const line = { fromPx: spot, toPx: spot, distanceMm: 900 };
    expect(() => calibrate({ ...request, [path]: line })).toThrow(
      expect.objectContaining({ path, message: expect.stringMatching(/lie on one spot\. Pick two points/) }),
    );
  });
});

describe('picture and floor', () => {
  const pixels = fc.double({ min: -20_000, max: 20_000, noNaN: true });

  it('map back and forth to the same point', () => {
    const frames = fc.record({
      mmPerPx: fc.double({ min: 0.1, max: 100, noNaN: true }),
      rotationDeg: fc.double({ min: -180, max: 180, noNaN: true }),
      originPx: fc.tuple(pixels, pixels),
    });
    fc.assert(
      fc.property(frames, pixels, pixels, (frame, xPx, yPx) => {
        const [backX, backY] = floorToPicture(frame, pictureToFloor(frame, [xPx, yPx]));
        expect(Math.hypot(backX - xPx, backY - yPx)).toBeLessThan(1e-6);
      }),
    );
  });
});
