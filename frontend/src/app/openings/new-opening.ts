import type { Language } from '#shared/checklist/text';
import { newOpeningSchema, type NewOpening } from '#shared/contracts/openings';
import type { UnitSystem } from '#shared/units/unit-system';
import { standardAtmosphere } from '#shared/refrigeration/gauge-pressure';
import { toSi } from '#shared/units/convert';
import { parseNumber } from '#shared/units/parse-number';
import { metre } from '#shared/units/quantity';
import { displayUnit } from '#shared/units/unit-system';

/** What the form holds, as typed. */
export interface TypedOpening {
  readonly name: string;
  readonly address: string;
  readonly elevation: string;
  readonly openingDate: string;
  readonly timeZone: string;
  readonly contractorName: string;
  readonly unitSystem: UnitSystem;
  readonly language: Language;
}

const LOWEST_M = -500;
const HIGHEST_M = 5000;

export type Elevation =
  | { readonly ok: true; readonly metres: number; readonly atmospherePaAbs: number }
  | { readonly ok: false; readonly reason: 'empty' | 'notANumber' | 'outOfRange' };

/** An elevation as typed in the unit of the chosen system, and the atmosphere that it means on a standard day. */
export function readElevation(text: string, unitSystem: UnitSystem): Elevation {
  // Elevations are whole thousands of feet often enough: "5,280" is meant as one.
  const parsedNumber = parseNumber(text, { decimalComma: false });
  if (!parsedNumber.ok)
    return { ok: false, reason: parsedNumber.reason === 'empty' ? 'empty' : 'notANumber' };
  const metres = toSi(parsedNumber.value, displayUnit('length', unitSystem));
  const atmosphere = standardAtmosphere(metre(metres));
  if (!atmosphere.ok || metres < LOWEST_M || metres > HIGHEST_M) return { ok: false, reason: 'outOfRange' };
  return { ok: true, metres, atmospherePaAbs: atmosphere.pressure };
}

/** What the form says as a request; `null` while something is missing or wrong. */
export function toNewOpening(typed: TypedOpening): NewOpening | null {
  const elevation = readElevation(typed.elevation, typed.unitSystem);
  if (!elevation.ok) return null;
  const request = newOpeningSchema.safeParse({
    name: typed.name.trim(),
    address: typed.address.trim(),
    elevationM: elevation.metres,
    openingDate: typed.openingDate,
    timeZone: typed.timeZone,
    contractorName: typed.contractorName.trim(),
    unitSystem: typed.unitSystem,
    language: typed.language,
  });
  return request.success ? request.data : null;
}

/** Whether the browser knows a time zone by this name. */
export function isTimeZone(name: string): boolean {
  try {
    return name !== '' && new Intl.DateTimeFormat('en', { timeZone: name }).resolvedOptions().timeZone !== '';
  } catch (error) {
    if (error instanceof RangeError) return false;
    throw error;
  }
}
