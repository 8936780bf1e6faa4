import { expect, it } from 'vitest';
import { colourDistance } from './colour-distance';

/** Pairs 1, 4, 7 and 25 of the test data of Sharma, Wu and Dalal 2005, table 1; copied from memory. */
it.each([
  [50, 2.6772, -79.7751, 50, 0, -82.7485, 2.0425],
  [50, -1.3802, -84.2814, 50, 0, -82.7485, 1.0],
  [50, 0, 0, 50, -1, 2, 2.3669],
  [60.2574, -34.0099, 36.2677, 60.4626, -34.1751, 39.4387, 1.2644],
])('agrees with published pairs', (l1, a1, b1, l2, a2, b2, expected) => {
  expect(colourDistance({ l: l1, a: a1, b: b1 }, { l: l2, a: a2, b: b2 })).toBeCloseTo(expected, 4);
});
