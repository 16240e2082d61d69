import * as z from 'zod/mini';
import { ROLES } from '../access/roles';
import { LANGUAGES } from '../checklist/text';
import {
  circuitIdSchema,
  companyIdSchema,
  openingIdSchema,
  personIdSchema,
  sequenceIdSchema,
  systemIdSchema,
} from '../plant/ids';
import { UNIT_SYSTEMS } from '../plant/plant';
import { LEVELS, TEMPERATURE_CLASSES } from '../plant/words';
import { SEQUENCE_STATES } from '../sequences/transitions';
import { pageOf } from './paging';

/** How many circuits stand where; `open` are those not yet begun, `underWay` those with at least one entry. */
export const circuitCountsSchema = z.object({
  open: z.int(),
  underWay: z.int(),
  submitted: z.int(),
  sentBack: z.int(),
  approved: z.int(),
});
export type CircuitCounts = z.infer<typeof circuitCountsSchema>;

export const openingSummarySchema = z.object({
  id: openingIdSchema,
  companyId: companyIdSchema,
  name: z.string(),
  address: z.string(),
  openingDate: z.iso.date(),
  contractorName: z.string(),
  counts: circuitCountsSchema,
});
export type OpeningSummary = z.infer<typeof openingSummarySchema>;
export const openingListSchema = pageOf(openingSummarySchema);

/** One line of words: no control characters, which would end up in file names, mails and documents. */
const line = (most: number) => z.string().check(z.trim(), z.maxLength(most), z.regex(/^[^\p{Cc}]*$/u));

export const newOpeningSchema = z.strictObject({
  name: line(120).check(z.minLength(1)),
  address: line(300),
  elevationM: z.number().check(z.gte(-500), z.lte(5000)),
  openingDate: z.iso.date().check(z.regex(/^2[01]\d\d-/, 'must be in this century or the next')),
  timeZone: z.string().check(z.minLength(1), z.maxLength(64)),
  contractorName: line(120),
  unitSystem: z.enum(UNIT_SYSTEMS),
  language: z.enum(LANGUAGES),
});
export type NewOpening = z.infer<typeof newOpeningSchema>;

/** One joint of a copper line. */
export const jointSchema = z.object({
  circuitId: circuitIdSchema,
  code: z.string(),
  state: z.enum([...SEQUENCE_STATES, 'underWay', 'noSequence']),
});
export type Joint = z.infer<typeof jointSchema>;

/** The own work of a system or a suction group, and where it stands. */
export const levelWorkSchema = z.object({ ...jointSchema.shape, level: z.enum(LEVELS) });
export type LevelWork = z.infer<typeof levelWorkSchema>;

export const openingDetailSchema = z.object({
  ...openingSummarySchema.shape,
  elevationM: z.number(),
  atmospherePaAbs: z.number(),
  timeZone: z.string(),
  unitSystem: z.enum(UNIT_SYSTEMS),
  language: z.enum(LANGUAGES),
  scheduleRevision: z.int(),
  systems: z.array(
    z.object({
      id: systemIdSchema,
      name: z.string(),
      refrigerant: z.string(),
      joints: z.array(jointSchema),
      /** Beside the line, not counted among its circuits: the system's first, then its groups'. */
      work: z.array(levelWorkSchema),
    }),
  ),
});
export type OpeningDetail = z.infer<typeof openingDetailSchema>;

/** One row of the circuits table. `sequenceId` is null where no template applies. */
export const circuitRowSchema = z.object({
  circuitId: circuitIdSchema,
  /** A suction group's and a system's own work stands among the circuits. */
  level: z.enum(LEVELS),
  sequenceId: z.nullable(sequenceIdSchema),
  code: z.string(),
  description: z.string(),
  area: z.string(),
  systemName: z.string(),
  suctionGroupName: z.string(),
  temperatureClass: z.enum(TEMPERATURE_CLASSES),
  state: jointSchema.shape.state,
  stepsDone: z.int(),
  stepsTotal: z.int(),
  outsideCount: z.int(),
  assigneeId: z.nullable(personIdSchema),
  assigneeName: z.nullable(z.string()),
  openingId: openingIdSchema,
  openingName: z.string(),
});
export type CircuitRow = z.infer<typeof circuitRowSchema>;
export const circuitListSchema = pageOf(circuitRowSchema);

export const assignmentRequestSchema = z.strictObject({
  circuitIds: z.array(circuitIdSchema).check(z.minLength(1), z.maxLength(500)),
  personId: z.nullable(personIdSchema),
});

export const openingPersonSchema = z.object({
  id: personIdSchema,
  name: z.string(),
  role: z.enum(ROLES),
  companyName: z.string(),
});
export const openingPeopleSchema = z.object({ people: z.array(openingPersonSchema) });
export type OpeningPerson = z.infer<typeof openingPersonSchema>;
