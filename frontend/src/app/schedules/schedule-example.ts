/** A column that a schedule can't do without: its heading, and what stands in a cell. */
export interface NeededColumn {
  readonly heading: string;
  readonly example: string;
  /** Translation key (scope `schedules`) of the words that say what it is. */
  readonly about: string;
}

/** The columns that every schedule needs. Headings may be written in the trade's other usual ways. */
export const NEEDED_COLUMNS: readonly NeededColumn[] = [
  { heading: 'System', example: 'Rack A', about: 'about_system' },
  { heading: 'Refrigerant', example: 'R-448A', about: 'about_refrigerant' },
  { heading: 'Suction group', example: 'A-MT', about: 'about_suctionGroup' },
  { heading: 'Circuit', example: 'A1', about: 'about_circuit' },
  { heading: 'Temperature class', example: 'medium', about: 'about_temperatureClass' },
  { heading: 'Fixture tag', example: 'ME-01', about: 'about_fixtureTag' },
  { heading: 'Evaporating temperature (°F)', example: '20', about: 'about_evaporating' },
  { heading: 'Discharge air (°F)', example: '28', about: 'about_dischargeAir' },
  { heading: 'Superheat low (°F)', example: '6', about: 'about_superheat' },
  { heading: 'Superheat high (°F)', example: '10', about: 'about_superheat' },
];

/** A file with the needed headings and one line, to start from. With a byte-order mark, so that spreadsheets read °. */
export function exampleCsv(): string {
  const line = (cells: readonly string[]): string => `${cells.join(',')}\r\n`;
  return `\uFEFF${line(NEEDED_COLUMNS.map(({ heading }) => heading))}${line(NEEDED_COLUMNS.map(({ example }) => example))}`;
}
