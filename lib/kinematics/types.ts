/**
 * The words of the computation. SI throughout: metres, radians, seconds.
 * Frames: floor frame x right, y away, z up, right-handed; angles counter-clockwise.
 */

export type Vec3 = readonly [number, number, number];

/** 4 × 4 homogeneous transform, as four rows. */
export type Pose = readonly (readonly number[])[];

/** A transform as an offset and a rotation about the fixed x, then y, then z axis (rad). */
export interface Frame {
  readonly xyz: Vec3;
  readonly rpy: Vec3;
}

/** What the tool can be asked to do: shift along or turn about the floor frame's axes. */
export type Freedom = 'x' | 'y' | 'z' | 'rx' | 'ry' | 'rz';

export interface Joint {
  readonly type: 'revolute' | 'prismatic';
  /** Denavit-Hartenberg link length (m), twist (rad), offset (m) and angle (rad). */
  readonly a: number;
  readonly alpha: number;
  readonly d: number;
  readonly theta: number;
  /** Limits: rad and rad/s for a revolute joint, m and m/s for a prismatic one; acceleration likewise. */
  readonly min: number;
  readonly max: number;
  readonly maxSpeed: number;
  readonly maxAcceleration: number;
}

export interface Actuator {
  readonly min: number;
  readonly max: number;
  readonly maxSpeed: number;
  readonly maxAcceleration: number;
}

/** A serial chain. `coupling` is chain joints × actuators: q = C u. */
export interface Arm {
  readonly convention: 'standard' | 'modified';
  readonly joints: readonly Joint[];
  readonly base?: Frame;
  readonly tool?: Frame;
  readonly freedoms?: readonly Freedom[];
  readonly coupling?: readonly (readonly number[])[];
  readonly actuators?: readonly Actuator[];
}

/** Tool orientation must stay fixed while moving (held), or only the tool point matters (free). */
export type WristMode = 'held' | 'free';

/** Measures of one posture; null where a measure does not exist for the chain. Speeds in m/s. */
export interface Measures {
  /** Gains in m/s, largest first. */
  readonly gains: readonly number[] | null;
  readonly inverseConditionNumber: number | null;
  readonly manipulability: number | null;
  readonly ellipsoidSpeed: number | null;
  readonly maximumToolSpeed: number | null;
  readonly sureSpeed: number | null;
}

export interface LimitMargin {
  /** Zero-based index of the joint (or actuator) nearest to a limit. */
  readonly joint: number;
  /** Distance to that limit: rad, or m for a prismatic joint. Negative outside the limits. */
  readonly angle: number;
  /** The same as a share of the joint's range, 0 … 0.5. */
  readonly share: number;
}

export interface PostureAnalysis {
  readonly pose: Pose;
  /** 6 × n rows, linear then angular, at the tool point, in the frame that the base is given in. */
  readonly jacobian: readonly (readonly number[])[];
  readonly wristFree: Measures;
  readonly wristHeld: Measures;
  readonly limitMargin: LimitMargin;
}

/** A tool pose asked for: whole, or as a point, the direction of the tool's z axis and a roll about it. */
export type Target =
  { readonly pose: Pose } | { readonly position: Vec3; readonly direction: Vec3; readonly roll: number | 'free' };

/** Why a pose is not reached. Stored in maps by its position in this list, so the order never changes. */
export const REASONS = ['reached', 'too far', 'too near', 'joint limit', 'direction', 'obstacle', 'not found'] as const;
export type Reason = (typeof REASONS)[number];

export type MapDirection =
  | { readonly kind: 'down' }
  /** Away from the first axis, `tilt` rad above (positive) or below the horizontal. */
  | { readonly kind: 'outward'; readonly tilt: number }
  | { readonly kind: 'vector'; readonly vector: Vec3 };

export interface MapGrid {
  /** Centre of the first cell, in the frame that the arm's base is given in (m). */
  readonly origin: readonly [number, number];
  readonly step: number;
  readonly columns: number;
  readonly rows: number;
}

/** Directions about the map's own: `samples` of them, even over the cone that opens by `halfAngle` (rad, above 0 and at most π) to every side. */
export interface MapCone {
  readonly halfAngle: number;
  readonly samples: number;
}

export interface MapRequest {
  readonly grid: MapGrid;
  /**
   * An upright map: columns run level along this bearing (rad, from x towards y) from the grid's origin, rows upwards from
   * `toolHeight`. Left out, the map lies level and its columns and rows run along x and y.
   */
  readonly section?: { readonly bearing: number };
  /** Height of the tool point (m); of a section's lowest row. */
  readonly toolHeight: number;
  readonly direction: MapDirection;
  /** A spot is then reached where every direction of the cone is, and has the worst value of them. */
  readonly cone?: MapCone;
  readonly roll: number | 'free';
  readonly wrist: WristMode;
  readonly branch: 'best' | string;
}

/** Rows `rowFrom` … `rowTo` − 1 of a map, row-major, one value a cell; NaN (0 for branch) where not reached. */
export interface MapTile {
  readonly rowFrom: number;
  readonly rowTo: number;
  readonly columns: number;
  /** Index into REASONS. */
  readonly reason: Uint8Array;
  /** 1-based joint that forbids the spot where the reason is a joint limit, else 0. */
  readonly bindingJoint: Uint8Array;
  readonly branch: Uint8Array;
  readonly inverseConditionNumber: Float32Array;
  readonly maximumToolSpeed: Float32Array;
  readonly sureSpeed: Float32Array;
  /** Share of range left to the nearest joint limit, 0 … 0.5. */
  readonly limitShare: Float32Array;
  /** Share of the cone's directions that are reached, 0 … 1; without a cone 1 where reached and 0 elsewhere. Never NaN. */
  readonly wristCoverage: Float32Array;
}
