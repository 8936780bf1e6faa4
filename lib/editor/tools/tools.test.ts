import { beforeEach, describe, expect, it } from 'vitest';
import type { Fixture, Item } from '@/lib/layout/items';
import { grouped } from '../groups';
import { newBlock, newRobot } from '../make-items';
import { Sheet, shownItems } from '../sheet';
import { seeded } from '../testing/seeded';
import { dimensionTool } from './dimension';
import { lineTool } from './line';
import { blockTool, plumbTool, robotTool, taskPointTool } from './place';
import type { Press, Target, Tool } from './tool';

const random = seeded(5);
const ARM = random.id();

let sheet: Sheet;
let robot: Item;
let fixture: Fixture;

beforeEach(() => {
  robot = newRobot(new Map(), { id: random.id(), xMm: 1000, yMm: 1000 }, ARM);
  fixture = newBlock(new Map(), 'fixture', { id: random.id(), xMm: 3000, yMm: 2000 }) as Fixture;
  sheet = new Sheet({ layoutVersion: 1, items: [robot, fixture].map((item) => ({ version: 1, item })) }, random.id);
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
const on = (item: Item): Target => ({ part: 'item', itemId: item.id });
const now = (item: Item) => sheet.getState().items.get(item.id);
const shown = (item: Item) => shownItems(sheet.getState()).get(item.id);
const steps = () => sheet.getState().history.past.length;

function drag(from: Press, ...way: Press[]): void {
  sheet.press(from);
  for (const press of way) sheet.move(press);
  sheet.release(way.at(-1) ?? from);
}
function click(tool: Tool | null, ...spots: Press[]): void {
  if (tool) sheet.use(tool);
  for (const spot of spots) drag(spot);
}

describe('choosing and moving', () => {
  it('drags an item onto the grid as one step', () => {
    drag(at(1000, 1000, { target: on(robot) }), at(1200, 1000), at(1312, 1490));
    expect(now(robot)).toMatchObject({ xMm: 1300, yMm: 1500 });
    expect(steps()).toBe(1);
    expect(sheet.getState().selection.itemIds).toEqual([robot.id]);
  });

  it('moves freely while snapping is suspended, and along one axis with Shift', () => {
    drag(at(1000, 1000, { target: on(robot) }), at(1012.3, 1033.339, { alt: true }));
    expect(now(robot)).toMatchObject({ xMm: 1012.3, yMm: 1033.34 });
    drag(at(1000, 1000, { target: on(fixture) }), at(1510, 1300, { shift: true }));
    expect(now(fixture)).toMatchObject({ xMm: 3500, yMm: 2000 });
  });

  it('returns to exactly the start when cancelled in the middle', () => {
    const before = sheet.getState().items;
    sheet.press(at(1000, 1000, { target: on(robot) }));
    sheet.move(at(2000, 2000));
    expect(shown(robot)).toMatchObject({ xMm: 2000, yMm: 2000 });
    sheet.cancel();
    expect(sheet.getState().items).toBe(before);
    expect(shown(robot)).toBe(robot);
    sheet.release(at(2000, 2000));
    expect(steps()).toBe(0);
  });

  it('leaves no step behind a shaky click', () => {
    drag(at(1000, 1000, { target: on(robot) }), at(1004, 1003));
    expect(steps()).toBe(0);
    expect(sheet.getState().selection.itemIds).toEqual([robot.id]);
  });

  it('moves several together and keeps their distance', () => {
    sheet.select({ itemIds: [robot.id, fixture.id], taskPointId: null });
    drag(at(1000, 1000, { target: on(robot) }), at(1510, 1000));
    expect(now(robot)).toMatchObject({ xMm: 1500 });
    expect(now(fixture)).toMatchObject({ xMm: 3500 });
    expect(steps()).toBe(1);
  });

  it('leaves locked items where they are', () => {
    const locked = { ...robot, locked: true };
    sheet.commit('Lock', [{ itemId: robot.id, before: robot, after: locked }]);
    drag(at(1000, 1000, { target: on(robot) }), at(2000, 1000));
    expect(now(robot)).toEqual(locked);
  });

  it('chooses with Shift and with a marquee, and nothing on an empty click', () => {
    click(null, at(1000, 1000, { target: on(robot) }), at(3000, 2000, { target: on(fixture), shift: true }));
    expect(sheet.getState().selection.itemIds).toEqual([robot.id, fixture.id]);
    click(null, at(6000, 6000));
    expect(sheet.getState().selection.itemIds).toEqual([]);
    drag(at(2000, 1000), at(4000, 3000));
    expect(sheet.getState().selection.itemIds).toEqual([fixture.id]);
  });

  it('turns by the handle in steps of fifteen degrees', () => {
    sheet.select({ itemIds: [robot.id], taskPointId: null });
    const target: Target = { part: 'turn', itemId: robot.id };
    drag(at(1500, 1000, { target }), at(1000, 1500), at(1000 - 480, 1020));
    expect(now(robot)?.angleDeg).toBe(180);
    drag(at(1500, 1000, { target }), at(1500, 1130));
    expect(now(robot)?.angleDeg).toBe(-165);
  });
});

describe('placing', () => {
  it('places a robot on the grid, chooses it and rests', () => {
    sheet.use(robotTool(ARM));
    sheet.move(at(5020, 4980));
    expect(shownItems(sheet.getState()).size).toBe(3);
    expect(sheet.getState().items.size).toBe(2);
    click(null, at(5020, 4980));
    const [placed] = [...sheet.getState().items.values()].slice(-1);
    expect(placed).toMatchObject({ kind: 'robot', name: 'R2', xMm: 5000, yMm: 5000, armId: ARM });
    expect(sheet.getState()).toMatchObject({ selection: { itemIds: [placed.id] }, draft: null });
    expect(sheet.getState().tool.name).toBe('select');
    sheet.undo();
    expect(sheet.getState().items.size).toBe(2);
  });

  it('drops the tool on Escape and places nothing', () => {
    sheet.use(robotTool(ARM));
    sheet.move(at(5000, 5000));
    sheet.cancel();
    expect(sheet.getState().tool.name).toBe('select');
    expect(shownItems(sheet.getState()).size).toBe(2);
  });

  it('draws a fixture to size, or places the usual one on a click', () => {
    sheet.use(blockTool('fixture'));
    drag(at(0, 0), at(1210, 790));
    expect([...sheet.getState().items.values()].at(-1)).toMatchObject({
      xMm: 600,
      yMm: 400,
      outlineMm: [
        [-600, -400],
        [600, -400],
        [600, 400],
        [-600, 400],
      ],
    });
    click(blockTool('obstacle'), at(100, 100));
    expect([...sheet.getState().items.values()].at(-1)).toMatchObject({ kind: 'obstacle', xMm: 100, yMm: 100 });
  });

  it('draws a guard line corner by corner and closes it on the first', () => {
    click(lineTool('guardLine'), at(0, 0), at(5000, 0), at(5000, 4000), at(3, 2));
    expect([...sheet.getState().items.values()].at(-1)).toMatchObject({
      kind: 'guardLine',
      closed: true,
      pointsMm: [
        [0, 0],
        [5000, 0],
        [5000, 4000],
      ],
    });
    expect(steps()).toBe(1);
  });

  it('draws a guard line as a rectangle with one drag', () => {
    sheet.use(lineTool('guardLine'));
    drag(at(500, 500), at(2000, 1000), at(6000, 4500));
    expect([...sheet.getState().items.values()].at(-1)).toMatchObject({
      pointsMm: [
        [0, 0],
        [5500, 0],
        [5500, 4000],
        [0, 4000],
      ],
    });
  });

  it('ends a walkway with Enter and refuses one of a single point', () => {
    click(lineTool('walkway'), at(0, 0));
    sheet.finish();
    expect(sheet.getState().said?.words).toMatch(/at least two points/);
    click(null, at(4000, 30, { shift: true }));
    sheet.finish();
    expect([...sheet.getState().items.values()].at(-1)).toMatchObject({
      kind: 'walkway',
      pointsMm: [
        [0, 0],
        [4000, 0],
      ],
      widthMm: 1200,
    });
  });

  it('puts a task point into the frame of the fixture under it and stays in hand', () => {
    const turned = { ...fixture, angleDeg: 90 };
    sheet.commit('Turn', [{ itemId: fixture.id, before: fixture, after: turned }]);
    click(taskPointTool(), at(3100, 2200));
    // The fixture's x axis points away after a quarter turn, so 200 mm away is its x and 100 mm right its −y.
    expect(now(fixture)).toMatchObject({ taskPoints: [{ name: 'Fixture A 1', xMm: 200, yMm: -100, zMm: 850 }] });
    expect(sheet.getState().tool.name).toBe('taskPoint');
    expect(sheet.getState().selection.itemIds).toEqual([fixture.id]);
    click(null, at(9000, 9000));
    expect(sheet.getState().said?.words).toMatch(/belongs to a fixture/);
  });

  it('measures between two robots and stands the line off', () => {
    click(dimensionTool(), at(990, 1010, { target: on(robot) }), at(3000, 2040), at(1500, 3000));
    expect([...sheet.getState().items.values()].at(-1)).toMatchObject({
      kind: 'dimension',
      xMm: 1000,
      yMm: 1000,
      fromMm: [0, 0],
      toMm: [2000, 1050],
    });
  });

  it('draws the plumb along without changing anything', () => {
    sheet.use(plumbTool());
    sheet.press(at(100.4, 200.2));
    sheet.move(at(150.6, 200.2));
    expect(sheet.getState().plumb).toEqual({ xMm: 151, yMm: 200 });
    sheet.release(at(150.6, 200.2));
    expect(steps()).toBe(0);
  });
});

describe('groups, and carrying without a drag', () => {
  const group = () => sheet.commit('Group', grouped(sheet.getState().items, [robot.id, fixture.id], random.id()));

  it('chooses a group by any member, and with a second click the member', () => {
    group();
    click(null, at(1000, 1000, { target: on(robot) }));
    expect([...sheet.getState().selection.itemIds].sort()).toEqual([robot.id, fixture.id].sort());
    click(null, at(1000, 1000, { target: on(robot) }));
    expect(sheet.getState().selection.itemIds).toEqual([robot.id]);
  });

  it('moves a group by any member as one step', () => {
    group();
    drag(at(1000, 1000, { target: on(robot) }), at(1500, 1000));
    expect([now(robot)?.xMm, now(fixture)?.xMm]).toEqual([1500, 3500]);
    expect(steps()).toBe(2);
  });

  it('picks up, follows the pointer with no button held, and puts down with a click', () => {
    sheet.select({ itemIds: [robot.id], taskPointId: null });
    sheet.pickUp();
    sheet.move(at(1700, 1700));
    expect(shown(robot)).toMatchObject({ xMm: 1700, yMm: 1700 });
    expect(now(robot)).toMatchObject({ xMm: 1000 });
    click(null, at(2000, 1500));
    expect(now(robot)).toMatchObject({ xMm: 2000, yMm: 1500 });
    expect(steps()).toBe(1);
    expect(sheet.getState().tool.name).toBe('select');
  });

  it('is put back where it was by Escape', () => {
    sheet.select({ itemIds: [robot.id], taskPointId: null });
    sheet.pickUp();
    sheet.move(at(1700, 1700));
    sheet.cancel();
    expect(shown(robot)).toMatchObject({ xMm: 1000, yMm: 1000 });
    expect([steps(), sheet.getState().tool.name, sheet.getState().draft]).toEqual([0, 'select', null]);
  });

  it('shows a guide while something snaps to an edge, and none once it is down or Alt is held', () => {
    sheet.press(at(1000, 1000, { target: on(robot), slackMm: 20 }));
    sheet.move(at(1000, 1990, { slackMm: 20 }));
    expect(sheet.getState().guides).toMatchObject([{ axis: 'y', atMm: 2000 }]);
    sheet.move(at(1000, 1990, { slackMm: 20, alt: true }));
    expect(sheet.getState().guides).toEqual([]);
    sheet.move(at(1000, 1990, { slackMm: 20 }));
    sheet.release(at(1000, 1990, { slackMm: 20 }));
    expect(sheet.getState().guides).toEqual([]);
  });
});
