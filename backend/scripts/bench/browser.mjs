import http from 'node:http';

/**
 * @typedef {object} Answer
 * @property {number} status
 * @property {Buffer} body
 * @property {http.IncomingHttpHeaders} headers
 * @property {number} ms from sending to the last byte
 */

/** A small HTTP client with cookies and one keep-alive connection, for what is measured one request at a time. */
export class Browser {
  /** @type {Map<string, string>} */
  cookies = new Map();
  agent = new http.Agent({ keepAlive: true, maxSockets: 1 });

  /** @param {number} port */
  constructor(port) {
    this.port = port;
  }

  get cookieHeader() {
    return [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
  }

  get forgeryToken() {
    return this.cookies.get('XSRF-TOKEN') ?? '';
  }

  /** @param {string} path */
  get(path) {
    return this.#send('GET', path, undefined);
  }

  /**
   * @param {string} path
   * @param {object} body
   */
  post(path, body) {
    return this.#send('POST', path, JSON.stringify(body));
  }

  /**
   * @param {string} email
   * @param {string} password
   */
  async signIn(email, password) {
    await this.get('/api/session');
    return this.post('/api/session', { email, password });
  }

  /**
   * Opens the stream of live events.
   * @param {(event: object) => void} onEvent
   * @returns {Promise<{ close: () => void }>} once the server has begun to answer
   */
  listen(onEvent) {
    return new Promise((resolve, reject) => {
      const request = http.get(this.#options('GET', '/api/events'), (response) => {
        let text = '';
        if (response.statusCode !== 200) reject(new Error(`No stream of events: ${response.statusCode}`));
        response.setEncoding('utf8');
        response.on('data', (piece) => {
          text += piece;
          const blocks = text.split('\n\n');
          text = blocks.pop() ?? '';
          for (const block of blocks) {
            const data = /^data: (.*)$/m.exec(block)?.[1];
            if (data !== undefined) onEvent(JSON.parse(data));
          }
        });
        response.on('error', () => {});
        response.once('data', () => resolve({ close: () => request.destroy() }));
      });
      request.once('error', reject);
    });
  }

  close() {
    this.agent.destroy();
  }

  /**
   * @param {string} method
   * @param {string} path
   */
  #options(method, path) {
    const headers = {
      Cookie: this.cookieHeader,
      'Accept-Encoding': 'br, gzip',
      ...(method === 'GET' ? {} : { 'X-XSRF-TOKEN': this.forgeryToken, 'Content-Type': 'application/json' }),
    };
    return { host: '127.0.0.1', port: this.port, method, path, headers };
  }

  /**
   * @param {string} method
   * @param {string} path
   * @param {string | undefined} body
   * @returns {Promise<Answer>}
   */
  #send(method, path, body) {
    return new Promise((resolve, reject) => {
      const begin = performance.now();
      const options = { ...this.#options(method, path), agent: this.agent, timeout: 30_000 };
      const request = http.request(options, (response) => {
        const pieces = /** @type {Buffer[]} */ ([]);
        response.on('data', (piece) => pieces.push(piece));
        response.on('error', reject);
        response.on('end', () => {
          const ms = performance.now() - begin;
          this.#keepCookies(response.headers['set-cookie'] ?? []);
          const { statusCode = 0, headers } = response;
          resolve({ status: statusCode, body: Buffer.concat(pieces), headers, ms });
        });
      });
      request.on('timeout', () => request.destroy(new Error(`${method} ${path} took too long`)));
      request.on('error', reject);
      request.end(body);
    });
  }

  /** @param {readonly string[]} lines */
  #keepCookies(lines) {
    for (const line of lines) {
      const [pair = ''] = line.split(';');
      this.cookies.set(pair.slice(0, pair.indexOf('=')), pair.slice(pair.indexOf('=') + 1));
    }
  }
}
