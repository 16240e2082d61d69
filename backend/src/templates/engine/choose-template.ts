import type { MakersTableFacts } from '#shared/checklist/facts';
import type { CircuitSpecification } from '#shared/plant/plant';
import { isTrue } from './evaluate';
import { specificationFacts } from './specification-facts';
import type { TemplateDocument } from './template-document';

/**
 * The template for a circuit, or for a suction group's or system's own work: of those of its level that apply, in their
 * newest versions, the one with the highest priority. Equal priorities are settled by key, so that the choice doesn't
 * depend on the order of the list.
 *
 * @param makersTable of the system's refrigerant, where the company works by one
 * @returns `null` when none applies
 * @throws {DomainFailure} templateRefused when a condition has no answer for this circuit
 */
export function chooseTemplate(
  templates: readonly TemplateDocument[],
  specification: CircuitSpecification,
  makersTable?: MakersTableFacts,
): TemplateDocument | null {
  const facts = specificationFacts(specification, makersTable);
  const { level = 'circuit' } = specification;
  const newest = new Map<string, TemplateDocument>();
  for (const template of templates) {
    if (template.level !== level) continue;
    const other = newest.get(template.key);
    if (!other || other.version < template.version) newest.set(template.key, template);
  }
  const applying = [...newest.values()].filter((template) =>
    isTrue(template.source, template.applies, facts),
  );
  applying.sort((a, b) => b.priority - a.priority || (a.key < b.key ? -1 : 1));
  return applying[0] ?? null;
}
