import { beforeAll, afterAll, describe, expect, it, vi } from 'vitest';
import { GET as getAccount } from '@/app/api/account/route';
import { POST as requestReset } from '@/app/api/account/password-reset/route';
import { POST as resetPassword } from '@/app/api/account/password-reset/[token]/route';
import { accountSchema } from '@/lib/contracts/accounts';
import { deliverMail } from '@/lib/server/mail';
import { checkCredentials } from '@/lib/server/session/check-credentials';
import { hashToken, randomToken } from '@/lib/server/tokens';
import { Organisation, PasswordReset } from '@/models';
import {
  callRoute,
  createMember,
  createUser,
  openMailbox,
  PASSWORD,
  queuedMails,
  someAddress,
  uniqueEmail,
} from '../factories';
import type { Mailbox } from '../factories';

let mailbox: Mailbox;
vi.mock('@/lib/server/env', async (original) => {
  const { env } = await original<typeof import('@/lib/server/env')>();
  return { env: Object.create(env, { SMTP_URL: { get: () => mailbox.url } }) as typeof env };
});

beforeAll(async () => {
  mailbox = await openMailbox();
});
afterAll(() => mailbox.close());

const NEW_PASSWORD = 'a better password';

/** Asks for a reset, lets the mail go out and returns the token of its link. */
async function resetLink(email: string): Promise<string> {
  await callRoute(requestReset, { method: 'POST', body: { email } });
  const [job] = (await queuedMails(email)).slice(-1);
  await deliverMail(job);
  const mail = mailbox.mails.findLast(({ to }) => to.includes(email));
  return /\/reset-password\/([\w-]{43})/.exec(mail?.source ?? '')?.[1] ?? 'none';
}

const reset = (token: string, password = NEW_PASSWORD) =>
  callRoute(resetPassword, { method: 'POST', params: { token }, body: { password } });

const canSignIn = async (email: string, password: string) =>
  (await checkCredentials({ email, password }, { 'x-forwarded-for': someAddress() })) !== null;

describe('GET /api/account', () => {
  it('says who I am and for whom I work', async () => {
    const member = await createMember('integrator');
    const organisation = await Organisation.findByPk(member.organisationId, { rejectOnEmpty: true });
    const account = accountSchema.parse(await (await callRoute(getAccount, { as: member })).json());
    expect(account).toEqual({
      id: member.user.id,
      name: member.user.name,
      email: member.user.email,
      role: 'integrator',
      organisation: { id: organisation.id, name: organisation.name },
    });
  });
});

describe('a forgotten password', () => {
  it('is replaced by the link of a mail, and all sessions from before are over', async () => {
    const member = await createMember('planner');
    const { email } = member.user;
    expect((await reset(await resetLink(email))).status).toBe(204);
    expect(await canSignIn(email, NEW_PASSWORD)).toBe(true);
    expect(await canSignIn(email, PASSWORD)).toBe(false);
    expect((await callRoute(getAccount, { as: member })).status).toBe(401);
  });

  it('takes each link once, and spends the others of the same person with it', async () => {
    const { user } = await createMember('planner');
    const [first, second] = [await resetLink(user.email), await resetLink(user.email)];
    expect(first).not.toBe(second);
    expect((await reset(second)).status).toBe(204);
    for (const token of [first, second]) {
      const response = await reset(token, 'an attacker’s choice');
      expect(response.status).toBe(404);
      expect(await response.json()).toMatchObject({ code: 'link_not_valid' });
    }
    expect(await canSignIn(user.email, NEW_PASSWORD)).toBe(true);
  });

  it('lets only one of two who use the link at the same moment through', async () => {
    const { user } = await createMember('planner');
    const token = await resetLink(user.email);
    const both = await Promise.all([reset(token), reset(token)]);
    expect(both.map((response) => response.status).sort()).toEqual([204, 404]);
  });

  it('refuses an expired link, a made-up one and a password that is too short', async () => {
    const { user } = await createMember('planner');
    const token = randomToken();
    const expiresAt = new Date(Date.now() - 1000);
    await PasswordReset.create({ userId: user.id, tokenHash: hashToken(token), expiresAt });
    expect((await reset(token)).status).toBe(404);
    expect((await reset(randomToken())).status).toBe(404);
    const good = await resetLink(user.email);
    expect((await reset(good, 'short')).status).toBe(422);
    expect((await reset(good)).status).toBe(204);
  });

  it('answers a stranger the same and sends them nothing', async () => {
    const outsider = await createUser();
    for (const email of [uniqueEmail(), outsider.email]) {
      const response = await callRoute(requestReset, { method: 'POST', body: { email } });
      expect(response.status).toBe(202);
      for (const job of await queuedMails(email)) await deliverMail(job);
      expect(mailbox.mails.filter(({ to }) => to.includes(email))).toEqual([]);
    }
  });

  it('keeps no token in the queue or the database', async () => {
    const { user } = await createMember('planner');
    const token = await resetLink(user.email);
    expect(JSON.stringify(await queuedMails(user.email))).not.toContain(token);
    const rows = await PasswordReset.findAll({ where: { userId: user.id } });
    expect(rows.map((row) => row.tokenHash)).toEqual([hashToken(token)]);
  });

  it('does not flood a mailbox, nor let one source try many', async () => {
    const { user } = await createMember('planner');
    for (let i = 0; i < 8; i += 1) {
      const response = await callRoute(requestReset, { method: 'POST', body: { email: user.email } });
      expect(response.status).toBe(202);
    }
    expect(await queuedMails(user.email)).toHaveLength(5);

    const headers = { 'x-forwarded-for': someAddress() };
    const statuses: number[] = [];
    for (let i = 0; i < 31; i += 1) {
      const body = { email: uniqueEmail() };
      statuses.push((await callRoute(requestReset, { method: 'POST', body, headers })).status);
    }
    expect(statuses.slice(0, 30).every((status) => status === 202)).toBe(true);
    expect(statuses[30]).toBe(429);
  });
});
