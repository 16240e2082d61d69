import type { MakersTableFacts, SequenceFacts } from '#shared/checklist/facts';
import { stepListSchema, type Section, type Step, type StepList } from '#shared/checklist/step';
import { Bug, DomainFailure } from '#shared/failures/failure';
import type { CircuitSpecification } from '#shared/plant/plant';
import { standardAtmosphere } from '#shared/refrigeration/gauge-pressure';
import { metre } from '#shared/units/quantity';
import { isTrue } from './evaluate';
import { expandStep, type StepTarget } from './expand-step';
import { fillPlaceholders } from './placeholder';
import { refuseTemplate } from './refuse-template';
import { specificationFacts, coilFacts, fixtureFacts, type Facts } from './specification-facts';
import type { SectionDocument, StepDocument, TemplateDocument } from './template-document';

/** A circuit with more steps than this would never be walked through; a template that makes them is a mistake. */
export const MOST_STEPS = 2000;

/**
 * Makes the steps of one circuit. The same template version and the same specification give the same bytes: order is
 * the template's order, then the specification's.
 *
 * @param makersTable of the system's refrigerant, where the company works by one: it takes precedence over the program's
 *   own figures
 * @throws {DomainFailure} templateRefused when an expression has no answer for this circuit, limits cross, or there
 *   are no steps or more than 2,000; invalidInput when the opening's elevation has no standard atmosphere
 */
export function expandTemplate(
  template: TemplateDocument,
  specification: CircuitSpecification,
  makersTable?: MakersTableFacts,
): StepList {
  const facts = specificationFacts(specification, makersTable);
  const sections: Section[] = [];
  const steps: Step[] = [];
  for (const section of template.sections) {
    if (section.when && !isTrue(template.source, section.when, facts)) continue;
    const before = steps.length;
    expandSection(template, section, specification, facts, steps);
    if (steps.length > before) sections.push({ key: section.key, title: fill(section.title, facts) });
  }
  if (steps.length === 0) {
    const offset = template.sections[0]?.steps[0]?.offset ?? 0;
    refuseTemplate(template.source, [
      { offset, sentence: `None of the steps is there for ${specification.circuit.code}.` },
    ]);
  }
  const { key, version, title } = template;
  const list = stepListSchema.safeParse({
    format: 1,
    template: { key, version, title: fill(title, facts) },
    facts: sequenceFacts(specification, makersTable),
    sections,
    steps,
  });
  if (!list.success)
    throw new Bug(`An expanded template has a wrong shape: ${JSON.stringify(list.error.issues)}`);
  return list.data;
}

function sequenceFacts(
  { opening, system }: CircuitSpecification,
  makersTable: MakersTableFacts | undefined,
): SequenceFacts {
  const atmosphere = standardAtmosphere(metre(opening.elevationM));
  if (!atmosphere.ok) {
    throw new DomainFailure('invalidInput', 'There is no standard atmosphere at this elevation.', [
      { path: 'opening.elevationM', message: `${opening.elevationM} m lies outside -500 m to 11,000 m.` },
    ]);
  }
  return {
    refrigerant: system.refrigerant,
    ...(makersTable ? { makersTable } : {}),
    atmospherePaAbs: atmosphere.pressure,
    elevationM: opening.elevationM,
    unitSystem: opening.unitSystem,
  };
}

function fill(text: { en: string; es: string }, facts: Facts): { en: string; es: string } {
  return { en: fillPlaceholders(text.en, facts), es: fillPlaceholders(text.es, facts) };
}

function expandSection(
  template: TemplateDocument,
  section: SectionDocument,
  specification: CircuitSpecification,
  facts: Facts,
  steps: Step[],
): void {
  for (const block of blocksOf(section.steps)) {
    for (const target of targetsOf(block[0]?.scope ?? 'circuit', specification, facts)) {
      for (const step of block) {
        if (step.when && !isTrue(template.source, step.when, target.facts)) continue;
        if (steps.length >= MOST_STEPS) {
          refuseTemplate(template.source, [
            { offset: step.offset, sentence: `This makes more than ${MOST_STEPS} steps for one circuit.` },
          ]);
        }
        steps.push(expandStep(template.source, section.key, step, target));
      }
    }
  }
}

/** Neighbours that are repeated for the same thing are done together: all of the first fixture, then the next one. */
function blocksOf(steps: readonly StepDocument[]): StepDocument[][] {
  const blocks: StepDocument[][] = [];
  for (const step of steps) {
    const last = blocks.at(-1);
    if (last && last[0]?.scope === step.scope) last.push(step);
    else blocks.push([step]);
  }
  return blocks;
}

function targetsOf(
  scope: StepDocument['scope'],
  specification: CircuitSpecification,
  facts: Facts,
): StepTarget[] {
  if (scope !== 'fixture' && scope !== 'coil') return [{ facts, fixture: null, coil: null }];
  return specification.circuit.fixtures.flatMap((fixture): StepTarget[] => {
    const withFixture = { ...facts, fixture: fixtureFacts(fixture) };
    if (scope === 'fixture') return [{ facts: withFixture, fixture, coil: null }];
    return fixture.coils.map((coil) => ({ facts: { ...withFixture, coil: coilFacts(coil) }, fixture, coil }));
  });
}
