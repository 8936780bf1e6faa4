import { distanceMm } from './geometry';
import type { Fixture, Item, TaskPoint } from './items';

/**
 * What differs between two sheets, item by item. Variants that were copied from one another have ids of their own, so items
 * are matched by id first, then by kind and name, the nearest first where several bear one name.
 */

export interface ItemPair {
  readonly left: Item;
  readonly right: Item;
}

export interface MatchedItems {
  readonly pairs: readonly ItemPair[];
  readonly removed: readonly Item[];
  readonly added: readonly Item[];
}

export function matchItems(left: readonly Item[], right: readonly Item[]): MatchedItems {
  const open = new Map(right.map((item) => [item.id, item]));
  const partner = new Map<string, Item>();
  const take = (item: Item, found: Item | undefined) => {
    if (!found) return;
    partner.set(item.id, found);
    open.delete(found.id);
  };
  for (const item of left) {
    const same = open.get(item.id);
    if (same?.kind === item.kind) take(item, same);
  }
  const nameless = left.filter(({ id }) => !partner.has(id));
  const near = nameless
    .flatMap((item) =>
      [...open.values()]
        .filter((other) => other.kind === item.kind && other.name === item.name)
        .map((other) => ({ item, other, apart: distanceMm([item.xMm, item.yMm], [other.xMm, other.yMm]) })),
    )
    .sort((a, b) => a.apart - b.apart);
  for (const { item, other } of near) {
    if (!partner.has(item.id) && open.has(other.id)) take(item, other);
  }
  return {
    pairs: left.flatMap((item) => {
      const other = partner.get(item.id);
      return other ? [{ left: item, right: other }] : [];
    }),
    removed: left.filter(({ id }) => !partner.has(id)),
    added: right.filter(({ id }) => open.has(id)),
  };
}

/** Task points of one fixture in two sheets: by id, then by name. */
export function matchTaskPoints(left: Fixture, right: Fixture): { left: TaskPoint; right: TaskPoint }[] {
  const open = [...right.taskPoints];
  const takeWhere = (fits: (point: TaskPoint) => boolean) => {
    const index = open.findIndex(fits);
    return index < 0 ? null : open.splice(index, 1)[0];
  };
  const byId = left.taskPoints.map((point) => ({ point, found: takeWhere(({ id }) => id === point.id) }));
  return byId.flatMap(({ point, found }) => {
    const other = found ?? takeWhere(({ name }) => name === point.name);
    return other ? [{ left: point, right: other }] : [];
  });
}

/** One thing that differs about one item, in the words and figures of the sheet. */
export interface ItemDifference {
  /** Of the right sheet; of the left one where it is gone. */
  readonly itemId: string;
  /** Of the left sheet; null where it is new. */
  readonly leftId: string | null;
  readonly kind: Item['kind'];
  /** What of it, such as `R2 base` or `R2 riser`. */
  readonly what: string;
  /** The change, such as `−300, −700 mm, +6°` or `350 → 400 mm`. */
  readonly change: string;
}

/** Less than this is no move: typed values are whole millimetres, and turns are kept to tenths of a degree. */
const LEAST_MOVE_MM = 0.5;
const LEAST_TURN_DEG = 0.05;

/** Everything that differs, matched items in the order of the left sheet, then what was taken away, then what is new. */
export function itemDifferences({ pairs, removed, added }: MatchedItems): ItemDifference[] {
  return [
    ...pairs.flatMap(pairDifferences),
    ...removed.map((item) => difference(item, item.id, item.name, 'taken away')),
    ...added.map((item) => difference(item, null, item.name, 'new')),
  ];
}

function difference(item: Item, leftId: string | null, what: string, change: string): ItemDifference {
  return { itemId: item.id, leftId, kind: item.kind, what, change };
}

function pairDifferences({ left, right }: ItemPair): ItemDifference[] {
  const found: ItemDifference[] = [];
  const note = (what: string, change: string) => found.push(difference(right, left.id, what, change));
  const move = moveWords(left, right);
  if (move) note(right.kind === 'robot' ? `${right.name} base` : right.name, move);
  if (left.name !== right.name) note(right.name, `was called ${left.name}`);
  if (left.kind === 'robot' && right.kind === 'robot') {
    if (left.riserMm !== right.riserMm) note(`${right.name} riser`, fromTo(left.riserMm, right.riserMm));
    if (left.armId !== right.armId) note(`${right.name} arm`, 'another arm');
    if (!same(left.tool, right.tool)) note(`${right.name} tool`, 'another tool');
    if (!same(left.part, right.part)) note(`${right.name} part`, 'another part');
    if (left.targetCycleS !== right.targetCycleS) {
      note(`${right.name} target cycle`, `${left.targetCycleS ?? 'none'} → ${right.targetCycleS ?? 'none'} s`);
    }
    if (left.sequence.length !== right.sequence.length) {
      note(`${right.name} cycle`, `${left.sequence.length} → ${right.sequence.length} steps`);
    }
  }
  if (left.kind === 'fixture' && right.kind === 'fixture') fixtureDifferences(left, right, note);
  if ('outlineMm' in left && 'outlineMm' in right) {
    if (!same(left.outlineMm, right.outlineMm)) note(`${right.name} outline`, 'redrawn');
  }
  if ('zToMm' in left && 'zToMm' in right && left.zToMm !== right.zToMm) {
    note(`${right.name} height`, fromTo(left.zToMm, right.zToMm));
  }
  if ('pointsMm' in left && 'pointsMm' in right && !same(left.pointsMm, right.pointsMm)) note(right.name, 'redrawn');
  if ('widthMm' in left && 'widthMm' in right && left.widthMm !== right.widthMm) {
    note(`${right.name} width`, fromTo(left.widthMm, right.widthMm));
  }
  if (left.kind === 'conveyor' && right.kind === 'conveyor' && left.speedMmS !== right.speedMmS) {
    note(`${right.name} speed`, `${left.speedMmS ?? 'not given'} → ${right.speedMmS ?? 'not given'} mm/s`);
  }
  if (left.kind === 'guardLine' && right.kind === 'guardLine' && !same(left.doors, right.doors)) {
    note(`${right.name} doors`, countOrRedrawn(left.doors.length, right.doors.length));
  }
  if (left.kind === 'note' && right.kind === 'note' && left.text !== right.text) note(right.name, 'other words');
  return found;
}

function fixtureDifferences(left: Fixture, right: Fixture, note: (what: string, change: string) => void): void {
  const points = matchTaskPoints(left, right);
  for (const { left: before, right: after } of points) {
    const by = [after.xMm - before.xMm, after.yMm - before.yMm, after.zMm - before.zMm];
    if (by.some((value) => Math.abs(value) >= LEAST_MOVE_MM)) note(after.name, `${by.map(signed).join(', ')} mm`);
    const turned = before.tiltDeg !== after.tiltDeg || before.azimuthDeg !== after.azimuthDeg;
    if (turned || before.rollDeg !== after.rollDeg) note(after.name, 'tool turned');
    if (before.speedMmS !== after.speedMmS) {
      note(`${after.name} wanted speed`, `${before.speedMmS ?? 'none'} → ${after.speedMmS ?? 'none'} mm/s`);
    }
  }
  if (!same(left.taskPaths.map(withoutIds), right.taskPaths.map(withoutIds))) {
    note(`${right.name} task paths`, countOrRedrawn(left.taskPaths.length, right.taskPaths.length));
  }
  if (!same(left.taskPatterns.map(withoutIds), right.taskPatterns.map(withoutIds))) {
    note(`${right.name} task patterns`, countOrRedrawn(left.taskPatterns.length, right.taskPatterns.length));
  }
  const gone = left.taskPoints.length - points.length;
  const come = right.taskPoints.length - points.length;
  if (gone > 0) note(`${right.name} task points`, `${gone} taken away`);
  if (come > 0) note(`${right.name} task points`, `${come} new`);
}

/** Variants that were copied from one another have other ids for the same things. */
const withoutIds = <T extends { id: string; robotId: string | null }>({ id: _id, robotId: _robotId, ...rest }: T) =>
  rest;

const countOrRedrawn = (before: number, after: number): string =>
  before === after ? 'redrawn' : `${before} → ${after}`;

/** How an item moved and turned; null where it did neither. */
export function moveWords(left: Item, right: Item): string | null {
  const [dx, dy] = [right.xMm - left.xMm, right.yMm - left.yMm];
  const turn = wrappedDeg(right.angleDeg - left.angleDeg);
  const moved = Math.hypot(dx, dy) >= LEAST_MOVE_MM;
  const turned = Math.abs(turn) >= LEAST_TURN_DEG;
  if (!moved && !turned) return null;
  return [
    moved && `${signed(dx)}, ${signed(dy)} mm`,
    turned && `${turn < 0 ? '−' : '+'}${Number(Math.abs(turn).toFixed(1))}°`,
  ]
    .filter(Boolean)
    .join(', ');
}

function wrappedDeg(angle: number): number {
  return ((((angle + 180) % 360) + 360) % 360) - 180;
}

function signed(value: number): string {
  const whole = Math.round(value);
  return whole === 0 ? '0' : `${whole < 0 ? '−' : '+'}${Math.abs(whole)}`;
}

const fromTo = (from: number, to: number): string => `${from} → ${to} mm`;

/** Items are plain data whose members stand in schema order, so their text tells them apart. */
function same(a: unknown, b: unknown): boolean {
  return JSON.stringify(a) === JSON.stringify(b);
}
