import { makeMapComputer } from '@/lib/kinematics/maps/compute-tile';
import type { Arm, MapDirection, WristMode } from '@/lib/kinematics/types';

/** The vertical map behind the plumb's arm: inverse condition number over distance from the base and height. */
export interface SectionMap {
  /** Centre of the first cell: distance and height over the base plate, mm. */
  readonly originMm: readonly [number, number];
  readonly stepMm: number;
  readonly columns: number;
  readonly rows: number;
  /** Row by row from below; NaN where not reached. */
  readonly value: Float32Array;
}

export interface SectionQuestion {
  /** The arm with its tool, in its base frame. */
  readonly arm: Arm;
  /** Level direction of the cut, base frame. */
  readonly headingDeg: number;
  readonly direction: MapDirection;
  readonly roll: number | 'free';
  readonly wrist: WristMode;
  /** What the cut shows, mm: distance from and to, height from and to. */
  readonly fromMm: readonly [number, number];
  readonly toMm: readonly [number, number];
  readonly stepMm: number;
}

/**
 * Computes a section row by row; each turn of the iteration is a few milliseconds of work, so a page can pause between them.
 * The arm is turned under the cut, so that joint limits and tracks show as they are in this direction.
 */
export function* sectionRows(question: SectionQuestion): Generator<SectionMap, SectionMap> {
  const { arm, headingDeg, fromMm, toMm, stepMm, wrist, roll } = question;
  const columns = Math.max(1, Math.ceil((toMm[0] - fromMm[0]) / stepMm));
  const rows = Math.max(1, Math.ceil((toMm[1] - fromMm[1]) / stepMm));
  const originMm: [number, number] = [fromMm[0] + stepMm / 2, fromMm[1] + stepMm / 2];
  const map: SectionMap = { originMm, stepMm, columns, rows, value: new Float32Array(columns * rows).fill(NaN) };
  const heading = (headingDeg * Math.PI) / 180;
  const underCut = turnedBase(arm, -heading);
  const direction = turnedDirection(question.direction, -heading);
  for (let row = 0; row < rows; row += 1) {
    const computer = makeMapComputer(underCut, {
      grid: { origin: [originMm[0] / 1000, 0], step: stepMm / 1000, columns, rows: 1 },
      toolHeight: (originMm[1] + row * stepMm) / 1000,
      direction,
      roll,
      wrist,
      branch: 'best',
    });
    map.value.set(computer.tile(0, 1).inverseConditionNumber, row * columns);
    yield map;
  }
  return map;
}

function turnedBase(arm: Arm, byRad: number): Arm {
  const { xyz, rpy } = arm.base ?? { xyz: [0, 0, 0] as const, rpy: [0, 0, 0] as const };
  const [c, s] = [Math.cos(byRad), Math.sin(byRad)];
  return {
    ...arm,
    base: { xyz: [c * xyz[0] - s * xyz[1], s * xyz[0] + c * xyz[1], xyz[2]], rpy: [rpy[0], rpy[1], rpy[2] + byRad] },
  };
}

function turnedDirection(direction: MapDirection, byRad: number): MapDirection {
  if (direction.kind !== 'vector') return direction;
  const [x, y, z] = direction.vector;
  const [c, s] = [Math.cos(byRad), Math.sin(byRad)];
  return { kind: 'vector', vector: [c * x - s * y, s * x + c * y, z] };
}
