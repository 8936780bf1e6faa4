import { makeMapComputer } from '@/lib/kinematics/maps/compute-tile';
import { mapWorkPerSpot } from '@/lib/kinematics/maps/work';
import type { Arm, MapTile } from '@/lib/kinematics/types';
import type { FloorGrid, PlacedMap } from './floor-map';
import { floorToItem, itemToFloor, type PointMm } from './geometry';
import type { Robot, SectionLine } from './items';
import { mapRequestOf, questionOfRobot } from './map-question';
import type { MapQuestion } from './map-question-schema';
import type { MapSettings } from './map-settings';

/** The map in an upright cut of the floor, such as section A–A: distance along the line, and height. */

export interface Cut {
  /** On the floor, mm. */
  readonly fromMm: PointMm;
  readonly toMm: PointMm;
  readonly zFromMm: number;
  readonly zToMm: number;
}

export function cutOfLine(line: SectionLine): Cut {
  const { zFromMm, zToMm } = line;
  return { fromMm: itemToFloor(line, line.fromMm), toMm: itemToFloor(line, line.toMm), zFromMm, zToMm };
}

export const cutLengthMm = ({ fromMm, toMm }: Cut): number => Math.hypot(toMm[0] - fromMm[0], toMm[1] - fromMm[1]);

/** A point over the floor as the cut shows it: along the line, height, and how far behind the cut's plane it lies (left of the line is behind). */
export function onCut({ fromMm, toMm }: Cut, [x, y, z]: readonly [number, number, number]) {
  const length = Math.hypot(toMm[0] - fromMm[0], toMm[1] - fromMm[1]) || 1;
  const [c, s] = [(toMm[0] - fromMm[0]) / length, (toMm[1] - fromMm[1]) / length];
  const [dx, dy] = [x - fromMm[0], y - fromMm[1]];
  return { alongMm: dx * c + dy * s, heightMm: z, behindMm: dy * c - dx * s };
}

/** One robot's part of a cut, as it is computed beside the page. */
export interface SectionTask {
  readonly question: MapQuestion;
  readonly arm: Arm;
  /** In the robot's base frame. */
  readonly cut: Cut;
  /** ms that it may take; decides how fine it is. */
  readonly budgetMs: number;
}

/** Columns along the cut from its beginning, rows upwards from the height of the base plate. */
export interface SectionTile {
  readonly grid: FloorGrid;
  readonly tile: MapTile;
}

export function sectionTask(robot: Robot, arm: Arm, settings: MapSettings, cut: Cut, budgetMs: number): SectionTask {
  // The cut has heights of its own.
  const question = questionOfRobot(robot, { ...settings, toolHeightMm: 0 });
  const inBase = {
    fromMm: floorToItem(robot, cut.fromMm),
    toMm: floorToItem(robot, cut.toMm),
    zFromMm: cut.zFromMm - robot.riserMm,
    zToMm: cut.zToMm - robot.riserMm,
  };
  return { question: { ...question, toolHeightMm: 0 }, arm, cut: inBase, budgetMs };
}

/** µs a plain spot before anything has been measured; cells no finer than this, mm, and no more than so many. */
const PLAIN_US = 12;
const FINEST_MM = 10;
const MOST_CELLS = 40_000;
const LEAST_CELLS = 200;

/** A maker of sections that learns what they cost on this machine. `now`: a clock in ms. */
export function makeSectionMapper(now: () => number): (task: SectionTask) => SectionTile {
  const costs = new Map<string, number>();
  return ({ question, arm, cut, budgetMs }) => {
    const { arm: tooled, request } = mapRequestOf(question, arm);
    const kind = JSON.stringify([question.armId, question.tool, question.settings]);
    const usPerCell = costs.get(kind) ?? PLAIN_US * mapWorkPerSpot(tooled, request);
    const lengthMm = cutLengthMm(cut);
    const heightMm = Math.max(1, cut.zToMm - cut.zFromMm);
    const cells = Math.min(MOST_CELLS, Math.max(LEAST_CELLS, (budgetMs * 1000) / usPerCell));
    const stepMm = Math.max(FINEST_MM, Math.ceil(Math.sqrt((lengthMm * heightMm) / cells)));
    const columns = Math.max(1, Math.ceil(lengthMm / stepMm));
    const rows = Math.max(1, Math.ceil(heightMm / stepMm));
    const bearing = Math.atan2(cut.toMm[1] - cut.fromMm[1], cut.toMm[0] - cut.fromMm[0]);
    const half = stepMm / 2;
    const began = now();
    const tile = makeMapComputer(tooled, {
      ...request,
      section: { bearing },
      grid: {
        origin: [(cut.fromMm[0] + half * Math.cos(bearing)) / 1000, (cut.fromMm[1] + half * Math.sin(bearing)) / 1000],
        step: stepMm / 1000,
        columns,
        rows,
      },
      toolHeight: (cut.zFromMm + half) / 1000,
    }).tile(0, rows);
    const took = ((now() - began) * 1000) / (columns * rows);
    costs.set(kind, Math.max(took, 0.5 * (usPerCell + took)));
    return { grid: { originMm: [half, cut.zFromMm + half], stepMm, columns, rows }, tile };
  };
}

/** A robot's section where the cut has it: raised by its riser. */
export function placedSection(robot: Pick<Robot, 'id' | 'riserMm'>, { grid, tile }: SectionTile): PlacedMap {
  return { robotId: robot.id, placement: { xMm: 0, yMm: robot.riserMm, angleDeg: 0 }, grid, tile };
}
