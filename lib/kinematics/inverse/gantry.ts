import type { Chain } from '../chain';
import { invertSmall } from '../measures/small-matrix';
import type { Transform } from '../transforms';
import { axesOf, inFlange, meetingPoint, rotationFromZero } from './axes';
import { makeBranches, type Branches, type ClosedForm } from './closed-form';
import { makeThreeTurns } from './three-turns';
import { placeInFlange } from './vectors';

/** Three slides, square to each other or not, that carry a spherical wrist: the wrist centre gives the slides, the rest the wrist. */
export function gantrySolver(chain: Chain): ClosedForm | null {
  if (chain.joints !== 6 || chain.coupling) return null;
  if (chain.prismatic.some((flag, i) => flag !== (i < 3 ? 1 : 0))) return null;
  const axes = axesOf(chain);
  const { directions, flange: zero } = axes;
  const centre = meetingPoint(axes, 3);
  const turns = makeThreeTurns(directions.slice(3));
  if (!centre || !turns) return null;
  const slides = Float64Array.from([0, 1, 2].flatMap((row) => [0, 1, 2].map((i) => directions[i][row])));
  const inverse = new Float64Array(9);
  if (!invertSmall(slides, 3, inverse)) return null;

  const wrist = inFlange(zero, centre);
  const branches = makeBranches(2, 6);
  const { values, codes } = branches;
  const rotation = new Float64Array(9);
  const shift = new Float64Array(3);

  function solve(flange: Transform): Branches {
    placeInFlange(flange, wrist, shift);
    for (let row = 0; row < 3; row++) shift[row] -= centre![row];
    rotationFromZero(flange, zero, rotation);
    branches.count = turns!.solve(rotation);
    for (let b = 0; b < branches.count; b++) {
      for (let i = 0; i < 3; i++) {
        values[6 * b + i] = inverse[3 * i] * shift[0] + inverse[3 * i + 1] * shift[1] + inverse[3 * i + 2] * shift[2];
        values[6 * b + 3 + i] = turns!.angles[3 * b + i];
      }
      codes[b] = b;
    }
    return branches;
  }

  return {
    branches,
    classes: 2,
    family: null,
    solve,
    nameOf: (code) => (code === 0 ? 'wrist plain' : 'wrist flipped'),
    shapeOf: () => 0,
  };
}
