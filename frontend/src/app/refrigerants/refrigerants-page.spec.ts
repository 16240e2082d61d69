import { describe, expect, it } from '@jest/globals';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { Language } from '#shared/checklist/text';
import type { RefrigerantTable } from '#shared/contracts/refrigerants';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { withWords } from '../ui/words/with-words.fixture';
import { RefrigerantsApi } from './refrigerants-api';
import { RefrigerantsPage } from './refrigerants-page';
import { keptTable } from './sheet.fixture';

async function open(items: readonly RefrigerantTable[] | null, mayAdd = true, language: Language = 'en') {
  const tables = () => (items ? Promise.resolve({ items, isCut: false }) : Promise.reject({ status: 0 }));
  TestBed.configureTestingModule({
    imports: [RefrigerantsPage, withWords(language)],
    providers: [
      provideRouter([]),
      { provide: RefrigerantsApi, useValue: { tables } },
      { provide: Session, useValue: { may: () => mayAdd } },
      { provide: Connectivity, useValue: { online: signal(true) } },
    ],
  });
  const fixture = TestBed.createComponent(RefrigerantsPage);
  await fixture.whenStable();
  return { fixture, root: fixture.nativeElement as HTMLElement };
}

const KEPT = [
  keptTable({ id: 'a', edition: '2026-07', safetyClass: 'A2L' }),
  keptTable({ id: 'b', isInUse: false }),
  keptTable({ id: 'c', designation: 'R-448A', edition: '' }),
];

describe('RefrigerantsPage', () => {
  it('says which table is in use, and which ones go before the program’s own figures', async () => {
    const { root } = await open(KEPT);
    const rows = [...root.querySelectorAll('li')].map((row) => row.textContent?.replace(/\s+/g, ' ') ?? '');
    expect(rows.map((row) => row.includes('In use'))).toEqual([true, false, true]);
    expect(rows[1]).toContain('A newer one took its place');
    expect(rows.map((row) => row.includes('Takes precedence'))).toEqual([false, false, true]);
    expect(rows[2]).toContain('Example Gases, without edition');
    expect(rows[0]).toContain('10 rows, \u221240.0 °F to 122.0 °F');
    expect(root.textContent).toContain('takes precedence over the program’s own figures');
  });

  it.each([
    ['en', 'Safety class '],
    ['es', 'Clase de seguridad '],
  ] as const)(
    'shows the safety class of each sheet, also where a newer one says another, in %s',
    async (...spoken) => {
      const [language, label] = spoken;
      const { root } = await open(KEPT, true, language);
      const said = [...root.querySelectorAll('.what p')].map((one) => one.textContent?.trim() ?? '');
      expect(said.filter((text) => text.startsWith(label))).toEqual(
        ['A2L', 'A1', 'A1'].map((one) => label + one),
      );
    },
  );

  it('opens a table’s curve and check values, in the units that are chosen', async () => {
    const { root, fixture } = await open(KEPT, true, 'es');
    root.querySelector<HTMLButtonElement>('h2 button')?.click();
    await fixture.whenStable();
    expect(root.querySelector('svg')?.getAttribute('aria-label')).toMatch(
      /^R-9X1, 10 filas de \u221240\.0 °F a 122\.0 °F: la presión de rocío va de .* psia/,
    );
    expect(root.querySelectorAll('app-check-table tbody tr')).toHaveLength(9);
    const select = root.querySelector<HTMLSelectElement>('.units select');
    if (!select) throw new Error('no units');
    select.selectedIndex = 1;
    select.dispatchEvent(new Event('change'));
    await fixture.whenStable();
    expect(root.querySelectorAll('app-check-table tbody tr')).toHaveLength(10);
    expect(root.querySelector('svg')?.getAttribute('aria-label')).toContain('bar(a)');
  });

  it('offers a lead to enter the first one, and an installer nothing that is refused', async () => {
    const forLead = await open([]);
    expect(forLead.root.querySelectorAll('a[href="/refrigerants/new"]').length).toBeGreaterThan(0);
    TestBed.resetTestingModule();
    const forInstaller = await open([], false);
    expect(forInstaller.root.querySelectorAll('a[href="/refrigerants/new"]')).toHaveLength(0);
    expect(forInstaller.root.textContent).toContain('No maker’s table yet');
  });

  it('says so when nobody answers', async () => {
    const { root } = await open(null);
    expect(root.querySelector('[role=alert]')).not.toBeNull();
  });
});
