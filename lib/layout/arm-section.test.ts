import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { coarsened, sectionGrid, sectionPosture, sectionRow } from './arm-section';

const arm = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!.arm;
/** Shoulder offset, upper arm and the straight elbow-to-flange line, added up by hand from the library's data, mm. */
const REACH_MM = 150 + 620 + Math.hypot(120, 630);

describe('the section through an arm', () => {
  it('stands the arm from its base to a tool that points down, within its reach', () => {
    const { body, joints } = sectionPosture(arm, REACH_MM);
    expect(body[0]).toEqual([0, 0]);
    // The column rises to the shoulder before the shoulder reaches out.
    expect(body[1][0]).toBeCloseTo(0, 6);
    expect(body[1][1]).toBeCloseTo(450, 6);
    expect(body[2][0]).toBeCloseTo(150, 6);
    const [wrist, tool] = body.slice(-2);
    expect(tool[0]).toBeCloseTo(wrist[0], 6);
    expect(wrist[1] - tool[1]).toBeCloseTo(100, 6);
    expect(joints.map(({ number }) => number)).toEqual([2, 3, 5]);
  });

  it('gives every built-in arm a body that ends away from its base', () => {
    for (const builtIn of BUILT_IN_ARMS) {
      const body = sectionPosture(builtIn.arm, 700).body;
      const [x] = body[body.length - 1];
      expect(x, builtIn.name).toBeGreaterThan(50);
    }
  });

  it('maps what lies within reach and nothing beyond', () => {
    const grid = sectionGrid(arm, REACH_MM, 72);
    const row = Math.round((300 - grid.originZMm) / grid.stepMm);
    const values = sectionRow(arm, grid, row).inverseConditionNumber;
    const at = (xMm: number): number => values[Math.round((xMm - grid.originXMm) / grid.stepMm)];
    expect(values).toHaveLength(grid.columns);
    expect(at(900)).toBeGreaterThan(0);
    expect(at(900)).toBeLessThanOrEqual(1);
    expect(at(REACH_MM + 80)).toBeNaN();
  });

  it('lays large cells over four times four small ones', () => {
    const fine = sectionGrid(arm, REACH_MM, 72);
    const coarse = coarsened(fine);
    expect([coarse.columns * 4, coarse.rows * 4]).toEqual([fine.columns, fine.rows]);
    // The left and lower edge of both.
    expect(coarse.originXMm - coarse.stepMm / 2).toBeCloseTo(fine.originXMm - fine.stepMm / 2, 6);
    expect(coarse.originZMm - coarse.stepMm / 2).toBeCloseTo(fine.originZMm - fine.stepMm / 2, 6);
    // The first axis and the base fall on edges of cells.
    expect((fine.originXMm / fine.stepMm + 0.5) % 1).toBeCloseTo(0, 6);
  });
});
