import { beforeEach, describe, expect, it, jest } from '@jest/globals';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { withWords } from '../words/with-words.fixture';
import { SignatureBox } from './signature-box';

describe('SignatureBox where nothing can be drawn', () => {
  let fixture: ComponentFixture<SignatureBox>;
  const root = (): HTMLElement => fixture.nativeElement as HTMLElement;

  async function type(name: string): Promise<void> {
    const input = root().querySelector('input');
    if (!input) throw new Error('no box to type in');
    input.value = name;
    input.dispatchEvent(new Event('input'));
    await fixture.whenStable();
  }

  beforeEach(async () => {
    jest.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null);
    TestBed.configureTestingModule({ imports: [SignatureBox, withWords()] });
    fixture = TestBed.createComponent(SignatureBox);
    fixture.componentRef.setInput('meaning', 'Reviewed and approved');
    fixture.componentRef.setInput('printedName', 'Inés Vega');
    await fixture.whenStable();
  });

  it('says what signing means and offers the typed way', () => {
    expect(root().querySelector('legend')?.textContent).toBe('Reviewed and approved');
    expect(root().querySelector('label')?.textContent).toContain('Inés Vega');
  });

  it('is signed once the printed name is typed', async () => {
    await type('ines vega');
    expect(fixture.componentInstance.signature()).toEqual({
      printedName: 'Inés Vega',
      width: 300,
      height: 120,
      strokes: [],
      typed: true,
    });
  });

  it('is not signed by another name, and no more when the name is changed', async () => {
    await type('Inés Vega');
    await type('Inés V');
    expect(fixture.componentInstance.signature()).toBeNull();
  });
});
