import { randomUUID } from 'node:crypto';
import { rectangleOutline } from '@/lib/layout/geometry';
import {
  conveyorSchema,
  dimensionSchema,
  guardLineSchema,
  noteSchema,
  obstacleSchema,
  walkwaySchema,
  type Item,
  type Robot,
} from '@/lib/layout/items';
import type { Hall } from './draw-hall';
import { at, fixture, robot, withPattern, withSequence, type Place } from './items';

/** All invented. The origin is the crossing of two building axes outside the hall. */
export const PUMP_HALL: Hall = {
  left: 700,
  right: 8300,
  near: 900,
  far: 7100,
  aisle: 2250,
  door: { x: 6400, width: 900 },
  title: 'Quillfen Pumps, hall 2, bay 4, dimensions in mm',
};

const RISER_MM = 350;

/** Where the robots stand in the variants: first one alone in the middle, then two, then the second one turned in. */
export const PLACES = {
  alone: [4900, 3780, 90],
  r1: [3720, 3920, 17],
  r2FaceToFace: [6400, 3140, -166],
  r2TurnedIn: [6100, 3740, 150],
} as const satisfies Record<string, Place>;

export const pumpRobot = (name: string, armId: string, place: Place) => robot(name, armId, place, RISER_MM);

/** What the robots go through in a cycle: R1 feeds the fixture and clears it, R2 deburrs and sets down. */
export const R1_STEPS = ['Infeed 1', 'grip', 'Fixture A 1', '!Fixture A 2', '!Fixture A 3', 'grip', 'Outfeed 1'];
export const R2_STEPS = ['Deburr 2', 'Deburr 1', 'grip', 'Outfeed 2', 'grip'];
const TARGET_CYCLE_S = 12;

export const working = (item: Robot, steps: readonly string[], items: readonly Item[]): Robot =>
  withSequence(item, steps, items, TARGET_CYCLE_S);

/** The distance between the robots along x. */
export function robotsApart(fromXMm: number, toXMm: number): Item {
  return dimensionSchema.parse({
    kind: 'dimension',
    name: 'Robots apart',
    ...at([fromXMm, 5530, 0]),
    fromMm: [0, 0],
    toMm: [toXMm - fromXMm, 0],
    offsetMm: 370,
  });
}

/** How far the cabinet stands off the guard line: it follows the cabinet wherever that goes. */
function cabinetDepth(cabinet: Item): Item {
  return dimensionSchema.parse({
    kind: 'dimension',
    name: 'Cabinet depth',
    ...at([850, 3850, 0]),
    fromMm: [0, 0],
    toMm: [500, 0],
    offsetMm: 250,
    fromItemId: cabinet.id,
    fromAnchorMm: [-250, 450],
    toItemId: cabinet.id,
    toAnchorMm: [250, 450],
  });
}

function stations(): Item[] {
  return [
    fixture(
      'Fixture A · pump housing',
      [4490, 4430, -12],
      [1100, 640, 820],
      [
        ['Fixture A 1', -322, 187, 850, { speedMmS: 400, dwellS: 1.5 }],
        ['Fixture A 2', -73, -52, 850, { speedMmS: 400, dwellS: 1.5 }],
        ['Fixture A 3', 312, 10, 850, { speedMmS: 400, dwellS: 1.5 }],
      ],
      20,
    ),
    withPattern(
      fixture(
        'Infeed tray',
        [3090, 5230, 8],
        [840, 840, 800],
        [
          ['Infeed 1', -60, -230, 850, { speedMmS: 250, dwellS: 0.5 }],
          ['Infeed 2', 180, -60, 850, { speedMmS: 250, dwellS: 0.5 }],
        ],
        10,
      ),
      {
        name: 'Housing nests',
        xMm: -60,
        yMm: -290,
        zMm: 850,
        rows: 2,
        columns: 3,
        pitchXMm: 120,
        pitchYMm: 110,
        speedMmS: 250,
        numbering: 'snake',
        order: 12,
      },
    ),
    fixture(
      'Deburr stand',
      [6920, 4400, -4],
      [700, 1200, 900],
      [
        ['Deburr 1', -65, 315, 950, { speedMmS: 300, dwellS: 2 }],
        ['Deburr 2', -95, -200, 950, { tiltDeg: 15, speedMmS: 300, dwellS: 2 }],
      ],
      50,
    ),
    fixture(
      'Outfeed conveyor',
      [5250, 2840, 0],
      [1700, 420, 760],
      [
        ['Outfeed 1', -770, 60, 800, { speedMmS: 250 }],
        ['Outfeed 2', 650, 0, 800, { speedMmS: 250 }],
      ],
      30,
    ),
  ];
}

function surroundings(): Item[] {
  const cabinet = obstacleSchema.parse({
    kind: 'obstacle',
    name: 'Control cabinet',
    ...at([1100, 3400, 0]),
    outlineMm: rectangleOutline(500, 900),
    zToMm: 2000,
  });
  return [
    cabinet,
    guardLineSchema.parse({
      kind: 'guardLine',
      name: 'Perimeter guard',
      ...at([1500, 2440, 0]),
      pointsMm: [
        [0, 0],
        [6100, 0],
        [6100, 3910],
        [0, 3910],
      ],
      heightMm: 2000,
      doors: [{ id: randomUUID(), name: 'Service door', alongMm: 12_010, widthMm: 700, kind: 'hinged-out' }],
    }),
    walkwaySchema.parse({
      kind: 'walkway',
      name: 'Aisle, keep 1200 mm clear',
      ...at([PUMP_HALL.left, 1650, 0]),
      pointsMm: [
        [0, 0],
        [PUMP_HALL.right - PUMP_HALL.left, 0],
      ],
      widthMm: 1200,
    }),
    conveyorSchema.parse({
      kind: 'conveyor',
      name: 'Infeed belt',
      ...at([1000, 5340, 0]),
      pointsMm: [
        [0, 0],
        [1560, 0],
      ],
      widthMm: 420,
      zFromMm: 560,
      zToMm: 780,
      speedMmS: 180,
    }),
    obstacleSchema.parse({
      kind: 'obstacle',
      form: 'column',
      name: 'Column B3',
      ...at([7950, 5000, 0]),
      outlineMm: rectangleOutline(300, 300),
      zToMm: 5200,
    }),
    noteSchema.parse({
      kind: 'note',
      name: 'Note on the belt',
      ...at([900, 6000, 0]),
      text: 'Housings in,\none every 40 s',
      sizeMm: 90,
    }),
    cabinetDepth(cabinet),
  ];
}

/** Everything but the robots: the same in every variant. */
export const pumpStations = (): Item[] => [...stations(), ...surroundings()];
