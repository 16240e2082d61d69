import { parseSchedule } from './schedule-parser';
import type { ParsedCircuit, ParsedFixture, ParsedSchedule } from './parsed-schedule';

/** A line of a schedule with every needed column, by heading. */
export const LINE = {
  System: 'Rack A',
  Refrigerant: 'R-448A',
  'Suction group': 'AS-1',
  Circuit: 'A1',
  'Fixture tag': 'ME-01',
  'Temperature class': 'medium',
  'Evaporating temperature (°F)': '20',
  'Discharge air (°F)': '28',
  'Superheat low (°F)': '6',
  'Superheat high (°F)': '10',
};

export type Line = Record<string, string>;

const cell = (text: string): string => (/[",;\t\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text);

/** The lines as a file, with the headings of the first line. */
export function csvOf(lines: readonly Line[], delimiter = ',', lineEnd = '\n'): string {
  const headings = Object.keys(lines[0] ?? LINE);
  const cells = lines.map((line) => headings.map((heading) => line[heading] ?? ''));
  return [headings, ...cells].map((row) => row.map(cell).join(delimiter) + lineEnd).join('');
}

export const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);

/** `LINE` changed; a heading set to undefined is taken out. */
export function line(changes: Record<string, string | undefined> = {}): Line {
  const entries = Object.entries({ ...LINE, ...changes });
  return Object.fromEntries(entries.filter((entry): entry is [string, string] => entry[1] !== undefined));
}

export const read = (lines: readonly Line[]) => parseSchedule(bytesOf(csvOf(lines)));

/** The schedule, which a test takes for granted. */
export function scheduleOf(reading: ReturnType<typeof parseSchedule>): ParsedSchedule {
  if (!reading.ok) throw new Error(JSON.stringify(reading.problems));
  return reading.schedule;
}

/** The problems, empty when the schedule was read. */
export const problemsOf = (reading: ReturnType<typeof parseSchedule>) => (reading.ok ? [] : reading.problems);

/** The same problems without their sentences. */
export const reasonsOf = (reading: ReturnType<typeof parseSchedule>) =>
  problemsOf(reading).map(({ row, column, reason }) => ({ row, column, ...reason }));

export const circuitsOf = (schedule: ParsedSchedule): ParsedCircuit[] =>
  schedule.systems.flatMap(({ suctionGroups }) => suctionGroups.flatMap(({ circuits }) => circuits));

export const fixturesOf = (schedule: ParsedSchedule): ParsedFixture[] =>
  circuitsOf(schedule).flatMap(({ fixtures }) => [...fixtures]);

/** The only circuit of one line. */
export function onlyCircuit(changes: Record<string, string | undefined>): ParsedCircuit {
  const [circuit] = circuitsOf(scheduleOf(read([line(changes)])));
  if (!circuit) throw new Error('no circuit');
  return circuit;
}

/** The only fixture of one line. */
export function onlyFixture(changes: Record<string, string | undefined>): ParsedFixture {
  const [fixture] = onlyCircuit(changes).fixtures;
  if (!fixture) throw new Error('no fixture');
  return fixture;
}
