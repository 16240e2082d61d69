import { spawnSync } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { DATABASE_PACKAGES, findCommand } from './debian.mjs';
import { ScriptFailure } from './failure.mjs';
import { runTool } from './processes.mjs';

/** @typedef {{ name: string, uid: number, gid: number }} SystemUser */

/**
 * The system user that the database server shall run as. MariaDB refuses to run as root unasked, and it
 * need not: `mysql` where a package made that user, else `nobody`. When that user cannot walk down to the
 * data directory (a project below root's home), root it is.
 * @param {string} data the data directory; need not exist yet
 * @returns {SystemUser | undefined} undefined when we are not root: then it runs as ourselves
 * @throws {ScriptFailure} when the data directory belongs to somebody else
 */
export function serverUser(data) {
  const self = process.getuid?.();
  const owner = fs.statSync(data, { throwIfNoEntry: false })?.uid;
  if (self !== 0) {
    if (owner !== undefined && owner !== self) {
      throw new ScriptFailure(`${data} belongs to another user: start as that user, or set DATA_DIR.`);
    }
    return undefined;
  }
  const candidates = ['mysql', 'nobody'].map(findUser).filter((user) => user !== undefined);
  const usable = candidates.find((user) => canEnter(path.dirname(data), user));
  return usable ?? { name: 'root', uid: 0, gid: 0 };
}

/**
 * Makes the data directory when there is none. It is made aside and then renamed, so that an interrupted
 * installation is never mistaken for a database.
 * @param {string} data
 * @param {SystemUser | undefined} user
 */
export async function installDataDirectory(data, user) {
  if (fs.existsSync(data)) {
    ownByServer(data, user);
    return;
  }
  const draft = `${data}.new`;
  fs.rmSync(draft, { recursive: true, force: true });
  fs.mkdirSync(draft, { mode: 0o700 });
  ownByServer(draft, user);
  const command = /** @type {string} */ (findCommand(DATABASE_PACKAGES[0].commands[1]));
  const { code, output } = await runTool(command, [
    '--no-defaults',
    ...(user ? [`--user=${user.name}`] : []),
    `--datadir=${draft}`,
    '--auth-root-authentication-method=normal',
    '--skip-test-db',
    '--innodb-log-file-size=16M',
  ]);
  if (code !== 0) {
    const tail = output.trim().split('\n').slice(-15).join('\n');
    throw new ScriptFailure(`The database could not be set up in ${data}:\n${tail}`);
  }
  fs.renameSync(draft, data);
}

/**
 * Hands the files to the user the server runs as, when they are another's: after a move of the project
 * that user may have changed.
 * @param {string} directory
 * @param {SystemUser | undefined} user
 */
function ownByServer(directory, user) {
  if (!user || fs.statSync(directory).uid === user.uid) {
    return;
  }
  for (const entry of fs.readdirSync(directory, { recursive: true, encoding: 'utf8' })) {
    fs.lchownSync(path.join(directory, entry), user.uid, user.gid);
  }
  fs.chownSync(directory, user.uid, user.gid);
}

/**
 * @param {string} name
 * @returns {SystemUser | undefined}
 */
function findUser(name) {
  const line = fs
    .readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .find((entry) => entry.startsWith(`${name}:`));
  const [, , uid, gid] = (line ?? '').split(':');
  return line === undefined ? undefined : { name, uid: Number(uid), gid: Number(gid) };
}

/**
 * Whether a user can walk down to a folder: found out by doing it, since the answer depends on every
 * folder above.
 * @param {string} directory
 * @param {SystemUser} user
 */
function canEnter(directory, user) {
  const result = spawnSync('test', ['-x', directory], {
    uid: user.uid,
    gid: user.gid,
    stdio: 'ignore',
    cwd: '/',
  });
  return result.status === 0;
}
