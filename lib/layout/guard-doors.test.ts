import { describe, expect, it } from 'vitest';
import { fenceStrokes, guardLengthMm, placedDoors } from './guard-doors';
import { doorFault, itemFault } from './item-fault';
import { guardLineSchema, type GuardLine } from './items';

const id = (last: number) => `00000000-0000-4000-8000-00000000000${last}`;

/** A fence of 4 × 3 m, drawn counter-clockwise. */
const fence = (doors: object[], rest: object = {}): GuardLine =>
  guardLineSchema.parse({
    kind: 'guardLine',
    id: id(1),
    name: 'Fence',
    xMm: 0,
    yMm: 0,
    angleDeg: 0,
    pointsMm: [
      [0, 0],
      [4000, 0],
      [4000, 3000],
      [0, 3000],
    ],
    doors: doors.map((door, index) => ({ id: id(index + 2), name: `Door ${index + 1}`, widthMm: 1000, ...door })),
    ...rest,
  });
const lengthOf = (strokes: ReturnType<typeof fenceStrokes>) =>
  strokes.reduce((sum, [from, to]) => sum + Math.hypot(to[0] - from[0], to[1] - from[1]), 0);

describe('doors of a guard line', () => {
  it('stand at their distance from the first corner and open away from or into the cell', () => {
    const guard = fence([{ alongMm: 500 }, { alongMm: 4500, kind: 'hinged-in' }]);
    const [south, east] = placedDoors(guard);
    expect(south).toMatchObject({ fromMm: [500, 0], toMm: [1500, 0] });
    expect(south.opensTo[1]).toBe(-1);
    expect(east).toMatchObject({ fromMm: [4000, 500], toMm: [4000, 1500] });
    expect(east.opensTo[0]).toBe(-1);
  });

  it('open outwards just so where the fence was drawn the other way round', () => {
    const { pointsMm } = fence([]);
    const [door] = placedDoors(fence([{ alongMm: 500 }], { pointsMm: [...pointsMm].reverse() }));
    // The first side now runs along the far wall; outwards is away.
    expect(door.fromMm).toEqual([500, 3000]);
    expect(door.opensTo[1]).toBe(1);
  });

  it('never run round a corner', () => {
    const [door] = placedDoors(fence([{ alongMm: 3400 }]));
    expect(door).toMatchObject({ fromMm: [3000, 0], toMm: [4000, 0] });
  });

  it('leave gaps in the fence as wide as they are', () => {
    const guard = fence([{ alongMm: 500 }, { alongMm: 2000 }, { alongMm: 4500 }]);
    expect(guardLengthMm(guard)).toBe(14_000);
    expect(lengthOf(fenceStrokes(guard))).toBeCloseTo(14_000 - 3000, 6);
    expect(lengthOf(fenceStrokes(fence([], { closed: false })))).toBe(11_000);
  });

  it('are refused beyond the end and over one another, in words', () => {
    const guard = fence([{ alongMm: 500 }, { alongMm: 1200 }]);
    const [, second] = guard.doors;
    expect(doorFault(guard, second)).toMatch(/overlap Door 1/);
    expect(doorFault(guard, { ...second, alongMm: 13_500 })).toMatch(/14000 mm long/);
    expect(doorFault(guard, { ...second, alongMm: 1500 })).toBeNull();
  });

  it('and a side without length is refused', () => {
    const folded = fence([], { pointsMm: [[0, 0], [4000, 0], [4000, 0]] }); // prettier-ignore
    expect(itemFault(folded)).toMatch(/Corners 2 and 3 lie on one spot/);
  });
});
