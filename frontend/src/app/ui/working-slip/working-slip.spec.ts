import { describe, expect, it } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import { withWords } from '../words/with-words.fixture';
import { WorkingSlip } from './working-slip';
import { shortSource, workingLines } from './working-text';

const working = {
  formula: 'superheatFromDew',
  source: 'Dew table of R-448A; a long paper, 1999',
  lines: [
    { label: 'suctionPressure', value: 200_000, unit: 'Pag' as const },
    { label: 'superheat', value: 5, unit: 'K_diff' as const },
  ],
};

describe('workingLines', () => {
  it('shows each line in the units of the opening', () => {
    expect(workingLines(working, 'us', 'en').map(({ text }) => text)).toEqual(['29.0 psig', '9.0 °F']);
    expect(workingLines(working, 'si', 'es').map(({ text }) => text)).toEqual(['2.00 bar(g)', '5.0 K']);
  });
});

describe('shortSource', () => {
  it('is what a citation begins with', () => {
    expect(shortSource('R-448A, REFTAB 1; first paper; second paper')).toBe('R-448A, REFTAB 1');
    expect(shortSource('Dew table')).toBe('Dew table');
  });
});

describe('WorkingSlip', () => {
  it('names formula, lines and source, closed until it is asked for', async () => {
    TestBed.configureTestingModule({ imports: [WorkingSlip, withWords()] });
    const fixture = TestBed.createComponent(WorkingSlip);
    fixture.componentRef.setInput('working', [working]);
    fixture.componentRef.setInput('unitSystem', 'us');
    await fixture.whenStable();
    const root = fixture.nativeElement as HTMLElement;
    expect(root.querySelector('details')?.open).toBe(false);
    expect(root.textContent).toContain('Superheat = line temperature');
    expect(root.querySelector('p.source')?.textContent).toBe('Source: Dew table of R-448A');
    expect(root.querySelector<HTMLDetailsElement>('details.source')?.open).toBe(false);
    expect(root.querySelector('details.source p')?.textContent).toBe(working.source);
    expect(root.querySelector('.result')?.textContent).toContain('9.0 °F');
  });
});
