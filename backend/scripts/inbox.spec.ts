import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import { createTransport, type SendMailOptions } from 'nodemailer';

interface ListedMail {
  id: string;
  to: string[];
  subject: string;
  text: string;
  html: string;
}

let dataDir: string;
let inbox: ChildProcess;
let url: string;
let smtpPort: number;

/** One connection for all mails: a server greets a new one slowly, to catch senders that talk too soon. */
async function send(...mails: SendMailOptions[]): Promise<void> {
  const transport = createTransport({
    host: '127.0.0.1',
    port: smtpPort,
    ignoreTLS: true,
    pool: true,
    maxConnections: 1,
  });
  for (const mail of mails) {
    await transport.sendMail({ from: 'Firstcold <no-reply@firstcold.example>', text: '', ...mail });
  }
  transport.close();
}

async function newest(): Promise<ListedMail> {
  const list = (await (await fetch(`${url}/api/mails`)).json()) as { mails: ListedMail[] };
  return list.mails[0]!;
}

beforeAll(async () => {
  dataDir = mkdtempSync(join(tmpdir(), 'firstcold-inbox-'));
  inbox = spawn(process.execPath, [join(__dirname, 'inbox.mjs')], {
    env: { ...process.env, DATA_DIR: dataDir },
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const [line] = (await once(inbox.stdout!, 'data')) as [Buffer];
  ({ url, smtpPort } = JSON.parse(String(line)) as { url: string; smtpPort: number });
});

afterAll(async () => {
  const exited = once(inbox, 'exit');
  inbox.kill('SIGTERM');
  await exited;
  rmSync(dataDir, { recursive: true });
});

describe('the local inbox', () => {
  it('says that it is empty before anything arrives', async () => {
    expect(await (await fetch(url)).text()).toContain('No mails here yet');
  });

  it('keeps a mail as .eml and tells subject, text, html and every recipient', async () => {
    await send({
      to: 'Ana <ana@store.example>',
      bcc: 'hidden@store.example',
      subject: 'Übergabe ❄',
      text: 'Hi',
      html: '<b>Hi</b>',
    });
    expect(await newest()).toMatchObject({
      to: ['ana@store.example', 'hidden@store.example'],
      subject: 'Übergabe ❄',
      text: 'Hi',
      html: '<b>Hi</b>',
    });
    expect(readdirSync(join(dataDir, 'inbox')).filter((name) => name.endsWith('.eml'))).toHaveLength(1);
  });

  it('shows foreign text escaped and its links clickable', async () => {
    await send({
      to: 'a@b.example',
      subject: '<script>x</script>',
      text: 'Open https://x.example/a?b=1&c=2.',
    });
    const { id } = await newest();
    const list = await (await fetch(url)).text();
    expect(list).not.toContain('<script>');
    const page = await (await fetch(`${url}/mails/${id}`)).text();
    expect(page).not.toContain('<script>');
    expect(page).toContain('<a href="https://x.example/a?b=1&#38;c=2" target="_blank" rel="noreferrer">');
  });

  it('shows the html of a mail in a sandbox that runs no scripts', async () => {
    await send({
      to: 'a@b.example',
      subject: 'html',
      html: '<script>alert(1)</script><a href="https://x.example">x</a>',
    });
    const { id } = await newest();
    const response = await fetch(`${url}/mails/${id}/html`);
    const policy = response.headers.get('content-security-policy');
    expect(policy).toContain('sandbox allow-popups');
    expect(policy).toContain("default-src 'none'");
    expect(policy).not.toContain('allow-scripts');
    expect(await response.text()).toContain('<base target="_blank">');
  });

  it('gives attachments back byte for byte', async () => {
    const content = Buffer.from([0, 255, 13, 10, 46, 13, 10]);
    await send({ to: 'a@b.example', subject: 'file', attachments: [{ filename: 'é.bin', content }] });
    const { id } = await newest();
    const response = await fetch(`${url}/mails/${id}/attachments/0`);
    expect(Buffer.from(await response.arrayBuffer()).equals(content)).toBe(true);
  });

  it('shows 50 mails a page', async () => {
    await send(
      ...Array.from({ length: 50 }, (_, index) => ({ to: 'a@b.example', subject: `many ${index}` })),
    );
    const second = (await (await fetch(`${url}/api/mails?page=2`)).json()) as {
      total: number;
      mails: ListedMail[];
    };
    expect(second.mails).toHaveLength(second.total - 50);
    expect(await (await fetch(url)).text()).toContain('Older');
  });

  it.each(['/mails/..%2Fsecrets', '/mails/2020-01-01T00-00-00-000Z-000001-abcdef', '/nothing'])(
    'answers 404 for %s',
    async (path) => {
      expect((await fetch(url + path)).status).toBe(404);
    },
  );
});
