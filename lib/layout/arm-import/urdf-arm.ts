import { compileChain, forward, makeStance } from '@/lib/kinematics/chain';
import type { Triple } from '@/lib/kinematics/inverse/lines';
import { identityTransform, multiplyTransforms, transformOf, type Transform } from '@/lib/kinematics/transforms';
import type { Arm, Joint } from '@/lib/kinematics/types';
import { dhRowsOf, type AxisLine } from './dh-rows';
import { answering, refuse, type Imported, type ImportedArm } from './imported-arm';
import { moves, pathBetween, type UrdfJoint, type UrdfModel } from './urdf-model';

/** Largest difference between the file's own chain and ours, in any entry of the tip's pose (m, or a cosine). */
const SAME_POSE = 1e-9;
const FULL_TURN = 2 * Math.PI;
/** As lib/contracts/arm has it: what is longer is no arm but two axes that miss being parallel by a hair. */
const LONGEST_M = 100;

/**
 * The chain of a URDF tree from one link to another as an arm in standard DH rows. Both are stood in several postures and the arm
 * is refused if they differ by more than 1e-9 m.
 */
export function armOfUrdf(model: UrdfModel, base: string, tip: string): Imported<ImportedArm> {
  return answering(() => {
    const path = pathBetween(model, base, tip) ?? refuse(`The link “${tip}” does not hang on “${base}”.`);
    demandMotions(path);
    const moving = path.filter(moves);
    if (moving.length === 0) refuse(`Nothing moves between “${base}” and “${tip}”.`);
    const axes = axesAtZero(path);
    const { rows, base: baseFrame, tool } = dhRowsOf(axes, poseOfPath(path, []));
    const bad = rows.findIndex(({ a, d }) => Math.hypot(a, d) > LONGEST_M);
    if (bad >= 0)
      refuse(
        `The axes of ${moving[bad].name} and ${moving[bad + 1]?.name ?? tip} are nearly parallel, but not quite. Write their angles with more decimals, or exactly parallel.`,
      );
    const joints = rows.map((row, index): Joint => ({ type: axes[index].type, ...row, ...travelOf(moving[index]) }));
    const arm: Arm = { convention: 'standard', joints, ...(baseFrame && { base: baseFrame }), ...(tool && { tool }) };
    demandSame(path, arm);
    return {
      name: model.name,
      description: '',
      payloadKg: null,
      arm,
      sources: moving.map(({ name }) => `joint ${name}`),
      notes: notesOf(model, moving),
    };
  });
}

function demandMotions(path: readonly UrdfJoint[]): void {
  for (const { name, motion, mimics } of path) {
    if (motion === 'floating' || motion === 'planar')
      refuse(`It is ${motion}: an arm has joints that turn, slide or stand still.`, `Joint ${name}`);
    if (mimics !== null)
      refuse(`It follows the joint ${mimics}. Joints that follow others are not taken.`, `Joint ${name}`);
  }
}

/** Speeds of zero are as good as none: they are asked for. */
function travelOf({
  motion,
  lower,
  upper,
  velocity,
}: UrdfJoint): Pick<Joint, 'min' | 'max' | 'maxSpeed' | 'maxAcceleration'> {
  const endless = motion === 'continuous';
  return {
    min: endless ? -FULL_TURN : lower,
    max: endless ? FULL_TURN : upper,
    maxSpeed: velocity > 0 ? velocity : NaN,
    maxAcceleration: NaN,
  };
}

function notesOf(model: UrdfModel, moving: readonly UrdfJoint[]): string[] {
  const named = (joints: readonly UrdfJoint[]): string => joints.map(({ name }) => name).join(', ');
  const endless = moving.filter(({ motion }) => motion === 'continuous');
  const slow = moving.filter(({ velocity }) => !(velocity > 0));
  const open = moving.filter(({ motion, lower, upper }) => motion !== 'continuous' && Number.isNaN(lower + upper));
  return [
    'URDF says nothing of acceleration: fill in the column ramp.',
    ...(slow.length > 0 ? [`No speed is given for ${named(slow)}.`] : []),
    ...(open.length > 0 ? [`A limit is missing for ${named(open)}.`] : []),
    ...(endless.length > 0 ? [`Endless in the file, here −360° to 360°: ${named(endless)}.`] : []),
    ...(model.squaredAngles > 0
      ? [
          model.squaredAngles === 1
            ? 'One angle was written as a rounded right angle and is taken as exact.'
            : `${model.squaredAngles} angles were written as rounded right angles (1.5708) and are taken as exact.`,
        ]
      : []),
  ];
}

const originOf = ({ xyz, rpy }: UrdfJoint): Transform => transformOf({ xyz: [...xyz], rpy: [...rpy] });

function axesAtZero(path: readonly UrdfJoint[]): AxisLine[] {
  const at = identityTransform();
  const axes: AxisLine[] = [];
  for (const joint of path) {
    multiplyTransforms(at, originOf(joint), at);
    if (!moves(joint)) continue;
    const [x, y, z] = joint.axis;
    const direction: Triple = [
      at[0] * x + at[1] * y + at[2] * z,
      at[4] * x + at[5] * y + at[6] * z,
      at[8] * x + at[9] * y + at[10] * z,
    ];
    const type = joint.motion === 'prismatic' ? 'prismatic' : 'revolute';
    axes.push({ type, point: [at[3], at[7], at[11]], direction });
  }
  return axes;
}

/** Forward kinematics as URDF defines it, joint by joint; what is not given stands at zero. */
export function poseOfPath(path: readonly UrdfJoint[], posture: readonly number[]): Transform {
  const at = identityTransform();
  let index = 0;
  for (const joint of path) {
    multiplyTransforms(at, originOf(joint), at);
    if (moves(joint)) multiplyTransforms(at, motionOf(joint, posture[index++] ?? 0), at);
  }
  return at;
}

function motionOf({ motion, axis: [x, y, z] }: UrdfJoint, q: number): Transform {
  if (motion === 'prismatic') return Float64Array.of(1, 0, 0, x * q, 0, 1, 0, y * q, 0, 0, 1, z * q);
  // Rodrigues' formula.
  const [c, s] = [Math.cos(q), Math.sin(q)];
  const t = 1 - c;
  // prettier-ignore
  return Float64Array.of(
    c + t * x * x, t * x * y - s * z, t * x * z + s * y, 0,
    t * x * y + s * z, c + t * y * y, t * y * z - s * x, 0,
    t * x * z - s * y, t * y * z + s * x, c + t * z * z, 0,
  );
}

/** Shares of each joint's range: ends, middle, and spots without a pattern (multiples of the golden ratio). */
const POSTURES = 12;

function demandSame(path: readonly UrdfJoint[], arm: Arm): void {
  const chain = compileChain(arm);
  const stance = makeStance(chain);
  for (let number = 0; number < POSTURES; number++) {
    const posture = arm.joints.map(({ min, max }, index) => {
      const [from, to] = max > min ? [min, max] : [-1, 1];
      const share = number < 3 ? number / 2 : (number * 0.618034 + index * 0.754878) % 1;
      return from + share * (to - from);
    });
    const wanted = poseOfPath(path, posture);
    const { tool } = forward(chain, posture, stance);
    const off = tool.reduce((most, value, index) => Math.max(most, Math.abs(value - wanted[index])), 0);
    if (!(off <= SAME_POSE))
      refuse(`The chain could not be written in DH rows: the tip would be off by ${off.toExponential(1)} m.`);
  }
}
