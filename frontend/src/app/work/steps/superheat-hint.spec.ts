import { TestBed } from '@angular/core/testing';
import { describe, expect, it } from '@jest/globals';
import type { Judgement } from '#shared/checklist/judgement';
import type { SuperheatStep } from '#shared/checklist/kinds/superheat';
import type { Language } from '#shared/checklist/text';
import { withWords } from '../../ui/words/with-words.fixture';
import { hintOf, newestLook, type HintWords } from './superheat-hint';
import { SuperheatHintLine } from './superheat-hint-line';
import { startSuperheat, type TypedSuperheat } from './superheat-typed';

const K = 1 / 1.8;
const STEP = {
  kind: 'superheat',
  band: { lowK: 6 * K, highK: 8 * K },
  waitS: 900,
} as unknown as SuperheatStep;
const NOW = Date.parse('2026-03-02T09:00:00.000Z');
const ago = (minutes: number): string => new Date(NOW - minutes * 60_000).toISOString();
const FORM = startSuperheat(null);

/** A judgement with the superheat in °F, and what is doubted about it. */
function judged(superheatF: number, errorF: number | null = null, ...doubts: string[]): Judgement {
  return {
    doubts: doubts.map((kind) => ({ kind, severity: kind === 'notSettled' ? 'keep' : 'ask' })),
    figures: [
      { label: 'superheat', value: superheatF * K, unit: 'K_diff' },
      ...(errorF === null
        ? []
        : [{ label: 'superheatUncertainty', value: errorF * K, unit: 'K_diff' as const }]),
    ],
  } as unknown as Judgement;
}

function turned(minutesAgo: number, beforeF: number | null = null): TypedSuperheat {
  const turn = { turns: 0.25, direction: 'clockwise' as const, at: ago(minutesAgo), readBefore: null };
  return { ...FORM, turns: [{ ...turn, beforeK: beforeF === null ? null : beforeF * K }] };
}

async function sentence(hint: HintWords | null, language: Language = 'en'): Promise<string | null> {
  if (!hint) return null;
  TestBed.resetTestingModule();
  TestBed.configureTestingModule({ imports: [SuperheatHintLine, withWords(language)] });
  const fixture = TestBed.createComponent(SuperheatHintLine);
  fixture.componentRef.setInput('hint', hint);
  await fixture.whenStable();
  return (fixture.nativeElement as HTMLElement).textContent?.trim() ?? '';
}

const raises = { ...FORM, clockwise: 'raisesSuperheat' as const };

describe('the hint in one sentence', () => {
  it.each<[string, Judgement, TypedSuperheat, string]>([
    ['leave', judged(7), FORM, 'Inside the band: leave the valve alone.'],
    [
      'open, which way unknown',
      judged(12),
      FORM,
      'Superheat too high: open gently, a quarter turn the way the valve’s own sheet gives, then wait.',
    ],
    [
      'open, by the sheet',
      judged(12),
      raises,
      'Superheat too high: open gently, a quarter turn counterclockwise, then wait.',
    ],
    [
      'close, by the sheet',
      judged(3),
      raises,
      'Superheat too low: close gently, a quarter turn clockwise, then wait.',
    ],
    [
      'within the error',
      judged(8.4, 1),
      FORM,
      'Off the band by no more than your instruments’ error: don’t chase it.',
    ],
    ['wait', judged(12), turned(4), 'The valve has not settled since the last turn: let it, then read.'],
    [
      'liquid',
      judged(-1, null, 'liquidRisk'),
      raises,
      'Superheat at or below zero: liquid may be leaving the coil. Close it now, half a turn clockwise.',
    ],
    [
      'liquid at the lowest of a swing',
      judged(7, null, 'liquidRisk'),
      FORM,
      'At its lowest the superheat touches zero: liquid may be leaving the coil. Raise it, and find out why it swings.',
    ],
    [
      'against the sheet',
      judged(3),
      { ...turned(20, 5), clockwise: 'raisesSuperheat' },
      'The last turn did the opposite of what the sheet says. Look again at sheet, wait and readings before you turn on.',
    ],
  ])('is for %s', async (_name, judgement, typed, expected) => {
    expect(await sentence(hintOf(judgement, typed, STEP, NOW))).toBe(expected);
  });

  it('reads in Spanish', async () => {
    expect(await sentence(hintOf(judged(3), raises, STEP, NOW), 'es')).toBe(
      'Sobrecalentamiento bajo: cierre con suavidad, un cuarto de vuelta en sentido horario, y espere.',
    );
  });

  it('is a caution only for liquid', () => {
    expect(hintOf(judged(-1, null, 'liquidRisk'), FORM, STEP, NOW)?.isCaution).toBe(true);
    expect(hintOf(judged(3), FORM, STEP, NOW)?.isCaution).toBe(false);
  });

  it('asks for no turn while a series shows the valve unsettled', () => {
    expect(hintOf(judged(12, null, 'notSettled'), FORM, STEP, NOW)).toBeNull();
  });

  it('says nothing of a slip', () => {
    const slip = { ...judged(12), doubts: [{ kind: 'swapped', severity: 'refuse' }] } as Judgement;
    expect(hintOf(slip, FORM, STEP, NOW)).toBeNull();
  });
});

describe('newestLook', () => {
  const read = { ...FORM.asLeft, pair: { pressure: '45', temperature: '28' } };

  it('is the as-left once it is typed, before that the as-found', () => {
    expect(newestLook(FORM)).toBeNull();
    expect(newestLook({ ...FORM, asFound: read })).toBe('asFound');
    expect(newestLook({ ...FORM, asFound: read, asLeft: read })).toBe('asLeft');
  });

  it('is none after a turn: what was found says nothing any more', () => {
    expect(newestLook({ ...turned(20), asFound: read })).toBeNull();
  });
});
