import { describe, expect, it } from '@jest/globals';
import { FAILURE_CODES } from '../failures/failure';
import { buildSignature } from '../checklist/step.fixture';
import { assignmentRequestSchema, newOpeningSchema } from './openings';
import { PAGE_SIZE_MAX, pageQueryShape } from './paging';
import { problemSchema } from './problem';
import { entryBatchSchema, reviewRequestSchema } from './sequences';
import { deviceRequestSchema, signInRequestSchema } from './session';
import * as z from 'zod/mini';

const HASH = 'a'.repeat(64);
const UUID = '00000000-0000-4000-8000-000000000001';
const opening = {
  name: 'Store',
  address: '1 Main Street',
  elevationM: 1609,
  openingDate: '2027-02-01',
  timeZone: 'America/Denver',
  contractorName: 'Builder',
  unitSystem: 'us',
  language: 'en',
};

describe('problemSchema', () => {
  it('knows every failure, and the two that are none of the caller’s', () => {
    const codes = problemSchema.shape.code.def.entries;
    expect(Object.keys(codes).sort()).toEqual([...FAILURE_CODES, 'temporary', 'bug'].sort());
  });
});

describe('pageQueryShape', () => {
  const query = z.object(pageQueryShape);

  it('reads a limit out of a query’s text', () => {
    expect(query.parse({ limit: '50' })).toEqual({ limit: 50 });
  });

  it.each(['0', '-1', String(PAGE_SIZE_MAX + 1), '1.5', 'all', ''])('refuses the limit %j', (limit) => {
    expect(query.safeParse({ limit }).success).toBe(false);
  });

  it('bounds the cursor', () => {
    expect(query.safeParse({ after: 'x'.repeat(201) }).success).toBe(false);
  });
});

describe('a request', () => {
  it.each([
    ['an opening', newOpeningSchema, opening],
    ['a sign-in', signInRequestSchema, { email: 'a@b.example', password: 'words' }],
    ['a device', deviceRequestSchema, { deviceId: null, label: 'phone' }],
    ['an assignment', assignmentRequestSchema, { circuitIds: [UUID], personId: null }],
    ['a batch', entryBatchSchema, { entries: [{ body: {}, bodyHash: HASH }] }],
    [
      'an approval',
      reviewRequestSchema,
      { verdict: 'approved', headHash: HASH, signature: buildSignature() },
    ],
  ] as const)(
    'for %s is taken as documented and refused with anything else in it',
    (_name, schema, value) => {
      expect(schema.safeParse(value).success).toBe(true);
      expect(schema.safeParse({ ...value, isAdmin: true }).success).toBe(false);
    },
  );

  it.each([
    [{ elevationM: -501 }],
    [{ elevationM: 5001 }],
    [{ elevationM: Number.NaN }],
    [{ name: '' }],
    [{ name: '   ' }],
    [{ name: 'Store\r\nBcc: a@b.example' }],
    [{ address: 'a\u0000b' }],
    [{ openingDate: '0027-02-01' }],
    [{ openingDate: '2027-02-30' }],
    [{ openingDate: '02/01/2027' }],
    [{ language: 'fr' }],
  ])('for an opening is refused with %j', (change) => {
    expect(newOpeningSchema.safeParse({ ...opening, ...change }).success).toBe(false);
  });

  it.each([0, 51])('with a batch of %i entries is refused', (length) => {
    const entries = Array.from({ length }, () => ({ body: {}, bodyHash: HASH }));
    expect(entryBatchSchema.safeParse({ entries }).success).toBe(false);
  });

  it('to send back without a remark is refused, and so is one to approve without a signature', () => {
    const sentBack = { verdict: 'sentBack', headHash: HASH, remarks: [] };
    expect(reviewRequestSchema.safeParse(sentBack).success).toBe(false);
    expect(
      reviewRequestSchema.safeParse({ ...sentBack, remarks: [{ stepKey: 'a', text: 'Again' }] }).success,
    ).toBe(true);
    expect(reviewRequestSchema.safeParse({ verdict: 'approved', headHash: HASH }).success).toBe(false);
    expect(reviewRequestSchema.safeParse({ verdict: 'withdrawn', headHash: HASH }).success).toBe(false);
  });
});
