'use client';

import { useBoard, useBoardSheet } from '@/components/sheet/editor/board-context';
import { useVerdicts } from '@/components/sheet/editor/readings-context';
import { useUnits } from '@/lib/client/use-units';
import { placeWords } from '@/lib/editor/measure-text';
import { settledDimension } from '@/lib/layout/attached-dimensions';
import { distanceMm } from '@/lib/layout/geometry';
import type { Dimension, Item } from '@/lib/layout/items';
import { fixtureWords } from './verdict-order';

export interface ItemNote {
  readonly title: string;
  readonly words: string;
  readonly tone: 'figures' | 'soft' | 'red';
}

/** What the list says of an item: its name, and the one thing worth knowing about it. */
export function useItemNote(item: Item): ItemNote {
  const { arms } = useBoard();
  const { byPoint } = useVerdicts();
  // A number, so that the row of a dimension is drawn again only when its length changes.
  const lengthMm = useBoardSheet(({ items }) => (item.kind === 'dimension' ? lengthOf(item, items) : 0));
  const units = useUnits();
  const place = placeWords(item, units.unit);
  switch (item.kind) {
    case 'robot': {
      const arm = arms.get(item.armId)?.name;
      const title = arm ? `${item.name} · ${arm[0].toLowerCase()}${arm.slice(1)}` : item.name;
      return { title, words: place, tone: 'figures' };
    }
    case 'fixture': {
      const verdicts = item.taskPoints.flatMap(({ id }) => byPoint.get(id) ?? []);
      const { words, isTrouble } = fixtureWords(verdicts, item.taskPoints.length);
      return { title: item.name, words, tone: isTrouble ? 'red' : 'soft' };
    }
    case 'dimension':
      return { title: item.name, words: units.length(lengthMm), tone: 'figures' };
    case 'conveyor': {
      const speed = item.speedMmS === null ? 'speed not given' : `${units.length(item.speedMmS)}/s`;
      return { title: item.name, words: speed, tone: 'soft' };
    }
    case 'note':
      return { title: item.name, words: item.text.split('\n')[0].slice(0, 60), tone: 'soft' };
    case 'walkway':
      return { title: item.name, words: `keep ${units.length(item.widthMm)} clear`, tone: 'soft' };
    default:
      return { title: item.name, words: place, tone: 'figures' };
  }
}

function lengthOf(dimension: Dimension, items: ReadonlyMap<string, Item>): number {
  const { fromMm, toMm } = settledDimension(dimension, (id) => items.get(id));
  return distanceMm(fromMm, toMm);
}
