import http from 'node:http';
import path from 'node:path';
import { pipeline } from 'node:stream/promises';
import { AwsChunkedDecoder } from './aws-chunked.mjs';
import { ChecksumMeter, verifyChecksums } from './object-store-checksums.mjs';
import { ObjectFiles } from './object-store-files.mjs';
import { listObjects } from './object-store-list.mjs';
import { errorDocument, S3Failure } from './object-store-replies.mjs';
import { dataDirectory, isCommand, makePrivateDirectory } from './paths.mjs';

/** S3's own limit for one PUT. */
const OBJECT_LIMIT_BYTES = 5 * 1024 ** 3;

/** Headers of an upload that come back with the object. */
const KEPT_HEADERS = ['content-type', 'content-disposition', 'content-language', 'cache-control'];

/**
 * A local stand-in for S3 object storage, so that the product runs without an account anywhere: buckets,
 * PUT, GET with ranges, HEAD, DELETE and listing (version 2), addressed by path. It is for one machine:
 * it listens on loopback and asks only for the right access key id. **The signature is not checked.**
 * What it does not know it refuses (501) instead of guessing.
 * @param {object} options
 * @param {string} options.dataDir objects go to `<dataDir>/objects`
 * @param {string} options.accessKeyId requests signed with another key id are refused
 * @param {number} [options.port] any free one when absent
 * @param {string[]} [options.buckets] made when they are not there
 * @returns {Promise<{ url: string, port: number, failed: Promise<string>, close: () => Promise<void> }>}
 *   `failed` resolves when the server breaks later on
 */
export async function startObjectStore({ dataDir, accessKeyId, port = 0, buckets = [] }) {
  const files = new ObjectFiles(makePrivateDirectory(path.join(dataDir, 'objects')));
  for (const bucket of buckets) {
    await files.createBucket(bucket);
  }
  const server = http.createServer((request, response) => void answer(files, accessKeyId, request, response));
  // Uploads over a slow disk may take long; sockets that say nothing at all are cut by the headers' time-out.
  server.requestTimeout = 0;
  await new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', () => resolve(undefined));
  });
  const address = /** @type {import('node:net').AddressInfo} */ (server.address());
  return {
    url: `http://127.0.0.1:${address.port}`,
    port: address.port,
    failed: new Promise((resolve) => server.once('error', (error) => resolve(error.message))),
    close: () => closeServer(server),
  };
}

/** @param {http.Server} server */
function closeServer(server) {
  return /** @type {Promise<void>} */ (
    new Promise((resolve) => {
      server.close(() => resolve());
      server.closeIdleConnections();
      setTimeout(() => server.closeAllConnections(), 2000).unref();
    })
  );
}

/**
 * @param {ObjectFiles} files
 * @param {string} accessKeyId
 * @param {http.IncomingMessage} request
 * @param {http.ServerResponse} response
 */
async function answer(files, accessKeyId, request, response) {
  try {
    checkAccess(request, accessKeyId);
    await route(files, request, response);
  } catch (error) {
    if (response.headersSent || response.destroyed) {
      response.destroy();
      return;
    }
    const failure =
      error instanceof S3Failure
        ? error
        : new S3Failure('InternalError', /** @type {Error} */ (error).message);
    // What is left of a refused upload is not worth reading to its end.
    const isUnread = !request.complete;
    const body = request.method === 'HEAD' ? '' : errorDocument(failure, request.url ?? '');
    response.writeHead(failure.status, {
      'content-type': 'application/xml',
      'content-length': request.method === 'HEAD' ? 0 : Buffer.byteLength(body),
      ...(isUnread ? { connection: 'close' } : {}),
    });
    response.end(body);
    request.resume();
  }
}

/**
 * @param {http.IncomingMessage} request
 * @param {string} accessKeyId
 */
function checkAccess(request, accessKeyId) {
  const used = /\bCredential=([^/,\s]+)\//.exec(request.headers.authorization ?? '')?.[1];
  if (used === undefined) {
    throw new S3Failure('AccessDenied', 'Access Denied');
  }
  if (used !== accessKeyId) {
    throw new S3Failure(
      'InvalidAccessKeyId',
      'The access key id you provided does not exist in our records.',
    );
  }
}

/**
 * @param {ObjectFiles} files
 * @param {http.IncomingMessage} request
 * @param {http.ServerResponse} response
 */
async function route(files, request, response) {
  const { bucket, key, query } = readAddress(request.url ?? '/');
  const { method } = request;
  if (key === '') {
    await answerBucket(files, { method, bucket, query }, response);
    return;
  }
  if ([...query.keys()].some((name) => name !== 'x-id') || request.headers['x-amz-copy-source']) {
    throw new S3Failure(
      'NotImplemented',
      'This stand-in does not know multipart uploads, copies and the like.',
    );
  }
  if (method === 'PUT') {
    await putObject(files, bucket, key, request, response);
  } else if (method === 'GET' || method === 'HEAD') {
    await getObject(files, bucket, key, request, response);
  } else if (method === 'DELETE') {
    await files.remove(bucket, key);
    response.writeHead(204).end();
  } else {
    throw new S3Failure('MethodNotAllowed', 'The specified method is not allowed against this resource.');
  }
}

/**
 * @param {string} url `/bucket/key/with/slashes?query`; taken apart by hand, because a URL parser would
 *   resolve `..` inside a key
 */
function readAddress(url) {
  const [address, search = ''] = url.split(/\?(.*)/s);
  const [, bucket = '', rawKey = ''] = /^\/([^/]*)\/?(.*)$/s.exec(address) ?? [];
  let key;
  try {
    key = decodeURIComponent(rawKey);
  } catch {
    throw new S3Failure('InvalidURI', 'The key is not valid percent-encoded UTF-8.');
  }
  if (Buffer.byteLength(key) > 1024) {
    throw new S3Failure('KeyTooLongError', 'Your key is too long');
  }
  return { bucket, key, query: new URLSearchParams(search) };
}

/**
 * @param {ObjectFiles} files
 * @param {{ method: string | undefined, bucket: string, query: URLSearchParams }} asked
 * @param {http.ServerResponse} response
 */
async function answerBucket(files, { method, bucket, query }, response) {
  if (method === 'PUT' && query.size === 0) {
    await files.createBucket(bucket);
    response.writeHead(200, { location: `/${bucket}`, 'content-length': 0 }).end();
  } else if (method === 'HEAD') {
    await files.requireBucket(bucket);
    response.writeHead(200, { 'content-length': 0 }).end();
  } else if (method === 'GET' && query.get('list-type') === '2') {
    const body = await listObjects(files, bucket, query);
    response.writeHead(200, { 'content-type': 'application/xml' }).end(body);
  } else {
    throw new S3Failure('NotImplemented', 'This stand-in does not know that request on a bucket.');
  }
}

/**
 * @param {ObjectFiles} files
 * @param {string} bucket
 * @param {string} key
 * @param {http.IncomingMessage} request
 * @param {http.ServerResponse} response
 */
async function putObject(files, bucket, key, request, response) {
  const headers = /** @type {Record<string, string | undefined>} */ (request.headers);
  if (headers['if-none-match'] === '*' && (await exists(files, bucket, key))) {
    throw new S3Failure(
      'PreconditionFailed',
      'At least one of the pre-conditions you specified did not hold',
    );
  }
  const encodings = (headers['content-encoding'] ?? '').split(',').map((name) => name.trim());
  const isChunked =
    encodings.includes('aws-chunked') || (headers['x-amz-content-sha256'] ?? '').startsWith('STREAMING-');
  const decoder = isChunked ? new AwsChunkedDecoder() : undefined;
  const meter = new ChecksumMeter(OBJECT_LIMIT_BYTES);
  const source = decoder ? [request, decoder, meter] : [request, meter];
  const object = await files.put(bucket, key, source, () => {
    // The outer length counts the chunk headers too, so it says nothing about a chunked body.
    const length = isChunked ? undefined : headers['content-length'];
    const promised = { ...headers, ...decoder?.trailers, 'content-length': length };
    const { md5, verified } = verifyChecksums(meter, promised);
    return { md5, headers: { ...keptHeaders(headers, encodings), ...verified } };
  });
  response
    .writeHead(200, { etag: `"${object.md5}"`, 'content-length': 0, ...checksumHeaders(object.headers) })
    .end();
}

/**
 * @param {Record<string, string | undefined>} headers
 * @param {string[]} encodings
 * @returns {Record<string, string>}
 */
function keptHeaders(headers, encodings) {
  const kept = /** @type {Record<string, string>} */ ({ 'content-type': 'binary/octet-stream' });
  for (const [name, value] of Object.entries(headers)) {
    if (value !== undefined && (KEPT_HEADERS.includes(name) || name.startsWith('x-amz-meta-'))) {
      kept[name] = value;
    }
  }
  const encoding = encodings.filter((name) => name !== '' && name !== 'aws-chunked').join(', ');
  return encoding ? { ...kept, 'content-encoding': encoding } : kept;
}

/** @param {Record<string, string>} headers */
function checksumHeaders(headers) {
  return Object.fromEntries(Object.entries(headers).filter(([name]) => name.startsWith('x-amz-checksum-')));
}

/**
 * @param {ObjectFiles} files
 * @param {string} bucket
 * @param {string} key
 */
async function exists(files, bucket, key) {
  try {
    await files.describe(bucket, key);
    return true;
  } catch (error) {
    if (error instanceof S3Failure && error.code === 'NoSuchKey') {
      return false;
    }
    throw error;
  }
}

/**
 * @param {ObjectFiles} files
 * @param {string} bucket
 * @param {string} key
 * @param {http.IncomingMessage} request
 * @param {http.ServerResponse} response
 */
async function getObject(files, bucket, key, request, response) {
  const { object, handle } = await files.open(bucket, key);
  try {
    const range = readRange(request.headers.range, object.size);
    // A checksum covers the whole object, so a part must not carry it.
    const sent = Object.entries(object.headers).filter(
      ([name]) => !range || !name.startsWith('x-amz-checksum-'),
    );
    const { start, end } = range ?? { start: 0, end: object.size - 1 };
    response.writeHead(range ? 206 : 200, {
      ...Object.fromEntries(sent),
      etag: `"${object.md5}"`,
      'last-modified': new Date(object.lastModified).toUTCString(),
      'accept-ranges': 'bytes',
      'content-length': end - start + 1,
      ...(range ? { 'content-range': `bytes ${start}-${end}/${object.size}` } : {}),
    });
    if (request.method === 'HEAD' || object.size === 0) {
      response.end();
    } else {
      await pipeline(handle.createReadStream({ start, end, autoClose: false }), response);
    }
  } finally {
    await handle.close();
  }
}

/**
 * @param {string | undefined} header
 * @param {number} size
 * @returns {{ start: number, end: number } | undefined} undefined for all of it: also when the header is
 *   one that we don't understand, as HTTP asks
 */
function readRange(header, size) {
  const match = /^bytes=(\d*)-(\d*)$/.exec(header ?? '');
  if (!match || (match[1] === '' && match[2] === '')) {
    return undefined;
  }
  const start = match[1] === '' ? Math.max(0, size - Number(match[2])) : Number(match[1]);
  const end = match[1] === '' || match[2] === '' ? size - 1 : Math.min(Number(match[2]), size - 1);
  if (start >= size || end < start) {
    throw new S3Failure('InvalidRange', 'The requested range is not satisfiable');
  }
  return { start, end };
}

if (isCommand(import.meta.url)) {
  const accessKeyId = process.env.S3_ACCESS_KEY_ID ?? 'local';
  void startObjectStore({
    dataDir: dataDirectory(),
    port: Number(process.env.S3_PORT ?? 0),
    accessKeyId,
  }).then(({ url, close }) => {
    console.log(JSON.stringify({ url }));
    process.once('SIGTERM', () => void close().then(() => process.exit(0)));
  });
}
