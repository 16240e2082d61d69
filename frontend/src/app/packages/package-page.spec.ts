import { describe, expect, it, jest } from '@jest/globals';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { NEVER } from 'rxjs';
import type { HandoverPackage } from '#shared/contracts/packages';
import { Connectivity } from '../offline/connectivity';
import { PasswordAgain } from '../session/password-again';
import { Session } from '../session/session';
import { LiveEvents } from '../shell/live-events';
import { withWords } from '../ui/words/with-words.fixture';
import { PackagePage } from './package-page';
import { PackagesApi } from './packages-api';

const HASH = 'ab'.repeat(32);
const pack = (change: Partial<HandoverPackage> = {}): HandoverPackage =>
  ({
    id: 'p1',
    openingId: 'o1',
    openingName: 'Juniper Street',
    version: 2,
    language: 'en',
    state: 'issued',
    progress: 1,
    circuitsApproved: 60,
    circuitsTotal: 60,
    createdAt: '2026-11-28T18:00:00.000Z',
    createdBy: 'Inés Vega',
    issuedAt: '2026-11-28T18:01:00.000Z',
    pages: 300,
    bytes: 4_000_000,
    sha256: HASH,
    failure: null,
    acceptance: null,
    ...change,
  }) as unknown as HandoverPackage;

async function open(answer: HandoverPackage, mayAccept: boolean) {
  jest.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null);
  const accept = jest.fn<(...args: unknown[]) => Promise<HandoverPackage>>().mockResolvedValue(answer);
  const api = {
    package: async () => answer,
    fingerprint: async () => 'cd'.repeat(32),
    documentUrl: () => '/api/packages/p1/document',
    accept,
  };
  TestBed.configureTestingModule({
    imports: [PackagePage, withWords()],
    providers: [
      provideRouter([]),
      { provide: PackagesApi, useValue: api },
      { provide: Session, useValue: { me: () => ({ name: 'Dale Whitcomb' }), may: () => mayAccept } },
      { provide: PasswordAgain, useValue: { ask: async () => true } },
      { provide: LiveEvents, useValue: { on: () => NEVER } },
      { provide: Connectivity, useValue: { online: signal(true) } },
    ],
  });
  const fixture = TestBed.createComponent(PackagePage);
  fixture.componentRef.setInput('packageId', 'p1');
  await fixture.whenStable();
  return { fixture, root: fixture.nativeElement as HTMLElement, accept };
}

describe('PackagePage', () => {
  it('accepts exactly the hash that stands on the screen, once signed', async () => {
    const { fixture, root, accept } = await open(pack(), true);
    const input = root.querySelector('input');
    const button = [...root.querySelectorAll('button')].at(-1);
    expect(button?.disabled).toBe(true);
    if (!input) throw new Error('no box to sign in');
    input.value = 'dale whitcomb';
    input.dispatchEvent(new Event('input'));
    await fixture.whenStable();
    button?.click();
    await fixture.whenStable();
    expect(accept).toHaveBeenCalledWith(
      'p1',
      HASH,
      expect.objectContaining({ printedName: 'Dale Whitcomb', typed: true }),
    );
  });

  it('offers a lead the document, but no acceptance', async () => {
    const { root } = await open(pack(), false);
    expect(root.querySelector('app-signature-box')).toBeNull();
    expect(root.querySelector('a[download]')?.getAttribute('download')).toBe(
      'handover-juniper-street-v2.pdf',
    );
    expect(root.textContent).toContain('has not accepted it yet');
  });

  it('says how many circuits are missing in a partial package', async () => {
    const { root } = await open(pack({ circuitsApproved: 58 }), false);
    expect(root.textContent).toContain('2 circuits were not approved');
  });

  it('says beside the box what the signature accepts', async () => {
    const partial = await open(pack({ circuitsApproved: 58 }), true);
    expect(partial.root.querySelector('.covers')?.textContent).toContain(
      'accepts version 2, in which 2 of 60 circuits are not approved',
    );
    TestBed.resetTestingModule();
    const whole = await open(pack(), true);
    expect(whole.root.querySelector('.covers')?.textContent).toContain('all 60 circuits are approved');
  });

  it('shows the certificate after the acceptance', async () => {
    const signature = { printedName: 'Dale Whitcomb', width: 1, height: 1, strokes: [], typed: true };
    const acceptance = {
      personName: 'Dale Whitcomb',
      companyName: 'Harrow & Finch Builders',
      signedAt: '2026-11-29T16:20:00.000Z',
      signature,
    };
    const { root } = await open(pack({ acceptance }), true);
    expect(root.querySelector('.certificate')?.textContent).toContain('Harrow & Finch Builders');
    expect(root.querySelector('app-signature-box')).toBeNull();
  });
});
