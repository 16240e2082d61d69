import net from 'node:net';

const HEAD_END = Buffer.from('\r\n\r\n');
const REFUSED = Buffer.from('"refused"');

/**
 * One keep-alive connection that writes ready-made requests, one after the other, and reads no more of the
 * answers than it must: the generator shares its cores with what it measures.
 */
export class LoadConnection {
  /** @param {number} port */
  constructor(port) {
    this.port = port;
    /** @type {net.Socket | undefined} */
    this.socket = undefined;
    /** @type {Buffer[]} requests that wait */
    this.queue = [];
    this.next = 0;
    this.pending = /** @type {Buffer | null} */ (null);
    this.wake = /** @type {((answer: Buffer | Error) => void) | null} */ (null);
  }

  /** Connects anew: servers close what was idle between two rounds. */
  open() {
    return new Promise((resolve, reject) => {
      const socket = net.connect(this.port, '127.0.0.1', () => {
        socket.off('error', reject);
        socket.on('error', (error) => this.wake?.(error));
        resolve(undefined);
      });
      socket.once('error', reject);
      socket.setNoDelay(true);
      socket.on('data', (piece) => this.#take(piece));
      socket.on('close', () => this.wake?.(new Error('The server closed the connection')));
      this.socket = socket;
    });
  }

  /** Requests that are ready. */
  get ready() {
    return this.queue.length - this.next;
  }

  /** @param {Buffer[]} requests */
  add(requests) {
    this.queue = [...this.queue.slice(this.next), ...requests];
    this.next = 0;
  }

  /**
   * Sends requests until the time is over or none is left.
   * @param {number} deadline on `performance.now()`
   * @param {number[]} latencies in milliseconds; the answers' times are added
   */
  async run(deadline, latencies) {
    while (performance.now() < deadline && this.ready > 0) {
      const begin = performance.now();
      const answer = await this.#send(this.queue[this.next]);
      this.next += 1;
      latencies.push(performance.now() - begin);
      if (answer.subarray(9, 12).toString('latin1') !== '200' || answer.includes(REFUSED)) {
        throw new Error(
          `A request was not answered as it should be: ${answer.toString('utf8').slice(0, 900)}`,
        );
      }
    }
  }

  close() {
    this.wake = null;
    this.socket?.destroy();
  }

  /**
   * @param {Buffer} request
   * @returns {Promise<Buffer>} the whole answer
   */
  #send(request) {
    return new Promise((resolve, reject) => {
      this.wake = (answer) => {
        this.wake = null;
        this.pending = null;
        if (answer instanceof Error) reject(answer);
        else resolve(answer);
      };
      this.socket?.write(request);
    });
  }

  /** @param {Buffer} piece */
  #take(piece) {
    const all = this.pending ? Buffer.concat([this.pending, piece]) : piece;
    this.pending = all;
    const headEnd = all.indexOf(HEAD_END);
    if (headEnd < 0) {
      return;
    }
    const length = /content-length: (\d+)/i.exec(all.toString('latin1', 0, headEnd))?.[1];
    if (length === undefined) {
      this.wake?.(new Error('An answer without a Content-Length can not be told from the next one'));
    } else if (all.length >= headEnd + HEAD_END.length + Number(length)) {
      this.wake?.(all);
    }
  }
}
