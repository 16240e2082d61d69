import { mkdtempSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from '@jest/globals';
import { startInbox } from '../../scripts/inbox.mjs';
import type { MailPayload } from '../jobs/job-kinds';
import { Mailer } from './mailer';

const MAIL: MailPayload = { to: 'lead@cold.example', subject: 'Words', text: 'Text', html: '<p>Text</p>' };

describe('Mailer', () => {
  let folder: string;
  let inbox: Awaited<ReturnType<typeof startInbox>>;
  let mailer: Mailer;

  beforeEach(async () => {
    folder = mkdtempSync(join(tmpdir(), 'firstcold-mail-'));
    inbox = await startInbox({ dataDir: folder });
    mailer = new Mailer({
      host: '127.0.0.1',
      port: inbox.smtpPort,
      user: null,
      password: null,
      from: 'Firstcold <no-reply@firstcold.example>',
    });
  });
  afterEach(async () => {
    await inbox.close();
    rmSync(folder, { recursive: true, force: true });
  });

  /** The mails as they came over the wire, oldest first. */
  const arrived = () =>
    readdirSync(join(folder, 'inbox'))
      .sort()
      .map((file) => readFileSync(join(folder, 'inbox', file), 'utf8'));

  const headersOf = (mail: string) => mail.split(/\r?\n\r?\n/)[0] ?? '';

  it('delivers both forms of a mail', async () => {
    await mailer.send(MAIL, { id: 'job-1' });
    expect(arrived()).toHaveLength(1);
    expect(arrived()[0]).toContain('<p>Text</p>');
    expect(headersOf(arrived()[0] ?? '')).toMatch(/^From: Firstcold <no-reply@firstcold\.example>$/m);
  });

  it('gives a mail that goes out twice the same Message-ID', async () => {
    await mailer.send(MAIL, { id: 'job-1' });
    await mailer.send(MAIL, { id: 'job-1' });
    await mailer.send(MAIL, { id: 'job-2' });
    const ids = arrived().map((mail) => /^Message-ID: (.+)$/im.exec(headersOf(mail))?.[1]?.trim());
    expect(ids).toEqual([
      '<job-1@firstcold.example>',
      '<job-1@firstcold.example>',
      '<job-2@firstcold.example>',
    ]);
  });

  it.each(['\r\n', '\n', '\r'])('lets nobody add a header through a circuit’s name with %j', async (end) => {
    const subject = `Sent back: circuit A1${end}Bcc: spy@evil.example${end}X-Evil: 1`;
    await mailer.send({ ...MAIL, subject }, { id: 'job-1' });
    const headers = headersOf(arrived()[0] ?? '');
    expect(headers).not.toMatch(/^(Bcc|X-Evil):/im);
    expect(headers.match(/^X-Delivered-To:.*$/gim)).toEqual(['X-Delivered-To: lead@cold.example']);
  });

  it('sends a mail to its one recipient, whatever stands in the address', async () => {
    await mailer
      .send({ ...MAIL, to: 'lead@cold.example, spy@evil.example' }, { id: 'job-1' })
      .catch(() => undefined);
    expect(arrived().join('\n')).not.toContain('X-Delivered-To: spy@evil.example');
  });

  it('fails when the server can’t be reached, so that the job is tried again', async () => {
    await inbox.close();
    await expect(mailer.send(MAIL, { id: 'job-1' })).rejects.toThrow();
    await expect(mailer.ping()).rejects.toThrow();
  });
});
