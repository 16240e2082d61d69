import { SEA_LEVEL_ATMOSPHERE } from '#shared/refrigeration/gauge-pressure';
import { printedPoints, TENTH_PSI_PA } from '#shared/refrigeration/makers-table/makers-table.fixture';
import { refrigerant } from '#shared/refrigeration/readings.fixture';
import { fromSi } from '#shared/units/convert';
import type { RefrigerantTable } from '#shared/contracts/refrigerants';

// R-9X1 doesn't exist: its figures are those of a shipped refrigerant every 18 °F, printed to a tenth of a psi.
const PRINTING = { stepK: 10, fromK: 233.15, toK: 323.15, lastDigitPa: TENTH_PSI_PA };

/** A sheet as text in °F and psig, ten rows from −40 °F on; one pressure column for a pure refrigerant. */
export function sheetText(of = 'R-448A', columns: 'both' | 'dew' = 'both'): string {
  const psi = (pressurePa: number): string => fromSi(pressurePa - SEA_LEVEL_ATMOSPHERE, 'psig').toFixed(1);
  return printedPoints(refrigerant(of), PRINTING)
    .map(({ temperature, bubble, dew }) => {
      const figures = [
        fromSi(temperature, 'degF').toFixed(0),
        ...(columns === 'both' ? [psi(bubble)] : []),
        psi(dew),
      ];
      return figures.join('\t');
    })
    .join('\n');
}

/** A sheet as the server keeps it. */
export const keptTable = (changes: Partial<RefrigerantTable> = {}): RefrigerantTable => ({
  id: '01930000-0000-7000-8000-000000000001',
  designation: 'R-9X1',
  issuer: 'Example Gases',
  edition: '2026-01',
  printedStepPa: TENTH_PSI_PA,
  safetyClass: 'A1',
  points: printedPoints(refrigerant('R-448A'), PRINTING).map(({ temperature, bubble, dew }) => ({
    temperatureK: temperature,
    bubblePa: bubble,
    dewPa: dew,
  })),
  createdByName: 'Lead',
  createdAt: '2026-12-01T12:00:00.000Z',
  isInUse: true,
  ...changes,
});
