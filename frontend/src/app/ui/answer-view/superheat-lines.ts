import {
  SUPERHEAT_CONDITIONS,
  type SuperheatAnswer,
  type SuperheatObservation,
} from '#shared/checklist/kinds/superheat';
import type { Step } from '#shared/checklist/step';
import type { TypedValue } from '#shared/checklist/typed-value';
import type { Language } from '#shared/checklist/text';
import { formatNumber } from '#shared/units/format';
import { UNITS } from '#shared/units/unit';

/** One line beside the pairs: keys are of the `ui` words. */
export interface SuperheatLine {
  readonly label: string;
  readonly labelValues?: Readonly<Record<string, string>>;
  /** As it stands. */
  readonly text?: string;
  /** Keys whose words follow each other, with commas. */
  readonly keys?: readonly string[];
  readonly values?: Readonly<Record<string, string | number>>;
  /** When it was, as ISO text. */
  readonly at?: string;
}

const typedText = ({ text, unit }: TypedValue): string => `${text} ${UNITS[unit].symbol}`.trim();

/** Label of the figure that a superheat with two averages is judged by; `null` for any other step. */
export function judgedMean(step: Step): string | null {
  if (step.kind !== 'superheat') return null;
  return step.judgedBy === 'timeWeighted' ? 'superheatTimeWeighted' : 'superheatMidpoint';
}

/**
 * What belongs to a superheat beyond its pairs: series and logs, turns of the valve, the conditions, and how it was read.
 * What the installer left at its usual (a plain gauge at the coil's outlet) makes no line.
 */
export function superheatLines(answer: SuperheatAnswer, language: Language): readonly SuperheatLine[] {
  return [
    ...(answer.asFound ? observationLines(answer.asFound, 'Found') : []),
    ...turnLines(answer, language),
    ...observationLines(answer.asLeft, 'Left'),
    ...conditionLines(answer),
    ...placeLines(answer),
    ...instrumentLines(answer),
  ];
}

const clock = (seconds: number): string =>
  `${Math.floor(seconds / 60)}:${String(Math.round(seconds % 60)).padStart(2, '0')}`;

function observationLines(observation: SuperheatObservation, when: 'Found' | 'Left'): SuperheatLine[] {
  if (observation.valve === 'series') {
    return observation.readings.map(({ atS, pressure, temperature }) => ({
      label: `superheat_series${when}`,
      labelValues: { since: clock(atS) },
      text: `${typedText(pressure)} · ${typedText(temperature)}`,
    }));
  }
  if (observation.valve !== 'log') return [];
  const { file, atS } = observation;
  const values = { name: file.name, count: atS.length };
  return [{ label: `superheat_log${when}`, keys: ['superheat_logRows'], values }];
}

function turnLines({ turns, clockwise }: SuperheatAnswer, language: Language): SuperheatLine[] {
  const lines = (turns ?? []).map(({ turns: size, direction, at }) => ({
    label: 'superheat_turns',
    text: formatNumber(size, Number.isInteger(size * 4) ? 2 : 3, language),
    keys: [`superheat_${direction}`],
    at,
  }));
  const sheet = { label: 'superheat_sheet', keys: [`superheat_sheet_${clockwise ?? 'unknown'}`] };
  return lines.length > 0 || clockwise ? [...lines, sheet] : [];
}

function conditionLines({ conditions }: SuperheatAnswer): SuperheatLine[] {
  if (!conditions) return [];
  const missing = SUPERHEAT_CONDITIONS.filter((one) => !conditions.includes(one));
  const values = { count: conditions.length, of: SUPERHEAT_CONDITIONS.length };
  if (missing.length === 0) return [{ label: 'superheat_conditions', keys: ['superheat_conditionsAll'] }];
  return [
    { label: 'superheat_conditions', keys: ['superheat_conditionsCount'], values },
    ...missing.map((one) => ({ label: 'superheat_notMet', keys: [`superheat_${one}`] })),
  ];
}

function placeLines({ takenAt, lineDrop }: SuperheatAnswer): SuperheatLine[] {
  if (takenAt !== 'elsewhere') return [];
  return [{ label: 'superheat_takenElsewhere', text: lineDrop ? typedText(lineDrop) : '—' }];
}

function instrumentLines({ instruments }: SuperheatAnswer): SuperheatLine[] {
  if (!instruments) return [];
  const { gauge, pressureAccuracy, temperatureAccuracy } = instruments;
  const accuracy = (label: string, typed: TypedValue | null): SuperheatLine[] =>
    typed ? [{ label, text: `± ${typedText(typed)}` }] : [];
  return [
    { label: 'superheat_gauge', keys: [`superheat_gauge_${gauge}`] },
    ...accuracy('superheat_pressureAccuracy', pressureAccuracy),
    ...accuracy('superheat_temperatureAccuracy', temperatureAccuracy),
  ];
}
