import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { readSpot } from '@/lib/kinematics/spot';
import { robotSchema, sectionLineSchema } from './items';
import { mapRequestOf, questionOfRobot } from './map-question';
import { mapSettingsSchema } from './map-settings';
import { armWithTool, floorToBase } from './robot-frame';
import { cutLengthMm, cutOfLine, makeSectionMapper, onCut, sectionTask } from './section-cut';

const { arm } = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!;
const ID = '00000000-0000-4000-8000-000000000001';
const robot = robotSchema.parse({
  kind: 'robot',
  id: ID,
  name: 'R1',
  xMm: 2000,
  yMm: 1500,
  angleDeg: 37,
  armId: ID,
  riserMm: 400,
  tool: { xMm: 30, zMm: 100 },
});
const line = sectionLineSchema.parse({
  kind: 'sectionLine',
  id: ID,
  name: 'Section A–A',
  letter: 'A',
  xMm: 700,
  yMm: 1200,
  angleDeg: 20,
  fromMm: [0, 0],
  toMm: [2600, 150],
  zFromMm: 100,
  zToMm: 1800,
});

describe('a section across the floor', () => {
  // The plumb goes through `reach` in the floor's own terms; the section through rows of a map in the base frame.
  it.each([
    ['tool down, fixed roll', { rollDeg: 25 }],
    ['tilted outward, fixed roll', { tiltDeg: 40, rollDeg: 25 }],
    ['tilted one way', { tiltDeg: 30, towards: 'heading', headingDeg: 70, rollDeg: -40, wrist: 'free' }],
  ] as const)('says at each place what a spot there says: %s', (_, patch) => {
    const settings = mapSettingsSchema.parse(patch);
    const cut = cutOfLine(line);
    const task = sectionTask(robot, arm, settings, cut, 1);
    const { grid, tile } = makeSectionMapper(() => 0)(task);
    const armAndTool = armWithTool(arm, robot.tool);
    const [dx, dy] = [cut.toMm[0] - cut.fromMm[0], cut.toMm[1] - cut.fromMm[1]];
    let reached = 0;
    for (let cell = 0; cell < tile.reason.length; cell += 1) {
      const along = grid.originMm[0] + (cell % grid.columns) * grid.stepMm;
      const heightMm = grid.originMm[1] + Math.floor(cell / grid.columns) * grid.stepMm + robot.riserMm;
      const share = along / cutLengthMm(cut);
      const floor = [cut.fromMm[0] + share * dx, cut.fromMm[1] + share * dy, heightMm] as const;
      const { request } = mapRequestOf(questionOfRobot(robot, { ...settings, toolHeightMm: heightMm }), arm);
      const [x, y, z] = floorToBase(robot, floor).map((mm) => mm / 1000);
      const radius = Math.hypot(x, y);
      const { direction } = request;
      const vector =
        direction.kind === 'down'
          ? ([0, 0, -1] as const)
          : direction.kind === 'vector'
            ? direction.vector
            : ([
                (x / radius) * Math.cos(direction.tilt),
                (y / radius) * Math.cos(direction.tilt),
                Math.sin(direction.tilt),
              ] as const);
      const spot = readSpot(armAndTool, { position: [x, y, z], direction: vector, roll: request.roll }, settings.wrist);
      expect(tile.reason[cell] === 0, `${along} ${heightMm}`).toBe(spot.reached);
      if (!spot.reached) continue;
      reached += 1;
      const [{ wristHeld, wristFree }] = spot.postures;
      const measures = settings.wrist === 'held' ? wristHeld : wristFree;
      expect(tile.inverseConditionNumber[cell]).toBeCloseTo(measures.inverseConditionNumber!, 5);
    }
    expect(reached).toBeGreaterThan(10);
  });

  it('grows finer with the time that it may take', () => {
    const settings = mapSettingsSchema.parse({ rollDeg: 0 });
    const fine = makeSectionMapper(() => 0)(sectionTask(robot, arm, settings, cutOfLine(line), 60));
    const coarse = makeSectionMapper(() => 0)(sectionTask(robot, arm, settings, cutOfLine(line), 6));
    expect(fine.grid.stepMm).toBeLessThan(coarse.grid.stepMm);
  });

  it('shows a point along the line, in height and behind it', () => {
    const cut = { fromMm: [1000, 0], toMm: [1000, 5000], zFromMm: 0, zToMm: 1 } as const;
    const { alongMm, heightMm, behindMm } = onCut(cut, [400, 700, 90]);
    expect([alongMm, heightMm, behindMm]).toEqual([700, 90, 600]);
  });
});
