import type { Arm, MapRequest, WristMode } from '../types';
import { DEGREE } from './chains';

/** The fixed workload against which the kernel's speed is measured: its six-axis arm, and 200 × 200 spots with the tool straight down. */
const ROWS = [
  { a: 0.15, alpha: -90, d: 0.45, min: -165, max: 170, maxSpeed: 2.6 },
  { a: 0.7, alpha: 0, d: 0, min: -155, max: 65, maxSpeed: 2.7 },
  { a: 0.12, alpha: -90, d: 0, min: -195, max: 75, maxSpeed: 2.8 },
  { a: 0, alpha: 90, d: 0.72, min: -200, max: 185, maxSpeed: 5.2 },
  { a: 0, alpha: -90, d: 0, min: -120, max: 125, maxSpeed: 4.6 },
  { a: 0, alpha: 0, d: 0.1, min: -350, max: 340, maxSpeed: 6 },
];

export const WORKLOAD_ARM: Arm = {
  convention: 'standard',
  joints: ROWS.map((row) => ({
    type: 'revolute',
    a: row.a,
    alpha: row.alpha * DEGREE,
    d: row.d,
    theta: 0,
    min: row.min * DEGREE,
    max: row.max * DEGREE,
    maxSpeed: row.maxSpeed,
    maxAcceleration: 10,
  })),
  tool: { xyz: [0.06, 0, 0.12], rpy: [0, 0, 0] },
};

export const workloadRequest = (wrist: WristMode): MapRequest => ({
  grid: { origin: [-1.7, -1.7], step: 3.4 / 199, columns: 200, rows: 200 },
  toolHeight: 0.3,
  direction: { kind: 'down' },
  roll: 0,
  wrist,
  branch: 'best',
});
