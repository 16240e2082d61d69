import * as z from 'zod/mini';
import { makersTableSchema } from '../checklist/facts';
import { pageOf } from './paging';

/** As wide as the column of a system's refrigerant, which takes it over. */
export const LONGEST_DESIGNATION = 24;

/** One line of words: no control characters. */
const line = (most: number) => z.string().check(z.trim(), z.maxLength(most), z.regex(/^[^\p{Cc}]*$/u));

const { points, safetyClass } = makersTableSchema.shape;

/**
 * A refrigerant maker's pressure–temperature table as a lead enters it: kelvin and absolute pascals. What the figures are
 * worth is for `checkMakersTable`, on both sides.
 */
export const newRefrigerantTableSchema = z.strictObject({
  /** Plain characters with a letter or a digit among them, as a schedule writes it. */
  designation: z
    .string()
    .check(z.trim(), z.maxLength(LONGEST_DESIGNATION), z.regex(/^(?=.*[A-Za-z0-9])[\x20-\x7e]+$/)),
  issuer: line(120),
  edition: line(120),
  printedStepPa: z.number().check(z.positive(), z.lte(10_000)),
  safetyClass,
  points,
  /** Somebody looked at the sheet once more and the figures that are asked about stand so in it. */
  confirmed: z.boolean(),
});
export type NewRefrigerantTable = z.infer<typeof newRefrigerantTableSchema>;

/** A table as it is kept: nobody can change it; a newer one of the same refrigerant takes its place. */
export const refrigerantTableSchema = z.object({
  id: z.uuid(),
  ...makersTableSchema.shape,
  createdByName: z.string(),
  createdAt: z.iso.datetime(),
  /** The newest of its refrigerant: what schedules are expanded with from now on. */
  isInUse: z.boolean(),
});
export type RefrigerantTable = z.infer<typeof refrigerantTableSchema>;
export const refrigerantTableListSchema = pageOf(refrigerantTableSchema);
export type RefrigerantTableList = z.infer<typeof refrigerantTableListSchema>;
