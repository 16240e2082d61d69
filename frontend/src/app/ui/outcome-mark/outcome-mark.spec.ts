import { describe, expect, it } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import { withWords } from '../words/with-words.fixture';
import { drawOutcome } from './outcome-drawing';
import { OutcomeMark } from './outcome-mark';

describe('drawOutcome', () => {
  it('gives every outcome a shape of its own', () => {
    const outcomes = ['within', 'outside', 'recorded', 'notApplicable', 'waiting'] as const;
    expect(new Set(outcomes.map((outcome) => JSON.stringify(drawOutcome(outcome, null)))).size).toBe(5);
  });

  it('points the wedge to the side on which the value lies', () => {
    expect(drawOutcome('outside', 'low').solid).toMatch(/^M1 10/);
    expect(drawOutcome('outside', 'high').solid).toMatch(/^M19 10/);
  });
});

describe('OutcomeMark', () => {
  async function render(inputs: Record<string, unknown>): Promise<HTMLElement> {
    TestBed.configureTestingModule({ imports: [OutcomeMark, withWords()] });
    const fixture = TestBed.createComponent(OutcomeMark);
    for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
    await fixture.whenStable();
    return fixture.nativeElement as HTMLElement;
  }

  it('says the outcome with its side', async () => {
    expect((await render({ outcome: 'outside', side: 'high' })).textContent?.trim()).toBe('Outside, high');
  });

  it('keeps the word for screen readers where it is not seen', async () => {
    const mark = await render({ outcome: 'notApplicable', withWord: false });
    expect(mark.querySelector('.heard-only')?.textContent).toBe('Not applicable');
  });
});
