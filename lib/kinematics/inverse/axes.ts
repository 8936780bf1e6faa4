import { forward, makeStance, type Chain } from '../chain';
import { identityTransform, type Transform } from '../transforms';
import { distanceToLine, dot, nearestOnFirst, type Triple } from './lines';

/** Where a chain's axes lie at its zero posture, in the frame of its base: what closed forms are recognised by. */
export interface Axes {
  readonly directions: readonly Triple[];
  readonly points: readonly Triple[];
  readonly flange: Transform;
}

export function axesOf(chain: Chain): Axes {
  const unbased: Chain = { ...chain, base: identityTransform() };
  const { axes, origins, flange } = forward(unbased, new Float64Array(chain.actuators), makeStance(unbased));
  const triples = (flat: Float64Array): Triple[] =>
    Array.from({ length: chain.joints }, (_, i) => [flat[3 * i], flat[3 * i + 1], flat[3 * i + 2]]);
  return { directions: triples(axes), points: triples(origins), flange };
}

/** Lengths (m) below which lines count as meeting. */
export const MEETING = 1e-9;

/** Where the three axes from joint `from` on meet; null where they do not meet in one point. */
export function meetingPoint({ directions, points }: Axes, from: number): Triple | null {
  const centre = nearestOnFirst(points[from], directions[from], points[from + 1], directions[from + 1]);
  if (!centre) return null;
  const apart = [from + 1, from + 2].some((i) => distanceToLine(centre, points[i], directions[i]) > MEETING);
  return apart ? null : centre;
}

/** A point given in the frame of the base, seen in that of the flange (which stands as in `flange`). */
export function inFlange(flange: Transform, point: Triple): Triple {
  const from: Triple = [point[0] - flange[3], point[1] - flange[7], point[2] - flange[11]];
  return [0, 1, 2].map((c) => dot([flange[c], flange[4 + c], flange[8 + c]], from)) as Triple;
}

/** Writes the rotation that takes the flange from its zero posture to `target`, nine numbers row after row: target · zeroᵀ. */
export function rotationFromZero(target: Transform, zero: Transform, out: Float64Array) {
  for (let i = 0; i < 3; i++)
    for (let j = 0; j < 3; j++)
      out[3 * i + j] =
        target[4 * i] * zero[4 * j] + target[4 * i + 1] * zero[4 * j + 1] + target[4 * i + 2] * zero[4 * j + 2];
}
