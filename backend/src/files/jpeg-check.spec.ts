import { describe, expect, it } from '@jest/globals';
import fc from 'fast-check';
import { DomainFailure } from '#shared/failures/failure';
import { drawDemoPhoto } from '../demo/demo-photo';
import { checkJpeg } from './jpeg-check';

const segment = (marker: number, body: Buffer) =>
  Buffer.concat([Buffer.from([0xff, marker, (body.length + 2) >> 8, (body.length + 2) & 255]), body]);

const START = Buffer.from([0xff, 0xd8]);
const END = Buffer.from([0xff, 0xd9]);
const JFIF = segment(0xe0, Buffer.from('JFIF\0\x01\x01\0\0\x01\0\x01\0\0', 'latin1'));
const EXIF = segment(0xe1, Buffer.from('Exif\0\0GPS', 'latin1'));
/** A scan header (B.2.3) and what could be its data. */
const SCAN = Buffer.concat([segment(0xda, Buffer.alloc(10, 1)), Buffer.alloc(200, 0x55)]);

/** A frame header (ITU-T T.81, B.2.2): precision, lines, samples a line, three components. */
function frame(width: number, height: number, marker = 0xc0): Buffer {
  const body = Buffer.alloc(15, 1);
  body.writeUInt8(8, 0);
  body.writeUInt16BE(height, 1);
  body.writeUInt16BE(width, 3);
  return segment(marker, body);
}

const picture = (...parts: Buffer[]) => Buffer.concat([START, ...parts, SCAN, END]);

function codeFor(bytes: Buffer): string {
  try {
    checkJpeg(bytes);
    return 'taken';
  } catch (error) {
    if (error instanceof DomainFailure) return error.code;
    throw error;
  }
}

describe('checkJpeg', () => {
  it('gives the size of a real picture', async () => {
    let seed = 1;
    const bytes = await drawDemoPhoto(() => (seed = (seed * 16_807) % 2_147_483_647) / 2_147_483_647, 160);
    expect(checkJpeg(bytes)).toEqual({ width: 160, height: 120 });
    expect(codeFor(bytes.subarray(0, bytes.length - 100))).toBe('notAnImage');
  });

  it.each([0xc0, 0xc1, 0xc2])(
    'reads a frame of the kind %i, behind other segments and fill bytes',
    (marker) => {
      const fill = Buffer.from([0xff, 0xff]);
      expect(
        checkJpeg(picture(JFIF, segment(0xdb, Buffer.alloc(65)), fill, frame(2048, 1536, marker))),
      ).toEqual({
        width: 2048,
        height: 1536,
      });
    },
  );

  it('does not take a Huffman table for a frame', () => {
    expect(codeFor(picture(segment(0xc4, Buffer.alloc(15, 1))))).toBe('notAnImage');
  });

  it.each([
    ['nothing', Buffer.alloc(0)],
    ['a PNG picture', Buffer.concat([Buffer.from('\x89PNG\r\n\x1a\n', 'latin1'), Buffer.alloc(300), END])],
    ['a page', Buffer.from(`<script>alert(1)</script>${' '.repeat(300)}`)],
    ['a picture without a frame', picture(JFIF)],
    ['a picture without lines', picture(frame(100, 0))],
    ['a picture whose end is missing', Buffer.concat([START, JFIF, frame(100, 100), SCAN])],
    ['a picture with a film behind it', Buffer.concat([picture(frame(100, 100)), Buffer.alloc(5000, 7)])],
    [
      'a segment that points outside',
      Buffer.concat([START, Buffer.from([0xff, 0xe0, 0xff, 0xff]), SCAN, END]),
    ],
    ['a picture with camera metadata', picture(EXIF, frame(100, 100))],
  ])('refuses %s', (_name, bytes) => {
    expect(codeFor(bytes)).toBe('notAnImage');
  });

  it.each([
    [4999, 4000, 'taken'],
    [5000, 4000, 'tooLarge'],
    [65_535, 65_535, 'tooLarge'],
  ])('answers to %i × %i pixels: %s', (width, height, code) => {
    expect(codeFor(picture(JFIF, frame(width, height)))).toBe(code);
  });

  it.each([
    ['camera metadata (APP1) behind the frame', picture(frame(100, 100), EXIF)],
    [
      'captions with a place (APP13)',
      picture(segment(0xed, Buffer.from('Photoshop 3.0\0City')), frame(100, 100)),
    ],
  ])('refuses %s, which should have been taken out', (_name, bytes) => {
    expect(codeFor(bytes)).toBe('notAnImage');
  });

  it('takes a colour profile (APP2) and a colour transform (APP14)', () => {
    const extras = [segment(0xe2, Buffer.from('ICC_PROFILE\0')), segment(0xee, Buffer.from('Adobe'))];
    expect(codeFor(picture(JFIF, ...extras, frame(100, 100)))).toBe('taken');
  });

  it('refuses a picture of a few bytes without its end', () => {
    expect(codeFor(Buffer.concat([START, frame(9, 9), segment(0xda, Buffer.alloc(10, 1))]))).toBe(
      'notAnImage',
    );
  });

  it('has a failure for any bytes, never an error of its own', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 400 }), fc.nat(20), (noise, cut) => {
        const whole = picture(JFIF, Buffer.from(noise));
        expect(['taken', 'notAnImage', 'tooLarge']).toContain(codeFor(whole.subarray(0, whole.length - cut)));
      }),
      { numRuns: 2000 },
    );
  });
});
