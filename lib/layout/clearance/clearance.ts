import type { Links } from './links';
import { segmentToPrism, type Prism } from './prism';
import { segmentToSegment } from './segments';

/** What came nearest, and how near (m; below zero where bodies run into one another). `index` counts the prisms or links asked about. */
export interface Nearest {
  distance: number;
  link: number;
  index: number;
}

export const nothingNear = (): Nearest => ({ distance: Infinity, link: -1, index: -1 });

/**
 * Least distance of a robot's links from solids; both in one frame. Links as they stand, with their radii taken off. The first
 * stick runs up inside the base and is left out. Writes into `out`, and allocates nothing.
 * @param skipTool index of a solid that the tool may touch, such as the fixture it works on; −1 for none.
 */
export function linksToPrisms(links: Links, prisms: readonly Prism[], skipTool: number, out: Nearest): Nearest {
  const { points, radii, count } = links;
  for (let link = 1; link < count; link += 1) {
    const at = 3 * link;
    for (let index = 0; index < prisms.length; index += 1) {
      if (link === count - 1 && index === skipTool) continue;
      const limit = out.distance + radii[link];
      const distance =
        segmentToPrism(
          prisms[index],
          points[at], points[at + 1], points[at + 2],
          points[at + 3], points[at + 4], points[at + 5],
          limit,
        ) - radii[link]; // prettier-ignore
      if (distance >= out.distance) continue;
      out.distance = distance;
      out.link = link;
      out.index = index;
    }
  }
  return out;
}

/** Least distance of the links of two robots, both in one frame. `index` is the other robot's link. */
export function linksToLinks(links: Links, others: Links, out: Nearest): Nearest {
  const { points: p, radii, count } = links;
  const { points: q, radii: otherRadii } = others;
  for (let link = 1; link < count; link += 1) {
    const a = 3 * link;
    for (let other = 1; other < others.count; other += 1) {
      const b = 3 * other;
      const distance =
        segmentToSegment(
          p[a], p[a + 1], p[a + 2], p[a + 3], p[a + 4], p[a + 5],
          q[b], q[b + 1], q[b + 2], q[b + 3], q[b + 4], q[b + 5],
        ) -
        radii[link] -
        otherRadii[other]; // prettier-ignore
      if (distance >= out.distance) continue;
      out.distance = distance;
      out.link = link;
      out.index = other;
    }
  }
  return out;
}
