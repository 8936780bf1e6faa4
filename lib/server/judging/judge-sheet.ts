import type { LibraryArm } from '@/lib/contracts/arms';
import type { CycleAnswer, VerdictsAnswer } from '@/lib/contracts/judging';
import { judgeCycles } from '@/lib/layout/cycle/cycle-judge';
import { itemSchema, type Item } from '@/lib/layout/items';
import { placeCount } from '@/lib/layout/judging/places';
import { taskRows } from '@/lib/layout/judging/task-rows';
import type { MapSettings } from '@/lib/layout/map-settings';
import { checkPayload } from '@/lib/layout/payload';
import { judgeCell } from '@/lib/layout/verdicts';
import { tooLarge } from '../errors';

/** What judging needs of a layout or a snapshot. */
export interface JudgedSheet {
  readonly items: readonly Item[];
  readonly arms: readonly Pick<LibraryArm, 'id' | 'definition' | 'payloadKg'>[];
  readonly mapSettings: Pick<MapSettings, 'wrist'>;
}

/** Poses to look at, robots times places, up to which an answer takes moments; a request must not hold the server for long. */
const MOST_LOOKS = 20_000;
/** Samples of a path that one look stands for. */
const PATH_LOOKS = 40;

const CAUTION =
  'Planning figures from the data typed in. Guarding and stopping distances need a risk assessment, measured stopping times and local rules.';

export function verdictsOf(sheet: JudgedSheet): VerdictsAnswer {
  const items = shownItems(sheet);
  demandBounded(items);
  const { wrist } = sheet.mapSettings;
  const arms = new Map(sheet.arms.map((arm) => [arm.id, arm]));
  return {
    wrist,
    tasks: taskRows(judgeCell(items, (armId) => arms.get(armId)?.definition, wrist)).map((row) => ({
      ...row,
      notes: [...row.notes],
    })),
    payloads: items.flatMap((item) => {
      if (item.kind !== 'robot') return [];
      const { questions, ...check } = checkPayload(item, arms.get(item.armId)?.payloadKg ?? null);
      return [{ robotId: item.id, robotName: item.name, ...check, questions: [...questions] }];
    }),
    caution: CAUTION,
  };
}

export function cycleOf(sheet: JudgedSheet): CycleAnswer {
  const items = shownItems(sheet);
  const arms = new Map(sheet.arms.map((arm) => [arm.id, arm]));
  const { estimates, cell } = judgeCycles(items, (armId) => arms.get(armId)?.definition);
  return {
    robots: estimates.map((estimate, index) => ({
      robotId: estimate.robotId,
      robotName: estimate.robotName,
      totalS: estimate.totalS,
      endS: cell.robots[index].endS,
      queuedS: cell.robots[index].queuedS,
      targetS: estimate.targetS,
      marginS: cell.robots[index].marginS,
      steps: estimate.steps.map((step) => ({
        ...step,
        crossings: [...step.crossings],
        posture: step.posture && [...step.posture],
      })),
      problems: [...estimate.problems],
    })),
    stays: [...cell.stays],
    endS: cell.endS,
    problems: [...cell.problems],
    caution: `An estimate: moves start and end at rest, corners are not rounded. ${CAUTION}`,
  };
}

/** Parsed, so that items stored before a field was known have it too. */
const shownItems = ({ items }: JudgedSheet): Item[] =>
  items.map((item) => itemSchema.parse(item)).filter(({ hidden }) => !hidden);

function demandBounded(items: readonly Item[]): void {
  const robots = items.filter(({ kind }) => kind === 'robot').length;
  const looks = items.reduce((sum, item) => {
    if (item.kind !== 'fixture') return sum;
    const places = item.taskPatterns.reduce((count, pattern) => count + placeCount(pattern), 0);
    return sum + item.taskPoints.length + places + PATH_LOOKS * item.taskPaths.length;
  }, 0);
  if (robots * looks > MOST_LOOKS)
    throw tooLarge(
      `This sheet has ${robots} robots and ${looks} places to judge; that is more than one answer holds. Hide some of them, or make patterns smaller.`,
    );
}
