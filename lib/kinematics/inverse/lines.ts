/** Small helpers on lines in space, for recognising what a chain is. Vectors are plain triples. */
export type Triple = [number, number, number];

export const dot = (a: Triple, b: Triple): number => a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
export const cross = (a: Triple, b: Triple): Triple => [
  a[1] * b[2] - a[2] * b[1],
  a[2] * b[0] - a[0] * b[2],
  a[0] * b[1] - a[1] * b[0],
];
export const minus = (a: Triple, b: Triple): Triple => [a[0] - b[0], a[1] - b[1], a[2] - b[2]];
export const along = (point: Triple, direction: Triple, t: number): Triple => [
  point[0] + direction[0] * t,
  point[1] + direction[1] * t,
  point[2] + direction[2] * t,
];
export const length = (a: Triple): number => Math.hypot(a[0], a[1], a[2]);

/** Point on the first line nearest to the second; null where they are parallel. Directions are unit vectors. */
export function nearestOnFirst(p: Triple, u: Triple, q: Triple, v: Triple): Triple | null {
  const normal = cross(u, v);
  const square = dot(normal, normal);
  if (square < 1e-18) return null;
  return along(p, u, dot(cross(minus(q, p), v), normal) / square);
}

/** Distance of a point from a line with unit direction. */
export const distanceToLine = (point: Triple, origin: Triple, direction: Triple): number =>
  length(cross(minus(point, origin), direction));
