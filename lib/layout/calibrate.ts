import type { Calibration, CalibrationRequest } from './calibration';

type Point = readonly [number, number];

/** Two picked points nearer than this cannot set a scale: one pixel of aim would be half of the result. */
export const LEAST_PICKED_DISTANCE_PX = 2;

/** Picked points that cannot be used; `path` leads to the field of the request. */
export class CalibrationFault extends Error {
  constructor(
    readonly path: 'scale' | 'check' | 'level',
    message: string,
  ) {
    super(message);
    this.name = 'CalibrationFault';
  }
}

interface PickedLine {
  readonly fromPx: Point;
  readonly toPx: Point;
}

const WHAT = { scale: 'scale', check: 'check distance', level: 'level line' } as const;

function lengthPx(path: keyof typeof WHAT, { fromPx, toPx }: PickedLine): number {
  const length = Math.hypot(toPx[0] - fromPx[0], toPx[1] - fromPx[1]);
  if (length < LEAST_PICKED_DISTANCE_PX) {
    throw new CalibrationFault(
      path,
      `The two points of the ${WHAT[path]} lie on one spot. Pick two points that are well apart.`,
    );
  }
  return length;
}

/** Counter-clockwise angle of a picked line as the picture shows it, degrees in (−180, 180]. */
function angleDeg({ fromPx, toPx }: PickedLine): number {
  return (Math.atan2(fromPx[1] - toPx[1], toPx[0] - fromPx[0]) * 180) / Math.PI;
}

/**
 * Sets a floor plan to scale: millimetres per pixel from the scale line, the turn that makes the level line run along the
 * floor's x axis (left to right, so a plan drawn upside down can be turned over), and the error of the check distance.
 * Throws CalibrationFault where two picked points coincide.
 */
export function calibrate(request: CalibrationRequest): Calibration {
  const mmPerPx = request.scale.distanceMm / lengthPx('scale', request.scale);
  const { check, level } = request;
  const checkError = check && (lengthPx('check', check) * mmPerPx - check.distanceMm) / check.distanceMm;
  if (level) lengthPx('level', level);
  // 0 − 0 rather than −0, so that a plan without a level line reads plain 0 everywhere.
  const rotationDeg = level ? 0 - angleDeg(level) : 0;
  return { ...request, mmPerPx, rotationDeg, checkError };
}

/** What the two mappings need of a calibration. */
export type PictureFrame = Pick<Calibration, 'mmPerPx' | 'rotationDeg' | 'originPx'>;

/** A point of the upright picture (px, y down) on the floor (mm, y away). */
export function pictureToFloor(frame: PictureFrame, [xPx, yPx]: Point): [number, number] {
  const angle = (frame.rotationDeg * Math.PI) / 180;
  const right = (xPx - frame.originPx[0]) * frame.mmPerPx;
  const up = (frame.originPx[1] - yPx) * frame.mmPerPx;
  return [Math.cos(angle) * right - Math.sin(angle) * up, Math.sin(angle) * right + Math.cos(angle) * up];
}

/** A point of the floor (mm, y away) in the upright picture (px, y down). */
export function floorToPicture(frame: PictureFrame, [xMm, yMm]: Point): [number, number] {
  const angle = (frame.rotationDeg * Math.PI) / 180;
  const right = Math.cos(angle) * xMm + Math.sin(angle) * yMm;
  const up = Math.cos(angle) * yMm - Math.sin(angle) * xMm;
  return [frame.originPx[0] + right / frame.mmPerPx, frame.originPx[1] - up / frame.mmPerPx];
}
