import { compileChain, forward, makeStance, type Chain } from '@/lib/kinematics/chain';
import { along, cross, dot, length, minus, nearestOnFirst, type Triple } from '@/lib/kinematics/inverse/lines';
import type { Arm } from '@/lib/kinematics/types';
import { farthest, type Posture } from './farthest-posture';

/** What to say of an arm without any. */
export const NO_REACH =
  'The tool of this chain never leaves its first axis: an arm needs a link length (a) or an offset (d).';

/**
 * How far an arm reaches (mm), as the trade states it: the greatest distance from the first axis that the wrist centre can take
 * inside the limits, or the tool point of an arm whose last three axes do not meet. Where the first joint slides, the
 * distance is taken from the upright line through the base instead, since the first axis lies along the travel.
 * Found by line searches over forward kinematics, from the middle and from corners of the joints' ranges.
 */
export function armReachMm(arm: Arm): number {
  return 1000 * Math.sqrt(Math.max(0, farthest(arm, squareFromFirstAxis(arm))));
}

/** The highest and the lowest that the same point comes, mm above the frame that the base is given in. */
export function armHeightsMm(arm: Arm): { topMm: number; bottomMm: number } {
  const point = reachPoint(compileChain(arm));
  return {
    topMm: 1000 * farthest(arm, (posture) => point(posture)[2]),
    bottomMm: -1000 * farthest(arm, (posture) => -point(posture)[2]),
  };
}

function squareFromFirstAxis(arm: Arm): (posture: Posture) => number {
  const chain = compileChain(arm);
  const point = reachPoint(chain);
  const { axes, origins } = forward(chain, new Float64Array(chain.actuators), makeStance(chain));
  const slides = chain.prismatic[0] === 1;
  const origin: Triple = slides ? [chain.base[3], chain.base[7], chain.base[11]] : [origins[0], origins[1], origins[2]];
  const axis: Triple = slides ? [chain.base[2], chain.base[6], chain.base[10]] : [axes[0], axes[1], axes[2]];
  return (posture) => {
    const aside = cross(minus(point(posture), origin), axis);
    return dot(aside, aside);
  };
}

/** Lengths (m) below which two axes count as meeting. */
const MEETING = 1e-6;

/** The wrist centre of a posture, or its tool point where the last three axes do not turn about one point. */
function reachPoint(chain: Chain): (posture: Posture) => Triple {
  const stance = makeStance(chain);
  const n = chain.joints;
  const wrist = wristOffset(chain);
  return (posture) => {
    const { axes, origins, tool } = forward(chain, posture, stance);
    if (wrist === null) return [tool[3], tool[7], tool[11]];
    const j = 3 * (n - 2);
    return along([origins[j], origins[j + 1], origins[j + 2]], [axes[j], axes[j + 1], axes[j + 2]], wrist);
  };
}

/** How far along the last but one axis the last three meet (m), or null. It is the same in every posture. */
function wristOffset(chain: Chain): number | null {
  const n = chain.joints;
  if (n < 4 || chain.prismatic.subarray(n - 3).includes(1)) return null;
  const { axes, origins } = forward(chain, new Float64Array(chain.actuators), makeStance(chain));
  const line = (joint: number): [Triple, Triple] => [
    [origins[3 * joint], origins[3 * joint + 1], origins[3 * joint + 2]],
    [axes[3 * joint], axes[3 * joint + 1], axes[3 * joint + 2]],
  ];
  const [before, middle, last] = [line(n - 3), line(n - 2), line(n - 1)];
  const meetings = [before, last].map((other) => {
    const onMiddle = nearestOnFirst(...middle, ...other);
    if (!onMiddle) return null;
    const aside = length(cross(minus(onMiddle, other[0]), other[1]));
    return aside < MEETING ? dot(minus(onMiddle, middle[0]), middle[1]) : null;
  });
  const [first, second] = meetings;
  if (first === null || second === null || Math.abs(first - second) > MEETING) return null;
  return first;
}
