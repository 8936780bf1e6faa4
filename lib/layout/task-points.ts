import { multiplyTransforms, poseOf, type Transform } from '@/lib/kinematics/transforms';
import type { Target } from '@/lib/kinematics/types';
import type { Fixture, Item, TaskPoint } from './items';
import { frameOnFloor, poseInBase, type BasePlacement } from './robot-frame';
import { toolDirection, toolOrientation } from './tool-orientation';

/** A task point where its fixture puts it. */
export interface FloorTaskPoint {
  readonly point: TaskPoint;
  readonly fixtureId: string;
  readonly fixtureName: string;
  readonly positionMm: readonly [number, number, number];
  /** Tool pose in the floor frame (m); a free roll is taken as 0. */
  readonly pose: Transform;
}

/** Every task point of a sheet in the order of the work; points of equal order in the order of the list. */
export function floorTaskPoints(items: readonly Item[]): FloorTaskPoint[] {
  return items
    .flatMap((item) => (item.kind === 'fixture' ? item.taskPoints.map((point) => onFloor(item, point)) : []))
    .sort((a, b) => a.point.order - b.point.order);
}

function onFloor(fixture: Fixture, point: TaskPoint): FloorTaskPoint {
  const roll = point.rollDeg === 'free' ? 0 : (point.rollDeg * Math.PI) / 180;
  const inFixture = toolOrientation(toolDirection(point.tiltDeg, point.azimuthDeg), roll);
  [point.xMm, point.yMm, point.zMm].forEach((valueMm, axis) => (inFixture[4 * axis + 3] = valueMm / 1000));
  const pose = multiplyTransforms(frameOnFloor(fixture), inFixture, inFixture);
  return {
    point,
    fixtureId: fixture.id,
    fixtureName: fixture.name,
    positionMm: [pose[3] * 1000, pose[7] * 1000, pose[11] * 1000],
    pose,
  };
}

/** What a robot's arm is asked for at a task point, in its base frame. */
export function targetInBase({ point, pose }: FloorTaskPoint, base: BasePlacement): Target {
  const t = poseInBase(base, pose);
  if (point.rollDeg !== 'free') return { pose: poseOf(t) };
  return { position: [t[3], t[7], t[11]], direction: [t[2], t[6], t[10]], roll: 'free' };
}
