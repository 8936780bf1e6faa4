/** A mail before it is set as text and HTML. */
export interface Message {
  subject: string;
  /** One string a paragraph, plain text. */
  paragraphs: string[];
  /** What somebody else wrote, set apart. */
  quote?: string;
  action?: { label: string; url: string };
  /** Why this mail came, in small print at the end. */
  reason: string;
}

export function toText({ paragraphs, quote, action, reason }: Message): string {
  const quoted = quote?.split('\n').map((line) => `> ${line}`);
  return [
    ...paragraphs,
    ...(quoted ? [quoted.join('\n')] : []),
    ...(action ? [`${action.label}:\n${action.url}`] : []),
    `--\n${reason}`,
  ].join('\n\n');
}

/** One column, no pictures, no scripts; everything that came from a person is escaped. */
export function toHtml({ subject, paragraphs, quote, action, reason }: Message): string {
  const parts = [
    ...paragraphs.map((text) => `<p>${lines(text)}</p>`),
    ...(quote ? [`<blockquote style="${QUOTE}">${lines(quote)}</blockquote>`] : []),
    ...(action ? [`<p><a href="${escape(action.url)}" style="${BUTTON}">${escape(action.label)}</a></p>`] : []),
    `<p style="${SMALL}">${lines(reason)}</p>`,
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
