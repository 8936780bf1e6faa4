import { describe, expect, it } from 'vitest';
import { itemDifferences, matchItems, matchTaskPoints, moveWords } from './differences';
import { itemSchema, type Fixture, type Item, type Robot } from './items';

const id = (number: number) => `00000000-0000-4000-8000-${String(number).padStart(12, '0')}`;
const make = (part: object) => itemSchema.parse({ xMm: 0, yMm: 0, angleDeg: 0, ...part });
const robot = (number: number, part: Partial<Robot> = {}) =>
  make({ kind: 'robot', id: id(number), name: 'R1', armId: id(900), ...part }) as Robot;
const fixture = (number: number, part: Partial<Fixture> = {}) =>
  make({
    kind: 'fixture',
    id: id(number),
    name: 'Tray',
    outlineMm: [
      [0, 0],
      [400, 0],
      [400, 300],
    ],
    zToMm: 800,
    ...part,
  }) as Fixture;
const point = (number: number, name: string, xMm = 0) => ({ id: id(number), name, xMm, yMm: 0, zMm: 850 });
const parsedPoints = (...points: ReturnType<typeof point>[]) => points as Fixture['taskPoints'];

describe('matching two sheets', () => {
  it('goes by id where there is one, whatever the name became', () => {
    const { pairs, added, removed } = matchItems([robot(1)], [robot(1, { name: 'R7' }), robot(2)]);
    expect(pairs.map(({ right }) => right.name)).toEqual(['R7']);
    expect(added.map((item) => item.id)).toEqual([id(2)]);
    expect(removed).toEqual([]);
  });

  it('goes by kind and name in a copied variant, nearest first where a name comes twice', () => {
    const left: Item[] = [fixture(1, { xMm: 0 }), fixture(2, { xMm: 5000 })];
    const right: Item[] = [fixture(11, { xMm: 4900 }), fixture(12, { xMm: 300 }), robot(13, { name: 'Tray' })];
    const { pairs, added } = matchItems(left, right);
    expect(pairs.map((pair) => [pair.left.id, pair.right.id])).toEqual([
      [id(1), id(12)],
      [id(2), id(11)],
    ]);
    expect(added.map((item) => item.kind)).toEqual(['robot']);
  });

  it('never gives one item two partners', () => {
    const { pairs, removed } = matchItems([robot(1), robot(2)], [robot(11)]);
    expect(pairs).toHaveLength(1);
    expect(removed).toHaveLength(1);
  });

  it('finds task points by id, then by name', () => {
    const left = fixture(1, { taskPoints: parsedPoints(point(5, 'Pick'), point(6, 'Place')) });
    const right = fixture(2, { taskPoints: parsedPoints(point(8, 'Place'), point(5, 'Renamed')) });
    expect(matchTaskPoints(left, right).map((pair) => [pair.left.name, pair.right.name])).toEqual([
      ['Pick', 'Renamed'],
      ['Place', 'Place'],
    ]);
  });
});

describe('what differs', () => {
  const between = (left: Item[], right: Item[]) =>
    itemDifferences(matchItems(left, right)).map(({ what, change }) => `${what}: ${change}`);

  it('is nothing between a sheet and its copy', () => {
    expect(between([robot(1), fixture(2)], [robot(11), fixture(12)])).toEqual([]);
  });

  it('says moves in millimetres, right and away first, and turns the short way round', () => {
    expect(moveWords(robot(1), robot(1, { xMm: -300, yMm: -700, angleDeg: 6 }))).toBe('−300, −700 mm, +6°');
    expect(moveWords(robot(1, { angleDeg: 178 }), robot(1, { angleDeg: -178 }))).toBe('+4°');
    expect(moveWords(robot(1), robot(1, { xMm: 0.2, angleDeg: 0.01 }))).toBeNull();
    expect(moveWords(robot(1, { angleDeg: 360 }), robot(1))).toBeNull();
  });

  it('names base, riser, arm and tool of a robot apart', () => {
    const changed = robot(1, { xMm: 100, riserMm: 350, armId: id(901), tool: { ...robot(1).tool, zMm: 120 } });
    expect(between([robot(1)], [changed])).toEqual([
      'R1 base: +100, 0 mm',
      'R1 riser: 0 → 350 mm',
      'R1 arm: another arm',
      'R1 tool: another tool',
    ]);
  });

  it('follows task points, outlines and heights of a fixture', () => {
    const left = fixture(1, { taskPoints: parsedPoints(point(5, 'Pick'), point(6, 'Place')) });
    const right = fixture(1, {
      zToMm: 900,
      taskPoints: parsedPoints(point(5, 'Pick', 40), point(7, 'Scan')),
    });
    expect(between([left], [right])).toEqual([
      'Pick: +40, 0, 0 mm',
      'Tray task points: 1 taken away',
      'Tray task points: 1 new',
      'Tray height: 800 → 900 mm',
    ]);
  });

  it('lists what was taken away and what is new last', () => {
    expect(between([robot(1), fixture(2)], [robot(1), robot(3, { name: 'R2' })])).toEqual([
      'Tray: taken away',
      'R2: new',
    ]);
  });
});
