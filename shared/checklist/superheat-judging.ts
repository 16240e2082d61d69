import { atmosphereFromBarometer } from '../refrigeration/barometer';
import { judgeSuperheat } from '../refrigeration/superheat-band';
import { standingOf } from '../refrigeration/uncertainty/standing';
import {
  superheatUncertainty,
  type UncertaintyResult,
} from '../refrigeration/uncertainty/superheat-uncertainty';
import { kelvinDifference, metre, pascalAbsolute, type KelvinDifference } from '../units/quantity';
import type { SequenceFacts } from './facts';
import {
  doubtsLetCount,
  plainJudgement,
  refusedJudgement,
  type Doubt,
  type Figure,
  type Judgement,
} from './judgement';
import type { SuperheatAnswer, SuperheatStep } from './kinds/superheat';
import { saturationOf } from './saturation-of';
import { DEFAULT_WAIT_S, SUPERHEAT_CONDITIONS } from './superheat-conditions';
import { observe, type Observed, type ObservingScene } from './superheat-observing';
import { readTypedValue } from './typed-value';

/**
 * Judges the superheat of one coil: saturation (dew) at the coil's outlet pressure, the difference to the line
 * temperature at the bulb, and that against the fixture's band. A hunting valve is judged by the mean of its high and
 * its low (common practice, no source), or by the time-weighted mean of a series where the template says so; a minimum
 * at or below zero is flagged whatever the mean is. Never clamped.
 *
 * A reading whose conditions weren't met is kept and doesn't count; one taken elsewhere with an allowance for the line
 * counts, and is flagged as estimated.
 */
export function judgeSuperheatAnswer(
  step: SuperheatStep,
  answer: SuperheatAnswer,
  facts: SequenceFacts,
): Judgement {
  const table = saturationOf(facts);
  if (!table) return refusedJudgement('unknownRefrigerant');
  const doubts: Doubt[] = [];
  const lineDropPa = readLineDrop(answer, doubts);
  // Without it every figure would be that of the tap, not of the coil.
  if (lineDropPa === null) return plainJudgement('recorded', doubts);
  const scene: ObservingScene = {
    table,
    facts: { ...facts, atmospherePaAbs: readAtmosphere(answer, facts, doubts) },
    gauge: answer.instruments?.gauge ?? 'vented',
    lineDropPa,
  };
  const left = observe(answer.asLeft, scene, doubts);
  if (!left) return { ...plainJudgement('recorded', unique(doubts)), counts: false };
  const foundDoubts: Doubt[] = [];
  const found = answer.asFound ? observe(answer.asFound, scene, foundDoubts) : null;
  // An as-found that can't be read is asked about; it doesn't keep the as-left from counting.
  doubts.push(...foundDoubts.map((doubt) => ({ ...doubt, severity: 'ask' as const })));
  doubts.push(...conditionDoubts(answer), ...settlingDoubts(left), ...turnDoubts(step, answer));

  const mean = meanOf(step, left);
  const band = { low: kelvinDifference(step.band.lowK), high: kelvinDifference(step.band.highK) };
  const verdict = judgeSuperheat(mean, band, left.minimum);
  if (verdict.liquidRisk) doubts.push({ kind: 'liquidRisk', severity: 'ask' });
  const error = errorOf(answer, scene, left, doubts);
  const verdicts = verdictsOf(left, error === null ? null : standingOf(mean, band, error.uncertainty));
  return {
    outcome: verdict.outcome,
    side: verdict.side,
    counts: doubtsLetCount(doubts),
    doubts: unique(doubts),
    ...(verdicts.length > 0 ? { verdicts } : {}),
    figures: [
      ...figuresOf(mean, left, found && meanOf(step, found)),
      ...(error === null
        ? []
        : [{ label: 'superheatUncertainty', value: error.uncertainty, unit: 'K_diff' as const }]),
      ...(answer.turns?.length && answer.waitedS !== undefined
        ? [{ label: 'waited', value: answer.waitedS, unit: 's' as const }]
        : []),
    ],
    limit: { low: step.band.lowK, high: step.band.highK, unit: 'K_diff', source: step.source ?? '' },
    working: [...left.workings, ...(found?.workings ?? []), ...(error === null ? [] : [error.working])].map(
      (working) => ({ ...working, lines: [...working.lines] }),
    ),
  };
}

/** The mean that is held against the band. */
function meanOf(step: SuperheatStep, observed: Observed): KelvinDifference {
  return step.judgedBy === 'timeWeighted' ? (observed.timeWeighted ?? observed.midpoint) : observed.midpoint;
}

/** A sea-level reading at a mountain store is worth several degrees; weather out of the ordinary is only asked about. */
const BAROMETER_DOUBTS = {
  seaLevelCorrected: { kind: 'barometerSeaLevel', severity: 'refuse' },
  farFromElevation: { kind: 'barometerFarOff', severity: 'ask' },
} as const satisfies Record<string, Doubt>;

/** The atmosphere here: the barometer's where somebody read one, else the standard one of the elevation. */
function readAtmosphere({ instruments }: SuperheatAnswer, facts: SequenceFacts, doubts: Doubt[]): number {
  const { barometer } = instruments ?? {};
  if (!barometer) return facts.atmospherePaAbs;
  const typed = readTypedValue(barometer, 'absolutePressure');
  const read = typed.ok ? atmosphereFromBarometer(pascalAbsolute(typed.si), metre(facts.elevationM)) : null;
  if (!typed.ok || !read?.ok) {
    doubts.push({ kind: typed.ok ? 'notPlausible' : typed.problem, severity: 'refuse' });
    return facts.atmospherePaAbs;
  }
  if (read.doubt) doubts.push(BAROMETER_DOUBTS[read.doubt]);
  return read.pressure;
}

/** 5 psi: more than a suction line that works loses; manuals allow about 2. Common practice, no source. */
const MOST_LINE_DROP_PA = 34_474;

/** What the line loses, in pascals; `null` when it was read elsewhere and the loss can't be read. */
function readLineDrop(answer: SuperheatAnswer, doubts: Doubt[]): number | null {
  if (answer.takenAt !== 'elsewhere') return 0;
  const drop = answer.lineDrop ? readTypedValue(answer.lineDrop, 'pressureDifference') : null;
  if (!drop?.ok || drop.si < 0) {
    doubts.push({
      kind: drop && !drop.ok ? drop.problem : drop ? 'notNegatable' : 'incomplete',
      severity: 'refuse',
    });
    return null;
  }
  doubts.push({ kind: 'estimated', severity: 'ask' });
  if (drop.si > MOST_LINE_DROP_PA) doubts.push({ kind: 'notPlausible', severity: 'ask' });
  return drop.si;
}

function conditionDoubts({ conditions }: SuperheatAnswer): Doubt[] {
  const areMet = !conditions || SUPERHEAT_CONDITIONS.every((condition) => conditions.includes(condition));
  return areMet ? [] : [{ kind: 'preliminary', severity: 'keep' }];
}

/**
 * A reading right after a turn shows the turn, not the setting; and a turned valve without a superheat as found leaves
 * nothing to say what the turn did. Both count, and the lead sees them.
 */
function turnDoubts(step: SuperheatStep, { turns = [], waitedS, asFound }: SuperheatAnswer): Doubt[] {
  if (turns.length === 0) return [];
  const isTooSoon = waitedS !== undefined && waitedS < (step.waitS ?? DEFAULT_WAIT_S);
  return [
    ...(asFound ? [] : [{ kind: 'asFoundMissing', severity: 'ask' } as const]),
    ...(isTooSoon ? [{ kind: 'readTooSoon', severity: 'ask' } as const] : []),
  ];
}

/** A series that shows that the valve hasn't settled is a true record of that, and no setting to sign off. */
function settlingDoubts({ settled }: Observed): Doubt[] {
  return settled === 'no' ? [{ kind: 'notSettled', severity: 'keep' }] : [];
}

type KnownError = Extract<UncertaintyResult, { ok: true }>;

function errorOf(
  { instruments }: SuperheatAnswer,
  { table, facts }: ObservingScene,
  { pressure }: Observed,
  doubts: Doubt[],
): KnownError | null {
  if (!instruments?.pressureAccuracy || !instruments.temperatureAccuracy) return null;
  const gauge = readTypedValue(instruments.pressureAccuracy, 'pressureDifference');
  const thermometer = readTypedValue(instruments.temperatureAccuracy, 'temperatureDifference');
  if (!gauge.ok || !thermometer.ok) {
    doubts.push({ kind: 'notANumber', severity: 'ask' });
    return null;
  }
  const result = superheatUncertainty({
    table,
    pressure,
    atmosphere: pascalAbsolute(facts.atmospherePaAbs),
    accuracy: {
      gauge: { kind: 'absolute', limitPa: gauge.si },
      thermometer: kelvinDifference(thermometer.si),
    },
  });
  return result.ok ? result : null;
}

function verdictsOf(left: Observed, standing: ReturnType<typeof standingOf> | null): string[] {
  return [
    // Of two pairs the answer itself says that the valve hunts; of a series it is a finding.
    ...(left.hunts && left.settled !== null ? ['superheat_hunts'] : []),
    ...(left.settled === 'no' ? ['superheat_notSettled'] : []),
    ...(left.settled === 'tooShort' ? ['superheat_watchLonger'] : []),
    ...(standing === 'insideWithinError' || standing === 'outsideWithinError'
      ? [`superheat_${standing}`]
      : []),
  ];
}

function figuresOf(mean: KelvinDifference, left: Observed, found: KelvinDifference | null): Figure[] {
  const figures: Figure[] = [{ label: 'superheat', value: mean, unit: 'K_diff' }];
  if (left.maximum > left.minimum || left.hunts) {
    figures.push({ label: 'superheatLow', value: left.minimum, unit: 'K_diff' });
    figures.push({ label: 'superheatHigh', value: left.maximum, unit: 'K_diff' });
  }
  if (left.timeWeighted !== null) {
    figures.push({ label: 'superheatMidpoint', value: left.midpoint, unit: 'K_diff' });
    figures.push({ label: 'superheatTimeWeighted', value: left.timeWeighted, unit: 'K_diff' });
  }
  figures.push(...left.figures);
  if (found !== null) figures.push({ label: 'superheatAsFound', value: found, unit: 'K_diff' });
  return figures;
}

function unique(doubts: readonly Doubt[]): Doubt[] {
  return doubts.filter((doubt, index) => doubts.findIndex((other) => other.kind === doubt.kind) === index);
}
