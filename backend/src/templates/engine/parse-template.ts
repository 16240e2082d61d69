import { checkTemplate } from './check-template';
import { SourceText } from './source-text';
import type { TemplateDocument } from './template-document';
import { readYaml } from './yaml-document';

/**
 * Reads and checks a template. Nothing of it is evaluated.
 *
 * @param source YAML text
 * @param fileName for messages only; nothing is opened
 * @throws {DomainFailure} templateRefused; each place has the path `file:line:column` and shows its line with a caret
 */
export function parseTemplate(source: string, fileName: string): TemplateDocument {
  const text = new SourceText(fileName, source);
  return checkTemplate(text, readYaml(text));
}
