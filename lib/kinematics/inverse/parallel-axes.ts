import { forward, makeStance, type Chain } from '../chain';
import { identityTransform, type Transform } from '../transforms';
import { elbowAngle, makeBranches, type Branches, type ClosedForm } from './closed-form';
import { cross, dot, length, minus, type Triple } from './lines';
import { wrapped } from './wrapped';

/**
 * Two or three turning joints about parallel axes, with or without one stroke along them: SCARA and planar arms, in any order of the
 * joints. Two turns take no orientation: the flange's turn about the axes is then whatever comes out.
 */

const SAME = 1e-9;

export function parallelAxesSolver(chain: Chain): ClosedForm | null {
  const n = chain.joints;
  if (chain.coupling || n < 2 || n > 4) return null;
  const turning = [...Array(n).keys()].filter((i) => chain.prismatic[i] === 0);
  const sliding = [...Array(n).keys()].filter((i) => chain.prismatic[i] === 1);
  if (turning.length < 2 || turning.length > 3 || sliding.length > 1) return null;

  const unbased: Chain = { ...chain, base: identityTransform() };
  const stance = forward(unbased, new Float64Array(n), makeStance(unbased));
  const axis = (i: number): Triple => [stance.axes[3 * i], stance.axes[3 * i + 1], stance.axes[3 * i + 2]];
  const point = (i: number): Triple => [stance.origins[3 * i], stance.origins[3 * i + 1], stance.origins[3 * i + 2]];
  const up = axis(turning[0]);
  for (let i = 0; i < n; i++) if (length(cross(up, axis(i))) > SAME) return null;

  const side: Triple = Math.abs(up[0]) < 0.9 ? [1, 0, 0] : [0, 1, 0];
  const y0 = cross(up, side);
  const y: Triple = [y0[0] / length(y0), y0[1] / length(y0), y0[2] / length(y0)];
  const x = cross(y, up);
  const origin = point(turning[0]);
  const flange = stance.flange;
  const place = (p: Triple): Triple => {
    const r = minus(p, origin);
    return [dot(x, r), dot(y, r), dot(up, r)];
  };
  const tip = place([flange[3], flange[7], flange[11]]);
  const second = place(point(turning[1]));
  const end = turning.length === 3 ? place(point(turning[2])) : tip;
  const inner = Math.hypot(second[0], second[1]);
  const outer = Math.hypot(end[0] - second[0], end[1] - second[1]);
  if (inner < SAME || outer < SAME) return null;
  const sign = (i: number) => (dot(up, axis(i)) > 0 ? 1 : -1);
  const innerAngle = Math.atan2(second[1], second[0]);
  const outerAngle = Math.atan2(end[1] - second[1], end[0] - second[0]);
  const tipX = tip[0] - end[0];
  const tipY = tip[1] - end[1];
  const branches = makeBranches(2, n);
  // Flange at the zero posture, seen in the frame of the axes, row after row.
  const zero = [x, y, up].map((row) =>
    [0, 1, 2].map((c) => row[0] * flange[c] + row[1] * flange[4 + c] + row[2] * flange[8 + c]),
  );

  function solve(target: Transform): Branches {
    branches.count = 0;
    branches.shortfall = 'none';
    branches.by = 0;
    const rows = [x, y, up].map((row) =>
      [0, 1, 2].map((c) => row[0] * target[c] + row[1] * target[4 + c] + row[2] * target[8 + c]),
    );
    // relative = target · zeroᵀ has to be a turn about the axes.
    const relative = (i: number, j: number) =>
      rows[i][0] * zero[j][0] + rows[i][1] * zero[j][1] + rows[i][2] * zero[j][2];
    if (Math.hypot(relative(0, 2), relative(1, 2)) > 1e-9 || relative(2, 2) < 0) {
      branches.shortfall = 'direction';
      return branches;
    }
    const yaw = Math.atan2(relative(1, 0), relative(0, 0));
    const at = place([target[3], target[7], target[11]]);
    const rise = at[2] - tip[2];
    if (sliding.length === 0 && Math.abs(rise) > 1e-9) {
      branches.shortfall = 'too far';
      branches.by = Math.abs(rise);
      return branches;
    }
    const c = Math.cos(yaw);
    const s = Math.sin(yaw);
    const wx = turning.length === 3 ? at[0] - (c * tipX - s * tipY) : at[0];
    const wy = turning.length === 3 ? at[1] - (s * tipX + c * tipY) : at[1];
    const distance = Math.hypot(wx, wy);
    const elbow = elbowAngle(distance * distance, inner, outer);
    if (Number.isNaN(elbow)) {
      const far = distance > inner + outer;
      branches.shortfall = far ? 'too far' : 'too near';
      branches.by = far ? distance - inner - outer : Math.abs(inner - outer) - distance;
      return branches;
    }
    for (let way = 0; way < 2; way++) {
      const bend = way === 0 ? elbow : -elbow;
      const first =
        Math.atan2(wy, wx) - Math.atan2(outer * Math.sin(bend), inner + outer * Math.cos(bend)) - innerAngle;
      const next = bend - (outerAngle - innerAngle);
      const row = branches.count * n;
      branches.values[row + turning[0]] = wrapped(first);
      branches.values[row + turning[1]] = wrapped(sign(turning[1]) * next);
      if (turning.length === 3) branches.values[row + turning[2]] = wrapped(sign(turning[2]) * (yaw - first - next));
      if (sliding.length === 1) branches.values[row + sliding[0]] = sign(sliding[0]) * rise;
      branches.codes[branches.count++] = way;
      if (elbow === 0) break;
    }
    return branches;
  }

  return {
    branches,
    classes: 2,
    family: null,
    solve,
    // Seen along the first axis: an elbow that bends counter-clockwise leaves the elbow to the right of the line to the tool.
    nameOf: (code) => (code === 0 ? 'elbow right' : 'elbow left'),
    shapeOf: (code) => code,
  };
}
