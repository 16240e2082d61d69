import { Injectable } from '@angular/core';
import type { UnitSystem } from '#shared/units/unit-system';
import { GAUGE_KINDS } from '#shared/checklist/kinds/superheat';
import { NO_INSTRUMENTS, type TypedInstruments } from './superheat-typed';

/** Texts are in the units of the opening: those of one with other units are others. */
const keyOf = (system: UnitSystem): string => `firstcold.instruments.${system}`;

/** The gauge and the thermometer that go with this phone: said once, not at every coil. */
@Injectable({ providedIn: 'root' })
export class InstrumentMemory {
  read(system: UnitSystem): TypedInstruments {
    try {
      const kept: unknown = JSON.parse(localStorage.getItem(keyOf(system)) ?? 'null');
      return isInstruments(kept) ? kept : NO_INSTRUMENTS;
    } catch (error) {
      // A text that isn't JSON was not written here.
      if (error instanceof SyntaxError) return NO_INSTRUMENTS;
      throw error;
    }
  }

  keep(system: UnitSystem, instruments: TypedInstruments): void {
    try {
      localStorage.setItem(keyOf(system), JSON.stringify({ ...instruments, barometer: undefined }));
    } catch (error) {
      // A full store costs only this convenience.
      if (!(error instanceof DOMException)) throw error;
    }
  }
}

function isInstruments(kept: unknown): kept is TypedInstruments {
  if (typeof kept !== 'object' || kept === null) return false;
  const { gauge, pressureAccuracy, temperatureAccuracy } = kept as Partial<Record<string, unknown>>;
  return (
    GAUGE_KINDS.some((kind) => kind === gauge) &&
    typeof pressureAccuracy === 'string' &&
    typeof temperatureAccuracy === 'string'
  );
}
