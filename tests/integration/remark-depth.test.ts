import { beforeEach, describe, expect, it } from 'vitest';
import sharp from 'sharp';
import { GET as projectRemarks } from '@/app/api/projects/[projectId]/remarks/route';
import { PATCH } from '@/app/api/remarks/[remarkId]/route';
import { POST as attach } from '@/app/api/remarks/[remarkId]/pictures/route';
import { GET as picture } from '@/app/api/remarks/[remarkId]/pictures/[pictureId]/route';
import { POST as read } from '@/app/api/remarks/[remarkId]/read/route';
import { POST as reply } from '@/app/api/remarks/[remarkId]/replies/route';
import { GET as list, POST as pin } from '@/app/api/revisions/[revisionId]/remarks/route';
import { POST as guestPin, GET as guestList } from '@/app/api/share/[token]/remarks/route';
import { POST as guestAttach } from '@/app/api/share/[token]/remarks/[remarkId]/pictures/route';
import { GET as guestPicture } from '@/app/api/share/[token]/remarks/[remarkId]/pictures/[pictureId]/route';
import { remarkListSchema, remarkSchema, type Remark } from '@/lib/contracts/remarks';
import {
  callRoute,
  createLayout,
  createMember,
  createProject,
  createRevision,
  createShareLink,
  queuedMails,
  uniqueEmail,
  type TestMember,
} from '@/tests/factories';

let planner: TestMember;
let viewer: TestMember;
let projectId: string;
let layoutId: string;
let revisionId: string;

beforeEach(async () => {
  planner = await createMember('planner');
  const { organisationId } = planner;
  projectId = (await createProject({ organisationId })).id;
  viewer = await createMember('viewer', { organisationId, projectIds: [projectId] });
  layoutId = (await createLayout({ projectId, createdBy: planner.user.id })).id;
  revisionId = (await createRevision({ layoutId })).id;
});

async function pinOne(body = 'Is there room?', mentions: string[] = [], as = viewer): Promise<Remark> {
  const request = { xMm: 10, yMm: 20, body, mentions };
  const response = await callRoute(pin, { as, method: 'POST', params: { revisionId }, body: request });
  expect(response.status).toBe(201);
  return remarkSchema.parse(await response.json());
}
async function listOf(id: string, as = planner): Promise<Remark[]> {
  const response = await callRoute(list, { as, params: { revisionId: id } });
  return remarkListSchema.parse(await response.json()).remarks;
}
const change = (remarkId: string, body: object, as = planner) =>
  callRoute(PATCH, { as, method: 'PATCH', params: { remarkId }, body });
const mailsOf = async (member: TestMember) => (await queuedMails(member.user.email)).map(({ template }) => template);

const form = (bytes: Uint8Array, name = 'bay.png') => {
  const data = new FormData();
  data.set('file', new File([new Uint8Array(bytes)], name));
  return data;
};
const png = (width = 80, height = 40) =>
  sharp({ create: { width, height, channels: 3, background: '#c33' } })
    .png()
    .toBuffer();

describe('naming somebody', () => {
  it('sends them one mail, and the mail of the remark not as well', async () => {
    const remark = await pinOne('@Pia is there room?', [planner.user.id]);
    expect(remark.mentions).toEqual([planner.user.name]);
    expect(await mailsOf(planner)).toEqual(['mention']);
  });

  it('is refused for somebody who cannot see the project', async () => {
    const stranger = await createMember('planner');
    const request = { xMm: 1, yMm: 2, body: 'Hello', mentions: [stranger.user.id] };
    const response = await callRoute(pin, { as: viewer, method: 'POST', params: { revisionId }, body: request });
    expect(response.status).toBe(422);
    expect(await listOf(revisionId)).toEqual([]);
    expect(await mailsOf(stranger)).toEqual([]);
  });
});

describe('giving a remark to somebody', () => {
  it('keeps who and until when, and tells them once', async () => {
    const { id } = await pinOne();
    const colleague = await createMember('planner', { organisationId: planner.organisationId });
    const given = await change(id, { assigneeId: colleague.user.id, dueOn: '2026-12-24' });
    expect(remarkSchema.parse(await given.json())).toMatchObject({
      assignee: { id: colleague.user.id, name: colleague.user.name },
      dueOn: '2026-12-24',
      resolvedAt: null,
    });
    await change(id, { assigneeId: colleague.user.id, dueOn: '2026-12-31' });
    expect(await mailsOf(colleague)).toEqual(['assignment']);
    const settled = await change(id, { resolved: true });
    expect(remarkSchema.parse(await settled.json())).toMatchObject({ dueOn: '2026-12-31' });
  });

  it('is for planners, and to planners', async () => {
    const { id } = await pinOne();
    expect((await change(id, { assigneeId: viewer.user.id })).status).toBe(422);
    expect((await change(id, { assigneeId: planner.user.id }, viewer)).status).toBe(403);
  });
});

describe('reading', () => {
  it('takes the mark away until somebody else answers', async () => {
    const { id } = await pinOne();
    const unread = async () => (await listOf(revisionId)).map((remark) => remark.unread);
    expect(await unread()).toEqual([true]);
    expect((await listOf(revisionId, viewer))[0].unread).toBe(false);
    expect((await callRoute(read, { as: planner, method: 'POST', params: { remarkId: id } })).status).toBe(204);
    expect(await unread()).toEqual([false]);
    await callRoute(reply, { as: planner, method: 'POST', params: { remarkId: id }, body: { body: 'Yes' } });
    expect(await unread()).toEqual([false]);
    expect((await listOf(revisionId, viewer))[0].unread).toBe(true);
  });
});

describe('the next revision', () => {
  it('has the remarks that were open when it was issued, under their numbers, and not the settled ones', async () => {
    const open = await pinOne('Open');
    const settled = await pinOne('Settled');
    await change(settled.id, { resolved: true });
    const next = await createRevision({ layoutId });
    const later = await pinOne('Written on the old one after the new one was issued');
    expect((await listOf(next.id)).map(({ id, number, revisionNumber }) => [id, number, revisionNumber])).toEqual([
      [open.id, 1, 1],
    ]);
    expect((await listOf(revisionId)).map(({ id }) => id)).toEqual([open.id, settled.id, later.id]);
    await change(open.id, { resolved: true });
    expect((await listOf(next.id))[0].resolvedAt).not.toBeNull();
  });

  it('shows them to the holder of its link, who can answer them, and shows nothing of another layout', async () => {
    const open = await pinOne('Open');
    const next = await createRevision({ layoutId });
    const { token } = await createShareLink({ revisionId: next.id });
    const other = await createShareLink({ revisionId: (await createRevision()).id });
    const seen = async (link: string) => {
      const response = await callRoute(guestList, { params: { token: link } });
      return remarkListSchema.parse(await response.json()).remarks.map(({ id }) => id);
    };
    expect(await seen(token)).toEqual([open.id]);
    expect(await seen(other.token)).toEqual([]);
  });
});

describe('the table of a project', () => {
  it('has the remarks of every variant, and is for those who see the project', async () => {
    const first = await pinOne('One');
    layoutId = (await createLayout({ projectId })).id;
    revisionId = (await createRevision({ layoutId })).id;
    const second = await pinOne('Two');
    const response = await callRoute(projectRemarks, { as: viewer, params: { projectId } });
    const { remarks } = remarkListSchema.parse(await response.json());
    expect(remarks.map(({ id }) => id).sort()).toEqual([first.id, second.id].sort());
    const stranger = await createMember('admin');
    expect((await callRoute(projectRemarks, { as: stranger, params: { projectId } })).status).toBe(404);
  });
});

describe('a picture', () => {
  const attachTo = (remarkId: string, bytes: Uint8Array, as = viewer) =>
    callRoute(attach, { as, method: 'POST', params: { remarkId }, body: form(bytes) });

  it('is made anew without metadata and read back by those who read the remark', async () => {
    const { id } = await pinOne();
    const photograph = await sharp(await png(3000, 1500))
      .jpeg()
      .withExif({ IFD0: { Copyright: 'whereabouts' }, IFD3: { GPSLatitude: '51/1 30/1 0/1' } })
      .toBuffer();
    const attached = remarkSchema.parse(await (await attachTo(id, photograph)).json());
    expect(attached.pictures).toMatchObject([{ widthPx: 2000, heightPx: 1000 }]);
    const pictureId = attached.pictures[0].id;
    const response = await callRoute(picture, { as: planner, params: { remarkId: id, pictureId } });
    expect(response.headers.get('x-content-type-options')).toBe('nosniff');
    const bytes = Buffer.from(await response.arrayBuffer());
    const head = await sharp(bytes).metadata();
    expect([head.format, head.width, head.exif]).toEqual(['webp', 2000, undefined]);
    const stranger = await createMember('admin');
    expect((await callRoute(picture, { as: stranger, params: { remarkId: id, pictureId } })).status).toBe(404);
  });

  it('is refused when it is none, damaged, of somebody else, or one too many', async () => {
    const { id } = await pinOne();
    expect((await attachTo(id, Buffer.from('<svg onload="alert(1)"/>'))).status).toBe(415);
    expect((await attachTo(id, (await png(300, 300)).subarray(0, 200))).status).toBe(422);
    expect((await attachTo(id, await png(), planner)).status).toBe(403);
    for (let count = 0; count < 4; count++) expect((await attachTo(id, await png())).status).toBe(201);
    expect((await attachTo(id, await png())).status).toBe(409);
  });

  it('comes from a guest by their browser’s mark only', async () => {
    const { token } = await createShareLink({ revisionId });
    const guest = { name: 'Vera Quill', email: uniqueEmail() };
    const body = { xMm: 1, yMm: 2, body: 'Look', guest };
    const pinned = await callRoute(guestPin, { method: 'POST', params: { token }, body });
    const cookie = (pinned.headers.get('set-cookie') ?? '').split(';')[0];
    const { id } = remarkSchema.parse(await pinned.json());
    const params = { token, remarkId: id };
    const bare = await callRoute(guestAttach, { method: 'POST', params, body: form(await png()) });
    expect(bare.status).toBe(403);
    const own = await callRoute(guestAttach, { method: 'POST', params, body: form(await png()), headers: { cookie } });
    expect(own.status).toBe(201);
    const pictureId = remarkSchema.parse(await own.json()).pictures[0].id;
    const shown = await callRoute(guestPicture, { params: { ...params, pictureId } });
    expect([shown.status, shown.headers.get('cache-control')]).toEqual([200, 'no-store']);
  });
});
