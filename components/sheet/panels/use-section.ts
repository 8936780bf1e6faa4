'use client';

import { useMemo } from 'react';
import { useBoard, useBoardSettings } from '@/components/sheet/editor/board-context';
import { useFloor } from '@/components/sheet/editor/floor-context';
import { useKernelDesk } from '@/components/sheet/editor/use-kernel-desk';
import type { DeskJob } from '@/lib/client/kernel-desk';
import { composeFloorMap, type FloorMap } from '@/lib/layout/floor-map';
import type { Robot } from '@/lib/layout/items';
import { cutLengthMm, placedSection, sectionTask, type Cut, type SectionTask } from '@/lib/layout/section-cut';

/** ms that a robot's section may take while something moves, and once it rests. */
const MOVING_MS = 20;
const RESTING_MS = 350;

/** The map of a cut: the best robot at each place. Coarse at first and while things move, fine once they rest. Null until there is something. */
export function useSection(cut: Cut | null, robots: readonly Robot[]): { map: FloorMap | null; isFine: boolean } {
  const { arms } = useBoard();
  const settings = useBoardSettings();
  const { isDragging, isLive } = useFloor();
  const isMoving = isDragging || isLive;
  const asked = useMemo(() => {
    if (!cut || cutLengthMm(cut) < 1) return [];
    return robots.flatMap((robot) => {
      const arm = arms.get(robot.armId)?.definition;
      if (!arm) return [];
      return [MOVING_MS, RESTING_MS].map((budgetMs): DeskJob<SectionTask> => {
        const task = sectionTask(robot, arm, settings, cut, budgetMs);
        return { slot: `${robot.id} ${budgetMs}`, key: JSON.stringify([task.question, task.cut]), task };
      });
    });
  }, [cut, robots, arms, settings]);
  const jobs = useMemo(
    () => (isMoving ? asked.filter(({ task }) => task.budgetMs === MOVING_MS) : asked),
    [asked, isMoving],
  );
  const answers = useKernelDesk('section', jobs);
  return useMemo(() => {
    const placed = robots.flatMap((robot) => {
      const [coarse, fine] = [MOVING_MS, RESTING_MS].map((budgetMs) => answers.get(`${robot.id} ${budgetMs}`));
      const wanted = jobs.find(({ slot }) => slot === `${robot.id} ${RESTING_MS}`)?.key;
      const answer = fine && fine.key === wanted ? fine : coarse;
      return answer ? [{ ...placedSection(robot, answer.result), isFine: answer === fine }] : [];
    });
    if (!cut || placed.length === 0) return { map: null, isFine: false };
    const stepMm = Math.min(...placed.map(({ grid }) => grid.stepMm));
    const grid = {
      originMm: [stepMm / 2, cut.zFromMm + stepMm / 2] as const,
      stepMm,
      columns: Math.max(1, Math.ceil(cutLengthMm(cut) / stepMm)),
      rows: Math.max(1, Math.ceil((cut.zToMm - cut.zFromMm) / stepMm)),
    };
    return { map: composeFloorMap(grid, placed, settings.measure), isFine: placed.every(({ isFine }) => isFine) };
  }, [answers, jobs, robots, cut, settings.measure]);
}
