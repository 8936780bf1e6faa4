import { branchNames } from '@/lib/kinematics/maps/compute-tile';
import { CONE_SAMPLES } from '@/lib/kinematics/maps/cone-sweep';
import type { Arm, MapDirection, MapGrid, MapRequest } from '@/lib/kinematics/types';
import type { FloorGrid } from './floor-map';
import type { Robot } from './items';
import type { MapQuestion } from './map-question-schema';
import type { MapSettings } from './map-settings';
import { reachRadius } from './reach-radius';
import { armWithTool, poseInBase } from './robot-frame';
import { rollOf, toolDirection, toolOrientation } from './tool-orientation';

/**
 * From "this robot, these settings of the sheet" to the question that is stored and to what the kernel is asked. Robots that
 * only stand elsewhere ask the same question, and equal questions are equal to the last digit: whatever cannot change
 * the answer is set to one value.
 */

const radians = (degrees: number): number => (degrees * Math.PI) / 180;

/** Sums and turns leave rounding noise far below anything that can be measured on a floor. */
const tidy = (value: number): number => Math.round(value * 1e6) / 1e6 || 0;

/** Into −180 < angle ≤ 180. */
function wrappedDeg(angleDeg: number): number {
  const angle = tidy(((angleDeg % 360) + 360) % 360);
  return angle > 180 ? tidy(angle - 360) : angle;
}

export function questionOfRobot(robot: Robot, settings: MapSettings): MapQuestion {
  const { xMm, yMm, zMm, rollDeg, pitchDeg, yawDeg } = robot.tool;
  const upright = settings.tiltDeg === 0 || settings.tiltDeg === 180;
  const towards = upright ? 'outward' : settings.towards;
  return {
    armId: robot.armId,
    tool: { xMm, yMm, zMm, rollDeg, pitchDeg, yawDeg },
    toolHeightMm: tidy(settings.toolHeightMm - robot.riserMm),
    settings: {
      tiltDeg: settings.tiltDeg,
      towards,
      coneDeg: settings.coneDeg,
      rollDeg: rollInBase(robot, settings),
      wrist: settings.wrist,
      branch: settings.branch,
      stepMm: settings.stepMm,
    },
    headingDeg: towards === 'heading' ? wrappedDeg(settings.headingDeg - robot.angleDeg) : 0,
  };
}

/**
 * A fixed roll is a matter of the work, so the sheet states it against the floor; the question states it against the base.
 * An outward tool turns with the spot, and its roll is stated against the base from the start.
 */
function rollInBase(robot: Robot, settings: MapSettings): number | 'free' {
  const { rollDeg, tiltDeg } = settings;
  if (rollDeg === 'free') return 'free';
  const upright = tiltDeg === 0 || tiltDeg === 180;
  if (settings.towards === 'outward' && !upright) return wrappedDeg(rollDeg);
  const onFloor = toolOrientation(toolDirection(tiltDeg, upright ? 0 : settings.headingDeg), radians(rollDeg));
  return wrappedDeg((rollOf(poseInBase(robot, onFloor)) * 180) / Math.PI);
}

/** What the kernel is asked: the arm in its base frame with the tool on it, and the grid of spots. */
export interface KernelQuestion {
  readonly arm: Arm;
  readonly request: MapRequest;
}

export function mapRequestOf(question: MapQuestion, arm: Arm): KernelQuestion {
  const armAndTool = armWithTool(arm, question.tool);
  const { coneDeg, rollDeg, wrist, branch } = question.settings;
  return {
    arm: armAndTool,
    request: {
      grid: mapGridOf(armAndTool, question.settings.stepMm),
      toolHeight: question.toolHeightMm / 1000,
      direction: directionOf(question),
      ...(coneDeg > 0 && { cone: { halfAngle: radians(coneDeg), samples: CONE_SAMPLES } }),
      roll: rollDeg === 'free' ? 'free' : radians(rollDeg),
      wrist,
      branch: branch !== 'best' && branchNames(armAndTool).includes(branch) ? branch : 'best',
    },
  };
}

function directionOf({ settings, headingDeg }: MapQuestion): MapDirection {
  if (settings.tiltDeg === 0) return { kind: 'down' };
  if (settings.tiltDeg === 180) return { kind: 'vector', vector: [0, 0, 1] };
  // The sheet counts from straight down, the kernel from the horizontal.
  if (settings.towards === 'outward') return { kind: 'outward', tilt: radians(settings.tiltDeg - 90) };
  return { kind: 'vector', vector: toolDirection(settings.tiltDeg, headingDeg) };
}

/** Cells from the base's middle to the edge of its map. */
function halfWidth(radiusMm: number, stepMm: number): number {
  return Math.max(1, Math.ceil(radiusMm / stepMm - 1e-9));
}

/** A square about the base with one cell on its middle, wide enough for every spot that the tool point can come to. */
function mapGridOf(armAndTool: Arm, stepMm: number): MapGrid {
  const half = halfWidth(reachRadius(armAndTool) * 1000, stepMm);
  const first = -(half * stepMm) / 1000;
  return { origin: [first, first], step: stepMm / 1000, columns: 2 * half + 1, rows: 2 * half + 1 };
}

/** The same grid in the sheet's millimetres. */
export function gridInMm(grid: MapGrid): FloorGrid & { originMm: [number, number] } {
  const stepMm = tidy(grid.step * 1000);
  return {
    originMm: [tidy(grid.origin[0] * 1000), tidy(grid.origin[1] * 1000)],
    stepMm,
    columns: grid.columns,
    rows: grid.rows,
  };
}

/** The finest whole-millimetre step that keeps a map of this arm within so many spots. */
export function finestStepMm(armAndTool: Arm, spotLimit: number): number {
  const radiusMm = reachRadius(armAndTool) * 1000;
  const halfLimit = Math.floor((Math.sqrt(spotLimit) - 1) / 2);
  let stepMm = Math.max(1, Math.floor(radiusMm / halfLimit));
  while (halfWidth(radiusMm, stepMm) > halfLimit) stepMm += 1;
  return stepMm;
}
