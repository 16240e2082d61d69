import { beforeEach, describe, expect, it } from '@jest/globals';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { withWords } from '../words/with-words.fixture';
import { CopperLine } from './copper-line';

describe('CopperLine', () => {
  let fixture: ComponentFixture<CopperLine>;
  const root = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const buttons = (): HTMLButtonElement[] => [...root().querySelectorAll('button')];

  beforeEach(async () => {
    TestBed.configureTestingModule({ imports: [CopperLine, withWords()] });
    fixture = TestBed.createComponent(CopperLine);
    fixture.componentRef.setInput('label', 'Rack A');
    fixture.componentRef.setInput('joints', [
      { label: 'A1', state: 'approved' },
      { label: 'A2', state: 'sentBack' },
      { label: 'A3', state: 'open' },
    ]);
    await fixture.whenStable();
  });

  it('says each joint with its state in words', () => {
    expect(buttons().map((button) => button.getAttribute('aria-label'))).toEqual([
      'A1, Approved',
      'A2, Sent back',
      'A3, Not begun',
    ]);
  });

  it('is one Tab stop that the arrow keys move along', async () => {
    const [first, second] = buttons();
    first?.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowRight', bubbles: true }));
    await fixture.whenStable();
    expect(buttons().map((button) => button.tabIndex)).toEqual([-1, 0, -1]);
    expect(document.activeElement).toBe(second);
  });

  it('emits the index of the joint that is picked', () => {
    const picked: number[] = [];
    fixture.componentInstance.pick.subscribe((index) => picked.push(index));
    buttons()[2]?.click();
    expect(picked).toEqual([2]);
  });

  it('is a picture with one sentence when small', async () => {
    fixture.componentRef.setInput('size', 'small');
    await fixture.whenStable();
    expect(buttons()).toEqual([]);
    const label = root().querySelector('[role="img"]')?.getAttribute('aria-label');
    expect(label).toBe('Rack A: 1 approved, 1 sent back, 1 not begun');
  });
});
