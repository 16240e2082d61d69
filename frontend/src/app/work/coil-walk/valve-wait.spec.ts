import { describe, expect, it } from '@jest/globals';
import type { ValveTurn } from '#shared/checklist/kinds/superheat';
import { countdownText, readSince, sinceText } from './clock-text';
import { valveWait } from './valve-wait';

const NOW = Date.parse('2026-03-02T09:00:00.000Z');
const turnedAt = (minutesAgo: number): ValveTurn => ({
  turns: 0.5,
  direction: 'clockwise',
  at: new Date(NOW - minutesAgo * 60_000).toISOString(),
});

describe('valveWait', () => {
  it('is none for a valve that was not turned', () => {
    expect(valveWait([], NOW)).toBeNull();
  });

  it('counts 15 minutes from the stamp where the template says nothing', () => {
    expect(valveWait([turnedAt(4)], NOW)).toMatchObject({ remainingS: 660, isOver: false });
    expect(valveWait([turnedAt(15)], NOW)).toMatchObject({ remainingS: 0, isOver: true });
  });

  it('takes the wait of the step, and the latest turn in whatever order they stand', () => {
    expect(valveWait([turnedAt(2), turnedAt(50)], NOW, 1800)).toMatchObject({ remainingS: 1680 });
  });

  it('is over after hours of a locked phone', () => {
    expect(valveWait([turnedAt(4)], NOW + 5 * 3_600_000)).toMatchObject({ remainingS: 0, isOver: true });
  });

  it('has the whole wait ahead when the phone’s clock was put back', () => {
    expect(valveWait([turnedAt(-30)], NOW)).toMatchObject({ remainingS: 900, isOver: false });
  });
});

describe('countdownText', () => {
  it.each([
    [680, '11:20'],
    [59.2, '1:00'],
    [0, '0:00'],
    [-3, '0:00'],
  ])('of %p s is %p', (seconds, text) => {
    expect(countdownText(seconds)).toBe(text);
  });
});

describe('readSince', () => {
  it.each([
    ['4:30', 270],
    ['4', 240],
    ['0:00', 0],
    ['4:75', null],
    ['', null],
    ['soon', null],
  ])('of %p is %p', (text, seconds) => {
    expect(readSince(text)).toBe(seconds);
  });

  it('reads what it writes', () => {
    for (const seconds of [0, 30, 61, 3599, 7200]) expect(readSince(sinceText(seconds))).toBe(seconds);
  });
});
