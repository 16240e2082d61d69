import { describe, expect, it, jest } from '@jest/globals';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { NEVER } from 'rxjs';
import { Connectivity } from '../offline/connectivity';
import { Session } from '../session/session';
import { LiveEvents } from '../shell/live-events';
import { withWords } from '../ui/words/with-words.fixture';
import { PackagesApi } from './packages-api';
import { PackagesPage } from './packages-page';

async function open(coverage: { approved: number; total: number }) {
  const issue = jest.fn<(...args: unknown[]) => Promise<void>>().mockResolvedValue();
  TestBed.configureTestingModule({
    imports: [PackagesPage, withWords()],
    providers: [
      provideRouter([]),
      { provide: PackagesApi, useValue: { packages: async () => [], coverage: async () => coverage, issue } },
      { provide: Session, useValue: { may: () => true } },
      { provide: LiveEvents, useValue: { on: () => NEVER } },
      { provide: Connectivity, useValue: { online: signal(true) } },
    ],
  });
  const fixture = TestBed.createComponent(PackagesPage);
  fixture.componentRef.setInput('openingId', 'o1');
  await fixture.whenStable();
  const root = fixture.nativeElement as HTMLElement;
  const press = async (words: string): Promise<void> => {
    [...root.querySelectorAll('button')].find((button) => button.textContent?.trim() === words)?.click();
    await fixture.whenStable();
  };
  return { root, press, issue };
}

describe('PackagesPage', () => {
  it('issues nothing before it has said what the version covers', async () => {
    const { root, press, issue } = await open({ approved: 1, total: 82 });
    await press('Issue a new version');
    expect(issue).not.toHaveBeenCalled();
    expect(root.querySelector('.confirm')?.textContent).toContain(
      '1 of 82 circuits is approved, 81 are not.',
    );
    await press('Issue');
    expect(issue).toHaveBeenCalledWith('o1', 'en');
    expect(root.querySelector('.confirm')).toBeNull();
  });

  it('issues nothing on second thoughts', async () => {
    const { root, press, issue } = await open({ approved: 82, total: 82 });
    await press('Issue a new version');
    expect(root.querySelector('.confirm')?.textContent).toContain('All 82 circuits are approved.');
    await press('Not yet');
    expect(root.querySelector('.confirm')).toBeNull();
    expect(issue).not.toHaveBeenCalled();
  });
});
