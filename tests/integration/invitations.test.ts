import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { GET as list, POST as invite } from '@/app/api/invitations/route';
import { DELETE as revoke } from '@/app/api/invitations/[invitationId]/route';
import { GET as preview, POST as accept } from '@/app/api/invitations/accept/[token]/route';
import { invitationPreviewSchema, invitationSchema, invitationsSchema } from '@/lib/contracts/accounts';
import { deliverMail } from '@/lib/server/mail';
import { checkCredentials } from '@/lib/server/session/check-credentials';
import { hashToken } from '@/lib/server/tokens';
import { Invitation, Membership, Organisation, ProjectViewer, User } from '@/models';
import {
  callRoute,
  createMember,
  createProject,
  openMailbox,
  queuedMails,
  someAddress,
  uniqueEmail,
} from '../factories';
import type { Mailbox, TestMember } from '../factories';

let mailbox: Mailbox;
vi.mock('@/lib/server/env', async (original) => {
  const { env } = await original<typeof import('@/lib/server/env')>();
  return { env: Object.create(env, { SMTP_URL: { get: () => mailbox.url } }) as typeof env };
});

beforeAll(async () => {
  mailbox = await openMailbox();
});
afterAll(() => mailbox.close());

const newcomer = { name: 'Nia Newcomer', password: 'a fine long password' };
const acceptWith = (token: string, body: object = newcomer) =>
  callRoute(accept, { method: 'POST', params: { token }, body });

async function sendInvitation(admin: TestMember, body: { email: string; role: string; projectIds?: string[] }) {
  const response = await callRoute(invite, { as: admin, method: 'POST', body });
  expect(response.status).toBe(201);
  const invitation = invitationSchema.parse(await response.json());
  const [job] = (await queuedMails(body.email)).slice(-1);
  await deliverMail(job);
  const mail = mailbox.mails.findLast(({ to }) => to.includes(body.email));
  const token = /\/invitation\/([\w-]{43})/.exec(mail?.source ?? '')?.[1] ?? 'none';
  return { invitation, token, mail, job };
}

describe('an invitation', () => {
  it('lets the person who gets the mail in, once', async () => {
    const admin = await createMember('admin');
    const email = uniqueEmail();
    const { token, mail } = await sendInvitation(admin, { email, role: 'planner' });
    expect(mail?.source).toContain(`Subject: ${admin.user.name} invites you`);

    const seen = invitationPreviewSchema.parse(await (await callRoute(preview, { params: { token } })).json());
    const organisation = await Organisation.findByPk(admin.organisationId, { rejectOnEmpty: true });
    expect(seen).toEqual({ email, role: 'planner', organisationName: organisation.name });

    expect((await acceptWith(token)).status).toBe(204);
    const user = await User.findOne({ where: { email }, rejectOnEmpty: true });
    const membership = await Membership.findOne({ where: { userId: user.id }, rejectOnEmpty: true });
    expect(membership).toMatchObject({ organisationId: admin.organisationId, role: 'planner' });
    const credentials = { email, password: newcomer.password };
    expect(await checkCredentials(credentials, { 'x-forwarded-for': someAddress() })).not.toBeNull();

    expect((await acceptWith(token)).status).toBe(404);
    expect((await callRoute(preview, { params: { token } })).status).toBe(404);
  });

  it('limits a viewer to the projects it names', async () => {
    const admin = await createMember('admin');
    const { organisationId } = admin;
    const [named] = [await createProject({ organisationId }), await createProject({ organisationId })];
    const email = uniqueEmail();
    const { token } = await sendInvitation(admin, { email, role: 'viewer', projectIds: [named.id] });
    await acceptWith(token);
    const user = await User.findOne({ where: { email }, rejectOnEmpty: true });
    const membership = await Membership.findOne({ where: { userId: user.id }, rejectOnEmpty: true });
    const viewers = await ProjectViewer.findAll({ where: { membershipId: membership.id } });
    expect(viewers.map((viewer) => viewer.projectId)).toEqual([named.id]);
  });

  it('can be withdrawn, which kills its link', async () => {
    const admin = await createMember('admin');
    const { invitation, token } = await sendInvitation(admin, { email: uniqueEmail(), role: 'planner' });
    const params = { invitationId: invitation.id };
    expect((await callRoute(revoke, { as: await createMember('admin'), method: 'DELETE', params })).status).toBe(404);
    expect((await callRoute(revoke, { as: admin, method: 'DELETE', params })).status).toBe(204);
    expect((await callRoute(revoke, { as: admin, method: 'DELETE', params })).status).toBe(404);
    expect((await acceptWith(token)).status).toBe(404);
    const { invitations } = invitationsSchema.parse(await (await callRoute(list, { as: admin })).json());
    expect(invitations).toEqual([]);
  });

  it('sent again replaces the one before', async () => {
    const admin = await createMember('admin');
    const email = uniqueEmail();
    const first = await sendInvitation(admin, { email, role: 'planner' });
    const second = await sendInvitation(admin, { email, role: 'integrator' });
    expect((await acceptWith(first.token)).status).toBe(404);
    const { invitations } = invitationsSchema.parse(await (await callRoute(list, { as: admin })).json());
    expect(invitations.map(({ id, role }) => ({ id, role }))).toEqual([
      { id: second.invitation.id, role: 'integrator' },
    ]);
    expect((await acceptWith(second.token)).status).toBe(204);
  });

  it('expires', async () => {
    const admin = await createMember('admin');
    const { invitation, token } = await sendInvitation(admin, { email: uniqueEmail(), role: 'planner' });
    await Invitation.update({ expiresAt: new Date(Date.now() - 1000) }, { where: { id: invitation.id } });
    expect((await acceptWith(token)).status).toBe(404);
  });

  it('is refused for a member, and for projects that do not fit', async () => {
    const admin = await createMember('admin');
    const ask = (body: object) => callRoute(invite, { as: admin, method: 'POST', body });
    const member = await ask({ email: admin.user.email, role: 'planner' });
    expect(await member.json()).toMatchObject({ status: 409, code: 'already_member' });
    const own = await createProject({ organisationId: admin.organisationId });
    const foreign = await createProject();
    const email = uniqueEmail();
    expect((await ask({ email, role: 'planner', projectIds: [own.id] })).status).toBe(422);
    expect((await ask({ email, role: 'viewer', projectIds: [foreign.id] })).status).toBe(422);
    expect(await queuedMails(email)).toEqual([]);
  });

  it('does not tell an admin that the person belongs to another organisation; only the link does', async () => {
    const elsewhere = await createMember('planner');
    const admin = await createMember('admin');
    const { token } = await sendInvitation(admin, { email: elsewhere.user.email, role: 'planner' });
    const response = await acceptWith(token);
    expect(await response.json()).toMatchObject({ status: 409, code: 'already_member' });
    expect((await elsewhere.membership.reload()).organisationId).toBe(elsewhere.organisationId);
  });

  it('brings back somebody who was removed, without the sessions they had', async () => {
    const admin = await createMember('admin');
    const former = await createMember('planner', { organisationId: admin.organisationId });
    await former.membership.destroy();
    const { token } = await sendInvitation(admin, { email: former.user.email, role: 'viewer' });
    expect((await acceptWith(token)).status).toBe(204);
    expect(await former.user.reload()).toMatchObject({ name: newcomer.name, sessionGeneration: 2 });
  });

  it('is kept as a hash only', async () => {
    const admin = await createMember('admin');
    const { invitation, token, job } = await sendInvitation(admin, { email: uniqueEmail(), role: 'planner' });
    const row = await Invitation.findByPk(invitation.id, { rejectOnEmpty: true });
    expect(row.tokenHash).toBe(hashToken(token));
    expect(JSON.stringify([row, job])).not.toContain(token);
  });
});
