import * as z from 'zod/mini';
import { LANGUAGES } from '../checklist/text';
import { signatureSchema } from '../checklist/signature';
import { openingIdSchema, packageIdSchema, sha256Schema } from '../plant/ids';

export const PACKAGE_STATES = ['building', 'issued', 'failed', 'cancelled'] as const;

/**
 * Why a package couldn't be built: something it needs didn't answer or changed meanwhile, there was no room for it, or
 * the fault is ours.
 */
export const PACKAGE_FAILURES = ['temporary', 'diskFull', 'bug'] as const;
export type PackageFailure = (typeof PACKAGE_FAILURES)[number];

export const packageRequestSchema = z.strictObject({ language: z.enum(LANGUAGES) });

export const acceptanceSchema = z.object({
  personName: z.string(),
  companyName: z.string(),
  signedAt: z.iso.datetime(),
  signature: signatureSchema,
});

export const packageSchema = z.object({
  id: packageIdSchema,
  openingId: openingIdSchema,
  openingName: z.string(),
  timeZone: z.string(),
  version: z.int(),
  language: z.enum(LANGUAGES),
  state: z.enum(PACKAGE_STATES),
  /** 0 to 1 while it is built. */
  progress: z.number(),
  circuitsApproved: z.int(),
  circuitsTotal: z.int(),
  createdAt: z.iso.datetime(),
  createdBy: z.string(),
  issuedAt: z.nullable(z.iso.datetime()),
  pages: z.nullable(z.int()),
  bytes: z.nullable(z.int()),
  sha256: z.nullable(sha256Schema),
  failure: z.nullable(z.enum(PACKAGE_FAILURES)),
  acceptance: z.nullable(acceptanceSchema),
});
export type HandoverPackage = z.infer<typeof packageSchema>;
export const packageListSchema = z.object({ packages: z.array(packageSchema) });

export const acceptanceRequestSchema = z.strictObject({ sha256: sha256Schema, signature: signatureSchema });

/** The installation's Ed25519 public key (SPKI, base64) and its SHA-256, which also stands in mails and on the hash page. */
export const installationKeySchema = z.object({ publicKey: z.string(), fingerprint: sha256Schema });
