/** The page on which a developer reads the mails that the product has sent. */

const escape = (text) =>
  text.replace(/[&<>"]/g, (sign) => ({ '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' })[sign]);
const linked = (text) => escape(text).replace(/https?:\/\/[^\s<]+/g, (url) => `<a href="${url}">${url}</a>`);

function article({ name, subject, to, date, text }) {
  return `<article>
<h2>${escape(subject)}</h2>
<p>to ${escape(to)} · ${escape(date)} · <a href="/mails/${name}.eml">source</a></p>
<pre>${linked(text)}</pre>
</article>`;
}

const STYLE = `
body { font: 16px/1.5 system-ui; margin: 2rem auto; max-width: 50rem; padding: 0 1rem; color: #1b2733; background: #ece7dc; }
article { border: 1px solid #1b2733; background: #faf8f2; padding: 1rem; margin: 0 0 1rem; }
h2 { font-size: 1.1rem; margin: 0; }
pre { white-space: pre-wrap; }
`;

export function listPage(mails) {
  return `<!doctype html>
<html lang="en"><meta charset="utf-8"><title>Mails</title><style>${STYLE}</style>
<h1>Mails kept by the stand-in</h1>
${mails.map(article).join('\n') || '<p>No mail has been sent yet.</p>'}
</html>`;
}
