import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { parseArgs } from 'node:util';
import { ensureDependencies } from './deps.mjs';
import { describeFailure, ScriptFailure } from './failure.mjs';
import { Interrupted, Shutdown } from './shutdown.mjs';

/*
 * `npm run bench`: measures the product beside plain references, in one run on one machine, and ends with a
 * table for the README. Starts everything it needs on folders of its own and leaves nothing behind.
 */

const MEASURES = ['saving', 'memory', 'queue', 'opening', 'screen', 'saturation', 'logger', 'defrost'];
const USAGE = `npm run bench -- [--quick] [--only NAME]… [--profile] [--no-build]

  --quick     short rounds: shows whether everything works, its figures are rough
  --only      one of ${MEASURES.join(', ')}; may be given several times
  --profile   also lists where the server spends its processor time (slows it down)
  --no-build  measures what was built last, even if the sources have changed since`;

const shutdown = new Shutdown((line) => console.log(line));
shutdown.listen();
process.on('uncaughtException', (error) => void failAndStop(error));
process.on('unhandledRejection', (error) => void failAndStop(error));

try {
  const options = readOptions();
  await ensureDependencies({ log: shutdown.log });
  shutdown.check();
  if (options.build) {
    const { build } = await import('./build.mjs');
    await build({ log: shutdown.log });
  }
  shutdown.check();
  await Promise.race([measureAll(options), shutdown.requested.then(() => shutdown.check())]);
  await stopAndLeave(0);
} catch (error) {
  if (error instanceof Interrupted || shutdown.isRequested) {
    await stopAndLeave(130);
  }
  await failAndStop(error);
}

/** @returns {{ quick: boolean, profile: boolean, build: boolean, wants: (...names: string[]) => boolean }} */
function readOptions() {
  const { values } = parseArgs({
    options: {
      quick: { type: 'boolean', default: false },
      profile: { type: 'boolean', default: false },
      'no-build': { type: 'boolean', default: false },
      help: { type: 'boolean', default: false },
      only: { type: 'string', multiple: true },
    },
  });
  if (values.help) {
    console.log(USAGE);
    process.exit(0);
  }
  const unknown = (values.only ?? []).find((name) => !MEASURES.includes(name));
  if (unknown !== undefined) {
    throw new ScriptFailure(`There is no measure "${unknown}".\n\n${USAGE}`);
  }
  const chosen = values.only ?? MEASURES;
  return {
    quick: values.quick,
    profile: values.profile,
    build: !values['no-build'],
    wants: (...names) => names.some((name) => chosen.includes(name)),
  };
}

/** @param {Pick<ReturnType<typeof readOptions>, 'quick' | 'profile' | 'wants'>} options */
async function measureAll({ quick, profile, wants }) {
  const rows = /** @type {import('./bench/report.mjs').Row[]} */ ([]);
  const { markdown } = await import('./bench/report.mjs');
  const { describeMachine } = await import('./bench/stage.mjs');
  if (wants('saturation')) {
    const { measureSaturation } = await import('./bench/saturation.mjs');
    heading('Saturation');
    rows.push(...(await measureSaturation({ quick, log: shutdown.log })));
  }
  if (wants('logger')) {
    const { measureLogger } = await import('./bench/logger.mjs');
    heading("A logger's trace");
    rows.push(...(await measureLogger({ quick, log: shutdown.log })));
  }
  if (wants('defrost')) {
    const { measureDefrostPlan } = await import('./bench/defrost.mjs');
    heading('A defrost plan');
    rows.push(...(await measureDefrostPlan({ quick, log: shutdown.log })));
  }
  if (wants('saving', 'memory', 'queue', 'opening', 'screen')) {
    rows.unshift(...(await measureServer({ quick, profile, wants })));
  }
  console.log(`\n${markdown(rows, describeMachine(os.tmpdir()))}\n`);
}

/**
 * @param {Pick<ReturnType<typeof readOptions>, 'quick' | 'profile' | 'wants'>} options
 * @returns {Promise<import('./bench/report.mjs').Row[]>}
 */
async function measureServer({ quick, profile, wants }) {
  const { setStage } = await import('./bench/stage.mjs');
  const { seed } = await import('./bench/seed.mjs');
  const { log } = shutdown;
  const profileDir = profile ? fs.mkdtempSync(path.join(os.tmpdir(), 'firstcold-profile-')) : undefined;
  if (profileDir) shutdown.add('The profiles', () => fs.rmSync(profileDir, { recursive: true, force: true }));
  heading('Starting');
  const stage = await setStage(shutdown, { profileDir });
  heading('Filling in');
  const seeded = await seed(stage, log);
  const rows = await measureLoad(stage, seeded, { quick, profile, wants });
  if (wants('queue')) {
    const { measureReviewQueue } = await import('./bench/review-queue.mjs');
    heading('From a submission to the open queue');
    rows.push(...(await measureReviewQueue({ port: stage.port, seeded, log })));
  }
  shutdown.check();
  if (wants('opening', 'screen')) {
    rows.push(...(await measurePages(stage, seeded, { quick, profile, wants })));
  }
  if (profileDir) {
    const { describeProfiles } = await import('./bench/profile.mjs');
    const { stopProcess } = await import('./processes.mjs');
    await stopProcess(stage.serverPid, 20_000);
    heading('Where the server spent its time');
    log(describeProfiles(profileDir).join('\n'));
  }
  return rows;
}

/**
 * @param {import('./bench/stage.mjs').Stage} stage
 * @param {import('./bench/seed.mjs').Seeded} seeded
 * @param {Pick<ReturnType<typeof readOptions>, 'quick' | 'profile' | 'wants'>} options
 * @returns {Promise<import('./bench/report.mjs').Row[]>}
 */
async function measureLoad(stage, seeded, { quick, wants }) {
  const rows = /** @type {import('./bench/report.mjs').Row[]} */ ([]);
  if (!wants('saving', 'memory')) {
    return rows;
  }
  const { Load } = await import('./bench/load.mjs');
  const { startBareServer } = await import('./bench/stage.mjs');
  const { log } = shutdown;
  const load = new Load(seeded.phones);
  shutdown.add('The load', () => load.close());
  await load.open('single', stage.port, 0);
  await load.open('batch', stage.port, 1);
  if (wants('saving')) {
    const { measureSaving } = await import('./bench/save-entries.mjs');
    heading('Saving entries');
    const ids = seeded.phones.flatMap(({ sequences }) => sequences.map(({ id }) => id));
    await load.open('bare', await startBareServer(stage, ids, shutdown), 0);
    rows.push(...(await measureSaving({ load, quick, log })));
  }
  if (wants('memory')) {
    const { measureMemory } = await import('./bench/memory.mjs');
    heading('Memory of the server');
    rows.push(...(await measureMemory({ load, serverPid: stage.serverPid, log })));
  }
  await load.close();
  return rows;
}

/**
 * @param {import('./bench/stage.mjs').Stage} stage
 * @param {import('./bench/seed.mjs').Seeded} seeded
 * @param {Pick<ReturnType<typeof readOptions>, 'quick' | 'profile' | 'wants'>} options
 * @returns {Promise<import('./bench/report.mjs').Row[]>}
 */
async function measurePages({ port }, seeded, { quick, wants }) {
  const rows = /** @type {import('./bench/report.mjs').Row[]} */ ([]);
  const { measureFirstScreen, PAGES_FOLDER } = await import('./bench/first-screen.mjs');
  const { packedBytes } = await import('./bench/script-sizes.mjs');
  const { visitPages } = await import('./bench/page-visit.mjs');
  const { log } = shutdown;
  const visit = await visitPages(shutdown, { port, seeded });
  if (!visit) log('  No browser found: scripts loaded on demand are not counted.');
  if (wants('opening')) {
    const { measureOpening } = await import('./bench/open-circuit.mjs');
    heading('Opening a circuit');
    const stepperBytes = visit && packedBytes(PAGES_FOLDER, visit.circuit);
    rows.push(...(await measureOpening({ port, seeded, quick, log, stepperBytes })));
  }
  if (wants('screen')) {
    heading("The phone's first screen");
    rows.push(...(await measureFirstScreen(shutdown, visit)));
  }
  return rows;
}

/**
 * Begins a part, unless a person has asked to stop: nothing may be started behind the stop's back.
 * @param {string} text
 */
function heading(text) {
  shutdown.check();
  console.log(`\n${text}`);
}

/** @param {unknown} problem */
async function failAndStop(problem) {
  console.error(`\n${describeFailure(problem)}`);
  await stopAndLeave(1);
}

/** @param {number} code */
async function stopAndLeave(code) {
  shutdown.isRequested = true;
  await shutdown.stopAll();
  process.exit(code);
}
