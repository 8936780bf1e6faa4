import { mkdirSync } from 'node:fs';
import http from 'node:http';
import { SMTPServer } from 'smtp-server';
import { keepMail, readMails, readSource } from './kept-mails.mjs';
import { listPage } from './mail-page.mjs';

/**
 * The local stand-in for the mail server: takes every mail, sends none, keeps each and shows them on a page.
 * Arguments: SMTP port, page port, folder. GET / is the page, GET /mails the list as JSON, newest first, GET /mails/NAME.eml one
 * mail as it came.
 */
const [smtpPort, pagePort, folder] = process.argv.slice(2);
mkdirSync(folder, { recursive: true });

const smtp = new SMTPServer({
  authOptional: true,
  disabledCommands: ['STARTTLS'],
  onData(stream, session, done) {
    const parts = [];
    stream.on('data', (part) => parts.push(part));
    stream.on('error', done);
    stream.on('end', () => {
      const recipients = session.envelope.rcptTo.map(({ address }) => address);
      keepMail(folder, recipients, Buffer.concat(parts)).then(({ name }) => {
        console.log(`mail for ${recipients.join(', ')}: ${name}`);
        done();
      }, done);
    });
  },
});

const page = http.createServer((request, response) => {
  const { pathname } = new URL(request.url, 'http://localhost');
  const send = (status, type, body) => response.writeHead(status, { 'content-type': type }).end(body);
  if (pathname === '/') return send(200, 'text/html; charset=utf-8', listPage(readMails(folder)));
  if (pathname === '/mails') return send(200, 'application/json', JSON.stringify(readMails(folder)));
  const source = readSource(folder, pathname.replace('/mails/', ''));
  if (source) return send(200, 'text/plain; charset=utf-8', source);
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
