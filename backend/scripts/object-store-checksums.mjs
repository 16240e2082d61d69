import { createHash } from 'node:crypto';
import { Transform } from 'node:stream';
import zlib from 'node:zlib';
import { S3Failure } from './object-store-replies.mjs';

/** Checksums that we can verify. Others that a client sends are passed over, not kept. */
const VERIFIED = ['crc32', 'sha1', 'sha256'];

/**
 * Passes bytes through and works out what clients may have promised about them.
 */
export class ChecksumMeter extends Transform {
  /** @param {number} limitBytes */
  constructor(limitBytes) {
    super();
    this.limitBytes = limitBytes;
    this.size = 0;
    this.crc32 = 0;
    this.md5 = createHash('md5');
    this.sha1 = createHash('sha1');
    this.sha256 = createHash('sha256');
  }

  /**
   * @param {Buffer} piece
   * @param {BufferEncoding} _encoding
   * @param {import('node:stream').TransformCallback} callback
   */
  _transform(piece, _encoding, callback) {
    this.size += piece.length;
    this.crc32 = zlib.crc32(piece, this.crc32);
    this.md5.update(piece);
    this.sha1.update(piece);
    this.sha256.update(piece);
    const isTooLarge = this.size > this.limitBytes;
    callback(isTooLarge ? new S3Failure('EntityTooLarge', 'The object is too large.') : null, piece);
  }
}

/**
 * Compares what arrived with what the client promised in headers and trailers: length, MD5, SHA-256 of
 * the payload, and the x-amz-checksum family.
 * @param {ChecksumMeter} meter after all bytes have passed
 * @param {Record<string, string | undefined>} promised lower-case names; headers and trailers together
 * @returns {{ md5: string, verified: Record<string, string> }} the MD5 in hex, and the verified checksums as
 *   headers to give back later
 */
export function verifyChecksums(meter, promised) {
  const md5 = meter.md5.digest();
  const length = promised['x-amz-decoded-content-length'] ?? promised['content-length'];
  if (length !== undefined && Number(length) !== meter.size) {
    throw new S3Failure('IncompleteBody', 'The body does not have the length that the request names.');
  }
  if (promised['content-md5'] && promised['content-md5'] !== md5.toString('base64')) {
    throw new S3Failure('BadDigest', 'The Content-MD5 you specified did not match what we received.');
  }
  const sha256 = meter.sha256.digest();
  const payload = promised['x-amz-content-sha256'];
  if (payload && /^[0-9a-f]{64}$/.test(payload) && payload !== sha256.toString('hex')) {
    throw new S3Failure('XAmzContentSHA256Mismatch', 'The payload does not match its SHA-256.');
  }
  const crc32 = Buffer.alloc(4);
  crc32.writeUInt32BE(meter.crc32);
  const found = { crc32, sha1: meter.sha1.digest(), sha256 };
  /** @type {Record<string, string>} */
  const verified = {};
  for (const name of VERIFIED) {
    const header = `x-amz-checksum-${name}`;
    const value = promised[header];
    if (value === undefined) {
      continue;
    }
    if (value !== found[/** @type {keyof typeof found} */ (name)].toString('base64')) {
      throw new S3Failure(
        'BadDigest',
        `The ${name.toUpperCase()} you specified did not match what we received.`,
      );
    }
    verified[header] = value;
  }
  return { md5: md5.toString('hex'), verified };
}
