'use client';

import { useMemo } from 'react';
import { useBoard, useBoardSheet } from '@/components/sheet/editor/board-context';
import { useVerdicts } from '@/components/sheet/editor/readings-context';
import type { LibraryArm } from '@/lib/contracts/arms';
import { inOrder } from '@/lib/editor/order';
import type { WorkingRobot } from '@/lib/layout/clearance/robot-clearance';
import type { Fixture, Item, Robot } from '@/lib/layout/items';
import { workOfRobot, type NamedWork } from '@/lib/layout/standing/ask';

/** A robot of the sheet whose arm is known. */
export interface Subject {
  readonly robot: Robot;
  readonly arm: LibraryArm;
}

export interface StudySubjects {
  /** In the order of the list, hidden ones left out. */
  readonly items: readonly Item[];
  readonly robots: readonly Subject[];
  readonly fixtures: readonly Fixture[];
  /** The points that fall to a robot as drawn. */
  readonly workOf: (robotId: string) => NamedWork[];
  /** Robots in the postures of their task points, in the order of the work. */
  readonly working: readonly WorkingRobot[];
}

/** What of the sheet can be studied: as it is saved, never what is just in the hand. */
export function useStudySubjects(): StudySubjects {
  const { arms } = useBoard();
  const all = useBoardSheet((state) => state.items);
  const { cell } = useVerdicts();
  const items = useMemo(() => inOrder(all).filter(({ hidden }) => !hidden), [all]);
  const robots = useMemo(
    () =>
      items.flatMap((item): Subject[] => {
        const arm = item.kind === 'robot' ? arms.get(item.armId) : undefined;
        return item.kind === 'robot' && arm ? [{ robot: item, arm }] : [];
      }),
    [items, arms],
  );
  const fixtures = useMemo(() => items.filter((item): item is Fixture => item.kind === 'fixture'), [items]);
  const workOf = useMemo(() => {
    const bestRobot = new Map([
      ...cell.points.map(({ pointId, best }) => [pointId, best?.robotId] as const),
      ...cell.patterns.map(({ patternId, best }) => [patternId, best?.robotId] as const),
    ]);
    return (robotId: string) => {
      const theirs = [...bestRobot].filter(([, best]) => best === robotId).map(([id]) => id);
      return workOfRobot(items, robotId, new Set(theirs));
    };
  }, [items, cell]);
  const working = useMemo(
    () =>
      robots.map(({ robot, arm }) => ({
        robot,
        arm: arm.definition,
        reachMm: arm.reachMm,
        postures: cell.points.flatMap(({ best, pointName, fixtureId }) =>
          best?.robotId === robot.id && best.posture
            ? [{ name: pointName, fixtureId, joints: best.posture.joints }]
            : [],
        ),
      })),
    [robots, cell],
  );
  return { items, robots, fixtures, workOf, working };
}
