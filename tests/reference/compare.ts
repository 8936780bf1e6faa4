import { FREEDOMS, controlledFreedoms } from '@/lib/kinematics/freedoms';
import { compileChain } from '@/lib/kinematics/chain';
import { makePostureAnalyser } from '@/lib/kinematics/posture';
import type { Measures } from '@/lib/kinematics/types';
import type { ReferenceArm } from './arms';

type Rows = readonly (readonly number[])[];
interface ReferenceMeasures {
  readonly gains: readonly number[];
  readonly manipulability: number;
  readonly maximumToolSpeed: number;
  readonly sureSpeed: number;
}

/** What generate.py prints. */
export interface Reference {
  readonly arms: readonly (ReferenceArm & {
    readonly answers: readonly {
      readonly posture: readonly number[];
      readonly pose: Rows;
      readonly jacobian: Rows;
      readonly wristFree: ReferenceMeasures;
      readonly wristHeld: ReferenceMeasures;
    }[];
  })[];
}

export interface Disagreement {
  /** Largest differences, as shares of the value where that is above one. */
  pose: number;
  jacobian: number;
  gains: number;
  manipulability: number;
  maximumToolSpeed: number;
  sureSpeed: number;
}

/** How far the kernel is from the reference over all postures of one arm; NaN counts as endless. */
export function disagreement(entry: Reference['arms'][number]): Disagreement {
  const analyse = makePostureAnalyser(entry.arm);
  const worst: Disagreement = { pose: 0, jacobian: 0, gains: 0, manipulability: 0, maximumToolSpeed: 0, sureSpeed: 0 };
  const see = (field: keyof Disagreement, ours: number | null | undefined, theirs: number) => {
    const difference = Math.abs((ours ?? NaN) - theirs) / Math.max(1, Math.abs(theirs));
    worst[field] = Math.max(worst[field], Number.isNaN(difference) ? Infinity : difference);
  };
  const seeRows = (field: keyof Disagreement, ours: Rows, theirs: Rows) =>
    theirs.forEach((row, i) => row.forEach((value, j) => see(field, ours[i][j], value)));
  const seeMeasures = (ours: Measures, theirs: ReferenceMeasures) => {
    theirs.gains.forEach((gain, i) => see('gains', ours.gains?.[i], gain));
    see('gains', ours.ellipsoidSpeed, theirs.gains[0]);
    see('gains', ours.inverseConditionNumber, theirs.gains[theirs.gains.length - 1] / theirs.gains[0]);
    for (const field of ['manipulability', 'maximumToolSpeed', 'sureSpeed'] as const)
      see(field, ours[field], theirs[field]);
  };
  for (const answer of entry.answers) {
    const ours = analyse(answer.posture);
    seeRows('pose', ours.pose, answer.pose);
    seeRows('jacobian', ours.jacobian, answer.jacobian);
    seeMeasures(ours.wristFree, answer.wristFree);
    seeMeasures(ours.wristHeld, answer.wristHeld);
  }
  return worst;
}

export function freedomsInKernel({ arm }: ReferenceArm): string[] {
  return controlledFreedoms(arm, compileChain(arm)).map((row) => FREEDOMS[row]);
}
