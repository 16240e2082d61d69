import * as z from 'zod/mini';

/** UUIDs travel in lower case only: an id that can be written in two ways is two keys. */
const id = () => z.uuid().check(z.regex(/^[0-9a-f-]*$/, 'must be in lower case'));

// Branded ids: a CircuitId can't be handed over where a SequenceId is asked for. All are UUIDs in text form; those of
// entries, devices and photos' captions are made on the phone, the others on the server. Never order by an id: it
// carries a phone's clock.

export const companyIdSchema = id().brand<'CompanyId'>();
export type CompanyId = z.infer<typeof companyIdSchema>;

export const personIdSchema = id().brand<'PersonId'>();
export type PersonId = z.infer<typeof personIdSchema>;

export const openingIdSchema = id().brand<'OpeningId'>();
export type OpeningId = z.infer<typeof openingIdSchema>;

export const systemIdSchema = id().brand<'SystemId'>();
export type SystemId = z.infer<typeof systemIdSchema>;

export const suctionGroupIdSchema = id().brand<'SuctionGroupId'>();
export type SuctionGroupId = z.infer<typeof suctionGroupIdSchema>;

export const circuitIdSchema = id().brand<'CircuitId'>();
export type CircuitId = z.infer<typeof circuitIdSchema>;

export const fixtureIdSchema = id().brand<'FixtureId'>();
export type FixtureId = z.infer<typeof fixtureIdSchema>;

export const coilIdSchema = id().brand<'CoilId'>();
export type CoilId = z.infer<typeof coilIdSchema>;

export const sequenceIdSchema = id().brand<'SequenceId'>();
export type SequenceId = z.infer<typeof sequenceIdSchema>;

/** Made on the device (UUIDv7) for everything recorded there; by the server for expansions and reviews. */
export const entryIdSchema = id().brand<'EntryId'>();
export type EntryId = z.infer<typeof entryIdSchema>;

/** One browser profile of one person: two people on one phone are two devices. */
export const deviceIdSchema = id().brand<'DeviceId'>();
export type DeviceId = z.infer<typeof deviceIdSchema>;

export const packageIdSchema = id().brand<'PackageId'>();
export type PackageId = z.infer<typeof packageIdSchema>;

/** Lower-case hexadecimal SHA-256. */
export const sha256Schema = z
  .string()
  .check(z.regex(/^[0-9a-f]{64}$/, 'must be 64 lower-case hexadecimal digits'));
