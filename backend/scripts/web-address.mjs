import { ScriptFailure } from './failure.mjs';
import { isPortFree } from './ports.mjs';

const DEFAULT_PORT = 4000;

/**
 * @typedef {object} WebAddress
 * @property {string} host what the server listens on
 * @property {number} port
 * @property {string} publicUrl what people open and mails link to
 * @property {string} localUrl how this machine reaches the server
 */

/**
 * Where the product will be found. Without TLS it stays on this machine unless HOST says otherwise: phones
 * keep nothing offline over plain http from another machine anyway. A port that was asked for is taken or
 * refused; the default one moves on when somebody has it.
 * @param {(line: string) => void} log
 * @returns {Promise<WebAddress>}
 */
export async function chooseWebAddress(log) {
  const hasTls = Boolean(process.env.TLS_CERT);
  const host = process.env.HOST || (hasTls ? '0.0.0.0' : '127.0.0.1');
  const port = await choosePort(host, log);
  const scheme = hasTls ? 'https' : 'http';
  const local = ['0.0.0.0', '::', 'localhost'].includes(host) ? '127.0.0.1' : host;
  return {
    host,
    port,
    publicUrl: process.env.PUBLIC_URL || `${scheme}://localhost:${port}`,
    localUrl: `${scheme}://${local.includes(':') ? `[${local}]` : local}:${port}`,
  };
}

/**
 * @param {string} host
 * @param {(line: string) => void} log
 */
async function choosePort(host, log) {
  const wanted = process.env.PORT;
  if (wanted) {
    const port = Number(wanted);
    if (!Number.isInteger(port) || port < 1 || port > 65535) {
      throw new ScriptFailure(`PORT=${wanted} is not a port: use a number from 1 to 65535.`);
    }
    if (!(await isFreeEverywhere(port, host))) {
      throw new ScriptFailure(`Port ${port} is in use or not allowed: choose another with PORT=…`);
    }
    return port;
  }
  for (let port = DEFAULT_PORT; port < DEFAULT_PORT + 100; port += 1) {
    if (await isFreeEverywhere(port, host)) {
      if (port !== DEFAULT_PORT) {
        log(`  Port ${DEFAULT_PORT} is in use, taking ${port}`);
      }
      return port;
    }
  }
  throw new ScriptFailure(`No free port from ${DEFAULT_PORT} on: choose one with PORT=…`);
}

/**
 * Free on the address and also on ::1, which browsers try first for "localhost".
 * @param {number} port
 * @param {string} host
 */
async function isFreeEverywhere(port, host) {
  return (await isPortFree(port, host)) && (await isPortFree(port, '::1'));
}
