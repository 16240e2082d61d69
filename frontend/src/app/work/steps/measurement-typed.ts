import type { MeasurementAnswer, MeasurementBoxes } from '#shared/checklist/kinds/measurement';
import type { Method, MethodField } from '#shared/checklist/methods/method';
import type { MethodKey } from '#shared/checklist/methods/method-keys';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';
import { typedOrNull } from './typed-text';

/** The boxes of a form or of one of its rows, as text. */
export interface TypedBoxes {
  readonly quantities: Readonly<Record<string, string>>;
  readonly words: Readonly<Record<string, string>>;
}

export interface TypedMeasurement {
  readonly boxes: TypedBoxes;
  readonly rows: readonly TypedBoxes[];
}

export const emptyBoxes = (): TypedBoxes => ({ quantities: {}, words: {} });

/** What the form begins with: the answer to be corrected or finished, else as many empty rows as the method needs. */
export function startMeasurement(method: Method, previous: MeasurementAnswer | null): TypedMeasurement {
  if (previous) return { boxes: textsOf(previous), rows: previous.rows.map(textsOf) };
  const rows = Array.from({ length: method.rows?.least ?? 0 }, emptyBoxes);
  return { boxes: emptyBoxes(), rows };
}

function textsOf({ quantities, words }: Pick<MeasurementBoxes, 'quantities' | 'words'>): TypedBoxes {
  const texts = Object.entries(quantities).map(([key, typed]) => [key, typed.text]);
  return { quantities: Object.fromEntries(texts) as Record<string, string>, words };
}

/** The answer as typed so far; `null` while nothing is. Rows that were added and left empty are not part of it. */
export function measurementAnswerOf(
  key: MethodKey,
  method: Method,
  typed: TypedMeasurement,
  unitSystem: UnitSystem,
): MeasurementAnswer | null {
  const boxes = boxesOf(method.fields, typed.boxes, unitSystem);
  const rows = typed.rows
    .map((row) => boxesOf(method.rows?.fields ?? [], row, unitSystem))
    .filter((row) => !isEmpty(row));
  if (isEmpty(boxes) && rows.length === 0) return null;
  return { kind: 'measurement', method: key, ...boxes, rows };
}

const isEmpty = ({ quantities, words }: MeasurementBoxes): boolean =>
  Object.keys(quantities).length + Object.keys(words).length === 0;

function boxesOf(
  fields: readonly MethodField[],
  { quantities, words }: TypedBoxes,
  unitSystem: UnitSystem,
): MeasurementBoxes {
  const boxes: MeasurementBoxes = { quantities: {}, words: {} };
  for (const field of fields) {
    if (field.kind === 'quantity') {
      const value = typedOrNull(quantities[field.key] ?? '', displayUnit(field.dimension, unitSystem));
      if (value) boxes.quantities[field.key] = value;
    } else {
      const word = words[field.key]?.trim() ?? '';
      if (word !== '') boxes.words[field.key] = word;
    }
  }
  return boxes;
}
