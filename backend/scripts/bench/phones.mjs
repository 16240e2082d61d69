import { uuidv7 } from 'uuidv7';

/**
 * @typedef {object} PlannedSequence
 * @property {string} id
 * @property {string} stepListHash
 * @property {readonly { kind: 'answer', stepKey: string, answer: object, workedOut: object }[]} contents one a step
 *
 * @typedef {object} PlannedInstaller
 * @property {string} authorId
 * @property {readonly { deviceId: string, cookie: string }[]} devices the cookie header has the device's
 *   credential and the forgery token
 * @property {string} forgeryToken
 * @property {readonly PlannedSequence[]} sequences
 *
 * @typedef {Omit<PlannedInstaller, 'devices'> & { deviceId: string, cookie: string }} PlannedPhone
 */

/**
 * @param {PlannedInstaller} installer
 * @param {number} device
 * @returns {PlannedPhone}
 */
export function phoneOf(installer, device) {
  return { ...installer, ...installer.devices[device] };
}

/**
 * An installer's phone: makes entries as the real one does, each with its own id, counts, what it supersedes
 * and the hash of its canonical JSON. Works through its sequences in turn and answers again after the last
 * step, which is a correction.
 */
export class Phone {
  #deviceCount = 0;
  #turn = 0;

  /**
   * @param {PlannedPhone} plan
   * @param {(body: object) => string} bodyHash the product's own
   */
  constructor(plan, bodyHash) {
    this.plan = plan;
    this.bodyHash = bodyHash;
    this.works = plan.sequences.map((sequence) => ({ sequence, count: 0, latest: new Map() }));
  }

  /**
   * @param {number} size how many entries, all of one sequence: a drain sends a circuit's work together
   * @returns {{ entries: { body: object, bodyHash: string }[] }} the body of a request
   */
  nextBatch(size) {
    const work = this.works[this.#turn % this.works.length];
    this.#turn += 1;
    return { entries: Array.from({ length: size }, () => this.#nextEntry(work)) };
  }

  /** @param {Phone['works'][number]} work */
  #nextEntry(work) {
    const content = work.sequence.contents[work.count % work.sequence.contents.length];
    return this.entry(work, content, work.latest.get(content.stepKey) ?? null);
  }

  /**
   * @param {Phone['works'][number]} work
   * @param {object} content
   * @param {string | null} supersedes
   */
  entry(work, content, supersedes) {
    this.#deviceCount += 1;
    work.count += 1;
    const body = {
      format: 1,
      id: uuidv7(),
      sequenceId: work.sequence.id,
      authorId: this.plan.authorId,
      deviceId: this.plan.deviceId,
      deviceCount: this.#deviceCount,
      countOnSequence: work.count,
      deviceTime: new Date().toISOString(),
      stepListHash: work.sequence.stepListHash,
      supersedes,
      content,
    };
    if ('stepKey' in content) {
      work.latest.set(content.stepKey, body.id);
    }
    return { body, bodyHash: this.bodyHash(body) };
  }

  /**
   * Everything on one sequence, and the submission that rests on it.
   * @param {Phone['works'][number]} work
   */
  answersAndSubmission(work) {
    const answers = work.sequence.contents.map((content) => this.entry(work, content, null));
    const restsOn = [{ deviceId: this.plan.deviceId, count: work.count }];
    return { answers, submission: this.entry(work, { kind: 'submission', restsOn }, null) };
  }
}

/**
 * A request ready to be written to a socket.
 * @param {Pick<PlannedPhone, 'cookie' | 'forgeryToken'>} phone
 * @param {string} path
 * @param {object} body
 * @returns {Buffer}
 */
export function serialiseRequest(phone, path, body) {
  const json = Buffer.from(JSON.stringify(body));
  const head = [
    `POST ${path} HTTP/1.1`,
    'Host: localhost',
    'Content-Type: application/json',
    'Accept: application/json',
    `Cookie: ${phone.cookie}`,
    `X-XSRF-TOKEN: ${phone.forgeryToken}`,
    `Content-Length: ${json.length}`,
    '\r\n',
  ].join('\r\n');
  return Buffer.concat([Buffer.from(head), json]);
}
