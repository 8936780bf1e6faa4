import { describe, expect, it } from 'vitest';
import type { Fixture } from '@/lib/layout/items';
import { newBlock, newTaskPoint } from './make-items';
import { placeSavedInView } from './place-in-view';
import { contentOf } from './saved-fixtures';
import { Sheet } from './sheet';
import { DEFAULT_SNAPPING } from './snapping';
import { seeded } from './testing/seeded';
import { savedFixtureTool } from './tools/place';

const random = seeded(21);

function saved() {
  const fixture = newBlock(new Map(), 'fixture', { id: random.id(), xMm: 3000, yMm: 2000 }) as Fixture;
  const point = { ...newTaskPoint(fixture, random.id(), [120, -40]), tiltDeg: 30, speedMmS: 250, dwellS: 2 };
  const content = contentOf({ ...fixture, angleDeg: 45, locked: true, taskPoints: [point] });
  return { id: random.id(), name: 'Drawer tray', content, updatedAt: new Date(0).toISOString() };
}

describe('a fixture of the library', () => {
  it('keeps nothing of where it stood', () => {
    expect(Object.keys(saved().content).sort()).toEqual(
      ['outlineMm', 'taskPaths', 'taskPatterns', 'taskPoints', 'zFromMm', 'zToMm'].sort(),
    );
  });

  it('is placed as a copy with its task points, ids of its own and a free name', () => {
    const library = saved();
    const sheet = new Sheet({ layoutVersion: 1, items: [] }, random.id);
    for (const xMm of [1020, 4000]) {
      sheet.use(savedFixtureTool(library));
      const press = { xMm, yMm: 1980, target: null, shift: false, alt: false, slackMm: 10 };
      sheet.move(press);
      sheet.press(press);
      sheet.release(press);
    }
    const [first, second] = [...sheet.getState().items.values()] as Fixture[];
    expect(first).toMatchObject({ name: 'Drawer tray', xMm: 1000, yMm: 2000, angleDeg: 0, locked: false });
    expect(second.name).toBe('Drawer tray 2');
    const [original] = library.content.taskPoints;
    for (const { taskPoints } of [first, second]) {
      expect(taskPoints[0]).toEqual({ ...original, id: taskPoints[0].id });
      expect(taskPoints[0].id).not.toBe(original.id);
    }
    expect(first.taskPoints[0].id).not.toBe(second.taskPoints[0].id);
    sheet.undo();
    expect(sheet.getState().items.size).toBe(1);
  });

  it('is placed by keyboard in the middle of the view', () => {
    const order = { middle: { xMm: 510, yMm: 490 }, snapping: DEFAULT_SNAPPING, newId: random.id };
    const { changes, selection } = placeSavedInView(new Map(), saved(), order);
    expect(changes[0].after).toMatchObject({ kind: 'fixture', xMm: 500, yMm: 500 });
    expect(selection.itemIds).toEqual([changes[0].itemId]);
  });
});
