import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { POST as answerRemark } from '@/app/api/remarks/[remarkId]/replies/route';
import { GET, POST } from '@/app/api/share/[token]/remarks/route';
import { POST as postReply } from '@/app/api/share/[token]/remarks/[remarkId]/replies/route';
import { problemSchema } from '@/lib/contracts/common';
import { remarkListSchema, remarkSchema, type Remark } from '@/lib/contracts/remarks';
import { Remark as RemarkRow } from '@/models';
import {
  callRoute,
  createLayout,
  createMember,
  createProject,
  createRemark,
  createRevision,
  createShareLink,
  queuedMails,
  uniqueEmail,
  type TestMember,
} from '@/tests/factories';

let planner: TestMember;
let projectId: string;
let layoutId: string;
let revisionId: string;
let token: string;

beforeAll(async () => {
  planner = await createMember('planner');
  projectId = (await createProject({ organisationId: planner.organisationId })).id;
});
beforeEach(async () => {
  layoutId = (await createLayout({ projectId, createdBy: planner.user.id })).id;
  revisionId = (await createRevision({ layoutId })).id;
  token = (await createShareLink({ revisionId })).token;
});

interface Guest {
  name: string;
  email: string;
}
const guest = (): Guest => ({ name: 'Ines Rohr', email: uniqueEmail() });

const pin = (by: Guest, body: string, link = token) =>
  callRoute(POST, { method: 'POST', params: { token: link }, body: { xMm: 10, yMm: 20, body, guest: by } });

const reply = (by: Guest, remarkId: string, body: string, link = token) =>
  callRoute(postReply, { method: 'POST', params: { token: link, remarkId }, body: { body, guest: by } });

async function seenWith(cookie: string | null): Promise<Remark[]> {
  const response = await callRoute(GET, { params: { token }, headers: { cookie } });
  return remarkListSchema.parse(await response.json()).remarks;
}

const cookieOf = (response: Response): string => (response.headers.get('set-cookie') ?? '').split(';')[0];

describe('a guest', () => {
  it('pins a remark under their name, and the planner is told', async () => {
    const by = guest();
    const response = await pin(by, 'Is there room for our cart?');
    expect(response.status).toBe(201);
    const remark = remarkSchema.parse(await response.json());
    expect(remark).toMatchObject({ number: 1, revisionId, author: { name: by.name, side: 'customer', you: true } });
    expect((await queuedMails(planner.user.email)).at(-1)).toMatchObject({
      template: 'remark',
      data: { authorName: by.name, body: 'Is there room for our cart?' },
    });
  });

  it('gets the answer by e-mail, without a link that cannot be rebuilt', async () => {
    const by = guest();
    const { id } = remarkSchema.parse(await (await pin(by, 'Is there room?')).json());
    await callRoute(answerRemark, {
      as: planner,
      method: 'POST',
      params: { remarkId: id },
      body: { body: 'There is.' },
    });
    const mails = await queuedMails(by.email);
    expect(mails).toHaveLength(1);
    expect(mails[0]).toMatchObject({ template: 'reply', data: { body: 'There is.', path: null } });
    expect(JSON.stringify(mails)).not.toContain(token);
  });

  it('answers, and sees what others wrote on the same revision without their addresses', async () => {
    const [first, second] = [guest(), guest()];
    const { id } = remarkSchema.parse(await (await pin(first, 'First')).json());
    const answered = await reply(second, id, 'I agree.');
    expect(answered.status).toBe(201);
    const text = await answered.text();
    expect(remarkSchema.parse(JSON.parse(text)).replies).toMatchObject([{ body: 'I agree.', author: { you: true } }]);
    expect(text).not.toContain(first.email);
    expect(text).not.toContain(second.email);
  });

  it('knows their own remarks again in their own browser only', async () => {
    const mine = await pin(guest(), 'Mine');
    const theirs = await pin(guest(), 'Theirs');
    const yours = async (cookie: string | null) =>
      (await seenWith(cookie)).map(({ body, author }) => [body, author.you]);
    expect(await yours(cookieOf(mine))).toEqual([
      ['Mine', true],
      ['Theirs', false],
    ]);
    expect(await yours(cookieOf(theirs))).toEqual([
      ['Mine', false],
      ['Theirs', true],
    ]);
    expect(await yours(null)).toEqual([
      ['Mine', false],
      ['Theirs', false],
    ]);
    expect(await yours('elbowroom-guest=undefined')).toEqual([
      ['Mine', false],
      ['Theirs', false],
    ]);
    expect(mine.headers.get('set-cookie')).toMatch(/; Path=\/api\/share; .*HttpOnly; SameSite=Strict/);
  });

  it('must say who they are', async () => {
    const body = { xMm: 10, yMm: 20, body: 'Hello' };
    const response = await callRoute(POST, { method: 'POST', params: { token }, body });
    expect(response.status).toBe(422);
    const wrong = await pin({ name: ' ', email: 'nobody' }, 'Hello');
    const { errors } = problemSchema.parse(await wrong.json());
    expect(errors?.map(({ path }) => path)).toEqual(['guest.name', 'guest.email']);
    expect(await RemarkRow.count({ where: { layoutId } })).toBe(0);
  });
});

describe('a guest is kept to the shared revision', () => {
  it('remarks on others are neither shown nor answered', async () => {
    const other = await createRevision({ layoutId });
    const elsewhere = await createRemark({ revisionId: other.id });
    await pin(guest(), 'Here');
    expect((await seenWith(null)).map(({ body }) => body)).toEqual(['Here']);
    expect((await reply(guest(), elsewhere.id, 'Hello')).status).toBe(404);
  });

  it('and to reading, where the link is for reading only', async () => {
    const readOnly = await createShareLink({ revisionId, mayRemark: false });
    const existing = await createRemark({ revisionId });
    expect((await pin(guest(), 'Hello', readOnly.token)).status).toBe(403);
    expect((await reply(guest(), existing.id, 'Hello', readOnly.token)).status).toBe(403);
    const response = await callRoute(GET, { params: { token: readOnly.token } });
    expect(remarkListSchema.parse(await response.json()).remarks).toHaveLength(1);
  });

  it('and to a pace that people write at', async () => {
    const by = guest();
    const statuses: number[] = [];
    for (let count = 0; count < 31; count += 1) statuses.push((await pin(by, `Remark ${count}`)).status);
    expect(statuses.slice(0, 30).every((status) => status === 201)).toBe(true);
    expect(statuses[30]).toBe(429);
    expect(await RemarkRow.count({ where: { layoutId } })).toBe(30);
    const other = await createShareLink({ revisionId });
    expect((await pin(by, 'By another link', other.token)).status).toBe(201);
  });

  it('and to pages of ours', async () => {
    const response = await callRoute(POST, {
      method: 'POST',
      params: { token },
      body: { xMm: 10, yMm: 20, body: 'Hello', guest: guest() },
      headers: { 'sec-fetch-site': 'cross-site' },
    });
    expect(response.status).toBe(403);
  });
});
