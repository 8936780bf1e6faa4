import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import PostalMime from 'postal-mime';

/** A folder of mails: each as it came in NAME.eml, and what a reader wants of it in NAME.json beside that. */

let count = 0;

/** Keeps a mail. Answers its summary: name, to (the envelope's recipients, with commas), from, subject, date and text with its links whole. */
export async function keepMail(folder, recipients, source) {
  const mail = await PostalMime.parse(source);
  const stamp = new Date().toISOString().replace(/[:.]/g, '-');
  const summary = {
    // The count keeps the order of mails that come in the same millisecond.
    name: `${stamp}-${String(++count).padStart(4, '0')}`,
    to: recipients.join(', '),
    from: mail.from?.address ?? '',
    subject: mail.subject ?? '',
    date: mail.date ?? '',
    text: mail.text ?? '',
  };
  writeFileSync(path.join(folder, `${summary.name}.eml`), source);
  writeFileSync(path.join(folder, `${summary.name}.json`), `${JSON.stringify(summary, null, 2)}\n`);
  return summary;
}

/** The summaries, newest first. */
export function readMails(folder) {
  return readdirSync(folder)
    .filter((name) => name.endsWith('.json'))
    .sort()
    .reverse()
    .map((name) => JSON.parse(readFileSync(path.join(folder, name), 'utf8')));
}

/** A mail as it came, by the name of its file; null where there is none. */
export function readSource(folder, name) {
  const file = path.join(folder, path.basename(name));
  return name.endsWith('.eml') && existsSync(file) ? readFileSync(file) : null;
}
