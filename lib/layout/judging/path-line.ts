import type { PathCorner, Point3 } from '../items';

export type Vector3 = readonly [number, number, number];

/** One place of a path; mm in the frame of its corners. */
export interface LinePoint {
  readonly atMm: number;
  readonly positionMm: Vector3;
  /** Unit direction of travel. */
  readonly tangent: Vector3;
}

export interface PathLine {
  readonly points: readonly LinePoint[];
  readonly lengthMm: number;
  /** Indices of points at which the tool has to come to rest, the two ends and every sharp corner; ascending. */
  readonly rests: readonly number[];
}

/** Directions that differ by less run on smoothly (cosine of 2°). */
const SMOOTH = Math.cos((2 * Math.PI) / 180);
/** Sine of the angle at which three points count as one line. */
const STRAIGHT = 1e-6;

const vector = ({ xMm, yMm, zMm }: Point3): Vector3 => [xMm, yMm, zMm];
const minus = (a: Vector3, b: Vector3): Vector3 => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
const plus = (a: Vector3, b: Vector3, by = 1): Vector3 => [a[0] + by * b[0], a[1] + by * b[1], a[2] + by * b[2]];
const scaled = (a: Vector3, by: number): Vector3 => [a[0] * by, a[1] * by, a[2] * by];
const dot = (a: Vector3, b: Vector3): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
const cross = (a: Vector3, b: Vector3): Vector3 => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];
const size = (a: Vector3): number => Math.sqrt(dot(a, a));

/** A stretch from one corner to the next: its length, and place and direction at a share of it. */
interface Stretch {
  readonly lengthMm: number;
  at(share: number): { positionMm: Vector3; tangent: Vector3 };
}

function lineStretch(from: Vector3, to: Vector3): Stretch {
  const along = minus(to, from);
  const lengthMm = size(along);
  const tangent = scaled(along, 1 / lengthMm);
  return { lengthMm, at: (share) => ({ positionMm: plus(from, along, share), tangent }) };
}

/** The arc of the circle through three points, from the first to the last by way of the middle one; a line where they lie on one. */
function arcStretch(from: Vector3, via: Vector3, to: Vector3): Stretch {
  const [a, b] = [minus(via, from), minus(to, from)];
  const normal = cross(a, b);
  if (size(normal) <= STRAIGHT * size(a) * size(b)) return lineStretch(from, to);
  // The centre, from the corner `from` (the circumcentre of a triangle; any textbook of analytic geometry).
  const factor = 1 / (2 * dot(normal, normal));
  const toCentre = plus(scaled(cross(normal, a), factor * dot(b, b)), cross(b, normal), factor * dot(a, a));
  const centre = plus(from, toCentre);
  const radius = size(toCentre);
  const axis = scaled(normal, 1 / size(normal));
  const first = scaled(minus(from, centre), 1 / radius);
  const second = cross(axis, first);
  const angleOf = (point: Vector3): number => {
    const out = minus(point, centre);
    const angle = Math.atan2(dot(out, second), dot(out, first));
    return angle < 0 ? angle + 2 * Math.PI : angle;
  };
  // About this axis the middle point comes before the last: the normal was made so.
  const sweep = angleOf(to);
  return {
    lengthMm: radius * sweep,
    at: (share) => {
      const [cosine, sine] = [Math.cos(share * sweep), Math.sin(share * sweep)];
      return {
        positionMm: plus(plus(centre, first, radius * cosine), second, radius * sine),
        tangent: plus(scaled(first, -sine), second, cosine),
      };
    },
  };
}

/** Corners nearer than this are one, mm. */
const SAME_MM = 1e-6;

function stretchesOf(corners: readonly PathCorner[]): Stretch[] {
  return corners.slice(1).flatMap((corner, index) => {
    const [from, to] = [vector(corners[index]), vector(corner)];
    if (corner.arcVia) {
      const via = vector(corner.arcVia);
      if (size(minus(via, from)) > SAME_MM && size(minus(to, via)) > SAME_MM && size(minus(to, from)) > SAME_MM)
        return [arcStretch(from, via, to)];
    }
    return size(minus(to, from)) > SAME_MM ? [lineStretch(from, to)] : [];
  });
}

/**
 * Samples of a path, at most `stepMm` apart, every corner among them twice: at the end of the stretch before and at the beginning of the one
 * after, with the direction of each. Empty where all corners lie on one spot.
 */
export function pathLine(corners: readonly PathCorner[], stepMm: number): PathLine {
  const points: LinePoint[] = [];
  const rests: number[] = [];
  let lengthMm = 0;
  for (const stretch of stretchesOf(corners)) {
    const start = stretch.at(0);
    const before = points.at(-1);
    if (!before || dot(before.tangent, start.tangent) < SMOOTH) rests.push(points.length);
    const steps = Math.max(2, Math.ceil(stretch.lengthMm / stepMm - 1e-9));
    for (let k = 0; k <= steps; k++) {
      points.push({ atMm: lengthMm + (stretch.lengthMm * k) / steps, ...stretch.at(k / steps) });
    }
    lengthMm += stretch.lengthMm;
  }
  if (points.length > 0) rests.push(points.length - 1);
  return { points, lengthMm, rests };
}

/** A step that shows a path well and keeps long ones quick: a hundredth of the length, 2 to 20 mm. */
export function pathStepMm(corners: readonly PathCorner[]): number {
  const lengthMm = stretchesOf(corners).reduce((sum, stretch) => sum + stretch.lengthMm, 0);
  return Math.min(20, Math.max(2, lengthMm / 100));
}
