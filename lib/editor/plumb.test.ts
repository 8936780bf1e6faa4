import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import { mapRequestOf, questionOfRobot } from '@/lib/layout/map-question';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { robotSchema } from '@/lib/layout/items';
import { makeMapComputer } from '@/lib/kinematics/maps/compute-tile';
import { bestPlumb, plumbOnFloor, plumbSpeeds, readPlumb } from './plumb';
import { plumbFigures } from './plumb-figures';
import { sectionRows } from './section-map';
import { seeded } from './testing/seeded';

const random = seeded(77);
const ARM = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-12kg')!.arm;
const robot = robotSchema.parse({
  kind: 'robot',
  id: random.id(),
  name: 'R1',
  armId: random.id(),
  xMm: 3720,
  yMm: 3920,
  angleDeg: -17,
  riserMm: 350,
});
const settings = mapSettingsSchema.parse({});

describe('the plumb', () => {
  it('puts the tool on the spot, in the frame of the floor', () => {
    const reading = readPlumb(robot, ARM, plumbOnFloor({ xMm: 4420, yMm: 3210 }, settings), settings);
    expect(reading.refusal).toBeNull();
    for (const { skeletonMm } of reading.postures) {
      const tool = skeletonMm[skeletonMm.length - 1];
      [4420, 3210, 850].forEach((value, axis) => expect(tool[axis]).toBeCloseTo(value, 6));
    }
  });

  it('reads what the map of the same question holds there', () => {
    const { request, arm } = mapRequestOf(questionOfRobot(robot, settings), ARM);
    const half = (request.grid.columns - 1) / 2;
    for (let count = 0; count < 40; count += 1) {
      const [column, row] = [random.below(request.grid.columns), random.below(request.grid.rows)];
      const tile = makeMapComputer(arm, request).tile(row, row + 1);
      const angle = (robot.angleDeg * Math.PI) / 180;
      const [x, y] = [(column - half) * settings.stepMm, (row - half) * settings.stepMm];
      const spot = {
        xMm: robot.xMm + Math.cos(angle) * x - Math.sin(angle) * y,
        yMm: robot.yMm + Math.sin(angle) * x + Math.cos(angle) * y,
      };
      const reading = readPlumb(robot, ARM, plumbOnFloor(spot, settings), settings);
      const stored = tile.inverseConditionNumber[column];
      if (Number.isNaN(stored)) expect(reading.postures).toHaveLength(0);
      // A map may be made from a radial profile, which is within 0.003 of the spot itself (measured, with the kernel).
      else expect(Math.abs((reading.postures[0].inverseConditionNumber ?? NaN) - stored)).toBeLessThan(0.003);
    }
  });

  it('reads a palletiser, which has fewer actuators than joints', () => {
    const palletiser = BUILT_IN_ARMS.find(({ slug }) => slug === 'palletiser-130kg')!.arm;
    const reading = readPlumb(robot, palletiser, plumbOnFloor({ xMm: 5720, yMm: 3920 }, settings), settings);
    const [posture] = reading.postures;
    const { error } = plumbFigures(reading, posture, 'held');
    expect(posture.joints).toHaveLength(4);
    // Two metres out, a minute of arc of the column alone is 0.58 mm (2000 mm × π / 180 / 60).
    expect(error.worstMm).toBeGreaterThan(0.58);
    expect(error.worstMm).toBeLessThan(5);
  });

  it('says why a spot is out of reach', () => {
    const reading = readPlumb(robot, ARM, plumbOnFloor({ xMm: 9000, yMm: 3920 }, settings), settings);
    expect(reading.postures).toHaveLength(0);
    expect(reading.refusal).toMatch(/Out of reach by \d+ mm/);
  });

  it('takes the robot that reads best, or the nearest where none reaches', () => {
    const far = { ...robot, id: random.id(), xMm: 20_000 };
    const spot = plumbOnFloor({ xMm: 4420, yMm: 3210 }, settings);
    const readings = [far, robot].map((entry) => readPlumb(entry, ARM, spot, settings));
    expect(bestPlumb(readings)?.robot.id).toBe(robot.id);
    const nowhere = plumbOnFloor({ xMm: 12_500, yMm: 3920 }, settings);
    expect(bestPlumb([far, robot].map((entry) => readPlumb(entry, ARM, nowhere, settings)))?.robot.id).toBe(far.id);
    expect(bestPlumb([])).toBeNull();
  });

  it('draws a velocity polygon whose farthest corner is no farther than the fastest tool speed', () => {
    const reading = readPlumb(robot, ARM, plumbOnFloor({ xMm: 4420, yMm: 3210 }, settings), settings);
    const [best] = reading.postures;
    const { polygon } = plumbSpeeds(reading, best, 'held').floor;
    const farthest = Math.max(...polygon.map(([x, y]) => Math.hypot(x, y)));
    expect(farthest).toBeLessThanOrEqual((best.maximumToolSpeed ?? 0) + 1e-9);
    expect(farthest).toBeGreaterThan((best.sureSpeed ?? 0) - 1e-9);
  });

  it('cuts a section that agrees with the spots on its line', () => {
    const headingDeg = 35;
    const { request, arm } = mapRequestOf(questionOfRobot(robot, settings), ARM);
    const rows = sectionRows({
      arm,
      headingDeg,
      direction: request.direction,
      roll: request.roll,
      wrist: 'held',
      fromMm: [0, 0],
      toMm: [1600, 1200],
      stepMm: 100,
    });
    let step = rows.next();
    while (!step.done) step = rows.next();
    const { value, columns, originMm, stepMm } = step.value;
    for (const [column, row] of [
      [8, 3],
      [10, 5],
      [15, 11],
      [0, 0],
    ]) {
      const distance = originMm[0] + column * stepMm;
      const angle = ((headingDeg + robot.angleDeg) * Math.PI) / 180;
      const spot = {
        positionMm: [
          robot.xMm + Math.cos(angle) * distance,
          robot.yMm + Math.sin(angle) * distance,
          robot.riserMm + originMm[1] + row * stepMm,
        ] as const,
        taskPoint: null,
      };
      const [best] = readPlumb(robot, ARM, spot, settings).postures;
      const cut = value[row * columns + column];
      if (!best) expect(cut).toBeNaN();
      else expect(Math.abs(cut - (best.inverseConditionNumber ?? NaN))).toBeLessThan(0.003);
    }
  });
});
