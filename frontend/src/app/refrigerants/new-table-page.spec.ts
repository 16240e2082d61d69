import { describe, expect, it } from '@jest/globals';
import { signal } from '@angular/core';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import type { Language } from '#shared/checklist/text';
import type { NewRefrigerantTable } from '#shared/contracts/refrigerants';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { withWords } from '../ui/words/with-words.fixture';
import { NewTablePage } from './new-table-page';
import { RefrigerantsApi } from './refrigerants-api';
import { keptTable, sheetText } from './sheet.fixture';

interface Opened {
  readonly fixture: ComponentFixture<NewTablePage>;
  readonly root: HTMLElement;
  readonly sent: NewRefrigerantTable[];
}

async function open(
  options: { language?: Language; mayAdd?: boolean; designation?: string } = {},
): Promise<Opened> {
  const sent: NewRefrigerantTable[] = [];
  const add = (table: NewRefrigerantTable) => {
    sent.push(table);
    return Promise.resolve(keptTable());
  };
  TestBed.configureTestingModule({
    imports: [NewTablePage, withWords(options.language)],
    providers: [
      provideRouter([{ path: 'refrigerants', children: [] }]),
      { provide: RefrigerantsApi, useValue: { add } },
      { provide: Session, useValue: { may: () => options.mayAdd ?? true } },
      { provide: Connectivity, useValue: { online: signal(true) } },
    ],
  });
  const fixture = TestBed.createComponent(NewTablePage);
  fixture.componentRef.setInput('designation', options.designation);
  await fixture.whenStable();
  return { fixture, root: fixture.nativeElement as HTMLElement, sent };
}

async function type({ fixture, root }: Opened, index: number, text: string): Promise<void> {
  const boxes = root.querySelectorAll<HTMLInputElement | HTMLTextAreaElement>(
    '.fields input:not([type]), textarea',
  );
  const box = boxes[index];
  if (!box) throw new Error('no such box');
  box.value = text;
  box.dispatchEvent(new Event('input'));
  await fixture.whenStable();
}
async function chooseClass({ fixture, root }: Opened, safetyClass: string): Promise<void> {
  const select = root.querySelector<HTMLSelectElement>('select[aria-describedby=safety-class-hint]');
  if (!select) throw new Error('no safety class to choose');
  select.selectedIndex = [...select.options].findIndex(({ text }) => text.trim() === safetyClass);
  select.dispatchEvent(new Event('change'));
  await fixture.whenStable();
}
async function fill(page: Opened, designation: string, edition: string, text: string): Promise<void> {
  await type(page, 0, designation);
  await type(page, 1, 'Example Gases');
  await type(page, 2, edition);
  await chooseClass(page, 'A2L');
  await type(page, 3, text);
}
async function save({ fixture, root }: Opened): Promise<void> {
  root.querySelector('form')?.dispatchEvent(new Event('submit', { cancelable: true }));
  await fixture.whenStable();
}
const textOf = (root: HTMLElement, selector: string): string[] =>
  [...root.querySelectorAll(selector)].map((one) => one.textContent?.replace(/\s+/g, ' ').trim() ?? '');

describe('NewTablePage', () => {
  it('saves a sheet that nothing is against, and goes to the list', async () => {
    const page = await open();
    await fill(page, 'R-9X1', '2026-01', sheetText());
    expect(textOf(page.root, '.read')).toEqual(['10 rows read, in °F and psig.']);
    expect(textOf(page.root, 'svg')).toHaveLength(1);
    await save(page);
    expect(page.sent).toHaveLength(1);
    expect(page.sent[0]).toMatchObject({
      designation: 'R-9X1',
      issuer: 'Example Gases',
      safetyClass: 'A2L',
      confirmed: false,
    });
    expect(page.sent[0]?.points).toHaveLength(10);
    expect(TestBed.inject(Router).url).toBe('/refrigerants');
  });

  it('lists what has to be put right by line, and saves nothing', async () => {
    const page = await open({ language: 'es' });
    const lines = sheetText().split('\n');
    const wrong = ['Temp (°F)\tBubble (psig)\tDew (psig)', ...lines.slice(0, 3), ...lines.slice(5)].join(
      '\n',
    );
    await fill(page, 'R-9X1', '2026-01', wrong);
    // The heading is line 1, so the fourth row is line 5.
    expect(textOf(page.root, '.problems li')).toEqual([
      'Línea 5 De \u22124.0 °F a 50.0 °F hay 54.0 °F; agregue filas para que entre dos haya 18.0 °F como máximo.',
    ]);
    await save(page);
    expect(page.sent).toEqual([]);
    expect(textOf(page.root, '.fault')).toContain('Corrija lo que figura arriba; antes no se guarda nada.');
  });

  it('asks about absolute pressures given as gauge ones, and saves once each question is ticked', async () => {
    const page = await open();
    const absolute = sheetText()
      .split('\n')
      .map((line) => {
        const [temperature, ...pressures] = line.split('\t').map(Number);
        return [temperature, ...pressures.map((pressure) => (pressure + 14.696).toFixed(1))].join('\t');
      })
      .join('\n');
    await fill(page, 'R-9X1', '', absolute);
    const ticks = () => page.root.querySelectorAll<HTMLInputElement>('input[type=checkbox]');
    expect(textOf(page.root, '.question p')).toEqual([
      expect.stringMatching(/^The sheet has no edition/),
      expect.stringMatching(/only when they are read as absolute pressures/),
    ]);
    await save(page);
    expect(page.sent).toEqual([]);
    for (const tick of ticks()) tick.click();
    await page.fixture.whenStable();
    await save(page);
    expect(page.sent.map(({ confirmed }) => confirmed)).toEqual([true]);
  });

  it('asks again when the figures have changed since', async () => {
    const page = await open();
    await fill(page, 'R-9X1', '', sheetText());
    page.root.querySelector<HTMLInputElement>('input[type=checkbox]')?.click();
    await page.fixture.whenStable();
    await type(page, 3, sheetText('R-407A'));
    expect(page.root.querySelector<HTMLInputElement>('input[type=checkbox]')?.checked).toBe(false);
  });

  it('takes the designation from the address, and says what a sheet of a known refrigerant goes before', async () => {
    const page = await open({ designation: 'r448a' });
    expect(textOf(page.root, '.precedence')[0]).toContain('The program has figures of its own for R-448A.');
    expect(textOf(page.root, '#designation-hint')).toEqual(['It will be listed as R-448A.']);
  });

  it('names missing fields once saving was tried', async () => {
    const page = await open();
    await type(page, 3, sheetText());
    expect(page.root.querySelectorAll('[aria-invalid=true]')).toHaveLength(0);
    await save(page);
    expect(page.root.querySelectorAll('[aria-invalid=true]')).toHaveLength(3);
    expect(page.sent).toEqual([]);
  });

  it.each([
    ['en', 'Choose', /^Choose the safety class/],
    ['es', 'Elija', /^Elija la clase de seguridad/],
  ] as const)('has no safety class by default, and saves nothing without one, in %s', async (...spoken) => {
    const [language, none, blocked] = spoken;
    const page = await open({ language });
    const options = textOf(page.root, 'select[aria-describedby=safety-class-hint] option');
    expect(options).toEqual([none, 'A1', 'A2L', 'A2', 'A3', 'B1', 'B2L', 'B2', 'B3']);
    await fill(page, 'R-9X1', '2026-01', sheetText());
    await chooseClass(page, none);
    await save(page);
    expect(page.sent).toEqual([]);
    expect(textOf(page.root, '#safety-class-hint em')).toEqual([expect.stringMatching(blocked)]);
    expect(textOf(page.root, '.fault')).toEqual([expect.stringMatching(blocked)]);
    await chooseClass(page, 'B2L');
    await save(page);
    expect(page.sent.map(({ safetyClass }) => safetyClass)).toEqual(['B2L']);
  });

  it('has no form for those who may only look', async () => {
    const page = await open({ mayAdd: false });
    expect(page.root.querySelector('form')).toBeNull();
    expect(textOf(page.root, 'h2')).toEqual(['Leads and admins enter makers’ tables']);
  });
});
