import { createHash } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from '@jest/globals';
import { Jimp, JimpMime } from 'jimp';
import type { SequenceId } from '#shared/plant/ids';
import { checkJpeg } from '../files/jpeg-check';
import { drawDemoPhoto } from '../demo/demo-photo';
import { steadyNumbers } from '../demo/steady-numbers';
import type { TestClient } from '../testing/test-client';
import { startTestServer, type TestServer } from '../testing/test-server';
import { importSmallSchedule, makeStore, type TestStore } from '../testing/test-store';
import { until } from '../testing/until';

let server: TestServer;
let store: TestStore;
let id: SequenceId;
let installer: TestClient;
let photo: Buffer;

beforeAll(async () => {
  server = await startTestServer({ jobs: true });
  store = await makeStore(server, 'photos');
  id = (await importSmallSchedule(server, store)).get('A1') as SequenceId;
  installer = await store.client('installer');
  photo = await drawDemoPhoto(steadyNumbers(3), 640);
}, 60_000);

afterAll(() => server.close());

const hashOf = (bytes: Buffer): string => createHash('sha256').update(bytes).digest('hex');
const stateOf = async (sha256: string): Promise<string | undefined> =>
  (await server.sql<{ state: string }>('SELECT state FROM photo WHERE sha256 = ?', [sha256]))[0]?.state;

/** Puts a marker segment behind the start of a JPEG. */
function withSegment(jpeg: Buffer, marker: number, content: Buffer): Buffer {
  const head = Buffer.from([0xff, marker, 0, 0]);
  head.writeUInt16BE(content.length + 2, 2);
  return Buffer.concat([jpeg.subarray(0, 2), head, content, jpeg.subarray(2)]);
}

/** Writes another size into a JPEG's frame header. */
function withSize(jpeg: Buffer, width: number, height: number): Buffer {
  const copy = Buffer.from(jpeg);
  const frame = copy.indexOf(Buffer.from([0xff, 0xc0]));
  copy.writeUInt16BE(height, frame + 5);
  copy.writeUInt16BE(width, frame + 7);
  return copy;
}

describe('PUT /sequences/:sequenceId/photos/:sha256', () => {
  it('keeps exactly the bytes that were sent, and says when it has them already', async () => {
    expect((await installer.addPhoto(id, photo)).body).toEqual({
      sha256: hashOf(photo),
      alreadyThere: false,
    });
    expect((await installer.addPhoto(id, photo)).body.alreadyThere).toBe(true);
    const back = await installer.get(`/api/sequences/${id}/photos/${hashOf(photo)}`).buffer(true);
    expect(back.headers['content-type']).toBe('image/jpeg');
    expect(hashOf(back.body as Buffer)).toBe(hashOf(photo));
  });

  it('has a job look at it fully and make its thumbnail', async () => {
    await until(async () => (await stateOf(hashOf(photo))) === 'checked');
    const small = await installer
      .get(`/api/sequences/${id}/photos/${hashOf(photo)}?size=thumbnail`)
      .buffer(true);
    expect(checkJpeg(small.body as Buffer)).toEqual({ width: 320, height: 240 });
  });

  it('finds a photo broken whose markers are right and whose picture is not', async () => {
    const broken = Buffer.from(photo);
    // A second start-of-frame where the tables should be: readable markers, no decodable picture.
    const tables = broken.indexOf(Buffer.from([0xff, 0xc4]));
    broken.fill(0x11, tables + 4, tables + 24);
    expect((await installer.addPhoto(id, broken)).status).toBe(200);
    await until(async () => (await stateOf(hashOf(broken))) === 'broken');
  });

  it.each([
    ['is no image', () => Buffer.from('%PDF-1.7 not a photo'), 415, 'notAnImage'],
    ['is a PNG', () => Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex'), 415, 'notAnImage'],
    ['is cut off half-way', () => photo.subarray(0, photo.length >> 1), 415, 'notAnImage'],
    ['has 40 megapixels', () => withSize(photo, 8000, 5000), 413, 'tooLarge'],
    ['holds other application data', () => withSegment(photo, 0xed, Buffer.from('Photo')), 415, 'notAnImage'],
    [
      'still holds camera metadata',
      () => withSegment(photo, 0xe1, Buffer.from('Exif\0\0')),
      415,
      'notAnImage',
    ],
    ['has no frame', () => Buffer.from('ffd8ffd9', 'hex'), 415, 'notAnImage'],
    [
      'is larger than 12 MB',
      () => withSegment(Buffer.alloc(12_100_000, 1), 0xe0, Buffer.alloc(2)),
      413,
      'tooLarge',
    ],
    ['is empty', () => Buffer.alloc(0), 415, 'notAnImage'],
  ] as const)('refuses a file that %s', async (_what, make, status, code) => {
    const bytes = make();
    const response = await installer.addPhoto(id, bytes);
    expect([response.status, response.body.code]).toEqual([status, code]);
    expect(await stateOf(hashOf(bytes))).toBeUndefined();
  });

  it('refuses bytes that were changed on the way', async () => {
    const path = `/api/sequences/${id}/photos/${'b'.repeat(64)}`;
    const response = await installer.upload('put', path, 'photo', photo, 'photo.jpg');
    expect([response.status, response.body.code]).toEqual([400, 'invalidInput']);
  });

  it('takes nothing from a contractor or a stranger, and says nothing to them', async () => {
    const other = await makeStore(server, 'photostrangers');
    for (const client of [await store.client('contractor'), await other.client('installer')]) {
      const response = await client.addPhoto(id, await drawDemoPhoto(steadyNumbers(5), 64));
      expect([response.status, response.body.code]).toEqual([404, 'notFound']);
    }
  });

  it('takes what somebody recorded before their role ended', async () => {
    const phone = await store.client('installer');
    await server.services.register.endMember(store.openingId, store.people.installer.id);
    const late = await drawDemoPhoto(steadyNumbers(6), 64);
    expect((await phone.addPhoto(id, late)).status).toBe(200);
    await server.sql('UPDATE membership SET ended_at = NULL');
  });

  it('refuses a request without a file, in words', async () => {
    const response = await installer.send('put', `/api/sequences/${id}/photos/${'c'.repeat(64)}`, {});
    expect(response.status).toBe(400);
    expect(response.body.detail).toContain('photo');
  });

  it('shows a photo of a wide picture upright and small enough for a document', async () => {
    const wide = await new Jimp({ width: 1800, height: 600, color: 0x336699ff }).getBuffer(JimpMime.jpeg);
    await installer.addPhoto(id, wide);
    await until(async () => (await stateOf(hashOf(wide))) === 'checked');
    const print = await server.services.photos.readForPrint(id, hashOf(wide));
    expect(checkJpeg(print as Buffer)).toEqual({ width: 1200, height: 400 });
  });
});
