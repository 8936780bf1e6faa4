/** Plane geometry of the sheet. Millimetres and degrees; x right, y away, angles counter-clockwise. */

export type PointMm = readonly [number, number];

/** Where an item's own frame lies on the floor. */
export interface Placement {
  readonly xMm: number;
  readonly yMm: number;
  readonly angleDeg: number;
}

const radians = (degrees: number): number => (degrees * Math.PI) / 180;

/** A vector turned counter-clockwise. */
export function turned([x, y]: PointMm, angleDeg: number): [number, number] {
  const cosine = Math.cos(radians(angleDeg));
  const sine = Math.sin(radians(angleDeg));
  return [cosine * x - sine * y, sine * x + cosine * y];
}

/** A point of an item's frame, on the floor. */
export function itemToFloor(placement: Placement, point: PointMm): [number, number] {
  const [x, y] = turned(point, placement.angleDeg);
  return [placement.xMm + x, placement.yMm + y];
}

/** A point of the floor, in an item's frame. */
export function floorToItem(placement: Placement, point: PointMm): [number, number] {
  return turned([point[0] - placement.xMm, point[1] - placement.yMm], -placement.angleDeg);
}

/** A rectangle about the frame's origin, counter-clockwise from its lower left corner. */
export function rectangleOutline(widthMm: number, depthMm: number): [number, number][] {
  const x = widthMm / 2;
  const y = depthMm / 2;
  return [
    [-x, -y],
    [x, -y],
    [x, y],
    [-x, y],
  ];
}

/** Signed area in mm², positive for counter-clockwise corners (the shoelace formula). */
export function signedAreaMm2(outline: readonly PointMm[]): number {
  let twice = 0;
  for (let index = 0; index < outline.length; index += 1) {
    const [x1, y1] = outline[index];
    const [x2, y2] = outline[(index + 1) % outline.length];
    twice += x1 * y2 - x2 * y1;
  }
  return twice / 2;
}

export function polygonAreaMm2(outline: readonly PointMm[]): number {
  return Math.abs(signedAreaMm2(outline));
}

/** Two neighbouring corners nearer than this count as one. */
const SAME_POINT_MM = 1e-6;

export function distanceMm(a: PointMm, b: PointMm): number {
  return Math.hypot(b[0] - a[0], b[1] - a[1]);
}

/** Twice the signed area of the triangle; its sign says on which side of a → b the point c lies. */
function side(a: PointMm, b: PointMm, c: PointMm): number {
  return (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);
}

function liesWithin(a: PointMm, b: PointMm, c: PointMm): boolean {
  return (
    Math.min(a[0], b[0]) <= c[0] &&
    c[0] <= Math.max(a[0], b[0]) &&
    Math.min(a[1], b[1]) <= c[1] &&
    c[1] <= Math.max(a[1], b[1])
  );
}

/** Whether two closed segments share a point, touching ends and overlaps included. */
export function segmentsMeet(a: PointMm, b: PointMm, c: PointMm, d: PointMm): boolean {
  const sides = [side(a, b, c), side(a, b, d), side(c, d, a), side(c, d, b)].map(Math.sign);
  if (sides[0] * sides[1] < 0 && sides[2] * sides[3] < 0) return true;
  return (
    (sides[0] === 0 && liesWithin(a, b, c)) ||
    (sides[1] === 0 && liesWithin(a, b, d)) ||
    (sides[2] === 0 && liesWithin(c, d, a)) ||
    (sides[3] === 0 && liesWithin(c, d, b))
  );
}

/** Neighbouring edges p → q → r may share q only; they overlap where the way back lies on the way out. */
function doublesBack(p: PointMm, q: PointMm, r: PointMm): boolean {
  const along = (p[0] - q[0]) * (r[0] - q[0]) + (p[1] - q[1]) * (r[1] - q[1]);
  return side(p, q, r) === 0 && along > 0;
}

/**
 * Why an outline cannot stand for a solid, in plain words; null where it can. Sides are counted from 1, side n running
 * from corner n to the next.
 */
export function outlineFault(outline: readonly PointMm[]): string | null {
  const count = outline.length;
  for (let index = 0; index < count; index += 1) {
    const next = (index + 1) % count;
    if (distanceMm(outline[index], outline[next]) < SAME_POINT_MM) {
      return `Corners ${index + 1} and ${next + 1} lie on one spot. Remove one of them.`;
    }
  }
  for (let first = 0; first < count; first += 1) {
    for (let second = first + 1; second < count; second += 1) {
      if (sidesCross(outline, first, second)) {
        return `Sides ${first + 1} and ${second + 1} of the outline cross. Move a corner so that no two sides meet.`;
      }
    }
  }
  return polygonAreaMm2(outline) === 0 ? 'The outline encloses no floor. Move a corner off the line.' : null;
}

function sidesCross(outline: readonly PointMm[], first: number, second: number): boolean {
  const count = outline.length;
  const corner = (index: number): PointMm => outline[index % count];
  if (second === first + 1) return doublesBack(corner(first), corner(second), corner(second + 1));
  if (first === 0 && second === count - 1) return doublesBack(corner(second), corner(0), corner(1));
  return segmentsMeet(corner(first), corner(first + 1), corner(second), corner(second + 1));
}
