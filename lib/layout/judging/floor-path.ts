import type { Transform } from '@/lib/kinematics/transforms';
import type { Fixture, TaskPath } from '../items';
import { poseOnFloor } from '../task-points';
import { pathLine, pathStepMm, type PathLine, type Vector3 } from './path-line';

/** A path where its fixture puts it: poses on the floor (m) and directions of travel. */
export interface FloorPath {
  readonly line: PathLine;
  readonly poses: readonly Transform[];
  readonly tangents: readonly Vector3[];
}

export function floorPath(fixture: Fixture, path: TaskPath): FloorPath {
  const line = pathLine(path.points, pathStepMm(path.points));
  const aim = poseOnFloor(fixture, { ...path, xMm: 0, yMm: 0, zMm: 0 });
  const turn = (fixture.angleDeg * Math.PI) / 180;
  const [cosine, sine] = [Math.cos(turn), Math.sin(turn)];
  const poses = line.points.map(({ positionMm: [x, y, z] }) => {
    const pose = aim.slice();
    pose[3] = (fixture.xMm + cosine * x - sine * y) / 1000;
    pose[7] = (fixture.yMm + sine * x + cosine * y) / 1000;
    pose[11] = z / 1000;
    return pose;
  });
  const tangents = line.points.map(({ tangent: [x, y, z] }): Vector3 => [
    cosine * x - sine * y,
    sine * x + cosine * y,
    z,
  ]);
  return { line, poses, tangents };
}
