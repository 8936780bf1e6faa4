import type { PointMm } from '../ink';
import { uprightAngle } from '../ink';

export interface LabelEdge {
  readonly xMm: number;
  readonly yMm: number;
  /** Baseline in the item's frame, counter-clockwise; upright on the screen. */
  readonly angleRad: number;
  /** +1 where the name goes below the baseline on the screen, −1 above. */
  readonly side: 1 | -1;
  readonly lengthMm: number;
}

/**
 * The edge of an outline along which a name reads best: a long one at the lower side of the screen. The name stands outside
 * the outline. `itemAngleRad` is the item's turn on the floor.
 */
export function labelEdge(outline: readonly PointMm[], itemAngleRad: number): LabelEdge {
  let area = 0;
  outline.forEach(([x1, y1], index) => {
    const [x2, y2] = outline[(index + 1) % outline.length];
    area += x1 * y2 - x2 * y1;
  });
  const winding = area >= 0 ? 1 : -1;

  let best: LabelEdge | null = null;
  let bestScore = -Infinity;
  outline.forEach(([x1, y1], index) => {
    const [x2, y2] = outline[(index + 1) % outline.length];
    const lengthMm = Math.hypot(x2 - x1, y2 - y1);
    if (lengthMm === 0) return;
    const along = Math.atan2(y2 - y1, x2 - x1);
    const outward = along - (winding * Math.PI) / 2;
    const downness = -Math.sin(outward + itemAngleRad);
    const score = lengthMm * (downness + 0.15 * Math.cos(outward + itemAngleRad));
    if (score <= bestScore) return;
    bestScore = score;
    const { angleRad: upright } = uprightAngle(along + itemAngleRad);
    const baseline = upright - itemAngleRad;
    const side = Math.sin(outward - baseline) < 0 ? 1 : -1;
    best = { xMm: (x1 + x2) / 2, yMm: (y1 + y2) / 2, angleRad: baseline, side, lengthMm };
  });
  return best ?? { xMm: 0, yMm: 0, angleRad: -itemAngleRad, side: 1, lengthMm: 0 };
}
