import { describe, expect, it } from '@jest/globals';
import { DocumentFormat } from './document-format';
import { DOCUMENT_WORDS } from './document-words';

const english = new DocumentFormat('en', 'us', 'America/Chicago', DOCUMENT_WORDS.en);
const spanish = new DocumentFormat('es', 'si', 'America/Chicago', DOCUMENT_WORDS.es);
const plain = (text: string): string => text.replace(/[\u202f\u00a0]/g, ' ');

describe('DocumentFormat', () => {
  it('writes a quantity in the units of the opening', () => {
    expect(english.quantity(266.98, 'K')).toBe('20.9 °F');
    expect(spanish.quantity(266.98, 'K')).toBe('−6.2 °C');
    expect(english.quantity(5, 'K_diff')).toBe('9.0 °F');
  });
  it('writes an elevation in whole feet or metres', () => {
    expect(english.wholeLength(1608.98)).toBe('5279 ft');
    expect(spanish.wholeLength(1608.98)).toBe('1609 m');
  });
  it('writes limits with their unit once, and open ends in words', () => {
    expect(english.range(10 / 3, 50 / 9, 'temperatureDifference')).toBe('6.0 to 10.0 °F');
    expect(english.range(null, 2.4, 'electricCurrent')).toBe('at most 2.4 A');
    expect(english.range(2.4, null, 'electricCurrent')).toBe('at least 2.4 A');
    expect(english.range(null, null, 'electricCurrent')).toBe('');
  });
  it('tells whether a printed value is the very number that was typed', () => {
    expect(english.showsAsTyped({ text: '36', unit: 'degF' })).toBe(true);
    expect(english.showsAsTyped({ text: '36.25', unit: 'degF' })).toBe(false);
    expect(english.showsAsTyped({ text: '2', unit: 'degC' })).toBe(false);
  });
  it('writes times in the zone of the opening and names it', () => {
    expect(plain(english.dateTime('2026-11-24T15:20:00.000Z'))).toBe('Nov 24, 2026, 9:20 AM CST');
  });
  it('writes a calendar day without shifting it', () =>
    expect(english.day('2026-12-10')).toBe('December 10, 2026'));
  it('falls back to UTC for a zone that is unknown', () => {
    const lost = new DocumentFormat('en', 'us', 'Nowhere/Here', DOCUMENT_WORDS.en);
    expect(plain(lost.dateTime('2026-11-24T15:20:00.000Z'))).toContain('3:20 PM UTC');
  });
});
