/** A mail before it is set as text and HTML. */
export interface Message {
  subject: string;
  /** One string a paragraph, plain text. */
  paragraphs: string[];
  /** What somebody else wrote, set apart. */
  quote?: string;
  action?: { label: string; url: string };
  /** Several mails in one: each under its own subject. */
  parts?: Message[];
  /** Why this mail came, in small print at the end. */
  reason: string;
}

/** A last line under the reason. */
interface Ending {
  label: string;
  url: string;
}

function bodyText({ paragraphs, quote, action }: Message): string[] {
  const quoted = quote?.split('\n').map((line) => `> ${line}`);
  return [
    ...paragraphs,
    ...(quoted ? [quoted.join('\n')] : []),
    ...(action ? [`${action.label}:\n${action.url}`] : []),
  ];
}

export function toText(message: Message, ending: Ending | null = null): string {
  const parts = (message.parts ?? []).flatMap((part) => [`* ${part.subject}`, ...bodyText(part)]);
  const foot = `--\n${message.reason}${ending ? `\n${ending.label}:\n${ending.url}` : ''}`;
  return [...bodyText(message), ...parts, foot].join('\n\n');
}

function bodyHtml({ paragraphs, quote, action }: Message): string[] {
  return [
    ...paragraphs.map((text) => `<p>${lines(text)}</p>`),
    ...(quote ? [`<blockquote style="${QUOTE}">${lines(quote)}</blockquote>`] : []),
    ...(action ? [`<p><a href="${escape(action.url)}" style="${BUTTON}">${escape(action.label)}</a></p>`] : []),
  ];
}

/** One column, no pictures, no scripts; everything that came from a person is escaped. */
export function toHtml(message: Message, ending: Ending | null = null): string {
  const { subject, reason } = message;
  const link = ending ? `<br><a href="${escape(ending.url)}">${escape(ending.label)}</a>` : '';
  const parts = [
    ...bodyHtml(message),
    ...(message.parts ?? []).flatMap((part) => [
      `<h2 style="${HEADING}">${escape(part.subject)}</h2>`,
      ...bodyHtml(part),
    ]),
    `<p style="${SMALL}">${lines(reason)}${link}</p>`,
  ];
  return `<!doctype html>
<html lang="en">
<head><meta charset="utf-8"><title>${escape(subject)}</title></head>
<body style="${BODY}">
${parts.join('\n')}
</body>
</html>`;
}

const BODY =
  'max-width:36em;margin:0 auto;padding:24px;font:16px/1.5 Arial,sans-serif;color:#1c2427;background:#ffffff';
const QUOTE = 'margin:16px 0;padding:8px 16px;border-left:3px solid #7d8b90;background:#f3f5f5';
const HEADING = 'margin:32px 0 8px;font-size:18px';
const BUTTON = 'display:inline-block;padding:10px 18px;color:#ffffff;background:#1c2427;text-decoration:none';
const SMALL = 'margin-top:32px;font-size:13px;color:#5c686c';

function lines(text: string): string {
  return escape(text).replaceAll('\n', '<br>');
}

function escape(text: string): string {
  return text
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')
    .replaceAll("'", '&#39;');
}
