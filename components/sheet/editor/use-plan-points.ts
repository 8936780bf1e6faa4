'use client';

import { useEffect } from 'react';
import type { FloorPlan } from '@/lib/contracts/floor-plans';
import { lumaOf, wallPoints } from '@/lib/editor/wall-points';
import { pictureToFloor } from '@/lib/layout/calibrate';
import { useBoard } from './board-context';

/** Wide enough to place a corner to a few millimetres of a bay, small enough to be read in a moment. */
const READ_WIDTH_PX = 1024;
const MOST_POINTS = 600;

/** Finds the wall corners on the floor plan under the sheet, once the page has nothing better to do, for the sheet to snap to. */
export function usePlanPoints(): void {
  const { sheet, floorPlan } = useBoard();
  useEffect(() => {
    sheet.setPlanPoints([]);
    if (!floorPlan?.calibration) return;
    let wanted = true;
    void readPicture(floorPlan).then((picture) => {
      if (picture && wanted) whenIdle(() => wanted && sheet.setPlanPoints(pointsOf(floorPlan, picture)));
    });
    return () => {
      wanted = false;
    };
  }, [sheet, floorPlan]);
}

async function readPicture(floorPlan: FloorPlan): Promise<HTMLImageElement | null> {
  const image = new Image();
  image.src = `/api/floor-plans/${encodeURIComponent(floorPlan.id)}/picture?width=${READ_WIDTH_PX}`;
  // A plan that cannot be loaded offers nothing to snap to; the layer that draws it says so.
  return image.decode().then(
    () => image,
    () => null,
  );
}

function pointsOf(floorPlan: FloorPlan, image: HTMLImageElement): [number, number][] {
  const { calibration } = floorPlan;
  const canvas = document.createElement('canvas');
  const scale = Math.min(1, READ_WIDTH_PX / image.naturalWidth);
  canvas.width = Math.round(image.naturalWidth * scale);
  canvas.height = Math.round(image.naturalHeight * scale);
  const ink = canvas.getContext('2d', { willReadFrequently: true });
  if (!calibration || !ink || canvas.width === 0) return [];
  ink.drawImage(image, 0, 0, canvas.width, canvas.height);
  const luma = lumaOf(ink.getImageData(0, 0, canvas.width, canvas.height).data, canvas.width, canvas.height);
  const toOriginal = floorPlan.widthPx / canvas.width;
  return wallPoints(luma, MOST_POINTS).map(({ x, y }) => pictureToFloor(calibration, [x * toOriginal, y * toOriginal]));
}

function whenIdle(action: () => void): void {
  if ('requestIdleCallback' in window) window.requestIdleCallback(action, { timeout: 4000 });
  else setTimeout(action, 300);
}
