import { describe, expect, it } from '@jest/globals';
import type { SuperheatAnswer } from '../checklist/kinds/superheat';
import { buildSignature, buildStep, pair, SEA_LEVEL, steady } from '../checklist/step.fixture';
import type { Answer, Step, StepList } from '../checklist/step';
import { CONFIRM, confirmStep, deepFreeze, hashOf, standing, stored, Story } from './entries.fixture';
import { applyEntry, emptyFold, foldEntries, missingSteps, type FoldEntry } from './fold';
import { foldStateSchema, stepFoldSchema } from './fold-state';
import { viewSequence } from './sequence-view';
import { changeOf, momentOf, staleSteps } from './stale';

const text = { en: 'Words', es: 'Palabras' };
const band = { lowK: 0.1, highK: 20 };
const STEPS: readonly Step[] = [
  buildStep('superheat', { key: 'coilA', band }),
  buildStep('superheat', { key: 'coilB', band }),
  buildStep('reading', { key: 'regulator', changes: true }),
  buildStep('reading', { key: 'thermometer' }),
  confirmStep('setPoint', { changes: true }),
  buildStep('choose', {
    key: 'valveType',
    options: [
      { value: 'kept', label: text, outcome: 'within' },
      { value: 'swapped', label: text, outcome: 'within', changes: true },
    ],
  }),
  buildStep('measurement', { key: 'charge', method: 'subcooling', changes: true }),
  buildStep('signature', { key: 'signed', required: false }),
];
const LIST: StepList = {
  format: 1,
  template: { key: 'circuit', version: 1, title: text },
  facts: SEA_LEVEL,
  sections: [{ key: 'a', title: text }],
  steps: [...STEPS],
};

const READING: Answer = { kind: 'reading', value: { text: '36', unit: 'degF' } };
const SIGNED: Answer = { kind: 'signature', signature: buildSignature() };
const SUBCOOLED: Answer = {
  kind: 'measurement',
  method: 'subcooling',
  quantities: {
    liquidPressure: { text: '225', unit: 'psig' },
    lineTemperature: { text: '86', unit: 'degF' },
  },
  words: {},
  rows: [],
};

/** A superheat that counts, with the turns of the stem that came before it. */
const read = (...turnedAt: string[]): SuperheatAnswer => ({
  ...steady(pair('45', '28')),
  turns: turnedAt.map((at) => ({ turns: 0.5, direction: 'clockwise', at: day(at) })),
});

const day = (time: string): string => `2027-01-15T${time}Z`;

/** The entry as it was made at that time by its device's clock. */
const at = (time: string, entry: FoldEntry): FoldEntry => ({
  ...entry,
  body: { ...entry.body, deviceTime: day(time) },
});

const again = (entries: readonly FoldEntry[]): Record<string, string> =>
  Object.fromEntries(
    viewSequence(LIST, entries).steps.flatMap((view) => (view.again ? [[view.step.key, view.again]] : [])),
  );

const keys = (entries: readonly FoldEntry[]): string[] =>
  missingSteps(foldEntries(entries, STEPS), STEPS).map(({ key }) => key);

describe('a superheat turns stale', () => {
  it('by a turn of another valve after it was read, on the same device', () => {
    const story = new Story(STEPS);
    const entries = [
      at('12:00:00', story.answer(1, 'coilA', read())),
      at('12:30:00', story.answer(1, 'coilB', read('12:10:00'))),
    ];
    expect(again(entries)).toEqual({ coilA: 'stale' });
    expect(keys(entries)).toContain('coilA');
    expect(keys(entries)).not.toContain('coilB');
    expect(foldEntries(entries, STEPS).steps['coilA']).toMatchObject({
      counts: true,
      reopenedBy: entries[1]?.body.id,
    });
  });

  it('not by a turn before it was read, though recorded after it', () => {
    const story = new Story(STEPS);
    const entries = [
      at('12:20:00', story.answer(1, 'coilA', read())),
      at('12:30:00', story.answer(1, 'coilB', read('12:10:00'))),
    ];
    expect(again(entries)).toEqual({});
  });

  it('by the last of several turns, in whatever order they stand', () => {
    const story = new Story(STEPS);
    const first = at('12:20:00', story.answer(1, 'coilA', read()));
    const turned = (turns: SuperheatAnswer) => at('12:40:00', story.answer(1, 'coilB', turns));
    expect(again([first, turned(read('12:10:00', '12:25:00'))])).toEqual({ coilA: 'stale' });
    expect(again([first, turned(read('12:25:00', '12:10:00'))])).toEqual({ coilA: 'stale' });
    expect(again([first, turned(read('12:05:00', '12:10:00'))])).toEqual({});
  });

  it('by times as times, with however many digits they are written', () => {
    const story = new Story(STEPS);
    const first = at('12:10:00', story.answer(1, 'coilA', read()));
    expect(again([first, story.answer(1, 'coilB', read('12:10:00.500'))])).toEqual({ coilA: 'stale' });
    expect(again([first, story.answer(1, 'coilB', read('12:10'))])).toEqual({});
    const exact = at('12:10:00.500', story.answer(1, 'coilA', read()));
    expect(again([exact, story.answer(1, 'coilB', read('12:10:00'))])).toEqual({});
  });

  it('by a turn on another device whatever the clocks say, since it was in the chain before', () => {
    const story = new Story(STEPS);
    const entries = [
      at('18:00:00', story.answer(2, 'coilA', read())),
      at('12:30:00', story.answer(1, 'coilB', read('12:10:00'))),
    ];
    expect(again(entries)).toEqual({ coilA: 'stale' });
  });

  it('never by its own turns, and not by a superheat without any', () => {
    const story = new Story(STEPS);
    const first = at('12:00:00', story.answer(1, 'coilA', read()));
    expect(again([first, at('12:30:00', story.answer(1, 'coilA', read('12:10:00')))])).toEqual({});
    expect(again([first, at('12:30:00', story.answer(1, 'coilB', read()))])).toEqual({});
    expect(again([first, story.answer(1, 'coilB', steady(pair('45', '28')))])).toEqual({});
  });

  it('also by a turn whose own reading doesn’t count: turned is turned', () => {
    const story = new Story(STEPS);
    const unread = { ...read('12:10:00'), asLeft: steady(pair('', '28')).asLeft };
    const entries = [at('12:00:00', story.answer(1, 'coilA', read())), story.answer(1, 'coilB', unread)];
    expect(again(entries)).toEqual({ coilA: 'stale' });
  });

  it.each<[string, Answer, boolean]>([
    ['regulator', READING, true],
    ['thermometer', READING, false],
    ['setPoint', CONFIRM, true],
    ['valveType', { kind: 'choose', value: 'swapped' }, true],
    ['valveType', { kind: 'choose', value: 'kept' }, false],
    ['valveType', { kind: 'choose', value: 'gone' }, false],
    ['charge', SUBCOOLED, true],
    // An answer of another kind than the step's doesn't say that anything was set.
    ['regulator', CONFIRM, false],
  ])('by what the template marks as a change: %s (case %#)', (key, answer, isStale) => {
    const story = new Story(STEPS);
    const entries = [
      at('12:00:00', story.answer(1, 'coilA', read())),
      at('12:10:00', story.answer(1, key, answer)),
    ];
    expect(again(entries)['coilA']).toBe(isStale ? 'stale' : undefined);
  });

  it('not by a change before it, nor by one that was said not to apply', () => {
    const story = new Story(STEPS);
    const [set, reading] = [
      at('12:00:00', story.answer(1, 'regulator', READING)),
      at('12:10:00', story.answer(1, 'coilA', read())),
    ];
    expect(again([set, reading])).toEqual({});
    expect(again([reading, at('12:20:00', story.notApplicable(1, 'regulator'))])).toEqual({});
  });

  it.each(['late', 'held'] as const)('not by an entry that stands %s', (value) => {
    const story = new Story(STEPS);
    const first = at('12:00:00', story.answer(1, 'coilA', read()));
    const turned = at('12:30:00', story.answer(1, 'coilB', read('12:10:00')));
    expect(again([first, standing(turned, value)])).toEqual({});
  });

  it('not after approval: what comes then stands late and touches nothing', () => {
    const story = new Story([STEPS[0] as Step, STEPS[1] as Step]);
    const steps = STEPS.slice(0, 2);
    const [a, b] = [at('12:00:00', story.answer(1, 'coilA', read())), story.answer(1, 'coilB', read())];
    const approved = foldEntries(
      stored([a, b, story.submission(1), story.review('approved', hashOf(3))]),
      steps,
    );
    expect(approved.state).toBe('approved');
    const late = standing(story.answer(1, 'coilB', read('13:00:00')), 'late');
    expect(applyEntry(approved, late, steps).steps).toEqual(approved.steps);
  });

  it('not when it doesn’t count, was said not to apply, or was asked again before', () => {
    const story = new Story(STEPS);
    const turned = at('12:30:00', story.answer(1, 'coilB', read('12:10:00')));
    const unread = story.answer(1, 'coilA', steady(pair('', '28')));
    expect(foldEntries([unread, turned], STEPS).steps['coilA']?.reopenedBy).toBeNull();
    expect(again([story.notApplicable(1, 'coilA'), turned])).toEqual({});
    const first = at('12:00:00', story.answer(1, 'coilA', read()));
    const set = at('12:05:00', story.answer(1, 'setPoint'));
    expect(foldEntries([first, set, turned], STEPS).steps['coilA']?.reopenedBy).toBe(set.body.id);
  });
});

describe('a stale superheat', () => {
  it('is missing for a submission until it is answered anew', () => {
    const story = new Story(STEPS);
    const steps = STEPS.slice(0, 2);
    const entries = [
      at('12:00:00', story.answer(1, 'coilA', read())),
      at('12:30:00', story.answer(1, 'coilB', read('12:10:00'))),
    ];
    const submitted = [...entries, story.submission(1)];
    const waiting = foldEntries(submitted, steps);
    expect(missingSteps(waiting, steps).map(({ key }) => key)).toEqual(['coilA']);
    expect(waiting).toMatchObject({ state: 'open', pending: [expect.anything()] });
    const done = foldEntries([...submitted, at('12:40:00', story.answer(1, 'coilA', read()))], steps);
    expect(missingSteps(done, steps)).toEqual([]);
    expect(done).toMatchObject({ state: 'submitted', pending: [] });
    expect(done.steps['coilA']?.reopenedBy).toBeNull();
  });

  it('stays stale by an answer that doesn’t count', () => {
    const story = new Story(STEPS);
    const entries = [
      at('12:00:00', story.answer(1, 'coilA', read())),
      at('12:30:00', story.answer(1, 'coilB', read('12:10:00'))),
      at('12:40:00', story.answer(1, 'coilA', { ...read(), conditions: [] })),
    ];
    expect(again(entries)).toEqual({ coilA: 'stale' });
    expect(keys(entries)).toContain('coilA');
  });

  it('that is set anew makes the other stale in its turn', () => {
    const story = new Story(STEPS);
    const entries = [
      at('12:00:00', story.answer(1, 'coilA', read())),
      at('12:30:00', story.answer(1, 'coilB', read('12:10:00'))),
      at('13:00:00', story.answer(1, 'coilA', read('12:40:00'))),
    ];
    expect(again(entries)).toEqual({ coilB: 'stale' });
  });
});

describe('why a step is asked again', () => {
  it('is said: by a remark, a change of the checklist, what came after a signature, or a change on the circuit', () => {
    const story = new Story(STEPS);
    const entries = [
      at('12:00:00', story.answer(1, 'coilA', read())),
      at('12:10:00', story.answer(1, 'thermometer', READING)),
      at('12:15:00', story.answer(1, 'valveType', { kind: 'choose', value: 'kept' })),
      at('12:20:00', story.answer(1, 'signed', SIGNED)),
      at('12:30:00', story.answer(1, 'coilB', read('12:25:00'))),
      story.expansion(hashOf(9), ['thermometer']),
    ];
    expect(again(entries)).toEqual({ coilA: 'stale', signed: 'signedBefore', thermometer: 'changed' });
  });

  it('is a remark when the lead sent it back, a superheat too, and a change of the checklist for one too', () => {
    const story = new Story(STEPS);
    const steps = STEPS.slice(0, 2);
    const answers = [
      at('12:00:00', story.answer(1, 'coilA', read())),
      at('12:30:00', story.answer(1, 'coilB', read())),
    ];
    const back = [...answers, story.submission(1), story.review('sentBack', hashOf(3), ['coilB'])];
    const view = viewSequence({ ...LIST, steps: [...steps] }, back);
    expect(view.steps.map((step) => step.again)).toEqual([null, 'remark']);
    expect(again([...answers, story.expansion(hashOf(9), ['coilA'])])).toEqual({ coilA: 'changed' });
  });

  it('is nothing for a step without an answer, remarked or not', () => {
    const story = new Story(STEPS);
    expect(again([story.answer(1, 'coilA', read())])).toEqual({});
    expect(again([])).toEqual({});
  });
});

describe('the fold of a superheat', () => {
  it('keeps when it was read, by its own device, as long as it counts', () => {
    const story = new Story(STEPS);
    const entry = at('12:00:00', story.answer(1, 'coilA', read('11:30:00')));
    const state = foldEntries([entry, story.answer(1, 'thermometer', READING)], STEPS);
    expect(state.steps['coilA']?.readAt).toEqual(momentOf(entry.body));
    expect(state.steps['thermometer']).not.toHaveProperty('readAt');
    const preliminary = story.answer(1, 'coilA', { ...read(), conditions: [] });
    expect(foldEntries([entry, preliminary], STEPS).steps['coilA']).not.toHaveProperty('readAt');
    expect(foldStateSchema.parse(JSON.parse(JSON.stringify(state)))).toEqual(state);
  });

  it('of an older program, without that time, is read and carried on; such a reading turns stale by nothing', () => {
    const story = new Story(STEPS);
    const state = foldEntries([story.answer(1, 'coilA', read())], STEPS);
    const { readAt: _readAt, ...old } = state.steps['coilA'] ?? {};
    expect(stepFoldSchema.parse(old)).toEqual(old);
    const carried = foldStateSchema.parse(JSON.parse(JSON.stringify({ ...state, steps: { coilA: old } })));
    const next = applyEntry(carried, story.answer(1, 'coilB', read('23:00:00')), STEPS);
    expect(next.steps['coilA']).toEqual(old);
  });

  it('does not change the state that it is given', () => {
    const story = new Story(STEPS);
    const state = deepFreeze(foldEntries([at('12:00:00', story.answer(1, 'coilA', read()))], STEPS));
    const next = applyEntry(state, deepFreeze(story.answer(1, 'coilB', read('12:10:00'))), STEPS);
    expect(next.steps['coilA']?.reopenedBy).not.toBeNull();
    expect(state.steps['coilA']?.reopenedBy).toBeNull();
  });
});

describe('what was recorded, whatever is asked today', () => {
  const story = new Story(STEPS);
  const entries = [
    at('12:00:00', story.answer(1, 'coilA', read())),
    at('12:10:00', story.answer(1, 'regulator', READING)),
  ];

  it('decides what is stale: a template that marks the step no more, or asks it no more, changes no history', () => {
    const unmarked = STEPS.map((step) =>
      step.key === 'regulator' ? buildStep('reading', { key: step.key }) : step,
    );
    for (const steps of [STEPS, unmarked, STEPS.slice(0, 2)]) {
      expect(foldEntries(entries, steps).steps['coilA']?.reopenedBy).toBe(entries[1]?.body.id);
    }
  });

  it('knows of no change without the mark of that day', () => {
    const set = story.answer(1, 'regulator', READING);
    if (set.body.content.kind !== 'answer') throw new Error('no answer');
    expect(changeOf(set.body, set.body.content, set.server.judgement)).toEqual(momentOf(set.body));
    expect(changeOf(set.body, set.body.content, null)).toBeNull();
    expect(staleSteps(emptyFold(), 'regulator', momentOf(set.body))).toEqual([]);
  });
});

describe('a reading that arrives after a change it was taken before', () => {
  const story = new Story(STEPS);
  const turned = at('12:30:00', story.answer(1, 'coilB', read('12:20:00')));

  it('is stale at once, and leaves a stale one stale', () => {
    const before = at('12:10:00', story.answer(1, 'coilA', read()));
    expect(again([turned, before])).toEqual({ coilA: 'stale' });
    const fresh = at('12:05:00', story.answer(1, 'coilA', read()));
    expect(again([fresh, turned, before])).toEqual({ coilA: 'stale' });
  });

  it('is fresh when it was taken after it, or on another device', () => {
    expect(again([turned, at('12:40:00', story.answer(1, 'coilA', read()))])).toEqual({});
    expect(again([turned, at('12:10:00', story.answer(2, 'coilA', read()))])).toEqual({});
    // Its own turns came before its own reading.
    expect(again([turned, at('12:30:00', story.answer(1, 'coilB', read('12:20:00')))])).toEqual({});
  });
});
