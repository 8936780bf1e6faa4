import type { PointMm } from '../geometry';
import type { Robot } from '../items';
import { robotSizes, robotSticks } from '../robot-sticks';
import { detail, name, type Circle, type DrawnRobot, type Layer, type Shape } from './shapes';

/** Base, the way it looks, links in the posture, and how far the arm may ever reach. */
export function robotShapes(robot: Robot, drawn: DrawnRobot | undefined): Shape[] {
  const reachMm = drawn?.reachMm ?? 0;
  const { baseRadiusMm } = robotSizes(reachMm);
  const centre: PointMm = [robot.xMm, robot.yMm];
  const zMm = robot.riserMm;
  const circle = (layer: Layer, radiusMm: number, part: Circle['part']): Circle => ({
    kind: 'circle',
    layer,
    itemId: robot.id,
    centre,
    radiusMm,
    zMm,
    part,
  });
  const sticks = drawn?.posture ? robotSticks(drawn.definition, robot.tool, drawn.posture, reachMm).sticks : [];
  return [
    ...(reachMm > 0 ? [circle('REACH', reachMm, 'detail')] : []),
    circle('ROBOTS', baseRadiusMm, 'body'),
    // Where the base looks.
    detail(
      robot,
      'ROBOTS',
      [
        [0, 0],
        [baseRadiusMm * 1.35, 0],
      ],
      'detail',
      zMm,
    ),
    ...sticks.map(({ from, to }) => detail(robot, 'ROBOTS', [from, to], 'link', zMm)),
    name(robot, [robot.xMm, robot.yMm - baseRadiusMm]),
  ];
}
