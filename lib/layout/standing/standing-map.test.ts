import { describe, expect, it } from 'vitest';
import { scara } from '@/lib/kinematics/library/scara';
import type { StandingQuestion } from './question';
import { makeStandingComputer } from './standing-map';

/** Two links of 0.6 m that turn all the way round: the tool reaches every spot within 1.2 m of the base. */
const DISC_ARM = scara({
  innerLink: 0.6,
  outerLink: 0.6,
  column: 0.5,
  stroke: 0.4,
  limits: [
    [-180, 180],
    [-180, 180],
    [-180, 180],
  ],
  speeds: [300, 400, 700],
  ramps: [1500, 2000, 4000],
  quillSpeed: 1,
  quillRamp: 10,
});

const point = (xMm: number) => ({
  fixture: { xMm, yMm: 0, angleDeg: 0 },
  xMm: 0,
  yMm: 0,
  zMm: 300,
  tiltDeg: 0,
  azimuthDeg: 0,
  rollDeg: 'free' as const,
  speedMmS: null,
});

function question(change: Partial<StandingQuestion> = {}): StandingQuestion {
  const stepMm = change.grid?.stepMm ?? 20;
  return {
    study: 'standing',
    mover: 'robot',
    armId: '00000000-0000-4000-8000-0000000000aa',
    tool: { xMm: 0, yMm: 0, zMm: 0, rollDeg: 0, pitchDeg: 0, yawDeg: 0 },
    wrist: 'free',
    robot: { xMm: 0, yMm: 0, angleDeg: 0, riserMm: 0 },
    points: [point(-1000), point(1000)],
    drawn: { xMm: 0, yMm: 500, angleDeg: 0 },
    footprintMm: null,
    blocksMm: [],
    grid: { originMm: [-300 + stepMm / 2, -800 + stepMm / 2], stepMm, columns: 600 / stepMm, rows: 1600 / stepMm },
    turnsDeg: [0],
    risersMm: [0],
    ...change,
  };
}

function answerTo(asked: StandingQuestion) {
  const computer = makeStandingComputer(asked, DISC_ARM);
  return computer.answer([computer.rows(0, asked.grid.rows)]);
}

describe('where a base may stand for two points 2.0 m apart', () => {
  // The lens of two discs of radius r at distance d: 2 r² acos(d / 2r) − d/2 √(4r² − d²); here 0.360124 m² (plane geometry).
  const lensM2 = 2 * 1.2 ** 2 * Math.acos(1 / 1.2) - Math.sqrt(4 * 1.2 ** 2 - 4);

  it('takes the area of the lens of both discs, the nearer the finer the grid', () => {
    expect(lensM2).toBeCloseTo(0.360124, 6);
    const coarse = answerTo(question({ grid: grid(20) })).feasibleAreaM2;
    const fine = answerTo(question({ grid: grid(10) })).feasibleAreaM2;
    // A grid errs by no more than the cells that the edge of the lens runs through: its length times the step, 2 × 2 r acos(d / 2r).
    const edgeM = 4 * 1.2 * Math.acos(1 / 1.2);
    expect(Math.abs(coarse - lensM2)).toBeLessThan(edgeM * 0.02 * 0.25);
    expect(Math.abs(fine - lensM2)).toBeLessThan(edgeM * 0.01 * 0.25);
    expect(Math.abs(fine - lensM2)).toBeLessThan(0.002);
  });

  it('says that nothing will do where the points lie farther apart than both arms', () => {
    const { best, feasibleAreaM2 } = answerTo(question({ points: [point(-1300), point(1300)] }));
    expect(best).toBeNull();
    expect(feasibleAreaM2).toBe(0);
  });

  it('keeps off floor that is taken', () => {
    const block: [number, number][] = [[-400, 0], [400, 0], [400, 900], [-400, 900]]; // prettier-ignore
    const free = answerTo(question());
    const kept = answerTo(question({ blocksMm: [block], footprintMm: [[-50, -50], [50, -50], [50, 50], [-50, 50]] })); // prettier-ignore
    // The lens is symmetric, and the plate keeps another 50 mm off: less than half is left.
    expect(kept.feasibleAreaM2).toBeLessThan(free.feasibleAreaM2 / 2);
    expect(kept.best!.yMm).toBeLessThan(-50);
    expect(kept.values.filter((value) => value === -2).length).toBeGreaterThan(0);
  });

  it('moves a fixture under a robot as it moves a robot under a fixture', () => {
    const asked = question({ points: [point(0)], drawn: { xMm: 0, yMm: 900, angleDeg: 0 }, grid: grid(50) });
    const robotMoved = answerTo(asked);
    const fixtureMoved = answerTo({ ...asked, mover: 'fixture' });
    // One point and an arm that turns all round: only the distance counts, and it is the same both ways.
    expect(fixtureMoved.feasibleAreaM2).toBe(robotMoved.feasibleAreaM2);
    expect(fixtureMoved.best!.worst).toBeCloseTo(robotMoved.best!.worst!, 9);
  });

  it('is the same however its rows are cut', () => {
    const asked = question({ grid: grid(50) });
    const computer = makeStandingComputer(asked, DISC_ARM);
    const cut = [computer.rows(0, 7), computer.rows(7, 8), computer.rows(8, asked.grid.rows)];
    expect(computer.answer(cut)).toEqual(answerTo(asked));
  });
});

function grid(stepMm: number): StandingQuestion['grid'] {
  return { originMm: [-300 + stepMm / 2, -800 + stepMm / 2], stepMm, columns: 600 / stepMm, rows: 1600 / stepMm };
}
