import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { rectangleOutline } from '../geometry';
import { obstacleSchema, robotSchema, type Robot } from '../items';
import { clearanceOfRobots, wayPostures, type WorkingRobot } from './robot-clearance';

const { arm } = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-6kg')!;
const id = (n: number) => `00000000-0000-4000-8000-00000000000${n}`;
const robot = (n: number, xMm: number): Robot =>
  robotSchema.parse({
    kind: 'robot',
    id: id(n),
    name: `R${n}`,
    xMm,
    yMm: 0,
    angleDeg: 0,
    armId: id(9),
    tool: { zMm: 100 },
  });
const column = (n: number, xMm: number, yMm: number) =>
  obstacleSchema.parse({ kind: 'obstacle', id: id(n), name: `Column ${n}`, xMm, yMm, angleDeg: 0, outlineMm: rectangleOutline(100, 100), zToMm: 3000 }); // prettier-ignore

const STRETCHED = [0, 0.2, 0.1, 0, 0.5, 0];
const working = (own: Robot, ...turns: number[]): WorkingRobot => ({
  robot: own,
  arm,
  reachMm: 900,
  postures: turns.map((turn, index) => ({
    name: `P${index + 1}`,
    fixtureId: '',
    joints: [turn, ...STRETCHED.slice(1)],
  })),
});

describe('clearance of robots', () => {
  it('sees what stands in the way between two points that are clear themselves', () => {
    const own = robot(1, 0);
    // Both points lie a quarter turn to each side of a column that the arm has to pass.
    const [{ rows }] = clearanceOfRobots([working(own, -0.8, 0.8)], [own, column(2, 450, 0)]);
    const at = (where: string) => rows.find((row) => row.where === where)!;
    expect(at('P1').distanceMm).toBeGreaterThan(0);
    expect(at('P2').distanceMm).toBeGreaterThan(0);
    expect(at('P1 to P2')).toMatchObject({ moving: true, other: 'Column 2' });
    expect(at('P1 to P2').distanceMm).toBeLessThan(0);
    expect(rows[0].where).toBe('P1 to P2');
  });

  it('grows by as much as a robot is moved away from a column', () => {
    const distance = (xMm: number): number =>
      clearanceOfRobots([working(robot(1, xMm), 0)], [column(2, 1500, 0)])[0].rows[0].distanceMm;
    expect(distance(0) - distance(100)).toBeCloseTo(100, 6);
  });

  it('of two robots is the same from both sides, and tells the other robot', () => {
    const both = clearanceOfRobots([working(robot(1, 0), 0), working(robot(2, 1400), Math.PI)], []);
    expect(both[0].rows[0]).toMatchObject({ other: 'R2', otherId: id(2) });
    expect(both[1].rows[0]).toMatchObject({ other: 'R1' });
    expect(both[0].rows[0].distanceMm).toBeCloseTo(both[1].rows[0].distanceMm, 9);
  });

  it('has no rows where nothing stands round', () => {
    expect(clearanceOfRobots([working(robot(1, 0), 0)], [])).toMatchObject([{ rows: [] }]);
  });

  it('looks at moves so often that no part of the arm goes far between two looks', () => {
    const postures = wayPostures(working(robot(1, 0), 0, 1));
    expect(postures[0][0]).toBe(0);
    expect(postures.at(-1)![0]).toBe(1);
    // One joint turning by 1 rad with at most 1.2 m behind it: 20 mm a step are at least 50 looks.
    expect(postures.length).toBeGreaterThan(1000 / 20);
  });
});
