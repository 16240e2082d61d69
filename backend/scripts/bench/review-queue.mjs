import { setTimeout as sleep } from 'node:timers/promises';
import { bodyHash } from '#shared/sequences/chain';
import { ScriptFailure } from '../failure.mjs';
import { Browser } from './browser.mjs';
import { Phone, phoneOf } from './phones.mjs';
import { milliseconds } from './report.mjs';
import { median } from './statistics.mjs';

const SUBMISSIONS = 10;
const GOAL_MS = 2_000;
const PATIENCE_MS = 20_000;

/**
 * From an installer's submission to the lead's open queue: the entry is posted, the lead's page hears of the
 * change on its stream, asks for the queue anew, and the circuit is in it.
 * @param {{ port: number, seeded: import('./seed.mjs').Seeded, log: (line: string) => void }} context
 * @returns {Promise<import('./report.mjs').Row[]>}
 */
export async function measureReviewQueue({ port, seeded, log }) {
  const lead = new Browser(port);
  const { status } = await lead.signIn(seeded.lead.email, seeded.lead.password);
  if (status !== 200) {
    throw new ScriptFailure(`The lead could not sign in: status ${status}.`);
  }
  const waiting = /** @type {Map<string, () => void>} */ (new Map());
  const stream = await lead.listen((event) => {
    if (event.state === 'submitted') waiting.get(event.sequenceId)?.();
  });
  const plan = phoneOf(seeded.quiet, 0);
  const phone = new Phone(plan, bodyHash);
  const sender = new Browser(port);
  const times = [];
  try {
    // The first circuit is the one that others open.
    for (const work of phone.works.slice(1, SUBMISSIONS + 1)) {
      times.push(await submit({ phone, work, plan, sender, lead, waiting }));
      // Not in step with the server's own clock.
      await sleep(Math.random() * 400);
    }
  } finally {
    stream.close();
    lead.close();
    sender.close();
  }
  log(`  ${times.map((time) => milliseconds(time)).join(', ')}`);
  const middle = median(times);
  return [
    {
      what: `From a submission to the lead's open queue, median of ${SUBMISSIONS}`,
      ours: milliseconds(middle),
      reference: `slowest ${milliseconds(Math.max(...times))}`,
      ratio: null,
      goal: 'at most 2 s',
      isMet: middle <= GOAL_MS,
    },
  ];
}

/**
 * @param {object} setup
 * @param {Phone} setup.phone
 * @param {Phone['works'][number]} setup.work
 * @param {import('./phones.mjs').PlannedPhone} setup.plan
 * @param {Browser} setup.sender
 * @param {Browser} setup.lead
 * @param {Map<string, () => void>} setup.waiting
 * @returns {Promise<number>} milliseconds
 */
async function submit({ phone, work, plan, sender, lead, waiting }) {
  const sequenceId = work.sequence.id;
  const { answers, submission } = phone.answersAndSubmission(work);
  await postEntries(sender, plan, answers);
  const heard = new Promise((resolve, reject) => {
    const late = () => reject(new ScriptFailure(`Nobody heard of the submission of ${sequenceId}.`));
    const timer = setTimeout(late, PATIENCE_MS);
    waiting.set(sequenceId, () => {
      clearTimeout(timer);
      resolve(undefined);
    });
  });
  const begin = performance.now();
  const sent = postEntries(sender, plan, [submission]).then(([result]) => {
    if (result.state !== 'submitted') {
      throw new ScriptFailure(`A submission had no effect: ${JSON.stringify(result)}`);
    }
  });
  await Promise.all([sent, heard]);
  for (;;) {
    const queue = JSON.parse((await lead.get('/api/review-queue')).body.toString('utf8'));
    const ms = performance.now() - begin;
    if (queue.items.some((/** @type {{ sequenceId: string }} */ item) => item.sequenceId === sequenceId)) {
      return ms;
    }
    if (ms > PATIENCE_MS) {
      throw new ScriptFailure(`The submission of ${sequenceId} did not get into the queue.`);
    }
  }
}

/**
 * Posts entries as a phone without a session does, 25 at a time.
 * @param {Browser} sender
 * @param {import('./phones.mjs').PlannedPhone} plan
 * @param {readonly object[]} entries
 * @returns {Promise<any[]>} what became of each
 */
export async function postEntries(sender, plan, entries) {
  for (const pair of plan.cookie.split('; ')) {
    const at = pair.indexOf('=');
    sender.cookies.set(pair.slice(0, at), pair.slice(at + 1));
  }
  const results = [];
  for (let at = 0; at < entries.length; at += 25) {
    const { status, body } = await sender.post('/api/entries', { entries: entries.slice(at, at + 25) });
    const text = body.toString('utf8');
    if (status !== 200 || text.includes('"refused"')) {
      throw new ScriptFailure(`Entries were refused: ${text.slice(0, 500)}`);
    }
    results.push(...JSON.parse(text).results);
  }
  return results;
}
