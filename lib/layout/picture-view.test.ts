import { describe, expect, it } from 'vitest';
import { centrePicture, fitPicture, pictureToScreen, pictureZoom, screenToPicture } from './picture-view';
import { MAX_SCALE, panBy, zoomAt } from './viewport';

const PICTURE = { widthPx: 2560, heightPx: 1880 };
const SIZE = { width: 800, height: 600 };

describe('the view of a picture', () => {
  const fitted = fitPicture(PICTURE, SIZE, 24);

  it('fits the whole picture with its margin, upright', () => {
    const zoom = pictureZoom(fitted);
    expect(zoom).toBeCloseTo(Math.min((800 - 48) / 2560, (600 - 48) / 1880), 10);
    const corner = pictureToScreen(fitted, [0, 0]);
    const opposite = pictureToScreen(fitted, [2560, 1880]);
    expect(corner.x).toBeLessThan(opposite.x);
    expect(corner.y).toBeLessThan(opposite.y);
    expect(corner.x + opposite.x).toBeCloseTo(800, 6);
    expect(corner.y + opposite.y).toBeCloseTo(600, 6);
  });

  it('goes to the screen and back without loss, zoomed and panned', () => {
    const viewport = panBy(zoomAt(fitted, { x: 120, y: 480 }, 7.3), -33, 51);
    const at = pictureToScreen(viewport, [1028.25, 1264.5]);
    const [x, y] = screenToPicture(viewport, at);
    expect(x).toBeCloseTo(1028.25, 8);
    expect(y).toBeCloseTo(1264.5, 8);
  });

  it('keeps the point under the pointer while it zooms, up to sixteen times', () => {
    const pointer = { x: 611, y: 97 };
    const before = screenToPicture(fitted, pointer);
    const close = zoomAt(fitted, pointer, 1e6);
    expect(close.scale).toBe(MAX_SCALE);
    expect(pictureZoom(close)).toBe(16);
    expect(screenToPicture(close, pointer)[0]).toBeCloseTo(before[0], 8);
  });

  it('brings a point to the middle', () => {
    expect(pictureToScreen(centrePicture(fitted, [100, 200], SIZE), [100, 200])).toEqual({ x: 400, y: 300 });
  });
});
