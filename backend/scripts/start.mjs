import { ensureDependencies } from './deps.mjs';
import { describeFailure } from './failure.mjs';
import { dataDirectory, makeWalkableDirectory } from './paths.mjs';
import { Interrupted, Shutdown } from './shutdown.mjs';

/*
 * `npm start`: from a fresh clone to a running product, with nothing to set up by hand.
 * Only built-ins may be imported above; the rest follows when the packages are there.
 */

const log = (/** @type {string} */ line) => console.log(line);
const shutdown = new Shutdown(log);
shutdown.listen();
process.on('uncaughtException', (error) => void failAndStop(error));
process.on('unhandledRejection', (error) => void failAndStop(error));

try {
  log('Starting Firstcold …');
  await ensureDependencies({ log });
  shutdown.check();
  const { takeDataDirectory, startParts, describeStart } = await import('./start-parts.mjs');
  const dataDir = dataDirectory();
  makeWalkableDirectory(dataDir);
  await takeDataDirectory(dataDir, shutdown);
  const running = await startParts(dataDir, shutdown);
  log(describeStart(running));
  const reason = await Promise.race([shutdown.requested, ...running.deaths]);
  if (reason !== undefined && !shutdown.isRequested) {
    await failAndStop(reason);
  }
  await stopAndLeave(0);
} catch (error) {
  // A tool that was ended by the interrupt reports a failure, which is not one.
  if (error instanceof Interrupted || shutdown.isRequested) {
    await stopAndLeave(0);
  }
  await failAndStop(error);
}

/**
 * Says what is wrong, then stops everything. Nothing is restarted: a crash that heals itself is a crash
 * that nobody looks into.
 * @param {unknown} problem a sentence, or an error
 */
async function failAndStop(problem) {
  console.error(`\n${typeof problem === 'string' ? problem : describeFailure(problem)}`);
  await stopAndLeave(1);
}

/** @param {number} code */
async function stopAndLeave(code) {
  const hadParts = shutdown.parts.length > 0;
  shutdown.isRequested = true;
  await shutdown.stopAll();
  if (hadParts) {
    log('Stopped.');
  }
  process.exit(code);
}
