import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { createWriteStream } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it, jest } from '@jest/globals';
import { readPages } from '../../pdf/read-pdf.fixture';
import type { PackageContent } from './package-content';
import { CircuitBuilder, packageOf } from './package.fixture';
import { writePackageDocument } from './write-package-document';

// Whole documents on a busy machine.
jest.setTimeout(60_000);

let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'level-work-'));
});
afterAll(() => rm(folder, { recursive: true }));

/** A rack and its group with work of their own, and one circuit. */
function contentWith(groupState: 'approved' | 'underWay', language: 'en' | 'es' = 'en'): PackageContent {
  const confirmed = (builder: CircuitBuilder) => builder.answer('fans', { kind: 'confirm', confirmed: true });
  const rack = confirmed(new CircuitBuilder(1, 'Rack A', ''));
  const circuit = confirmed(new CircuitBuilder(3, 'A-12', 'Dairy wall'));
  const content = packageOf([rack, circuit], new Map(), language);
  const [ofRack, ofCircuit] = content.circuits;
  if (!ofRack || !ofCircuit) throw new Error('Two chapters are needed.');
  return {
    ...content,
    circuits: [
      { ...ofRack, level: 'system', state: 'approved' },
      { ...ofCircuit, state: 'approved' },
    ],
    summary: {
      systems: [
        {
          name: 'Rack A',
          refrigerant: 'R-448A',
          work: [
            { level: 'system', code: 'Rack A', state: 'approved' },
            { level: 'suctionGroup', code: 'Rack A AS-1', state: groupState },
          ],
          circuits: [{ code: 'A-12', description: 'Dairy wall', area: 'Dairy', state: 'approved' }],
        },
      ],
    },
  };
}

async function pagesOf(content: PackageContent): Promise<string[]> {
  const file = join(folder, `${Math.trunc(content.package.version)}-${content.package.language}.pdf`);
  const signal = new AbortController().signal;
  await writePackageDocument(content, createWriteStream(file), { signal, onProgress: () => undefined });
  return readPages(await readFile(file));
}

describe('the work of systems and suction groups in a package', () => {
  it('is listed in the summary and contents with its state, and counted with no circuit', async () => {
    const [cover = '', contents = '', summary = ''] = await pagesOf(contentWith('underWay'));
    expect(cover).toContain('1 of 1 circuits approved');
    expect(cover).toContain('This package is not complete.');
    expect(cover).toMatch(/Systems and suction groups, not approved\nRack A AS-1 \(under way\)/);
    expect(contents).toMatch(/Rack A\nSystem\nApproved[\s\S]*A-12\nDairy wall/);
    expect(summary).toMatch(
      /System or suction group[\s\S]*Rack A\nSystem\nApproved\nRack A AS-1\nSuction group\nUnder way[\s\S]*A-12/,
    );
    expect(summary).toContain('1 circuit ·');
  });

  it('makes a package complete once it is approved too', async () => {
    const [cover = ''] = await pagesOf(contentWith('approved'));
    expect(cover).toContain('Every circuit of this opening has been commissioned');
    expect(cover).not.toContain('not approved');
  });

  it('says in Spanish what it is', async () => {
    const pages = await pagesOf(contentWith('underWay', 'es'));
    expect(pages[0]).toContain('Sistemas y grupos de succión, sin aprobar');
    expect(pages[2]).toContain('Grupo de succión');
  });
});
