import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  drawingRatio,
  fitBounds,
  floorToScreen,
  MAX_SCALE,
  MIN_SCALE,
  panBy,
  screenToFloor,
  unionBounds,
  visibleBounds,
  zoomAt,
} from './viewport';

const millimetre = fc.double({ min: -50_000, max: 50_000, noNaN: true });
const viewport = fc.record({
  scale: fc.double({ min: 0.005, max: 2, noNaN: true }),
  xMm: millimetre,
  yMm: millimetre,
});
const spot = fc.record({
  x: fc.double({ min: 0, max: 2000, noNaN: true }),
  y: fc.double({ min: 0, max: 1200, noNaN: true }),
});

describe('viewport', () => {
  it('puts its own point at the upper left corner, and y away is up', () => {
    const view = { scale: 0.1, xMm: 1000, yMm: 5000 };
    expect(floorToScreen(view, { xMm: 1000, yMm: 5000 })).toEqual({ x: 0, y: 0 });
    expect(floorToScreen(view, { xMm: 2000, yMm: 4000 })).toEqual({ x: 100, y: 100 });
  });

  it('leads from the screen to the floor and back', () => {
    fc.assert(
      fc.property(viewport, spot, (view, at) => {
        const back = floorToScreen(view, screenToFloor(view, at));
        expect(back.x).toBeCloseTo(at.x, 6);
        expect(back.y).toBeCloseTo(at.y, 6);
      }),
    );
  });

  it('keeps the floor under the pointer while zooming, at the ends of the scale too', () => {
    fc.assert(
      fc.property(viewport, spot, fc.double({ min: 1e-4, max: 1e4, noNaN: true }), (view, at, factor) => {
        const before = screenToFloor(view, at);
        const zoomed = zoomAt(view, at, factor);
        const after = screenToFloor(zoomed, at);
        expect(after.xMm).toBeCloseTo(before.xMm, 5);
        expect(after.yMm).toBeCloseTo(before.yMm, 5);
        expect(zoomed.scale).toBeGreaterThanOrEqual(MIN_SCALE);
        expect(zoomed.scale).toBeLessThanOrEqual(MAX_SCALE);
      }),
    );
  });

  it('moves the drawing with the pointer', () => {
    fc.assert(
      fc.property(viewport, spot, (view, at) => {
        const held = screenToFloor(view, at);
        const moved = floorToScreen(panBy(view, 30, -12), held);
        expect(moved.x).toBeCloseTo(at.x + 30, 5);
        expect(moved.y).toBeCloseTo(at.y - 12, 5);
      }),
    );
  });

  it('fits bounds into the middle with at least the margin on every side', () => {
    const bounds = { minXMm: -2000, minYMm: 1000, maxXMm: 8000, maxYMm: 4000 };
    const size = { width: 800, height: 600 };
    const view = fitBounds(bounds, size, 40);
    const lowerLeft = floorToScreen(view, { xMm: bounds.minXMm, yMm: bounds.minYMm });
    const upperRight = floorToScreen(view, { xMm: bounds.maxXMm, yMm: bounds.maxYMm });
    // 10 m fill the 720 px between the margins: 0.072 px/mm; 3 m are then 216 px, so 192 px stay above and below.
    expect(view.scale).toBeCloseTo(0.072, 12);
    expect([lowerLeft.x, 800 - upperRight.x]).toEqual([expect.closeTo(40, 6), expect.closeTo(40, 6)]);
    expect([upperRight.y, 600 - lowerLeft.y]).toEqual([expect.closeTo(192, 6), expect.closeTo(192, 6)]);
    expect(visibleBounds(view, size).minXMm).toBeCloseTo(-2000 - 40 / 0.072, 6);
  });

  it('survives a single point', () => {
    const view = fitBounds({ minXMm: 5, minYMm: 5, maxXMm: 5, maxYMm: 5 }, { width: 400, height: 300 });
    expect(view.scale).toBe(MAX_SCALE);
    expect(floorToScreen(view, { xMm: 5, yMm: 5 })).toEqual({ x: 200, y: 150 });
  });

  it('states the drawing scale by the CSS pixel', () => {
    // A CSS pixel is 1/96 inch (CSS Values and Units 4, absolute lengths), so 96 px a metre are 25.4 mm a metre: 1 : 39.37.
    expect(drawingRatio({ scale: 0.096, xMm: 0, yMm: 0 })).toBe(39);
  });

  it('unites bounds with nothing as themselves', () => {
    const bounds = { minXMm: 0, minYMm: 0, maxXMm: 1, maxYMm: 1 };
    expect(unionBounds(null, bounds)).toBe(bounds);
    expect(unionBounds(bounds, null)).toBe(bounds);
    expect(unionBounds(null, null)).toBeNull();
  });
});
