import {
  C1,
  C4,
  C_LEAN,
  CA,
  LAST_AXIS,
  OFFSET,
  PAIR,
  S1,
  S4,
  S_LEAN,
  SA,
  TOOL,
  X,
  type BranchPairs,
} from './branch-pairs';

/**
 * The Jacobian of a pair's plain flip in the arm's own plane (x outward, y along axis 2, z along axis 1), columns scaled by the joints' top
 * speeds. Measures don't change when the frame turns, nor with the sign of a column, so joint 3 counts as turning with joint 2.
 */
export interface ToolColumns {
  /** Six columns x y z one after another, m/s; and rad/s. */
  readonly linear: Float64Array;
  readonly angular: Float64Array;
  fill(pair: number): void;
}

export function makeToolColumns({ lengths, pairs, shared }: BranchPairs, maxSpeed: Float64Array): ToolColumns {
  const linear = new Float64Array(18);
  const angular = new Float64Array(18);
  const { shoulderX, shoulderZ, lateral, upper, wristBasis: w } = lengths;
  const [v1, v2, v3, v4, v5, v6] = maxSpeed;
  const [b00, b01, b02, b10, b11, b12, b20, b21, b22] = w;

  function fill(pair: number) {
    const at = pair * PAIR;
    const c1 = pairs[at + C1];
    const s1 = pairs[at + S1];
    const cl = pairs[at + C_LEAN];
    const sl = pairs[at + S_LEAN];
    const c4 = pairs[at + C4];
    const s4 = pairs[at + S4];
    const px = c1 * shared[TOOL] + s1 * shared[TOOL + 1];
    const py = c1 * shared[TOOL + 1] - s1 * shared[TOOL];
    const pz = shared[TOOL + 2];
    // From shoulder, elbow and wrist centre to the tool point.
    const sx = px - shoulderX;
    const sz = pz - shoulderZ;
    const ex = sx - upper * pairs[at + SA];
    const ez = sz - upper * pairs[at + CA];
    const rx = px - pairs[at + X];
    const ry = py - lateral;
    const rz = -shared[OFFSET + 2];
    // Axes 4 and 5 turned by the lean, axis 6 as the tool has it.
    const x4 = cl * b02 + sl * b22;
    const y4 = b12;
    const z4 = cl * b22 - sl * b02;
    const u = c4 * b01 - s4 * b00;
    const y5 = c4 * b11 - s4 * b10;
    const t = c4 * b21 - s4 * b20;
    const x5 = cl * u + sl * t;
    const z5 = cl * t - sl * u;
    const x6 = c1 * shared[LAST_AXIS] + s1 * shared[LAST_AXIS + 1];
    const y6 = c1 * shared[LAST_AXIS + 1] - s1 * shared[LAST_AXIS];
    const z6 = shared[LAST_AXIS + 2];
    linear[0] = -v1 * py;
    linear[1] = v1 * px;
    linear[2] = 0;
    linear[3] = v2 * sz;
    linear[4] = 0;
    linear[5] = -v2 * sx;
    linear[6] = v3 * ez;
    linear[7] = 0;
    linear[8] = -v3 * ex;
    linear[9] = v4 * (y4 * rz - z4 * ry);
    linear[10] = v4 * (z4 * rx - x4 * rz);
    linear[11] = v4 * (x4 * ry - y4 * rx);
    linear[12] = v5 * (y5 * rz - z5 * ry);
    linear[13] = v5 * (z5 * rx - x5 * rz);
    linear[14] = v5 * (x5 * ry - y5 * rx);
    linear[15] = v6 * (y6 * rz - z6 * ry);
    linear[16] = v6 * (z6 * rx - x6 * rz);
    linear[17] = v6 * (x6 * ry - y6 * rx);
    angular[9] = v4 * x4;
    angular[10] = v4 * y4;
    angular[11] = v4 * z4;
    angular[12] = v5 * x5;
    angular[13] = v5 * y5;
    angular[14] = v5 * z5;
    angular[15] = v6 * x6;
    angular[16] = v6 * y6;
    angular[17] = v6 * z6;
  }

  angular[2] = v1;
  angular[4] = v2;
  angular[7] = v3;
  return { linear, angular, fill };
}
