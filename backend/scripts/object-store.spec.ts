import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import {
  CreateBucketCommand,
  DeleteObjectCommand,
  GetObjectCommand,
  HeadBucketCommand,
  HeadObjectCommand,
  ListObjectsV2Command,
  PutObjectCommand,
  S3Client,
} from '@aws-sdk/client-s3';
import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';

const Bucket = 'firstcold';
const bytes = Buffer.from(Array.from({ length: 300_000 }, (_, index) => (index * 7 + (index >> 8)) % 256));

let dataDir: string;
let store: ChildProcess;
let url: string;
let s3: S3Client;

/** Starts the stand-in as its own process, the way a person would. */
async function startStore(): Promise<void> {
  store = spawn(process.execPath, [join(__dirname, 'object-store.mjs')], {
    env: { ...process.env, DATA_DIR: dataDir, S3_ACCESS_KEY_ID: 'test-key' },
    stdio: ['ignore', 'pipe', 'inherit'],
  });
  const [line] = (await once(store.stdout!, 'data')) as [Buffer];
  url = (JSON.parse(String(line)) as { url: string }).url;
  s3 = connect('test-key');
}

async function stopStore(): Promise<void> {
  s3.destroy();
  const exited = once(store, 'exit');
  store.kill('SIGTERM');
  await exited;
}

function connect(accessKeyId: string): S3Client {
  return new S3Client({
    endpoint: url,
    region: 'local',
    forcePathStyle: true,
    maxAttempts: 1,
    credentials: { accessKeyId, secretAccessKey: 'anything' },
  });
}

/** Pieces of odd sizes, so that chunk borders fall anywhere. */
function streamOf(content: Buffer): Readable {
  return Readable.from(
    (function* pieces() {
      for (let start = 0; start < content.length; start += 65_431) {
        yield content.subarray(start, start + 65_431);
      }
    })(),
  );
}

async function read(Key: string, Range?: string): Promise<Buffer> {
  const { Body } = await s3.send(new GetObjectCommand({ Bucket, Key, Range }));
  return Buffer.from(await Body!.transformToByteArray());
}

beforeAll(async () => {
  dataDir = mkdtempSync(join(tmpdir(), 'firstcold-objects-'));
  await startStore();
  await s3.send(new CreateBucketCommand({ Bucket }));
});

afterAll(async () => {
  await stopStore();
  rmSync(dataDir, { recursive: true });
});

describe('the local object store', () => {
  it('gives back a buffer byte for byte, with its type and metadata', async () => {
    await s3.send(
      new PutObjectCommand({
        Bucket,
        Key: 'buffer',
        Body: bytes,
        ContentType: 'image/jpeg',
        Metadata: { a: 'b' },
      }),
    );
    expect((await read('buffer')).equals(bytes)).toBe(true);
    const head = await s3.send(new HeadObjectCommand({ Bucket, Key: 'buffer' }));
    expect(head).toMatchObject({ ContentLength: 300_000, ContentType: 'image/jpeg', Metadata: { a: 'b' } });
    expect(head.ETag).toMatch(/^"[0-9a-f]{32}"$/);
  });

  it('takes the chunk headers out of a stream sent with the default checksums', async () => {
    await s3.send(
      new PutObjectCommand({ Bucket, Key: 'stream', Body: streamOf(bytes), ContentLength: bytes.length }),
    );
    expect((await read('stream')).equals(bytes)).toBe(true);
  });

  it('stores an empty object', async () => {
    await s3.send(new PutObjectCommand({ Bucket, Key: 'empty', Body: Buffer.alloc(0) }));
    expect(await read('empty')).toHaveLength(0);
  });

  it.each([
    ['bytes=10-19', 10, 20],
    ['bytes=299990-', 299_990, 300_000],
    ['bytes=-5', 299_995, 300_000],
    ['bytes=299990-400000', 299_990, 300_000],
  ])('answers the range %s', async (range, start, end) => {
    await s3.send(new PutObjectCommand({ Bucket, Key: 'range', Body: bytes }));
    expect((await read('range', range)).equals(bytes.subarray(start, end))).toBe(true);
  });

  it('refuses a range behind the end', async () => {
    await s3.send(new PutObjectCommand({ Bucket, Key: 'range', Body: bytes }));
    await expect(read('range', 'bytes=300000-')).rejects.toMatchObject({ name: 'InvalidRange' });
  });

  it.each(['fotos/Kühlmöbel – 冷.jpg', '../../outside', 'a/./b//c', 'plus + space % and ?#', '.'])(
    'keeps the key %s as it is, inside its own folder',
    async (Key) => {
      await s3.send(new PutObjectCommand({ Bucket, Key, Body: Key }));
      expect((await read(Key)).toString('utf8')).toBe(Key);
      const { Contents } = await s3.send(new ListObjectsV2Command({ Bucket, Prefix: Key }));
      expect(Contents?.map((object) => object.Key)).toContain(Key);
      expect(readdirSync(dataDir)).toEqual(['objects']);
    },
  );

  it('replaces an object and leaves no bytes of the old one behind', async () => {
    const countFiles = () => readdirSync(dataDir, { recursive: true }).length;
    await s3.send(new PutObjectCommand({ Bucket, Key: 'replaced', Body: 'old' }));
    const before = countFiles();
    await s3.send(new PutObjectCommand({ Bucket, Key: 'replaced', Body: 'new' }));
    expect((await read('replaced')).toString()).toBe('new');
    expect(countFiles()).toBe(before);
  });

  it('does not replace an object when asked not to', async () => {
    await s3.send(new PutObjectCommand({ Bucket, Key: 'once', Body: 'first' }));
    const again = s3.send(new PutObjectCommand({ Bucket, Key: 'once', Body: 'second', IfNoneMatch: '*' }));
    await expect(again).rejects.toMatchObject({ name: 'PreconditionFailed' });
    expect((await read('once')).toString()).toBe('first');
  });
});

describe('listing', () => {
  it('pages through keys in order', async () => {
    for (const name of ['c', 'a', 'b']) {
      await s3.send(new PutObjectCommand({ Bucket, Key: `list/${name}`, Body: name }));
    }
    const first = await s3.send(new ListObjectsV2Command({ Bucket, Prefix: 'list/', MaxKeys: 2 }));
    expect(first.Contents?.map((object) => object.Key)).toEqual(['list/a', 'list/b']);
    const ContinuationToken = first.NextContinuationToken;
    const second = await s3.send(new ListObjectsV2Command({ Bucket, Prefix: 'list/', ContinuationToken }));
    expect(second.Contents?.map((object) => object.Key)).toEqual(['list/c']);
    expect(second.IsTruncated).toBe(false);
  });

  it('groups by a delimiter, also across pages', async () => {
    for (const name of ['1/a', '1/b', '2/a', 'z']) {
      await s3.send(new PutObjectCommand({ Bucket, Key: `tree/${name}`, Body: name }));
    }
    const seen: (string | undefined)[] = [];
    let ContinuationToken: string | undefined;
    do {
      const page = await s3.send(
        new ListObjectsV2Command({ Bucket, Prefix: 'tree/', Delimiter: '/', MaxKeys: 1, ContinuationToken }),
      );
      seen.push(...(page.CommonPrefixes ?? []).map((group) => group.Prefix));
      seen.push(...(page.Contents ?? []).map((object) => object.Key));
      ContinuationToken = page.NextContinuationToken;
    } while (ContinuationToken);
    expect(seen).toEqual(['tree/1/', 'tree/2/', 'tree/z']);
  });
});

describe('what is refused or absent', () => {
  it('forgets a deleted object and does not mind deleting it again', async () => {
    await s3.send(new PutObjectCommand({ Bucket, Key: 'gone', Body: 'x' }));
    await s3.send(new DeleteObjectCommand({ Bucket, Key: 'gone' }));
    await s3.send(new DeleteObjectCommand({ Bucket, Key: 'gone' }));
    await expect(read('gone')).rejects.toMatchObject({ name: 'NoSuchKey' });
    await expect(s3.send(new HeadObjectCommand({ Bucket, Key: 'gone' }))).rejects.toMatchObject({
      name: 'NotFound',
    });
  });

  it('names a missing bucket', async () => {
    const put = s3.send(new PutObjectCommand({ Bucket: 'elsewhere', Key: 'a', Body: 'x' }));
    await expect(put).rejects.toMatchObject({ name: 'NoSuchBucket' });
    await expect(s3.send(new HeadBucketCommand({ Bucket: 'elsewhere' }))).rejects.toMatchObject({
      name: 'NotFound',
    });
  });

  it('turns a foreign access key away', async () => {
    const stranger = connect('another-key');
    const put = stranger.send(new PutObjectCommand({ Bucket, Key: 'a', Body: 'x' }));
    await expect(put).rejects.toMatchObject({ name: 'InvalidAccessKeyId' });
    expect((await fetch(`${url}/${Bucket}/buffer`)).status).toBe(403);
  });

  it('keeps nothing of an upload whose checksum does not fit', async () => {
    const Key = 'broken';
    const put = s3.send(new PutObjectCommand({ Bucket, Key, Body: 'x', ChecksumCRC32: 'AAAAAA==' }));
    await expect(put).rejects.toMatchObject({ name: 'BadDigest' });
    await expect(read(Key)).rejects.toMatchObject({ name: 'NoSuchKey' });
  });
});

describe('after a restart', () => {
  it('still has everything', async () => {
    await s3.send(new PutObjectCommand({ Bucket, Key: 'kept', Body: bytes }));
    await stopStore();
    await startStore();
    expect((await read('kept')).equals(bytes)).toBe(true);
    const { Contents } = await s3.send(new ListObjectsV2Command({ Bucket, Prefix: 'kept' }));
    expect(Contents).toHaveLength(1);
  });
});
