import { compileChain, forward, jacobian, makeStance, type Chain, type Stance } from './chain';
import { controlledFreedoms, rowsToMatch } from './freedoms';
import type { ClosedForm } from './inverse/closed-form';
import { gantrySolver } from './inverse/gantry';
import { makeNumericalSolver, type NumericalSolver } from './inverse/numerical';
import { palletiserSolver } from './inverse/palletiser';
import { parallelAxesSolver } from './inverse/parallel-axes';
import { sevenAxisSolver } from './inverse/seven-axis';
import { sphericalWristSolver } from './inverse/spherical-wrist';
import { trackSolver } from './inverse/track';
import { identityTransform, invertTransform, multiplyTransforms, type Transform } from './transforms';
import type { Arm } from './types';

/** How a chain is solved, in words for people. */
export type SolutionMethod =
  'spherical wrist' | 'parallel axes' | 'palletiser' | 'gantry' | 'arm angle' | 'track' | 'numerical';

/** Every closed form that the kernel knows, tried in this order: each recognises its own kind of chain. */
const CLOSED_FORMS: readonly (readonly [SolutionMethod, (chain: Chain) => ClosedForm | null])[] = [
  ['spherical wrist', sphericalWristSolver],
  ['parallel axes', parallelAxesSolver],
  ['palletiser', palletiserSolver],
  ['gantry', gantrySolver],
  ['arm angle', sevenAxisSolver],
  ['track', trackSolver],
];

function closedFormOf(chain: Chain): { method: SolutionMethod; closedForm: ClosedForm | null } {
  for (const [method, recognise] of CLOSED_FORMS) {
    const closedForm = recognise(chain);
    if (closedForm) return { method, closedForm };
  }
  return { method: 'numerical', closedForm: null };
}

/** An arm made ready: its chain, what it controls, how it is solved, and scratch space shared by one user at a time. */
export interface Solver {
  readonly chain: Chain;
  readonly freedoms: readonly number[];
  readonly method: SolutionMethod;
  readonly closedForm: ClosedForm | null;
  /** For chains without a closed form. */
  readonly solveNumerically: NumericalSolver;
  /** The tool's z axis lies on the last axis, so a free roll only turns the last joint. */
  readonly toolOnLastAxis: boolean;
  readonly stance: Stance;
  readonly matrix: Float64Array;
  /** Flange pose in the frame of the chain's base for a tool pose in the frame that the base is given in. */
  flangeOf(tool: Transform): Transform;
  /** Stands the chain and fills `matrix` with the Jacobian. */
  stand(actuators: ArrayLike<number>): Float64Array;
}

export function makeSolver(arm: Arm): Solver {
  const chain = compileChain(arm);
  const { method, closedForm } = closedFormOf(chain);
  const fromBase = invertTransform(chain.base, identityTransform());
  const fromTool = invertTransform(chain.tool, identityTransform());
  const flange = identityTransform();
  const stance = makeStance(chain);
  const matrix = new Float64Array(6 * chain.actuators);
  const freedoms = controlledFreedoms(arm, chain);
  return {
    chain,
    freedoms,
    method,
    closedForm,
    solveNumerically: makeNumericalSolver(chain, rowsToMatch(arm, chain, freedoms)),
    toolOnLastAxis: toolOnLastAxis(chain),
    stance,
    matrix,
    flangeOf: (tool) => multiplyTransforms(multiplyTransforms(fromBase, tool, flange), fromTool, flange),
    stand: (actuators) => jacobian(chain, forward(chain, actuators, stance), matrix),
  };
}

/** Lengths (m) and sines below which the tool counts as lying on the last axis. */
const ON_AXIS = 1e-9;

function toolOnLastAxis(chain: Chain): boolean {
  const last = chain.joints - 1;
  if (chain.prismatic[last] || !drivenAlone(chain, last)) return false;
  const { axes, origins, tool } = forward(chain, new Float64Array(chain.actuators), makeStance(chain));
  const [x, y, z] = axes.subarray(3 * last, 3 * last + 3);
  const [dx, dy, dz] = [tool[3] - origins[3 * last], tool[7] - origins[3 * last + 1], tool[11] - origins[3 * last + 2]];
  const aside = Math.hypot(y * dz - z * dy, z * dx - x * dz, x * dy - y * dx);
  const tilted = Math.hypot(y * tool[10] - z * tool[6], z * tool[2] - x * tool[10], x * tool[6] - y * tool[2]);
  return aside < ON_AXIS && tilted < ON_AXIS;
}

/** The last actuator drives the last joint one to one and nothing else. */
function drivenAlone({ coupling, joints, actuators }: Chain, last: number): boolean {
  if (!coupling) return true;
  for (let j = 0; j < joints; j++)
    for (let k = 0; k < actuators; k++) {
      const share = coupling[j * actuators + k];
      if (j === last && k === actuators - 1 ? share !== 1 : (j === last || k === actuators - 1) && share !== 0)
        return false;
    }
  return true;
}
