import { makeMapComputer } from './maps/compute-tile';
import { mapSummary } from './maps/summary';
import { makePostureAnalyser } from './posture';
import { reach, type ReachAnswer } from './reach';
import { makeSolver } from './solver';
import { REASONS, type Arm, type MapRequest, type PostureAnalysis, type Target } from './types';

/** A batch of questions about one arm, already checked. */
export interface Questions {
  readonly arm: Arm;
  readonly postures?: readonly (readonly number[])[];
  readonly targets?: readonly Target[];
  readonly map?: MapRequest;
}

export interface TargetAnswer {
  readonly reached: boolean;
  readonly reason: string | null;
  readonly solutions: number[][];
}

export interface MapAnswer {
  readonly columns: number;
  readonly rows: number;
  readonly reason: string[];
  /** Joint counted from one. */
  readonly bindingJoint: (number | null)[];
  readonly branch: (string | null)[];
  readonly inverseConditionNumber: (number | null)[];
  readonly maximumToolSpeed: (number | null)[];
  readonly sureSpeed: (number | null)[];
  readonly limitShare: (number | null)[];
  readonly wristCoverage: number[];
  readonly summary: {
    readonly reachedAreaM2: number;
    readonly bestInverseConditionNumber: number | null;
    readonly fastestToolSpeed: number | null;
  };
}

export interface Answers {
  postures?: PostureAnalysis[];
  targets?: TargetAnswer[];
  map?: MapAnswer;
}

/** Answers what was asked and leaves the rest out. */
export function analyse({ arm, postures, targets, map }: Questions): Answers {
  const answers: Answers = {};
  if (postures) answers.postures = postures.map(makePostureAnalyser(arm));
  if (targets) {
    const solver = makeSolver(arm);
    answers.targets = targets.map((target) => {
      const answer = reach(solver, target);
      return {
        reached: answer.reached,
        reason: answer.reached ? null : reasonInWords(answer, arm),
        solutions: answer.postures.map(({ posture }) => posture),
      };
    });
  }
  if (map) answers.map = answerMap(arm, map);
  return answers;
}

/** "joint 5 past its limit by 12.3°", "too far by 62 mm", … */
export function reasonInWords({ reason, joint, by }: ReachAnswer, arm: Arm): string {
  if (reason === 'joint limit' && joint >= 0) {
    const amount = arm.joints[joint].type === 'revolute' ? `${((by * 180) / Math.PI).toFixed(1)}°` : millimetres(by);
    return `joint ${joint + 1} past its limit by ${amount}`;
  }
  if (reason === 'joint limit') return 'only beyond a joint limit';
  if (reason === 'too far' || reason === 'too near') return `${reason} by ${millimetres(by)}`;
  if (reason === 'direction') return 'the arm cannot point its tool this way';
  return 'no posture found';
}

const millimetres = (m: number) => `${(m * 1000).toFixed(m < 0.01 ? 1 : 0)} mm`;

function answerMap(arm: Arm, request: MapRequest): MapAnswer {
  const { columns, rows, step } = request.grid;
  const computer = makeMapComputer(arm, request);
  const tile = computer.tile(0, rows);
  const plane = (values: Float32Array) => Array.from(values, (value) => (Number.isNaN(value) ? null : value));
  const { reachedAreaM2, bestInverseConditionNumber, fastestToolSpeed } = mapSummary([tile], step);
  return {
    columns,
    rows,
    reason: Array.from(tile.reason, (code) => REASONS[code]),
    bindingJoint: Array.from(tile.bindingJoint, (joint) => joint || null),
    branch: Array.from(tile.branch, (code, i) => (tile.reason[i] === 0 ? (computer.classes[code] ?? '') : null)),
    inverseConditionNumber: plane(tile.inverseConditionNumber),
    maximumToolSpeed: plane(tile.maximumToolSpeed),
    sureSpeed: plane(tile.sureSpeed),
    limitShare: plane(tile.limitShare),
    wristCoverage: Array.from(tile.wristCoverage),
    summary: { reachedAreaM2, bestInverseConditionNumber, fastestToolSpeed },
  };
}
