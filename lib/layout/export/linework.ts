import type { Arm } from '@/lib/kinematics/types';
import { itemToFloor, type PointMm } from '../geometry';
import { fenceStrokes, placedDoors, type PlacedDoor } from '../guard-doors';
import type {
  Conveyor,
  Dimension,
  Fixture,
  GuardLine,
  Item,
  Note,
  Obstacle,
  Robot,
  SectionLine,
  Walkway,
} from '../items';
import { LINE_PITCH, noteLines } from '../note-lines';
import { robotSizes, robotSticks } from '../robot-sticks';
import { walkwayEdges } from '../walkway-edges';

/**
 * A sheet as plain lines on named layers, floor frame, mm: what the DXF holds and what reports and pictures draw. No line widths and
 * no colours: whoever draws knows the paper.
 */

export const LAYERS = [
  'WALKWAYS',
  'CONVEYORS',
  'OBSTACLES',
  'FIXTURES',
  'GUARD-LINES',
  'REACH',
  'ROBOTS',
  'TASK-POINTS',
  'DIMENSIONS',
  'SECTIONS',
  'NOTES',
  'NAMES',
] as const;
export type Layer = (typeof LAYERS)[number];

export type Shape = Line | Circle | Spot | Words;

export interface Line {
  readonly kind: 'line';
  readonly layer: Layer;
  readonly itemId: string;
  readonly points: readonly PointMm[];
  readonly closed: boolean;
  /** Height of its lowest edge above the floor, mm. */
  readonly zMm: number;
  /** `body` is the outline of something solid, `detail` a line within or beside it. */
  readonly part: 'body' | 'detail' | 'link' | 'arrow';
}
export interface Circle {
  readonly kind: 'circle';
  readonly layer: Layer;
  readonly itemId: string;
  readonly centre: PointMm;
  readonly radiusMm: number;
  readonly zMm: number;
  readonly part: 'body' | 'detail';
}
/** A task point. */
export interface Spot {
  readonly kind: 'spot';
  readonly layer: 'TASK-POINTS';
  readonly itemId: string;
  readonly pointId: string;
  readonly name: string;
  readonly at: readonly [number, number, number];
}
export interface Words {
  readonly kind: 'words';
  readonly layer: 'NAMES' | 'DIMENSIONS' | 'SECTIONS' | 'NOTES';
  readonly itemId: string;
  readonly of: Item['kind'];
  readonly at: PointMm;
  /** Turn of the baseline, upright to a reader, degrees. */
  readonly angleDeg: number;
  readonly text: string;
  /** Height of the letters on the floor where the sheet gives one, mm. */
  readonly heightMm?: number;
}

/** What is known of a robot's arm, and the posture that it is drawn in (rad or m); none draws its base alone. */
export interface DrawnRobot {
  readonly definition: Arm;
  readonly reachMm: number;
  readonly posture?: readonly number[];
}

/** Every line of the items that are not hidden, the lowest first. */
export function linework(items: readonly Item[], robots: ReadonlyMap<string, DrawnRobot>): Shape[] {
  return items.filter(({ hidden }) => !hidden).flatMap((item) => shapesOf(item, robots.get(item.id)));
}

function shapesOf(item: Item, robot: DrawnRobot | undefined): Shape[] {
  switch (item.kind) {
    case 'robot':
      return robotShapes(item, robot);
    case 'fixture':
      return fixtureShapes(item);
    case 'obstacle':
      return [body(item, 'OBSTACLES', item.outlineMm, item.zFromMm), name(item, middleOf(item))];
    case 'guardLine':
      return guardShapes(item);
    case 'walkway':
      return walkwayShapes(item);
    case 'dimension':
      return dimensionShapes(item);
    case 'conveyor':
      return conveyorShapes(item);
    case 'sectionLine':
      return sectionShapes(item);
    case 'note':
      return noteShapes(item);
  }
}

/** The chord of a turn is flattened to this many sides where a drawing has no circles. */
export const CIRCLE_SIDES = 72;

type Outlined = Fixture | Obstacle;

const onFloor = (item: Item, points: readonly PointMm[]): [number, number][] =>
  points.map((point) => itemToFloor(item, point));

function body(item: Item, layer: Layer, points: readonly PointMm[], zMm: number): Line {
  return { kind: 'line', layer, itemId: item.id, points: onFloor(item, points), closed: true, zMm, part: 'body' };
}

function detail(item: Item, layer: Layer, points: readonly PointMm[], part: Line['part'] = 'detail', zMm = 0): Line {
  return { kind: 'line', layer, itemId: item.id, points: onFloor(item, points), closed: false, zMm, part };
}

function name(item: Item, at: PointMm, text = item.name, angleDeg = 0): Words {
  return { kind: 'words', layer: 'NAMES', itemId: item.id, of: item.kind, at, angleDeg, text };
}

/** Below the lowest edge, where the eye looks for a name. */
function middleOf(item: Outlined): PointMm {
  const points = onFloor(item, item.outlineMm);
  const xs = points.map(([x]) => x);
  const ys = points.map(([, y]) => y);
  return [(Math.min(...xs) + Math.max(...xs)) / 2, Math.min(...ys)];
}

function robotShapes(robot: Robot, drawn: DrawnRobot | undefined): Shape[] {
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

function fixtureShapes(fixture: Fixture): Shape[] {
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

function guardShapes(guard: GuardLine): Shape[] {
  const points = onFloor(guard, guard.pointsMm);
  const corner = points.reduce((best, point) => (point[1] - point[0] > best[1] - best[0] ? point : best));
  if (guard.doors.length === 0) {
    const { closed } = guard;
    const whole: Line = { kind: 'line', layer: 'GUARD-LINES', itemId: guard.id, points, closed, zMm: 0, part: 'body' };
    return [whole, name(guard, corner)];
  }
  return [
    ...fenceStrokes(guard).map((stroke) => ({ ...detail(guard, 'GUARD-LINES', stroke), part: 'body' as const })),
    ...placedDoors(guard).map((placed) => detail(guard, 'GUARD-LINES', doorPath(placed))),
    name(guard, corner),
  ];
}

/** A hinged leaf standing open and the quarter circle that it swings through; a sliding one pushed half aside. */
function doorPath({ door, fromMm, toMm, opensTo }: PlacedDoor): PointMm[] {
  const [hinge, latch] = door.hinge === 'start' ? [fromMm, toMm] : [toMm, fromMm];
  const [wx, wy] = [latch[0] - hinge[0], latch[1] - hinge[1]];
  const width = Math.hypot(wx, wy);
  if (door.kind === 'sliding') {
    const at = (share: number): PointMm => [
      hinge[0] + wx * share + opensTo[0] * 40,
      hinge[1] + wy * share + opensTo[1] * 40,
    ];
    return [at(0.5), at(-0.5)];
  }
  const arc = Array.from({ length: SWING_SIDES + 1 }, (_, index): PointMm => {
    const turn = (index / SWING_SIDES) * (Math.PI / 2);
    const [along, across] = [Math.cos(turn), Math.sin(turn) * width];
    return [hinge[0] + wx * along + opensTo[0] * across, hinge[1] + wy * along + opensTo[1] * across];
  });
  return [...arc, hinge];
}

/** The quarter circle of a door leaf is flattened to this many sides. */
const SWING_SIDES = 12;

function walkwayShapes(walkway: Walkway): Shape[] {
  const edges = walkwayEdges(walkway.pointsMm, walkway.widthMm);
  const [first, second] = onFloor(walkway, walkway.pointsMm);
  const along = (Math.atan2(second[1] - first[1], second[0] - first[0]) * 180) / Math.PI;
  const words = walkway.name.includes(String(walkway.widthMm))
    ? walkway.name
    : `${walkway.name}, keep ${walkway.widthMm} mm clear`;
  return [
    ...edges.map((edge) => detail(walkway, 'WALKWAYS', edge)),
    name(walkway, [(first[0] + second[0]) / 2, (first[1] + second[1]) / 2], words, uprightDeg(along)),
  ];
}

function dimensionShapes(dimension: Dimension): Shape[] {
  const { fromMm, toMm, offsetMm } = dimension;
  const length = Math.hypot(toMm[0] - fromMm[0], toMm[1] - fromMm[1]);
  if (length === 0) return [];
  const [ux, uy] = [(toMm[0] - fromMm[0]) / length, (toMm[1] - fromMm[1]) / length];
  const off = ([x, y]: PointMm, by: number): PointMm => [x - uy * by, y + ux * by];
  const beyond = offsetMm + Math.sign(offsetMm || 1) * 40;
  const [from, to] = [off(fromMm, offsetMm), off(toMm, offsetMm)];
  const arrow = (tip: PointMm, direction: number): PointMm[] => {
    const size = Math.min(120, length / 4) * direction;
    const back: PointMm = [tip[0] + ux * size, tip[1] + uy * size];
    return [off(back, size / 4), tip, off(back, -size / 4)];
  };
  const turn = (Math.atan2(uy, ux) * 180) / Math.PI + dimension.angleDeg;
  const [middle] = onFloor(dimension, [[(from[0] + to[0]) / 2, (from[1] + to[1]) / 2]]);
  return [
    detail(dimension, 'DIMENSIONS', [fromMm, off(fromMm, beyond)]),
    detail(dimension, 'DIMENSIONS', [toMm, off(toMm, beyond)]),
    detail(dimension, 'DIMENSIONS', [from, to]),
    detail(dimension, 'DIMENSIONS', arrow(from, 1), 'arrow'),
    detail(dimension, 'DIMENSIONS', arrow(to, -1), 'arrow'),
    {
      kind: 'words',
      layer: 'DIMENSIONS',
      itemId: dimension.id,
      of: 'dimension',
      at: middle,
      angleDeg: uprightDeg(turn),
      text: String(Math.round(length)),
    },
  ];
}

function conveyorShapes(conveyor: Conveyor): Shape[] {
  const [left, right] = walkwayEdges(conveyor.pointsMm, conveyor.widthMm);
  const [before, last] = conveyor.pointsMm.slice(-2);
  const length = Math.hypot(last[0] - before[0], last[1] - before[1]) || 1;
  const [ux, uy] = [(last[0] - before[0]) / length, (last[1] - before[1]) / length];
  const size = Math.min(200, length / 3, conveyor.widthMm / 2);
  const wing = (side: number): PointMm => [
    last[0] - ux * size - uy * side * size * 0.4,
    last[1] - uy * size + ux * side * size * 0.4,
  ];
  const [first, second] = onFloor(conveyor, conveyor.pointsMm);
  const along = (Math.atan2(second[1] - first[1], second[0] - first[0]) * 180) / Math.PI;
  return [
    body(conveyor, 'CONVEYORS', [...left, ...[...right].reverse()], conveyor.zFromMm),
    detail(conveyor, 'CONVEYORS', [wing(1), last, wing(-1)], 'arrow', conveyor.zToMm),
    name(conveyor, [(first[0] + second[0]) / 2, (first[1] + second[1]) / 2], conveyor.name, uprightDeg(along)),
  ];
}

function sectionShapes(section: SectionLine): Shape[] {
  const words = (at: PointMm): Words => ({
    kind: 'words',
    layer: 'SECTIONS',
    itemId: section.id,
    of: 'sectionLine',
    at,
    angleDeg: 0,
    text: section.letter,
  });
  return [
    detail(section, 'SECTIONS', [section.fromMm, section.toMm]),
    ...onFloor(section, [section.fromMm, section.toMm]).map(words),
  ];
}

function noteShapes(note: Note): Shape[] {
  return noteLines(note).map((text, index): Words => {
    const [at] = onFloor(note, [[0, -note.sizeMm * (1 + index * LINE_PITCH)]]);
    return {
      kind: 'words',
      layer: 'NOTES',
      itemId: note.id,
      of: 'note',
      at,
      angleDeg: note.angleDeg,
      text,
      heightMm: note.sizeMm,
    };
  });
}

/** Within (−90, 90]: letters never stand on their heads. */
function uprightDeg(angleDeg: number): number {
  const wrapped = ((((angleDeg + 180) % 360) + 360) % 360) - 180;
  if (wrapped > 90) return wrapped - 180;
  return wrapped <= -90 ? wrapped + 180 : wrapped;
}
