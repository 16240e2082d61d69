import { describe, expect, it } from '@jest/globals';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { FloodHuntRow } from '#shared/contracts/flood-hunt';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { withWords } from '../ui/words/with-words.fixture';
import { FloodHuntApi } from './flood-hunt-api';
import { FloodHuntPage } from './flood-hunt-page';

const row = (coilId: string, change: Partial<FloodHuntRow> = {}): FloodHuntRow =>
  ({
    coilId,
    coilNumber: 1,
    fixtureTag: `D-${coilId}`,
    circuitCode: 'A1',
    sequenceId: `s-${coilId}`,
    stepKey: `superheat:${coilId}`,
    superheatK: 4,
    minimumSuperheatK: null,
    asLeftStale: false,
    sinceDefrostS: null,
    overrideStanding: false,
    loadW: 1000,
    ...change,
  }) as unknown as FloodHuntRow;

async function open(coils: readonly FloodHuntRow[], { online = true, lead = false } = {}) {
  TestBed.configureTestingModule({
    imports: [FloodHuntPage, withWords()],
    providers: [
      provideRouter([]),
      { provide: FloodHuntApi, useValue: { read: async () => ({ suctionGroupName: 'AS-1', coils }) } },
      { provide: Session, useValue: { may: () => lead } },
      { provide: Connectivity, useValue: { online: signal(online) } },
    ],
  });
  const fixture = TestBed.createComponent(FloodHuntPage);
  fixture.componentRef.setInput('openingId', 'o');
  fixture.componentRef.setInput('suctionGroupId', 'g');
  fixture.componentRef.setInput('back', 'group');
  fixture.componentRef.setInput('step', 'return-gas');
  await fixture.whenStable();
  const root = fixture.nativeElement as HTMLElement;
  const text = (element: Element | null | undefined) =>
    element?.textContent
      ?.replace(/\u2060/g, '')
      .replace(/\s+/g, ' ')
      .trim() ?? '';
  return { root, text, links: [...root.querySelectorAll<HTMLAnchorElement>('li a')] };
}

describe('FloodHuntPage', () => {
  it('puts the likeliest fixture first, with its reasons in words and the way to its step', async () => {
    const { root, links, text } = await open([row('1'), row('2', { minimumSuperheatK: -0.5 })]);
    expect(links.map((link) => text(link.querySelector('.tag')))).toEqual(['D-2', 'D-1']);
    expect(text(links[0])).toContain('Superheat was zero or less');
    expect(text(links[0])).toContain('−0.9');
    expect(links[0]?.getAttribute('href')).toBe('/work/s-2?at=superheat:2');
    expect([...root.querySelectorAll('h2')].map(text)).toEqual([
      'Look here first 1',
      'Nothing speaks against these 1',
    ]);
    expect(text(root)).toContain('Liquid is coming back.');
  });

  it('takes a lead to the review of the step, and back to where it began', async () => {
    const { root, links } = await open([row('1')], { lead: true });
    expect(links[0]?.getAttribute('href')).toBe('/review/s-1?step=superheat:1');
    expect(root.querySelector('header a')?.getAttribute('href')).toBe('/review/group?step=return-gas');
  });

  it('tells coils of one fixture apart', async () => {
    const { links, text } = await open([
      row('1', { fixtureTag: 'D-9' }),
      row('2', { fixtureTag: 'D-9', coilNumber: 2 }),
    ]);
    expect(links.map((link) => text(link.querySelector('.where')))).toEqual(['A1 · coil 1', 'A1 · coil 2']);
  });

  it('says without a network that it needs one', async () => {
    const { root, text } = await open([], { online: false });
    expect(text(root)).toContain('it needs a network');
  });
});
