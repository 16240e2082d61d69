import { unreachable } from '#shared/failures/unreachable';
import { METHODS } from '#shared/checklist/methods/methods';
import type { Level } from '#shared/plant/words';
import type { Dimension } from '#shared/units/unit';
import type { Scope } from './fact-fields';
import type { WrittenStep } from './step-shape';
import type { TemplateChecker } from './template-checker';
import type { Condition, PlacedLimit, StepBody, StepDocument } from './template-document';
import type { YamlPath } from './yaml-document';

/** Where a step stands: everything that its checks need to know of its surroundings. */
interface Place {
  readonly checker: TemplateChecker;
  readonly path: YamlPath;
  readonly scope: Scope;
  readonly guards: readonly (Condition | null)[];
}

/** Checks a step and gives it its checked form; what is wrong is reported to the checker. */
export function checkStep(
  checker: TemplateChecker,
  path: YamlPath,
  step: WrittenStep,
  sectionWhen: Condition | null,
  level: Level,
): StepDocument {
  const scope: Scope = step.for_each ?? level;
  if (step.for_each && level !== 'circuit') {
    checker.report(
      [...path, 'for_each'],
      `Only a circuit has fixtures and coils; this template is for a ${level}.`,
    );
  }
  checker.text([...path, 'title'], step.title, scope);
  checker.text([...path, 'instruction'], step.instruction, scope);
  checker.text([...path, 'caution', 'text'], step.caution?.text, scope);
  const when =
    step.when === undefined ? null : checker.condition([...path, 'when'], step.when, scope, [sectionWhen]);
  const body = checkBody({ checker, path, scope, guards: [sectionWhen, when] }, step);
  if (step.source === undefined && hasCriterion(body)) {
    checker.report(
      [...path, 'source'],
      'A criterion names its source: a publication\'s title, "From the schedule" or "Common practice".',
    );
  }
  return {
    key: step.key,
    scope,
    when,
    title: step.title,
    instruction: step.instruction ?? null,
    caution: step.caution ?? null,
    required: step.required ?? true,
    source: step.source ?? null,
    body,
    offset: checker.yaml.offsetOf([...path, 'key']),
  };
}

function hasCriterion(body: StepBody): boolean {
  switch (body.kind) {
    case 'reading':
      return body.low !== null || body.high !== null;
    case 'superheat':
    case 'trend':
      return true;
    case 'measurement':
      return body.criteria.size > 0;
    case 'choose':
      return body.options.some((option) => option.outcome !== 'recorded');
    default:
      return false;
  }
}

function checkBody(place: Place, step: WrittenStep): StepBody {
  const { checker, path, scope } = place;
  switch (step.kind) {
    case 'confirm':
      return { kind: step.kind, changes: step.changes ?? false };
    case 'note':
      return { kind: step.kind };
    case 'choose':
      return checkOptions(place, step);
    case 'reading':
      return checkReading(place, step);
    case 'superheat':
      return checkSuperheat(place, step);
    case 'measurement':
      return checkMeasurement(place, step);
    case 'trend':
      return checkTrend(place, step);
    case 'photo':
      return { kind: 'photo', minCount: step.min_count };
    case 'override':
      checker.text([...path, 'subject'], step.subject, scope);
      return { kind: 'override', subject: step.subject };
    case 'signature':
      checker.text([...path, 'meaning'], step.meaning, scope);
      return { kind: 'signature', meaning: step.meaning };
    default:
      return unreachable(step);
  }
}

function checkOptions({ checker, path, scope }: Place, step: WrittenStep & { kind: 'choose' }): StepBody {
  const seen = new Set<string>();
  step.options.forEach((option, index) => {
    const optionPath = [...path, 'options', index];
    checker.text([...optionPath, 'label'], option.label, scope);
    if (seen.has(option.value))
      checker.report([...optionPath, 'value'], `\`${option.value}\` stands here twice.`);
    seen.add(option.value);
  });
  const options = step.options.map((option) => ({ ...option, changes: option.changes ?? false }));
  return { kind: 'choose', options };
}

function checkReading(place: Place, step: WrittenStep & { kind: 'reading' }): StepBody {
  const { low, high } = step.limits ?? {};
  const path = [...place.path, 'limits'];
  if (step.limits && low === undefined && high === undefined) {
    place.checker.report(path, '`limits` holds low, high or both; without it the value is recorded.');
  }
  const limits = checkLimits(place, path, step.dimension, low, high);
  return { kind: 'reading', changes: step.changes ?? false, dimension: step.dimension, ...limits };
}

function checkSuperheat(place: Place, step: WrittenStep & { kind: 'superheat' }): StepBody {
  if (place.scope !== 'coil') {
    place.checker.report([...place.path, 'kind'], 'Superheat is set per coil: write for_each: coil.');
  }
  const rest = {
    kind: 'superheat',
    judgedBy: step.judged_by === 'time_weighted' ? 'timeWeighted' : 'midpoint',
    wait: checkLimit(place, 'wait', step.wait, 'duration'),
  } as const;
  if (!step.band) return { ...rest, band: null };
  const path = [...place.path, 'band'];
  const { low, high } = checkLimits(place, path, 'temperatureDifference', step.band.low, step.band.high);
  return { ...rest, band: low && high ? { low, high } : null };
}

/** A template writes `least_hold` where the method says `leastHold`. */
const written = (key: string): string => key.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`);

function checkMeasurement(place: Place, step: WrittenStep & { kind: 'measurement' }): StepBody {
  const declared = METHODS[step.method].criteria;
  const criteria = new Map<string, PlacedLimit>();
  const path = [...place.path, 'criteria'];
  for (const criterion of declared) {
    const name = written(criterion.key);
    const text = step.criteria?.[name];
    if (text === undefined) {
      if (criterion.required)
        place.checker.report(
          [...place.path, 'method'],
          `\`${step.method}\` needs the criterion \`${name}\`.`,
        );
      continue;
    }
    const limit = place.checker.limit([...path, name], text, criterion.dimension, place.scope, place.guards);
    if (limit) criteria.set(criterion.key, limit);
  }
  const known = declared.map((criterion) => written(criterion.key));
  for (const name of Object.keys(step.criteria ?? {})) {
    if (known.includes(name)) continue;
    const offer = known.length === 0 ? 'it has none' : `it has ${known.join(', ')}`;
    place.checker.report([...path, name], `\`${step.method}\` has no criterion \`${name}\`: ${offer}.`);
  }
  return { kind: 'measurement', changes: step.changes ?? false, method: step.method, criteria };
}

function checkTrend(place: Place, step: WrittenStep & { kind: 'trend' }): StepBody {
  const band = [...place.path, 'band'];
  return {
    kind: 'trend',
    ...checkLimits(place, band, 'temperature', step.band.low, step.band.high),
    hold: checkLimit(place, 'hold', step.hold, 'duration'),
    longestExcursion: checkLimit(place, 'longest_excursion', step.longest_excursion, 'duration'),
  };
}

function checkLimit(
  { checker, path, scope, guards }: Place,
  key: string,
  text: string | undefined,
  dimension: Dimension,
): PlacedLimit | null {
  return text === undefined ? null : checker.limit([...path, key], text, dimension, scope, guards);
}

function checkLimits(
  { checker, scope, guards }: Place,
  path: YamlPath,
  dimension: Dimension,
  low: string | undefined,
  high: string | undefined,
): { low: PlacedLimit | null; high: PlacedLimit | null } {
  const checked = {
    low: low === undefined ? null : checker.limit([...path, 'low'], low, dimension, scope, guards),
    high: high === undefined ? null : checker.limit([...path, 'high'], high, dimension, scope, guards),
  };
  checker.crossing(path, checked.low, checked.high);
  return checked;
}
