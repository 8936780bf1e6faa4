import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { POST as unsubscribe } from '@/app/api/unsubscribe/[token]/route';
import { inTransaction } from '@/lib/server/database';
import { deliverMail, sendMailLater, setMailChoice, unsubscribeToken } from '@/lib/server/mail';
import type { MailJob } from '@/lib/server/jobs';
import { nextDigest } from '@/lib/server/mail/digest';
import { callRoute, openMailbox, queuedMails, unique, uniqueEmail, type Mailbox } from '../factories';

let mailbox: Mailbox;
vi.mock('@/lib/server/env', async (original) => {
  const { env } = await original<typeof import('@/lib/server/env')>();
  return { env: Object.create(env, { SMTP_URL: { get: () => mailbox.url } }) as typeof env };
});
beforeAll(async () => {
  mailbox = await openMailbox();
});
afterAll(() => mailbox.close());

const remark = (remarkNumber: number) => ({
  projectName: 'Pump housing line, bay 4',
  layoutTitle: 'A · In line',
  revisionNumber: 1,
  remarkNumber,
  authorName: 'Vera Quill',
  body: `Remark ${remarkNumber}`,
  path: '/projects',
});
const queue = (to: string, number: number) =>
  inTransaction((transaction) => sendMailLater({ to, template: 'remark', data: remark(number) }, transaction));
const received = (to: string) => mailbox.mails.filter((mail) => mail.to.includes(to));
/** What the queue does with a job: again until it goes through. True once it has. */
const attempt = (job: MailJob): Promise<boolean> =>
  deliverMail(job).then(
    () => true,
    () => false,
  );

describe('a hundred mails while the host is down for a while', () => {
  it('all arrive, none twice, though every job is tried again and again and some are run twice at the end', async () => {
    const to = uniqueEmail();
    for (let number = 1; number <= 100; number++) await queue(to, number);
    const jobs = await queuedMails(to);
    expect(jobs).toHaveLength(100);
    const delivered = new Set<string>();
    const round = async () => {
      for (const job of jobs) if (!delivered.has(job.id) && (await attempt(job))) delivered.add(job.id);
    };
    mailbox.refusing = true;
    await round();
    expect(delivered.size).toBe(0);
    mailbox.refusing = false;
    // It comes up, goes down in the middle of the round, and comes up again.
    for (const job of jobs.slice(0, 37)) if (await attempt(job)) delivered.add(job.id);
    mailbox.refusing = true;
    await round();
    expect(delivered.size).toBe(37);
    mailbox.refusing = false;
    await round();
    // A worker that was killed after its mail went out has its job given to another one.
    for (const job of jobs) await deliverMail(job);
    const numbers = received(to).map(({ source }) => Number(/Subject: Remark (\d+)/.exec(source)?.[1]));
    expect(numbers.toSorted((a, b) => a - b)).toEqual(Array.from({ length: 100 }, (_, index) => index + 1));
  }, 180_000);
});

describe('the choice of mails', () => {
  it('none: nothing is queued, but what somebody asked for themselves', async () => {
    const to = uniqueEmail();
    await setMailChoice(to, 'none');
    await queue(to, 1);
    await inTransaction((transaction) => sendMailLater({ to, template: 'password-reset', data: {} }, transaction));
    expect((await queuedMails(to)).map(({ template }) => template)).toEqual(['password-reset']);
  });

  it('daily: one mail with all of it, once, whatever is tried again', async () => {
    const to = uniqueEmail();
    await setMailChoice(to, 'daily');
    for (const number of [1, 2, 3]) await queue(to, number);
    const jobs = await queuedMails(to);
    expect(new Set(jobs.map(({ id, template }) => `${id} ${template}`)).size).toBe(1);
    mailbox.refusing = true;
    expect(await attempt(jobs[0])).toBe(false);
    mailbox.refusing = false;
    await queue(to, 4);
    for (const job of jobs) await deliverMail(job);
    const [mail, ...more] = received(to);
    expect(more).toEqual([]);
    expect(mail.source).toContain('things happened on Elbowroom');
    for (const number of [1, 2, 3]) expect(mail.source).toContain(`Remark ${number} by Vera Quill`);
  });

  it('daily goes out at the next five o’clock UTC', () => {
    expect(nextDigest(new Date('2026-12-01T04:59:59Z')).toISOString()).toBe('2026-12-01T05:00:00.000Z');
    expect(nextDigest(new Date('2026-12-01T05:00:00Z')).toISOString()).toBe('2026-12-02T05:00:00.000Z');
    expect(nextDigest(new Date('2026-12-31T23:00:00Z')).toISOString()).toBe('2027-01-01T05:00:00.000Z');
  });

  it('can be made by one press in the mail program, which sends no origin', async () => {
    const to = uniqueEmail();
    await queue(to, 1);
    const [job] = await queuedMails(to);
    await deliverMail(job);
    const { source } = received(to)[0];
    expect(source).toMatch(/List-Unsubscribe-Post: List-Unsubscribe=One-Click/);
    const token = unsubscribeToken(to);
    expect(source.replace(/\r\n\s+/g, ' ')).toContain(`/api/unsubscribe/${token}>`);
    const press = (value: string) =>
      callRoute(unsubscribe, { method: 'POST', params: { token: value }, headers: { 'sec-fetch-site': null } });
    const forged = `${token.slice(0, 43)}${Buffer.from(unique('a') + '@example.com').toString('base64url')}`;
    expect((await press(forged)).status).toBe(404);
    expect((await press(token)).status).toBe(200);
    await queue(to, 2);
    expect(await queuedMails(to)).toHaveLength(1);
  });
});
