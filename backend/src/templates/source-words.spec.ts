import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from '@jest/globals';
import { sourceInWords } from '#shared/checklist/source-words';

const FOLDER = path.join(__dirname, '../../../templates');
const sources = new Set(
  readdirSync(FOLDER)
    .filter((file) => file.endsWith('.yaml'))
    .flatMap((file) => [...readFileSync(path.join(FOLDER, file), 'utf8').matchAll(/^\s*source: (.+)$/gm)])
    .map((match) => match[1] ?? ''),
);

describe('sourceInWords', () => {
  it('has Spanish words for every source of the templates that is not a publication’s own title', () => {
    const same = [...sources].filter((source) => sourceInWords(source, 'es') === source).sort();
    expect(same).toEqual(['UFGS 15182 Refrigerant Piping', 'US FDA Food Code 3-501.16']);
  });
  it('leaves what it does not know as the template says it', () => {
    expect(sourceInWords('Nameplate', 'es')).toBe('Nameplate');
    expect(sourceInWords('Common practice', 'en')).toBe('Common practice');
  });
});
