import type { Arm, WristMode } from '@/lib/kinematics/types';
import { makeBench, type Bench } from '../bench';
import type { Fixture, Item, Robot } from '../items';
import { floorTaskPoints, targetInBase } from '../task-points';
import { assigned, standOf, type Assignment } from './assignment';
import { makeMemory } from './memory';
import { floorPath } from './floor-path';
import type { RobotPathVerdict } from './path-run';
import { betterPath, judgePath, type PathVerdict } from './path-verdict';
import { betterPattern, judgePattern, type PatternVerdict, type RobotPatternVerdict } from './pattern-verdict';
import { betterOf, judgeTarget, type RobotVerdict } from './point-verdict';

export interface PointVerdict {
  readonly pointId: string;
  readonly pointName: string;
  readonly fixtureId: string;
  readonly fixtureName: string;
  readonly positionMm: readonly [number, number, number];
  readonly wantedSpeedMmS: number | null;
  readonly assignment: Assignment;
  /** The verdict that counts: of the robot that the point is given to, else of the one that does best. Null without robots. */
  readonly best: RobotVerdict | null;
  /** Every robot, in the order of the sheet. */
  readonly robots: readonly RobotVerdict[];
}

/** All that a sheet's robots can do at its work. */
export interface CellVerdicts {
  /** In the order of the work. */
  readonly points: readonly PointVerdict[];
  readonly paths: readonly PathVerdict[];
  readonly patterns: readonly PatternVerdict[];
}

export type ArmOf = (armId: string) => Arm | undefined;

/** Judges a sheet again and again; only what changed since the last time is worked out anew. Robots whose arm is not known are left out. */
export type CellJudge = (items: readonly Item[], armOf: ArmOf, wrist: WristMode) => CellVerdicts;

export function makeCellJudge(): CellJudge {
  const benches = makeMemory<Bench>();
  const points = makeMemory<RobotVerdict>();
  const paths = makeMemory<RobotPathVerdict>();
  const patterns = makeMemory<RobotPatternVerdict>();

  /** The bench of a robot stays while its arm and tool do, wherever the robot is dragged. */
  const benchOf = (robot: Robot, arm: Arm, wrist: WristMode): { robot: Robot; bench: Bench } => {
    const { xMm, yMm, zMm, rollDeg, pitchDeg, yawDeg } = robot.tool;
    const inputs = [arm, wrist, xMm, yMm, zMm, rollDeg, pitchDeg, yawDeg];
    return { robot, bench: benches.recall(robot.id, inputs, () => makeBench(robot, arm, wrist)) };
  };

  return (items, armOf, wrist) => {
    const standing = items.flatMap((item) => {
      const arm = item.kind === 'robot' ? armOf(item.armId) : undefined;
      return item.kind === 'robot' && arm ? [benchOf(item, arm, wrist)] : [];
    });
    const fixtures = items.filter((item): item is Fixture => item.kind === 'fixture');
    const placeOf = new Map(fixtures.map(({ id, xMm, yMm, angleDeg }) => [id, [xMm, yMm, angleDeg]]));
    const inputsOf = (robot: Robot, bench: Bench, fixtureId: string, task: unknown): unknown[] => [
      bench,
      task,
      ...standOf(robot),
      ...placeOf.get(fixtureId)!,
    ];
    const keyOf = (robot: Robot, fixtureId: string, taskId: string): string => `${robot.id} ${fixtureId} ${taskId}`;

    const answer: CellVerdicts = {
      points: floorTaskPoints(items).map((floor): PointVerdict => {
        const { point, fixtureId, fixtureName, positionMm } = floor;
        const robots = standing.map(({ robot, bench }) =>
          points.recall(keyOf(robot, fixtureId, point.id), inputsOf(robot, bench, fixtureId, point), () =>
            judgeTarget(
              { ...bench, robot },
              targetInBase({ rollDeg: point.rollDeg, pose: floor.pose }, robot),
              point.speedMmS,
            ),
          ),
        );
        return {
          pointId: point.id,
          pointName: point.name,
          fixtureId,
          fixtureName,
          positionMm,
          wantedSpeedMmS: point.speedMmS,
          ...assigned(point.robotId, robots, betterOf),
          robots,
        };
      }),
      paths: fixtures.flatMap((fixture) =>
        fixture.taskPaths.map((path): PathVerdict => {
          const floor = lazily(() => floorPath(fixture, path));
          const robots = standing.map(({ robot, bench }) =>
            paths.recall(keyOf(robot, fixture.id, path.id), inputsOf(robot, bench, fixture.id, path), () =>
              judgePath({ ...bench, robot }, path, floor()),
            ),
          );
          return {
            pathId: path.id,
            pathName: path.name,
            fixtureId: fixture.id,
            fixtureName: fixture.name,
            lengthMm: floor().line.lengthMm,
            wantedSpeedMmS: path.speedMmS,
            ...assigned(path.robotId, robots, betterPath),
            robots,
          };
        }),
      ),
      patterns: fixtures.flatMap((fixture) =>
        fixture.taskPatterns.map((pattern): PatternVerdict => {
          const robots = standing.map(({ robot, bench }) =>
            patterns.recall(keyOf(robot, fixture.id, pattern.id), inputsOf(robot, bench, fixture.id, pattern), () =>
              judgePattern({ ...bench, robot }, fixture, pattern),
            ),
          );
          return {
            patternId: pattern.id,
            patternName: pattern.name,
            fixtureId: fixture.id,
            fixtureName: fixture.name,
            placeCount: pattern.rows * pattern.columns * pattern.layers,
            wantedSpeedMmS: pattern.speedMmS,
            ...assigned(pattern.robotId, robots, betterPattern),
            robots,
          };
        }),
      ),
    };
    [benches, points, paths, patterns].forEach((memory) => memory.settle());
    return answer;
  };
}

function lazily<T>(compute: () => T): () => T {
  let value: T | undefined;
  return () => (value ??= compute());
}
