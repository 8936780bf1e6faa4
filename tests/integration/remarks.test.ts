import { randomUUID } from 'node:crypto';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { GET as onLayout } from '@/app/api/layouts/[layoutId]/remarks/route';
import { PATCH } from '@/app/api/remarks/[remarkId]/route';
import { POST as postReply } from '@/app/api/remarks/[remarkId]/replies/route';
import { GET as onRevision, POST as postRemark } from '@/app/api/revisions/[revisionId]/remarks/route';
import { problemSchema } from '@/lib/contracts/common';
import { remarkListSchema, remarkSchema, type Remark } from '@/lib/contracts/remarks';
import { issueRevision } from '@/lib/server/revisions/issue-revision';
import { Remark as RemarkRow } from '@/models';
import {
  callRoute,
  createArm,
  createLayout,
  createMember,
  createProject,
  queuedMails,
  robotItem,
  type TestMember,
} from '@/tests/factories';

let integrator: TestMember;
let planner: TestMember;
let viewer: TestMember;
let stranger: TestMember;
let projectId: string;
let layoutId: string;
let revisionId: string;
let robotId: string;

beforeAll(async () => {
  integrator = await createMember('integrator');
  const { organisationId } = integrator;
  planner = await createMember('planner', { organisationId });
  projectId = (await createProject({ organisationId })).id;
  viewer = await createMember('viewer', { organisationId, projectIds: [projectId] });
  stranger = await createMember('admin');
});

beforeEach(async () => {
  const robot = robotItem((await createArm({ organisationId: integrator.organisationId })).id);
  robotId = robot.id;
  layoutId = (await createLayout({ projectId, createdBy: planner.user.id, items: [robot] })).id;
  revisionId = (await issueRevision(integrator.actor, layoutId, { note: '' })).id;
});

const send = (as: TestMember, body: object, revision = revisionId) =>
  callRoute(postRemark, { as, method: 'POST', params: { revisionId: revision }, body });

async function pin(as: TestMember, body: string, more: object = {}): Promise<Remark> {
  const response = await send(as, { xMm: 4100, yMm: 2600.5, body, ...more });
  expect(response.status).toBe(201);
  return remarkSchema.parse(await response.json());
}

const reply = (as: TestMember, remarkId: string, body: string) =>
  callRoute(postReply, { as, method: 'POST', params: { remarkId }, body: { body } });

const resolve = (as: TestMember, remarkId: string, resolved: boolean) =>
  callRoute(PATCH, { as, method: 'PATCH', params: { remarkId }, body: { resolved } });

async function listed(handler: Parameters<typeof callRoute>[0], as: TestMember, params: object): Promise<Remark[]> {
  const response = await callRoute(handler, { as, params });
  return remarkListSchema.parse(await response.json()).remarks;
}

describe('a remark', () => {
  it('is pinned to a spot and a thing, and read with its author on the right side', async () => {
    const remark = await pin(viewer, ' Our cart needs 900 mm here. ', { itemId: robotId });
    expect(remark).toMatchObject({
      revisionId,
      revisionNumber: 1,
      number: 1,
      xMm: 4100,
      yMm: 2600.5,
      itemId: robotId,
      body: 'Our cart needs 900 mm here.',
      author: { name: viewer.user.name, side: 'customer', you: true },
      resolvedAt: null,
      replies: [],
    });
    const [seen] = await listed(onRevision, planner, { revisionId });
    expect(seen).toEqual({ ...remark, unread: true, author: { ...remark.author, you: false } });
    expect((await pin(planner, 'Noted.')).author).toEqual({ name: planner.user.name, side: 'integrator', you: true });
  });

  it('is not pinned to a thing that is not on the revision', async () => {
    const response = await send(viewer, { xMm: 0, yMm: 0, body: 'Here', itemId: randomUUID() });
    expect(response.status).toBe(422);
    expect(problemSchema.parse(await response.json()).errors?.[0].path).toBe('itemId');
  });

  it('counts within the layout, over its revisions, and at the same moment too', async () => {
    await pin(viewer, 'One');
    const second = await issueRevision(integrator.actor, layoutId, { note: '' });
    await Promise.all(['Two', 'Three', 'Four'].map((body) => send(planner, { xMm: 0, yMm: 0, body }, second.id)));
    const remarks = await listed(onLayout, planner, { layoutId });
    expect(remarks.map(({ number, revisionNumber }) => [number, revisionNumber])).toEqual([
      [1, 1],
      [2, 2],
      [3, 2],
      [4, 2],
    ]);
    expect((await listed(onRevision, viewer, { revisionId: second.id })).map(({ number }) => number)).toEqual([
      1, 2, 3, 4,
    ]);
  });

  it('is answered, settled and reopened', async () => {
    const { id } = await pin(viewer, 'Can the door open?');
    const answered = remarkSchema.parse(await (await reply(planner, id, 'It can, by 1,100 mm.')).json());
    expect(answered.replies).toMatchObject([
      { body: 'It can, by 1,100 mm.', author: { side: 'integrator', you: true } },
    ]);
    await reply(viewer, id, 'Good.');
    const [seen] = await listed(onRevision, viewer, { revisionId });
    expect(seen.replies.map(({ body, author }) => [body, author.you])).toEqual([
      ['It can, by 1,100 mm.', false],
      ['Good.', true],
    ]);

    const settled = remarkSchema.parse(await (await resolve(planner, id, true)).json());
    expect(settled.resolvedAt).not.toBeNull();
    const again = remarkSchema.parse(await (await resolve(planner, id, true)).json());
    expect(again.resolvedAt).toBe(settled.resolvedAt);
    const reopened = remarkSchema.parse(await (await resolve(planner, id, false)).json());
    expect(reopened.resolvedAt).toBeNull();
  });
});

describe('who is told', () => {
  it('of a customer\u2019s remark: whoever planned and issued, once each, with the way to the sheet', async () => {
    const before = (await queuedMails(planner.user.email)).length;
    const { number } = await pin(viewer, 'Too near to the aisle.');
    for (const member of [planner, integrator]) {
      const mails = await queuedMails(member.user.email);
      expect(mails.at(-1)).toMatchObject({
        template: 'remark',
        data: {
          remarkNumber: number,
          revisionNumber: 1,
          authorName: viewer.user.name,
          body: 'Too near to the aisle.',
          path: `/projects/${projectId}/layouts/${layoutId}`,
        },
      });
    }
    expect(await queuedMails(planner.user.email)).toHaveLength(before + 1);
    expect((await queuedMails(viewer.user.email)).map(({ data }) => data.body)).not.toContain('Too near to the aisle.');
  });

  it('of an answer: the customer who wrote; of the customer\u2019s answer: the planners', async () => {
    const { id } = await pin(viewer, 'How high is the guard?');
    await reply(planner, id, 'Two metres.');
    expect((await queuedMails(viewer.user.email)).at(-1)).toMatchObject({
      template: 'reply',
      data: { body: 'Two metres.', authorName: planner.user.name, path: `/revisions/${revisionId}` },
    });
    await reply(viewer, id, 'Please make it 2.2.');
    expect((await queuedMails(planner.user.email)).at(-1)).toMatchObject({
      template: 'reply',
      data: { body: 'Please make it 2.2.' },
    });
    expect((await queuedMails(viewer.user.email)).at(-1)?.data.body).toBe('Two metres.');
  });
});

describe('who may remark', () => {
  it('is the organisation and its viewers of the project; settling is for planners', async () => {
    const { id } = await pin(planner, 'Seen from here');
    const otherViewer = await createMember('viewer', { organisationId: integrator.organisationId });
    for (const as of [otherViewer, stranger]) {
      expect((await send(as, { xMm: 0, yMm: 0, body: 'Mine' })).status).toBe(404);
      expect((await reply(as, id, 'Mine')).status).toBe(404);
      expect((await callRoute(onRevision, { as, params: { revisionId } })).status).toBe(404);
      expect((await callRoute(onLayout, { as, params: { layoutId } })).status).toBe(404);
    }
    expect((await resolve(stranger, id, true)).status).toBe(404);
    expect((await resolve(viewer, id, true)).status).toBe(403);
    expect(await RemarkRow.count({ where: { layoutId } })).toBe(1);
    expect((await RemarkRow.findByPk(id, { rejectOnEmpty: true })).resolvedAt).toBeNull();
  });
});
