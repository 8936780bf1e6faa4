import sharp from 'sharp';
import type { ReportInput, ReportOptions } from '@/lib/contracts/reports';
import { valueRange, type ValueRange } from '@/lib/layout/scales';
import { AppError } from '../errors';
import { pageBounds, fittingScale, paperOf, type Box } from './paper';
import { pdfBytes, openPdf, PdfPen } from './pen/pdf-pen';
import { SvgPen } from './pen/svg-pen';
import { assumptionPages } from './pages/assumption-pages';
import { cautionPages } from './pages/caution-pages';
import { certificatePage } from './pages/certificate-page';
import { comparisonPages, figurePages } from './pages/comparison-pages';
import { Flow } from './pages/flow';
import { protectivePages } from './pages/protective-pages';
import { cyclePages, pathPages, payloadPages } from './pages/work-pages';
import { cycleOf, verdictsOf } from '../judging/judge-sheet';
import { mapPicture } from './pages/map-picture';
import { drawSheetPage, sheetBounds, sheetBoxes, type SheetPage } from './pages/sheet-page';
import { drawFoot, drawTitleBlock, TITLE_HEIGHT } from './pages/title-block';
import { verdictPages } from './pages/verdict-pages';
import { reportSheet, type ReportSheet } from './report-sheet';

export interface MadeReport {
  readonly bytes: Uint8Array;
  readonly mediaType: string;
  readonly pages: number;
}

/** More pages of plan than this are a wall and no report. */
const PLAN_PAGES_MAX = 40;
const PNG_DOTS_PER_INCH = 200;

/**
 * The report of a frozen sheet. The same input gives the same pages.
 * @throws AppError 422 `too_many_pages` where the wanted scale would need more pages than anybody lays side by side.
 */
export async function makeReport(
  input: ReportInput,
  organisationId: string,
  options: ReportOptions,
  onProgress: (done: number) => Promise<void> = async () => undefined,
): Promise<MadeReport> {
  const sheet = await reportSheet(input.sheet, organisationId, options);
  await onProgress(1);
  const other = input.compared && (await reportSheet(input.compared, organisationId, { ...options, floorPlan: false }));
  const range = sheet.map ? valueRange(sheet.map.measure, sheet.map.value) : { from: 0, to: 1 };
  const picture = sheet.map && (await mapPicture(sheet.map, options.mapScale, range));
  await onProgress(2);
  const plan = { input, options, sheet, mapPicture: picture, range };
  if (options.kind === 'png') return makePng(plan);
  const made = await makePdf(plan, other);
  await onProgress(3);
  return made;
}

interface Plan {
  readonly input: ReportInput;
  readonly options: ReportOptions;
  readonly sheet: ReportSheet;
  readonly mapPicture: SheetPage['mapPicture'];
  readonly range: ValueRange;
}

/** The plan's pages: one that shows all of it, and, where the wanted scale needs more room, one a part. */
function planPages({ sheet, options }: Plan): Pick<SheetPage, 'bounds' | 'scale' | 'name'>[] {
  const bounds = sheetBounds(sheet);
  const box = sheetBoxes(options.paper).plan;
  const fitting = fittingScale(bounds, box);
  if (options.scale === 'fit') return [{ bounds, scale: fitting, name: 'Plan' }];
  const parts = pageBounds(bounds, box, options.scale);
  if (parts.length === 1) return [{ bounds, scale: options.scale, name: 'Plan' }];
  if (parts.length > PLAN_PAGES_MAX) {
    throw new AppError({
      status: 422,
      code: 'too_many_pages',
      detail: `At 1:${options.scale} the plan takes ${parts.length} pages. Choose a smaller scale or larger paper.`,
    });
  }
  const { scale } = options;
  return [
    { bounds, scale: fitting, name: 'Plan' },
    ...parts.map((part, index) => ({ bounds: part, scale, name: `Part ${index + 1} of ${parts.length}` })),
  ];
}

async function makePng(plan: Plan): Promise<MadeReport> {
  const paper = paperOf(plan.options.paper);
  const pen = new SvgPen(paper.widthPt, paper.heightPt);
  const [page] = planPages({ ...plan, options: { ...plan.options, scale: onePageScale(plan) } });
  drawSheetPage(pen, { ...plan, ...page, foot: '' });
  const bytes = await sharp(Buffer.from(pen.svg()), { density: PNG_DOTS_PER_INCH, unlimited: true })
    .flatten({ background: '#ffffff' })
    .withMetadata({ density: PNG_DOTS_PER_INCH })
    .png({ compressionLevel: 9 })
    .toBuffer();
  return { bytes, mediaType: 'image/png', pages: 1 };
}

/** A picture is one page: the wanted scale where the plan fits it, else the fitting one. */
function onePageScale({ sheet, options }: Plan): ReportOptions['scale'] {
  if (options.scale === 'fit') return 'fit';
  return pageBounds(sheetBounds(sheet), sheetBoxes(options.paper).plan, options.scale).length === 1
    ? options.scale
    : 'fit';
}

async function makePdf(plan: Plan, other: ReportSheet | null): Promise<MadeReport> {
  const { input, sheet, options } = plan;
  const { snapshot, revision } = input.sheet;
  const paper = paperOf(options.paper);
  const document = openPdf({
    title: `${snapshot.projectName}, ${snapshot.letter} · ${snapshot.name}, ${revision ? `rev ${revision.number}` : 'draft'}`,
    author: input.organisationName,
  });
  const pen = new PdfPen(document);
  const addPage = () => document.addPage({ size: [paper.widthPt, paper.heightPt], margin: 0 });
  for (const page of planPages(plan)) {
    addPage();
    drawSheetPage(pen, { ...plan, ...page, foot: '' });
  }
  const top = paper.marginPt + TITLE_HEIGHT + 4;
  const box: Box = {
    x: paper.marginPt,
    y: top,
    width: paper.widthPt - 2 * paper.marginPt,
    height: paper.heightPt - top - paper.marginPt - 10,
  };
  const flow = new Flow(() => {
    addPage();
    drawTitleBlock(pen, { ...box, y: paper.marginPt, height: TITLE_HEIGHT }, input, '–', 'Report');
    drawFoot(pen, paper, input, '');
    return pen;
  }, box);
  const judged = verdictsOf(snapshot);
  verdictPages(flow, sheet);
  pathPages(flow, sheet, judged);
  cyclePages(flow, cycleOf(snapshot));
  payloadPages(flow, judged);
  figurePages(flow, sheet);
  if (other) comparisonPages(flow, sheet, other);
  protectivePages(flow, sheet);
  assumptionPages(flow, sheet);
  cautionPages(flow);
  certificatePage(flow, input);
  // Page numbers last, when it is known how many there are.
  const { start, count } = document.bufferedPageRange();
  for (let index = 0; index < count; index += 1) {
    document.switchToPage(start + index);
    const y = paper.heightPt - paper.marginPt + 2;
    const right = paper.widthPt - paper.marginPt;
    pen.text(`Page ${index + 1} of ${count}`, right, y, { size: 6.5, face: 'mono', align: 'right' });
  }
  return { bytes: await pdfBytes(document), mediaType: 'application/pdf', pages: count };
}
