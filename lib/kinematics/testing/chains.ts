import type { Joint } from '../types';

/** Joints for invented test chains: one Denavit-Hartenberg row and a speed, with roomy limits. */
type Row = Pick<Joint, 'a' | 'alpha' | 'd'>;

export const RIGHT_ANGLE = Math.PI / 2;
export const DEGREE = Math.PI / 180;

export const turning = (row: Row, maxSpeed = 2, theta = 0): Joint => ({
  type: 'revolute',
  ...row,
  theta,
  min: -3,
  max: 3,
  maxSpeed,
  maxAcceleration: 10,
});

export const sliding = (row: Row, maxSpeed = 1.5): Joint => ({
  type: 'prismatic',
  ...row,
  theta: 0,
  min: 0,
  max: 1,
  maxSpeed,
  maxAcceleration: 5,
});

/** A planar arm: turns about parallel axes, link after link (m), each with its speed (rad/s). */
export const planar = (links: readonly number[], speeds: readonly number[] = links.map(() => 1)): Joint[] =>
  links.map((a, i) => turning({ a, alpha: 0, d: 0 }, speeds[i]));
