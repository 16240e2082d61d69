import { describe, expect, it } from '@jest/globals';
import { ErrorHandler } from '@angular/core';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { Observable, of, throwError } from 'rxjs';
import type { Language } from '#shared/checklist/text';
import type { LoggerProblem } from '#shared/refrigeration/logger/logger-file';
import { withWords } from '../../ui/words/with-words.fixture';
import type { PickedLog, WantedColumn } from './log-choice';
import { fileOf } from './log-file.fixture';
import type { LogRefusal, LogStage } from './log-reading';
import { LoggerPicker } from './logger-picker';
import { LoggerNotes } from './logger-notes';
import { LoggerReader } from './logger-reader';

const WANTED: readonly WantedColumn[] = [{ key: 'air', label: 'temperature', dimension: 'temperature' }];
const GOOD = 'Time (s),Ch1,Air (°F)\n0,1,50\n10,2,41';

interface Shown {
  readonly fixture: ComponentFixture<LoggerPicker>;
  readonly root: HTMLElement;
  readonly picked: (PickedLog | null)[];
  choose(file: File): Promise<void>;
  press(words: string): Promise<void>;
  select(index: number, value: string): Promise<void>;
  readonly text: () => string;
}

async function show(language: Language = 'en', read?: () => Observable<LogStage>): Promise<Shown> {
  TestBed.configureTestingModule({ imports: [LoggerPicker, withWords(language)] });
  if (read) TestBed.overrideProvider(LoggerReader, { useValue: { read } });
  const fixture = TestBed.createComponent(LoggerPicker);
  fixture.componentRef.setInput('wanted', WANTED);
  const picked: (PickedLog | null)[] = [];
  fixture.componentInstance.picked.subscribe((log) => picked.push(log));
  await fixture.whenStable();
  const root = fixture.nativeElement as HTMLElement;
  const settle = async (): Promise<void> => {
    // Reading takes a few turns of the loop: its bytes come in pieces.
    for (let turn = 0; turn < 20; turn++) await new Promise((resolve) => setTimeout(resolve));
    await fixture.whenStable();
  };
  return {
    fixture,
    root,
    picked,
    text: () => root.textContent.replace(/\s+/g, ' '),
    async choose(file) {
      const box = root.querySelector('input')!;
      Object.defineProperty(box, 'files', { value: [file], configurable: true });
      box.dispatchEvent(new Event('change'));
      await settle();
    },
    async press(words) {
      const button = [...root.querySelectorAll('button')].find((one) => one.textContent.trim() === words);
      if (!button) throw new Error(`No button says ${words}`);
      button.click();
      await settle();
    },
    async select(index, value) {
      const box = root.querySelectorAll('select')[index]!;
      box.value = value;
      box.dispatchEvent(new Event('change'));
      await settle();
    },
  };
}

describe('LoggerPicker', () => {
  it('preselects the likeliest column and hands it out in kelvin', async () => {
    const shown = await show();
    await shown.choose(fileOf(GOOD));
    expect(shown.root.querySelector('select')?.selectedOptions[0]?.textContent.trim()).toBe('Air (°F)');
    expect(shown.picked).toHaveLength(1);
    expect(shown.picked[0]).toMatchObject({ file: { name: 'log.csv', rows: 2 }, startText: '0' });
    expect(shown.picked[0]?.columns[0]?.values[0]).toBeCloseTo(283.15, 9);
    expect(shown.text()).toContain('2 rows over 10 s, from 0 on');
  });

  it('asks for the unit of a column that names none, and takes nothing before', async () => {
    const shown = await show();
    await shown.choose(fileOf(GOOD));
    await shown.select(0, '0');
    expect(shown.picked.at(-1)).toBeNull();
    expect(shown.text()).toContain('Unit of “Ch1”, which the file does not say');
    await shown.select(1, 'degC');
    expect(shown.picked.at(-1)?.columns[0]?.heading).toBe('Ch1');
    expect(shown.picked.at(-1)?.columns[0]?.values[1]).toBeCloseTo(275.15, 9);
    await shown.select(0, '1');
    expect(shown.picked.at(-1)?.columns[0]?.heading).toBe('Air (°F)');
  });

  it('says so when no column fits', async () => {
    const shown = await show();
    await shown.choose(fileOf('Time (s),Suction (psig)\n0,50\n10,41'));
    expect(shown.text()).toContain('No column can be this: temperature.');
    expect(shown.picked.at(-1)).toBeNull();
  });

  it('asks what plain numbers count and reads again', async () => {
    const shown = await show();
    await shown.choose(fileOf('Time,Air (°F)\n0,50\n10,41'));
    expect(shown.text()).toContain('The times in log.csv are plain numbers. What do they count?');
    await shown.press('Minutes');
    expect([...(shown.picked.at(-1)?.times ?? [])]).toEqual([0, 600]);
    expect(shown.text()).not.toContain('plain numbers');
  });

  it('reads dates the other way when told, and keeps the column that was chosen', async () => {
    const shown = await show();
    await shown.choose(
      fileOf('Date,Ch1 (°F),Ch2 (°F)\n02/03/2026 10:00,50,1\n02/03/2026 11:00,41,2\n03/03/2026 10:00,41,3'),
    );
    await shown.select(0, '1');
    expect(shown.text()).toContain('They were read as month/day');
    expect(shown.picked.at(-1)?.times[2]).toBe(29 * 86_400 - 86_400);
    await shown.press('Read as day/month');
    expect(shown.picked.at(-1)?.times[2]).toBe(86_400);
    expect(shown.picked.at(-1)?.columns[0]?.heading).toBe('Ch2 (°F)');
    expect(shown.text()).toContain('They were read as day/month');
  });

  it('asks what a comma is and reads again', async () => {
    const shown = await show();
    await shown.choose(fileOf('Time (s);Air (°F)\n0;1,250\n10;1,375\n20;40'));
    expect(shown.text()).toContain('Numbers whose comma can be a decimal mark or group thousands: 2.');
    await shown.press('The decimal mark');
    expect(shown.picked.at(-1)?.columns[0]?.values[0]).toBeCloseTo((1.25 + 459.67) / 1.8, 9);
  });

  it.each([
    ['notText', 'is not text', 'no es texto'],
    ['tooShort', 'fewer than two rows', 'menos de dos filas'],
    ['tooLong', 'is too long', 'es muy largo'],
    ['noTimeColumn', 'is a time', 'es una hora'],
    ['noTimeUnit', 'What do they count?', '¿Qué cuentan?'],
    ['cannotOpen', 'does not hand over', 'no entrega'],
  ] as const)('says in both languages that a file is refused: %s', async (reason: LogRefusal, en, es) => {
    for (const [language, words] of [
      ['en', en],
      ['es', es],
    ] as const) {
      TestBed.resetTestingModule();
      const shown = await show(language, () => of({ kind: 'done', reading: { ok: false, reason } }));
      await shown.choose(fileOf('', 'box 7.csv'));
      expect(shown.text()).toContain(words);
      expect(shown.text()).toContain('box 7.csv');
      expect(shown.picked).toEqual([]);
    }
  });

  it('keeps what was taken when the next file is refused, or its reading is cancelled', async () => {
    const shown = await show();
    await shown.choose(fileOf(GOOD));
    await shown.choose(fileOf('nothing', 'other.csv'));
    expect(shown.text()).toContain('other.csv has fewer than two rows');
    expect(shown.text()).toContain('What was taken before stays as it is.');
    expect(shown.picked).toHaveLength(1);
    expect(shown.root.querySelector('select')?.value).toBe('1');
  });

  it('shows how far it is and stops when told', async () => {
    let isCancelled = false;
    const shown = await show('en', () => {
      return new Observable<LogStage>((listener) => {
        listener.next({ kind: 'reading', share: 0.25 });
        return () => (isCancelled = true);
      });
    });
    await shown.choose(fileOf(GOOD));
    expect(shown.root.querySelector('progress')?.value).toBe(0.25);
    expect(shown.root.querySelector('input')?.disabled).toBe(true);
    await shown.press('Cancel');
    expect(isCancelled).toBe(true);
    expect(shown.root.querySelector('progress')).toBeNull();
    expect(shown.root.querySelector('input')?.disabled).toBe(false);
  });

  it('says that reading failed, and reports the mistake', async () => {
    const told: unknown[] = [];
    TestBed.configureTestingModule({
      providers: [{ provide: ErrorHandler, useValue: { handleError: (error: unknown) => told.push(error) } }],
    });
    const shown = await show('en', () => throwError(() => new RangeError('ours')));
    await shown.choose(fileOf(GOOD));
    expect(shown.text()).toContain('Reading log.csv failed');
    expect(told).toHaveLength(1);
  });
});

describe('LoggerNotes', () => {
  const PROBLEMS: readonly (readonly [LoggerProblem, string, string])[] = [
    [{ kind: 'ambiguousDate', taken: 'monthFirst', changesElapsed: true }, 'other times', 'otros tiempos'],
    [
      { kind: 'ambiguousDate', taken: 'dayFirst', changesElapsed: false },
      'the same either way',
      'los mismos',
    ],
    [{ kind: 'repeatedTimes', count: 3 }, 'same time as another: 3', 'misma hora que otra: 3'],
    [{ kind: 'unorderedTimes', count: 4 }, 'put in order', 'en orden'],
    [
      {
        kind: 'gaps',
        count: 2,
        medianStep: 60,
        first: [
          { from: 0, to: 600 },
          { from: 7200, to: 18_000 },
        ],
      } as unknown as LoggerProblem,
      'Stretches without samples: 2. The longest lasts 3.0 h, from 2.0 h on; usually there is a sample every 1 min.',
      'El más largo dura 3.0 h',
    ],
    [
      { kind: 'unreadableCells', count: 9, first: [{ row: 12, heading: 'Air', text: 'Err{{heading}}' }] },
      'Row 12, Air: “Err{{heading}}”',
      'Fila 12, Air',
    ],
    [{ kind: 'ambiguousNumbers', count: 5 }, 'What is the comma?', '¿Qué es la coma?'],
    [{ kind: 'emptyCells', count: 6 }, 'Empty cells: 6.', 'Celdas vacías: 6.'],
    [{ kind: 'pastMidnight', count: 1 }, 'They pass midnight', 'Pasan la medianoche'],
    [{ kind: 'hoursAndMinutes' }, 'as hours and minutes', 'horas y minutos'],
    [
      { kind: 'columnWithoutNumbers', heading: 'Alarm' },
      'Column “Alarm” has no number',
      'La columna «Alarm»',
    ],
    [{ kind: 'columnsLeftOut', count: 7 }, 'first 64, left out: 7', 'primeras 64, omitidas: 7'],
  ];

  it.each(PROBLEMS)('says in both languages: %j', async (problem, en, es) => {
    for (const [language, words] of [
      ['en', en],
      ['es', es],
    ] as const) {
      TestBed.resetTestingModule();
      TestBed.configureTestingModule({ imports: [LoggerNotes, withWords(language)] });
      const fixture = TestBed.createComponent(LoggerNotes);
      fixture.componentRef.setInput('problems', [problem]);
      await fixture.whenStable();
      expect((fixture.nativeElement as HTMLElement).textContent).toContain(words);
    }
  });
});
