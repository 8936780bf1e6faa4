import { describe, expect, it } from 'vitest';
import { compileChain } from '@/lib/kinematics/chain';
import { BUILT_IN_ARMS } from '@/lib/kinematics/library';
import type { PointMm } from '../geometry';
import { linksToLinks, linksToPrisms, nothingNear } from './clearance';
import { makeLinks, standLinks } from './links';
import { liesInside } from './plane';
import { makePrism, segmentToPrism } from './prism';
import { segmentToSegment } from './segments';

/** Seeded, so that a failure can be seen again (mulberry32, public domain). */
function seeded(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

type Point3 = [number, number, number];
const L_SHAPE: PointMm[] = [[0, 0], [2000, 0], [2000, 500], [600, 500], [600, 1500], [0, 1500]]; // prettier-ignore
const BOX: PointMm[] = [[-400, -300], [700, -300], [700, 900], [-400, 900]]; // prettier-ignore

/** Least distance of many points of the segment from the solid, each worked out from the outline itself: an upper bound. */
function sampledDistance(
  outline: readonly PointMm[],
  z: [number, number],
  a: Point3,
  b: Point3,
  samples: number,
): number {
  let least = Infinity;
  for (let k = 0; k <= samples; k += 1) {
    const [x, y, height] = a.map((value, axis) => value + ((b[axis] - value) * k) / samples);
    const off = Math.max(z[0] - height, height - z[1], 0);
    least = Math.min(least, Math.hypot(planDistance(outline, x, y), off));
  }
  return least;
}

function planDistance(outline: readonly PointMm[], x: number, y: number): number {
  if (liesInside(outline, x * 1000, y * 1000)) return 0;
  return Math.min(
    ...outline.map(([x1, y1], i) => {
      const [x2, y2] = outline[(i + 1) % outline.length];
      const [ax, ay, dx, dy] = [x1 / 1000, y1 / 1000, (x2 - x1) / 1000, (y2 - y1) / 1000];
      const along = Math.min(1, Math.max(0, ((x - ax) * dx + (y - ay) * dy) / (dx * dx + dy * dy)));
      return Math.hypot(x - ax - along * dx, y - ay - along * dy);
    }),
  );
}

describe('distance of a link from a solid, against a brute-force sampler', () => {
  it.each([
    ['a box', BOX],
    ['an L', L_SHAPE],
  ])('%s', (_, outline) => {
    const random = seeded(7);
    const prism = makePrism(outline, 200, 900);
    const anywhere = (): Point3 => [4 * random() - 1.5, 4 * random() - 1.5, 2 * random() - 0.4];
    for (let trial = 0; trial < 300; trial += 1) {
      const [a, b] = [anywhere(), anywhere()];
      const samples = 600;
      const sampled = sampledDistance(outline, [0.2, 0.9], a, b, samples);
      const found = segmentToPrism(prism, ...a, ...b);
      // Two neighbouring samples are this far apart, so the true distance is at most half of it smaller.
      const spacing = Math.hypot(a[0] - b[0], a[1] - b[1], a[2] - b[2]) / samples;
      expect(found).toBeLessThanOrEqual(sampled + 1e-9);
      expect(found).toBeGreaterThanOrEqual(sampled - spacing / 2 - 1e-9);
    }
  });

  it('is exact where it can be told by hand', () => {
    const prism = makePrism(BOX, 0, 1000);
    // Over the top by 250 mm; beside the right face by 300 mm; off the upper right edge by a 3-4-5 triangle.
    expect(segmentToPrism(prism, 0, 0, 1.25, 0.5, 0.2, 1.4)).toBeCloseTo(0.25, 9);
    expect(segmentToPrism(prism, 1, 0, 0.2, 1, 0.5, 0.8)).toBeCloseTo(0.3, 9);
    expect(segmentToPrism(prism, 1, 0.1, 1.4, 1, 0.5, 1.4)).toBeCloseTo(0.5, 9);
    expect(segmentToPrism(prism, -2, 0, 0.5, 2, 0.1, 0.6)).toBe(0);
  });
});

it('the distance of two links agrees with a brute-force sampler', () => {
  const random = seeded(11);
  const anywhere = (): Point3 => [2 * random(), 2 * random(), 2 * random()];
  const samples = 160;
  for (let trial = 0; trial < 60; trial += 1) {
    const [p, q, r, s] = [anywhere(), anywhere(), anywhere(), anywhere()];
    let sampled = Infinity;
    for (let i = 0; i <= samples; i += 1) {
      for (let j = 0; j <= samples; j += 1) {
        const gap = [0, 1, 2].map((k) => p[k] + ((q[k] - p[k]) * i) / samples - r[k] - ((s[k] - r[k]) * j) / samples);
        sampled = Math.min(sampled, Math.hypot(...gap));
      }
    }
    const found = segmentToSegment(...p, ...q, ...r, ...s);
    expect(found).toBeLessThanOrEqual(sampled + 1e-9);
    expect(found).toBeGreaterThan(sampled - 4 / samples);
  }
  // Two parallel metres 0.3 m apart, and two points.
  expect(segmentToSegment(0, 0, 0, 1, 0, 0, 0.5, 0.3, 0, 2, 0.3, 0)).toBeCloseTo(0.3, 12);
  expect(segmentToSegment(0, 0, 0, 0, 0, 0, 0, 3, 4, 0, 3, 4)).toBe(5);
});

describe('the links of a robot', () => {
  const { arm } = BUILT_IN_ARMS.find(({ slug }) => slug === 'six-axis-6kg')!;
  const chain = compileChain(arm);
  const stood = (posture: number[]) => standLinks(chain, posture, makeLinks(chain, 0.06, 0.05));

  it('come nearer to a wall by as much as it moves, and say which link it was', () => {
    const links = stood([0, 0.3, -0.4, 0, 0.5, 0]);
    const reach = Math.max(...Array.from(links.points).filter((_, i) => i % 3 === 0));
    const wall = (xMm: number) => makePrism([[xMm, -5000], [xMm + 100, -5000], [xMm + 100, 5000], [xMm, 5000]], -2000, 5000); // prettier-ignore
    const near = linksToPrisms(links, [wall(2000)], -1, nothingNear());
    const far = linksToPrisms(links, [wall(2250)], -1, nothingNear());
    expect(far.distance - near.distance).toBeCloseTo(0.25, 9);
    expect(near.distance).toBeGreaterThan(2 - reach - 0.06 - 1e-9);
    expect(near.distance).toBeLessThan(2 - reach - 0.05 + 1e-9);
  });

  it('let the tool alone touch the fixture it works on', () => {
    const links = stood([0, 0.3, -0.4, 0, 0.5, 0]);
    const at = 3 * links.count;
    const [x, y, z] = links.points.slice(at, at + 3).map((value) => value * 1000);
    const fixture = makePrism([[x - 60, y - 60], [x + 60, y - 60], [x + 60, y + 60], [x - 60, y + 60]], z - 300, z - 1); // prettier-ignore
    expect(linksToPrisms(links, [fixture], -1, nothingNear()).distance).toBeLessThan(0);
    expect(linksToPrisms(links, [fixture], 0, nothingNear()).link).toBeLessThan(links.count - 1);
  });

  it('of two robots touch where they stand in one another', () => {
    const links = stood([0, 0, 0, 0, 0, 0]);
    expect(linksToLinks(links, stood([0, 0, 0, 0, 0, 0]), nothingNear()).distance).toBeLessThan(0);
  });
});
