import type { FloorPlan } from '@/models';

/** Where a rendition lies in the object store. */
export const pictureKey = (objectPrefix: string, widthPx: number): string => `${objectPrefix}/${widthPx}`;

export const pictureKeysOf = ({ objectPrefix, pictureWidths }: FloorPlan): string[] =>
  pictureWidths.map((widthPx) => pictureKey(objectPrefix, widthPx));

/** The smallest stored width that is at least as wide as asked, else the widest. */
export function widthAtHand(pictureWidths: readonly number[], askedPx: number): number {
  const ascending = [...pictureWidths].sort((a, b) => a - b);
  return ascending.find((widthPx) => widthPx >= askedPx) ?? ascending[ascending.length - 1];
}
