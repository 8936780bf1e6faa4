import { itemToFloor, type PointMm } from '../geometry';
import type { Conveyor, Fixture, Obstacle, Zone } from '../items';
import { walkwayEdges } from '../walkway-edges';
import { body, detail, name, onFloor, type Shape, type Spot } from './shapes';

/** Below the lowest edge, where the eye looks for a name. */
function middleOf(item: Fixture | Obstacle | Zone): PointMm {
  const points = onFloor(item, item.outlineMm);
  const xs = points.map(([x]) => x);
  const ys = points.map(([, y]) => y);
  return [(Math.min(...xs) + Math.max(...xs)) / 2, Math.min(...ys)];
}

export function fixtureShapes(fixture: Fixture): Shape[] {
  const { outlineMm, zFromMm } = fixture;
  const diagonals: [PointMm, PointMm][] =
    outlineMm.length === 4
      ? [
          [outlineMm[0], outlineMm[2]],
          [outlineMm[1], outlineMm[3]],
        ]
      : [];
  return [
    body(fixture, 'FIXTURES', outlineMm, zFromMm),
    ...diagonals.map((ends) => detail(fixture, 'FIXTURES', ends, 'detail', zFromMm)),
    name(fixture, middleOf(fixture)),
    ...fixture.taskPoints.map((point): Spot => {
      const [x, y] = itemToFloor(fixture, [point.xMm, point.yMm]);
      return {
        kind: 'spot',
        layer: 'TASK-POINTS',
        itemId: fixture.id,
        pointId: point.id,
        name: point.name,
        at: [x, y, point.zMm],
      };
    }),
  ];
}

export function obstacleShapes(obstacle: Obstacle): Shape[] {
  const { outlineMm, zFromMm, form } = obstacle;
  // A column of the building is drawn as cut: crossed.
  const cut: [PointMm, PointMm][] =
    form === 'column' && outlineMm.length === 4
      ? [
          [outlineMm[0], outlineMm[2]],
          [outlineMm[1], outlineMm[3]],
        ]
      : [];
  return [
    body(obstacle, 'OBSTACLES', outlineMm, zFromMm),
    ...cut.map((ends) => detail(obstacle, 'OBSTACLES', ends, 'detail', zFromMm)),
    name(obstacle, middleOf(obstacle)),
  ];
}

export function zoneShapes(zone: Zone): Shape[] {
  const words = zone.use === 'keepOut' ? `${zone.name}, keep out` : `${zone.name}, one robot at a time`;
  return [body(zone, 'ZONES', zone.outlineMm, 0), name(zone, middleOf(zone), words)];
}

/** Both edges, the middle line, and an arrow in the direction in which it carries. */
export function conveyorShapes(conveyor: Conveyor): Shape[] {
  const { pointsMm, widthMm, zToMm } = conveyor;
  const [left, right] = walkwayEdges(pointsMm, widthMm);
  const tip = pointsMm[pointsMm.length - 1];
  const before = pointsMm[pointsMm.length - 2];
  const along = Math.atan2(tip[1] - before[1], tip[0] - before[0]);
  const barb = (turn: number): PointMm => [
    tip[0] - (widthMm / 3) * Math.cos(along + turn),
    tip[1] - (widthMm / 3) * Math.sin(along + turn),
  ];
  const [first, second] = onFloor(conveyor, pointsMm);
  return [
    body(conveyor, 'CONVEYORS', [...left, ...right.reverse()], zToMm),
    detail(conveyor, 'CONVEYORS', pointsMm, 'detail', zToMm),
    detail(conveyor, 'CONVEYORS', [barb(0.5), tip, barb(-0.5)], 'detail', zToMm),
    name(conveyor, [(first[0] + second[0]) / 2, (first[1] + second[1]) / 2 - widthMm / 2]),
  ];
}
