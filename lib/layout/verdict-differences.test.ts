import { describe, expect, it } from 'vitest';
import { matchItems } from './differences';
import { itemSchema } from './items';
import { effectsOf, pointChanges } from './verdict-differences';
import type { PointVerdict, RobotVerdict } from './verdicts';
import type { VerdictBand } from './verdict-words';

const id = (number: number) => `00000000-0000-4000-8000-${String(number).padStart(12, '0')}`;
const tray = (number: number, pointNumber: number) =>
  itemSchema.parse({
    kind: 'fixture',
    id: id(number),
    name: 'Tray',
    xMm: 0,
    yMm: 0,
    angleDeg: 0,
    outlineMm: [
      [0, 0],
      [1, 0],
      [1, 1],
    ],
    zToMm: 800,
    taskPoints: [{ id: id(pointNumber), name: 'Pick', xMm: 0, yMm: 0, zMm: 850 }],
  });
const verdict = (pointNumber: number, band: VerdictBand, robotNumber: number): PointVerdict => {
  const best: RobotVerdict = {
    robotId: id(robotNumber),
    reached: band !== 'out',
    met: band !== 'out',
    band,
    reason: null,
    notes: [],
    bindingJoint: null,
    posture: null,
    speedMarginMmS: null,
    shortfallMm: null,
  };
  return {
    pointId: id(pointNumber),
    pointName: 'Pick',
    fixtureId: id(1),
    fixtureName: 'Tray',
    positionMm: [0, 0, 850],
    wantedSpeedMmS: null,
    assignment: 'best robot',
    best,
    robots: [best],
  };
};

const matched = matchItems([tray(1, 5)], [tray(11, 15)]);
const change = (from: VerdictBand, to: VerdictBand) =>
  pointChanges(matched, [verdict(5, from, 2)], [verdict(15, to, 12)]);

describe('what a move does to the work', () => {
  it.each([
    ['out', 'fair', 'Pick now reached', 'better'],
    ['tight', 'out', 'Pick out of reach', 'worse'],
    ['tight', 'roomy', 'Pick tight → roomy', 'better'],
    ['fair', 'pinned', 'Pick fair → pinned', 'worse'],
  ] as const)('from %s to %s', (from, to, words, direction) => {
    expect(change(from, to)).toMatchObject([{ words, direction }]);
  });

  it('is nothing where the band stays', () => {
    expect(change('fair', 'fair')).toEqual([]);
  });

  it('stands beside the fixture and beside the robots that served or serve the point, and beside no others', () => {
    const changes = change('out', 'roomy');
    const difference = (kind: 'robot' | 'fixture', leftId: string | null, itemId: string) => ({
      kind,
      leftId,
      itemId,
      what: '',
      change: '',
    });
    expect(effectsOf(difference('fixture', id(1), id(11)), changes)).toEqual(changes);
    expect(effectsOf(difference('robot', id(2), id(22)), changes)).toEqual(changes);
    expect(effectsOf(difference('robot', null, id(12)), changes)).toEqual(changes);
    expect(effectsOf(difference('robot', id(3), id(33)), changes)).toEqual([{ words: 'none', direction: 'none' }]);
  });
});
