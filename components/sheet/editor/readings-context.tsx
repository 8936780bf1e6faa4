'use client';

import { createContext, useContext, useDeferredValue, useMemo, useState, type ReactNode } from 'react';
import { inOrder } from '@/lib/editor/order';
import {
  bestPlumb,
  plumbOnFloor,
  plumbOnTaskPoint,
  readPlumb,
  type PlumbPosture,
  type PlumbReading,
  type PlumbSpot,
} from '@/lib/editor/plumb';
import { restPosture } from '@/lib/editor/rest-posture';
import { shownItems } from '@/lib/editor/sheet';
import type { Robot } from '@/lib/layout/items';
import { judgeItems, type PointVerdict } from '@/lib/layout/verdicts';
import { useBoard, useBoardSettings, useBoardSheet } from './board-context';

/** What the browser's own kernel says of the sheet as it is shown now: verdicts, the plumb, and how robots stand. */
export interface Readings {
  readonly verdicts: readonly PointVerdict[];
  readonly byPoint: ReadonlyMap<string, PointVerdict>;
  readonly plumb: {
    readonly spot: PlumbSpot | null;
    /** The robot that is read; null while no robot stands on the sheet. */
    readonly reading: PlumbReading | null;
    readonly posture: PlumbPosture | null;
    readonly robots: readonly Robot[];
    /** Null: the best one. */
    readonly chosenRobotId: string | null;
    readonly chooseRobot: (robotId: string | null) => void;
    readonly chooseBranch: (branch: string) => void;
  };
  /** Joint values by robot, to draw it in. */
  readonly postures: ReadonlyMap<string, readonly number[]>;
}

const ReadingsContext = createContext<Readings | null>(null);

export function useReadings(): Readings {
  const readings = useContext(ReadingsContext);
  if (!readings) throw new Error('Readings belong inside their provider.');
  return readings;
}

export function ReadingsProvider({ children }: { readonly children: ReactNode }) {
  const { arms } = useBoard();
  const items = useBoardSheet((state) => state.items);
  const draft = useBoardSheet((state) => state.draft);
  const settings = useBoardSettings();
  const ordered = useMemo(() => inOrder(shownItems({ items, draft })).filter(({ hidden }) => !hidden), [items, draft]);
  // Verdicts may come a moment after the picture while something is dragged.
  const judged = useDeferredValue(ordered);
  const verdicts = useMemo(
    () => judgeItems(judged, (armId) => arms.get(armId)?.definition, settings.wrist),
    [judged, arms, settings.wrist],
  );
  const byPoint = useMemo(() => new Map(verdicts.map((verdict) => [verdict.pointId, verdict])), [verdicts]);

  const hung = useBoardSheet((state) => state.plumb);
  const taskPointId = useBoardSheet((state) => state.selection.taskPointId);
  const spot = useMemo(
    () => (taskPointId ? plumbOnTaskPoint(ordered, taskPointId) : hung && plumbOnFloor(hung, settings)),
    [taskPointId, ordered, hung, settings],
  );
  const [chosenRobotId, chooseRobot] = useState<string | null>(null);
  const [branch, chooseBranch] = useState('');

  const robots = useMemo(
    () => ordered.filter((item): item is Robot => item.kind === 'robot' && arms.has(item.armId)),
    [ordered, arms],
  );
  const reading = useMemo(() => {
    if (!spot) return null;
    const asked = robots.filter(({ id }) => id === chosenRobotId);
    const readings = (asked.length > 0 ? asked : robots).map((robot) =>
      readPlumb(robot, arms.get(robot.armId)!.definition, spot, settings),
    );
    return bestPlumb(readings);
  }, [spot, robots, chosenRobotId, arms, settings]);
  const posture = reading?.postures.find((entry) => entry.branch === branch) ?? reading?.postures[0] ?? null;

  const postures = useMemo(() => {
    const standing = new Map<string, readonly number[]>();
    for (const robot of robots) {
      const joints = reading?.robot.id === robot.id ? posture?.joints : workPosture(robot.id, verdicts);
      const arm = arms.get(robot.armId)!;
      const drawn = joints ?? restOf(robot, arm.id, () => restPosture(arm.definition, arm.reachMm, robot.tool));
      if (drawn) standing.set(robot.id, drawn);
    }
    return standing;
  }, [robots, reading, posture, verdicts, arms]);

  const readings = useMemo<Readings>(
    () => ({
      verdicts,
      byPoint,
      postures,
      plumb: { spot, reading, posture, robots, chosenRobotId, chooseRobot, chooseBranch },
    }),
    [verdicts, byPoint, postures, spot, reading, posture, robots, chosenRobotId],
  );
  return <ReadingsContext value={readings}>{children}</ReadingsContext>;
}

/** A robot at rest is drawn at the first task point that falls to it. */
function workPosture(robotId: string, verdicts: readonly PointVerdict[]): readonly number[] | undefined {
  return verdicts.find(({ best }) => best?.robotId === robotId && best.posture)?.best?.posture?.joints;
}

/** Resting postures by arm and tool: they do not depend on where the base stands. */
const resting = new Map<string, readonly number[] | null>();

function restOf(robot: Robot, armId: string, compute: () => readonly number[] | null): readonly number[] | null {
  const key = `${armId} ${JSON.stringify(robot.tool)}`;
  const known = resting.get(key);
  if (known !== undefined) return known;
  const posture = compute();
  resting.set(key, posture);
  return posture;
}
