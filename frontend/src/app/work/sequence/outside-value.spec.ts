import { CdkStepper } from '@angular/cdk/stepper';
import { TestBed } from '@angular/core/testing';
import { MatIconTestingModule } from '@angular/material/icon/testing';
import { describe, expect, it } from '@jest/globals';
import { judge } from '#shared/checklist/judge';
import type { Answer, Step } from '#shared/checklist/step';
import { withWords } from '../../ui/words/with-words.fixture';
import { outsideValue, type OutsideValue } from './outside-value';
import { confirmStep, stepListOf } from './sequence.fixture';
import { StepFooter } from './step-footer';

const { facts } = stepListOf([]);
const { title } = confirmStep('a');
const base = { ...confirmStep('a'), title };
// 32 °F to 36 °F.
const limits = { low: 273.15, high: 275.372_222_2 };
const reading = { ...base, kind: 'reading', dimension: 'temperature', limits, siUnit: 'K' } as Step;
const superheat = { ...base, kind: 'superheat', band: { lowK: 3.33, highK: 5.56 } } as Step;
const typed = (text: string): Answer => ({ kind: 'reading', value: { text, unit: 'degF' } });

const outside = (step: Step, answer: Answer): OutsideValue | null =>
  outsideValue(answer, judge(step, answer, facts), 'us', 'en');

async function footerOf(value: OutsideValue | null, language: 'en' | 'es'): Promise<string> {
  TestBed.configureTestingModule({
    imports: [StepFooter, MatIconTestingModule, withWords(language)],
    providers: [{ provide: CdkStepper, useValue: {} }],
  });
  const fixture = TestBed.createComponent(StepFooter);
  const inputs = { number: 2, count: 3, action: 'work.action_asTyped', canAct: true, outside: value };
  for (const [name, input] of Object.entries({ ...inputs, question: 'work.secondLook_outside' }))
    fixture.componentRef.setInput(name, input);
  await fixture.whenStable();
  const question = (fixture.nativeElement as HTMLElement).querySelector('[role=alert]');
  return question?.textContent?.replace(/\s+/g, ' ').trim() ?? '';
}

describe('outsideValue', () => {
  it('is a reading as it was typed, with the limits that it misses', () => {
    expect(outside(reading, typed('36.04'))).toEqual({
      text: '36.04 °F',
      limits: expect.objectContaining({ ...limits, dimension: 'temperature' }),
      unitSystem: 'us',
    });
  });

  it('is what was worked out, in the units of the opening', () => {
    const pair = {
      pressure: { text: '47', unit: 'psig' as const },
      temperature: { text: '60', unit: 'degF' as const },
    };
    const answer: Answer = { kind: 'superheat', asFound: null, asLeft: { valve: 'steady', pair } };
    const value = outside(superheat, answer);
    expect(value?.text).toMatch(/^\d+\.\d °F$/);
    expect(value?.limits).toMatchObject({ low: 3.33, high: 5.56, dimension: 'temperatureDifference' });
  });

  it('is nothing within the limits', () => {
    expect(outside(reading, typed('34'))).toBeNull();
    expect(outsideValue(null, null, 'us', 'en')).toBeNull();
  });
});

describe('the second look', () => {
  it.each([
    ['en', '36.04 °F Wanted: 32.0 °F to 36.0 °F. Outside its limits. Record it as it stands?'],
    ['es', '36.04 °F Se pide: de 32.0 °F a 36.0 °F. Fuera de sus límites. ¿Registrarlo tal como está?'],
  ] as const)('says the value once more, with its limits: %s', async (language, words) => {
    expect(await footerOf(outside(reading, typed('36.04')), language)).toBe(words);
  });
});
