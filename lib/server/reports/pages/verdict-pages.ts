import type { PointVerdict } from '@/lib/layout/verdicts';
import type { ReportSheet } from '../report-sheet';
import { BAND_NAMES, bandTextColour } from './band-colour';
import type { Flow, FlowCell } from './flow';

const whole = (value: number): string => String(Math.round(value)).replace('-', '−');
const signed = (value: number): string => (value > 0 ? `+${whole(value)}` : whole(value));
const condition = (value: number): string => (value > 9999 ? '> 9999' : value.toFixed(1));

/** Every task point with the robot that serves it best, in the order of the work. */
export function verdictPages(flow: Flow, sheet: ReportSheet): void {
  flow.heading('Verdicts');
  if (sheet.verdicts.length === 0) {
    flow.paragraph('This sheet has no task points, so there is nothing to judge.');
    return;
  }
  const { reached, met, points } = sheet.figures.verdicts;
  flow.paragraph(
    `${met} of ${points} task points are met: reached, and at the wanted speed in every direction. ${reached} are reached at all. ` +
      'Bands of the condition number: roomy up to 4, fair up to 10, tight up to 30, pinned above (house values).',
  );
  flow.table(
    [
      { title: 'Row', share: 0.5, figures: true },
      { title: 'Task point', share: 1.7 },
      { title: 'Fixture', share: 2 },
      { title: 'x, y, z on the floor, mm', share: 1.9, figures: true },
      { title: 'Robot', share: 0.8 },
      { title: 'Verdict', share: 1 },
      { title: 'Condition', share: 0.8, figures: true },
      { title: 'Wanted mm/s', share: 0.8, figures: true },
      { title: 'Sure speed mm/s', share: 0.9, figures: true },
      { title: 'Margin mm/s', share: 0.9, figures: true },
      { title: 'Binding joint', share: 0.7, figures: true },
      { title: 'Reason', share: 3 },
    ],
    sheet.verdicts.map((point, index) => row(sheet, point, index)),
  );
}

function row({ snapshot }: ReportSheet, point: PointVerdict, index: number): FlowCell[] {
  const { best } = point;
  const robot = snapshot.items.find(({ id }) => id === best?.robotId)?.name ?? '–';
  const band = best?.band ?? 'out';
  const margin = best?.speedMarginMmS ?? null;
  return [
    String(index + 1),
    point.pointName,
    point.fixtureName,
    point.positionMm.map(whole).join(', '),
    best?.reached ? robot : '–',
    { text: best ? BAND_NAMES[band] : 'No robot', colour: bandTextColour(band), face: 'sans-bold' },
    best?.posture ? condition(best.posture.conditionNumber) : '–',
    point.wantedSpeedMmS === null ? '–' : whole(point.wantedSpeedMmS),
    best?.posture ? whole(best.posture.sureSpeedMmS) : '–',
    margin === null ? '–' : { text: signed(margin), colour: margin < 0 ? bandTextColour('out') : undefined },
    best?.bindingJoint ? String(best.bindingJoint) : '–',
    best?.reason ?? (best ? '' : 'The sheet has no robot.'),
  ];
}
