import { beforeEach, describe, expect, it } from 'vitest';
import { itemToFloor } from '@/lib/layout/geometry';
import { settledDimension } from '@/lib/layout/attached-dimensions';
import { toolAxes } from '@/lib/layout/tool-orientation';
import type { Dimension, Fixture, Item, Walkway } from '@/lib/layout/items';
import { duplicated, removed } from '../edits';
import { aimTowards, gripsOf, rollHeadingRad, type Grip } from '../grips';
import { newBlock, newDimension, newLine, newRobot, newTaskPoint } from '../make-items';
import { Sheet, shownItems } from '../sheet';
import { seeded } from '../testing/seeded';
import { dimensionTool } from './dimension';
import type { Press } from './tool';

const random = seeded(11);
let sheet: Sheet;
let fixture: Fixture;
let robot: Item;
let way: Walkway;

const open = (...items: Item[]) =>
  new Sheet({ layoutVersion: 1, items: items.map((item) => ({ version: 1, item })) }, random.id);

beforeEach(() => {
  fixture = newBlock(new Map(), 'fixture', { id: random.id(), xMm: 3000, yMm: 2000 }) as Fixture;
  robot = newRobot(new Map(), { id: random.id(), xMm: 500, yMm: 500 }, random.id());
  way = newLine(new Map(), 'walkway', random.id(), [[0, 9000], [4000, 9000]], false) as Walkway; // prettier-ignore
  sheet = open(fixture, robot, way);
});

const at = (xMm: number, yMm: number, rest: Partial<Press> = {}): Press => ({
  xMm,
  yMm,
  target: null,
  shift: false,
  alt: false,
  slackMm: 10,
  ...rest,
});
const hold = (item: Item, grip: Grip, xMm: number, yMm: number) =>
  sheet.press(at(xMm, yMm, { target: { part: 'grip', itemId: item.id, grip } }));
const now = <T extends Item>(item: T) => sheet.getState().items.get(item.id) as T;
const steps = () => sheet.getState().history.past.length;

/** The fixture is 1000 × 700 about (3000, 2000): its upper right corner, index 2, lies at (3500, 2350). */
describe('the outline of a body', () => {
  it('stays a rectangle while one corner is dragged, and the opposite one stays', () => {
    hold(fixture, { kind: 'corner', index: 2 }, 3500, 2350);
    sheet.move(at(3700, 2600));
    sheet.release(at(3800, 2650));
    expect(now(fixture).outlineMm).toEqual([
      [-500, -350],
      [800, -350],
      [800, 650],
      [-500, 650],
    ]);
    expect(steps()).toBe(1);
    sheet.undo();
    expect(now(fixture)).toEqual(fixture);
  });

  it('gets a new corner from the middle of a side by two clicks, without a drag', () => {
    hold(fixture, { kind: 'side', index: 1 }, 3500, 2000);
    sheet.release(at(3500, 2000));
    expect(sheet.getState().tool.name).toBe('outline');
    sheet.move(at(3900, 2000));
    expect(shownItems(sheet.getState()).get(fixture.id)).toMatchObject({ outlineMm: { length: 5 } });
    sheet.press(at(3900, 2000));
    sheet.release(at(3900, 2000));
    expect(now(fixture).outlineMm).toEqual([
      [-500, -350],
      [500, -350],
      [900, 0],
      [500, 350],
      [-500, 350],
    ]);
    expect(sheet.getState().tool.name).toBe('select');
  });

  it('is refused in words where it would cross itself, and stays as it was', () => {
    const house = { ...fixture, cornersFree: true };
    sheet = open(house);
    hold(house, { kind: 'corner', index: 2 }, 3500, 2350);
    sheet.release(at(1500, 1950));
    expect(now(house)).toEqual(house);
    expect(steps()).toBe(0);
    expect(sheet.getState().said?.words).toMatch(/cross\. Move a corner/);
  });

  it('is refused with no area, and taken back by Escape', () => {
    hold(fixture, { kind: 'corner', index: 2 }, 3500, 2350);
    sheet.release(at(2500, 2650));
    expect(now(fixture)).toEqual(fixture);
    expect(sheet.getState().said?.words).toMatch(/lie on one spot|cross|encloses no floor/);
    hold(fixture, { kind: 'corner', index: 2 }, 3500, 2350);
    sheet.move(at(3900, 2900));
    sheet.cancel();
    expect(shownItems(sheet.getState()).get(fixture.id)).toEqual(fixture);
    expect(sheet.getState().tool.name).toBe('select');
  });

  it('loses the corner in hand to Delete, down to three', () => {
    for (const left of [3, 3]) {
      hold(fixture, { kind: 'corner', index: 0 }, 2500, 1650);
      sheet.release(at(2500, 1650));
      expect(sheet.removeInHand()).toBe(true);
      expect(now(fixture).outlineMm).toHaveLength(left);
    }
    expect(sheet.getState().said?.words).toMatch(/at least three corners/);
    expect(sheet.removeInHand()).toBe(false);
  });

  it('has at most 200 corners', () => {
    const many = Array.from({ length: 200 }, (_, index): [number, number] => [
      Math.round(2000 * Math.cos((index / 100) * Math.PI)),
      Math.round(2000 * Math.sin((index / 100) * Math.PI)),
    ]);
    const round = { ...fixture, outlineMm: many };
    sheet = open(round);
    hold(round, { kind: 'side', index: 0 }, 5000, 2000);
    sheet.release(at(5200, 2030));
    expect(now(round).outlineMm).toHaveLength(200);
    expect(sheet.getState().said?.words).toMatch(/200/);
  });

  it('leaves locked things alone and lines have grips of their own', () => {
    const locked = { ...way, locked: true };
    sheet = open(locked);
    hold(locked, { kind: 'corner', index: 1 }, 4000, 9000);
    sheet.release(at(5000, 9500));
    expect(now(locked)).toEqual(locked);
    sheet = open(way);
    hold(way, { kind: 'corner', index: 1 }, 4000, 9000);
    sheet.release(at(5000, 9500));
    expect(now(way).pointsMm).toEqual([
      [0, 0],
      [5000, 500],
    ]);
  });
});

describe('the knobs of a task point', () => {
  const pxMm = 5;
  const withPoint = (patch: object) => {
    const point = { ...newTaskPoint(fixture, random.id(), [0, 0]), ...patch };
    return { ...fixture, angleDeg: 90, taskPoints: [point] };
  };

  it('aim the tool: the knob is found again where it was put', () => {
    const before = withPoint({});
    sheet = open(before);
    const [{ id }] = before.taskPoints;
    hold(before, { kind: 'aim', taskPointId: id, pxMm }, 3000, 2090);
    // 58 px out is half way from straight down (18 px) to straight up (98 px): level. The fixture is turned by 90°.
    sheet.release(at(3000 + 58 * pxMm, 2000));
    expect(now(before).taskPoints[0]).toMatchObject({ tiltDeg: 90, azimuthDeg: -90 });
    const [aim] = gripsOf(now(before), id, pxMm);
    const [x, y] = itemToFloor(before, aim.atMm);
    expect(x).toBeCloseTo(3000 + 58 * pxMm, 6);
    expect(y).toBeCloseTo(2000, 6);
    expect(aimTowards(0, 18 * pxMm, pxMm).tiltDeg).toBe(0);
    expect(aimTowards(0, 500 * pxMm, pxMm).tiltDeg).toBe(180);
  });

  it.each([
    [0, 0, 30],
    [40, 75, -120],
    [120, -30, 165],
  ])(
    'roll the tool about tilt %i and azimuth %i so that its x axis heads for %i',
    (tiltDeg, azimuthDeg, headingDeg) => {
      const before = { ...withPoint({ tiltDeg, azimuthDeg, rollDeg: 0 }), angleDeg: 0 };
      sheet = open(before);
      const [{ id }] = before.taskPoints;
      hold(before, { kind: 'roll', taskPointId: id, pxMm }, 3000, 2090);
      const heading = (headingDeg * Math.PI) / 180;
      sheet.release(at(3000 + 400 * Math.cos(heading), 2000 + 400 * Math.sin(heading), { alt: true }));
      const [after] = now(before).taskPoints;
      // Nothing else of the roll brings the axis nearer to the heading: the share along it is the largest there is.
      const along = (rollDeg: number) => {
        const { x } = toolAxes({ ...after, rollDeg });
        return x[0] * Math.cos(heading) + x[1] * Math.sin(heading);
      };
      const best = Math.max(...Array.from({ length: 3600 }, (_, tenth) => along(tenth / 10)));
      expect(along(Number(after.rollDeg))).toBeGreaterThanOrEqual(best - 1e-5);
      expect(rollHeadingRad(after)).not.toBeNull();
    },
  );

  it('show no roll where it is free', () => {
    const before = withPoint({ rollDeg: 'free' });
    expect(gripsOf(before, before.taskPoints[0].id, pxMm).map(({ grip }) => grip.kind)).toEqual(['aim']);
  });
});

describe('a dimension that follows', () => {
  const lengthNow = (dimension: Item) => {
    const { items } = sheet.getState();
    const settled = settledDimension(items.get(dimension.id) as Dimension, (id) => items.get(id));
    return Math.round(Math.hypot(settled.toMm[0] - settled.fromMm[0], settled.toMm[1] - settled.fromMm[1]));
  };
  const measure = () => {
    sheet.use(dimensionTool());
    for (const press of [
      at(505, 500, { target: { part: 'item', itemId: robot.id } }),
      at(3498, 2352, { target: { part: 'item', itemId: fixture.id } }),
      at(1500, 3000),
    ]) {
      sheet.press(press);
      sheet.release(press);
    }
    return [...sheet.getState().items.values()].at(-1) as Dimension;
  };
  const shift = (item: Item, xMm: number) => {
    const before = now(item);
    sheet.commit('Move', [{ itemId: item.id, before, after: { ...before, xMm } }]);
  };

  it('runs from a robot’s place to a fixture’s corner and follows both', () => {
    const dimension = measure();
    expect(dimension).toMatchObject({ fromItemId: robot.id, toItemId: fixture.id, toAnchorMm: [500, 350] });
    expect(lengthNow(dimension)).toBe(Math.round(Math.hypot(3000, 1850)));
    shift(robot, 1500);
    expect(lengthNow(dimension)).toBe(Math.round(Math.hypot(2000, 1850)));
  });

  it('stays where it stands when what it measures is deleted, and follows again after undo', () => {
    const dimension = measure();
    shift(robot, 1500);
    const before = lengthNow(dimension);
    sheet.commit('Delete', removed(sheet.getState().items, [robot.id]));
    expect(now(dimension).fromItemId).toBeUndefined();
    expect(lengthNow(dimension)).toBe(before);
    sheet.undo();
    shift(robot, 2500);
    expect(lengthNow(dimension)).toBe(Math.round(Math.hypot(1000, 1850)));
  });

  it('takes its copies along with copied items, and leaves alone what was not copied', () => {
    const dimension = measure();
    const alone = duplicated(sheet.getState().items, [dimension.id], 100, random.id).changes[0].after as Dimension;
    expect(alone.fromItemId ?? alone.toItemId).toBeUndefined();
    const { changes } = duplicated(sheet.getState().items, [robot.id, fixture.id, dimension.id], 100, random.id);
    const copies = changes.map(({ after }) => after as Item);
    expect(copies[2]).toMatchObject({ fromItemId: copies[0].id, toItemId: copies[1].id });
  });

  it('lets its end be moved to another item, or free with Alt; its body moves only the line', () => {
    const dimension = measure();
    hold(dimension, { kind: 'end', end: 'to' }, 3500, 2350);
    sheet.release(at(2502, 1648));
    expect(now(dimension)).toMatchObject({ toItemId: fixture.id, toAnchorMm: [-500, -350] });
    hold(dimension, { kind: 'end', end: 'to' }, 2500, 1650);
    sheet.release(at(2500, 900, { alt: true }));
    expect(now(dimension).toItemId).toBeUndefined();
    const { offsetMm } = now(dimension);
    sheet.press(at(1500, 3000, { target: { part: 'item', itemId: dimension.id } }));
    sheet.move(at(1500, 3400));
    sheet.release(at(1500, 3400));
    expect(now(dimension)).toMatchObject({ fromItemId: robot.id, fromAnchorMm: [0, 0] });
    expect(now(dimension).offsetMm).not.toBe(offsetMm);
  });

  it('is refused without length', () => {
    const flat = newDimension(sheet.getState().items, random.id(), [7000, 0], [8000, 0], 300) as Dimension;
    sheet = open(flat);
    hold(flat, { kind: 'end', end: 'to' }, 8000, 0);
    sheet.release(at(7000, 0));
    expect(now(flat)).toEqual(flat);
    expect(sheet.getState().said?.words).toMatch(/one spot/);
  });
});
