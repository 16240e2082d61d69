import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { DomainFailure } from '#shared/failures/failure';
import { parseTemplate } from './parse-template';
import type { TemplateDocument } from './template-document';

/** A template of the product with the text that it was read from, which is what gets stored. */
export interface ShippedTemplate {
  readonly document: TemplateDocument;
  readonly source: string;
  readonly fileName: string;
}

/**
 * Reads every `.yaml` file of a folder, in the order of their names.
 *
 * @throws {DomainFailure} templateRefused for a file that isn't sound, or when two files have the same key
 */
export function loadShippedTemplates(folder: string): ShippedTemplate[] {
  const fileNames = readdirSync(folder)
    .filter((name) => name.endsWith('.yaml'))
    .sort();
  const byKey = new Map<string, string>();
  return fileNames.map((fileName) => {
    const source = readFileSync(join(folder, fileName), 'utf8');
    const document = parseTemplate(source, fileName);
    const other = byKey.get(document.key);
    if (other !== undefined) {
      throw new DomainFailure(
        'templateRefused',
        `${fileName} and ${other} have the same key ${document.key}.`,
      );
    }
    byKey.set(document.key, fileName);
    return { document, source, fileName };
  });
}
