/** What the pointer snaps to. Holding the suspend key lets it go anywhere. */
export interface Snapping {
  /** Distance between the lines that places snap to, mm; null: no snapping to the grid. */
  readonly gridMm: number | null;
  /** Turns snap to multiples of this, degrees; null: any angle. */
  readonly angleDeg: number | null;
  /** Places also snap to edges, centres and task points of other items. */
  readonly toItems: boolean;
  /** Places also snap to corners of walls found on the floor plan. */
  readonly toPlan: boolean;
}

/** Turns that a line drawn corner by corner falls into, degrees. */
export const LINE_STEP_DEG = 15;

export const DEFAULT_SNAPPING: Snapping = { gridMm: 50, angleDeg: 15, toItems: true, toPlan: true };
export const NO_SNAPPING: Snapping = { gridMm: null, angleDeg: null, toItems: false, toPlan: false };

/** No place or turn on a sheet is finer than this: a hundredth of a millimetre, a hundredth of a degree. */
const FINEST = 100;

/** Rounds away the tail of digits that a pointer leaves, so that lists and the server hold plain numbers. */
export const tidy = (value: number): number => Math.round(value * FINEST) / FINEST + 0;

const toStep = (value: number, step: number): number => tidy(Math.round(value / step) * step);

/** A spot of the floor on the nearest crossing of the grid; `suspended` keeps it where the pointer is. */
export function snapSpot(
  spot: { readonly xMm: number; readonly yMm: number },
  { gridMm }: Pick<Snapping, 'gridMm'>,
  suspended: boolean,
): { xMm: number; yMm: number } {
  if (suspended || !gridMm) return { xMm: tidy(spot.xMm), yMm: tidy(spot.yMm) };
  return { xMm: toStep(spot.xMm, gridMm), yMm: toStep(spot.yMm, gridMm) };
}

export function snapAngle(degrees: number, { angleDeg }: Pick<Snapping, 'angleDeg'>, suspended: boolean): number {
  const wanted = suspended || !angleDeg ? tidy(degrees) : toStep(degrees, angleDeg);
  return normalAngle(wanted);
}

/** The same turn written between −180 (left out) and 180 degrees. */
export function normalAngle(degrees: number): number {
  const turn = ((degrees % 360) + 360) % 360;
  return tidy(turn > 180 ? turn - 360 : turn);
}

/** A side this near to a round angle was meant to run at it, degrees. */
const NEARLY_DEG = 1.5;

/**
 * The end of a side from `from` toward `to` where that runs nearly at a multiple of LINE_STEP_DEG: at exactly that angle, as long
 * as the grid has it. Null where it does not, or where turns do not snap. Upright and level sides are left to the grid.
 */
export function onRoundAngle(
  from: readonly [number, number],
  to: { readonly xMm: number; readonly yMm: number },
  { gridMm, angleDeg }: Snapping,
): [number, number] | null {
  const [x, y] = [to.xMm - from[0], to.yMm - from[1]];
  const headingDeg = (Math.atan2(y, x) * 180) / Math.PI;
  const roundDeg = Math.round(headingDeg / LINE_STEP_DEG) * LINE_STEP_DEG;
  if (angleDeg === null || roundDeg % 90 === 0 || Math.abs(headingDeg - roundDeg) > NEARLY_DEG) return null;
  const length = Math.hypot(x, y);
  const kept = gridMm ? Math.round(length / gridMm) * gridMm : length;
  const angleRad = (roundDeg * Math.PI) / 180;
  return [tidy(from[0] + kept * Math.cos(angleRad)), tidy(from[1] + kept * Math.sin(angleRad))];
}
