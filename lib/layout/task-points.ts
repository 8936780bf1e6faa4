import { multiplyTransforms, poseOf, type Transform } from '@/lib/kinematics/transforms';
import type { Target } from '@/lib/kinematics/types';
import type { Placement } from './geometry';
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

/** What of a task point, a place of a pattern or a path says how the tool is held. */
export type ToolPlace = Pick<TaskPoint, 'xMm' | 'yMm' | 'zMm' | 'tiltDeg' | 'azimuthDeg' | 'rollDeg'>;

/** A tool pose of a fixture in the floor frame (m); a free roll is taken as 0. */
export function poseOnFloor(fixture: Placement, place: ToolPlace): Transform {
  const roll = place.rollDeg === 'free' ? 0 : (place.rollDeg * Math.PI) / 180;
  const inFixture = toolOrientation(toolDirection(place.tiltDeg, place.azimuthDeg), roll);
  [place.xMm, place.yMm, place.zMm].forEach((valueMm, axis) => (inFixture[4 * axis + 3] = valueMm / 1000));
  return multiplyTransforms(frameOnFloor(fixture), inFixture, inFixture);
}

/** A task point where its fixture puts it. */
export function onFloor(fixture: Fixture, point: TaskPoint): FloorTaskPoint {
  const pose = poseOnFloor(fixture, point);
  return {
    point,
    fixtureId: fixture.id,
    fixtureName: fixture.name,
    positionMm: [pose[3] * 1000, pose[7] * 1000, pose[11] * 1000],
    pose,
  };
}

/** What a robot's arm is asked for at a tool pose of the floor frame, in its base frame. */
export function targetInBase(
  { rollDeg, pose }: { readonly rollDeg: TaskPoint['rollDeg']; readonly pose: Transform },
  base: BasePlacement,
): Target {
  const t = poseInBase(base, pose);
  if (rollDeg !== 'free') return { pose: poseOf(t) };
  return { position: [t[3], t[7], t[11]], direction: [t[2], t[6], t[10]], roll: 'free' };
}
