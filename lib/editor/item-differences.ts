import type { Item } from '@/lib/layout/items';
import { printed } from './measure-text';
import { same } from './same';

export interface ItemDifference {
  readonly what: string;
  readonly left: string;
  readonly right: string;
}

/** Fields of an item in words, in the order in which they are told. */
const WORDS: readonly (readonly [string, string])[] = [
  ['name', 'Name'],
  ['xMm', 'x'],
  ['yMm', 'y'],
  ['angleDeg', 'Angle'],
  ['armId', 'Arm'],
  ['riserMm', 'Riser'],
  ['tool', 'Tool'],
  ['part', 'Part'],
  ['wristRating', 'Wrist rating'],
  ['sequence', 'Steps of the cycle'],
  ['targetCycleS', 'Target cycle (s)'],
  ['zFromMm', 'Bottom'],
  ['zToMm', 'Top'],
  ['outlineMm', 'Outline'],
  ['pointsMm', 'Corners'],
  ['taskPoints', 'Task points'],
  ['taskPaths', 'Task paths'],
  ['taskPatterns', 'Task patterns'],
  ['heightMm', 'Height'],
  ['widthMm', 'Clear width'],
  ['closed', 'Closed'],
  ['fromMm', 'First point'],
  ['toMm', 'Second point'],
  ['offsetMm', 'Stands off'],
  ['fromItemId', 'Follows at its first end'],
  ['toItemId', 'Follows at its second end'],
  ['doors', 'Doors'],
  ['form', 'Form'],
  ['speedMmS', 'Speed (mm/s)'],
  ['text', 'Words'],
  ['sizeMm', 'Letter height'],
  ['letter', 'Letter'],
  ['locked', 'Locked'],
  ['hidden', 'Hidden'],
  ['order', 'Place in the list'],
];

/** Where two versions of one item differ, as two people would tell each other. */
export function itemDifferences(left: Item, right: Item): ItemDifference[] {
  const [one, other] = [left as Record<string, unknown>, right as Record<string, unknown>];
  return WORDS.filter(([key]) => !same(one[key], other[key])).map(([key, what]) => ({
    what,
    left: words(key, one[key], other[key]),
    right: words(key, other[key], one[key]),
  }));
}

function words(key: string, value: unknown, against: unknown): string {
  if (typeof value === 'number') {
    const unit = key.endsWith('Mm') ? ' mm' : key.endsWith('Deg') ? '°' : '';
    return `${printed(value)}${unit}`;
  }
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (value === undefined || value === null) return '–';
  if (typeof value === 'string') return key === 'armId' ? 'another arm' : value;
  if (Array.isArray(value)) return listWords(value, Array.isArray(against) ? against : []);
  return 'other values';
}

/** A list is told by its length; where that is equal, by how many entries differ. */
function listWords(list: readonly unknown[], against: readonly unknown[]): string {
  if (list.length !== against.length) return String(list.length);
  const changed = list.filter((entry, index) => !same(entry, against[index])).length;
  return `${list.length}, ${changed} differ`;
}
