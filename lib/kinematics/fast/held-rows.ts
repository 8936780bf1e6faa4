import {
  C5,
  C4,
  C_LEAN,
  CA,
  CB,
  DX,
  DZ,
  PAIR,
  S4,
  S5,
  S_ELBOW,
  S_LEAN,
  SA,
  SB,
  X,
  type BranchPairs,
} from './branch-pairs';

/**
 * The joint speeds that move the tool point without turning the tool, as shares of their top speeds: u = A v for a tool velocity v in the arm's
 * plane. The tool does not turn, so v is also the wrist centre's velocity, and A follows from two lengths and two sines instead of an inverse.
 * Six rows x y z one after another (s/m). Signs of single rows are free, as no measure depends on them.
 */
export function makeHeldRows({ lengths, pairs }: BranchPairs, maxSpeed: Float64Array, rows: Float64Array) {
  const { lateral, upper, fore, wristBasis } = lengths;
  const [b00, b01, b02, b10, b11, b12, b20, b21, b22] = wristBasis;
  const [w1, w2, w3, w4, w5, w6] = maxSpeed.map((speed) => 1 / speed);

  return (pair: number) => {
    const at = pair * PAIR;
    const cl = pairs[at + C_LEAN];
    const sl = pairs[at + S_LEAN];
    const c4 = pairs[at + C4];
    const s4 = pairs[at + S4];
    const s5 = pairs[at + S5];
    const c5 = pairs[at + C5];
    const perX = 1 / pairs[at + X];
    const slant = lateral * perX;
    const perDet = -1 / (upper * fore * pairs[at + S_ELBOW]);
    // Joint 1 takes all of the sideways speed, joints 2 and 3 what is left in the plane.
    const dx = pairs[at + DX] * perDet;
    const dz = pairs[at + DZ] * perDet;
    const fx = fore * pairs[at + SB] * perDet;
    const fz = fore * pairs[at + CB] * perDet;
    rows[0] = 0;
    rows[1] = w1 * perX;
    rows[2] = 0;
    rows[3] = w2 * fx;
    rows[4] = w2 * fx * slant;
    rows[5] = w2 * fz;
    rows[6] = w3 * dx;
    rows[7] = w3 * dx * slant;
    rows[8] = w3 * dz;
    // Turning of the forearm that the wrist has to undo: about y by joints 2 and 3, about z by joint 1.
    const ux = upper * pairs[at + SA] * perDet;
    const uy = ux * slant;
    const uz = upper * pairs[at + CA] * perDet;
    // Axis 5, and the directions at right angles to axes 5 and 6 and to axes 4 and 5, y and z parts in the plane.
    const x5 = c4 * b01 - s4 * b00;
    const y5 = c4 * b11 - s4 * b10;
    const t5 = c4 * b21 - s4 * b20;
    const z5 = cl * t5 - sl * x5;
    const xm = c4 * b00 + s4 * b01;
    const ym = c4 * b10 + s4 * b11;
    const tm = c4 * b20 + s4 * b21;
    const zm = cl * tm - sl * xm;
    const y4 = b12;
    const z4 = cl * b22 - sl * b02;
    const four = w4 / s5;
    const six = w6 / s5;
    const ny = four * (c5 * ym - s5 * y4);
    const nz = four * (c5 * zm - s5 * z4) * perX;
    rows[9] = ny * ux;
    rows[10] = ny * uy + nz;
    rows[11] = ny * uz;
    rows[12] = w5 * y5 * ux;
    rows[13] = w5 * (y5 * uy + z5 * perX);
    rows[14] = w5 * y5 * uz;
    rows[15] = six * ym * ux;
    rows[16] = six * (ym * uy + zm * perX);
    rows[17] = six * ym * uz;
  };
}
