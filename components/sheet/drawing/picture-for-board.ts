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
  ink.fillStyle = '#ffffff';
  ink.fillRect(0, 0, canvas.width, canvas.height);
  // White less the picture is its negative; canvas filters would say the same, but not every browser has them.
  ink.globalCompositeOperation = 'difference';
  ink.drawImage(picture, 0, 0);
  ink.globalCompositeOperation = 'hue';
  ink.drawImage(picture, 0, 0);
  return canvas;
}
