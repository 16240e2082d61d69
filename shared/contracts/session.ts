import * as z from 'zod/mini';
import { LANGUAGES } from '../checklist/text';
import { ROLES } from '../access/roles';
import { companyIdSchema, deviceIdSchema, openingIdSchema, personIdSchema } from '../plant/ids';

export const signInRequestSchema = z.strictObject({
  email: z.string().check(z.minLength(3), z.maxLength(254), z.regex(/^[^\p{Cc}]*$/u)),
  password: z.string().check(z.minLength(1), z.maxLength(256)),
});

/** Who is signed in, and what `may()` needs to know about them. */
export const meSchema = z.object({
  id: personIdSchema,
  name: z.string(),
  email: z.string(),
  language: z.enum(LANGUAGES),
  companyId: companyIdSchema,
  companyName: z.string(),
  companyRole: z.enum(ROLES),
  memberships: z.array(z.object({ openingId: openingIdSchema, role: z.enum(ROLES) })),
});
export type Me = z.infer<typeof meSchema>;

/** `me` is null where nobody is signed in: asking who one is is no fault, and browsers would log one. */
export const sessionSchema = z.object({ me: z.nullable(meSchema) });

export const passwordRequestSchema = z.strictObject({
  password: z.string().check(z.minLength(1), z.maxLength(256)),
});

export const languageRequestSchema = z.strictObject({ language: z.enum(LANGUAGES) });

/** `deviceId`: the one this browser holds for this person, if any; it is taken up again when it is still good. */
export const deviceRequestSchema = z.strictObject({
  deviceId: z.nullable(deviceIdSchema),
  label: z.string().check(z.maxLength(120)),
});

/** The credential itself travels as an HttpOnly cookie. `lastCount`: the highest count that the server has of it. */
export const deviceResponseSchema = z.object({
  deviceId: deviceIdSchema,
  lastCount: z.int(),
  expiresAt: z.iso.datetime(),
});
