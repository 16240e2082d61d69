import { describe, expect, it } from '@jest/globals';
import { NOTHING_SELECTED, toggle, toggleAll } from './circuit-selection';

const shown = ['a', 'b', 'c', 'd'];

describe('toggle', () => {
  it('selects a range from the row before, either way round', () => {
    const down = toggle(toggle(NOTHING_SELECTED, shown, 'a', false), shown, 'c', true);
    expect([...down.ids]).toEqual(['a', 'b', 'c']);
    const up = toggle(toggle(NOTHING_SELECTED, shown, 'd', false), shown, 'b', true);
    expect([...up.ids].sort()).toEqual(['b', 'c', 'd']);
  });

  it('frees a range that ends on a selected row', () => {
    const all = toggleAll(NOTHING_SELECTED, shown);
    const freed = toggle(toggle(all, shown, 'a', false), shown, 'b', true);
    expect([...freed.ids]).toEqual(['c', 'd']);
  });

  it('never reaches rows that are not shown', () => {
    const one = toggle(NOTHING_SELECTED, shown, 'a', false);
    expect([...toggle(one, ['a', 'd'], 'd', true).ids]).toEqual(['a', 'd']);
  });

  it('takes one row alone when the anchor is hidden', () => {
    const one = toggle(NOTHING_SELECTED, shown, 'a', false);
    expect([...toggle(one, ['c', 'd'], 'd', true).ids]).toEqual(['a', 'd']);
  });
});

describe('toggleAll', () => {
  it('selects all shown, then frees them, and leaves hidden ones alone', () => {
    const hidden = toggle(NOTHING_SELECTED, shown, 'a', false);
    const all = toggleAll(hidden, ['c', 'd']);
    expect([...all.ids]).toEqual(['a', 'c', 'd']);
    expect([...toggleAll(all, ['c', 'd']).ids]).toEqual(['a']);
  });
});
