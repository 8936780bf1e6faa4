import type { Palette } from '@/lib/layout/palette';

/** The picture as the board needs it: as it is by day, light lines on dark ground by night. Hues stay what they were. */
export function pictureForBoard(
  picture: HTMLImageElement,
  board: Palette['board'],
): HTMLImageElement | HTMLCanvasElement {
  if (board === 'day') return picture;
  const canvas = document.createElement('canvas');
  canvas.width = picture.naturalWidth;
  canvas.height = picture.naturalHeight;
  const ink = canvas.getContext('2d');
  if (!ink) return picture;
  ink.filter = 'invert(1) hue-rotate(180deg)';
  ink.drawImage(picture, 0, 0);
  return canvas;
}
