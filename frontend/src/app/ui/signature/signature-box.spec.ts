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

  const message = (): string => root().querySelector('.wrong')?.textContent?.trim() ?? '';

  it('says beneath the box what is wrong with the name, once the box is left', async () => {
    await type('Ines Vegas');
    expect(message()).toBe('');
    const input = root().querySelector('input')!;
    input.dispatchEvent(new Event('blur'));
    await fixture.whenStable();
    expect(message()).toBe('The name has to be as on your account: Inés Vega');
    expect(input.getAttribute('aria-invalid')).toBe('true');
    const described = input.getAttribute('aria-describedby')!;
    expect(root().querySelector(`[id="${described}"]`)?.textContent).toContain('Inés Vega');
    await type('Inés Vega');
    expect(message()).toBe('');
  });

  it('says so at Enter too, but never about an empty box', async () => {
    const input = root().querySelector('input')!;
    input.dispatchEvent(new KeyboardEvent('keydown', { key: 'Enter' }));
    await fixture.whenStable();
    expect(message()).toBe('');
    await type('Inés');
    expect(message()).not.toBe('');
  });
});

describe('SignatureBox', () => {
  it('leads the keyboard to what takes the place of the button pressed', async () => {
    jest
      .spyOn(HTMLCanvasElement.prototype, 'getContext')
      .mockReturnValue({ fillRect() {}, clearRect() {}, scale() {} } as unknown as RenderingContext);
    TestBed.configureTestingModule({ imports: [SignatureBox, withWords()] });
    const fixture = TestBed.createComponent(SignatureBox);
    fixture.componentRef.setInput('meaning', 'Reviewed and approved');
    fixture.componentRef.setInput('printedName', 'Inés Vega');
    await fixture.whenStable();
    const root = fixture.nativeElement as HTMLElement;
    document.body.append(root);
    const button = (words: string): HTMLButtonElement =>
      [...root.querySelectorAll('button')].find((one) => one.textContent?.includes(words))!;

    button('Type my name instead').click();
    await fixture.whenStable();
    expect(document.activeElement).toBe(root.querySelector('input'));
    button('Draw instead').click();
    await fixture.whenStable();
    expect(document.activeElement).toBe(button('Type my name instead'));
    root.remove();
  });
});
