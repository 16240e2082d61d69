import type { Language, Text } from '../checklist/text';
import { formatNumber, formatQuantity } from '../units/format';
import { displayUnit, type UnitSystem } from '../units/unit-system';
import type { BlockingRule } from '../refrigeration/defrost/explain-blocked';
import type { DefrostBreach, DefrostNote } from '../refrigeration/defrost/defrost-breach';
import type { DefrostRule, DefrostRules } from '../refrigeration/defrost/defrost-plan-types';

// The same sentences on the screen and in the package, so that the two never say different things of one plan.

/** Whom the sentences are for, and what the circuits are called. */
export interface DefrostSpeech {
  readonly language: Language;
  readonly unitSystem: UnitSystem;
  /** A running load may be given in watts or as a share; the rules tell which. */
  readonly rules: Pick<DefrostRules, 'leastRunningLoadForHotGasW'>;
  readonly codeOf: (circuitId: string) => string;
}

export const DEFROST_RULE_NAMES: Readonly<Record<DefrostRule, Text>> = {
  fixedStarts: { en: 'Starts kept by hand', es: 'Inicios fijados a mano' },
  quietHours: { en: 'Quiet hours', es: 'Horas sin deshielo' },
  gapBetweenStarts: { en: 'Time between starts', es: 'Tiempo entre inicios' },
  shareOfLoad: { en: 'Share of load in defrost', es: 'Parte de la carga en deshielo' },
  shareInHotGas: { en: 'Share in hot-gas defrost', es: 'Parte en deshielo por gas caliente' },
  runningLoadForHotGas: { en: 'Load running for hot gas', es: 'Carga en marcha para gas caliente' },
  heaterDemand: { en: 'Heater demand', es: 'Demanda de resistencias' },
  sharedBox: { en: 'One walk-in box', es: 'Una misma cámara' },
  sharedAirCurtain: { en: 'One air curtain', es: 'Una misma cortina de aire' },
  tooClose: { en: 'Spacing of one circuit', es: 'Separación de un circuito' },
  startsPerDay: { en: 'Defrosts a day', es: 'Deshielos por día' },
  startOutsideDay: { en: 'Start outside the day', es: 'Inicio fuera del día' },
  unknownCircuit: { en: 'Unknown circuit', es: 'Circuito desconocido' },
};

/**
 * Time on a 24-hour clock, as defrost controls show it.
 *
 * @param atS second of the day; the end of the day is written 24:00
 * @returns such as "06:05"; an em dash for what is no time
 * @example clockText(21_900) // '06:05'
 */
export function clockText(atS: number | null): string {
  if (atS === null || !Number.isFinite(atS)) return '—';
  const minutes = Math.floor(atS / 60);
  const two = (value: number): string => String(value).padStart(2, '0');
  return `${two(Math.floor(minutes / 60))}:${two(minutes % 60)}`;
}

/**
 * A share in percent, with a decimal only where there is one to tell.
 *
 * @param fraction 0 to 1
 * @example percentText(1 / 3, 'en') // '33.3 %'
 */
export const percentText = (fraction: number, language: Language): string =>
  `${formatNumber(fraction * 100, 1, language).replace(/\.0$/, '')} %`;

type Sentence = Readonly<Record<Language, string>>;

const BREACHES: Readonly<Record<DefrostRule, Sentence>> = {
  shareOfLoad: {
    en: '{at}: {value} of the suction group is in defrost, {limit} is allowed ({codes}).',
    es: '{at}: está en deshielo {value} del grupo de succión; se permite {limit} ({codes}).',
  },
  shareInHotGas: {
    en: '{at}: {value} of the hot-gas circuits are in defrost, {limit} is allowed ({codes}).',
    es: '{at}: está en deshielo {value} de los circuitos de gas caliente; se permite {limit} ({codes}).',
  },
  runningLoadForHotGas: {
    en: '{at}: {value} of load keeps running while {codes} defrost, {limit} is needed.',
    es: '{at}: queda en marcha {value} de carga mientras deshielan {codes}; se necesita {limit}.',
  },
  gapBetweenStarts: {
    en: '{at}: {codes} start {value} apart, at least {limit} is asked.',
    es: '{at}: {codes} inician con {value} de diferencia; se pide al menos {limit}.',
  },
  tooClose: {
    en: '{at}: {codes} defrosts again after {value}, at least {limit} is asked.',
    es: '{at}: {codes} vuelve a deshielar después de {value}; se pide al menos {limit}.',
  },
  startsPerDay: {
    en: '{codes} has {value} defrosts in the plan and {limit} in the schedule.',
    es: '{codes} tiene {value} deshielos en el plan y {limit} en la tabla.',
  },
  fixedStarts: {
    en: '{at}: the start of {codes} that was kept by hand is missing.',
    es: '{at}: falta el inicio de {codes} que se fijó a mano.',
  },
  quietHours: {
    en: '{at}: the defrost of {codes} reaches into quiet hours.',
    es: '{at}: el deshielo de {codes} entra en las horas sin deshielo.',
  },
  heaterDemand: {
    en: '{at}: heaters draw {value}, {limit} is allowed ({codes}).',
    es: '{at}: las resistencias consumen {value}; se permite {limit} ({codes}).',
  },
  sharedBox: {
    en: '{at}: {codes} feed one walk-in box and defrost at once.',
    es: '{at}: {codes} alimentan una misma cámara y deshielan a la vez.',
  },
  sharedAirCurtain: {
    en: '{at}: {codes} share an air curtain and defrost at once.',
    es: '{at}: {codes} comparten cortina de aire y deshielan a la vez.',
  },
  startOutsideDay: {
    en: '{codes} has a start that is no time of the day.',
    es: '{codes} tiene un inicio que no es una hora del día.',
  },
  unknownCircuit: {
    en: 'The plan names a circuit that is not in the schedule ({codes}).',
    es: 'El plan nombra un circuito que no está en la tabla ({codes}).',
  },
};

const UNKNOWN_HEATERS: Sentence = {
  en: '{at}: nobody has said what the heaters of {codes} draw, so {limit} can’t be shown to be kept.',
  es: '{at}: nadie ha dicho cuánto consumen las resistencias de {codes}; no se puede mostrar que se respeta {limit}.',
};

const NOTES: Readonly<Record<DefrostNote['note'], Sentence>> = {
  aloneOverShare: {
    en: '{codes} alone is {value} of its suction group, more than {limit}: it defrosts by itself.',
    es: '{codes} solo es {value} de su grupo de succión, más de {limit}: deshiela aparte.',
  },
  aloneOverHotGasShare: {
    en: '{codes} alone is {value} of the hot-gas circuits, more than {limit}: it defrosts by itself.',
    es: '{codes} solo es {value} de los circuitos de gas caliente, más de {limit}: deshiela aparte.',
  },
  judgedByCount: {
    en: 'No load is known for {codes}: the share of this suction group is counted in circuits, not in load.',
    es: 'No se conoce la carga de {codes}: la parte de este grupo de succión se cuenta en circuitos, no en carga.',
  },
};

/**
 * A broken rule in one sentence: when, which circuits, what was found and what is allowed.
 *
 * @param breach of a check
 * @param speech language, units and codes
 * @example breachInWords({ rule: 'gapBetweenStarts', … }, speech) // '06:05: A1, A2 start 5 min apart, at least 15 min is asked.'
 */
export function breachInWords(breach: DefrostBreach, speech: DefrostSpeech): string {
  const isUnknown = breach.rule === 'heaterDemand' && breach.value === null;
  const sentence = isUnknown ? UNKNOWN_HEATERS : BREACHES[breach.rule];
  const { atS, circuitIds } = breach;
  return filled(sentence[speech.language], {
    at: clockText(atS),
    codes: codesText(circuitIds, speech),
    value: figureText(breach, breach.value, speech),
    limit: figureText(breach, breach.limit, speech),
  });
}

/** Something that a plan may do but that a person should know, in one sentence. */
export function noteInWords(note: DefrostNote, speech: DefrostSpeech): string {
  const share = (value: number | null): string =>
    value === null ? '—' : percentText(value, speech.language);
  return filled(NOTES[note.note][speech.language], {
    codes: codesText(note.circuitIds, speech),
    value: share(note.value),
    limit: share(note.limit),
  });
}

/** A rule that is in the way of a plan: its name, the circuits that break it, and what has to be loosened with it. */
export function blockingInWords({ rule, circuitIds, onlyWith }: BlockingRule, speech: DefrostSpeech): string {
  const { language } = speech;
  const circuits = circuitIds.length === 0 ? '' : `: ${codesText(circuitIds, speech)}`;
  const others = onlyWith.map((each) => DEFROST_RULE_NAMES[each][language]).join(', ');
  const together = language === 'es' ? 'solo junto con' : 'only together with';
  return `${DEFROST_RULE_NAMES[rule][language]}${circuits}${others === '' ? '' : ` (${together} ${others})`}`;
}

const codesText = (circuitIds: readonly string[], { codeOf }: DefrostSpeech): string =>
  circuitIds.map(codeOf).join(', ');

function figureText(
  { rule, limit }: DefrostBreach,
  value: number | null,
  { language, unitSystem, rules }: DefrostSpeech,
): string {
  if (value === null) return '—';
  if (rule === 'gapBetweenStarts' || rule === 'tooClose') return formatQuantity(value, 'min', language);
  if (rule === 'heaterDemand') return formatQuantity(value, 'kW_el', language);
  if (rule === 'startsPerDay') return String(value);
  // A running load is asked for in watts, as a share, or both; its limit tells which of them was broken.
  if (rule === 'runningLoadForHotGas' && limit === rules.leastRunningLoadForHotGasW)
    return formatQuantity(value, displayUnit('heatFlow', unitSystem), language);
  return percentText(value, language);
}

/** In one pass: a circuit's code that looks like a place to fill stays as it is. */
const filled = (sentence: string, parts: Readonly<Record<string, string>>): string =>
  sentence.replace(/\{(\w+)\}/g, (place, name: string) => parts[name] ?? place);
