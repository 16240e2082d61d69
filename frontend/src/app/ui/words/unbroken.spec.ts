import { describe, expect, it } from '@jest/globals';
import { unbroken } from './unbroken';

describe('unbroken', () => {
  it.each([
    ['Superheat of AS-1', 'Superheat of AS-\u20601'],
    ['Within 5 °F of 24 °F', 'Within 5\u00a0°F of 24\u00a0°F'],
    ['at 45 psig for 10 min', 'at 45\u00a0psig for 10\u00a0min'],
    ['pump-down, then 3 coils', 'pump-down, then 3 coils'],
    ['5 minutes', '5 minutes'],
  ])('keeps codes and quantities of %p on one line', (text, shown) => {
    expect(unbroken(text)).toBe(shown);
  });
});
