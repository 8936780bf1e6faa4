import { randomUUID } from 'node:crypto';
import type { z } from 'zod';
import { rectangleOutline } from '@/lib/layout/geometry';
import {
  fixtureSchema,
  robotSchema,
  type Item,
  type Robot,
  type SequenceStep,
  type taskPatternSchema,
  type taskPointSchema,
} from '@/lib/layout/items';

/** x and y on the floor (mm) and the turn (degrees). */
export type Place = readonly [xMm: number, yMm: number, angleDeg: number];

export const at = ([xMm, yMm, angleDeg]: Place) => ({ id: randomUUID(), xMm, yMm, angleDeg });

/** A straight gripper, 180 mm from the flange to the tool point. */
const GRIPPER = { name: 'Gripper', zMm: 180, massKg: 2.4 };

export function robot(name: string, armId: string, place: Place, riserMm: number): Robot {
  return robotSchema.parse({ kind: 'robot', name, armId, riserMm, tool: GRIPPER, ...at(place) });
}

type TaskPointInput = z.input<typeof taskPointSchema>;
/** In the fixture's frame, mm; z above the floor. */
type PointRow = readonly [name: string, xMm: number, yMm: number, zMm: number, more?: Partial<TaskPointInput>];

/** A box, width × depth × height in mm, with its task points, which are worked through from `firstOrder` on. */
export function fixture(
  name: string,
  place: Place,
  [widthMm, depthMm, zToMm]: readonly [number, number, number],
  points: readonly PointRow[],
  firstOrder: number,
): Item {
  const taskPoints = points.map(([pointName, xMm, yMm, zMm, more], index): TaskPointInput => ({
    id: randomUUID(),
    name: pointName,
    xMm,
    yMm,
    zMm,
    order: firstOrder + index,
    ...more,
  }));
  const outlineMm = rectangleOutline(widthMm, depthMm);
  return fixtureSchema.parse({ kind: 'fixture', name, ...at(place), outlineMm, zToMm, taskPoints });
}

type PatternInput = Omit<z.input<typeof taskPatternSchema>, 'id'>;

/** A fixture with places in rows and columns on it. */
export function withPattern(item: Item, pattern: PatternInput): Item {
  return fixtureSchema.parse({ ...item, taskPatterns: [{ id: randomUUID(), ...pattern }] });
}

/** Seconds that the gripper takes to close or open. */
const GRIP_S = 0.4;

/** A robot that goes from task point to task point by name, straight where `!` stands before the name, and grips where it is `grip`. */
export function withSequence(
  robotItem: Robot,
  names: readonly string[],
  items: readonly Item[],
  targetCycleS: number,
): Robot {
  const sequence = names.map((name): SequenceStep => {
    const id = randomUUID();
    if (name === 'grip') return { kind: 'wait', id, cause: 'grip', name: 'Grip', seconds: GRIP_S };
    for (const item of items) {
      const point = item.kind === 'fixture' && item.taskPoints.find((each) => each.name === name.replace('!', ''));
      if (!point) continue;
      const motion = name.startsWith('!') ? 'straight' : 'joint';
      return { kind: 'point', id, fixtureId: item.id, taskPointId: point.id, place: null, motion, viaMm: [] };
    }
    throw new Error(`There is no task point ${name} in the demo layout`);
  });
  return { ...robotItem, sequence, targetCycleS };
}

/** The items with their place in the list, which is the order they are given in. */
export const inOrder = (items: readonly Item[]): Item[] => items.map((item, order) => ({ ...item, order }));
