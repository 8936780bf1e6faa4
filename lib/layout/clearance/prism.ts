import { signedAreaMm2, type PointMm } from '../geometry';

/**
 * Solids that a link may hit: outlines drawn up between two heights, cut into convex pieces once so that the many questions
 * about them are quick. All in metres, floor frame; nothing is allocated per question.
 */
export interface Prism {
  /** Convex pieces, counter-clockwise: x, y, x, y, … */
  readonly pieces: readonly Float64Array[];
  readonly zFrom: number;
  readonly zTo: number;
  /** Around all of it: left, near, right, far. */
  readonly box: Float64Array;
}

/** @param outline corners in mm on the floor; @param zFromMm, zToMm heights in mm. */
export function makePrism(outline: readonly PointMm[], zFromMm: number, zToMm: number): Prism {
  const corners = signedAreaMm2(outline) < 0 ? [...outline].reverse() : outline;
  const inMetres = corners.map(([x, y]): PointMm => [x / 1000, y / 1000]);
  const xs = inMetres.map(([x]) => x);
  const ys = inMetres.map(([, y]) => y);
  return {
    pieces: convexPieces(inMetres).map((piece) => Float64Array.from(piece.flat())),
    zFrom: zFromMm / 1000,
    zTo: zToMm / 1000,
    box: Float64Array.of(Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)),
  };
}

const turn = (a: PointMm, b: PointMm, c: PointMm): number =>
  (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);

/** The outline itself where it is convex, else triangles by cutting off ears (Meisters 1975). */
function convexPieces(outline: readonly PointMm[]): (readonly PointMm[])[] {
  const count = outline.length;
  const isConvex = outline.every(
    (point, i) => turn(outline[(i + count - 1) % count], point, outline[(i + 1) % count]) >= 0,
  );
  if (isConvex) return [outline];
  const rest = [...outline];
  const pieces: PointMm[][] = [];
  while (rest.length > 3) {
    const ear = rest.findIndex((_, i) => isEar(rest, i));
    // Rounding may leave no perfect ear; the flattest corner then loses no floor worth speaking of.
    const at = ear < 0 ? 0 : ear;
    const n = rest.length;
    pieces.push([rest[(at + n - 1) % n], rest[at], rest[(at + 1) % n]]);
    rest.splice(at, 1);
  }
  return [...pieces, rest];
}

function isEar(outline: readonly PointMm[], at: number): boolean {
  const n = outline.length;
  const [a, b, c] = [outline[(at + n - 1) % n], outline[at], outline[(at + 1) % n]];
  if (turn(a, b, c) <= 0) return false;
  return outline.every(
    (p) => p === a || p === b || p === c || !(turn(a, b, p) >= 0 && turn(b, c, p) >= 0 && turn(c, a, p) >= 0),
  );
}

/** Squared distance in plan of a point from a convex piece; 0 inside. */
function planSquare(piece: Float64Array, x: number, y: number): number {
  const n = piece.length;
  let least = Infinity;
  let inside = true;
  for (let i = 0; i < n; i += 2) {
    const x1 = piece[i];
    const y1 = piece[i + 1];
    const j = i + 2 === n ? 0 : i + 2;
    const dx = piece[j] - x1;
    const dy = piece[j + 1] - y1;
    if (dx * (y - y1) - dy * (x - x1) < 0) inside = false;
    const square = dx * dx + dy * dy;
    let along = square === 0 ? 0 : ((x - x1) * dx + (y - y1) * dy) / square;
    if (along < 0) along = 0;
    else if (along > 1) along = 1;
    const ox = x - x1 - along * dx;
    const oy = y - y1 - along * dy;
    const off = ox * ox + oy * oy;
    if (off < least) least = off;
  }
  return inside ? 0 : least;
}

/** A third of the golden ratio's business: the share that each step of the search keeps. */
const KEEP = 0.6180339887498949;
const STEPS = 44;

/**
 * Distance (m) of a segment from a solid; 0 where it enters. The distance from a convex piece is a convex function along the
 * segment, so a golden-section search finds its least value (Kiefer 1953); the error is below a micrometre for links of metres.
 * `limit`: a distance beyond which the caller does not care; a larger one may come out as any value at or above it.
 */
export function segmentToPrism(
  prism: Prism,
  ax: number,
  ay: number,
  az: number,
  bx: number,
  by: number,
  bz: number,
  limit = Infinity,
): number {
  // prettier-ignore
  const { pieces, zFrom, zTo, box } = prism;
  // Boxes that lie farther apart than the limit need no search.
  const gapX = Math.max(box[0] - Math.max(ax, bx), Math.min(ax, bx) - box[2], 0);
  const gapY = Math.max(box[1] - Math.max(ay, by), Math.min(ay, by) - box[3], 0);
  const gapZ = Math.max(zFrom - Math.max(az, bz), Math.min(az, bz) - zTo, 0);
  const gap = gapX * gapX + gapY * gapY + gapZ * gapZ;
  if (gap >= limit * limit) return Math.sqrt(gap);
  let best = Infinity;
  for (let p = 0; p < pieces.length; p += 1) {
    const found = leastAlong(pieces[p], zFrom, zTo, ax, ay, az, bx - ax, by - ay, bz - az);
    if (found < best) best = found;
    if (best === 0) return 0;
  }
  return Math.sqrt(best);
}

function leastAlong(
  piece: Float64Array,
  zFrom: number,
  zTo: number,
  ax: number,
  ay: number,
  az: number,
  dx: number,
  dy: number,
  dz: number,
): number {
  // prettier-ignore
  let low = 0;
  let high = 1;
  let left = high - KEEP;
  let right = KEEP;
  let atLeft = squareAt(piece, zFrom, zTo, ax + left * dx, ay + left * dy, az + left * dz);
  let atRight = squareAt(piece, zFrom, zTo, ax + right * dx, ay + right * dy, az + right * dz);
  let best = Math.min(
    atLeft,
    atRight,
    squareAt(piece, zFrom, zTo, ax, ay, az),
    squareAt(piece, zFrom, zTo, ax + dx, ay + dy, az + dz),
  );
  for (let step = 0; step < STEPS && best > 0; step += 1) {
    if (atLeft <= atRight) {
      high = right;
      right = left;
      atRight = atLeft;
      left = high - KEEP * (high - low);
      atLeft = squareAt(piece, zFrom, zTo, ax + left * dx, ay + left * dy, az + left * dz);
      if (atLeft < best) best = atLeft;
    } else {
      low = left;
      left = right;
      atLeft = atRight;
      right = low + KEEP * (high - low);
      atRight = squareAt(piece, zFrom, zTo, ax + right * dx, ay + right * dy, az + right * dz);
      if (atRight < best) best = atRight;
    }
  }
  return best;
}

function squareAt(piece: Float64Array, zFrom: number, zTo: number, x: number, y: number, z: number): number {
  const off = z < zFrom ? zFrom - z : z > zTo ? z - zTo : 0;
  return planSquare(piece, x, y) + off * off;
}
