import * as z from 'zod/mini';

// Branded ids: a CircuitId can't be handed over where a SequenceId is asked for. All are UUIDs in text form; those of
// entries, devices and photos' captions are made on the phone, the others on the server. Never order by an id: it
// carries a phone's clock.

export const companyIdSchema = z.uuid().brand<'CompanyId'>();
export type CompanyId = z.infer<typeof companyIdSchema>;

export const personIdSchema = z.uuid().brand<'PersonId'>();
export type PersonId = z.infer<typeof personIdSchema>;

export const openingIdSchema = z.uuid().brand<'OpeningId'>();
export type OpeningId = z.infer<typeof openingIdSchema>;

export const systemIdSchema = z.uuid().brand<'SystemId'>();
export type SystemId = z.infer<typeof systemIdSchema>;

export const suctionGroupIdSchema = z.uuid().brand<'SuctionGroupId'>();
export type SuctionGroupId = z.infer<typeof suctionGroupIdSchema>;

export const circuitIdSchema = z.uuid().brand<'CircuitId'>();
export type CircuitId = z.infer<typeof circuitIdSchema>;

export const fixtureIdSchema = z.uuid().brand<'FixtureId'>();
export type FixtureId = z.infer<typeof fixtureIdSchema>;

export const coilIdSchema = z.uuid().brand<'CoilId'>();
export type CoilId = z.infer<typeof coilIdSchema>;

export const sequenceIdSchema = z.uuid().brand<'SequenceId'>();
export type SequenceId = z.infer<typeof sequenceIdSchema>;

/** Made on the device (UUIDv7) for everything recorded there; by the server for expansions and reviews. */
export const entryIdSchema = z.uuid().brand<'EntryId'>();
export type EntryId = z.infer<typeof entryIdSchema>;

/** One browser profile of one person: two people on one phone are two devices. */
export const deviceIdSchema = z.uuid().brand<'DeviceId'>();
export type DeviceId = z.infer<typeof deviceIdSchema>;

export const packageIdSchema = z.uuid().brand<'PackageId'>();
export type PackageId = z.infer<typeof packageIdSchema>;

/** Lower-case hexadecimal SHA-256. */
export const sha256Schema = z
  .string()
  .check(z.regex(/^[0-9a-f]{64}$/, 'must be 64 lower-case hexadecimal digits'));
