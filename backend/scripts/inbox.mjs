import http from 'node:http';
import path from 'node:path';
import { SMTPServer } from 'smtp-server';
import { MailFiles } from './inbox-mails.mjs';
import { answerInbox } from './inbox-pages.mjs';
import { dataDirectory, isCommand, makePrivateDirectory } from './paths.mjs';

const MAIL_LIMIT_BYTES = 25 * 1024 * 1024;

/**
 * A post office for one machine: takes every mail by SMTP, delivers none of them, and shows them on a
 * page. Invitations and handover links can be followed without a mail account, and none reaches a real
 * person by mistake. Both servers listen on loopback only.
 * @param {object} options
 * @param {string} options.dataDir mails go to `<dataDir>/inbox`
 * @param {number} [options.smtpPort] any free one when absent
 * @param {number} [options.port] of the page; any free one when absent
 * @returns {Promise<{ url: string, port: number, smtpPort: number, failed: Promise<string>, close: () => Promise<void> }>}
 *   `failed` resolves when one of the servers breaks later on
 */
export async function startInbox({ dataDir, smtpPort = 0, port = 0 }) {
  const mails = new MailFiles(makePrivateDirectory(path.join(dataDir, 'inbox')));
  const smtp = createSmtpServer(mails);
  const pages = http.createServer((request, response) => void answerInbox(mails, request, response));
  const failed = new Promise((resolve) => {
    pages.on('error', (error) => resolve(error.message));
    smtp.server.on('error', (/** @type {Error} */ error) => resolve(error.message));
  });
  // A client that hangs up in the middle is reported here, and is no reason to stop.
  smtp.on('error', () => {});
  await listen(smtp.server, smtpPort);
  await listen(pages, port);
  const { port: pagePort } = /** @type {import('node:net').AddressInfo} */ (pages.address());
  const { port: takenSmtpPort } = /** @type {import('node:net').AddressInfo} */ (smtp.server.address());
  const close = async () => {
    pages.close();
    pages.closeAllConnections();
    await new Promise((resolve) => smtp.close(() => resolve(undefined)));
  };
  return { url: `http://localhost:${pagePort}`, port: pagePort, smtpPort: takenSmtpPort, failed, close };
}

/** @param {MailFiles} mails */
function createSmtpServer(mails) {
  return new SMTPServer({
    disabledCommands: ['STARTTLS', 'AUTH'],
    size: MAIL_LIMIT_BYTES,
    banner: 'Firstcold local inbox',
    disableReverseLookup: true,
    closeTimeout: 2000,
    onData(stream, session, callback) {
      const recipients = session.envelope.rcptTo.map((recipient) => recipient.address);
      const pieces = /** @type {Buffer[]} */ ([]);
      stream.on('data', (piece) => stream.sizeExceeded || pieces.push(piece));
      stream.once('end', () => {
        if (stream.sizeExceeded) {
          callback(Object.assign(new Error('The mail is too large'), { responseCode: 552 }));
          return;
        }
        // The sender is told "accepted" only when the mail is on the disk.
        mails.save(recipients, Buffer.concat(pieces)).then(
          () => callback(),
          (error) => callback(Object.assign(error, { responseCode: 451 })),
        );
      });
    },
  });
}

/**
 * @param {import('node:net').Server} server
 * @param {number} port
 */
function listen(server, port) {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', () => {
      server.off('error', reject);
      resolve(undefined);
    });
  });
}

if (isCommand(import.meta.url)) {
  void startInbox({ dataDir: dataDirectory() }).then(({ url, smtpPort, close }) => {
    console.log(JSON.stringify({ url, smtpPort }));
    process.once('SIGTERM', () => void close().then(() => process.exit(0)));
  });
}
