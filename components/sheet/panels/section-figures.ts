import { compileChain, skeleton } from '@/lib/kinematics/chain';
import type { Arm } from '@/lib/kinematics/types';
import type { Robot } from '@/lib/layout/items';
import { armWithTool, baseToFloor } from '@/lib/layout/robot-frame';
import { cutLengthMm, onCut, type Cut } from '@/lib/layout/section-cut';

/** Along the cut and over the floor, mm. */
export type CutPoint = readonly [number, number];

/** An arm seen square to the cut. */
export interface Silhouette {
  readonly robotId: string;
  readonly name: string;
  readonly body: readonly CutPoint[];
  /** Middle of the base plate, on top of its riser. */
  readonly base: CutPoint;
  readonly linkWidthMm: number;
  /** Its base stands this near to the cut that the cut goes through the arm's own work; the others are drawn pale. */
  readonly isNear: boolean;
}

/** Links shorter than this in the cut lie across it and are not drawn, mm. */
const SHORTEST_MM = 4;

/** What the cut shows of a robot in a posture; null where it stands out of reach of the cut. */
export function silhouetteOf(
  robot: Robot,
  arm: { readonly definition: Arm; readonly reachMm: number },
  posture: readonly number[],
  cut: Cut,
): Silhouette | null {
  const base = onCut(cut, [robot.xMm, robot.yMm, robot.riserMm]);
  const { reachMm } = arm;
  if (Math.abs(base.behindMm) > reachMm) return null;
  if (base.alongMm < -reachMm || base.alongMm > cutLengthMm(cut) + reachMm) return null;
  const body: CutPoint[] = [];
  for (const [x, y, z] of skeleton(compileChain(armWithTool(arm.definition, robot.tool)), posture)) {
    const { alongMm, heightMm } = onCut(cut, baseToFloor(robot, [x * 1000, y * 1000, z * 1000]));
    const last = body[body.length - 1];
    if (!last || Math.hypot(last[0] - alongMm, last[1] - heightMm) > SHORTEST_MM) body.push([alongMm, heightMm]);
  }
  return {
    robotId: robot.id,
    name: robot.name,
    body,
    base: [base.alongMm, base.heightMm],
    linkWidthMm: reachMm * 0.05,
    isNear: Math.abs(base.behindMm) < reachMm / 2,
  };
}

/** Distances between marks to choose from, mm. */
const MARKS_MM = [50, 100, 200, 250, 500, 1000, 2000, 5000, 10_000, 20_000, 50_000];

/** Round values from `fromMm` to `toMm`, so far apart that each has room on the drawing. */
export function marksOf(fromMm: number, toMm: number, pxPerMm: number, roomPx: number): number[] {
  const step = MARKS_MM.find((mm) => mm * pxPerMm >= roomPx) ?? 100_000;
  const first = Math.ceil(fromMm / step);
  const count = Math.max(0, Math.floor(toMm / step) - first + 1);
  return Array.from({ length: count }, (_, index) => (first + index) * step);
}
