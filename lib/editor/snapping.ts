/** What the pointer snaps to. Holding the suspend key lets it go anywhere. */
export interface Snapping {
  /** Distance between the lines that places snap to, mm; null: no snapping to the grid. */
  readonly gridMm: number | null;
  /** Turns snap to multiples of this, degrees; null: any angle. */
  readonly angleDeg: number | null;
}

export const DEFAULT_SNAPPING: Snapping = { gridMm: 50, angleDeg: 5 };

/** No place or turn on a sheet is finer than this: a hundredth of a millimetre, a hundredth of a degree. */
const FINEST = 100;

/** Rounds away the tail of digits that a pointer leaves, so that lists and the server hold plain numbers. */
export const tidy = (value: number): number => Math.round(value * FINEST) / FINEST + 0;

const toStep = (value: number, step: number): number => tidy(Math.round(value / step) * step);

/** A spot of the floor on the nearest crossing of the grid; `suspended` keeps it where the pointer is. */
export function snapSpot(
  spot: { readonly xMm: number; readonly yMm: number },
  { gridMm }: Snapping,
  suspended: boolean,
): { xMm: number; yMm: number } {
  if (suspended || !gridMm) return { xMm: tidy(spot.xMm), yMm: tidy(spot.yMm) };
  return { xMm: toStep(spot.xMm, gridMm), yMm: toStep(spot.yMm, gridMm) };
}

export function snapAngle(degrees: number, { angleDeg }: Snapping, suspended: boolean): number {
  const wanted = suspended || !angleDeg ? tidy(degrees) : toStep(degrees, angleDeg);
  return normalAngle(wanted);
}

/** The same turn written between −180 (left out) and 180 degrees. */
export function normalAngle(degrees: number): number {
  const turn = ((degrees % 360) + 360) % 360;
  return tidy(turn > 180 ? turn - 360 : turn);
}
