/** What a developer wants to see of a mail: who, what, and its plain text with the links whole. */
export function summaryOf(name, source) {
  const header = (field) => {
    const found = source.match(new RegExp(`^${field}: (.*(?:\\r?\\n[ \\t].*)*)`, 'im'));
    return found ? decodeWords(found[1].replace(/\r?\n[ \t]+/g, ' ')) : '';
  };
  return {
    name,
    to: header('To'),
    from: header('From'),
    subject: header('Subject'),
    date: header('Date'),
    text: plainText(source),
  };
}

function plainText(source) {
  const boundary = source.match(/boundary="?([^";\r\n]+)"?/i)?.[1];
  const parts = boundary ? source.split(`--${boundary}`) : [source];
  const part = parts.find((candidate) => /content-type: text\/plain/i.test(candidate)) ?? parts[0];
  const [head, ...body] = part.split(/\r?\n\r?\n/);
  const text = body.join('\n\n');
  const encoding = head.match(/content-transfer-encoding: (\S+)/i)?.[1]?.toLowerCase();
  if (encoding === 'base64') return Buffer.from(text, 'base64').toString('utf8').trim();
  if (encoding === 'quoted-printable') return quotedPrintable(text.replace(/=\r?\n/g, '')).trim();
  return text.trim();
}

function quotedPrintable(text) {
  const bytes = text.replace(/=([0-9A-F]{2})/gi, (_, hex) => String.fromCharCode(parseInt(hex, 16)));
  return Buffer.from(bytes, 'latin1').toString('utf8');
}

/** Encoded words of RFC 2047. */
function decodeWords(text) {
  return text.replace(/=\?utf-8\?([bq])\?([^?]*)\?=\s*/gi, (_, kind, word) =>
    kind.toLowerCase() === 'b'
      ? Buffer.from(word, 'base64').toString('utf8')
      : quotedPrintable(word.replace(/_/g, ' ')),
  );
}

const escape = (text) =>
  text.replace(/[&<>"]/g, (sign) => ({ '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' })[sign]);
const linked = (text) => escape(text).replace(/https?:\/\/[^\s<]+/g, (url) => `<a href="${url}">${url}</a>`);

export function listPage(mails) {
  const rows = mails.map(
    (mail) =>
      `<article><h2>${escape(mail.subject)}</h2><p>to ${escape(mail.to)} · ${escape(mail.date)} · <a href="/mails/${mail.name}">source</a></p><pre>${linked(mail.text)}</pre></article>`,
  );
  return `<!doctype html><html lang="en"><meta charset="utf-8"><title>Mails</title>
<style>body{font:16px/1.5 system-ui;margin:2rem auto;max-width:50rem;padding:0 1rem;color:#1b2733;background:#ece7dc}article{border:1px solid #1b2733;background:#faf8f2;padding:1rem;margin:0 0 1rem}h2{font-size:1.1rem;margin:0}pre{white-space:pre-wrap}</style>
<h1>Mails kept by the stand-in</h1>${rows.join('') || '<p>No mail has been sent yet.</p>'}</html>`;
}
