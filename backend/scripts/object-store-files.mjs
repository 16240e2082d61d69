import { createHash, randomBytes } from 'node:crypto';
import fs from 'node:fs';
import { mkdir, open, readdir, readFile, rename, rm, stat } from 'node:fs/promises';
import path from 'node:path';
import { pipeline } from 'node:stream/promises';
import { S3Failure } from './object-store-replies.mjs';

/**
 * What is kept beside the bytes of an object.
 * @typedef {object} StoredObject
 * @property {string} key
 * @property {string} file name of the file with the bytes
 * @property {number} size
 * @property {string} md5 in hex; the ETag
 * @property {string} lastModified ISO 8601
 * @property {Record<string, string>} headers what the client wants back: content type, own metadata, checksums
 */

/**
 * Objects on the disk. A key never becomes part of a path: files are named by the key's SHA-256, so no
 * key can be too long, leave the folder, or clash on a system that ignores case.
 *
 * Each object is two files: the bytes under a fresh name, and a small JSON file that points to them.
 * Renaming the JSON file is the one step that makes an upload visible; whatever interrupts before it
 * leaves the old object whole.
 */
export class ObjectFiles {
  /** @param {string} root */
  constructor(root) {
    this.root = root;
    /** @type {Map<string, Map<string, StoredObject>>} what listings are made from; filled at the first one */
    this.listed = new Map();
  }

  /** @param {string} bucket */
  async createBucket(bucket) {
    await mkdir(path.join(this.root, bucketName(bucket)), { recursive: true, mode: 0o700 });
  }

  /** @param {string} bucket */
  async requireBucket(bucket) {
    const found = await stat(path.join(this.root, bucketName(bucket))).catch(() => undefined);
    if (!found?.isDirectory()) {
      throw new S3Failure('NoSuchBucket', 'The specified bucket does not exist');
    }
  }

  /**
   * @param {string} bucket
   * @param {string} key
   * @returns {Promise<StoredObject>}
   */
  async describe(bucket, key) {
    await this.requireBucket(bucket);
    try {
      return JSON.parse(await readFile(this.cardOf(bucket, key), 'utf8'));
    } catch (error) {
      if (/** @type {NodeJS.ErrnoException} */ (error).code === 'ENOENT') {
        throw new S3Failure('NoSuchKey', 'The specified key does not exist.');
      }
      throw error;
    }
  }

  /**
   * Opens the bytes of an object. When the object is replaced between reading its card and opening its
   * file, the new one is taken.
   * @param {string} bucket
   * @param {string} key
   * @returns {Promise<{ object: StoredObject, handle: import('node:fs/promises').FileHandle }>}
   */
  async open(bucket, key) {
    for (let attempt = 1; ; attempt += 1) {
      const object = await this.describe(bucket, key);
      try {
        return { object, handle: await open(path.join(this.folderOf(bucket, key), object.file), 'r') };
      } catch (error) {
        if (attempt === 5 || /** @type {NodeJS.ErrnoException} */ (error).code !== 'ENOENT') {
          throw error;
        }
      }
    }
  }

  /**
   * Stores an object: durable on the disk when this resolves.
   * @param {string} bucket
   * @param {string} key
   * @param {Array<NodeJS.ReadableStream | NodeJS.ReadWriteStream>} source streams, to be piped in this order
   * @param {() => { md5: string, headers: Record<string, string> }} finish called when all bytes are there;
   *   may throw to refuse them
   * @returns {Promise<StoredObject>}
   */
  async put(bucket, key, source, finish) {
    await this.requireBucket(bucket);
    const folder = this.folderOf(bucket, key);
    await mkdir(folder, { recursive: true, mode: 0o700 });
    const file = `${hashOf(key)}.${randomBytes(6).toString('hex')}.bytes`;
    const target = path.join(folder, file);
    try {
      await pipeline([...source, fs.createWriteStream(target, { flags: 'wx', mode: 0o600, flush: true })]);
      const { md5, headers } = finish();
      const { size } = await stat(target);
      const object = { key, file, size, md5, lastModified: new Date().toISOString(), headers };
      await this.publish(bucket, object, folder);
      return object;
    } catch (error) {
      await rm(target, { force: true });
      throw error;
    }
  }

  /**
   * @param {string} bucket
   * @param {StoredObject} object
   * @param {string} folder
   */
  async publish(bucket, object, folder) {
    const previous = await this.describe(bucket, object.key).catch(() => undefined);
    const draft = path.join(folder, `${object.file}.card`);
    const handle = await open(draft, 'w', 0o600);
    try {
      await handle.writeFile(JSON.stringify(object));
      await handle.sync();
    } finally {
      await handle.close();
    }
    await rename(draft, this.cardOf(bucket, object.key));
    await syncDirectory(folder);
    this.listed.get(bucket)?.set(object.key, object);
    if (previous) {
      await rm(path.join(folder, previous.file), { force: true });
    }
  }

  /**
   * Deleting what is not there is fine, as in S3.
   * @param {string} bucket
   * @param {string} key
   */
  async remove(bucket, key) {
    await this.requireBucket(bucket);
    const object = await this.describe(bucket, key).catch(() => undefined);
    if (object) {
      const folder = this.folderOf(bucket, key);
      await rm(this.cardOf(bucket, key), { force: true });
      await rm(path.join(folder, object.file), { force: true });
      await syncDirectory(folder);
      this.listed.get(bucket)?.delete(key);
    }
  }

  /**
   * All objects of a bucket in the order of their keys' UTF-8 bytes, which is S3's.
   * @param {string} bucket
   * @returns {Promise<StoredObject[]>}
   */
  async list(bucket) {
    await this.requireBucket(bucket);
    let known = this.listed.get(bucket);
    if (!known) {
      known = await this.readBucket(bucket);
      this.listed.set(bucket, known);
    }
    return [...known.values()].sort((a, b) => Buffer.compare(Buffer.from(a.key), Buffer.from(b.key)));
  }

  /** @param {string} bucket */
  async readBucket(bucket) {
    const root = path.join(this.root, bucketName(bucket));
    /** @type {Map<string, StoredObject>} */
    const found = new Map();
    for (const entry of await readdir(root, { recursive: true })) {
      if (entry.endsWith('.json')) {
        const object = JSON.parse(await readFile(path.join(root, entry), 'utf8'));
        found.set(object.key, object);
      }
    }
    return found;
  }

  /**
   * @param {string} bucket
   * @param {string} key
   */
  folderOf(bucket, key) {
    return path.join(this.root, bucketName(bucket), hashOf(key).slice(0, 2));
  }

  /**
   * @param {string} bucket
   * @param {string} key
   */
  cardOf(bucket, key) {
    return path.join(this.folderOf(bucket, key), `${hashOf(key)}.json`);
  }
}

/**
 * @param {string} bucket
 * @returns {string} the same name, which is then safe as the name of a folder
 */
function bucketName(bucket) {
  if (!/^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/.test(bucket) || bucket.includes('..')) {
    throw new S3Failure('InvalidBucketName', 'The specified bucket is not valid.');
  }
  return bucket;
}

/** @param {string} key */
function hashOf(key) {
  return createHash('sha256').update(key).digest('hex');
}

/** @param {string} directory a rename survives a power cut only once its folder is on the disk */
async function syncDirectory(directory) {
  const handle = await open(directory, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}
