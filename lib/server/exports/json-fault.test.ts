import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { jsonFaultAt, placeInText } from './json-fault';

describe('the place at which a text stops being JSON', () => {
  it.each([
    ['{"a": oops}', 6],
    ['{"a": 1,}', 8],
    ['[1 2]', 3],
    ['{"a" 1}', 5],
    ['[1,\n ]', 5],
    ['{"a": "x\ny"}', 6],
    ['{"a": 1', 7],
    ['[01]', 2],
    ['{} x', 3],
    ['{]', 1],
  ])('%j: %i', (text, at) => {
    expect(() => JSON.parse(text) as unknown).toThrow();
    expect(jsonFaultAt(text)).toBe(at);
  });

  it('is the end of a text that was cut short anywhere, and never beyond the cut', () => {
    fc.assert(
      fc.property(fc.dictionary(fc.string(), fc.jsonValue(), { minKeys: 1 }), fc.nat(), (value, cut) => {
        const text = JSON.stringify(value, null, 1);
        const short = text.slice(0, cut % text.length);
        // What is left of a cut token starts at the token.
        expect(jsonFaultAt(short)).toBeLessThanOrEqual(short.length);
        expect(jsonFaultAt(text)).toBe(text.length);
      }),
      { seed: 20261201, numRuns: 200 },
    );
  });

  it('is said as line and column', () => {
    expect(placeInText('{\n "a": oops', 8)).toBe('line 2, column 7');
  });
});
