import { randomBytes } from 'node:crypto';
import { open, readdir, readFile, rename } from 'node:fs/promises';
import path from 'node:path';
import { simpleParser } from 'mailparser';

/** How many parsed mails are kept in memory; the rest is read again when asked for. */
const REMEMBERED = 300;

/**
 * @typedef {object} Mail
 * @property {string} id
 * @property {string} from
 * @property {string[]} to who the mail was really delivered to, blind copies included
 * @property {string} subject
 * @property {string} date when it arrived, ISO 8601
 * @property {string} text
 * @property {string} html empty when the mail has none
 * @property {{ filename: string, size: number }[]} attachments
 */

/** Mails as .eml files, which every mail program opens. Their names sort by arrival. */
export class MailFiles {
  /** @param {string} directory */
  constructor(directory) {
    this.directory = directory;
    this.counter = 0;
    /** @type {Map<string, Mail>} */
    this.parsed = new Map();
  }

  /**
   * Stores a mail; it is on the disk when this resolves.
   * @param {string[]} recipients
   * @param {Buffer} content as it came over the wire
   */
  async save(recipients, content) {
    const stamp = new Date().toISOString().replace(/[:.]/g, '-');
    this.counter = (this.counter + 1) % 1_000_000;
    const id = `${stamp}-${String(this.counter).padStart(6, '0')}-${randomBytes(3).toString('hex')}`;
    const delivered = recipients
      .map((address) => `X-Delivered-To: ${address.replace(/[\r\n]/g, '')}\r\n`)
      .join('');
    const draft = path.join(this.directory, `${id}.part`);
    const handle = await open(draft, 'wx', 0o600);
    try {
      await handle.writeFile(Buffer.concat([Buffer.from(delivered), content]));
      await handle.sync();
    } finally {
      await handle.close();
    }
    await rename(draft, this.fileOf(id));
  }

  /**
   * One page of mails, newest first.
   * @param {number} page from 1
   * @param {number} size
   * @returns {Promise<{ total: number, mails: Mail[] }>}
   */
  async list(page, size) {
    const names = (await readdir(this.directory))
      .filter((name) => name.endsWith('.eml'))
      .sort()
      .reverse();
    const wanted = names.slice((page - 1) * size, page * size).map((name) => name.slice(0, -'.eml'.length));
    const mails = [];
    for (const id of wanted) {
      const mail = await this.read(id);
      if (mail) {
        mails.push(mail);
      }
    }
    return { total: names.length, mails };
  }

  /**
   * @param {string} id
   * @returns {Promise<Mail | undefined>} undefined when there is no such mail
   */
  async read(id) {
    const known = this.parsed.get(id);
    if (known) {
      return known;
    }
    const content = await this.readSource(id);
    if (!content) {
      return undefined;
    }
    const mail = await parseMail(id, content);
    this.parsed.set(id, mail);
    if (this.parsed.size > REMEMBERED) {
      this.parsed.delete(/** @type {string} */ (this.parsed.keys().next().value));
    }
    return mail;
  }

  /**
   * @param {string} id
   * @param {number} index
   * @returns {Promise<{ filename: string, content: Buffer } | undefined>}
   */
  async readAttachment(id, index) {
    const content = await this.readSource(id);
    const attachment = content && (await simpleParser(content)).attachments[index];
    return attachment
      ? { filename: attachment.filename ?? 'attachment', content: attachment.content }
      : undefined;
  }

  /**
   * @param {string} id comes from an address, so only our own kind of name is looked up
   * @returns {Promise<Buffer | undefined>}
   */
  async readSource(id) {
    if (!/^[\dTZ-]+-\d{6}-[0-9a-f]{6}$/.test(id)) {
      return undefined;
    }
    return readFile(this.fileOf(id)).catch(() => undefined);
  }

  /** @param {string} id */
  fileOf(id) {
    return path.join(this.directory, `${id}.eml`);
  }
}

/**
 * @param {string} id
 * @param {Buffer} content
 * @returns {Promise<Mail>}
 */
async function parseMail(id, content) {
  const mail = await simpleParser(content, { skipTextToHtml: true });
  const delivered = mail.headerLines
    .filter((header) => header.key === 'x-delivered-to')
    .map((header) => header.line.slice(header.line.indexOf(':') + 1).trim());
  return {
    id,
    from: mail.from?.text ?? '',
    to: delivered,
    subject: mail.subject ?? '',
    date: id.replace(/^(.{10}T\d\d)-(\d\d)-(\d\d)-(\d{3}Z).*$/, '$1:$2:$3.$4'),
    text: mail.text ?? '',
    html: mail.html || '',
    attachments: mail.attachments.map((attachment) => ({
      filename: attachment.filename ?? 'attachment',
      size: attachment.size,
    })),
  };
}
