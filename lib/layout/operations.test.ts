import { describe, expect, it } from 'vitest';
import { applyOperations, type StoredItem } from './operations';
import { rectangleOutline } from './geometry';
import { obstacleSchema, type Item } from './items';

const ids = {
  column: '3f0c2c8e-6a55-4d0b-8a55-64a8c0a0d001',
  cabinet: '3f0c2c8e-6a55-4d0b-8a55-64a8c0a0d002',
};

function block(id: string, xMm = 0): Item {
  return obstacleSchema.parse({
    kind: 'obstacle',
    id,
    name: 'Block',
    xMm,
    yMm: 0,
    angleDeg: 0,
    zToMm: 900,
    outlineMm: rectangleOutline(400, 400),
  });
}

const sheet: StoredItem[] = [
  { version: 3, item: block(ids.column) },
  { version: 1, item: block(ids.cabinet) },
];

describe('a batch of edits', () => {
  it('puts, adds and removes, and counts versions on', () => {
    const { items, conflicts } = applyOperations(
      [sheet[0]],
      [
        { type: 'put', baseVersion: 3, item: block(ids.column, 500) },
        { type: 'put', baseVersion: 0, item: block(ids.cabinet) },
      ],
    );
    expect(conflicts).toEqual([]);
    expect(items).toEqual([
      { version: 4, item: block(ids.column, 500) },
      { version: 1, item: block(ids.cabinet) },
    ]);
    expect(applyOperations(sheet, [{ type: 'remove', baseVersion: 1, itemId: ids.cabinet }]).items).toEqual([sheet[0]]);
  });

  it('leaves the sheet it was given as it was', () => {
    const before = structuredClone(sheet);
    applyOperations(sheet, [{ type: 'remove', baseVersion: 3, itemId: ids.column }]);
    expect(sheet).toEqual(before);
  });

  it('applies nothing when one edit is stale, and shows the newer item', () => {
    const { items, conflicts } = applyOperations(sheet, [
      { type: 'put', baseVersion: 2, item: block(ids.column, 500) },
      { type: 'put', baseVersion: 1, item: block(ids.cabinet, 500) },
    ]);
    expect(items).toEqual(sheet);
    expect(conflicts).toEqual([{ itemId: ids.column, current: sheet[0] }]);
  });

  it('conflicts with a removal, and with an item that is already there', () => {
    const gone = applyOperations([sheet[0]], [{ type: 'put', baseVersion: 1, item: block(ids.cabinet) }]);
    expect(gone.conflicts).toEqual([{ itemId: ids.cabinet, current: null }]);
    const twice = applyOperations(sheet, [{ type: 'put', baseVersion: 0, item: block(ids.cabinet) }]);
    expect(twice.conflicts).toEqual([{ itemId: ids.cabinet, current: sheet[1] }]);
    const removedTwice = applyOperations([sheet[0]], [{ type: 'remove', baseVersion: 1, itemId: ids.cabinet }]);
    expect(removedTwice.conflicts).toEqual([{ itemId: ids.cabinet, current: null }]);
  });

  it('may edit one item several times', () => {
    const { items, conflicts } = applyOperations(sheet, [
      { type: 'put', baseVersion: 3, item: block(ids.column, 100) },
      { type: 'put', baseVersion: 3, item: block(ids.column, 200) },
      { type: 'remove', baseVersion: 1, itemId: ids.cabinet },
      { type: 'put', baseVersion: 0, item: block(ids.cabinet, 7) },
    ]);
    expect(conflicts).toEqual([]);
    expect(items).toContainEqual({ version: 5, item: block(ids.column, 200) });
    expect(items).toContainEqual({ version: 3, item: block(ids.cabinet, 7) });
  });

  it('counts on from the last version when a removed item comes back', () => {
    const { items } = applyOperations(
      [],
      [{ type: 'put', baseVersion: 0, item: block(ids.column) }],
      new Map([[ids.column, 6]]),
    );
    expect(items).toEqual([{ version: 7, item: block(ids.column) }]);
  });
});
