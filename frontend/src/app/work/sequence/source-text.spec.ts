import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from '@jest/globals';
import { sourceText } from './source-text';

const TEMPLATES = path.join(__dirname, '../../../../../templates');
/** A published rule is cited under its own title. */
const CITED = /^US FDA Food Code/;

const sources = new Set(
  readdirSync(TEMPLATES)
    .filter((file) => file.endsWith('.yaml'))
    .flatMap((file) => [...readFileSync(path.join(TEMPLATES, file), 'utf8').matchAll(/^ +source: (.+)$/gm)])
    .map(([, source]) => source!),
);

describe('sourceText', () => {
  it('has Spanish words for every source of the shipped templates', () => {
    const same = [...sources].filter((source) => sourceText(source).es === source && !CITED.test(source));
    expect(sources.size).toBeGreaterThan(3);
    expect(same).toEqual([]);
  });

  it('leaves a source that it does not know as it is', () => {
    expect(sourceText('House rule 7')).toEqual({ en: 'House rule 7', es: 'House rule 7' });
  });
});
