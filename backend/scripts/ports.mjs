import fs from 'node:fs';
import net from 'node:net';
import path from 'node:path';
import { writeFileAtomically } from './paths.mjs';

/**
 * Whether nobody listens on a port of an address. Asking the system by listening is the only answer
 * that is true for every kind of listener.
 * @param {number} port
 * @param {string} [host]
 * @returns {Promise<boolean>}
 */
export function isPortFree(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const probe = net.createServer();
    probe.once('error', (error) => {
      const code = /** @type {NodeJS.ErrnoException} */ (error).code;
      // A machine without IPv6 has nobody on ::1 either.
      resolve(code === 'EADDRNOTAVAIL' || code === 'EAFNOSUPPORT');
    });
    probe.listen({ port, host, exclusive: true }, () => probe.close(() => resolve(true)));
  });
}

/**
 * A port that the system says is free at this moment.
 * @returns {Promise<number>}
 */
export function anyFreePort() {
  return new Promise((resolve, reject) => {
    const probe = net.createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const { port } = /** @type {net.AddressInfo} */ (probe.address());
      probe.close(() => resolve(port));
    });
  });
}

/**
 * The port a part had last time, when it is still free, else another one. Kept in `ports.json`, so that
 * bookmarks of the inbox survive a restart; never assumed, because anything may have taken it since.
 * @param {string} dataDir
 * @param {string} part
 * @returns {Promise<number>}
 */
export async function rememberedPort(dataDir, part) {
  const remembered = readPorts(dataDir)[part];
  if (remembered !== undefined && (await isPortFree(remembered))) {
    return remembered;
  }
  const port = await anyFreePort();
  const ports = { ...readPorts(dataDir), [part]: port };
  writeFileAtomically(path.join(dataDir, 'ports.json'), `${JSON.stringify(ports, null, 2)}\n`);
  return port;
}

/**
 * The ports used last time.
 * @param {string} dataDir
 * @returns {Record<string, number>} empty when nothing is remembered or the file is unreadable
 */
export function readPorts(dataDir) {
  try {
    return JSON.parse(fs.readFileSync(path.join(dataDir, 'ports.json'), 'utf8'));
  } catch {
    // Absent or damaged: ports are only a convenience, new ones are chosen.
    return {};
  }
}
