import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { canonicalJson } from './canonical-json';

const SEED = 20260417;

/** The same value with the keys of every object in another order. */
function shuffled(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(shuffled);
  if (value === null || typeof value !== 'object') return value;
  return Object.fromEntries(
    Object.entries(value)
      .reverse()
      .map(([key, member]) => [key, shuffled(member)]),
  );
}

describe('canonical JSON', () => {
  it('spells one value one way', () => {
    expect(canonicalJson({ b: [1, -0, 0.1], a: { d: null, c: 'é"' }, left: undefined })).toBe(
      '{"a":{"c":"é\\"","d":null},"b":[1,0,0.1]}',
    );
  });

  it('does not depend on the order of keys, and is JSON of the same value', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        const text = canonicalJson(value);
        expect(canonicalJson(shuffled(value))).toBe(text);
        expect(canonicalJson(JSON.parse(text))).toBe(text);
      }),
      { seed: SEED, numRuns: 500 },
    );
  });

  it('keeps different numbers apart', () => {
    expect(canonicalJson(0.1 + 0.2)).not.toBe(canonicalJson(0.3));
    expect(canonicalJson(1e21)).toBe('1e+21');
  });

  it.each([NaN, Infinity, [-Infinity], { a: NaN }, () => 1, Symbol('a'), 1n, [undefined]])('refuses %s', (value) => {
    expect(() => canonicalJson(value)).toThrow(TypeError);
  });
});
