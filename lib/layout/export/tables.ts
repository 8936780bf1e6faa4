import { REASONS } from '@/lib/kinematics/types';
import { itemToFloor } from '../geometry';
import type { Item } from '../items';
import type { PlacedMap } from '../floor-map';
import type { PointVerdict } from '../verdicts';
import { csvOf } from './csv';

/** Rounded where more digits would be noise: hundredths of a millimetre. */
const tidyMm = (value: number): number => Math.round(value * 100) / 100 + 0;
const tidy = (value: number): number => Number(value.toPrecision(7));

const nameOf = (items: readonly Item[], id: string | undefined): string =>
  items.find((item) => item.id === id)?.name ?? '';

export const VERDICT_COLUMNS = [
  'Task point',
  'Fixture',
  'x (mm)',
  'y (mm)',
  'z (mm)',
  'Wanted speed (mm/s)',
  'Robot',
  'Best of the robots',
  'Reached',
  'Met',
  'Band',
  'Condition number',
  'Sure speed (mm/s)',
  'Maximum tool speed (mm/s)',
  'Speed margin (mm/s)',
  'Binding joint',
  'Branch',
  'Reason',
] as const;

/** Every task point and every robot, in the order of the work; a point of a sheet without robots has one row of its own. */
export function verdictsCsv(items: readonly Item[], verdicts: readonly PointVerdict[]): string {
  const rows = verdicts.flatMap((point) => {
    const head = [point.pointName, point.fixtureName, ...point.positionMm.map(tidyMm), point.wantedSpeedMmS];
    if (point.robots.length === 0) return [[...head, '', false, false, false, 'no robot', ...Array(7).fill(null)]];
    return point.robots.map((robot) => [
      ...head,
      nameOf(items, robot.robotId),
      robot.robotId === point.best?.robotId,
      robot.reached,
      robot.met,
      robot.band,
      robot.posture && Number.isFinite(robot.posture.conditionNumber) ? tidy(robot.posture.conditionNumber) : null,
      robot.posture && tidy(robot.posture.sureSpeedMmS),
      robot.posture && tidy(robot.posture.maximumToolSpeedMmS),
      robot.speedMarginMmS === null ? null : tidy(robot.speedMarginMmS),
      robot.bindingJoint,
      robot.posture?.branch ?? null,
      robot.reason,
    ]);
  });
  return csvOf(VERDICT_COLUMNS, rows);
}

export const MAP_COLUMNS = [
  'Robot',
  'x (mm)',
  'y (mm)',
  'Tool height (mm)',
  'Reached',
  'Reason',
  'Inverse condition number',
  'Maximum tool speed (m/s)',
  'Sure speed (m/s)',
  'Joint that binds',
  'Distance to the nearest joint limit (share of its range)',
] as const;

/** Every spot of every robot's map at its place on the floor, as computed: nothing is blended or resampled. */
export function mapCsv(items: readonly Item[], maps: readonly PlacedMap[], toolHeightMm: number): string {
  const rows = maps.flatMap(({ robotId, placement, grid, tile }) => {
    const robot = nameOf(items, robotId);
    return Array.from(tile.reason, (reason, spot) => {
      const row = Math.floor(spot / grid.columns);
      const inBase = [
        grid.originMm[0] + (spot - row * grid.columns) * grid.stepMm,
        grid.originMm[1] + row * grid.stepMm,
      ] as const;
      const [x, y] = itemToFloor(placement, inBase);
      const reached = reason === 0;
      const joint = tile.bindingJoint[spot];
      const value = (plane: Float32Array) => (reached && Number.isFinite(plane[spot]) ? tidy(plane[spot]) : null);
      return [
        robot,
        tidyMm(x),
        tidyMm(y),
        toolHeightMm,
        reached,
        REASONS[reason] ?? null,
        value(tile.inverseConditionNumber),
        value(tile.maximumToolSpeed),
        value(tile.sureSpeed),
        joint > 0 ? joint : null,
        value(tile.limitShare),
      ];
    });
  });
  return csvOf(MAP_COLUMNS, rows);
}
