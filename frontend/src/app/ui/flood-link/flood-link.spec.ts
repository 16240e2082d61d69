import { describe, expect, it } from '@jest/globals';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { withWords } from '../words/with-words.fixture';
import { FloodLink } from './flood-link';

async function linkOf(method: string, side: 'low' | 'high' | null): Promise<HTMLAnchorElement | null> {
  TestBed.configureTestingModule({ imports: [FloodLink, withWords()], providers: [provideRouter([])] });
  const fixture = TestBed.createComponent(FloodLink);
  fixture.componentRef.setInput('sequence', {
    id: 's',
    openingId: 'o',
    specification: { suctionGroup: { id: 'g' } },
    stepList: { facts: { unitSystem: 'si' } },
  });
  fixture.componentRef.setInput('step', { kind: 'measurement', method, key: 'return-gas' });
  fixture.componentRef.setInput('judgement', side && { side });
  await fixture.whenStable();
  return (fixture.nativeElement as HTMLElement).querySelector('a');
}

describe('FloodLink', () => {
  it('leads from a low return gas to the fixtures of its group', async () => {
    expect((await linkOf('returnGas', 'low'))?.getAttribute('href')).toBe(
      '/openings/o/suction-groups/g?back=s&step=return-gas&units=si',
    );
  });

  it.each([
    ['returnGas', 'high'],
    ['returnGas', null],
    ['subcooling', 'low'],
  ] as const)('is not there for %s, %s', async (method, side) => {
    expect(await linkOf(method, side)).toBeNull();
  });
});
