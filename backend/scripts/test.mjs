import { ensureDependencies } from './deps.mjs';
import { BROWSER_PACKAGES, DATABASE_PACKAGES, ensureSystemPackages, findChromium } from './debian.mjs';
import { describeFailure, ScriptFailure } from './failure.mjs';
import { Interrupted, Shutdown } from './shutdown.mjs';
import { runJest, show, STATIC_STAGES } from './test-stages.mjs';
import { createThrowAwayDirectory, removeThrowAwayDirectory } from './throw-away.mjs';

/*
 * `npm test`: every check, from a fresh clone. Stops at the first stage that fails. The last line is always
 * "N passed, N failed"; each stage counts as one, and so does each test.
 *
 *   npm test -- --only-jest                       no format, lint and type checks
 *   npm test -- --selectProjects backend          everything else goes to jest
 */

const total = { passed: 0, failed: 0 };
const shutdown = new Shutdown((line) => console.log(line));
shutdown.listen();

try {
  await run(process.argv.slice(2));
} catch (error) {
  if (error instanceof Interrupted || shutdown.isRequested) {
    // Jest may have counted the tests that the interrupt cut off already.
    total.failed = Math.max(1, total.failed);
  } else {
    console.error(`\n${describeFailure(error)}`);
    total.failed += 1;
  }
}
// A signal from here on ends the run at once; there is little left to stop.
shutdown.isRequested = true;
await shutdown.stopAll();
console.log(`${total.passed} passed, ${total.failed} failed`);
process.exitCode = total.failed > 0 ? 1 : 0;

/** @param {string[]} args */
async function run(args) {
  await ensureDependencies();
  shutdown.check();
  ensureSystemPackages([...DATABASE_PACKAGES, ...BROWSER_PACKAGES]);
  if (!args.includes('--only-jest')) {
    for (const { name, command } of STATIC_STAGES) {
      await stage(name, async () => (await show(command)) === 0);
    }
  }
  const { build } = await import('./build.mjs');
  await stage('Build', async () => (await build()) !== undefined);
  heading('Tests');
  const { environment, directory } = await startDatabase();
  shutdown.check();
  const extra = args.filter((argument) => argument !== '--only-jest');
  const { passed, failed } = await runJest(extra, environment, directory);
  total.passed += passed;
  total.failed += failed;
  shutdown.check();
}

/**
 * @param {string} name
 * @param {() => Promise<boolean>} work
 * @throws {ScriptFailure} when it fails, which ends the run
 */
async function stage(name, work) {
  heading(name);
  const begin = performance.now();
  const isFine = await work();
  shutdown.check();
  if (!isFine) {
    throw new ScriptFailure(`${name} FAILED. The stages after it were not run.`);
  }
  total.passed += 1;
  console.log(`${name} passed (${((performance.now() - begin) / 1000).toFixed(1)} s)`);
}

/** @param {string} name */
function heading(name) {
  console.log(`\n=== ${name} ===`);
}

/** A database server that lives as long as this run, quick because it may forget everything. */
async function startDatabase() {
  const { startMariadb } = await import('./mariadb.mjs');
  const directory = createThrowAwayDirectory();
  shutdown.add('The folder', () => removeThrowAwayDirectory(directory));
  const mariadb = await startMariadb({ dataDir: directory, throwAway: true, log: console.log });
  shutdown.add('MariaDB', mariadb.stop, mariadb.kill);
  const environment = {
    TEST_DATABASE_HOST: mariadb.host,
    TEST_DATABASE_PORT: String(mariadb.port),
    TEST_DATABASE_ROOT_USER: mariadb.root.user,
    TEST_DATABASE_ROOT_PASSWORD: mariadb.root.password,
    TEST_DATABASE_OWNER_USER: mariadb.owner.user,
    TEST_DATABASE_OWNER_PASSWORD: mariadb.owner.password,
    TEST_DATABASE_APP_USER: mariadb.app.user,
    TEST_DATABASE_APP_PASSWORD: mariadb.app.password,
    CHROMIUM_PATH: findChromium() ?? '',
  };
  return { environment, directory };
}
