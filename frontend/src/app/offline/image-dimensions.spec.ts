import { describe, expect, it } from '@jest/globals';
import { imageDimensions } from './image-dimensions';

const bufferOf = (...bytes: number[]): ArrayBuffer =>
  Uint8Array.from([...bytes, ...Array.from({ length: 24 }, () => 0)]).buffer;

describe('imageDimensions', () => {
  it('reads a JPEG past its other segments', () => {
    const file = bufferOf(
      ...[0xff, 0xd8],
      ...[0xff, 0xe1, 0, 4, 1, 2],
      ...[0xff, 0xc4, 0, 3, 9],
      ...[0xff, 0xc2, 0, 17, 8, 0x1f, 0x40, 0x2e, 0xe0],
    );
    expect(imageDimensions(file)).toEqual({ width: 12_000, height: 8_000 });
  });

  it('reads a PNG', () => {
    const head = [0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10, 0, 0, 0, 13, 0x49, 0x48, 0x44, 0x52];
    expect(imageDimensions(bufferOf(...head, 0, 0, 4, 0, 0, 0, 3, 0))).toEqual({ width: 1024, height: 768 });
  });

  it('has nothing to say about anything else', () => {
    expect(imageDimensions(bufferOf(1, 2, 3))).toBeNull();
    expect(imageDimensions(bufferOf(0xff, 0xd8, 1, 2))).toBeNull();
    expect(imageDimensions(new ArrayBuffer(3))).toBeNull();
  });
});
