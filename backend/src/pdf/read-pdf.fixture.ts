import { inflateSync } from 'node:zlib';

// Reads just enough of what pdfkit writes for a spec to look at: objects, page streams, and which letter a glyph stands for.

interface PdfObject {
  readonly head: string;
  readonly stream: string;
}

function objectsOf(bytes: Buffer): Map<number, PdfObject> {
  const text = bytes.toString('latin1');
  const objects = new Map<number, PdfObject>();
  for (const match of text.matchAll(/(?:^|\n)(\d+) 0 obj\n/g)) {
    const from = (match.index ?? 0) + match[0].length;
    const body = text.slice(from, text.indexOf('\nendobj', from));
    const cut = body.indexOf('\nstream\n');
    const head = cut < 0 ? body : body.slice(0, cut);
    const length = Number(/\/Length (\d+)/.exec(head)?.[1] ?? 0);
    const raw = cut < 0 ? '' : text.slice(from + cut + 8, from + cut + 8 + length);
    const stream = head.includes('/FlateDecode')
      ? inflateSync(Buffer.from(raw, 'latin1')).toString('latin1')
      : raw;
    objects.set(Number(match[1]), { head, stream });
  }
  return objects;
}

/** Letters of a font's glyphs, in order of their code. */
function lettersOf(objects: Map<number, PdfObject>, font: PdfObject | undefined): string[] {
  const map = objects.get(Number(/\/ToUnicode (\d+)/.exec(font?.head ?? '')?.[1]))?.stream ?? '';
  return [...map.matchAll(/\[((?:<[0-9a-f ]*>\s*)+)\]/g)].flatMap((range) =>
    [...(range[1] ?? '').matchAll(/<([0-9a-f ]*)>/g)].map(([, codes = '']) =>
      codes
        .split(' ')
        .filter((code) => code !== '')
        .map((code) => String.fromCharCode(parseInt(code, 16)))
        .join(''),
    ),
  );
}

function textOf(objects: Map<number, PdfObject>, page: PdfObject): string {
  const resources = objects.get(Number(/\/Resources (\d+)/.exec(page.head)?.[1]))?.head ?? '';
  const fonts = new Map(
    [...resources.matchAll(/\/(F\d+) (\d+) 0 R/g)].map(([, name, id]) => [
      name,
      lettersOf(objects, objects.get(Number(id))),
    ]),
  );
  const { stream } = objects.get(Number(/\/Contents (\d+)/.exec(page.head)?.[1])) ?? { stream: '' };
  const lines: string[] = [];
  let letters: string[] = [];
  for (const line of stream.split('\n')) {
    const font = /^\/(F\d+) /.exec(line);
    if (font) letters = fonts.get(font[1]) ?? [];
    if (!line.endsWith('TJ')) continue;
    const codes = [...line.matchAll(/<([0-9a-f]+)>/g)].flatMap(([, hex = '']) => hex.match(/.{4}/g) ?? []);
    lines.push(codes.map((code) => letters[parseInt(code, 16)] ?? '?').join(''));
  }
  return lines.join('\n');
}

/** The text of each page, a line for every piece of text that was drawn. */
export function readPages(bytes: Buffer): string[] {
  const objects = objectsOf(bytes);
  return [...objects.values()]
    .filter(({ head }) => /\/Type \/Page\n/.test(head))
    .map((page) => textOf(objects, page));
}

/** How many pictures the file holds. */
export function countPictures(bytes: Buffer): number {
  return [...objectsOf(bytes).values()].filter(({ head }) => head.includes('/Subtype /Image')).length;
}

/** The heads of all objects, for what stands in dictionaries. */
export const dictionariesOf = (bytes: Buffer): string =>
  [...objectsOf(bytes).values()].map(({ head }) => head).join('\n');
