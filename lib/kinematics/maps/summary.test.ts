import { describe, expect, it } from 'vitest';
import { mapSummary } from './summary';
import { makeMapTile } from './tile-codec';

function tileOf(rowFrom: number, values: readonly (number | null)[]) {
  const tile = makeMapTile(rowFrom, rowFrom + 1, values.length);
  values.forEach((value, i) => {
    tile.reason[i] = value === null ? 1 : 0;
    if (value === null) return;
    tile.inverseConditionNumber[i] = value;
    tile.maximumToolSpeed[i] = 10 * value;
    tile.sureSpeed[i] = 1 - value;
  });
  return tile;
}

describe('the summary of a map', () => {
  it('counts reached cells as area and sorts their values over all tiles', () => {
    const summary = mapSummary([tileOf(0, [0.5, null, 0.25]), tileOf(1, [null, 0.75, 0.125])], 0.02);
    expect(summary.reachedAreaM2).toBeCloseTo(4 * 0.0004, 15);
    expect(summary.bestInverseConditionNumber).toBe(0.75);
    expect(summary.fastestToolSpeed).toBe(7.5);
    const { inverseConditionNumber, sureSpeed } = summary.quantiles;
    expect(inverseConditionNumber).toHaveLength(11);
    expect([inverseConditionNumber[0], inverseConditionNumber[10]]).toEqual([0.125, 0.75]);
    expect([...inverseConditionNumber].sort((a, b) => a - b)).toEqual(inverseConditionNumber);
    expect([sureSpeed[0], sureSpeed[10]]).toEqual([0.25, 0.875]);
  });

  it('of a map that reaches nothing has no numbers to give', () => {
    expect(mapSummary([tileOf(0, [null, null])], 0.1)).toEqual({
      reachedAreaM2: 0,
      bestInverseConditionNumber: null,
      fastestToolSpeed: null,
      quantiles: { inverseConditionNumber: [], maximumToolSpeed: [], sureSpeed: [] },
    });
  });
});
