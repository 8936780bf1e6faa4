import { describe, expect, it } from 'vitest';
import { keepSame, keepSameMap } from './keep-same';

describe('keeping what stayed the same', () => {
  it('answers the earlier object while the words are the same', () => {
    const keep = keepSame<{ readonly x: number }[]>();
    const first = keep([{ x: 1 }, { x: 2 }]);
    expect(keep([{ x: 1 }, { x: 2 }])).toBe(first);
  });

  it('answers a new list with the elements that stayed, where one changed', () => {
    const keep = keepSame<{ readonly x: number }[]>();
    const first = keep([{ x: 1 }, { x: 2 }]);
    const next = keep([{ x: 1 }, { x: 3 }]);
    expect(next).not.toBe(first);
    expect(next[0]).toBe(first[0]);
    expect(next).toEqual([{ x: 1 }, { x: 3 }]);
  });

  it('does so for maps, and sees a key that is gone', () => {
    const keep = keepSameMap<string, number>();
    const first = keep(new Map([['a', 1]]));
    expect(keep(new Map([['a', 1]]))).toBe(first);
    expect(keep(new Map([['b', 1]]))).toEqual(new Map([['b', 1]]));
    expect(keep(new Map())).toEqual(new Map());
  });
});
