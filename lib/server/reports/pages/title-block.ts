import { PRINT_PALETTE } from '@/lib/layout/palette';
import type { ReportInput } from '@/lib/contracts/reports';
import type { Box, Paper } from '../paper';
import { fitted, rectangle, segment, type Pen } from '../pen/pen';

const { ink, inkSoft, petrol, paper: paperColour } = PRINT_PALETTE;

export const STATE_NAMES = {
  draft: 'Draft',
  issued: 'In review',
  accepted: 'Accepted',
  changes_requested: 'Changes requested',
  superseded: 'Superseded',
} as const;

/** `1 Dec 2026`, in universal time, so that two readers read the same day. */
export function day(iso: string): string {
  return new Date(iso).toLocaleDateString('en-GB', {
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    timeZone: 'UTC',
  });
}

/** `1 Dec 2026, 16:04 UTC` */
export function moment(iso: string): string {
  const time = new Date(iso).toLocaleTimeString('en-GB', { hour: '2-digit', minute: '2-digit', timeZone: 'UTC' });
  return `${day(iso)}, ${time} UTC`;
}

interface Cell {
  readonly label: string;
  readonly value: string;
  /** Share of the width. */
  readonly share: number;
  readonly strong?: boolean;
  readonly colour?: string;
  readonly figures?: boolean;
}

export const TITLE_HEIGHT = 34;

/** The title block over the plan: whose, what, which state, at which scale. */
export function drawTitleBlock(pen: Pen, box: Box, input: ReportInput, scaleWords: string, pageName: string): void {
  const { snapshot, revision, siteName } = input.sheet;
  const state = revision ? STATE_NAMES[revision.state] : STATE_NAMES.draft;
  const cells: Cell[] = [
    { label: input.organisationName, value: 'Elbowroom', share: 1.5, strong: true },
    { label: 'Customer', value: [snapshot.customerName, siteName].filter(Boolean).join(', ') || '–', share: 1.7 },
    { label: 'Project', value: snapshot.projectName, share: 2.1 },
    { label: 'Variant', value: `${snapshot.letter} · ${snapshot.name}`, share: 2.1, strong: true },
    { label: 'Revision', value: revision ? String(revision.number) : 'draft', share: 0.7, figures: revision !== null },
    { label: 'State', value: state, share: 1.2, colour: petrol },
    { label: revision ? 'Issued' : 'As of', value: day(revision?.issuedAt ?? input.askedAt), share: 1, figures: true },
    { label: 'Scale', value: scaleWords, share: 0.75, figures: true },
    { label: 'Sheet', value: pageName, share: 0.8 },
  ];
  const whole = cells.reduce((sum, { share }) => sum + share, 0);
  pen.path([rectangle(box.x, box.y, box.width, TITLE_HEIGHT)], { fill: paperColour, fillOpacity: 0.6 });
  pen.path([rectangle(box.x, box.y, box.width, TITLE_HEIGHT)], { stroke: ink, width: 0.9 });
  let x = box.x;
  cells.forEach(({ label, value, share, strong, colour, figures }, index) => {
    const width = (share / whole) * box.width;
    if (index > 0) pen.path([segment([x, box.y], [x, box.y + TITLE_HEIGHT])], { stroke: ink, width: 0.5 });
    const room = width - 9;
    pen.text(fitted(label, room, 6.5), x + 5, box.y + 11, { size: 6.5, colour: inkSoft });
    const face = figures ? 'mono-medium' : strong ? 'sans-bold' : 'sans-medium';
    const size = figures ? 8 : 9.5;
    pen.text(fitted(value, room, size, face), x + 5, box.y + 25, { size, face, colour });
    x += width;
  });
}

/** Along the foot of every page: what it is, its caution, and which page. */
export function drawFoot(pen: Pen, paper: Paper, input: ReportInput, page: string): void {
  const y = paper.heightPt - paper.marginPt + 2;
  const { snapshot, revision } = input.sheet;
  const which = `${snapshot.projectName} · ${snapshot.letter} · ${revision ? `rev ${revision.number}` : 'draft'} · made ${moment(input.askedAt)}`;
  pen.text(fitted(which, paper.widthPt * 0.36, 6.5), paper.marginPt, y, { size: 6.5, colour: inkSoft });
  const caution =
    'Planning aid, computed from the data typed in; no substitute for a risk assessment. See the cautions.';
  pen.text(caution, paper.widthPt / 2 + 20, y, { size: 6.5, colour: inkSoft, align: 'center' });
  pen.text(page, paper.widthPt - paper.marginPt, y, { size: 6.5, colour: inkSoft, align: 'right', face: 'mono' });
}
