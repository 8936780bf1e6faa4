import { compileChain, forward, jacobian, makeStance, type Chain, type Stance } from './chain';
import { controlledFreedoms, rowsToMatch } from './freedoms';
import type { ClosedForm } from './inverse/closed-form';
import { makeNumericalSolver, type NumericalSolver } from './inverse/numerical';
import { parallelAxesSolver } from './inverse/parallel-axes';
import { sphericalWristSolver } from './inverse/spherical-wrist';
import { identityTransform, invertTransform, multiplyTransforms, type Transform } from './transforms';
import type { Arm } from './types';

/** How a chain is solved, in words for people. */
export type SolutionMethod = 'spherical wrist' | 'parallel axes' | 'numerical';

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
  const spherical = sphericalWristSolver(chain);
  const closedForm = spherical ?? parallelAxesSolver(chain);
  const fromBase = invertTransform(chain.base, identityTransform());
  const fromTool = invertTransform(chain.tool, identityTransform());
  const flange = identityTransform();
  const stance = makeStance(chain);
  const matrix = new Float64Array(6 * chain.actuators);
  const freedoms = controlledFreedoms(arm, chain);
  return {
    chain,
    freedoms,
    method: spherical ? 'spherical wrist' : closedForm ? 'parallel axes' : 'numerical',
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
  if (chain.prismatic[last] || chain.coupling) return false;
  const { axes, origins, tool } = forward(chain, new Float64Array(chain.actuators), makeStance(chain));
  const [x, y, z] = axes.subarray(3 * last, 3 * last + 3);
  const [dx, dy, dz] = [tool[3] - origins[3 * last], tool[7] - origins[3 * last + 1], tool[11] - origins[3 * last + 2]];
  const aside = Math.hypot(y * dz - z * dy, z * dx - x * dz, x * dy - y * dx);
  const tilted = Math.hypot(y * tool[10] - z * tool[6], z * tool[2] - x * tool[10], x * tool[6] - y * tool[2]);
  return aside < ON_AXIS && tilted < ON_AXIS;
}
