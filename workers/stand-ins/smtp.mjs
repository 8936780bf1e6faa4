import { mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import http from 'node:http';
import path from 'node:path';
import { SMTPServer } from 'smtp-server';
import { listPage, summaryOf } from './mail-page.mjs';

/**
 * The local stand-in for the mail server: takes every mail, sends none, keeps each as an .eml file and shows them on a page.
 * Arguments: SMTP port, page port, folder. GET / is the page, GET /mails the list as JSON, GET /mails/NAME one mail as it came.
 */
const [smtpPort, pagePort, folder] = process.argv.slice(2);
mkdirSync(folder, { recursive: true });

let count = 0;
const smtp = new SMTPServer({
  authOptional: true,
  disabledCommands: ['STARTTLS'],
  onData(stream, session, done) {
    const parts = [];
    stream.on('data', (part) => parts.push(part));
    stream.on('error', done);
    stream.on('end', () => {
      const stamp = new Date().toISOString().replace(/[:.]/g, '-');
      const name = `${stamp}-${String(++count).padStart(4, '0')}.eml`;
      writeFileSync(path.join(folder, name), Buffer.concat(parts));
      console.log(`mail for ${session.envelope.rcptTo.map(({ address }) => address).join(', ')}: ${name}`);
      done();
    });
  },
});

const names = () =>
  readdirSync(folder)
    .filter((name) => name.endsWith('.eml'))
    .sort()
    .reverse();
const mails = () => names().map((name) => summaryOf(name, readFileSync(path.join(folder, name), 'utf8')));

const page = http.createServer((request, response) => {
  const { pathname } = new URL(request.url, 'http://localhost');
  const send = (status, type, body) => response.writeHead(status, { 'content-type': type }).end(body);
  if (pathname === '/') return send(200, 'text/html; charset=utf-8', listPage(mails()));
  if (pathname === '/mails') return send(200, 'application/json', JSON.stringify(mails()));
  const name = pathname.replace('/mails/', '');
  if (names().includes(name)) return send(200, 'text/plain; charset=utf-8', readFileSync(path.join(folder, name)));
  return send(404, 'text/plain', 'No such mail.');
});

smtp.on('error', (error) => console.error(error.message));
smtp.listen(Number(smtpPort), '127.0.0.1', () => console.log(`mail server on port ${smtpPort}`));
page.listen(Number(pagePort), '127.0.0.1', () => console.log(`mails shown on port ${pagePort}`));

for (const signal of ['SIGTERM', 'SIGINT'])
  process.on(signal, () => {
    page.close();
    smtp.close(() => process.exit(0));
  });
