import { listPage, mailPage, messagePage } from './inbox-html.mjs';

export const PAGE_SIZE = 50;

/** The pages run no script at all and load nothing from anywhere. */
const PAGE_POLICY =
  "default-src 'none'; style-src 'unsafe-inline'; frame-src 'self'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'";

/**
 * A mail's own HTML is foreign: no scripts, nothing fetched, shown only inside our page. Its links open
 * outside of the frame.
 */
const MAIL_POLICY =
  "sandbox allow-popups allow-popups-to-escape-sandbox; default-src 'none'; style-src 'unsafe-inline'; img-src data:; form-action 'none'; frame-ancestors 'self'";

/**
 * @param {import('./inbox-mails.mjs').MailFiles} mails
 * @param {import('node:http').IncomingMessage} request
 * @param {import('node:http').ServerResponse} response
 */
export async function answerInbox(mails, request, response) {
  try {
    const url = new URL(request.url ?? '/', 'http://localhost');
    const reply = request.method === 'GET' || request.method === 'HEAD' ? await route(mails, url) : undefined;
    const { status, headers, body } = reply ?? {
      status: request.method === 'GET' || request.method === 'HEAD' ? 404 : 405,
      ...page(messagePage('Not here', 'There is no such mail or page.')),
    };
    response.writeHead(status ?? 200, {
      'x-content-type-options': 'nosniff',
      'referrer-policy': 'no-referrer',
      'cache-control': 'no-store',
      ...headers,
    });
    response.end(request.method === 'HEAD' ? undefined : body);
  } catch (error) {
    response.writeHead(500, { 'content-type': 'text/plain; charset=utf-8' });
    response.end(/** @type {Error} */ (error).message);
  }
}

/**
 * @typedef {{ status?: number, headers: Record<string, string>, body: string | Buffer }} Reply
 * @param {import('./inbox-mails.mjs').MailFiles} mails
 * @param {URL} url
 * @returns {Promise<Reply | undefined>} undefined when there is nothing at that address
 */
async function route(mails, url) {
  const number = Math.max(1, Math.trunc(Number(url.searchParams.get('page'))) || 1);
  if (url.pathname === '/') {
    return page(listPage({ ...(await mails.list(number, PAGE_SIZE)), page: number, pageSize: PAGE_SIZE }));
  }
  if (url.pathname === '/api/mails') {
    const { total, mails: found } = await mails.list(number, PAGE_SIZE);
    return json({ total, page: number, pageSize: PAGE_SIZE, mails: found });
  }
  const [, kind, id, part, index] =
    /^\/(mails|api\/mails)\/([\w-]+)(?:\/(html|source|attachments)(?:\/(\d+))?)?$/.exec(url.pathname) ?? [];
  const mail = id === undefined ? undefined : await mails.read(id);
  if (!mail) {
    return undefined;
  }
  if (kind === 'api/mails') {
    return part === undefined ? json(mail) : undefined;
  }
  if (part === undefined) {
    return page(mailPage(mail));
  }
  if (part === 'html') {
    return {
      headers: { 'content-type': 'text/html; charset=utf-8', 'content-security-policy': MAIL_POLICY },
      body: `<!doctype html><meta charset="utf-8"><base target="_blank">${mail.html}`,
    };
  }
  return download(mails, mail.id, part, index);
}

/**
 * @param {import('./inbox-mails.mjs').MailFiles} mails
 * @param {string} id
 * @param {string} part
 * @param {string | undefined} index
 * @returns {Promise<Reply | undefined>}
 */
async function download(mails, id, part, index) {
  const found =
    part === 'source'
      ? { filename: `${id}.eml`, content: await mails.readSource(id) }
      : await mails.readAttachment(id, Number(index));
  if (!found?.content) {
    return undefined;
  }
  const name = encodeURIComponent(found.filename).replace(/['()*]/g, '_');
  return {
    headers: {
      'content-type': 'application/octet-stream',
      'content-disposition': `attachment; filename*=UTF-8''${name}`,
    },
    body: found.content,
  };
}

/**
 * @param {string} body
 * @returns {Reply}
 */
function page(body) {
  return {
    headers: { 'content-type': 'text/html; charset=utf-8', 'content-security-policy': PAGE_POLICY },
    body,
  };
}

/**
 * @param {unknown} value
 * @returns {Reply}
 */
function json(value) {
  return { headers: { 'content-type': 'application/json; charset=utf-8' }, body: JSON.stringify(value) };
}
