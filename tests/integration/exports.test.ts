import { randomUUID } from 'node:crypto';
import sharp from 'sharp';
import { beforeAll, describe, expect, it } from 'vitest';
import { GET as getFile } from '@/app/api/exports/[subject]/[subjectId]/[file]/route';
import { GET as getSchema } from '@/app/api/exports/schema/route';
import { POST as uploadPlan } from '@/app/api/projects/[projectId]/floor-plans/route';
import { POST as importFile } from '@/app/api/projects/[projectId]/import/route';
import { problemSchema } from '@/lib/contracts/common';
import { floorPlanSchema } from '@/lib/contracts/floor-plans';
import { LAYOUT_FILE_VERSION, layoutFileSchema, layoutImportAnswerSchema } from '@/lib/contracts/layout-file';
import { calibrate } from '@/lib/layout/calibrate';
import { itemSchema } from '@/lib/layout/items';
import { issueRevision } from '@/lib/server/revisions/issue-revision';
import { Arm, AuditEvent, FloorPlan, Layout, LayoutItem } from '@/models';
import {
  callRoute,
  createArm,
  createLayout,
  createMember,
  createProject,
  robotItem,
  type TestMember,
} from '@/tests/factories';
import { uploadForm } from './support/upload';

let integrator: TestMember;
let projectId: string;
let layoutId: string;

beforeAll(async () => {
  integrator = await createMember('integrator');
  const { organisationId } = integrator;
  projectId = (await createProject({ organisationId })).id;
  const arm = await createArm({ organisationId });
  const fixture = itemSchema.parse({
    kind: 'fixture',
    id: randomUUID(),
    name: '=Nest',
    xMm: 900,
    yMm: 100 / 3,
    angleDeg: 12.5,
    zToMm: 800,
    outlineMm: [[-300, -200], [300, -200], [300, 200]],
    taskPoints: [{ id: randomUUID(), name: 'Pick', xMm: 0, yMm: 0, zMm: 850, speedMmS: 250 }],
  }); // prettier-ignore
  layoutId = (await createLayout({ projectId, items: [robotItem(arm.id), fixture] })).id;
  const bytes = await sharp({ create: { width: 300, height: 200, channels: 3, background: '#eee' } })
    .png()
    .toBuffer();
  const form = uploadForm({ file: { name: 'hall.png', bytes } });
  const answer = await callRoute(uploadPlan, { as: integrator, method: 'POST', params: { projectId }, body: form });
  const plan = floorPlanSchema.parse(await answer.json());
  const line = { fromPx: [0, 0], toPx: [300, 0], distanceMm: 7321.5 } as const;
  const calibration = calibrate({
    scale: { ...line, fromPx: [0, 0], toPx: [300, 0] },
    check: null,
    level: null,
    originPx: [10, 190],
  });
  await FloorPlan.update({ calibration }, { where: { id: plan.id } });
  await Layout.update({ floorPlanId: plan.id }, { where: { id: layoutId } });
});

const fetchFile = (subjectId: string, file: string, as = integrator, subject = 'layouts') =>
  callRoute(getFile, { as, params: { subject, subjectId, file } });

async function exported(subjectId = layoutId, as = integrator): Promise<string> {
  const response = await fetchFile(subjectId, 'layout.json', as);
  expect(response.status).toBe(200);
  return response.text();
}

function bring(text: string | Uint8Array<ArrayBuffer>, into = projectId, as = integrator) {
  const headers = { cookie: as.cookie, 'sec-fetch-site': 'same-origin', 'content-type': 'application/json' };
  const request = new Request('http://elbowroom.test/', { method: 'POST', headers, body: text });
  return importFile(request, { params: Promise.resolve({ projectId: into }) });
}

async function imported(text: string, into = projectId, as = integrator) {
  const response = await bring(text, into, as);
  expect(response.status).toBe(201);
  return layoutImportAnswerSchema.parse(await response.json());
}

describe('a layout file', () => {
  it('comes back byte for byte after an import into the same project, into which nothing else is added', async () => {
    const text = await exported();
    const [arms, plans] = [await Arm.count(), await FloorPlan.count()];
    const answer = await imported(text);
    expect(answer).toMatchObject({ armsAdded: [], floorPlan: 'found', letter: 'B' });
    expect(answer.layoutId).not.toBe(layoutId);
    expect(await exported(answer.layoutId)).toBe(text);
    expect([await Arm.count(), await FloorPlan.count()]).toEqual([arms, plans]);
    expect(await AuditEvent.count({ where: { action: 'layout.imported', subjectId: answer.layoutId } })).toBe(1);
  });

  it('comes back byte for byte out of another organisation, which then has the arm and the floor plan', async () => {
    const text = await exported();
    const stranger = await createMember('admin');
    const there = await createProject({ organisationId: stranger.organisationId });
    const answer = await imported(text, there.id, stranger);
    expect(answer.floorPlan).toBe('added');
    expect(answer.armsAdded).toHaveLength(1);
    expect(await exported(answer.layoutId, stranger)).toBe(text);
    // Again: now both are known.
    expect(await imported(text, there.id, stranger)).toMatchObject({ floorPlan: 'found', armsAdded: [] });
  });

  it('is the same for the revision issued from the draft', async () => {
    const { id } = await issueRevision(integrator.actor, layoutId, { note: '' });
    const response = await fetchFile(id, 'layout.json', integrator, 'revisions');
    expect(await response.text()).toBe(await exported());
  });

  it('fits the public schema, which names its version', async () => {
    const response = await callRoute(getSchema);
    const schema = (await response.json()) as { properties: Record<string, unknown>; required: string[] };
    expect(response.headers.get('content-type')).toBe('application/schema+json');
    expect(schema.properties.version).toMatchObject({ const: LAYOUT_FILE_VERSION });
    const file = JSON.parse(await exported()) as object;
    for (const member of Object.keys(file)) expect(schema.properties).toHaveProperty(member);
    expect(layoutFileSchema.safeParse(file).success).toBe(true);
  });
});

describe('an import', () => {
  async function refused(text: string | Uint8Array<ArrayBuffer>, as = integrator) {
    const before = [await Layout.count(), await LayoutItem.count(), await Arm.count(), await FloorPlan.count()];
    const response = await bring(text, projectId, as);
    expect([await Layout.count(), await LayoutItem.count(), await Arm.count(), await FloorPlan.count()]).toEqual(
      before,
    );
    return problemSchema.parse(await response.json());
  }
  const edited = async (change: (file: Record<string, unknown>) => void, keepSum = false) => {
    const file = JSON.parse(await exported()) as Record<string, unknown>;
    if (!keepSum) delete file.sha256;
    change(file);
    return JSON.stringify(file);
  };

  it('refuses a foreign file', async () => {
    expect(await refused('{"a":1}')).toMatchObject({ status: 422, code: 'file_foreign' });
    expect(await refused('x,y\n1,2')).toMatchObject({ status: 422, code: 'file_foreign' });
    expect(await refused('')).toMatchObject({ status: 422, code: 'file_foreign' });
    expect(await refused(new Uint8Array([0x89, 0x50, 0x4e, 0x47, 0xff]))).toMatchObject({ code: 'file_foreign' });
  });

  it('refuses a file cut short and says where it ends', async () => {
    const text = await exported();
    const lines = text.slice(0, 4000).split('\n').length;
    const problem = await refused(text.slice(0, 4000));
    expect(problem).toMatchObject({ status: 422, code: 'file_damaged' });
    expect(problem.detail).toContain(`line ${lines}, column`);
  });

  it('refuses a file with a stray character and says where it is', async () => {
    const problem = await refused('{\n "format": "elbowroom-layout",\n "version": oops\n}');
    expect(problem).toMatchObject({ code: 'file_damaged', errors: [{ path: 'line 3, column 13' }] });
  });

  it('refuses a newer file', async () => {
    const problem = await refused(await edited((file) => (file.version = LAYOUT_FILE_VERSION + 1)));
    expect(problem).toMatchObject({ code: 'file_newer', errors: [{ path: 'version' }] });
  });

  it('refuses a file that was changed behind its checksum, and reads it without one', async () => {
    const change = (file: Record<string, unknown>) => (file.name = 'Another');
    expect(await refused(await edited(change, true))).toMatchObject({
      code: 'file_changed',
      errors: [{ path: 'sha256' }],
    });
    expect(await imported(await edited(change))).toMatchObject({ name: 'Another' });
  });

  it('names the place of a wrong, an unknown and a dangling member', async () => {
    const items = (file: Record<string, unknown>) => file.items as Record<string, unknown>[];
    const wrong = await refused(await edited((file) => (items(file)[0].xMm = 'left')));
    expect(wrong).toMatchObject({ status: 422, errors: [{ path: 'items.0.xMm' }] });
    const unknown = await refused(await edited((file) => (items(file)[1].wheels = 4)));
    expect(unknown).toMatchObject({ status: 422, errors: [{ path: 'items.1.wheels' }] });
    const dangling = await refused(await edited((file) => (items(file)[0].armId = randomUUID())));
    expect(dangling).toMatchObject({ status: 422, errors: [{ path: 'items.0.armId' }] });
    const twice = await refused(await edited((file) => (items(file)[1].id = items(file)[0].id)));
    expect(twice).toMatchObject({ status: 422, errors: [{ path: 'items.1.id' }] });
  });

  it('refuses a picture that does not fit its checksum', async () => {
    const bytes = await sharp({ create: { width: 300, height: 200, channels: 3, background: '#000' } })
      .png()
      .toBuffer();
    const text = await edited((file) => {
      ((file.floorPlan as Record<string, unknown>).picture as Record<string, unknown>).base64 =
        bytes.toString('base64');
    });
    expect(await refused(text)).toMatchObject({ code: 'file_damaged', errors: [{ path: 'floorPlan.picture.sha256' }] });
  });

  it('does not let a planner add arms to the library, and names them', async () => {
    const planner = await createMember('planner', { organisationId: integrator.organisationId });
    const text = await edited((file) => {
      (file.arms as Record<string, unknown>[])[0].name = 'Arm of somewhere else';
    });
    const problem = await refused(text, planner);
    expect(problem).toMatchObject({ status: 403, code: 'arms_missing', errors: [{ path: 'arms.0' }] });
    expect(problem.detail).toContain('Arm of somewhere else');
    // What the library has, a planner may use.
    expect(await imported(await exported(), projectId, planner)).toMatchObject({ armsAdded: [] });
  });
});

describe('the other exports', () => {
  it('are downloads: DXF and verdicts, with a dangerous name made harmless', async () => {
    const dxf = await fetchFile(layoutId, 'layout.dxf');
    expect(dxf.headers.get('content-disposition')).toMatch(/^attachment; filename="[\w-]+-A-draft\.dxf"$/);
    expect(await dxf.text()).toContain('GUARD-LINES');
    const csv = await (await fetchFile(layoutId, 'verdicts.csv')).text();
    expect(csv).toContain("'=Nest");
    expect(csv).toContain('Pick');
  });

  it('say that there is no map yet', async () => {
    const response = await fetchFile(layoutId, 'map.csv');
    expect(response.status).toBe(409);
    expect(await response.json()).toMatchObject({ code: 'map_not_ready' });
  });

  it('let a viewer have what was issued, not the draft', async () => {
    const viewer = await createMember('viewer', { organisationId: integrator.organisationId, projectIds: [projectId] });
    const { id } = await issueRevision(integrator.actor, layoutId, { note: '' });
    expect((await fetchFile(id, 'layout.dxf', viewer, 'revisions')).status).toBe(200);
    expect((await fetchFile(layoutId, 'layout.dxf', viewer)).status).toBe(403);
    const stranger = await createMember('admin');
    expect((await fetchFile(id, 'layout.dxf', stranger, 'revisions')).status).toBe(404);
  });
});
