import { DomainFailure } from '#shared/failures/failure';
import type { CircuitId, OpeningId, PersonId } from '#shared/plant/ids';
import type { CircuitSpecification } from '#shared/plant/plant';
import type { Context } from '../database/transactions';
import { specificationsOf, type PlantRepository, type PlantRows } from './plant.repository';

type OpeningFacts = Parameters<typeof specificationsOf>[0];

/** What stands in an opening: read for screens and templates, changed by schedules and assignments. */
export class PlantService {
  constructor(private readonly plant: PlantRepository) {}

  async systemsOf(
    context: Context,
    openingId: OpeningId,
  ): Promise<{ id: string; name: string; refrigerant: string }[]> {
    return this.plant.findSystems(context, openingId);
  }

  /** The specification of every circuit of an opening, or of some. */
  async specifications(
    context: Context,
    opening: OpeningFacts,
    circuitIds?: readonly CircuitId[],
  ): Promise<CircuitSpecification[]> {
    const plant = await this.plant.findPlant(context, opening.id as OpeningId, circuitIds);
    return specificationsOf(opening, plant);
  }

  /** @throws {DomainFailure} invalidInput when one of the circuits is not of this opening */
  async assign(
    context: Context,
    openingId: OpeningId,
    circuitIds: readonly CircuitId[],
    personId: PersonId | null,
  ): Promise<void> {
    const unique = [...new Set(circuitIds)];
    if ((await this.plant.countCircuits(context, openingId, unique)) !== unique.length) {
      throw new DomainFailure('invalidInput', 'Some of these circuits are not of this opening.', [
        {
          path: 'body.circuitIds',
          message: 'A circuit is unknown here, or was removed by a later schedule.',
        },
      ]);
    }
    await this.plant.assign(context, openingId, unique, personId);
  }

  /** All rows under the opening, removed ones included. */
  async everything(context: Context, openingId: OpeningId): Promise<PlantRows> {
    return this.plant.findEverything(context, openingId);
  }

  /** Writes new, changed and removed rows. */
  async replace(context: Context, rows: PlantRows): Promise<void> {
    await this.plant.upsert(context, rows);
  }
}
