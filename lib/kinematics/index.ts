/**
 * The computation of Elbowroom: pure functions from an arm and a question to an answer. No clock, no random numbers, no input or output; SI
 * units; the same code runs in Node, in worker threads and in browser workers.
 *
 *   chain       an arm compiled to flat numbers; forward kinematics and Jacobian
 *   measures/   gains, velocity polytopes and what is read off them
 *   inverse/    closed forms, families of redundant chains, and damped least squares
 *   solver      an arm made ready to be asked;  reach: all postures of a target, or why there are none
 *   posture     one posture analysed;  spot: one spot with all its branches;  maps/: a grid of spots
 *   library/    the built-in arms
 */
export * from './types';
export { KERNEL_VERSION } from './version';
export { canonicalJson } from './canonical-json';
export { BUILT_IN_ARMS, type BuiltInArm } from './library';
export { compileChain, forward, jacobian, makeStance, skeleton, type Chain, type Stance } from './chain';
export { controlledFreedoms, FREEDOMS } from './freedoms';
export { analysePosture, makePostureAnalyser, type PostureAnalyser } from './posture';
export { limitMargin, limitShare, withinLimits } from './limits';
export { makeSolver, type SolutionMethod, type Solver } from './solver';
export { reach, type ReachAnswer, type ReachingPosture, type Score } from './reach';
export { makeSpotReader, readSpot, type SpotPosture, type SpotReading } from './spot';
export { errorGain, worstErrorAlong, type ErrorFigures, type ErrorGain } from './measures/error-gain';
export { makePoseConditioner, type PoseCondition, type PoseConditioner } from './measures/pose-condition';
export {
  principalDirections,
  type PrincipalDirection,
  type PrincipalDirections,
} from './measures/principal-directions';
export { spreadDirections, wristCoverage, type Directions, type WristCoverage } from './measures/wrist-coverage';
export { velocityOutlines, type VelocityOutline, type VelocityOutlines } from './velocity-outline';
export { branchNames, computeMapTile, makeMapComputer, type MapComputer } from './maps/compute-tile';
export { decodeMapTile, encodeMapTile, makeMapTile } from './maps/tile-codec';
export { analyse, reasonInWords, type Answers, type Questions } from './analyse';
export { mapSummary, type MapSummary } from './maps/summary';
