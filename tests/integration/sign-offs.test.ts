import { randomUUID } from 'node:crypto';
import { beforeEach, describe, expect, it } from 'vitest';
import { POST as postOperations } from '@/app/api/layouts/[layoutId]/operations/route';
import { POST as issue } from '@/app/api/layouts/[layoutId]/revisions/route';
import { GET as readRevision } from '@/app/api/revisions/[revisionId]/route';
import { POST as sign } from '@/app/api/revisions/[revisionId]/sign-offs/route';
import { POST as guestSign } from '@/app/api/share/[token]/sign-offs/route';
import { problemSchema } from '@/lib/contracts/common';
import { revisionSchema, type Revision } from '@/lib/contracts/revisions';
import { signOffStateSchema } from '@/lib/contracts/sign-offs';
import { checkSignOffs } from '@/lib/server/sign-offs/check-sign-offs';
import { Revision as RevisionRow, SignOff } from '@/models';
import {
  callRoute,
  createArm,
  createLayout,
  createMember,
  createProject,
  createShareLink,
  queuedMails,
  robotItem,
  uniqueEmail,
  type TestMember,
} from '@/tests/factories';

let integrator: TestMember;
let viewer: TestMember;
let layoutId: string;
let robot: ReturnType<typeof robotItem>;

async function issueOne(): Promise<Revision> {
  const response = await callRoute(issue, {
    as: integrator,
    method: 'POST',
    params: { layoutId },
    body: { note: 'Look' },
  });
  expect(response.status).toBe(201);
  return revisionSchema.parse(await response.json());
}

beforeEach(async () => {
  integrator = await createMember('integrator');
  const { organisationId } = integrator;
  const projectId = (await createProject({ organisationId })).id;
  viewer = await createMember('viewer', { organisationId, projectIds: [projectId] });
  robot = robotItem((await createArm({ organisationId })).id);
  layoutId = (await createLayout({ projectId, items: [robot], createdBy: integrator.user.id })).id;
});

type Decision = 'accepted' | 'changes_requested';
const say = (as: TestMember, { id, sha256 }: { id: string; sha256: string }, decision: Decision, note = '') =>
  callRoute(sign, { as, method: 'POST', params: { revisionId: id }, body: { decision, sha256, note } });
const guestSays = (token: string, sha256: string, decision: Decision, email = uniqueEmail()) =>
  callRoute(guestSign, {
    method: 'POST',
    params: { token },
    body: { decision, sha256, guest: { name: 'Vera Quill', email } },
  });
const stateOf = async (id: string) => (await RevisionRow.findByPk(id, { rejectOnEmpty: true })).state;
const codeOf = async (response: Response) => problemSchema.parse(await response.json()).code;

describe('a sign-off', () => {
  it('keeps who said what, when and to which content, and sets the state', async () => {
    const revision = await issueOne();
    const from = Date.now();
    const response = await say(viewer, revision, 'accepted', 'Go ahead');
    const to = Date.now();
    expect(response.status).toBe(201);
    const { state, signOffs } = signOffStateSchema.parse(await response.json());
    expect(state).toBe('accepted');
    expect(signOffs).toMatchObject([
      {
        decision: 'accepted',
        note: 'Go ahead',
        sha256: revision.sha256,
        name: viewer.user.name,
        email: viewer.user.email,
      },
    ]);
    // Signed while it was being said, by the server's own clock.
    const signedAt = Date.parse(signOffs[0].signedAt);
    expect(signedAt >= from && signedAt <= to).toBe(true);
  });

  it('stays as it was when the sheet is edited, and the revision still has its hash', async () => {
    const revision = await issueOne();
    await say(viewer, revision, 'accepted');
    const before = await SignOff.findAll({ where: { revisionId: revision.id }, raw: true });
    const operation = { type: 'put', baseVersion: 1, item: { ...robot, xMm: 777 } };
    const edited = await callRoute(postOperations, {
      as: integrator,
      method: 'POST',
      params: { layoutId },
      body: { id: randomUUID(), operations: [operation] },
    });
    expect(edited.status).toBe(200);
    await issueOne();
    expect(await SignOff.findAll({ where: { revisionId: revision.id }, raw: true })).toEqual(before);
    const read = await callRoute(readRevision, { as: viewer, params: { revisionId: revision.id } });
    const after = revisionSchema.parse(await read.json());
    expect(after.sha256).toBe(revision.sha256);
    expect(after.snapshot).toEqual(revision.snapshot);
    expect((await checkSignOffs(revision.id)).map(({ holds }) => holds)).toEqual([true]);
  });

  it('is refused any change or removal by the database itself', async () => {
    const revision = await issueOne();
    await say(viewer, revision, 'changes_requested');
    const where = { revisionId: revision.id };
    await expect(SignOff.update({ decision: 'accepted' }, { where })).rejects.toThrow(/never changes/);
    await expect(SignOff.destroy({ where })).rejects.toThrow(/never changes/);
    const forged = {
      ...where,
      sha256: '0'.repeat(64),
      decision: 'accepted' as const,
      userId: viewer.user.id,
      signerName: 'V',
      signerEmail: 'v@example.com',
    };
    await expect(SignOff.create(forged)).rejects.toThrow(/foreign key/);
  });

  it('is refused for other content than was seen, and for a superseded revision', async () => {
    const revision = await issueOne();
    const other = await say(viewer, { id: revision.id, sha256: 'a'.repeat(64) }, 'accepted');
    expect([other.status, await codeOf(other)]).toEqual([409, 'other_content']);
    await issueOne();
    const late = await say(viewer, revision, 'accepted');
    expect([late.status, await codeOf(late)]).toEqual([409, 'superseded']);
    expect(await SignOff.count({ where: { revisionId: revision.id } })).toBe(0);
  });

  it('is not for those who drew it', async () => {
    const revision = await issueOne();
    expect((await say(integrator, revision, 'accepted')).status).toBe(403);
    expect(await stateOf(revision.id)).toBe('issued');
  });

  it('leaves one accepted revision a layout: a newer one supersedes it', async () => {
    const first = await issueOne();
    await say(viewer, first, 'accepted');
    const second = await issueOne();
    expect(await stateOf(first.id)).toBe('accepted');
    await say(viewer, second, 'changes_requested');
    const third = await issueOne();
    expect(await stateOf(second.id)).toBe('superseded');
    await say(viewer, third, 'accepted');
    expect([await stateOf(first.id), await stateOf(third.id)]).toEqual(['superseded', 'accepted']);
  });
});

describe('a guest', () => {
  it('signs by a link that may, with name and address, and learns nobody’s address', async () => {
    const revision = await issueOne();
    const { token } = await createShareLink({ revisionId: revision.id, maySign: true });
    const email = uniqueEmail();
    const response = await guestSays(token, revision.sha256, 'changes_requested', email);
    expect(response.status).toBe(201);
    expect(response.headers.get('cache-control')).toBe('no-store');
    const { state, signOffs } = signOffStateSchema.parse(await response.json());
    expect(state).toBe('changes_requested');
    expect(signOffs).toMatchObject([{ name: 'Vera Quill', email: null }]);
    const [row] = await SignOff.findAll({ where: { revisionId: revision.id } });
    expect(row).toMatchObject({ signerEmail: email, userId: null });
  });

  it('cannot sign by a link for remarks only', async () => {
    const revision = await issueOne();
    const { token } = await createShareLink({ revisionId: revision.id });
    expect((await guestSays(token, revision.sha256, 'accepted')).status).toBe(403);
  });
});

describe('who is told', () => {
  const templates = async (email: string) => (await queuedMails(email)).map(({ template }) => template);

  it('of an issue: the viewers of the project, and not the issuer', async () => {
    await issueOne();
    expect(await templates(viewer.user.email)).toEqual(['issue']);
    expect(await templates(integrator.user.email)).toEqual([]);
  });

  it('of a sign-off: those who issued it and the other reviewers; the signer gets a receipt with the hash', async () => {
    const revision = await issueOne();
    const { token } = await createShareLink({ revisionId: revision.id, maySign: true });
    const email = uniqueEmail();
    await guestSays(token, revision.sha256, 'accepted', email);
    expect(await templates(integrator.user.email)).toEqual(['sign-off']);
    expect(await templates(viewer.user.email)).toEqual(['issue', 'sign-off']);
    expect(await queuedMails(email)).toMatchObject([
      { template: 'sign-off-receipt', data: { sha256: revision.sha256, path: null } },
    ]);
    await issueOne();
    expect(await templates(email)).toEqual(['sign-off-receipt', 'issue']);
  });
});
