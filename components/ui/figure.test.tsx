import { describe, expect, it } from 'vitest';
import { formatFigure } from './format-figure';
import { sayMoment } from './moment';
import { parseNumber } from './parse-number';

describe('formatFigure', () => {
  it.each([
    [2680, {}, '2680'],
    [12345.678, { decimals: 1 }, '12\u00a0345.7'],
    [-0.04, { decimals: 1 }, '0.0'],
    [-17, {}, '\u221217'],
    [0.5, { decimals: 1, signed: true }, '+0.5'],
    [0, { signed: true }, '0'],
    [null, {}, '–'],
    [Number.NaN, {}, '–'],
  ] as const)('writes %j with %j as %s', (value, format, text) => {
    expect(formatFigure(value, format)).toBe(text);
  });
});

describe('parseNumber', () => {
  it.each([
    ['12', 12],
    ['1 234,5', 1234.5],
    ['\u221217', -17],
    ['.5', 0.5],
    ['', null],
    ['1.2.3', null],
    ['12 mm', null],
    ['1e9', null],
  ])('reads %j as %j', (text, number) => {
    expect(parseNumber(text)).toBe(number);
  });
});

describe('sayMoment', () => {
  const now = new Date(2026, 2, 12, 15, 0);
  it.each([
    [new Date(2026, 2, 12, 9, 5), 'today 09:05'],
    [new Date(2026, 2, 11, 23, 59), 'yesterday'],
    [new Date(2026, 2, 13, 0, 1), 'tomorrow'],
    [new Date(2026, 1, 28, 12, 0), '28 Feb 2026'],
  ])('says %s as %s', (date, words) => {
    expect(sayMoment(date, now)).toBe(words);
  });
});
