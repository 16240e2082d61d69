import { Transform } from 'node:stream';
import { S3Failure } from './object-store-replies.mjs';

const LINE_LIMIT_BYTES = 8192;

/**
 * Takes the chunk headers out of an upload in the `aws-chunked` encoding, which current S3 clients use
 * for streams by default. A stand-in that does not know it stores the headers inside the object, silently.
 * `trailers` holds what stood behind the last chunk, such as a checksum.
 */
export class AwsChunkedDecoder extends Transform {
  constructor() {
    super();
    /** @type {Record<string, string>} lower-case names */
    this.trailers = {};
    /** @type {'size' | 'data' | 'data-end' | 'trailer' | 'done'} */
    this.state = 'size';
    this.missing = 0;
    /** @type {Buffer} what is not consumed yet */
    this.rest = Buffer.alloc(0);
  }

  /**
   * @param {Buffer} piece
   * @param {BufferEncoding} _encoding
   * @param {import('node:stream').TransformCallback} callback
   */
  _transform(piece, _encoding, callback) {
    this.rest = this.rest.length === 0 ? piece : Buffer.concat([this.rest, piece]);
    try {
      while (this.advance()) {
        // Each round consumes one line or one piece of data.
      }
      callback();
    } catch (error) {
      callback(/** @type {Error} */ (error));
    }
  }

  /** @param {import('node:stream').TransformCallback} callback */
  _flush(callback) {
    callback(this.state === 'done' ? null : new S3Failure('IncompleteBody', 'The last chunk is missing.'));
  }

  /** @returns {boolean} whether something was consumed */
  advance() {
    if (this.state === 'data') {
      return this.takeData();
    }
    const line = this.takeLine();
    if (line === undefined) {
      return false;
    }
    if (this.state === 'size') {
      this.startChunk(line);
    } else if (this.state === 'data-end') {
      this.expectEmpty(line);
      this.state = 'size';
    } else if (this.state === 'trailer') {
      this.takeTrailer(line);
    } else {
      this.expectEmpty(line);
    }
    return true;
  }

  /** @param {string} line `<size in hex>` or `<size in hex>;chunk-signature=…` */
  startChunk(line) {
    const size = /^([0-9a-fA-F]{1,8})(;.*)?$/.exec(line)?.[1];
    if (size === undefined) {
      throw new S3Failure('InvalidRequest', 'A chunk does not begin with its size.');
    }
    this.missing = Number.parseInt(size, 16);
    this.state = this.missing === 0 ? 'trailer' : 'data';
  }

  takeData() {
    if (this.rest.length === 0) {
      return false;
    }
    const data = this.rest.subarray(0, this.missing);
    this.rest = this.rest.subarray(data.length);
    this.missing -= data.length;
    this.push(data);
    if (this.missing === 0) {
      this.state = 'data-end';
    }
    return true;
  }

  /** @param {string} line an empty one ends the trailers */
  takeTrailer(line) {
    if (line === '') {
      this.state = 'done';
      return;
    }
    const colon = line.indexOf(':');
    if (colon < 1 || Object.keys(this.trailers).length > 20) {
      throw new S3Failure('InvalidRequest', 'A trailer is malformed.');
    }
    this.trailers[line.slice(0, colon).trim().toLowerCase()] = line.slice(colon + 1).trim();
  }

  /** @param {string} line */
  expectEmpty(line) {
    if (line !== '') {
      throw new S3Failure('InvalidRequest', 'A chunk is longer than it says.');
    }
  }

  /** @returns {string | undefined} undefined while the line is not complete */
  takeLine() {
    const end = this.rest.indexOf('\r\n');
    if (end > LINE_LIMIT_BYTES || (end < 0 && this.rest.length > LINE_LIMIT_BYTES)) {
      throw new S3Failure('InvalidRequest', 'A chunk header is too long.');
    }
    if (end < 0) {
      return undefined;
    }
    const line = this.rest.subarray(0, end).toString('latin1');
    this.rest = this.rest.subarray(end + 2);
    return line;
  }
}
