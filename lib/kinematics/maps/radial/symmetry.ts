import type { Chain } from '../../chain';
import { LAST_AXIS, makeBranchPairs, OFFSET } from '../../fast/branch-pairs';
import type { Solver } from '../../solver';
import { orient } from '../../target';
import { identityTransform, type Transform } from '../../transforms';
import type { MapRequest, Vec3, WristMode } from '../../types';

/** A map whose values depend on the distance from axis 1 alone, joint 1 but for its limits left out. */
export interface Symmetry {
  readonly chain: Chain;
  readonly wrist: WristMode;
  readonly wanted: number;
  readonly lastIsFree: boolean;
  /** Tool rotation at bearing zero; its position is scratch. */
  readonly pose: Transform;
  /** Where the map's plane meets axis 1, then the direction of bearing zero, x y z each, in the frame that the base is given in. */
  readonly heading: Float64Array;
  /** Map plane to bearings: x and y about axis 1 from the frame that the base is given in, 2 × 3: factors of x, of y, and a shift. */
  readonly toPlane: Float64Array;
  readonly halfRanges: Float64Array;
  /** Where joint 1 stands mid-range (cosine, sine), cosine of half its range, −2 where any angle will do. */
  readonly first: readonly [number, number, number];
  /** Distance from axis 1 beyond which nothing is reached (m). */
  readonly reach: number;
  /** +1 or −1: joint 6 turns with or against the bearing. */
  readonly turn6: number;
}

/** m, and sines. */
const EXACTLY = 1e-9;

/** Null where the map has no such symmetry. Fixed rolls qualify only where joint 6 takes any angle, so that its limits mask nothing. */
export function symmetryOf(solver: Solver, request: MapRequest, wanted: number): Symmetry | null {
  const { chain } = solver;
  const { direction, toolHeight } = request;
  // A cone's sampled directions do not turn with the bearing, and a section is not level.
  if (request.cone || request.section) return null;
  if (solver.method !== 'spherical wrist' || solver.freedoms.length !== 6 || !solver.toolOnLastAxis) return null;
  const lastIsFree = request.roll === 'free';
  const branches = makeBranchPairs(chain, lastIsFree);
  if (!branches || Math.abs(branches.lengths.lateral) > EXACTLY * EXACTLY) return null;
  const t = branches.toAxis;
  // Row 3 of the rotation is axis 1; the map is level, so the axis has to be vertical.
  if (Math.abs(t[8]) > EXACTLY || Math.abs(t[9]) > EXACTLY) return null;
  const vertical = direction.kind === 'down' || (direction.kind === 'vector' && isVertical(direction.vector));
  if (!vertical && direction.kind !== 'outward') return null;
  if (!lastIsFree && (!vertical || branches.edges[5] !== -2)) return null;
  const centre = [-(t[0] * t[3] + t[4] * t[7]), -(t[1] * t[3] + t[5] * t[7])];
  // Outward is measured from the base's own origin.
  const aside = Math.hypot(centre[0] - chain.base[3], centre[1] - chain.base[7]);
  if (direction.kind === 'outward' && aside > EXACTLY) return null;

  const pose = identityTransform();
  const roll = request.roll === 'free' ? 0 : request.roll;
  if (direction.kind === 'outward') {
    const c = Math.cos(direction.tilt);
    orient([c * t[0], c * t[1], Math.sin(direction.tilt)], roll, pose);
  } else orient(direction.kind === 'vector' ? direction.vector : [0, 0, -1], roll, pose);
  branches.orient(pose);
  const { shoulderX, upper, fore } = branches.lengths;
  const hand = Math.hypot(branches.shared[OFFSET], branches.shared[OFFSET + 1]);
  return {
    chain,
    wrist: request.wrist,
    wanted,
    lastIsFree,
    pose,
    heading: Float64Array.of(centre[0], centre[1], toolHeight, t[0], t[1], 0),
    toPlane: Float64Array.of(t[0], t[1], t[2] * toolHeight + t[3], t[4], t[5], t[6] * toolHeight + t[7]),
    halfRanges: Float64Array.from(chain.min, (low, i) => (chain.max[i] - low) / 2),
    first: [branches.windows[0], branches.windows[1], branches.edges[0]],
    reach: Math.abs(shoulderX) + upper + fore + hand,
    turn6: branches.shared[LAST_AXIS + 2] > 0 ? -1 : 1,
  };
}

const isVertical = ([x, y, z]: Vec3): boolean => Math.hypot(x, y) <= EXACTLY * Math.abs(z);
