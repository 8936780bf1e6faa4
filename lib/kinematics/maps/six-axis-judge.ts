import type { Chain } from '../chain';
import { DOUBTFUL, FLIPPED, PLAIN, TOO_FAR } from '../fast/branch-pairs';
import { JOINT, makeLimitOffsets, MISS, SHARE } from '../fast/limit-offsets';
import { ICN, makeSixAxisGauge, MAXIMUM_SPEED, SURE_SPEED } from '../fast/six-axis-gauge';
import { WRIST_FLIPPED } from '../inverse/spherical-wrist';
import type { WristMode } from '../types';
import { CLEARLY_BETTER, CODE, type Cell } from './cell';
import type { Judge } from './roll-search';

/**
 * The quick judge of six-axis arms with a spherical wrist: each wrist-flip pair is measured once, and speeds only for the pair that wins. Gives up
 * near singular postures and limits, for the reference to decide, and out of reach where the roll is searched (`searches`), as only the reference
 * tells by how much. Null for other chains. `turns`: the rotation changes from pose to pose; else call `orient` beforehand.
 */
export interface SixAxisJudge {
  readonly judge: Judge;
  readonly orient: (target: Float64Array) => void;
}

export function makeSixAxisJudge(
  chain: Chain,
  wrist: WristMode,
  wanted: number,
  lastIsFree: boolean,
  turns: boolean,
  searches: boolean,
  cell: Cell,
): SixAxisJudge | null {
  const gauge = makeSixAxisGauge(chain, wrist, lastIsFree);
  if (!gauge) return null;
  const { branches, reading } = gauge;
  const { codes, inside } = branches;
  const offsets = makeLimitOffsets(branches, chain);
  const { answers } = offsets;
  const joints = lastIsFree ? 5 : 6;

  /** The refusal of the branch that misses its limits by least. */
  function nameLimit(count: number) {
    for (let pair = 0; pair < count; pair++)
      for (let flip = 0; flip < 2; flip++) {
        if (wanted >= 0 && wanted !== (flip === 0 ? codes[pair] : codes[pair] | WRIST_FLIPPED)) continue;
        offsets.read(pair, flip === 1, 0, joints);
        if (cell.reason === CODE['joint limit'] && answers[MISS] >= cell.by) continue;
        cell.reason = CODE['joint limit'];
        cell.joint = answers[JOINT];
        cell.by = answers[MISS];
      }
  }

  const judge: Judge = (target) => {
    if (turns) branches.orient(target);
    const count = branches.solve(target);
    if (count < 0) {
      if (count === DOUBTFUL || searches) return false;
      cell.reason = count === TOO_FAR ? CODE['too far'] : CODE['too near'];
      return true;
    }
    let best = -1;
    let code = 0;
    for (let pair = 0; pair < count; pair++) {
      const flips = inside[pair];
      const plain = codes[pair];
      // Of two flips that measure alike the plain one is taken, as the reference meets it first.
      if (flips & PLAIN && (wanted < 0 || wanted === plain)) code = plain;
      else if (flips & FLIPPED && (wanted < 0 || wanted === (plain | WRIST_FLIPPED))) code = plain | WRIST_FLIPPED;
      else continue;
      gauge.read(pair);
      if (cell.reason === CODE.reached && reading[ICN] <= cell.value + CLEARLY_BETTER) continue;
      cell.reason = CODE.reached;
      cell.value = reading[ICN];
      cell.branch = code;
      best = pair;
    }
    if (best < 0) {
      if (cell.reason !== CODE.reached) nameLimit(count);
      return true;
    }
    gauge.read(best);
    gauge.readSpeeds();
    cell.maximumToolSpeed = reading[MAXIMUM_SPEED];
    cell.sureSpeed = reading[SURE_SPEED];
    offsets.read(best, (cell.branch & WRIST_FLIPPED) !== 0, 0, joints);
    cell.limitShare = answers[SHARE];
    cell.joint = 0;
    return true;
  };
  return { judge, orient: branches.orient };
}
