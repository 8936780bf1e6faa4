import { describe, expect, it } from 'vitest';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { newBlock } from './make-items';
import { Sheet } from './sheet';
import { randomEdit } from './testing/random-edits';
import { seeded } from './testing/seeded';

describe('the history of a sheet', () => {
  it.each([1, 2, 3, 4, 5])('takes back 1,000 random operations to the start and forth to the end (seed %i)', (seed) => {
    const random = seeded(seed);
    const sheet = new Sheet({ layoutVersion: 1, items: [] }, random.id);
    for (let count = 0; count < 20; count += 1) randomEdit(random, sheet);
    const begin = new Sheet(
      { layoutVersion: 1, items: [...sheet.getState().items.values()].map((item) => ({ version: 1, item })) },
      random.id,
    );
    const start = begin.getState().items;
    let made = 0;
    while (made < 1000) if (randomEdit(random, begin)) made += 1;
    const end = begin.getState().items;
    expect(begin.getState().history.past).toHaveLength(1000);

    for (let count = 0; count < 1000; count += 1) begin.undo();
    expect(new Map(begin.getState().items)).toEqual(new Map(start));
    expect(begin.getState().history.past).toHaveLength(0);
    for (let count = 0; count < 1000; count += 1) begin.redo();
    expect(new Map(begin.getState().items)).toEqual(new Map(end));
  });

  it('takes one step back and forth anywhere in a random walk', () => {
    const random = seeded(99);
    const sheet = new Sheet({ layoutVersion: 1, items: [] }, random.id);
    for (let count = 0; count < 300; count += 1) {
      const before = sheet.getState().items;
      if (!randomEdit(random, sheet)) continue;
      const after = sheet.getState().items;
      sheet.undo();
      expect(new Map(sheet.getState().items)).toEqual(new Map(before));
      sheet.redo();
      expect(new Map(sheet.getState().items)).toEqual(new Map(after));
    }
  });

  it('drops what could be redone once something new is done', () => {
    const random = seeded(7);
    const sheet = new Sheet({ layoutVersion: 1, items: [] }, random.id);
    randomEdit(random, sheet);
    sheet.undo();
    randomEdit(random, sheet);
    expect(sheet.getState().history.future).toHaveLength(0);
  });

  it('keeps what a colleague changed in other fields when a move is undone', () => {
    const random = seeded(3);
    const fixture = newBlock(new Map(), 'fixture', { id: random.id(), xMm: 100, yMm: 200 });
    const sheet = new Sheet({ layoutVersion: 1, items: [{ version: 1, item: fixture }] }, random.id);
    sheet.commit('Move', [{ itemId: fixture.id, before: fixture, after: { ...fixture, xMm: 900 } }]);
    sheet.depart(random.id());
    sheet.acknowledge({ layoutVersion: 2, items: [{ id: fixture.id, version: 2 }] });
    sheet.merge({
      layoutVersion: 3,
      items: [{ version: 3, item: { ...fixture, xMm: 900, name: 'Infeed tray' } }],
      removed: [],
      mapSettings: mapSettingsSchema.parse({}),
      floorPlanId: null,
    });
    sheet.undo();
    expect(sheet.getState().items.get(fixture.id)).toMatchObject({ xMm: 100, name: 'Infeed tray' });
  });
});
