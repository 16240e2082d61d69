import type { Level } from '#shared/plant/words';
import { checkStep } from './check-step';
import { refuseTemplate } from './refuse-template';
import { shapeProblems } from './shape-problem';
import type { SourceText } from './source-text';
import { TemplateChecker } from './template-checker';
import type { SectionDocument, TemplateDocument } from './template-document';
import { templateShape, type WrittenTemplate } from './template-shape';
import type { YamlDocument, YamlPath } from './yaml-document';

/**
 * Checks what was read: its shape first; then, when that is sound, every name, type, unit, text and limit.
 *
 * @throws {DomainFailure} templateRefused with all problems
 */
export function checkTemplate(source: SourceText, yaml: YamlDocument): TemplateDocument {
  const shaped = templateShape.safeParse(yaml.value);
  if (!shaped.success) return refuseTemplate(source, shapeProblems(shaped.error.issues, yaml));
  const written = shaped.data;
  const checker = new TemplateChecker(yaml);
  checker.text(['title'], written.title, written.level);
  const applies = checker.condition(['applies'], written.applies, written.level, []);
  const sections = written.sections.map((section, index) =>
    checkSection(checker, ['sections', index], section, written.level),
  );
  checkKeys(checker, written);
  if (!applies || checker.problems.length > 0) return refuseTemplate(source, checker.problems);
  const { key, version, level, title, priority } = written;
  return { key, version, level, title, priority, applies, sections, source };
}

function checkSection(
  checker: TemplateChecker,
  path: YamlPath,
  section: WrittenTemplate['sections'][number],
  level: Level,
): SectionDocument {
  checker.text([...path, 'title'], section.title, level);
  const when =
    section.when === undefined ? null : checker.condition([...path, 'when'], section.when, level, []);
  return {
    key: section.key,
    title: section.title,
    when,
    steps: section.steps.map((step, index) =>
      checkStep(checker, [...path, 'steps', index], step, when, level),
    ),
  };
}

/** A step key stands once in the whole template: entries hang on it, whatever section it moves to. */
function checkKeys(checker: TemplateChecker, template: WrittenTemplate): void {
  const sections = new Set<string>();
  const steps = new Set<string>();
  template.sections.forEach((section, index) => {
    const path = ['sections', index];
    if (sections.has(section.key))
      checker.report([...path, 'key'], `Section \`${section.key}\` stands here twice.`);
    sections.add(section.key);
    section.steps.forEach((step, stepIndex) => {
      if (steps.has(step.key)) {
        checker.report([...path, 'steps', stepIndex, 'key'], `Step \`${step.key}\` stands here twice.`);
      }
      steps.add(step.key);
    });
  });
}
