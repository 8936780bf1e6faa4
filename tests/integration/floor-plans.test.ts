import sharp from 'sharp';
import { beforeAll, describe, expect, it } from 'vitest';
import { DELETE, GET, PATCH } from '@/app/api/floor-plans/[floorPlanId]/route';
import { GET as getPicture } from '@/app/api/floor-plans/[floorPlanId]/picture/route';
import { GET as list, POST } from '@/app/api/projects/[projectId]/floor-plans/route';
import { PATCH as patchLayout } from '@/app/api/layouts/[layoutId]/route';
import { floorPlanListSchema, floorPlanSchema, type FloorPlan } from '@/lib/contracts/floor-plans';
import { problemSchema } from '@/lib/contracts/common';
import { issueRevision } from '@/lib/server/revisions/issue-revision';
import { Layout } from '@/models';
import {
  callRoute,
  createArm,
  createFloorPlan,
  createLayout,
  createMember,
  createProject,
  robotItem,
  type TestMember,
  type Handler,
} from '@/tests/factories';
import { storedKeys } from './support/stored-keys';
import { upload } from './support/upload';

let planner: TestMember;
let stranger: TestMember;
let projectId: string;

beforeAll(async () => {
  planner = await createMember('planner');
  stranger = await createMember('admin');
  projectId = (await createProject({ organisationId: planner.organisationId })).id;
});

async function uploaded(): Promise<FloorPlan> {
  const bytes = await sharp({ create: { width: 3000, height: 1500, channels: 3, background: 'white' } })
    .png()
    .toBuffer();
  const response = await upload(POST, { as: planner, projectId, file: { name: 'hall.png', bytes }, name: 'Hall 2' });
  return floorPlanSchema.parse(await response.json());
}

const call = (handler: Handler, floorPlanId: string, as: TestMember, options: object = {}) =>
  callRoute(handler, { as, params: { floorPlanId }, ...options });

/** A variant with a robot on it, so that there is something to issue. */
async function layoutOver(floorPlanId: string): Promise<Layout> {
  const arm = await createArm({ organisationId: planner.organisationId });
  const layout = await createLayout({ projectId, items: [robotItem(arm.id)] });
  const response = await callRoute(patchLayout, {
    as: planner,
    method: 'PATCH',
    params: { layoutId: layout.id },
    body: { floorPlanId },
  });
  expect(response.status).toBe(200);
  return layout;
}

describe('pictures', () => {
  it('come in the smallest stored size that is wide enough, to be kept by the browser alone', async () => {
    const { id, pictureWidths } = await uploaded();
    expect(pictureWidths).toEqual([1024, 2048, 3000]);
    for (const [asked, given] of [
      [1, 1024],
      [1024, 1024],
      [1025, 2048],
      [3000, 3000],
      [9999, 3000],
    ]) {
      const response = await call(getPicture, id, planner, { path: `/?width=${asked}` });
      expect(response.headers.get('cache-control')).toBe('private, max-age=31536000, immutable');
      const bytes = Buffer.from(await response.arrayBuffer());
      expect(response.headers.get('content-length')).toBe(String(bytes.byteLength));
      expect((await sharp(bytes).metadata()).width).toBe(given);
    }
  });

  it('are not sent again to a browser that has them', async () => {
    const { id } = await uploaded();
    const etag = (await call(getPicture, id, planner)).headers.get('etag');
    const again = await call(getPicture, id, planner, { headers: { 'if-none-match': etag } });
    expect(again.status).toBe(304);
    expect(await again.text()).toBe('');
  });

  it('of a draft are not for viewers; those of an issued revision are, and stay so when the draft moves on', async () => {
    const viewer = await createMember('viewer', { organisationId: planner.organisationId, projectIds: [projectId] });
    const issuedPlan = await uploaded();
    const draftPlan = await uploaded();
    const layout = await layoutOver(issuedPlan.id);
    expect((await call(getPicture, issuedPlan.id, viewer)).status).toBe(404);
    const integrator = await createMember('integrator', { organisationId: planner.organisationId });
    await issueRevision(integrator.actor, layout.id, { note: '' });
    await Layout.update({ floorPlanId: draftPlan.id }, { where: { id: layout.id } });
    expect((await call(getPicture, issuedPlan.id, viewer)).status).toBe(200);
    expect((await call(getPicture, draftPlan.id, viewer)).status).toBe(404);
  });
});

describe('a floor plan', () => {
  it('is renamed and listed', async () => {
    const { id } = await uploaded();
    const response = await call(PATCH, id, planner, { method: 'PATCH', body: { name: ' Hall 2, as measured ' } });
    expect(floorPlanSchema.parse(await response.json()).name).toBe('Hall 2, as measured');
    const listed = await callRoute(list, { as: planner, params: { projectId } });
    const { floorPlans } = floorPlanListSchema.parse(await listed.json());
    expect(floorPlans.find((plan) => plan.id === id)?.name).toBe('Hall 2, as measured');
  });

  it('keeps its scale through a rename, and loses it when told', async () => {
    const { id } = await uploaded();
    const calibration = {
      scale: { fromPx: [0, 0], toPx: [1000, 0], distanceMm: 8000 },
      check: { fromPx: [0, 0], toPx: [0, 1010], distanceMm: 8000 },
      originPx: [0, 1500],
    };
    await call(PATCH, id, planner, { method: 'PATCH', body: { calibration } });
    const renamed = await call(PATCH, id, planner, { method: 'PATCH', body: { name: 'Hall' } });
    expect(floorPlanSchema.parse(await renamed.json()).calibration).toMatchObject({
      mmPerPx: 8,
      rotationDeg: 0,
      checkError: expect.closeTo(0.01, 9),
      level: null,
    });
    const bare = await call(PATCH, id, planner, { method: 'PATCH', body: { calibration: null } });
    expect(floorPlanSchema.parse(await bare.json()).calibration).toBeNull();
  });

  it('is not set to scale by two points on one spot', async () => {
    const { id } = await uploaded();
    const calibration = { scale: { fromPx: [5, 5], toPx: [5, 5], distanceMm: 8000 }, originPx: [0, 0] };
    const response = await call(PATCH, id, planner, { method: 'PATCH', body: { calibration } });
    expect(response.status).toBe(422);
    const { errors } = problemSchema.parse(await response.json());
    expect(errors).toEqual([
      { path: 'calibration.scale', message: expect.stringMatching(/one spot\. Pick two points/) },
    ]);
    expect(floorPlanSchema.parse(await (await call(GET, id, planner)).json()).calibration).toBeNull();
  });

  it('is deleted with its pictures', async () => {
    const { id } = await uploaded();
    const prefix = `floor-plans/${planner.organisationId}/${id}/`;
    expect(await storedKeys(prefix)).toHaveLength(3);
    expect((await call(DELETE, id, planner, { method: 'DELETE' })).status).toBe(204);
    expect(await storedKeys(prefix)).toEqual([]);
    expect((await call(GET, id, planner)).status).toBe(404);
  });

  it('is kept while a variant lies on it, and for good once a revision shows it', async () => {
    const { id } = await uploaded();
    const layout = await layoutOver(id);
    const used = await call(DELETE, id, planner, { method: 'DELETE' });
    expect(used.status).toBe(409);
    expect(problemSchema.parse(await used.json())).toMatchObject({
      code: 'floor_plan_in_use',
      detail: expect.stringContaining(`variant ${layout.letter}`),
    });

    const integrator = await createMember('integrator', { organisationId: planner.organisationId });
    await issueRevision(integrator.actor, layout.id, { note: '' });
    await Layout.update({ floorPlanId: null }, { where: { id: layout.id } });
    const issued = await call(DELETE, id, planner, { method: 'DELETE' });
    expect(issued.status).toBe(409);
    expect(problemSchema.parse(await issued.json()).detail).toMatch(/issued revision/);
    expect((await call(getPicture, id, planner)).status).toBe(200);
  });

  it('of another organisation, or for a viewer, is not there', async () => {
    const { id } = await uploaded();
    for (const handler of [GET, getPicture]) expect((await call(handler, id, stranger)).status).toBe(404);
    for (const [handler, method] of [[PATCH, 'PATCH'] as const, [DELETE, 'DELETE'] as const]) {
      const body = method === 'PATCH' ? { name: 'Mine' } : undefined;
      expect((await call(handler, id, stranger, { method, body })).status).toBe(404);
    }
    const foreign = await createFloorPlan();
    const layout = await createLayout({ projectId });
    const laid = await callRoute(patchLayout, {
      as: planner,
      method: 'PATCH',
      params: { layoutId: layout.id },
      body: { floorPlanId: foreign.id },
    });
    expect(laid.status).toBe(422);
    const elsewhere = await upload(POST, { as: stranger, projectId, file: { name: 'a.png', bytes: Buffer.from('x') } });
    expect(elsewhere.status).toBe(404);
  });
});
