import { createHash, randomBytes, randomUUID } from 'node:crypto';
import { readFileSync } from 'node:fs';
import nodemailer from 'nodemailer';
import { QueryTypes } from 'sequelize';
import { afterAll, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { sequelize } from '@/lib/server/database';
import { env } from '@/lib/server/env';
import { deleteObjects, getObject, putObject } from '@/lib/server/object-store';

const digest = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');

describe('the object store', () => {
  const stored: string[] = [];
  afterAll(() => deleteObjects(stored));

  async function keep(body: Uint8Array, contentType: string) {
    const key = `tests/${randomUUID()}`;
    stored.push(key);
    await putObject(key, body, contentType);
    return key;
  }

  it('gives back the very bytes of a picture, without the framing of a streamed upload', async () => {
    const picture = readFileSync('tests/fixtures/floor-plans/plan-scan.jpg');
    const answer = await getObject(await keep(picture, 'image/jpeg'));
    expect(answer?.contentType).toBe('image/jpeg');
    expect(digest(answer!.body)).toBe(digest(picture));
  });

  it('takes nothing, one byte and more than a chunk of the wire', async () => {
    for (const length of [0, 1, 65_536 + 1, 5_000_000]) {
      const body = randomBytes(length);
      const answer = await getObject(await keep(body, 'application/octet-stream'));
      expect(answer?.body.byteLength).toBe(length);
      expect(digest(answer!.body)).toBe(digest(body));
    }
  });

  it('writes over what was there, and forgets what is deleted', async () => {
    const key = await keep(Buffer.from('first'), 'text/plain');
    await putObject(key, Buffer.from('second'), 'text/plain');
    expect(Buffer.from((await getObject(key))!.body).toString()).toBe('second');
    await deleteObjects([key, `tests/${randomUUID()}`]);
    expect(await getObject(key)).toBeNull();
  });
});

const keptMailSchema = z.object({
  name: z.string(),
  to: z.string(),
  from: z.string(),
  subject: z.string(),
  date: z.string(),
  text: z.string(),
});

describe('the mail server', () => {
  const mailbox = z.url().parse(process.env.MAILBOX_URL);

  async function send(mail: { subject: string; text: string }) {
    const to = `${randomUUID()}@quillfen.example`;
    const transport = nodemailer.createTransport(env.SMTP_URL);
    await transport.sendMail({ from: env.MAIL_FROM, to, html: '<p>As HTML</p>', ...mail });
    const answer = await fetch(`${mailbox}/mails`);
    const kept = z.array(keptMailSchema).parse(await answer.json());
    return { to, found: kept.filter((candidate) => candidate.to === to) };
  }

  it('keeps a mail and shows it as JSON: letters beyond ASCII, long lines and links whole', async () => {
    const link = `https://elbowroom.example/share/${randomBytes(60).toString('hex')}`;
    const mail = { subject: 'Kühlpumpe, Zelle “4” – Prüfung', text: `Größe: 1 m²\n\n${link}\n` };
    const { to, found } = await send(mail);
    expect(found).toHaveLength(1);
    expect(found[0]).toMatchObject({ to, from: 'elbowroom@brackwater.example', subject: mail.subject });
    expect(found[0].text.trim()).toBe(mail.text.trim());
    expect(Date.parse(found[0].date)).not.toBeNaN();
  });

  it('shows the mail as it came, and on a page that runs nothing of it', async () => {
    const { to, found } = await send({ subject: '<script>alert(1)</script>', text: 'plain' });
    const source = await (await fetch(`${mailbox}/mails/${found[0].name}.eml`)).text();
    expect(source).toContain(`To: ${to}`);
    const page = await (await fetch(mailbox)).text();
    expect(page).toContain(to);
    expect(page).not.toContain('<script>');
  });

  it('gives no file beside its mails', async () => {
    const { found } = await send({ subject: 'one', text: 'one' });
    for (const name of [`${found[0].name}.json`, '..%2f..%2fsecrets.json', '%2e%2e/ports.json'])
      expect((await fetch(`${mailbox}/mails/${name}`)).status).toBe(404);
  });
});

describe('the database', () => {
  it('listens on loopback only', async () => {
    const [{ listen_addresses: addresses }] = await sequelize.query<{ listen_addresses: string }>(
      'SHOW listen_addresses',
      { type: QueryTypes.SELECT },
    );
    expect(addresses).toBe('127.0.0.1');
  });
});
