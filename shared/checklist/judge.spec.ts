import { describe, expect, it } from '@jest/globals';
import { judge } from './judge';
import { judgementSchema } from './judgement';
import { answerSchema, stepSchema, type Answer, type StepKind } from './step';
import { buildSignature, buildStep, pair, SEA_LEVEL, steady } from './step.fixture';

const ANSWERS: { readonly [K in StepKind]: Answer } = {
  confirm: { kind: 'confirm', confirmed: true },
  choose: { kind: 'choose', value: 'clear' },
  reading: { kind: 'reading', value: { text: '36', unit: 'degF' } },
  superheat: steady(pair('45', '28')),
  measurement: {
    kind: 'measurement',
    method: 'subcooling',
    quantities: {
      liquidPressure: { text: '225', unit: 'psig' },
      lineTemperature: { text: '86', unit: 'degF' },
    },
    words: {},
    rows: [],
  },
  trend: {
    kind: 'trend',
    file: { name: 'air.csv', sha256: 'b'.repeat(64), rows: 3 },
    startText: '2026-12-01 08:00',
    column: 'Air (°F)',
    // Every quarter of an hour over a day, always in the band.
    atS: Array.from({ length: 97 }, (_, index) => index * 900),
    temperatureK: Array.from({ length: 97 }, () => 275),
  },
  photo: {
    kind: 'photo',
    photos: [
      { sha256: 'a'.repeat(64), originalSha256: null, bytes: 1, width: 1, height: 1, capturedAt: null },
    ],
  },
  note: { kind: 'note', text: 'Words' },
  override: { kind: 'override', phase: 'putBack', remark: '' },
  signature: { kind: 'signature', signature: buildSignature() },
};
const KINDS = Object.keys(ANSWERS) as StepKind[];
const pairs = KINDS.flatMap((asked) => KINDS.map((given) => [asked, given] as const));

describe('judge', () => {
  it.each(KINDS)('counts a good answer to a step of the kind %s', (kind) => {
    expect(judge(buildStep(kind), ANSWERS[kind], SEA_LEVEL).counts).toBe(true);
  });

  it.each(pairs.filter(([asked, given]) => asked !== given))(
    'does not count on a step of the kind %s an answer of the kind %s',
    (asked, given) => {
      expect(judge(buildStep(asked), ANSWERS[given], SEA_LEVEL)).toMatchObject({
        outcome: 'recorded',
        counts: false,
        doubts: [{ kind: 'wrongAnswerKind', severity: 'refuse' }],
      });
    },
  );

  it.each(pairs)('gives a judgement that can be stored for a %s step and a %s answer', (asked, given) => {
    const judgement = judge(buildStep(asked), ANSWERS[given], SEA_LEVEL);
    expect(judgementSchema.parse(JSON.parse(JSON.stringify(judgement)))).toEqual(judgement);
  });

  it('covers every kind that a template and an entry can have', () => {
    expect(KINDS.every((kind) => stepSchema.safeParse(buildStep(kind)).success)).toBe(true);
    expect(KINDS.every((kind) => answerSchema.safeParse(ANSWERS[kind]).success)).toBe(true);
    expect(stepSchema.def.options).toHaveLength(KINDS.length);
    expect(answerSchema.def.options).toHaveLength(KINDS.length);
  });
});
