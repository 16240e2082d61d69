import { TestBed } from '@angular/core/testing';
import { describe, expect, it } from '@jest/globals';
import { SUPERHEAT_CONDITIONS, type SuperheatAnswer } from '#shared/checklist/kinds/superheat';
import type { Language } from '#shared/checklist/text';
import { withWords } from '../words/with-words.fixture';
import { SuperheatExtras } from './superheat-extras';
import { superheatLines } from './superheat-lines';

const pair = {
  pressure: { text: '45', unit: 'psig' as const },
  temperature: { text: '28', unit: 'degF' as const },
};
const plain: SuperheatAnswer = { kind: 'superheat', asFound: null, asLeft: { valve: 'steady', pair } };

async function linesOf(answer: SuperheatAnswer, language: Language = 'en'): Promise<string[]> {
  TestBed.configureTestingModule({ imports: [SuperheatExtras, withWords(language)] });
  const fixture = TestBed.createComponent(SuperheatExtras);
  fixture.componentRef.setInput('answer', answer);
  await fixture.whenStable();
  return [...(fixture.nativeElement as HTMLElement).querySelectorAll('dl > div')].map((line) =>
    [...line.querySelectorAll('dt, dd')]
      .map((part) => part.textContent!.trim().replace(/\s+/g, ' '))
      .join(': '),
  );
}

describe('what belongs to a superheat beyond its pairs', () => {
  it('is nothing of an answer of the first release', () => {
    expect(superheatLines(plain, 'en')).toEqual([]);
  });

  it('lists a series, the turns and how it was read', async () => {
    const lines = await linesOf({
      ...plain,
      asLeft: {
        valve: 'series',
        readings: [
          { atS: 0, ...pair },
          { atS: 90, ...pair },
        ],
      },
      turns: [{ turns: 0.125, direction: 'counterclockwise', at: '2026-03-02T09:00:00.000Z' }],
      clockwise: 'raisesSuperheat',
      conditions: [...SUPERHEAT_CONDITIONS],
      takenAt: 'elsewhere',
      lineDrop: { text: '1.5', unit: 'psi_diff' },
      instruments: {
        gauge: 'sealed',
        pressureAccuracy: { text: '1', unit: 'psi_diff' },
        temperatureAccuracy: null,
      },
    });
    expect(lines[0]).toMatch(/^Valve turned: 0.125 counterclockwise Mar 2, 2026/);
    expect(lines.slice(1)).toEqual([
      'Clockwise, by the valve’s sheet: raises superheat',
      'As left, 0:00 min: 45 psig · 28 °F',
      'As left, 1:30 min: 45 psig · 28 °F',
      'Conditions met: all',
      'Pressure read elsewhere, line drop: 1.5 psi',
      'Gauge: against sealed air',
      'Gauge good to: ± 1 psi',
    ]);
  });

  it('names each condition that was not met', async () => {
    const conditions = SUPERHEAT_CONDITIONS.filter((one) => one !== 'coilClear');
    expect(await linesOf({ ...plain, conditions }, 'es')).toEqual([
      'Condiciones cumplidas: 4 de 5',
      'No se cumplió: serpentín despejado',
    ]);
  });

  it('names a logger’s file just as it is called', async () => {
    const file = { name: 'a {{b}}.csv', sha256: 'a'.repeat(64), rows: 2 };
    const asLeft = { valve: 'log' as const, file, atS: [0, 1], pressurePag: [1, 1], temperatureK: [2, 2] };
    const [line] = await linesOf({ ...plain, asLeft });
    expect(line).toBe('As left, from the logger: a {{b}}.csv, 2 readings');
  });
});
