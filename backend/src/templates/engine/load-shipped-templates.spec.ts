import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from '@jest/globals';
import { DomainFailure } from '#shared/failures/failure';
import { loadShippedTemplates } from './load-shipped-templates';
import { templateText } from './written-template.fixture';

describe('loadShippedTemplates', () => {
  let folder = '';
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'templates-'));
  });
  afterEach(() => rmSync(folder, { recursive: true }));

  it('reads the YAML files by name and hands their text over unchanged', () => {
    const other = templateText().replace('key: trial', 'key: other');
    writeFileSync(join(folder, 'b.yaml'), templateText());
    writeFileSync(join(folder, 'a.yaml'), other);
    writeFileSync(join(folder, 'template.schema.json'), '{}');
    const loaded = loadShippedTemplates(folder);
    expect(loaded.map(({ fileName, document }) => [fileName, document.key])).toEqual([
      ['a.yaml', 'other'],
      ['b.yaml', 'trial'],
    ]);
    expect(loaded[0]?.source).toBe(other);
  });

  it('refuses two files with one key', () => {
    writeFileSync(join(folder, 'a.yaml'), templateText());
    writeFileSync(join(folder, 'b.yaml'), templateText());
    expect(() => loadShippedTemplates(folder)).toThrow(DomainFailure);
    expect(() => loadShippedTemplates(folder)).toThrow('b.yaml and a.yaml have the same key trial.');
  });

  it('names the file that is not sound', () => {
    writeFileSync(join(folder, 'a.yaml'), 'key: [');
    expect(() => loadShippedTemplates(folder)).toThrow(/^a\.yaml has/);
  });
});
