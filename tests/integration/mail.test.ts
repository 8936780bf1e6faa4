import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { inTransaction } from '@/lib/server/database';
import { deliverMail, sendMailLater } from '@/lib/server/mail';
import type { TemplateData } from '@/lib/server/mail';
import { planningRecipients } from '@/lib/server/members/planning-recipients';
import {
  createLayout,
  createMember,
  createProject,
  createRevision,
  openMailbox,
  queuedMails,
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

const remark: TemplateData<'remark'> = {
  projectName: 'Pump housing line, bay 4',
  layoutTitle: 'A · In line',
  revisionNumber: 2,
  remarkNumber: 7,
  authorName: 'Vera <script>alert(1)</script>',
  body: 'Does the door open?\nIt is 900 mm & heavy.',
  path: '/revisions/7d4f3b3e-3b0a-4c0c-9f55-0d7b4c6d8f10',
};

async function queue(to: string, data = remark) {
  await inTransaction((transaction) => sendMailLater({ to, template: 'remark', data }, transaction));
  return (await queuedMails(to)).slice(-1)[0];
}

const received = (to: string) => mailbox.mails.filter((mail) => mail.to.includes(to));

describe('a mail', () => {
  it('is queued with the transaction it belongs to, or not at all', async () => {
    const to = uniqueEmail();
    const failing = inTransaction(async (transaction) => {
      await sendMailLater({ to, template: 'remark', data: remark }, transaction);
      throw new Error('changed our mind');
    });
    await expect(failing).rejects.toThrow('changed our mind');
    expect(await queuedMails(to)).toEqual([]);
    expect(await queue(to)).toMatchObject({ to, template: 'remark' });
  });

  it('says what was remarked and where, as text and as HTML, with nothing of it run', async () => {
    const to = uniqueEmail();
    await deliverMail(await queue(to));
    const [{ source }] = received(to);
    expect(source).toContain('> Does the door open?\r\n> It is 900 mm & heavy.');
    expect(source).toContain('layout A · In line, revision 2');
    expect(source).toMatch(/http\S+\/revisions\/7d4f3b3e/);
    expect(source).toContain('Vera &lt;script&gt;');
    expect(source).toContain('Does the door open?<br>It is 900 mm &amp; heavy.');
    const html = source.slice(source.indexOf('<!doctype html>'));
    expect(html).not.toContain('<script>');
  });

  it('cannot be given headers by what somebody typed', async () => {
    const to = uniqueEmail();
    await deliverMail(await queue(to, { ...remark, projectName: 'Bay\r\nBcc: everybody@example.com' }));
    const [{ source }] = received(to);
    const head = source.slice(0, source.indexOf('\r\n\r\n'));
    expect(head).not.toMatch(/^Bcc:/im);
    expect(mailbox.mails.filter((mail) => mail.to.includes('everybody@example.com'))).toEqual([]);
  });

  it('is sent once, however often its job runs', async () => {
    const to = uniqueEmail();
    const job = await queue(to);
    await deliverMail(job);
    await deliverMail(job);
    expect(received(to)).toHaveLength(1);
  });

  it('is tried again when the mail server turned it away', async () => {
    const to = uniqueEmail();
    const job = await queue(to);
    mailbox.refusing = true;
    await expect(deliverMail(job)).rejects.toThrow();
    mailbox.refusing = false;
    await deliverMail(job);
    expect(received(to)).toHaveLength(1);
  });
});

describe('who is told of a remark', () => {
  const told = (revisionId: string) => inTransaction((transaction) => planningRecipients(revisionId, transaction));

  it('are those who planned the layout and issued the revision', async () => {
    const planner = await createMember('planner', { name: 'Pia' });
    const { organisationId } = planner;
    const integrator = await createMember('integrator', { organisationId });
    await createMember('admin', { organisationId });
    const projectId = (await createProject({ organisationId })).id;
    const layoutId = (await createLayout({ projectId, createdBy: planner.user.id })).id;
    const revision = await createRevision({ layoutId, issuedBy: integrator.user.id });
    const names = (await told(revision.id)).map((recipient) => recipient.email);
    expect(names.sort()).toEqual([planner.user.email, integrator.user.email].sort());
  });

  it('are the admins when nobody of those is left', async () => {
    const gone = await createMember('planner');
    const { organisationId } = gone;
    const admin = await createMember('admin', { organisationId });
    const projectId = (await createProject({ organisationId })).id;
    const layoutId = (await createLayout({ projectId, createdBy: gone.user.id })).id;
    const revision = await createRevision({ layoutId, issuedBy: gone.user.id });
    await gone.membership.destroy();
    expect((await told(revision.id)).map((recipient) => recipient.userId)).toEqual([admin.user.id]);
  });
});
