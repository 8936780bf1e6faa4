'use client';

import { useMemo } from 'react';
import { aligned, distributed, type Alignment, type Direction } from '@/lib/editor/arrange';
import { duplicated, editedTaskPoint, flagged, moved, removed, turnedBy, withoutTaskPoint } from '@/lib/editor/edits';
import { grouped, ungrouped } from '@/lib/editor/groups';
import { reorder } from '@/lib/editor/order';
import type { SheetState } from '@/lib/editor/sheet';
import { tidy } from '@/lib/editor/snapping';
import { named } from '@/lib/editor/tools/move';
import { chosen } from '@/lib/editor/tools/tool';
import { turned } from '@/lib/layout/geometry';
import type { Fixture, Item, TaskPoint } from '@/lib/layout/items';
import { useBoard } from './board-context';

/** A copy stands this far beside its original, mm. */
const COPY_OFFSET_MM = 250;
/** One arrow press without a grid to step on, mm and degrees. */
const FREE_STEP_MM = 10;
const FREE_STEP_DEG = 1;

interface ChosenTaskPoint {
  readonly fixture: Fixture;
  readonly point: TaskPoint;
}

/** The chosen task point and its fixture: keys then go to it and not to the fixture. */
function chosenTaskPoint({ items, selection }: SheetState): ChosenTaskPoint | null {
  const fixture = items.get(selection.itemIds[0]);
  if (!selection.taskPointId || fixture?.kind !== 'fixture') return null;
  const point = fixture.taskPoints.find(({ id }) => id === selection.taskPointId);
  return point ? { fixture, point } : null;
}

/** What can be done with the chosen items, each as one step of the history. */
export function useSelectionCommands() {
  const { sheet } = useBoard();
  return useMemo(() => {
    const selected = (): Item[] => {
      const { items, selection } = sheet.getState();
      return selection.itemIds.map((id) => items.get(id)).filter((item): item is Item => item !== undefined);
    };
    const ids = () => sheet.getState().selection.itemIds;
    const putFixture = (label: string, before: Fixture, after: Fixture) => {
      if (before.locked) return sheet.refuse(`${before.name} is locked. Unlock it first.`);
      sheet.commit(label, [{ itemId: before.id, before, after }]);
    };
    const shiftTaskPoint = ({ fixture, point }: ChosenTaskPoint, byXMm: number, byYMm: number) => {
      const [x, y] = turned([byXMm, byYMm], -fixture.angleDeg);
      const edit = editedTaskPoint(fixture, point.id, { xMm: tidy(point.xMm + x), yMm: tidy(point.yMm + y) });
      if (edit.ok) putFixture(`Move ${point.name}`, fixture, edit.value);
    };
    return {
      nudge(xSteps: number, ySteps: number) {
        const { items, snapping } = sheet.getState();
        const step = snapping.gridMm ?? FREE_STEP_MM;
        if (ids().length === 0) return;
        const point = chosenTaskPoint(sheet.getState());
        if (point) return shiftTaskPoint(point, xSteps * step, ySteps * step);
        sheet.commit(`Move ${named(selected())}`, moved(items, ids(), xSteps * step, ySteps * step));
      },
      turn(steps: number) {
        const { items, snapping } = sheet.getState();
        if (ids().length === 0) return;
        const byDeg = steps * (snapping.angleDeg ?? FREE_STEP_DEG);
        sheet.commit(`Turn ${named(selected())}`, turnedBy(items, ids(), byDeg));
      },
      remove() {
        if (sheet.removeInHand()) return;
        const { items } = sheet.getState();
        if (ids().length === 0) return;
        const point = chosenTaskPoint(sheet.getState());
        if (point)
          return putFixture(
            `Delete ${point.point.name}`,
            point.fixture,
            withoutTaskPoint(point.fixture, point.point.id),
          );
        const changes = removed(items, ids());
        if (changes.length === 0) return sheet.refuse('It is locked. Unlock it to delete it.');
        sheet.commit(`Delete ${named(selected())}`, changes);
      },
      duplicate() {
        const { items } = sheet.getState();
        if (ids().length === 0) return;
        const { changes, copies } = duplicated(items, ids(), COPY_OFFSET_MM, () => crypto.randomUUID());
        sheet.commit(`Duplicate ${named(selected())}`, changes, chosen(...copies));
      },
      reorder(itemId: string, by: -1 | 1) {
        const { items } = sheet.getState();
        const item = items.get(itemId);
        if (item) sheet.commit(`Move ${item.name} ${by < 0 ? 'up' : 'down'} the list`, reorder(items, itemId, by));
      },
      pickUp() {
        if (ids().length === 0) return sheet.refuse('Nothing is chosen.');
        if (selected().every(({ locked }) => locked)) return sheet.refuse('It is locked. Unlock it first.');
        sheet.pickUp();
      },
      align(alignment: Alignment) {
        const { items } = sheet.getState();
        sheet.commit(`Align ${named(selected())}`, aligned(items, ids(), alignment));
      },
      distribute(direction: Direction) {
        const { items } = sheet.getState();
        sheet.commit(`Space ${named(selected())} evenly`, distributed(items, ids(), direction));
      },
      group() {
        const { items } = sheet.getState();
        if (ids().length < 2) return sheet.refuse('Choose two items or more to group them.');
        sheet.commit(`Group ${named(selected())}`, grouped(items, ids(), crypto.randomUUID()));
      },
      ungroup() {
        const { items } = sheet.getState();
        sheet.commit(`Take the group of ${named(selected())} apart`, ungrouped(items, ids()));
      },
      /** Locks or hides what is chosen; where all of it is, the other way round. */
      toggle(flag: 'locked' | 'hidden') {
        const { items } = sheet.getState();
        if (ids().length === 0) return;
        const next = !selected().every((item) => item[flag]);
        const word = flag === 'locked' ? (next ? 'Lock' : 'Unlock') : next ? 'Hide' : 'Show';
        sheet.commit(`${word} ${named(selected())}`, flagged(items, ids(), { [flag]: next }));
      },
      selectAll() {
        const { items } = sheet.getState();
        sheet.select(chosen(...[...items.values()].filter(({ hidden }) => !hidden).map(({ id }) => id)));
      },
    };
  }, [sheet]);
}
