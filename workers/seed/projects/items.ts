import { randomUUID } from 'node:crypto';
import type { z } from 'zod';
import { rectangleOutline } from '@/lib/layout/geometry';
import { fixtureSchema, robotSchema, type Item, type Robot, type taskPointSchema } from '@/lib/layout/items';

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

/** The items with their place in the list, which is the order they are given in. */
export const inOrder = (items: readonly Item[]): Item[] => items.map((item, order) => ({ ...item, order }));
