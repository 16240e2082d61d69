import { beforeAll, describe, expect, it } from '@jest/globals';
import { signal } from '@angular/core';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { TranslocoService } from '@jsverse/transloco';
import { throwError } from 'rxjs';
import type { Language } from '#shared/checklist/text';
import type { ScheduleProblem } from '#shared/contracts/schedules';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { withWords } from '../ui/words/with-words.fixture';
import { SchedulePage } from './schedule-page';
import { SchedulesApi } from './schedules-api';

const missing = (column: 'system' | 'circuit', heading: string): ScheduleProblem => ({
  row: 1,
  column: null,
  reason: {
    code: 'missingColumn',
    params: { column, heading, found: ['Rack', 'Case'], moreCount: 0 },
  },
  message: 'An English sentence.',
});

const ROWS: readonly ScheduleProblem[] = [
  missing('system', 'System'),
  missing('circuit', 'Circuit'),
  {
    row: 4,
    column: 'Evap temp (°F)',
    reason: { code: 'notANumber', params: { text: 'twenty' } },
    message: 'An English sentence.',
  },
];

const refusalOf = (rows: readonly ScheduleProblem[]) => ({
  status: 422,
  error: {
    type: 'about:blank',
    title: '',
    status: 422,
    detail: 'An English sentence.',
    code: 'scheduleRefused',
    places: [],
    facts: { rows },
    requestId: 'r',
  },
});

async function openRefused(
  language: Language,
  rows: readonly ScheduleProblem[] = ROWS,
  mayAdd = true,
): Promise<ComponentFixture<SchedulePage>> {
  const refusal = refusalOf(rows);
  TestBed.configureTestingModule({
    imports: [SchedulePage, withWords(language)],
    providers: [
      provideRouter([]),
      { provide: SchedulesApi, useValue: { upload: () => throwError(() => refusal) } },
      { provide: Session, useValue: { may: (action: string) => action !== 'refrigerant.add' || mayAdd } },
      { provide: Connectivity, useValue: { online: signal(true) } },
    ],
  });
  const fixture = TestBed.createComponent(SchedulePage);
  fixture.componentRef.setInput('openingId', 'o1');
  await fixture.whenStable();
  const root = fixture.nativeElement as HTMLElement;
  const box = root.querySelector<HTMLInputElement>('input[type=file]');
  if (!box) throw new Error('no box for a file');
  Object.defineProperty(box, 'files', { value: [new File(['a,b'], 'schedule.csv')] });
  box.dispatchEvent(new Event('change'));
  await fixture.whenStable();
  return fixture;
}

const cells = (fixture: ComponentFixture<SchedulePage>): string[][] =>
  [...(fixture.nativeElement as HTMLElement).querySelectorAll('tbody tr')].map((row) =>
    [...row.querySelectorAll('td')].map((cell) => cell.textContent?.trim() ?? ''),
  );
const found = (fixture: ComponentFixture<SchedulePage>): string | undefined =>
  (fixture.nativeElement as HTMLElement).querySelector('.found')?.textContent?.trim();

beforeAll(() => {
  // jsdom has no object URLs; the page makes one for its example file.
  Object.assign(URL, { createObjectURL: () => 'blob:x', revokeObjectURL: () => undefined });
});

describe('SchedulePage, given a refused schedule', () => {
  it('says in Spanish what has to be put right, and the file’s headings once', async () => {
    const fixture = await openRefused('es');
    expect(cells(fixture)).toEqual([
      ['1', '–', 'Falta la columna «System» (sistema); agréguela.'],
      ['1', '–', 'Falta la columna «Circuit» (circuito); agréguela.'],
      ['4', 'Evap temp (°F)', '«twenty» no es un número; escriba solo cifras, como 12.5.'],
    ]);
    expect(found(fixture)).toBe('Encabezados en el archivo: «Rack», «Case».');
    expect((fixture.nativeElement as HTMLElement).textContent).not.toContain('English');
  });

  it('follows a change of language', async () => {
    const fixture = await openRefused('es');
    TestBed.inject(TranslocoService).setActiveLang('en');
    await fixture.whenStable();
    expect(cells(fixture)[2]?.[2]).toBe('“twenty” is not a number; write digits only, such as 12.5.');
    expect(found(fixture)).toBe('Headings found in the file: “Rack”, “Case”.');
  });

  it('leads to the maker’s table of a refrigerant that nobody knows, once, and only who may enter it', async () => {
    const unknown = (row: number): ScheduleProblem => ({
      row,
      column: 'Refrigerant',
      reason: { code: 'unknownRefrigerant', params: { text: 'R-9X1' } },
      message: 'An English sentence.',
    });
    const links = (fixture: ComponentFixture<SchedulePage>) =>
      [...(fixture.nativeElement as HTMLElement).querySelectorAll('a[href^="/refrigerants"]')].map((link) => [
        link.getAttribute('href'),
        link.textContent?.trim(),
      ]);
    expect(links(await openRefused('en', [unknown(2), unknown(3)]))).toEqual([
      ['/refrigerants/new?designation=R-9X1', 'Enter the maker’s table of R-9X1'],
    ]);
    TestBed.resetTestingModule();
    expect(links(await openRefused('en', [unknown(2)], false))).toEqual([]);
  });
});
