import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { createWriteStream } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { PassThrough } from 'node:stream';
import { afterAll, beforeAll, describe, expect, it, jest } from '@jest/globals';
import type { SequenceDetail } from '#shared/contracts/sequences';
import { countPictures, dictionariesOf, readPages } from '../../pdf/read-pdf.fixture';
import type { PackageContent } from './package-content';
import { CircuitBuilder, madePhoto, packageOf, pair, recordAll } from './package.fixture';
import { PEOPLE, SIGNATURE } from './package-steps.fixture';
import { writePackageDocument } from './write-package-document';

const NOTE = Array.from({ length: 570 }, (_, index) => `note${String(index).padStart(3, '0')}`)
  .join('')
  .slice(0, 3990);

// Whole documents on a busy machine.
jest.setTimeout(60_000);

let folder: string;
let content: PackageContent;
let bytes: Buffer;
let result: { pages: number };
let pages: string[];
const progress: number[] = [];

async function write(from: PackageContent, name: string): Promise<{ pages: number; bytes: Buffer }> {
  const file = join(folder, name);
  const out = createWriteStream(file);
  const written = await writePackageDocument(from, out, {
    signal: new AbortController().signal,
    onProgress: (fraction) => progress.push(fraction),
  });
  return { ...written, bytes: await readFile(file) };
}

async function madeContent(language: 'en' | 'es' = 'en'): Promise<PackageContent> {
  const good = await madePhoto(120, 90, 1);
  const tall = await madePhoto(90, 120, 2);
  const broken = await madePhoto(60, 60, 3);
  const cut = await madePhoto(60, 50, 4);
  const photos = new Map([
    [good.ref.sha256, good.bytes],
    [tall.ref.sha256, tall.bytes],
    [broken.ref.sha256, Buffer.from('no picture at all')],
    [cut.ref.sha256, cut.bytes.subarray(0, 200)],
  ]);
  const approved = recordAll(
    new CircuitBuilder(1, 'A-12', 'Dairy wall'),
    [good.ref, tall.ref, broken.ref, cut.ref],
    'Fine.',
  )
    .review('sentBack', [{ stepKey: 'drain', text: 'Fill the trap again.' }])
    .answer('drain', { kind: 'choose', value: 'slow' })
    .answer('signature', { kind: 'signature', signature: SIGNATURE })
    .append({ kind: 'submission', restsOn: [] })
    .review('approved')
    .answer('fans', { kind: 'confirm', confirmed: true }, { standing: 'late' });
  const submitted = recordAll(new CircuitBuilder(2, 'A-14', 'Island 🍎 שלום \u202Eevil'), [good.ref], NOTE);
  const open = new CircuitBuilder(3, 'B-3', 'Reach-in')
    .answer('superheat', {
      kind: 'superheat',
      asFound: null,
      asLeft: { valve: 'steady', pair: pair('50', '24') },
    })
    .answer('hold', { kind: 'override', phase: 'set', remark: 'For the valve' })
    .answer('fanAmps', { kind: 'reading', value: { text: 'two', unit: 'A' } })
    .answer('signature', { kind: 'signature', signature: { ...SIGNATURE, strokes: [], typed: true } })
    .append({ kind: 'notApplicable', stepKey: 'gone', reason: 'A step of an older checklist' });
  const notBegun = new CircuitBuilder(4, 'C-7', 'Nobody’s yet');
  return packageOf([approved, submitted, open, notBegun], photos, language);
}

const pageWith = (text: string): string => pages.find((page) => page.includes(text)) ?? '';
const flat = (text: string): string => text.replace(/\n/g, ' ');

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'package-document-'));
  content = await madeContent();
  ({ bytes, ...result } = await write(content, 'english.pdf'));
  pages = readPages(bytes);
});
afterAll(() => rm(folder, { recursive: true }));

describe('writePackageDocument', () => {
  it('has as many pages as it says, on every page as well', () => {
    expect(pages).toHaveLength(result.pages);
    pages.forEach((page, index) => expect(page).toContain(`Page ${index + 1} of ${result.pages}`));
  });

  it('tells on the cover what is and what is not complete', () => {
    const [cover = ''] = pages;
    expect(cover).toContain('Willow Bend');
    expect(cover).toContain('1 of 5 circuits approved');
    expect(cover).toMatch(/Submitted, 1 circuit\nA-14/);
    expect(cover).toMatch(/No checklist, 1 circuit\nA-90/);
    expect(flat(cover)).toContain(
      'Local codes and the judgement of licensed practice stand above this document',
    );
  });

  it('gives in the contents the page on which each chapter begins', () => {
    for (const code of ['A-12', 'A-14', 'B-3']) {
      const number = new RegExp(`${code}\\n[^\\n]*\\n[^\\n]*\\n(\\d+)\\n`).exec(pages[1] ?? '')?.[1];
      const chapter = pages[Number(number) - 1] ?? '';
      expect(chapter).toContain('Specification');
      expect(chapter).toContain(code);
    }
  });

  it('gives a circuit that nobody recorded on one line in the summary, and no chapter', () => {
    expect(pages.filter((page) => page.includes('C-7')).map((page) => pages.indexOf(page) + 1)).toEqual([
      1, 3,
    ]);
    expect(pages[2]).toMatch(
      /Not begun\nNothing was recorded[^\n]*\n[\s\S]*C-7\nNobody’s yet\nDairy wall\nNot begun\n11/,
    );
    expect(pages[1]).not.toContain('C-7');
    expect(dictionariesOf(bytes)).not.toContain('/Title (C-7');
  });

  it('names required steps that nobody answered once, together, and leaves out those that are optional', () => {
    const chapter = pageWith('Still open (');
    expect(flat(chapter)).toContain('2. Drain line');
    expect(flat(chapter)).toContain('9. Valve, bulb and strap in one picture');
    expect(chapter).not.toContain('Door heater draws current');
    expect(pages.join('\n')).not.toContain('Nothing recorded\n');
  });

  it('never puts a superheat and its working on two pages', () => {
    const starts = pages.filter((page) => page.includes('7. Superheat of the coil'));
    expect(starts.length).toBe(3);
    starts.forEach((page) => expect(page).toContain('Formula: Superheat'));
  });

  it('prints readings in the units of the opening, as typed, with their limits', () => {
    const page = pageWith('4. Discharge air at the honeycomb');
    expect(page).toContain('27.5 °F');
    expect(page).toContain('entered as -2.5 °C');
    expect(page).toContain('Limits: 24.0 to 30.0 °F');
  });

  it('prints a superheat with its working, as-found beside as-left', () => {
    const page = pageWith('7. Superheat of the coil');
    expect(page).toMatch(/As found\nAs left, lowest\nAs left, highest/);
    expect(page).toMatch(/Dew temperature\n24\.4 °F\n24\.4 °F\n24\.4 °F/);
    expect(flat(page)).toContain('Formula: Superheat = line temperature − dew temperature');
    expect(page).toContain('Source: R-448A');
  });

  it('prints what went wrong: outside, refused, standing, reopened', () => {
    const all = pages.join('\n');
    expect(all).toContain('Below limits');
    expect(all).toContain('liquid may be leaving the coil');
    expect(all).toContain('This is not a number.');
    expect(all).toContain('Still standing: not put back.');
    expect(all).toContain('Fill the trap again.');
  });

  it('keeps what was superseded, came late or is no longer asked', () => {
    const all = pages.join('\n');
    expect(all).toMatch(/Earlier on this step\nWithin limits: Runs clear, trap filled/);
    expect(all).toMatch(
      /Arrived after the approval[\s\S]*All fans run and blow into the case\nRecorded: Confirmed/,
    );
    expect(all).toMatch(/No longer asked[\s\S]*gone\nNot applicable\. Reason: A step of an older checklist/);
  });

  it('prints reviews with the meaning of the signature', () => {
    const page = pageWith('Signed as reviewer');
    expect(page).toContain(PEOPLE.lead.name);
    expect(page).toContain('Meaning: I looked at every step and answer for it.');
  });

  it('lets a note of four thousand letters without a space flow over pages whole', () => {
    const printed = pages
      .join('\n')
      .replace(/\nIsland[^\n]*|\nPage \d+ of \d+|\nWillow[^\n]*|\nA-14 ·[^\n]*|\n/g, '');
    expect(printed).toContain(NOTE.slice(0, 400));
    expect(printed).toContain(NOTE.slice(-400));
  });

  it('puts a visible substitute for letters that the face lacks and drops marks that turn text around', () => {
    expect(pages.join('\n')).toContain('Island □ □□□□ evil');
  });

  it('embeds the good photos once each and says in a frame which can not be opened', () => {
    expect(countPictures(bytes)).toBe(3);
    expect(pages.join('\n').match(/This photo can not be opened\./g)).toHaveLength(2);
  });

  it('prints the approved head and the fingerprint on the last page', async () => {
    const first = await content.loadCircuit(content.circuits[0]?.sequenceId as never);
    const last = pages.at(-1) ?? '';
    expect(last).toContain(`A-12\n${first.fold.approvedHead}`);
    expect(last).toMatch(/A-14\nnot approved/);
    expect(last).toContain(content.installation.fingerprint);
  });

  it('carries metadata, language, outline and structure', () => {
    const heads = dictionariesOf(bytes);
    expect(heads).toContain('/DisplayDocTitle true');
    expect(heads).toContain('/Lang (en-US)');
    expect(heads).toContain('/Marked true');
    expect(heads).toContain('/Title (Rack A)');
    expect(heads).toMatch(/\/S \/H1/);
  });

  it('reports progress that only grows, to the end', () => {
    expect([...progress].sort((a, b) => a - b)).toEqual(progress);
    expect(progress.at(-1)).toBe(1);
  });

  it('writes the same document in Spanish', async () => {
    const spanish = await write(await madeContent('es'), 'spanish.pdf');
    const text = readPages(spanish.bytes).join('\n');
    expect(text).toContain('Paquete de entrega');
    expect(text).toContain('27.5 °F');
    expect(text).toContain('sobrecalentamiento');
    expect(text).not.toMatch(/recalentamiento del/);
    expect(text).not.toMatch(/Within limits|Page \d/);
  });

  it('is complete for an opening that has no circuits', async () => {
    const empty = await write({ ...content, circuits: [], summary: { systems: [] } }, 'empty.pdf');
    expect(readPages(empty.bytes)).toHaveLength(empty.pages);
    expect(readPages(empty.bytes)[0]).toContain('This opening has no circuits yet.');
  });
});

describe('writePackageDocument, when something fails', () => {
  const none = (): void => undefined;

  it('survives photos that can not be fetched', async () => {
    const failing = { ...content, loadPhoto: () => Promise.reject(new Error('store is down')) };
    const written = await write(failing, 'no-photos.pdf');
    expect(written.pages).toBe(result.pages);
    expect(countPictures(written.bytes)).toBe(0);
  });

  it('stops soon after it is aborted, even while a photo hangs', async () => {
    const controller = new AbortController();
    const hanging = {
      ...content,
      loadPhoto: () => {
        controller.abort(new Error('cancelled by a lead'));
        return new Promise<never>(() => undefined);
      },
    };
    const out = new PassThrough().resume();
    const done = writePackageDocument(hanging, out, { signal: controller.signal, onProgress: none });
    await expect(done).rejects.toMatchObject({ name: 'AbortError' });
    expect(out.writableEnded).toBe(false);
  });

  it('ends with an AbortError when it was aborted before it began', async () => {
    const signal = AbortSignal.abort();
    const done = writePackageDocument(content, new PassThrough(), { signal, onProgress: none });
    await expect(done).rejects.toMatchObject({ name: 'AbortError' });
  });

  it('leaves an entry that arrives between the passes to the next package', async () => {
    let calls = 0;
    const moving = {
      ...content,
      loadCircuit: async (id: Parameters<PackageContent['loadCircuit']>[0]): Promise<SequenceDetail> => {
        const detail = await content.loadCircuit(id);
        calls += 1;
        const last = detail.entries.at(-1);
        if (calls <= content.circuits.length || !last) return detail;
        const late = { ...last, server: { ...last.server, position: last.server.position + 1 } };
        return { ...detail, entries: [...detail.entries, late] };
      },
    };
    expect((await write(moving, 'moving.pdf')).pages).toBe(result.pages);
  });

  it('asks for a new attempt when the steps of a circuit changed between the passes', async () => {
    let calls = 0;
    const changed = {
      ...content,
      loadCircuit: async (id: Parameters<PackageContent['loadCircuit']>[0]): Promise<SequenceDetail> => ({
        ...(await content.loadCircuit(id)),
        stepListHash: String((calls += 1)).padStart(64, '0'),
      }),
    };
    const out = new PassThrough().resume();
    const done = writePackageDocument(changed, out, {
      signal: new AbortController().signal,
      onProgress: none,
    });
    await expect(done).rejects.toMatchObject({ name: 'TemporaryFailure' });
  });
});
