import type { NeededColumnId, ScheduleReason } from '#shared/contracts/schedule-reasons';
import type { FoundColumn } from './find-columns';
import type { ScheduleRow } from './read-rows';
import {
  COLUMN_IDS,
  isNeededColumn,
  SCHEDULE_COLUMNS,
  type ColumnId,
  type ColumnLevel,
  type ColumnValues,
} from './schedule-columns';
import { quoted, type ScheduleProblems } from './schedule-problems';

/** A part of the plant as put together from the lines that speak of it. */
export interface Part {
  readonly level: ColumnLevel;
  readonly name: string;
  /** The first line that speaks of it. */
  readonly line: number;
  /** What its lines agree on. */
  readonly values: Partial<ColumnValues>;
  /** The line that each value was taken from. */
  readonly lines: Map<ColumnId, number>;
  readonly unreadable: Set<ColumnId>;
}

export interface CircuitPart extends Part {
  readonly group: SuctionGroupPart;
  readonly fixtures: Part[];
}

export interface SuctionGroupPart extends Part {
  readonly system: SystemPart;
  readonly circuits: CircuitPart[];
}

export interface SystemPart extends Part {
  readonly groups: SuctionGroupPart[];
}

const COLUMNS_OF: Readonly<Record<ColumnLevel, readonly ColumnId[]>> = {
  system: COLUMN_IDS.filter((id) => SCHEDULE_COLUMNS[id].level === 'system'),
  suctionGroup: COLUMN_IDS.filter((id) => SCHEDULE_COLUMNS[id].level === 'suctionGroup'),
  circuit: COLUMN_IDS.filter((id) => SCHEDULE_COLUMNS[id].level === 'circuit'),
  fixture: COLUMN_IDS.filter((id) => SCHEDULE_COLUMNS[id].level === 'fixture'),
};

const NAME_COLUMNS = {
  system: 'system',
  suctionGroup: 'suctionGroup',
  circuit: 'circuit',
  fixture: 'fixtureTag',
} as const;

/** Names differing in capitals or accents only are one name to people, and to the database. */
const keyOf = (name: string): string => name.normalize('NFKD').replace(/\p{M}/gu, '').toUpperCase();

const part = (level: ColumnLevel, name: string, line: number): Part => ({
  level,
  name,
  line,
  values: {},
  lines: new Map(),
  unreadable: new Set(),
});

/** Conversion may differ in the last digit between "8 ft" and "96 in"; capitals tell no two texts apart. */
const isSame = (a: unknown, b: unknown): boolean => {
  if (typeof a === 'number' && typeof b === 'number') return Math.abs(a - b) <= 1e-9 * Math.abs(a);
  return typeof a === 'string' && typeof b === 'string' && keyOf(a) === keyOf(b);
};

/** Puts lines together to systems, suction groups, circuits and fixtures, and names what doesn't fit together. */
export class ScheduleTree {
  private readonly byName = new Map<string, SystemPart>();
  private readonly groups = new Map<string, SuctionGroupPart>();
  private readonly circuits = new Map<string, CircuitPart>();
  private readonly fixtures = new Map<string, Part>();
  /** The circuit of the line above, undefined where that line found no place, which is named once. */
  private above: CircuitPart | undefined;
  private isLost = false;

  /**
   * @param columns as found, to name the heading in a problem
   * @param problems takes lines without a place, names used twice and lines that contradict one another
   */
  constructor(
    private readonly columns: ReadonlyMap<ColumnId, FoundColumn>,
    private readonly problems: ScheduleProblems,
  ) {}

  /** Adds one line; lines have to come in the order of the file, as blank cells take over from the line above. */
  add(row: ScheduleRow): void {
    const circuit = this.placeOf(row);
    this.above = circuit;
    this.isLost = circuit === undefined;
    if (!circuit) return;
    this.adopt(circuit, row);
    this.addFixture(circuit, row);
  }

  /** @returns the systems in the order of the file */
  get systems(): SystemPart[] {
    return [...this.byName.values()];
  }

  /** Finds or makes the circuit of a line; its system and suction group learn from the line even where the circuit can't be told. */
  private placeOf(row: ScheduleRow): CircuitPart | undefined {
    const { system: systemName, suctionGroup, circuit: code } = row.values;
    const isPlaced = systemName !== undefined || suctionGroup !== undefined;
    const known = code === undefined ? undefined : this.circuits.get(keyOf(code));
    // A line further down that gives the code alone means the circuit there is.
    const isReadable = !row.unreadable.has('system') && !row.unreadable.has('suctionGroup');
    const meant = isReadable && !isPlaced ? known?.group : undefined;
    const system = meant?.system ?? this.systemOf(row);
    if (system) this.adopt(system, row);
    const group = meant ?? (system && this.groupOf(row, system));
    if (group) this.adopt(group, row);
    return group && this.circuitOf(row, group);
  }

  private heading(id: ColumnId): string | null {
    return this.columns.get(id)?.heading ?? null;
  }

  /** The name on the line, or the one above where that is meant. */
  private nameOf(row: ScheduleRow, level: ColumnLevel, above: Part | undefined): string | undefined {
    const id = NAME_COLUMNS[level];
    if (row.unreadable.has(id)) return undefined;
    const name = row.values[id] ?? above?.name;
    // A missing column is named once, in the line of headings, and so is the first of several lines without a place.
    if (name === undefined && !this.isLost && this.columns.has(id))
      this.problems.add(row.line, this.heading(id), { code: 'missingName', params: { level } });
    return name;
  }

  private systemOf(row: ScheduleRow): SystemPart | undefined {
    const name = this.nameOf(row, 'system', this.above?.group.system);
    if (name === undefined) return undefined;
    const known = this.byName.get(keyOf(name));
    if (known) return known;
    const system: SystemPart = { ...part('system', name, row.line), groups: [] };
    this.byName.set(keyOf(name), system);
    return system;
  }

  private groupOf(row: ScheduleRow, system: SystemPart): SuctionGroupPart | undefined {
    const name = this.nameOf(
      row,
      'suctionGroup',
      this.above?.group.system === system ? this.above.group : undefined,
    );
    if (name === undefined) return undefined;
    const key = JSON.stringify([keyOf(system.name), keyOf(name)]);
    const known = this.groups.get(key);
    if (known) return known;
    const group: SuctionGroupPart = { ...part('suctionGroup', name, row.line), system, circuits: [] };
    this.groups.set(key, group);
    system.groups.push(group);
    return group;
  }

  private circuitOf(row: ScheduleRow, group: SuctionGroupPart): CircuitPart | undefined {
    const code = this.nameOf(row, 'circuit', this.above?.group === group ? this.above : undefined);
    if (code === undefined) return undefined;
    const known = this.circuits.get(keyOf(code));
    if (known && known.group !== group) {
      const params = {
        circuit: quoted(code),
        suctionGroup: quoted(known.group.name),
        system: quoted(known.group.system.name),
        row: known.line,
      };
      this.problems.add(row.line, this.heading('circuit'), { code: 'circuitElsewhere', params });
      return undefined;
    }
    if (known) return known;
    const circuit: CircuitPart = { ...part('circuit', code, row.line), group, fixtures: [] };
    this.circuits.set(keyOf(code), circuit);
    group.circuits.push(circuit);
    return circuit;
  }

  private addFixture(circuit: CircuitPart, row: ScheduleRow): void {
    const tag = row.values.fixtureTag;
    if (tag === undefined) {
      const isNamed = row.unreadable.has('fixtureTag') || !this.columns.has('fixtureTag');
      if (!isNamed) this.problems.add(row.line, this.heading('fixtureTag'), missingValue('fixtureTag'));
      return;
    }
    const known = this.fixtures.get(keyOf(tag));
    if (known) {
      const params = { text: quoted(tag), row: known.line };
      this.problems.add(row.line, this.heading('fixtureTag'), { code: 'fixtureTagTwice', params });
      return;
    }
    const fixture = part('fixture', tag, row.line);
    this.fixtures.set(keyOf(tag), fixture);
    this.adopt(fixture, row);
    circuit.fixtures.push(fixture);
  }

  private adopt(target: Part, row: ScheduleRow): void {
    for (const id of COLUMNS_OF[target.level]) {
      if (row.unreadable.has(id)) target.unreadable.add(id);
      if (id !== NAME_COLUMNS[target.level]) this.adoptValue(target, row, id);
    }
  }

  private adoptValue<Id extends ColumnId>(target: Part, row: ScheduleRow, id: Id): void {
    const value: Partial<ColumnValues>[Id] = row.values[id];
    if (value === undefined) return;
    const from = target.lines.get(id);
    if (from === undefined) {
      target.values[id] = value;
      target.lines.set(id, row.line);
    } else if (!isSame(target.values[id], value)) {
      const params = { row: from, level: target.level, name: quoted(target.name) };
      this.problems.add(row.line, this.heading(id), { code: 'rowsDisagree', params });
    }
  }
}

/** @returns the needed columns of a part on which none of its lines says anything */
export const missingValues = ({ level, values, unreadable }: Part): NeededColumnId[] =>
  COLUMNS_OF[level]
    .filter(isNeededColumn)
    .filter((id) => id !== NAME_COLUMNS[level] && values[id] === undefined && !unreadable.has(id));

/** @returns what is said where a needed cell is blank */
export const missingValue = (column: NeededColumnId): ScheduleReason => ({
  code: 'missingValue',
  params: { column, heading: SCHEDULE_COLUMNS[column].label },
});
