import { describe, expect, it } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import type { Language } from '#shared/checklist/text';
import { PACKAGE_FAILURES, type HandoverPackage, type PackageFailure } from '#shared/contracts/packages';
import { WORDS as EN } from '../../i18n/loader/en';
import { WORDS as ES } from '../../i18n/loader/es';
import { withWords } from '../ui/words/with-words.fixture';
import { PackageState } from './package-state';

async function failedIn(language: Language, failure: PackageFailure | null): Promise<string | undefined> {
  TestBed.configureTestingModule({ imports: [PackageState, withWords(language)] });
  const fixture = TestBed.createComponent(PackageState);
  fixture.componentRef.setInput('pack', { state: 'failed', failure } as HandoverPackage);
  await fixture.whenStable();
  return (fixture.nativeElement as HTMLElement).querySelector('.failed')?.textContent?.trim();
}

describe('PackageState, given a package that could not be built', () => {
  it('says why in the language that is read', async () => {
    expect(await failedIn('es', 'diskFull')).toBe(
      'No se pudo preparar. El servidor ya no tiene espacio. Avise a quien lo administra y luego prepárelo de nuevo.',
    );
  });

  it('takes no reason for a fault of ours', async () => {
    expect(await failedIn('en', null)).toContain('Something is wrong on our side');
  });

  it.each(PACKAGE_FAILURES)('has words for %s in both languages', (failure) => {
    expect(EN.packages).toHaveProperty(`failure_${failure}`);
    expect(ES.packages).toHaveProperty(`failure_${failure}`);
  });
});
