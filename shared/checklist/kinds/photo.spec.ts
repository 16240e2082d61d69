import { describe, expect, it } from '@jest/globals';
import { judge } from '../judge';
import { buildStep, SEA_LEVEL } from '../step.fixture';
import { photoAnswerSchema, type PhotoRef } from './photo';

const photo = (digit: string, change: Partial<PhotoRef> = {}): PhotoRef => ({
  sha256: digit.repeat(64),
  originalSha256: null,
  bytes: 200_000,
  width: 2048,
  height: 1536,
  capturedAt: '2027-01-15T18:20:00Z',
  ...change,
});

const photos = (minCount: number, list: PhotoRef[]) =>
  judge(buildStep('photo', { minCount }), { kind: 'photo', photos: list }, SEA_LEVEL);

describe('judge of photos', () => {
  it('records as many as were asked for, and more', () => {
    expect(photos(2, [photo('a'), photo('b')])).toMatchObject({ outcome: 'recorded', counts: true });
    expect(photos(1, [photo('a'), photo('b')]).counts).toBe(true);
  });

  it('does not count too few', () => {
    expect(photos(2, [photo('a')])).toMatchObject({
      counts: false,
      doubts: [{ kind: 'tooFewPhotos', severity: 'refuse' }],
    });
  });

  it('does not count the same picture twice', () => {
    expect(photos(2, [photo('a'), photo('a', { capturedAt: null })]).counts).toBe(false);
  });

  it.each([
    ['no picture at all', { photos: [] }],
    ['more than 20 pictures', { photos: Array.from({ length: 21 }, () => photo('a')) }],
    ['a picture without bytes', { photos: [photo('a', { bytes: 0 })] }],
    ['a picture above the upload limit', { photos: [photo('a', { bytes: 15_000_001 })] }],
    ['a hash in capitals', { photos: [photo('A')] }],
  ])('has no form for %s', (_name, rest) => {
    expect(photoAnswerSchema.safeParse({ kind: 'photo', ...rest }).success).toBe(false);
  });
});
