import { parentPort, workerData } from 'node:worker_threads';
import { bodyHash } from '#shared/sequences/chain';
import { LoadConnection } from './load-connection.mjs';
import { Phone, phoneOf, serialiseRequest } from './phones.mjs';
import { percentile } from './statistics.mjs';

/*
 * The load generator, in a thread of its own. A target is a server with one connection a phone; requests
 * are made and serialised before the clock starts.
 */

/** @type {Map<string, { phone: Phone, plan: import('./phones.mjs').PlannedPhone, connection: LoadConnection }[]>} */
const targets = new Map();

/** @param {{ name: string, port: number, device: number }} order */
async function open({ name, port, device }) {
  const lanes = workerData.phones.map((/** @type {import('./phones.mjs').PlannedInstaller} */ person) => {
    const plan = phoneOf(person, device);
    return { plan, phone: new Phone(plan, bodyHash), connection: new LoadConnection(port) };
  });
  targets.set(name, lanes);
}

/**
 * What earlier rounds left over is sent first, since counts must have no gaps; so one target has one size of
 * batch.
 * @param {{ name: string, path: string, batch: number, requests: number, durationMs: number }} order
 */
async function run({ name, path, batch, requests, durationMs }) {
  const lanes = targets.get(name) ?? [];
  for (const { phone, plan, connection } of lanes) {
    const wanted = Math.ceil(requests / lanes.length) - connection.ready;
    connection.add(
      Array.from({ length: Math.max(0, wanted) }, () => serialiseRequest(plan, path, phone.nextBatch(batch))),
    );
  }
  await Promise.all(lanes.map(({ connection }) => connection.open()));
  const latencies = /** @type {number[]} */ ([]);
  const begin = performance.now();
  await Promise.all(lanes.map(({ connection }) => connection.run(begin + durationMs, latencies)));
  const seconds = (performance.now() - begin) / 1000;
  for (const { connection } of lanes) {
    connection.close();
  }
  return {
    seconds,
    requests: latencies.length,
    perSecond: latencies.length / seconds,
    p50Ms: percentile(latencies, 0.5),
    p99Ms: percentile(latencies, 0.99),
    ranDry: seconds * 1000 < durationMs * 0.98,
  };
}

parentPort?.on('message', (order) => {
  const work = order.kind === 'open' ? open(order) : run(order);
  work.then(
    (result) => parentPort?.postMessage({ result }),
    (error) => parentPort?.postMessage({ failure: error.message }),
  );
});
