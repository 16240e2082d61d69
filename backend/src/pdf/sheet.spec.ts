import { describe, expect, it } from '@jest/globals';
import PDFDocument from 'pdfkit';
import { gap, kept } from './block';
import { PAGE } from './page-geometry';
import { paragraph } from './paragraph';
import { readPages } from './read-pdf.fixture';
import { ruledTable } from './ruled-table';
import { Sheet } from './sheet';
import { STYLES } from './text-style';

async function drawn(draw: (sheet: Sheet) => Promise<void>): Promise<string[]> {
  const doc = new PDFDocument({ autoFirstPage: false, tagged: true });
  const chunks: Buffer[] = [];
  doc.on('data', (chunk: Buffer) => chunks.push(chunk));
  const ended = new Promise((resolve) => doc.on('end', resolve));
  const sheet = new Sheet(doc, { tagged: true, drawFooter: () => undefined, settle: async () => undefined });
  sheet.newPage();
  await draw(sheet);
  sheet.finish();
  doc.end();
  await ended;
  return readPages(Buffer.concat(chunks));
}

describe('Sheet', () => {
  it('takes a heading to the page of what it heads', async () => {
    const pages = await drawn(async (sheet) => {
      const room = PAGE.bottom - PAGE.top;
      await sheet.place([{ height: room - 30, draw: () => undefined }]);
      await sheet.place([
        ...paragraph(sheet, 'Heading', STYLES.section, { tag: 'H2' }),
        {
          height: 60,
          draw: (page, top) => page.tagged('P', () => page.text('Picture', PAGE.left, top + 20, STYLES.body)),
        },
      ]);
    });
    expect(pages).toEqual(['', 'Heading\nPicture']);
  });

  it('lets a long text go on and leaves no line alone at either end of a page', async () => {
    const words = Array.from({ length: 1500 }, (_, index) => `word${index}`);
    const pages = await drawn((sheet) => sheet.place(paragraph(sheet, words.join(' '), STYLES.body)));
    expect(pages.length).toBeGreaterThan(1);
    expect(pages.join('\n').split(/\s+/)).toEqual(words);
    for (const page of pages) expect(page.split('\n').length).toBeGreaterThan(1);
  });

  it('cuts a group that is taller than a page instead of drawing over its end', async () => {
    const tops: number[] = [];
    await drawn((sheet) =>
      sheet.place(
        kept(
          Array.from({ length: 40 }, () => ({
            height: 40,
            draw: (_page: Sheet, top: number) => void tops.push(top),
          })),
        ),
      ),
    );
    expect(tops).toHaveLength(40);
    expect(Math.max(...tops)).toBeLessThanOrEqual(PAGE.bottom - 40);
  });

  it('drops a gap at the top of a page', async () => {
    let top = 0;
    await drawn((sheet) => sheet.place([gap(50), { height: 10, draw: (_page, at) => void (top = at) }]));
    expect(top).toBe(PAGE.top);
  });

  it('cuts a line with an ellipsis where it has to fit', async () => {
    await drawn(async (sheet) => {
      expect(sheet.fitted('short', STYLES.body, 100)).toBe('short');
      expect(sheet.fitted('x'.repeat(200), STYLES.body, 60)).toMatch(/^x+…$/);
    });
  });

  it('measures a space in the mono face', async () => {
    await drawn(async (sheet) => expect(sheet.width(' ', STYLES.mono)).toBeCloseTo(0.6 * STYLES.mono.size));
  });
});

describe('ruledTable', () => {
  it('repeats its head on every page it goes on to', async () => {
    const pages = await drawn((sheet) =>
      sheet.place(
        ruledTable(
          sheet,
          [
            { title: 'Code', share: 1 },
            { title: 'State', share: 2 },
          ],
          rowsOf(120),
        ),
      ),
    );
    expect(pages.length).toBeGreaterThan(2);
    for (const page of pages) expect(page.startsWith('Code\nState\n')).toBe(true);
    expect(pages.join('\n').match(/row \d+/g)).toHaveLength(120);
  });

  it('carries a cell that is longer than a page over to further rows', async () => {
    const text = Array.from({ length: 900 }, (_, index) => `n${index}`).join(' ');
    const pages = await drawn((sheet) =>
      sheet.place(
        ruledTable(
          sheet,
          [
            { title: 'A', share: 1 },
            { title: 'B', share: 3 },
          ],
          [[{ text }, { text: 'b' }]],
        ),
      ),
    );
    expect(pages.join('\n').match(/n\d+/g)).toHaveLength(900);
  });
});

const rowsOf = (count: number): { text: string }[][] =>
  Array.from({ length: count }, (_, index) => [{ text: `row ${index}` }, { text: 'open' }]);
