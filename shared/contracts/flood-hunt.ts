import * as z from 'zod/mini';
import { coilIdSchema, sequenceIdSchema } from '../plant/ids';
import { rankFloodSuspects, type FloodReason } from '../refrigeration/flood-hunt';
import { kelvinDifference, second } from '../units/quantity';

/** One coil of a suction group as its circuit was left, with the step that says so. SI; `null`: not known. */
export const floodHuntCoilSchema = z.object({
  coilId: coilIdSchema,
  coilNumber: z.int(),
  fixtureTag: z.string(),
  circuitCode: z.string(),
  sequenceId: sequenceIdSchema,
  /** The superheat step of this coil. */
  stepKey: z.string(),
  superheatK: z.nullable(z.number()),
  /** The lowest while the valve hunted. */
  minimumSuperheatK: z.nullable(z.number()),
  /** Whether the superheat is asked again: it was right under other conditions. */
  asLeftStale: z.boolean(),
  /** Since the end of a defrost that somebody watched and recorded. */
  sinceDefrostS: z.nullable(z.number()),
  overrideStanding: z.boolean(),
  /** Design load of the whole circuit. */
  loadW: z.nullable(z.number()),
});
export type FloodHuntRow = z.infer<typeof floodHuntCoilSchema>;

export const floodHuntSchema = z.object({
  suctionGroupName: z.string(),
  coils: z.array(floodHuntCoilSchema),
});
export type FloodHunt = z.infer<typeof floodHuntSchema>;

export interface RankedCoil {
  readonly coil: FloodHuntRow;
  /** Strongest first; empty when nothing speaks against the coil. */
  readonly reasons: readonly FloodReason[];
  /** In kelvin, a difference; `null` when it was never read. */
  readonly lowestSuperheatK: number | null;
}

/**
 * The coils of a group, the likeliest to send liquid back first.
 *
 * @example rankCoils(hunt.coils)[0]?.coil.fixtureTag // the fixture to feel first
 */
export function rankCoils(coils: readonly FloodHuntRow[]): readonly RankedCoil[] {
  const known = new Map(coils.map((coil) => [coil.coilId as string, coil]));
  const suspects = rankFloodSuspects(
    coils.map(({ superheatK, minimumSuperheatK, sinceDefrostS, ...rest }) => ({
      ...rest,
      superheat: superheatK === null ? null : kelvinDifference(superheatK),
      minimumSuperheat: minimumSuperheatK === null ? null : kelvinDifference(minimumSuperheatK),
      sinceDefrost: sinceDefrostS === null ? null : second(sinceDefrostS),
    })),
  );
  return suspects.flatMap(({ coilId, reasons, lowestSuperheat }) => {
    const coil = known.get(coilId);
    return coil ? [{ coil, reasons, lowestSuperheatK: lowestSuperheat }] : [];
  });
}
