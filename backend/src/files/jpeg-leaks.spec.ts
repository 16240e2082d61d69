import { describe, expect, it } from '@jest/globals';
import { checkJpeg } from './jpeg-check';

const segment = (marker: number, text: string) => {
  const body = Buffer.from(text, 'latin1');
  return Buffer.concat([Buffer.from([0xff, marker, 0, body.length + 2]), body]);
};
const FRAME = segment(0xc0, '\x08\0\x64\0\x64\x03\x01\x11\0\x02\x11\x01\x03\x11\x01');
const SCAN = Buffer.concat([segment(0xda, '\x03\x01\0\x02\x11\x03\x11\0\x3f\0'), Buffer.alloc(100, 0x55)]);

const picture = (...parts: Buffer[]) =>
  Buffer.concat([Buffer.from([0xff, 0xd8]), ...parts, Buffer.from([0xff, 0xd9])]);

describe('checkJpeg on what should have been taken out', () => {
  it('takes a picture without it', () => {
    expect(checkJpeg(picture(FRAME, SCAN))).toEqual({ width: 100, height: 100 });
  });

  it.each([
    ['camera metadata (APP1) behind the frame', picture(FRAME, segment(0xe1, 'Exif\0\0GPS'), SCAN)],
    ['captions with a place (APP13)', picture(segment(0xed, 'Photoshop 3.0\0City'), FRAME, SCAN)],
  ])('refuses %s', (_name, bytes) => {
    expect(() => checkJpeg(bytes)).toThrow(expect.objectContaining({ code: 'notAnImage' }));
  });

  it('refuses a picture of a few bytes without its end', () => {
    expect(() => checkJpeg(picture(FRAME).subarray(0, 21))).toThrow(
      expect.objectContaining({ code: 'notAnImage' }),
    );
  });
});
