const STYLE = `
:root { color-scheme: light dark; --paper: #faf7f0; --sheet: #fff; --ink: #16332d; --soft: #4c625c; --link: #1f6484;
  --copper: #c8743c; --rule: #d8d1c1; }
@media (prefers-color-scheme: dark) { :root { --paper: #0f1c1a; --sheet: #162926; --ink: #ece6da; --soft: #a9b8b2;
  --link: #93cbe3; --copper: #d98a55; --rule: #34504a; } }
* { box-sizing: border-box; }
body { margin: 0 auto; max-width: 60rem; padding: 1.25rem 1rem 3rem; background: var(--paper); color: var(--ink);
  font: 1rem/1.5 system-ui, sans-serif; overflow-wrap: anywhere; }
header { border-bottom: 3px solid var(--copper); margin-bottom: 1rem; padding-bottom: .5rem; }
h1 { font-size: 1.25rem; line-height: 1.3; margin: 0; font-weight: 600; }
p { margin: .25rem 0; }
small, .soft, dt { color: var(--soft); }
a { color: var(--link); }
a:focus-visible { outline: 3px solid var(--copper); outline-offset: 2px; }
ol { list-style: none; margin: 0; padding: 0; background: var(--sheet); border: 1px solid var(--rule); }
li + li { border-top: 1px solid var(--rule); }
li a { display: grid; grid-template-columns: 1fr auto; gap: 0 1rem; padding: .625rem .875rem; min-height: 48px;
  color: inherit; text-decoration: none; }
li a:hover strong { text-decoration: underline; }
li strong { font-weight: 600; }
li .soft { grid-column: 1 / -1; font-size: .875rem; }
time { font-variant-numeric: tabular-nums; color: var(--soft); font-size: .875rem; }
nav { display: flex; justify-content: space-between; gap: 1rem; margin-top: 1rem; }
nav a { padding: .75rem 0; }
dl { display: grid; grid-template-columns: auto 1fr; gap: .125rem 1rem; margin: .75rem 0 1rem; }
dd { margin: 0; }
iframe { width: 100%; height: 70vh; border: 1px solid var(--rule); background: #fff; color-scheme: light; }
pre { white-space: pre-wrap; background: var(--sheet); border: 1px solid var(--rule); padding: 1rem; margin: 0;
  font: .9375rem/1.55 ui-monospace, monospace; }
h2 { font-size: 1rem; margin: 1.25rem 0 .5rem; font-weight: 600; }
@media (max-width: 30rem) { li a { grid-template-columns: 1fr; } }
`;

/**
 * @param {unknown} text
 * @returns {string} safe between tags and inside quoted attributes
 */
export function escapeHtml(text) {
  return String(text).replace(/[&<>"']/g, (character) => `&#${character.charCodeAt(0)};`);
}

/**
 * @param {string} title
 * @param {string} body
 */
function frame(title, body) {
  return `<!doctype html><html lang="en"><head><meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1"><title>${escapeHtml(title)}</title>
<style>${STYLE}</style></head><body>${body}</body></html>`;
}

/**
 * @param {string} title
 * @param {string} message
 */
export function messagePage(title, message) {
  const back = '<p><a href="/">Back to all mails</a></p>';
  return frame(title, `<header><h1>${escapeHtml(title)}</h1></header><p>${escapeHtml(message)}</p>${back}`);
}

/**
 * @param {{ total: number, mails: import('./inbox-mails.mjs').Mail[], page: number, pageSize: number }} list
 */
export function listPage({ total, mails, page, pageSize }) {
  const rows = mails.map(
    (mail) => `<li><a href="/mails/${mail.id}"><strong>${escapeHtml(mail.subject || '(no subject)')}</strong>
${timeTag(mail.date)}<span class="soft">to ${escapeHtml(mail.to.join(', '))}</span></a></li>`,
  );
  const empty = '<p>No mails here yet. What Firstcold sends shows up on this page; reload to look again.</p>';
  const newer = page > 1 ? `<a href="/?page=${page - 1}">Newer</a>` : '<span></span>';
  const older = page * pageSize < total ? `<a href="/?page=${page + 1}">Older</a>` : '<span></span>';
  return frame(
    'Local inbox',
    `<header><h1>Local inbox</h1><p class="soft">${total} ${total === 1 ? 'mail' : 'mails'}, newest first.
Mails stay on this machine: none is delivered.</p></header><main>
${rows.length > 0 ? `<ol>${rows.join('')}</ol>` : empty}</main><nav aria-label="Pages">${newer}${older}</nav>`,
  );
}

/** @param {import('./inbox-mails.mjs').Mail} mail */
export function mailPage(mail) {
  const attachments = mail.attachments.map(
    (attachment, index) =>
      `<a href="/mails/${mail.id}/attachments/${index}">${escapeHtml(attachment.filename)}</a>
<small>(${Math.ceil(attachment.size / 1024)} kB)</small>`,
  );
  const html = mail.html
    ? `<h2>As a mail program shows it</h2><iframe title="The mail" src="/mails/${mail.id}/html"
 sandbox="allow-popups allow-popups-to-escape-sandbox" referrerpolicy="no-referrer"></iframe>`
    : '';
  return frame(
    mail.subject || '(no subject)',
    `<header><p><a href="/">All mails</a></p><h1>${escapeHtml(mail.subject || '(no subject)')}</h1></header><main>
<dl><dt>From</dt><dd>${escapeHtml(mail.from)}</dd><dt>To</dt><dd>${escapeHtml(mail.to.join(', '))}</dd>
<dt>Arrived</dt><dd>${timeTag(mail.date)}</dd>
${attachments.length > 0 ? `<dt>Attached</dt><dd>${attachments.join('<br>')}</dd>` : ''}</dl>
${html}<h2>Text</h2><pre>${linkAddresses(mail.text)}</pre>
<p><a href="/mails/${mail.id}/source">Save as .eml</a></p></main>`,
  );
}

/** @param {string} date */
function timeTag(date) {
  return `<time datetime="${escapeHtml(date)}">${escapeHtml(date.slice(0, 19).replace('T', ' '))} UTC</time>`;
}

/**
 * Makes web addresses in plain text clickable. The text is split first and escaped after, so escaping
 * never changes an address.
 * @param {string} text
 */
function linkAddresses(text) {
  return text
    .split(/(https?:\/\/[^\s<>"]+[^\s<>".,;:!?)\]])/)
    .map((piece, index) =>
      index % 2 === 1
        ? `<a href="${escapeHtml(piece)}" target="_blank" rel="noreferrer">${escapeHtml(piece)}</a>`
        : escapeHtml(piece),
    )
    .join('');
}
