import { PRINT_PALETTE } from '@/lib/layout/palette';
import type { CycleAnswer, VerdictsAnswer } from '@/lib/contracts/judging';
import type { ReportSheet } from '../report-sheet';
import { BAND_NAMES, bandTextColour } from './band-colour';
import type { Flow, FlowCell } from './flow';

const { green, red, inkSoft } = PRINT_PALETTE;
const seconds = (value: number): string => `${value.toFixed(2).replace('-', '−')} s`;
const whole = (value: number | null): string => (value === null ? '–' : String(Math.round(value)).replace('-', '−'));

/** Paths and patterns, each by its worst place; nothing where the sheet has none. */
export function pathPages(flow: Flow, sheet: ReportSheet, { tasks }: VerdictsAnswer): void {
  const rows = tasks.filter(({ kind }) => kind !== 'point');
  if (rows.length === 0) return;
  const named = new Map(sheet.snapshot.items.map(({ id, name }) => [id, name]));
  flow.heading('Paths and patterns');
  flow.table(
    [
      { title: 'Task', share: 1.6 },
      { title: 'Kind', share: 0.7 },
      { title: 'Fixture', share: 1.4 },
      { title: 'Robot', share: 0.7 },
      { title: 'Verdict at its worst place', share: 1.1 },
      { title: 'Wanted mm/s', share: 0.8, figures: true },
      { title: 'Speed mm/s', share: 0.8, figures: true },
      { title: 'Margin mm/s', share: 0.8, figures: true },
      { title: 'Reason and notes', share: 3.4 },
    ],
    rows.map((task): FlowCell[] => [
      task.name,
      task.kind,
      named.get(task.fixtureId) ?? '–',
      (task.robotId && named.get(task.robotId)) ?? '–',
      {
        text: task.band ? BAND_NAMES[task.band] : 'No robot',
        colour: bandTextColour(task.band ?? undefined),
        face: 'sans-bold',
      },
      whole(task.wantedSpeedMmS),
      whole(task.speedMmS),
      whole(task.marginMmS),
      [task.reason, ...task.notes].filter(Boolean).join(' '),
    ]),
  );
}

/** Tool and part against what each arm is rated for. */
export function payloadPages(flow: Flow, { payloads }: VerdictsAnswer): void {
  if (payloads.length === 0) return;
  flow.heading('Payload');
  const figure = (rated: { value: number; rated: number | null } | null, unit: string): string =>
    rated === null
      ? '–'
      : `${rated.value.toFixed(2)} of ${rated.rated === null ? 'no stated limit' : rated.rated.toFixed(2)} ${unit}`;
  flow.table(
    [
      { title: 'Robot', share: 0.8 },
      { title: 'Mass', share: 1.3, figures: true },
      { title: 'Moment', share: 1.4, figures: true },
      { title: 'Inertia', share: 1.4, figures: true },
      { title: 'Within the rating', share: 1 },
      { title: 'Not known yet', share: 4 },
    ],
    payloads.map((payload): FlowCell[] => [
      { text: payload.robotName, face: 'sans-bold' },
      figure(payload.massKg, 'kg'),
      figure(payload.momentNm, 'N m'),
      figure(payload.inertiaKgM2, 'kg m²'),
      payload.within === null
        ? 'not told'
        : payload.within && payload.questions.length > 0
          ? 'as far as known'
          : { text: payload.within ? 'yes' : 'no', colour: payload.within ? green : red, face: 'sans-bold' },
      payload.questions.map(({ words }) => words).join(' '),
    ]),
  );
  for (const caution of new Set(payloads.map((payload) => payload.caution))) flow.caution(caution);
}

/** The estimate of every robot's cycle, step by step; nothing where no robot has steps. */
export function cyclePages(flow: Flow, { robots, problems, caution }: CycleAnswer): void {
  if (robots.length === 0 && problems.length === 0) return;
  flow.heading('Cycle estimate');
  for (const problem of problems) flow.paragraph(problem, { colour: red });
  for (const robot of robots) {
    flow.need(100);
    const target =
      robot.targetS === null
        ? 'no target set'
        : `target ${seconds(robot.targetS)}, margin ${robot.marginS === null ? '–' : seconds(robot.marginS)}`;
    const waiting = robot.queuedS > 0 ? `, of it ${seconds(robot.queuedS)} waiting for shared zones` : '';
    flow.paragraph(`${robot.robotName}: ${seconds(robot.endS)}${waiting}; ${target}`, { face: 'sans-bold' });
    flow.table(
      [
        { title: 'Step', share: 0.5, figures: true },
        { title: 'What', share: 2.4 },
        { title: 'Motion', share: 0.8 },
        { title: 'Move', share: 0.8, figures: true },
        { title: 'Along the path', share: 0.9, figures: true },
        { title: 'Dwell or wait', share: 0.9, figures: true },
        { title: 'Slowest joint', share: 0.8, figures: true },
        { title: 'Least speed mm/s', share: 0.9, figures: true },
        { title: 'Where it slows or changes branch', share: 2 },
      ],
      robot.steps.map((step, index): FlowCell[] => [
        String(index + 1),
        step.label,
        step.motion ?? '–',
        seconds(step.moveS),
        step.runS > 0 ? seconds(step.runS) : '–',
        step.holdS > 0 ? seconds(step.holdS) : '–',
        step.slowestJoint === null ? '–' : String(step.slowestJoint),
        whole(step.leastSpeedMmS),
        step.crossings
          .map(({ fromMm, toMm, changesBranch }) =>
            changesBranch ? `branch changes at ${whole(fromMm)} mm` : `slow from ${whole(fromMm)} to ${whole(toMm)} mm`,
          )
          .join('; '),
      ]),
    );
    for (const { number, label, message } of robot.problems) {
      flow.paragraph(`Step ${number}, ${label}: ${message}`, { colour: red });
    }
  }
  flow.paragraph('Moves are timed by the joints’ greatest speeds and accelerations as typed in.', { colour: inkSoft });
  flow.caution(caution);
}
