'use client';

import { createContext, useContext, useDeferredValue, useMemo, useState, type Context, type ReactNode } from 'react';
import { keepSame, keepSameMap } from '@/lib/editor/keep-same';
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
import { makeCellJudge, type CellVerdicts, type PointVerdict } from '@/lib/layout/verdicts';
import { placeOfTask } from '@/lib/layout/judging/task-place';
import { useBoard, useBoardSettings, useBoardSheet } from './board-context';

/** Verdicts on the work; they may lag a moment behind what is dragged. */
export interface Verdicts {
  /** Of task points, paths and patterns. */
  readonly cell: CellVerdicts;
  readonly verdicts: readonly PointVerdict[];
  readonly byPoint: ReadonlyMap<string, PointVerdict>;
}

export interface Plumb {
  readonly spot: PlumbSpot | null;
  /** The robot that is read; null while no robot stands on the sheet. */
  readonly reading: PlumbReading | null;
  readonly posture: PlumbPosture | null;
  readonly robots: readonly Robot[];
  /** Null: the best one. */
  readonly chosenRobotId: string | null;
  readonly chooseRobot: (robotId: string | null) => void;
  readonly chooseBranch: (branch: string) => void;
}

/** Joint values by robot, to draw it in. */
export type Postures = ReadonlyMap<string, readonly number[]>;

// Three contexts, so that a base that is dragged does not draw the panels again that have nothing to do with it.
const VerdictsContext = createContext<Verdicts | null>(null);
const PlumbContext = createContext<Plumb | null>(null);
const PosturesContext = createContext<Postures | null>(null);

function useInside<T>(context: Context<T | null>): T {
  const value = useContext(context);
  if (!value) throw new Error('Readings belong inside their provider.');
  return value;
}

export const useVerdicts = (): Verdicts => useInside(VerdictsContext);
export const usePlumb = (): Plumb => useInside(PlumbContext);
export const usePostures = (): Postures => useInside(PosturesContext);

/** What the browser's own kernel says of the sheet as it is shown now: verdicts, the plumb, and how robots stand. */
export function ReadingsProvider({ children }: { readonly children: ReactNode }) {
  const { arms } = useBoard();
  const items = useBoardSheet((state) => state.items);
  const draft = useBoardSheet((state) => state.draft);
  const settings = useBoardSettings();
  const ordered = useMemo(() => inOrder(shownItems({ items, draft })).filter(({ hidden }) => !hidden), [items, draft]);
  // Verdicts may come a moment after the picture while something is dragged.
  const judged = useDeferredValue(ordered);
  // Remembers from one look to the next what did not change: a drag judges only what it moves.
  const [judge] = useState(makeCellJudge);
  // What comes out as before keeps its identity, so that lists and shapes that have nothing to do with a drag are left alone.
  const [keepPoints] = useState(keepSame<CellVerdicts['points']>);
  const [keepPaths] = useState(keepSame<CellVerdicts['paths']>);
  const [keepPatterns] = useState(keepSame<CellVerdicts['patterns']>);
  const found = useMemo(
    () => judge(judged, (armId) => arms.get(armId)?.definition, settings.wrist),
    [judge, judged, arms, settings.wrist],
  );
  const [points, paths, patterns] = [keepPoints(found.points), keepPaths(found.paths), keepPatterns(found.patterns)];
  const cell = useMemo<CellVerdicts>(() => ({ points, paths, patterns }), [points, paths, patterns]);
  const verdicts = cell.points;
  const judgement = useMemo(
    () => ({ cell, verdicts: cell.points, byPoint: new Map(cell.points.map((verdict) => [verdict.pointId, verdict])) }),
    [cell],
  );

  const hung = useBoardSheet((state) => state.plumb);
  const taskPointId = useBoardSheet((state) => state.selection.taskPointId);
  const spot = useMemo(() => {
    if (!taskPointId) return hung && plumbOnFloor(hung, settings);
    const worst = plumbOnTaskPoint(ordered, taskPointId) ? null : placeOfTask(ordered, cell, taskPointId);
    return worst ? { positionMm: worst.positionMm, taskPoint: worst } : plumbOnTaskPoint(ordered, taskPointId);
  }, [taskPointId, ordered, cell, hung, settings]);
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

  const [keepPostures] = useState(keepSameMap<string, readonly number[]>);
  const standingNow = useMemo(() => {
    const standing = new Map<string, readonly number[]>();
    for (const robot of robots) {
      const joints = reading?.robot.id === robot.id ? posture?.joints : workPosture(robot.id, verdicts);
      const arm = arms.get(robot.armId)!;
      const drawn = joints ?? restOf(robot, arm.id, () => restPosture(arm.definition, arm.reachMm, robot.tool));
      if (drawn) standing.set(robot.id, drawn);
    }
    return standing;
  }, [robots, reading, posture, verdicts, arms]);
  const postures = keepPostures(standingNow);

  const plumb = useMemo<Plumb>(
    () => ({ spot, reading, posture, robots, chosenRobotId, chooseRobot, chooseBranch }),
    [spot, reading, posture, robots, chosenRobotId],
  );
  return (
    <VerdictsContext value={judgement}>
      <PlumbContext value={plumb}>
        <PosturesContext value={postures}>{children}</PosturesContext>
      </PlumbContext>
    </VerdictsContext>
  );
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
