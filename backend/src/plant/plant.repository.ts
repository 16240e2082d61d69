import { In, IsNull } from 'typeorm';
import type { CircuitId, CoilId, FixtureId, OpeningId, SuctionGroupId, SystemId } from '#shared/plant/ids';
import type { CircuitSpecification, Fixture } from '#shared/plant/plant';
import type { Level, TemperatureClass } from '#shared/plant/words';
import type { OpeningEntity } from '../openings/opening.entity';
import { managerOf, type Context } from '../database/transactions';
import { CircuitEntity } from './circuit.entity';
import { CoilEntity } from './coil.entity';
import { FixtureEntity } from './fixture.entity';
import { SuctionGroupEntity } from './suction-group.entity';
import { SystemEntity } from './system.entity';

/** All that stands of an opening's plant, removed things left out. */
export interface PlantRows {
  readonly systems: readonly SystemEntity[];
  readonly suctionGroups: readonly SuctionGroupEntity[];
  readonly circuits: readonly CircuitEntity[];
  readonly fixtures: readonly FixtureEntity[];
  readonly coils: readonly CoilEntity[];
}

type OpeningFacts = Pick<OpeningEntity, 'id' | 'name' | 'elevationM' | 'unitSystem'>;

export class PlantRepository {
  /** The whole plant of an opening: a few hundred rows in five queries, whatever its size. */
  async findPlant(
    context: Context,
    openingId: OpeningId,
    circuitIds?: readonly CircuitId[],
  ): Promise<PlantRows> {
    const manager = managerOf(context);
    const standing = { openingId, removedAt: IsNull() };
    const ofCircuits = circuitIds ? { ...standing, circuitId: In([...circuitIds]) } : standing;
    const circuits = circuitIds ? { ...standing, id: In([...circuitIds]) } : standing;
    return {
      systems: await manager.find(SystemEntity, { where: standing, order: { ordinal: 'ASC' } }),
      suctionGroups: await manager.find(SuctionGroupEntity, { where: standing, order: { ordinal: 'ASC' } }),
      circuits: await manager.find(CircuitEntity, { where: circuits, order: { ordinal: 'ASC' } }),
      fixtures: await manager.find(FixtureEntity, { where: ofCircuits, order: { ordinal: 'ASC' } }),
      coils: await manager.find(CoilEntity, { where: ofCircuits, order: { number: 'ASC' } }),
    };
  }

  async findSystems(context: Context, openingId: OpeningId): Promise<SystemEntity[]> {
    return managerOf(context).find(SystemEntity, {
      where: { openingId, removedAt: IsNull() },
      order: { ordinal: 'ASC' },
    });
  }

  /** Everything there ever was under these names, removed things included, so that a second import finds them again. */
  async findEverything(context: Context, openingId: OpeningId): Promise<PlantRows> {
    const manager = managerOf(context);
    return {
      systems: await manager.findBy(SystemEntity, { openingId }),
      suctionGroups: await manager.findBy(SuctionGroupEntity, { openingId }),
      circuits: await manager.findBy(CircuitEntity, { openingId }),
      fixtures: await manager.findBy(FixtureEntity, { openingId }),
      coils: await manager.findBy(CoilEntity, { openingId }),
    };
  }

  /** Writes new and changed rows; those with a known id replace what stands there. */
  async upsert(context: Context, rows: PlantRows): Promise<void> {
    const manager = managerOf(context);
    const tables = [
      [SystemEntity, rows.systems],
      [SuctionGroupEntity, rows.suctionGroups],
      [CircuitEntity, rows.circuits],
      [FixtureEntity, rows.fixtures],
      [CoilEntity, rows.coils],
    ] as const;
    for (const [entity, list] of tables) {
      // Bounded statements: a schedule may hold thousands of fixtures.
      for (let at = 0; at < list.length; at += 200) {
        await manager.upsert(entity, list.slice(at, at + 200) as never, ['id']);
      }
    }
  }

  /** How many of these circuits belong to the opening. */
  async countCircuits(context: Context, openingId: OpeningId, ids: readonly CircuitId[]): Promise<number> {
    return managerOf(context).countBy(CircuitEntity, { openingId, id: In([...ids]), removedAt: IsNull() });
  }

  async assign(
    context: Context,
    openingId: OpeningId,
    ids: readonly CircuitId[],
    personId: string | null,
  ): Promise<void> {
    await managerOf(context).update(CircuitEntity, { openingId, id: In([...ids]) }, { assigneeId: personId });
  }
}

/** The specification of each circuit, in the order of the schedule. */
export function specificationsOf(opening: OpeningFacts, plant: PlantRows): CircuitSpecification[] {
  const systems = new Map(plant.systems.map((system) => [system.id, system]));
  const groups = new Map(plant.suctionGroups.map((group) => [group.id, group]));
  return plant.circuits.flatMap((circuit) => {
    const system = systems.get(circuit.systemId);
    const group = circuit.suctionGroupId === null ? null : groups.get(circuit.suctionGroupId);
    return system && group !== undefined ? [specificationOf(opening, system, group, circuit, plant)] : [];
  });
}

function specificationOf(
  opening: OpeningFacts,
  system: SystemEntity,
  group: SuctionGroupEntity | null,
  circuit: CircuitEntity,
  plant: PlantRows,
): CircuitSpecification {
  return {
    revision: circuit.revision,
    ...(circuit.level === 'circuit' ? {} : { level: circuit.level as Level }),
    opening: {
      id: opening.id as OpeningId,
      name: opening.name,
      elevationM: opening.elevationM,
      unitSystem: opening.unitSystem as 'us' | 'si',
    },
    system: {
      id: system.id as SystemId,
      name: system.name,
      kind: system.kind as CircuitSpecification['system']['kind'],
      refrigerant: system.refrigerant,
    },
    suctionGroup: group && {
      id: group.id as SuctionGroupId,
      name: group.name,
      temperatureClass: group.temperatureClass as TemperatureClass,
      saturatedSuctionTemperatureK: group.saturatedSuctionTemperatureK,
    },
    circuit: {
      ...circuitFacts(circuit),
      fixtures: plant.fixtures
        .filter((row) => row.circuitId === circuit.id)
        .map((row) => fixtureOf(row, plant.coils)),
    },
  };
}

function circuitFacts(row: CircuitEntity): Omit<CircuitSpecification['circuit'], 'fixtures'> {
  return {
    id: row.id as CircuitId,
    code: row.code,
    description: row.description,
    area: row.area,
    temperatureClass: row.temperatureClass as CircuitSpecification['circuit']['temperatureClass'],
    feed: row.feed as CircuitSpecification['circuit']['feed'],
    control: row.control as CircuitSpecification['circuit']['control'],
    loadW: row.loadW,
    defrost: {
      type: row.defrostType as CircuitSpecification['circuit']['defrost']['type'],
      perDay: row.defrostPerDay,
      failSafeS: row.defrostFailSafeS,
      terminationTemperatureK: row.defrostTerminationTemperatureK,
      dripS: row.defrostDripS,
    },
  };
}

function fixtureOf(row: FixtureEntity, coils: readonly CoilEntity[]): Fixture {
  return {
    id: row.id as FixtureId,
    tag: row.tag,
    description: row.description,
    kind: row.kind as Fixture['kind'],
    lengthM: row.lengthM,
    evaporatingTemperatureK: row.evaporatingTemperatureK,
    evaporatingBasis: row.evaporatingBasis as Fixture['evaporatingBasis'],
    dischargeAirTemperatureK: row.dischargeAirTemperatureK,
    superheatLowK: row.superheatLowK,
    superheatHighK: row.superheatHighK,
    valveKind: row.valveKind as Fixture['valveKind'],
    coils: coils
      .filter((coil) => coil.fixtureId === row.id)
      .map((coil) => ({ id: coil.id as CoilId, number: coil.number })),
  };
}
