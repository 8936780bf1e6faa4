import { describe, expect, it } from 'vitest';
import { calibrate, pictureToFloor } from './calibrate';
import { carriedCalibration } from './carry-calibration';

const calibrated = calibrate({
  scale: { fromPx: [100, 100], toPx: [900, 140], distanceMm: 8000 },
  check: { fromPx: [200, 200], toPx: [200, 600], distanceMm: 4000 },
  level: { fromPx: [100, 100], toPx: [900, 110] },
  originPx: [50, 950],
});

describe('a newer picture of the same floor plan', () => {
  it('puts the same spot of the paper on the same spot of the floor, at twice the pixels', () => {
    const request = carriedCalibration(
      calibrated,
      { widthPx: 1000, heightPx: 1000 },
      { widthPx: 2000, heightPx: 2000 },
    );
    const carried = calibrate(request!);
    for (const spot of [
      [0, 0],
      [437, 812],
    ] as const) {
      const before = pictureToFloor(calibrated, spot);
      const after = pictureToFloor(carried, [spot[0] * 2, spot[1] * 2]);
      expect(after[0]).toBeCloseTo(before[0], 6);
      expect(after[1]).toBeCloseTo(before[1], 6);
    }
  });

  it('is refused where the picture has another shape', () => {
    expect(carriedCalibration(calibrated, { widthPx: 1000, heightPx: 1000 }, { widthPx: 2000, heightPx: 1500 })).toBe(
      null,
    );
  });
});
