import type { Chain } from '../chain';
import { identityTransform, invertTransform, multiplyTransforms, type Transform } from '../transforms';
import { axesOf } from './axes';
import { makeBranches, type Branches, type ClosedForm } from './closed-form';
import { sphericalWristSolver } from './spherical-wrist';

const SAMPLES = 24;

/** A slide that carries a six-axis arm with a spherical wrist: for each place of the slide the six axes are solved in closed form. */
export function trackSolver(chain: Chain): ClosedForm | null {
  if (chain.joints !== 7 || chain.coupling || chain.prismatic[0] !== 1) return null;
  const carried = sphericalWristSolver(withoutFirst(chain));
  if (!carried) return null;
  const { directions } = axesOf(chain);
  const [x, y, z] = directions[0];
  const toCarriage = invertTransform(carriageOf(chain), identityTransform());
  const shifted = identityTransform();
  const flangeOnCarriage = identityTransform();
  const branches = makeBranches(8, 7);

  function solve(flange: Transform, place = 0): Branches {
    shifted.set(flange);
    shifted[3] -= place * x;
    shifted[7] -= place * y;
    shifted[11] -= place * z;
    const found = carried!.solve(multiplyTransforms(toCarriage, shifted, flangeOnCarriage));
    branches.count = found.count;
    branches.shortfall = found.shortfall;
    branches.by = found.by;
    for (let b = 0; b < found.count; b++) {
      branches.values[7 * b] = place;
      for (let i = 0; i < 6; i++) branches.values[7 * b + 1 + i] = found.values[6 * b + i];
      branches.codes[b] = found.codes[b];
    }
    return branches;
  }

  return {
    branches,
    classes: carried.classes,
    family: { from: chain.min[0], to: chain.max[0], closed: false, samples: SAMPLES },
    solve,
    nameOf: carried.nameOf,
    shapeOf: carried.shapeOf,
  };
}

function withoutFirst(chain: Chain): Chain {
  return {
    ...chain,
    joints: chain.joints - 1,
    actuators: chain.actuators - 1,
    base: identityTransform(),
    prismatic: chain.prismatic.subarray(1),
    a: chain.a.subarray(1),
    d: chain.d.subarray(1),
    theta: chain.theta.subarray(1),
    cosAlpha: chain.cosAlpha.subarray(1),
    sinAlpha: chain.sinAlpha.subarray(1),
  };
}

/** Frame that the carried arm stands in, the slide at zero: what joint 1 alone makes of the base. */
function carriageOf(chain: Chain): Transform {
  const alone: Chain = { ...chain, joints: 1, actuators: 1 };
  return axesOf(alone).flange.slice();
}
