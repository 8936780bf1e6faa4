import type { Transform } from '../transforms';

/** Postures that put the flange on a pose, before limits and modulo 2π; the next call overwrites them. */
export interface Branches {
  count: number;
  /** Posture b at b × actuators. */
  readonly values: Float64Array;
  /** Class of posture b; what the number means is told by `ClosedForm.nameOf`. */
  readonly codes: Uint8Array;
  /** Why there is none (count 0): how far the wanted spot lies outside (m), or a direction that the chain can't take. */
  shortfall: 'none' | 'too far' | 'too near' | 'direction';
  by: number;
}

/**
 * What a redundant chain leaves free once its flange is placed: one number, such as where a track stands or how far the elbow is swung
 * about the line from shoulder to wrist. For each value of it the chain has branches as others have.
 */
export interface Family {
  readonly from: number;
  readonly to: number;
  /** The end is the beginning again. */
  readonly closed: boolean;
  /** Even samples that find the ranges of a common arm; the best of them are refined. */
  readonly samples: number;
}

/** A chain solved in closed form. Poses are of the flange in the frame of the chain's base. */
export interface ClosedForm {
  readonly branches: Branches;
  readonly classes: number;
  /** Null where the flange leaves nothing free. */
  readonly family: Family | null;
  /** `parameter` is of the family, where there is one. */
  solve(flange: Transform, parameter?: number): Branches;
  nameOf(code: number): string;
  /** Classes of one shape hold the axes on the same lines, so their measures are equal. */
  shapeOf(code: number): number;
}

export function makeBranches(capacity: number, actuators: number): Branches {
  return {
    count: 0,
    values: new Float64Array(capacity * actuators),
    codes: new Uint8Array(capacity),
    shortfall: 'none',
    by: 0,
  };
}

/**
 * The angle between two links of lengths l2 and l3 whose ends are √`square` apart, or NaN outside. Taken from the two distances to
 * the stretched and the folded elbow rather than from a cosine, which keeps its digits near both.
 */
export function elbowAngle(square: number, l2: number, l3: number): number {
  const stretched = (l2 + l3) * (l2 + l3) - square;
  const folded = square - (l2 - l3) * (l2 - l3);
  const slack = ELBOW_CLAMP * (l2 + l3) * (l2 + l3);
  if (stretched < -slack || folded < -slack) return NaN;
  return 2 * Math.atan2(Math.sqrt(Math.max(0, stretched)), Math.sqrt(Math.max(0, folded)));
}

/** Rounding at the boundary of reach, as a share of the squared reach: such spots count as just reached. */
const ELBOW_CLAMP = 1e-13;
