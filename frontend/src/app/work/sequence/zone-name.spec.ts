import { describe, expect, it } from '@jest/globals';
import { zoneName } from './zone-name';

describe('zoneName', () => {
  it('is the name that holds on that day', () => {
    expect(zoneName('2026-01-02T12:00:00Z', 'America/Chicago', 'en')).toBe('CST');
    expect(zoneName('2026-07-02T12:00:00Z', 'America/Chicago', 'en')).toBe('CDT');
  });

  it('is empty for a zone or a moment that is none', () => {
    expect(zoneName('2026-07-02T12:00:00Z', 'Nowhere/Atall', 'en')).toBe('');
    expect(zoneName('soon', 'America/Chicago', 'en')).toBe('');
  });
});
