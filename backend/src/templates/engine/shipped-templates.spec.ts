import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from '@jest/globals';
import Ajv2020, { type ValidateFunction } from 'ajv/dist/2020';
import { parse } from 'yaml';
import * as z from 'zod/mini';
import { stepListSchema } from '#shared/checklist/step';
import type { CircuitSpecification } from '#shared/plant/plant';
import {
  CONTROLS,
  DEFROST_TYPES,
  FIXTURE_KINDS,
  LEVELS,
  TEMPERATURE_CLASSES,
  VALVE_KINDS,
} from '#shared/plant/words';
import { canonicalJson } from '#shared/sequences/canonical-json';
import { chooseTemplate } from './choose-template';
import { atLevel, specificationWith } from './circuit-specification.fixture';
import { expandTemplate } from './expand-template';
import { loadShippedTemplates } from './load-shipped-templates';
import { STEP_KEYS } from './step-shape';
import { sectionShape, templateShape } from './template-shape';

const FOLDER = join(__dirname, '../../../../templates');
const shipped = loadShippedTemplates(FOLDER);
const documents = shipped.map(({ document }) => document);
const schemaText = readFileSync(join(FOLDER, 'template.schema.json'), 'utf8');

const objectSchema = z.object({
  properties: z.record(z.string(), z.unknown()),
  required: z.array(z.string()),
});
const jsonSchema = z
  .object({ ...objectSchema.shape, $defs: z.record(z.string(), z.unknown()) })
  .parse(JSON.parse(schemaText));
const keysOf = (definition: unknown) => Object.keys(objectSchema.parse(definition).properties).sort();

describe('template.schema.json', () => {
  let validate: ValidateFunction;
  beforeAll(() => {
    validate = new Ajv2020({ allErrors: true }).compile(JSON.parse(schemaText) as object);
  });

  it.each(shipped)('accepts $fileName, which names it for editors', ({ source }) => {
    validate(parse(source));
    expect(validate.errors).toBeNull();
    expect(source.split('\n')[0]).toBe('# yaml-language-server: $schema=./template.schema.json');
  });

  it('refuses a template with a key too many', () => {
    const [first] = shipped;
    expect(validate({ ...(parse(first?.source ?? '') as object), colour: 'red' })).toBe(false);
  });

  it.each(Object.entries(STEP_KEYS))('has the same keys as the shape of a %s step', (kind, keys) => {
    expect(keysOf(jsonSchema.$defs[kind])).toEqual([...keys].sort());
  });

  it('has the same keys as the shapes of a section and of a template', () => {
    expect(keysOf(jsonSchema.$defs['section'])).toEqual(Object.keys(sectionShape.shape).sort());
    expect(keysOf(jsonSchema)).toEqual(Object.keys(templateShape.shape).sort());
  });
});

const keyOf = (specification: CircuitSpecification) => chooseTemplate(documents, specification)?.key;

describe('the shipped templates', () => {
  const combinations = TEMPERATURE_CLASSES.flatMap((temperatureClass) =>
    DEFROST_TYPES.flatMap((type) =>
      FIXTURE_KINDS.flatMap((kind) =>
        VALVE_KINDS.flatMap((valveKind) =>
          CONTROLS.flatMap((control) =>
            [null, 285].map((terminationTemperatureK) =>
              specificationWith({
                circuit: { temperatureClass, control },
                fixtures: { kind, valveKind },
                defrost: { type, terminationTemperatureK, failSafeS: terminationTemperatureK && 2700 },
              }),
            ),
          ),
        ),
      ),
    ),
  );

  it('give every circuit steps, the same twice, with superheat on each coil and a signature at the end', () => {
    for (const specification of combinations) {
      const template = chooseTemplate(documents, specification);
      if (!template) throw new Error('A circuit without template.');
      const list = expandTemplate(template, specification);
      expect(canonicalJson(expandTemplate(template, specification))).toBe(canonicalJson(list));
      expect(stepListSchema.safeParse(list).success).toBe(true);
      expect(list.steps.filter((step) => step.kind === 'superheat')).toHaveLength(3);
      expect(list.steps.at(-1)?.kind).toBe('signature');
      expect(new Set(list.steps.map((step) => step.key)).size).toBe(list.steps.length);
    }
  });

  it('leave no two of one priority applying to the same circuit', () => {
    for (const specification of combinations) {
      const first = chooseTemplate(documents, specification);
      const others = documents.filter((document) => document.key !== first?.key);
      expect(chooseTemplate(others, specification)?.priority).not.toBe(first?.priority);
    }
  });

  it('use every kind of step and say each text in two languages that differ from each other', () => {
    const kinds = new Set(
      documents.flatMap((each) => each.sections.flatMap((s) => s.steps.map((step) => step.body.kind))),
    );
    expect([...kinds].sort()).toEqual(Object.keys(STEP_KEYS).sort());
    for (const step of documents.flatMap((each) => each.sections.flatMap((section) => section.steps))) {
      expect(step.title.es).not.toBe(step.title.en);
      if (step.instruction) expect(step.instruction.es).not.toBe(step.instruction.en);
      if (step.caution) expect(step.caution.text.es).not.toBe(step.caution.text.en);
    }
  });

  it('fill the same placeholders in both languages', () => {
    const placeholdersOf = (text: string) => (text.match(/\{\{[^}]*\}\}/g) ?? []).sort();
    for (const step of documents.flatMap((each) => each.sections.flatMap((section) => section.steps))) {
      for (const text of [step.title, step.instruction, step.caution?.text]) {
        if (text) expect(placeholdersOf(text.es)).toEqual(placeholdersOf(text.en));
      }
    }
  });

  it('say the same in every template that has a step of the same key and title', () => {
    const seen = new Map<string, string>();
    for (const step of documents.flatMap((each) => each.sections.flatMap((section) => section.steps))) {
      const name = `${step.key} ${step.title.en}`;
      const body = canonicalJson({
        instruction: step.instruction,
        caution: step.caution,
        source: step.source,
      });
      // The freezer's door has more to look at, and a fan's step in a box has a drain line with heat trace; what a
      // lead should know is something else of a circuit, a group and a system.
      if (['box-door', 'fans', 'discharge-air', 'remarks'].includes(step.key)) continue;
      expect(seen.get(name) ?? body).toBe(body);
      seen.set(name, body);
    }
  });

  it('warn of CO2 and of a flammable refrigerant before anything else is touched', () => {
    const first = { circuit: 'right-circuit', suctionGroup: 'right-group', system: 'right-system' } as const;
    for (const level of LEVELS) {
      const keysFor = (refrigerant: string) => {
        const specification = atLevel(level, specificationWith({ system: { refrigerant } }));
        return documents
          .filter((document) => document.level === level && document.key === keyOf(specification))
          .flatMap((document) => expandTemplate(document, specification).steps.map((step) => step.key));
      };
      expect(keysFor('R-744').slice(0, 2)).toEqual([first[level], 'co2-ready']);
      expect(keysFor('R-454C').slice(0, 2)).toEqual([first[level], 'flammable-ready']);
      expect(keysFor('R-448A')).not.toContain('co2-ready');
      expect(keysFor('R-448A')[0]).toBe(first[level]);
    }
  });

  it.each(documents.filter(({ level }) => level === 'circuit'))(
    '$key warns of both before anything else',
    (document) => {
      const keysFor = (refrigerant: string) =>
        expandTemplate(document, specificationWith({ system: { refrigerant } })).steps.map(
          (step) => step.key,
        );
      expect(keysFor('R-744').slice(0, 2)).toEqual(['right-circuit', 'co2-ready']);
      expect(keysFor('R-454C').slice(0, 2)).toEqual(['right-circuit', 'flammable-ready']);
    },
  );

  it('put the work of one template on every system and on every group, with a signature at the end', () => {
    for (const refrigerant of ['R-448A', 'R-449A', 'R-404A', 'R-454C', 'R-744']) {
      for (const level of ['system', 'suctionGroup'] as const) {
        const specification = atLevel(level, specificationWith({ system: { refrigerant } }));
        const applying = documents.filter((document) => chooseTemplate([document], specification) !== null);
        expect(applying.map((document) => document.level)).toEqual([level]);
        const list = expandTemplate(applying[0] as (typeof documents)[number], specification);
        expect(stepListSchema.safeParse(list).success).toBe(true);
        expect(list.steps.at(-1)?.kind).toBe('signature');
        expect(list.steps.every((step) => step.fixtureId === null && step.coilId === null)).toBe(true);
      }
    }
  });
});
