import { execFileSync } from 'node:child_process';
import { createHash, randomUUID } from 'node:crypto';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { GET as getReport, DELETE as removeReport } from '@/app/api/reports/[reportId]/route';
import { GET as getFile } from '@/app/api/reports/[reportId]/file/route';
import { POST as retry } from '@/app/api/reports/[reportId]/retry/route';
import { GET as listReports, POST as askReport } from '@/app/api/reports/route';
import { reportListSchema, reportSchema, type Report, type ReportOptions } from '@/lib/contracts/reports';
import { CAUTIONS } from '@/lib/layout/cautions';
import { itemSchema, robotSchema, type Item } from '@/lib/layout/items';
import { questionOfRobot } from '@/lib/layout/map-question';
import { mapSettingsSchema } from '@/lib/layout/map-settings';
import { askMap } from '@/lib/server/maps';
import { failReport } from '@/lib/server/reports/fail-report';
import { runReport } from '@/lib/server/reports/run-report';
import { issueRevision } from '@/lib/server/revisions/issue-revision';
import { AuditEvent, Layout, Report as ReportRow, SignOff } from '@/models';
import {
  callRoute,
  createArm,
  createLayout,
  createMember,
  createProject,
  robotItem,
  type TestMember,
} from '@/tests/factories';
import { runTiles } from './support/map-jobs';

let integrator: TestMember;
let projectId: string;
let revision: Awaited<ReturnType<typeof issueRevision>>;
const folder = mkdtempSync(join(tmpdir(), 'reports-'));
afterAll(() => rmSync(folder, { recursive: true }));

/** Beside the distance itself. */
const SAFETY_WORDS = 'Needs a risk assessment, measured stopping times, local codes and competent persons.';

const POINTS = ['Infeed left', 'Far corner', '=Deburr 2'];

function fixture(): Item {
  const places = [[0, 0], [3000, 0], [100, 60]]; // prettier-ignore
  return itemSchema.parse({
    kind: 'fixture',
    id: randomUUID(),
    name: 'Nest Łódź',
    xMm: 800,
    yMm: 200,
    angleDeg: 10,
    zToMm: 500,
    outlineMm: [[-300, -200], [300, -200], [300, 200], [-300, 200]],
    taskPoints: places.map(([xMm, yMm], order) => ({ id: randomUUID(), name: POINTS[order], xMm, yMm, zMm: 600, order, speedMmS: 250 })),
  }); // prettier-ignore
}

beforeAll(async () => {
  integrator = await createMember('integrator');
  const { organisationId } = integrator;
  projectId = (await createProject({ organisationId })).id;
  const arm = await createArm({ organisationId });
  const robot = robotItem(arm.id);
  const guard = itemSchema.parse({ kind: 'guardLine', id: randomUUID(), name: 'Guard', xMm: 0, yMm: 0, angleDeg: 0, pointsMm: [[-3000, -2500], [3500, -2500], [3500, 2500], [-3000, 2500]] }); // prettier-ignore
  const mapSettings = mapSettingsSchema.parse({ stepMm: 50, toolHeightMm: 600 });
  const device = (name: string, stopS: number | null) =>
    itemSchema.parse({ kind: 'protectiveDevice', id: randomUUID(), name, xMm: 0, yMm: 0, angleDeg: 0, pointsMm: [[0, -2500], [2000, -2500]], stopS, responseS: 0.05, detectionMm: 30 }); // prettier-ignore
  const items = [robot, fixture(), guard, device('Curtain told', 0.3), device('Curtain open', null)];
  const layout = await createLayout({ projectId, items });
  await Layout.update({ mapSettings }, { where: { id: layout.id } });
  const map = await askMap(integrator.actor, questionOfRobot(robotSchema.parse(robot), mapSettings));
  await runTiles(map.id);
  revision = await issueRevision(integrator.actor, layout.id, { note: 'For review' });
  await SignOff.create({
    revisionId: revision.id,
    sha256: revision.sha256,
    decision: 'accepted',
    note: 'As agreed on the floor.',
    userId: integrator.user.id,
    signerName: 'Vera Holt',
    signerEmail: 'vera@example.com',
  });
}, 120_000);

async function ask(options: Partial<ReportOptions> = {}, as = integrator): Promise<Report> {
  const body = { subject: 'revisions', subjectId: revision.id, options };
  const response = await callRoute(askReport, { as, method: 'POST', body });
  expect(response.status).toBe(202);
  return reportSchema.parse(await response.json());
}

/** Made as a worker would, and downloaded as a member would; the path of the file. */
async function made(options: Partial<ReportOptions> = {}): Promise<string> {
  const { id, options: asked } = await ask(options);
  await runReport({ reportId: id, attempt: 1 });
  const response = await callRoute(getFile, { as: integrator, params: { reportId: id } });
  expect(response.status).toBe(200);
  expect(response.headers.get('content-disposition')).toContain(`.${asked.kind}"`);
  const path = join(folder, `${id}.${asked.kind}`);
  writeFileSync(path, Buffer.from(await response.arrayBuffer()));
  const answer = reportSchema.parse(
    await (await callRoute(getReport, { as: integrator, params: { reportId: id } })).json(),
  );
  const bytes = readFileSync(path);
  expect(answer).toMatchObject({ state: 'done', bytes: bytes.byteLength, progress: { done: 4, total: 4 } });
  expect(answer.sha256).toBe(createHash('sha256').update(bytes).digest('hex'));
  return path;
}

// Read by programs of poppler-utils, which share nothing with what wrote the file.
const run = (program: string, ...parameters: string[]): string =>
  execFileSync(program, parameters, { encoding: 'utf8' });
const textOf = (path: string): string => run('pdftotext', '-layout', path, '-').replace(/[ \t]+/g, ' ');
/** As pdftotext gives it, line ends and column gaps apart. */
const squeezed = (text: string): string => text.replace(/\s+/g, '');

/** The longest dark stroke in the lower right corner of the first page, mm on paper: the scale bar. */
async function scaleBarMm(path: string): Promise<number> {
  const dpi = 400;
  const page = path.replace(/\.pdf$/, '');
  run('pdftoppm', '-r', String(dpi), '-f', '1', '-l', '1', '-singlefile', '-gray', '-png', path, page);
  const { data, info } = await sharp(`${page}.png`).greyscale().raw().toBuffer({ resolveWithObject: true });
  const px = (mm: number) => Math.round((mm / 25.4) * dpi);
  let longest = 0;
  for (let y = info.height - px(28); y < info.height - px(9); y += 1) {
    let length = 0;
    for (let x = info.width - px(76); x < info.width - px(6); x += 1) {
      length = data[y * info.width + x] < 140 ? length + 1 : 0;
      longest = Math.max(longest, length);
    }
  }
  return (longest / dpi) * 25.4;
}

describe('a PDF report, read back', () => {
  it.each([
    ['A4', 50, 841.89, 595.276, 40],
    ['A4', 100, 841.89, 595.276, 50],
    ['A3', 20, 1190.55, 841.89, 50],
  ] as const)('%s at 1:%i has its page size and its scale bar on paper', async (paper, scale, width, height, barMm) => {
    const path = await made({ paper, scale });
    // ISO 216: A4 is 210 mm × 297 mm, A3 297 mm × 420 mm; a point is 1/72 inch (PDF, ISO 32000-1).
    const [, pageWidth, pageHeight] = /Page size:\s+([\d.]+) x ([\d.]+)/.exec(run('pdfinfo', path)) ?? [];
    expect(Number(pageWidth)).toBeCloseTo(width, 1);
    expect(Number(pageHeight)).toBeCloseTo(height, 1);
    const text = textOf(path);
    const [, firstScale] = /Scale 1:(\d+)/.exec(text) ?? [];
    const [, floor, unit] = /\b0 ([\d.]+) (m|mm)\n/.exec(text) ?? [];
    const measured = await scaleBarMm(path);
    const [, saidMm] = /The bar is ([\d.]+) mm long/.exec(text) ?? [];
    expect(Math.abs(measured - Number(saidMm))).toBeLessThan(0.2);
    // Length on the floor over the scale is the length on paper, to a fifth of a millimetre.
    const floorMm = Number(floor) * (unit === 'm' ? 1000 : 1);
    expect(Math.abs(measured - floorMm / Number(firstScale))).toBeLessThan(0.2);
    if (Number(firstScale) === scale) expect(Math.abs(measured - barMm)).toBeLessThan(0.2);
  });

  it('names every task point with its verdict, the cautions, the assumptions and who signed', async () => {
    const text = textOf(await made());
    const verdicts = text.split('\n');
    const rowOf = (name: string) => verdicts.find((line) => line.includes(name) && /\d+, /.test(line)) ?? '';
    for (const name of POINTS) expect(rowOf(name)).toMatch(/Roomy|Fair|Tight|Pinned|Out of reach/);
    expect(rowOf('Far corner')).toContain('Out of reach');
    expect(text).toContain('Nest Łódź');
    for (const caution of CAUTIONS) expect(squeezed(text)).toContain(squeezed(caution));
    for (const word of ['Assumptions', 'tool down, height 600 mm', 'kernel version', 'Inverse condition number']) {
      expect(text).toContain(word);
    }
    // ISO 13855:2010 at right angles, d ≤ 40 mm (from memory): S = 2000 T + 8 (d − 14) = 700 + 128 > 500, so the slow form
    // counts where it gives at least 500: S = 1600 × 0.35 + 128 = 688.
    expect(text).toMatch(/Distance, planning aid 688 mm/);
    expect(text).toContain('not told: figures are missing');
    expect(squeezed(text)).toContain(squeezed(SAFETY_WORDS));
    expect(text).toContain('Certificate of sign-off');
    expect(text).toContain('Vera Holt');
    expect(text).not.toContain('vera@example.com');
    expect(text.split(revision.sha256)).toHaveLength(3);
    expect(text.toLowerCase()).not.toMatch(/\bcompliant\b|\bis safe\b/);
  });

  it('embeds its fonts', async () => {
    const fonts = run('pdffonts', await made())
      .split('\n')
      .slice(2)
      .filter(Boolean);
    expect(fonts.length).toBeGreaterThan(2);
    // Columns emb, sub, uni.
    for (const font of fonts) expect(font).toMatch(/ yes +yes +yes /);
  });

  it('sets another sheet beside it', async () => {
    const draft = { subject: 'layouts', subjectId: revision.layoutId } as const;
    const text = textOf(await made({ compareWith: draft }));
    expect(text).toContain('Comparison');
    expect(text).toContain('Nothing stands or is turned differently.');
  });
});

describe('a report', () => {
  it('is a picture too, of the same page', async () => {
    const head = await sharp(await made({ kind: 'png', paper: 'A4' })).metadata();
    // A4 at 200 dots an inch.
    expect([head.format, head.width, head.height, head.density]).toEqual(['png', 2339, 1654, 200]);
  });

  it('is listed with its sheet, for a viewer too, and for nobody else', async () => {
    const { id } = await ask();
    const query = `/?subject=revisions&subjectId=${revision.id}`;
    const viewer = await createMember('viewer', { organisationId: integrator.organisationId, projectIds: [projectId] });
    const answer = await callRoute(listReports, { as: viewer, path: query });
    expect(reportListSchema.parse(await answer.json()).reports.map((report) => report.id)).toContain(id);
    const stranger = await createMember('admin');
    expect((await callRoute(listReports, { as: stranger, path: query })).status).toBe(404);
    expect((await callRoute(getReport, { as: stranger, params: { reportId: id } })).status).toBe(404);
    expect((await callRoute(removeReport, { as: viewer, method: 'DELETE', params: { reportId: id } })).status).toBe(
      403,
    );
  });

  it('of a draft is not for viewers', async () => {
    const viewer = await createMember('viewer', { organisationId: integrator.organisationId, projectIds: [projectId] });
    const body = { subject: 'layouts', subjectId: revision.layoutId };
    expect((await callRoute(askReport, { as: viewer, method: 'POST', body })).status).toBe(403);
    const response = await callRoute(askReport, { as: integrator, method: 'POST', body });
    const { id } = reportSchema.parse(await response.json());
    expect((await callRoute(getReport, { as: viewer, params: { reportId: id } })).status).toBe(404);
  });

  it('is not to be had before it is made, and says why when it cannot be', async () => {
    const { id } = await ask();
    expect((await callRoute(getFile, { as: integrator, params: { reportId: id } })).status).toBe(409);
    await failReport({ reportId: id, attempt: 1 }, 'The store is away.');
    // Late news of an attempt that is over changes nothing.
    await runReport({ reportId: id, attempt: 1 });
    expect(await ReportRow.findByPk(id)).toMatchObject({ state: 'failed', failure: 'The store is away.' });
    const again = await callRoute(retry, { as: integrator, method: 'POST', params: { reportId: id } });
    expect(reportSchema.parse(await again.json())).toMatchObject({ state: 'queued', failure: null });
    await runReport({ reportId: id, attempt: 2 });
    // Done twice is done once.
    await runReport({ reportId: id, attempt: 2 });
    expect(await ReportRow.findByPk(id)).toMatchObject({ state: 'done', attempt: 2 });
    expect((await callRoute(removeReport, { as: integrator, method: 'DELETE', params: { reportId: id } })).status).toBe(
      204,
    );
    expect((await callRoute(getFile, { as: integrator, params: { reportId: id } })).status).toBe(404);
    const actions = (await AuditEvent.findAll({ where: { subjectId: id } })).map(({ action }) => action).sort();
    expect(actions).toEqual(['report.asked', 'report.removed', 'report.retried']);
  });

  it('refuses to compare with a sheet of another project', async () => {
    const foreign = await createLayout({
      projectId: (await createProject({ organisationId: integrator.organisationId })).id,
    });
    const options = { compareWith: { subject: 'layouts', subjectId: foreign.id } };
    const body = { subject: 'revisions', subjectId: revision.id, options };
    const response = await callRoute(askReport, { as: integrator, method: 'POST', body });
    expect(response.status).toBe(422);
    expect(await response.json()).toMatchObject({ errors: [{ path: 'options.compareWith' }] });
  });
});
