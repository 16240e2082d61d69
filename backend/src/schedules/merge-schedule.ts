import type { Level } from '#shared/plant/words';
import { canonicalJson } from '#shared/sequences/canonical-json';
import type { CircuitEntity } from '../plant/circuit.entity';
import type { CoilEntity } from '../plant/coil.entity';
import type { FixtureEntity } from '../plant/fixture.entity';
import type { PlantRows } from '../plant/plant.repository';
import type { SuctionGroupEntity } from '../plant/suction-group.entity';
import type { SystemEntity } from '../plant/system.entity';
import type { ParsedCircuit, ParsedFixture, ParsedSchedule } from './parsed-schedule';

interface Owner {
  readonly companyId: string;
  readonly openingId: string;
}

interface Lists {
  readonly systems: SystemEntity[];
  readonly suctionGroups: SuctionGroupEntity[];
  readonly circuits: CircuitEntity[];
  readonly fixtures: FixtureEntity[];
  readonly coils: CoilEntity[];
}

/**
 * Lays a schedule over what stands already: things keep their ids by their names (systems and groups by name, circuits
 * by code, fixtures by circuit and tag, coils by number), so that what was recorded stays where it belongs. What the
 * schedule no longer has is marked removed, never deleted.
 *
 * @param newId makes an id
 * @returns every row to write
 */
export function mergeSchedule(
  owner: Owner,
  schedule: ParsedSchedule,
  known: PlantRows,
  now: Date,
  newId: () => string,
): PlantRows {
  const out: Lists = { systems: [], suctionGroups: [], circuits: [], fixtures: [], coils: [] };
  const find = finders(known);
  let circuitOrdinal = 0;
  let groupCount = 0;
  for (const [systemOrdinal, { suctionGroups, ...facts }] of schedule.systems.entries()) {
    const system = {
      ...owner,
      id: find.system(facts.name)?.id ?? newId(),
      ...facts,
      ordinal: systemOrdinal,
      removedAt: null,
    };
    out.systems.push(system);
    addLevel(
      out,
      owner,
      { level: 'system', system, group: null, ordinal: FIRST_SYSTEM + systemOrdinal },
      find,
      newId,
    );
    for (const [groupOrdinal, { circuits, ...groupFacts }] of suctionGroups.entries()) {
      const group = {
        ...owner,
        id: find.suctionGroup(system.id, groupFacts.name)?.id ?? newId(),
        systemId: system.id,
        ...groupFacts,
        ordinal: groupOrdinal,
        removedAt: null,
      };
      out.suctionGroups.push(group);
      const ordinal = FIRST_GROUP + groupCount;
      addLevel(out, owner, { level: 'suctionGroup', system, group, ordinal }, find, newId);
      groupCount += 1;
      for (const circuit of circuits) {
        const place = { systemId: system.id, suctionGroupId: group.id, ordinal: circuitOrdinal };
        addCircuit(out, owner, { ...circuit, ...place }, find, newId);
        circuitOrdinal += 1;
      }
    }
  }
  countRevisions(out, known);
  return withRemoved(out, known, now);
}

/** A circuit's revision goes up when something about it, its fixtures or coils is other than it was. */
function countRevisions(out: Lists, known: PlantRows): void {
  const [before, after] = [factsByCircuit(known), factsByCircuit(out)];
  for (const circuit of out.circuits) {
    if (before.get(circuit.id) !== after.get(circuit.id)) circuit.revision += 1;
  }
}

function factsByCircuit(rows: PlantRows): ReadonlyMap<string, string> {
  const groups = new Map(rows.suctionGroups.map((group) => [group.id, group]));
  const systems = new Map(rows.systems.map((system) => [system.id, system]));
  const parts = new Map<string, unknown[]>();
  for (const circuit of rows.circuits) {
    const group = groups.get(circuit.suctionGroupId ?? '');
    const { revision: _revision, ordinal: _ordinal, assigneeId: _assignee, ...facts } = circuit;
    const { ordinal: _groupOrdinal, ...groupFacts } = group ?? { ordinal: 0 };
    const { ordinal: _systemOrdinal, ...systemFacts } = systems.get(circuit.systemId) ?? { ordinal: 0 };
    parts.set(circuit.id, [facts, groupFacts, systemFacts]);
  }
  for (const { ordinal: _ordinal, ...fixture } of standing(rows.fixtures))
    parts.get(fixture.circuitId)?.push(fixture);
  for (const coil of standing(rows.coils)) parts.get(coil.circuitId)?.push(coil);
  return new Map(
    [...parts].map(([id, facts]) => [
      id,
      facts
        .map((fact) => canonicalJson(fact))
        .sort()
        .join(),
    ]),
  );
}

function standing<T extends { readonly removedAt: Date | null }>(rows: readonly T[]): readonly T[] {
  return rows.filter((row) => row.removedAt === null);
}

function addCircuit(
  out: Lists,
  owner: Owner,
  parsed: ParsedCircuit & {
    readonly systemId: string;
    readonly suctionGroupId: string;
    readonly ordinal: number;
  },
  find: ReturnType<typeof finders>,
  newId: () => string,
): void {
  const { fixtures, defrost, ...facts } = parsed;
  const before = find.circuit('circuit', facts.code);
  const id = before?.id ?? newId();
  const row: CircuitEntity = {
    ...owner,
    id,
    level: 'circuit',
    ...facts,
    defrostType: defrost.type,
    defrostPerDay: defrost.perDay,
    defrostFailSafeS: defrost.failSafeS,
    defrostTerminationTemperatureK: defrost.terminationTemperatureK,
    defrostDripS: defrost.dripS,
    assigneeId: before?.assigneeId ?? null,
    revision: before?.revision ?? 0,
    removedAt: null,
  };
  out.circuits.push(row);
  for (const [ordinal, fixture] of fixtures.entries())
    addFixture(out, owner, id, fixture, ordinal, find, newId);
}

// The work of systems and groups comes before all circuits in every list, in this order.
const FIRST_SYSTEM = -200_000;
const FIRST_GROUP = -100_000;

/** The row for the work of a whole system or suction group. Groups of two systems may share a name. */
function addLevel(
  out: Lists,
  owner: Owner,
  at: {
    readonly level: 'system' | 'suctionGroup';
    readonly system: SystemEntity;
    readonly group: SuctionGroupEntity | null;
    readonly ordinal: number;
  },
  find: ReturnType<typeof finders>,
  newId: () => string,
): void {
  const { level, system, group, ordinal } = at;
  const code = group ? `${system.name} ${group.name}` : system.name;
  const before = find.circuit(level, code);
  out.circuits.push({
    ...owner,
    id: before?.id ?? newId(),
    level,
    systemId: system.id,
    suctionGroupId: group?.id ?? null,
    code,
    description: '',
    area: '',
    temperatureClass: group?.temperatureClass ?? 'medium',
    feed: 'homeRun',
    control: 'evaporatorPressureRegulator',
    loadW: null,
    defrostType: 'none',
    defrostPerDay: 0,
    defrostFailSafeS: null,
    defrostTerminationTemperatureK: null,
    defrostDripS: null,
    assigneeId: before?.assigneeId ?? null,
    ordinal,
    revision: before?.revision ?? 0,
    removedAt: null,
  });
}

function addFixture(
  out: Lists,
  owner: Owner,
  circuitId: string,
  { coilCount, ...facts }: ParsedFixture,
  ordinal: number,
  find: ReturnType<typeof finders>,
  newId: () => string,
): void {
  const id = find.fixture(circuitId, facts.tag)?.id ?? newId();
  out.fixtures.push({ ...owner, id, circuitId, ...facts, ordinal, removedAt: null });
  for (let number = 1; number <= coilCount; number += 1) {
    out.coils.push({
      ...owner,
      id: find.coil(id, number)?.id ?? newId(),
      circuitId,
      fixtureId: id,
      number,
      removedAt: null,
    });
  }
}

function finders(known: PlantRows) {
  const index = <T>(rows: readonly T[], key: (row: T) => string): ReadonlyMap<string, T> =>
    new Map(rows.map((row) => [key(row), row]));
  const systems = index(known.systems, (row) => row.name);
  const groups = index(known.suctionGroups, (row) => `${row.systemId} ${row.name}`);
  const circuits = index(known.circuits, (row) => `${row.level} ${row.code}`);
  const fixtures = index(known.fixtures, (row) => `${row.circuitId} ${row.tag}`);
  const coils = index(known.coils, (row) => `${row.fixtureId} ${row.number}`);
  return {
    system: (name: string) => systems.get(name),
    suctionGroup: (systemId: string, name: string) => groups.get(`${systemId} ${name}`),
    circuit: (level: Level, code: string) => circuits.get(`${level} ${code}`),
    fixture: (circuitId: string, tag: string) => fixtures.get(`${circuitId} ${tag}`),
    coil: (fixtureId: string, number: number) => coils.get(`${fixtureId} ${number}`),
  };
}

function withRemoved(out: Lists, known: PlantRows, removedAt: Date): PlantRows {
  const gone = <T extends { id: string; removedAt: Date | null }>(
    now: readonly T[],
    before: readonly T[],
  ): T[] => {
    const kept = new Set(now.map((row) => row.id));
    return before
      .filter((row) => row.removedAt === null && !kept.has(row.id))
      .map((row) => ({ ...row, removedAt }));
  };
  return {
    systems: [...out.systems, ...gone(out.systems, known.systems)],
    suctionGroups: [...out.suctionGroups, ...gone(out.suctionGroups, known.suctionGroups)],
    circuits: [...out.circuits, ...gone(out.circuits, known.circuits)],
    fixtures: [...out.fixtures, ...gone(out.fixtures, known.fixtures)],
    coils: [...out.coils, ...gone(out.coils, known.coils)],
  };
}
