import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it, jest } from '@jest/globals';
import * as z from 'zod/mini';

interface JsonSchema {
  readonly type?: string;
  readonly format?: string;
  readonly pattern?: string;
  readonly properties?: Readonly<Record<string, JsonSchema>>;
  readonly items?: JsonSchema;
  readonly anyOf?: readonly JsonSchema[];
  readonly oneOf?: readonly JsonSchema[];
  readonly allOf?: readonly JsonSchema[];
  readonly additionalProperties?: JsonSchema | boolean;
}

/** One named field of a schema, with the names around it. */
interface Field {
  readonly path: string;
  readonly name: string;
  readonly parent: string;
  readonly siblings: readonly string[];
  readonly schema: JsonSchema;
}

const FOLDER = __dirname;
const MODULES = readdirSync(FOLDER).filter((file) => file.endsWith('.ts') && !file.includes('.spec.'));

/** Every exported schema of the folder, so that a new file is checked without being named here. */
const schemas: [string, JsonSchema][] = MODULES.flatMap((file) =>
  Object.entries(jest.requireActual<Record<string, unknown>>(join(FOLDER, file)))
    .filter(([, value]) => value instanceof z.ZodMiniType)
    .map(([name, value]): [string, JsonSchema] => [
      name,
      z.toJSONSchema(value as z.ZodMiniType, { unrepresentable: 'any' }) as JsonSchema,
    ]),
);

function fieldsOf(schema: JsonSchema, path: string, parent: string): Field[] {
  const siblings = Object.keys(schema.properties ?? {});
  const own = Object.entries(schema.properties ?? {}).flatMap(([name, part]) => [
    { path: `${path}.${name}`, name, parent, siblings, schema: part },
    ...fieldsOf(part, `${path}.${name}`, name),
  ]);
  const inner = [...(schema.anyOf ?? []), ...(schema.oneOf ?? []), ...(schema.allOf ?? [])];
  if (schema.items) inner.push(schema.items);
  if (typeof schema.additionalProperties === 'object') inner.push(schema.additionalProperties);
  return [...own, ...inner.flatMap((part) => fieldsOf(part, path, parent))];
}

const holds = (schema: JsonSchema, test: (schema: JsonSchema) => boolean): boolean =>
  test(schema) ||
  [
    ...(schema.anyOf ?? []),
    ...(schema.oneOf ?? []),
    ...(schema.allOf ?? []),
    ...(schema.items ? [schema.items] : []),
  ].some((part) => holds(part, test));

/** A UUID by its format, or by the pattern of one where a further pattern stands beside it. */
const isUuid = ({ format, pattern }: JsonSchema) =>
  format === 'uuid' || (pattern?.startsWith('^([0-9a-fA-F]{8}-[0-9a-fA-F]{4}-') ?? false);

const isNumeric = (schema: JsonSchema) =>
  holds(schema, ({ type }) => type === 'number' || type === 'integer');

const fields = schemas.flatMap(([name, schema]) => fieldsOf(schema, name, ''));
const numeric = fields.filter(({ schema }) => isNumeric(schema));

/** SI units as they end a name; `PaAbs` and `Pag` say which pressure, `Pa` is a saturation table's (absolute) or a step's. */
const SUFFIX = /[a-z](K|PaAbs|Pag|M|M2|W|Kg|S|A|V)$|^(bubble|dew|printedStep)Pa$/;

/** Counts, versions and positions: numbers of things, which have no unit. */
const COUNTS =
  /(Count|Total|Done|Approved)$|^count[A-Z]|^(count|counts|number|perDay|round|upTo|beyond|minCount|attempts|rows|turns)$/;
const COUNTED = new Set(
  'open underWay submitted sentBack approved systems suctionGroups circuits fixtures coils sequences pages'.split(
    ' ',
  ),
);
const ORDINALS =
  /(Version|Revision|Position|Number)$|^(version|revision|position|format|row|status|step|basedOn)$/;
/** A share of something is a fraction from 0 to 1. */
const SHARES = /^(largest|least)[A-Za-z]*Share[A-Z]/;
/** A fraction from 0 to 1; bytes; pixels of a picture or of a signature's box. */
const PLAIN = new Set(['progress', 'bytes', 'width', 'height', 'strokes']);

function hasUnit(field: Field): boolean {
  const { name, parent, siblings } = field;
  if (SUFFIX.test(name) || COUNTS.test(name) || COUNTED.has(name) || ORDINALS.test(name) || PLAIN.has(name))
    return true;
  if (SHARES.test(name)) return true;
  // A value beside its unit, and limits in the SI unit that their step names.
  return (['value', 'low', 'high'].includes(name) && siblings.includes('unit')) || parent === 'limits';
}

describe('every schema of the contracts', () => {
  it('is found by this spec', () => {
    expect(schemas.length).toBeGreaterThan(35);
    expect(numeric.length).toBeGreaterThan(100);
  });

  it('names the unit of each number, unless it is a count, a ratio, a version or a position', () => {
    expect([...new Set(numeric.filter((field) => !hasUnit(field)).map(({ path }) => path))]).toEqual([]);
  });

  it('would not take a bare quantity', () => {
    for (const name of [
      'temperature',
      'superheat',
      'elevation',
      'load',
      'tempF',
      'pressurePsi',
      'pressurePa',
      'shareOfLoad',
    ]) {
      expect(hasUnit({ path: name, name, parent: '', siblings: [name], schema: { type: 'number' } })).toBe(
        false,
      );
    }
  });

  it('gives each id the form of a UUID', () => {
    // What the server echoes of an entry that it could not read, and ids that are only ever shown: a defrost plan's
    // findings are worked out by shared code that takes any circuit's name.
    const echoed =
      /^(entryBatchResponseSchema\.results|entryResultSchema)\.id$|requestId$|^(jobSchema|jobListSchema\.items)\.id$|(Breach|Note|breaches|notes)(Schema)?\.circuitIds$/;
    const loose = fields
      .filter(({ name, path }) => /(^id|Ids?)$/.test(name) && !echoed.test(path))
      .filter(({ schema }) => !holds(schema, isUuid));
    expect(loose.map(({ path }) => path)).toEqual([]);
  });

  it('gives each hash the form of a SHA-256', () => {
    const hashes = fields.filter(({ name }) => /(^sha256|Sha256|Hash|^hash|fingerprint)$/.test(name));
    const loose = hashes.filter(({ schema }) => !holds(schema, (part) => part.pattern === '^[0-9a-f]{64}$'));
    expect(hashes.length).toBeGreaterThan(10);
    expect(loose.map(({ path }) => path)).toEqual([]);
  });

  it('gives each moment the form of an ISO 8601 time in UTC', () => {
    // `takenAt` is a place; `readAt` and `changedAt` hold their moment as `at`, which is checked.
    const elsewhere = new Set(['takenAt', 'readAt', 'changedAt']);
    const moments = fields.filter(
      ({ name }) => /(^at|At|deviceTime|runAfter)$/.test(name) && !elsewhere.has(name),
    );
    expect(moments.map(({ path }) => path)).toEqual(
      expect.arrayContaining([expect.stringMatching(/readAt\.at$/)]),
    );
    const loose = moments.filter(({ schema }) => !holds(schema, ({ format }) => format === 'date-time'));
    expect(moments.length).toBeGreaterThan(8);
    expect(loose.map(({ path }) => path)).toEqual([]);
  });
});
