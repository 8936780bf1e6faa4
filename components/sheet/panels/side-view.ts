import type { PlumbPosture, PlumbReading } from '@/lib/editor/plumb';

/** What the side elevation shows: level distance from the first axis along the heading, and height over the floor, mm. */
export interface SideView {
  readonly fromMm: readonly [number, number];
  readonly toMm: readonly [number, number];
}

export const SIDE_WIDTH_PX = 298;
export const SIDE_HEIGHT_PX = 184;

/** Fits an arm of this reach on this riser into the picture, floor line included, both axes at one scale. */
export function sideView(reachMm: number, riserMm: number): SideView {
  const below = reachMm * 0.07;
  const heightMm = riserMm + reachMm * 0.88 + below;
  const widthMm = (heightMm * SIDE_WIDTH_PX) / SIDE_HEIGHT_PX;
  const left = Math.max(widthMm * 0.16, widthMm - reachMm * 1.12);
  return { fromMm: [-left, -below], toMm: [widthMm - left, heightMm - below] };
}

export type SidePoint = readonly [number, number];

/** From the view's millimetres to the picture's pixels, y down. */
export function sideToPx(view: SideView, [distance, height]: SidePoint): [number, number] {
  const scale = SIDE_WIDTH_PX / (view.toMm[0] - view.fromMm[0]);
  return [(distance - view.fromMm[0]) * scale, (view.toMm[1] - height) * scale];
}

/** A posture seen from the side, at right angles to the line from the base to the spot. */
export function sideOfPosture({ robot, headingDeg }: PlumbReading, posture: PlumbPosture): SidePoint[] {
  const heading = (headingDeg * Math.PI) / 180;
  return posture.skeletonMm.map(([x, y, z]) => [
    (x - robot.xMm) * Math.cos(heading) + (y - robot.yMm) * Math.sin(heading),
    z,
  ]);
}

/** Level distance from the base to the spot, and its height. */
export function sideOfSpot({ robot, spot }: PlumbReading): SidePoint {
  const [x, y, z] = spot.positionMm;
  return [Math.hypot(x - robot.xMm, y - robot.yMm), z];
}
