import { errorGain } from '@/lib/kinematics/measures/error-gain';
import { makePoseConditioner } from '@/lib/kinematics/measures/pose-condition';
import { principalDirections } from '@/lib/kinematics/measures/principal-directions';
import { spreadDirections } from '@/lib/kinematics/measures/wrist-coverage';
import { reach } from '@/lib/kinematics/reach';
import { makeSolver } from '@/lib/kinematics/solver';
import type { Arm, Joint, Vec3, WristMode } from '@/lib/kinematics/types';
import { actuatorType } from '@/lib/layout/arm-columns';
import { directionToFloor, floorToBase } from '@/lib/layout/robot-frame';
import type { PlumbPosture, PlumbReading } from './plumb';

/** One arc minute, the error that is stated for every turning joint; sliding ones are taken as exact. */
export const ARC_MINUTE_RAD = Math.PI / 180 / 60;

export interface PrincipalFigure {
  /** m/s for joint speeds of length one as shares of their limits. */
  readonly gain: number;
  /** On the floor: heading (0 along x, counter-clockwise) of its level part, and how far it rises, both of the end that does not fall. */
  readonly headingDeg: number | null;
  readonly riseDeg: number;
  /** The joint that works most for it, counted from one; null where nothing moves that way. */
  readonly joint: number | null;
}

export interface PlumbFigures {
  readonly principal: readonly PrincipalFigure[];
  /** Ways in which joints can move and the tool stays. */
  readonly stillCount: number;
  /** Null where the chain controls only shifts or only turns. */
  readonly poseCondition: { readonly inverse: number; readonly lengthMm: number } | null;
  /** mm, where every turning joint is off by an arc minute: all against us, and independent of one another. */
  readonly error: { readonly worstMm: number; readonly rootSumSquareMm: number };
}

/** All that takes too long to be read for every posture: of the one that is looked at. */
export function plumbFigures({ arm, robot }: PlumbReading, posture: PlumbPosture, wrist: WristMode): PlumbFigures {
  const solver = makeSolver(arm);
  const { chain, freedoms } = solver;
  const jacobian = solver.stand(posture.joints);
  const { shift } = errorGain(
    jacobian,
    typesOfColumns(arm).map((type) => (type === 'revolute' ? ARC_MINUTE_RAD : 0)),
  );
  const error = { worstMm: shift.worst * 1000, rootSumSquareMm: shift.rootSumSquare * 1000 };
  const isMixed = freedoms.some((row) => row < 3) && freedoms.some((row) => row >= 3);
  const pose = isMixed ? makePoseConditioner(chain, freedoms)(jacobian) : null;
  const poseCondition = pose && { inverse: pose.inverseConditionNumber, lengthMm: pose.lengthM * 1000 };
  if (!freedoms.some((row) => row < 3)) return { principal: [], stillCount: 0, poseCondition, error };
  const { principal, still } = principalDirections(chain, freedoms, wrist, jacobian);
  const figures = principal.map(({ gain, tool, joints }): PrincipalFigure => {
    const onFloor = directionToFloor(robot, tool);
    return { gain, ...bearingOf(onFloor), joint: joints && mostOf(joints) };
  });
  return { principal: figures, stillCount: still.length, poseCondition, error };
}

/** A direction and its opposite are one: the end that rises is told, of level ones the end between −90° and 90°. */
function bearingOf([x, y, z]: Vec3): Pick<PrincipalFigure, 'headingDeg' | 'riseDeg'> {
  const level = Math.hypot(x, y);
  const turned = z < -1e-9 || (Math.abs(z) <= 1e-9 && x < 0) ? -1 : 1;
  const riseDeg = (Math.atan2(turned * z, level) * 180) / Math.PI;
  return { headingDeg: level < 1e-6 ? null : (Math.atan2(turned * y, turned * x) * 180) / Math.PI, riseDeg };
}

function mostOf(joints: readonly number[]): number {
  const sizes = joints.map(Math.abs);
  return sizes.indexOf(Math.max(...sizes)) + 1;
}

/** Under a coupling the columns of the Jacobian are of the actuators, which may be fewer than the joints. */
function typesOfColumns({ joints, coupling }: Arm): Joint['type'][] {
  if (!coupling) return joints.map(({ type }) => type);
  return coupling[0].map((_, actuator) => actuatorType(joints, coupling, actuator));
}

export interface CoverageSoFar {
  readonly asked: number;
  readonly reached: number;
  readonly of: number;
}

/** Directions asked for, evenly over the sphere. */
const DIRECTIONS = 96;

/**
 * In how many of all tool directions the spot is reached, any roll: one direction a turn of the iteration, so that a page can pause
 * in between. Directions come in a scattered order, so that the share so far is a fair one.
 */
export function* coverageAt({ arm, robot, spot }: PlumbReading): Generator<CoverageSoFar, void> {
  const solver = makeSolver(arm);
  const [x, y, z] = floorToBase(robot, spot.positionMm).map((mm) => mm / 1000);
  const directions = spreadDirections({ kind: 'sphere' }, DIRECTIONS);
  let reached = 0;
  for (let k = 0; k < DIRECTIONS; k += 1) {
    // A stride without a common factor with the count meets every direction once.
    const direction = directions[(k * 37) % DIRECTIONS];
    if (reach(solver, { position: [x, y, z], direction, roll: 'free' }).reached) reached += 1;
    yield { asked: k + 1, reached, of: DIRECTIONS };
  }
}
