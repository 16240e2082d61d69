import type { OpeningId, PackageId, SequenceId } from '#shared/plant/ids';
import { managerOf, type Context } from '../database/transactions';
import { AcceptanceEntity } from './acceptance.entity';
import { PackageEntity } from './package.entity';
import type { PackageSnapshot, SnapshotCircuit } from './package-snapshot';

export interface PackageRow extends PackageEntity {
  readonly openingName: string;
  readonly timeZone: string;
  readonly createdByName: string;
}

export interface AcceptanceRow extends AcceptanceEntity {
  readonly personName: string;
  readonly companyName: string;
}

interface SnapshotRow extends Omit<SnapshotCircuit, 'sequenceId'> {
  readonly sequenceId: SequenceId | null;
  readonly systemName: string;
  readonly refrigerant: string;
}

export class PackagesRepository {
  async insert(context: Context, row: PackageEntity): Promise<void> {
    await managerOf(context).insert(PackageEntity, row);
  }

  async lock(context: Context, id: PackageId): Promise<PackageEntity | null> {
    return managerOf(context).findOne(PackageEntity, { where: { id }, lock: { mode: 'pessimistic_write' } });
  }

  async update(context: Context, id: PackageId, change: Partial<PackageEntity>): Promise<void> {
    await managerOf(context).update(PackageEntity, { id }, change);
  }

  /** Moves the bar of a package that is still being built; `false` when it isn't any more. */
  async setProgress(context: Context, id: PackageId, progress: number): Promise<boolean> {
    const result = await managerOf(context).update(PackageEntity, { id, state: 'building' }, { progress });
    return (result.affected ?? 0) > 0;
  }

  async findLastVersion(context: Context, openingId: OpeningId): Promise<number> {
    return (await managerOf(context).maximum(PackageEntity, 'version', { openingId })) ?? 0;
  }

  async find(context: Context, id: PackageId): Promise<PackageRow | null> {
    return (await this.query(context, 'h.id = :id', { id }))[0] ?? null;
  }

  /** Newest version first. */
  async findOfOpening(context: Context, openingId: OpeningId): Promise<PackageRow[]> {
    return this.query(context, 'h.openingId = :openingId', { openingId });
  }

  async findAcceptances(context: Context, ids: readonly string[]): Promise<AcceptanceRow[]> {
    if (ids.length === 0) return [];
    return managerOf(context).query(
      `SELECT a.id, a.package_id AS packageId, a.person_id AS personId, a.sha256, a.statement,
              a.installation_signature AS installationSignature, a.created_at AS createdAt,
              p.name AS personName, c.name AS companyName
         FROM acceptance a JOIN person p ON p.id = a.person_id JOIN company c ON c.id = p.company_id
        WHERE a.package_id IN (${ids.map(() => '?').join(',')})`,
      [...ids],
    );
  }

  async insertAcceptance(context: Context, row: AcceptanceEntity): Promise<void> {
    await managerOf(context).insert(AcceptanceEntity, row);
  }

  /** Where every circuit stands, read in one statement and so in one moment. */
  async takeSnapshot(context: Context, openingId: OpeningId): Promise<PackageSnapshot> {
    const rows: SnapshotRow[] = await managerOf(context).query(
      `SELECT s.id AS sequenceId, COALESCE(s.head_position, 0) AS position, s.head_hash AS headHash, c.level, c.code,
              c.description, c.area, sys.name AS systemName, sys.refrigerant,
              CASE WHEN s.id IS NULL THEN 'noSequence'
                   WHEN s.state = 'open' AND s.head_position > 1 THEN 'underWay' ELSE s.state END AS state
         FROM circuit c
         JOIN plant_system sys ON sys.id = c.system_id
         LEFT JOIN sequence s ON s.circuit_id = c.id
        WHERE c.opening_id = ? AND c.removed_at IS NULL ORDER BY sys.ordinal, c.ordinal`,
      [openingId],
    );
    const systems = new Map<string, { name: string; refrigerant: string; circuits: SnapshotCircuit[] }>();
    for (const { systemName, refrigerant, ...circuit } of rows) {
      const system = systems.get(systemName) ?? { name: systemName, refrigerant, circuits: [] };
      system.circuits.push(circuit);
      systems.set(systemName, system);
    }
    return { systems: [...systems.values()] };
  }

  private async query(
    context: Context,
    where: string,
    parameters: Record<string, string>,
  ): Promise<PackageRow[]> {
    const { entities, raw } = await managerOf(context)
      .createQueryBuilder(PackageEntity, 'h')
      .innerJoin('opening', 'o', 'o.id = h.opening_id')
      .innerJoin('person', 'p', 'p.id = h.created_by')
      .addSelect('o.name', 'openingName')
      .addSelect('o.time_zone', 'timeZone')
      .addSelect('p.name', 'createdByName')
      .where(where, parameters)
      .orderBy('h.version', 'DESC')
      .limit(200)
      .getRawAndEntities<{ openingName: string; timeZone: string; createdByName: string }>();
    return entities.map((entity, index) => ({
      ...entity,
      openingName: raw[index]?.openingName ?? '',
      timeZone: raw[index]?.timeZone ?? 'UTC',
      createdByName: raw[index]?.createdByName ?? '',
    }));
  }
}
