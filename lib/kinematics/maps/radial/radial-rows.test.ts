import { describe, expect, it } from 'vitest';
import { BUILT_IN_ARMS } from '../../library';
import { makeSolver } from '../../solver';
import { DEGREE } from '../../testing/chains';
import { seededRandom } from '../../testing/random';
import type { Arm, MapDirection, MapRequest } from '../../types';
import { makeMapComputer } from '../compute-tile';
import { symmetryOf } from './symmetry';

const SIX_AXIS = BUILT_IN_ARMS.filter(({ slug }) => slug.startsWith('six-axis'));
const DOWN: MapDirection = { kind: 'down' };

function reachOf(arm: Arm): number {
  return arm.joints.reduce((sum, { a, d }) => sum + Math.hypot(a, d), 0);
}

/** A grid off the base's centre, so that no two cells have a radius in common by design. */
function asked(arm: Arm, over: Partial<MapRequest> & { readonly height?: number } = {}): MapRequest {
  const reach = reachOf(arm);
  const { height = 0.3, ...rest } = over;
  const cells = 90;
  return {
    grid: { origin: [-0.93 * reach, -0.97 * reach], step: (1.9 * reach) / cells, columns: cells, rows: cells },
    toolHeight: height * reach,
    direction: DOWN,
    roll: 'free',
    wrist: 'held',
    branch: 'best',
    ...rest,
  };
}

/** Cells reached alike, refused alike, and values within a thousandth of the scale: 1, the fastest speed of the map, a whole range. */
function compare(arm: Arm, request: MapRequest) {
  const { rows } = request.grid;
  const ours = makeMapComputer(arm, request, 'symmetry').tile(0, rows);
  const full = makeMapComputer(arm, request, 'full grid').tile(0, rows);
  expect(Buffer.from(ours.reason).equals(Buffer.from(full.reason)), 'reasons').toBe(true);
  expect(Buffer.from(ours.bindingJoint).equals(Buffer.from(full.bindingJoint)), 'joints').toBe(true);
  expect(Buffer.from(ours.branch).equals(Buffer.from(full.branch)), 'branches').toBe(true);
  let reached = 0;
  for (const plane of ['inverseConditionNumber', 'maximumToolSpeed', 'sureSpeed', 'limitShare'] as const) {
    const scale = plane === 'inverseConditionNumber' || plane === 'limitShare' ? 1 : highest(full[plane]);
    let worst = 0;
    full[plane].forEach((value, cell) => {
      if (full.reason[cell] !== 0) return;
      reached++;
      worst = Math.max(worst, Math.abs(value - ours[plane][cell]) / scale);
    });
    expect(worst, plane).toBeLessThanOrEqual(1e-3);
  }
  return reached / 4;
}

const highest = (values: Float32Array) => values.reduce((most, value) => (value > most ? value : most), 0);
const symmetric = (arm: Arm, request: MapRequest) => symmetryOf(makeSolver(arm), request, -1) !== null;

describe.each(SIX_AXIS.map(({ slug, arm }) => [slug, arm] as const))('by symmetry as cell by cell: %s', (_, arm) => {
  it.each(['held', 'free'] as const)('wrist %s, heights and directions', (wrist) => {
    for (const height of [0.02, 0.15, 0.4])
      for (const direction of [DOWN, { kind: 'outward', tilt: 0 }, { kind: 'outward', tilt: -30 * DEGREE }] as const) {
        const request = asked(arm, { wrist, height, direction });
        expect(symmetric(arm, request)).toBe(true);
        expect(compare(arm, request)).toBeGreaterThan(300);
      }
  });

  it('with a fixed roll that joint 6 can always take', () => {
    expect(compare(arm, asked(arm, { roll: 0.7 }))).toBeGreaterThan(300);
    expect(compare(arm, asked(arm, { roll: -1, direction: { kind: 'vector', vector: [0, 0, 2] } }))).toBeGreaterThan(0);
  });

  it('of one named branch', () => {
    const branch = 'shoulder right, elbow up, wrist flipped';
    expect(compare(arm, asked(arm, { branch }))).toBeGreaterThan(100);
  });

  it('on a floor far larger than its reach', () => {
    const reach = reachOf(arm);
    const grid = { origin: [-40 * reach, -0.31 * reach] as const, step: reach / 30, columns: 1800, rows: 4 };
    expect(compare(arm, asked(arm, { grid }))).toBeGreaterThan(40);
  });

  it('hung from above, turned and set aside', () => {
    const hung: Arm = { ...arm, base: { xyz: [0.21, -0.34, reachOf(arm)], rpy: [Math.PI, 0, 0.6] } };
    expect(compare(hung, asked(arm, { height: 0.55 }))).toBeGreaterThan(100);
  });

  it('with narrow limits that cut every branch', () => {
    const random = seededRandom(5);
    for (let draw = 0; draw < 6; draw++) {
      const joints = arm.joints.map((joint) => {
        const middle = joint.min + (joint.max - joint.min) * (0.3 + 0.4 * random());
        const half = (joint.max - joint.min) * (0.1 + 0.3 * random());
        return { ...joint, min: middle - half, max: middle + half };
      });
      compare({ ...arm, joints }, asked(arm, { wrist: draw % 2 ? 'held' : 'free' }));
    }
  });
});

it('takes maps without the symmetry cell by cell', () => {
  const { arm } = SIX_AXIS[0];
  expect(symmetric(arm, asked(arm, { direction: { kind: 'vector', vector: [0.1, 0, -1] } }))).toBe(false);
  expect(symmetric(arm, asked(arm, { roll: 0, direction: { kind: 'outward', tilt: 0 } }))).toBe(false);
  expect(symmetric({ ...arm, tool: { xyz: [0.05, 0, 0.1], rpy: [0, 0, 0] } }, asked(arm))).toBe(false);
  expect(symmetric({ ...arm, base: { xyz: [0, 0, 0], rpy: [0.1, 0, 0] } }, asked(arm))).toBe(false);
  expect(symmetric(BUILT_IN_ARMS.find(({ slug }) => slug === 'scara-5kg')!.arm, asked(arm))).toBe(false);
  const lateral = { ...arm, joints: arm.joints.map((joint, i) => (i === 1 ? { ...joint, d: 0.1 } : joint)) };
  expect(symmetric(lateral, asked(arm))).toBe(false);
});
