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

/** Computes a section row by row; each turn of the iteration is a few milliseconds of work, so a page can pause between them. */
export function* sectionRows(question: SectionQuestion): Generator<SectionMap, SectionMap> {
  const { arm, headingDeg, fromMm, toMm, stepMm, wrist, roll, direction } = question;
  const columns = Math.max(1, Math.ceil((toMm[0] - fromMm[0]) / stepMm));
  const rows = Math.max(1, Math.ceil((toMm[1] - fromMm[1]) / stepMm));
  const originMm: [number, number] = [fromMm[0] + stepMm / 2, fromMm[1] + stepMm / 2];
  const map: SectionMap = { originMm, stepMm, columns, rows, value: new Float32Array(columns * rows).fill(NaN) };
  const bearing = (headingDeg * Math.PI) / 180;
  const computer = makeMapComputer(arm, {
    grid: {
      origin: [(originMm[0] / 1000) * Math.cos(bearing), (originMm[0] / 1000) * Math.sin(bearing)],
      step: stepMm / 1000,
      columns,
      rows,
    },
    section: { bearing },
    toolHeight: originMm[1] / 1000,
    direction,
    roll,
    wrist,
    branch: 'best',
  });
  for (let row = 0; row < rows; row += 1) {
    map.value.set(computer.tile(row, row + 1).inverseConditionNumber, row * columns);
    yield map;
  }
  return map;
}
