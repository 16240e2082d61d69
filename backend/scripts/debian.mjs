import { spawnSync } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { ScriptFailure } from './failure.mjs';

/*
 * Runs before `npm ci`, so nothing here may import a package.
 */

/**
 * What the scripts need from the system: a package is there when one name of every group is found.
 * The server package proper is avoided on purpose: it brings a data directory and a service that this
 * project does not want. The client package holds a tool that mariadb-install-db cannot do without.
 * @typedef {{ name: string, commands: string[][] }} SystemPackage
 */

/** @type {SystemPackage[]} */
export const DATABASE_PACKAGES = [
  { name: 'mariadb-server-core', commands: [['mariadbd', 'mysqld'], ['mariadb-install-db']] },
  { name: 'mariadb-client-core', commands: [['my_print_defaults']] },
];

/** @type {SystemPackage[]} */
export const BROWSER_PACKAGES = [
  { name: 'chromium', commands: [['chromium', 'chromium-browser', 'google-chrome', 'google-chrome-stable']] },
];

/**
 * The full path of the first command that exists. The system folders are searched too, because a plain
 * user's PATH often lacks them and mariadbd lies there.
 * @param {string[]} names
 * @returns {string | undefined}
 */
export function findCommand(names) {
  const folders = (process.env.PATH ?? '').split(path.delimiter).filter(Boolean);
  for (const name of names) {
    for (const folder of [
      ...folders,
      '/usr/sbin',
      '/usr/local/sbin',
      '/sbin',
      '/usr/local/bin',
      '/usr/bin',
    ]) {
      const candidate = path.join(folder, name);
      if (isExecutable(candidate)) {
        return candidate;
      }
    }
  }
  return undefined;
}

/** @param {string} file */
function isExecutable(file) {
  try {
    fs.accessSync(file, fs.constants.X_OK);
    return fs.statSync(file).isFile();
  } catch {
    // Absent, or in a folder of PATH that we may not look into.
    return false;
  }
}

/**
 * The browser for the end-to-end tests.
 * @returns {string | undefined}
 */
export function findChromium() {
  const chosen = process.env.CHROMIUM_PATH;
  return chosen && fs.existsSync(chosen) ? chosen : findCommand(BROWSER_PACKAGES[0].commands[0]);
}

/**
 * Installs what is missing, and only that. Asks apt for fresh lists only when the first try fails,
 * because updating takes longer than the installation.
 * @param {SystemPackage[]} packages
 * @param {(line: string) => void} [log]
 * @returns {string[]} the names of the packages that were installed
 */
export function ensureSystemPackages(packages, log = console.log) {
  const missing = packages.filter((wanted) => !isPresent(wanted)).map((wanted) => wanted.name);
  if (missing.length === 0) {
    return [];
  }
  const prefix = privilegePrefix(missing);
  log(`  Installing ${missing.join(' and ')} (apt-get) …`);
  const install = [...prefix, 'apt-get', 'install', '-y', '--no-install-recommends', ...missing];
  let result = run(install);
  if (result.status !== 0) {
    log('  Fetching fresh package lists (apt-get update) …');
    run([...prefix, 'apt-get', 'update']);
    result = run(install);
  }
  const absent = packages.filter((wanted) => !isPresent(wanted)).map((wanted) => wanted.name);
  if (result.status !== 0 || absent.length > 0) {
    const tail = `${result.stdout}${result.stderr}`.trim().split('\n').slice(-6).join('\n');
    throw new ScriptFailure(`${byHand(missing)}\n${tail}`);
  }
  return missing;
}

/** @param {SystemPackage} wanted */
function isPresent(wanted) {
  if (wanted.name === 'chromium') {
    return findChromium() !== undefined;
  }
  return wanted.commands.every((names) => findCommand(names) !== undefined);
}

/** @param {string[]} missing */
function byHand(missing) {
  return `These system packages could not be installed: run \`apt-get install ${missing.join(' ')}\` as root, then try again.`;
}

/**
 * @param {string[]} missing
 * @returns {string[]} what to put before apt-get: nothing for root, sudo when it asks for no password
 */
function privilegePrefix(missing) {
  if (!findCommand(['apt-get'])) {
    throw new ScriptFailure(
      `This system has no apt-get: install the equivalents of ${missing.join(', ')} by hand, then try again.`,
    );
  }
  if (process.getuid?.() === 0) {
    return [];
  }
  if (findCommand(['sudo']) && spawnSync('sudo', ['-n', 'true'], { stdio: 'ignore' }).status === 0) {
    return ['sudo', '-n'];
  }
  throw new ScriptFailure(byHand(missing));
}

/** @param {string[]} command */
function run([command, ...args]) {
  const noninteractive = command === 'sudo' ? ['-n', 'env', 'DEBIAN_FRONTEND=noninteractive'] : [];
  const rest = command === 'sudo' ? args.slice(1) : args;
  return spawnSync(command, [...noninteractive, ...rest], {
    encoding: 'utf8',
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
    stdio: ['ignore', 'pipe', 'pipe'],
    maxBuffer: 64 * 1024 * 1024,
  });
}
