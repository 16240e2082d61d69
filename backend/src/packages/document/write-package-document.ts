import PDFDocument from 'pdfkit';
import { TemporaryFailure } from '#shared/failures/failure';
import type { SequenceId } from '#shared/plant/ids';
import { COLOURS } from '../../pdf/colours';
import { DocumentStream, orAborted } from '../../pdf/document-stream';
import { PAGE } from '../../pdf/page-geometry';
import { Sheet } from '../../pdf/sheet';
import { STYLES } from '../../pdf/text-style';
import { CircuitSource } from './circuit-source';
import { surveyCircuits, type Survey } from './circuit-survey';
import type { DocumentContext } from './document-context';
import { DocumentFormat } from './document-format';
import { DOCUMENT_WORDS } from './document-words';
import { drawDocument } from './draw-document';
import type { PackageContent } from './package-content';

type Doc = InstanceType<typeof PDFDocument>;

export interface WriteOptions {
  readonly signal: AbortSignal;
  /** Called with 0 to 1, never less than before. */
  onProgress(fraction: number): void;
}

/** What both passes draw from: they have to see the same. */
interface Drawn {
  readonly content: PackageContent;
  readonly source: Pick<CircuitSource, 'load'>;
  readonly survey: Survey;
}

interface Measured {
  readonly pages: number;
  readonly chapters: ReadonlyMap<string, number>;
}

/** The measuring pass reads the same circuits but no photos: about this share of the time. */
const MEASURING_SHARE = 0.25;

/**
 * Writes a handover package's document and ends the stream. Circuits are surveyed first: what nobody recorded on gets no
 * chapter. Then two passes over those that do: the first lays everything out to learn on which page each chapter begins and
 * how many pages there are, the second writes. At any time one circuit and the
 * photos of one row are in memory, and drawing waits for the stream's reader.
 *
 * @param out gets the PDF; left open, for its owner to throw away, when this rejects
 * @returns how many pages were written
 * @throws an AbortError soon after the signal fires
 * @throws {TemporaryFailure} when a circuit changed between the passes, or the stream was closed early
 */
export async function writePackageDocument(
  content: PackageContent,
  out: NodeJS.WritableStream,
  options: WriteOptions,
): Promise<{ pages: number }> {
  const { signal } = options;
  const source = new CircuitSource(content);
  const load = (id: SequenceId): ReturnType<CircuitSource['load']> => orAborted(source.load(id), signal);
  const survey = await surveyCircuits(content.circuits, { load });
  const chapters = [...survey.values()].filter(({ isBegun }) => isBegun).length;
  const share = (from: number, size: number) => (drawn: number) =>
    options.onProgress(from + (size * drawn) / Math.max(1, chapters));
  const drawn: Drawn = { content, source: { load }, survey };
  const measured = await measure(drawn, signal, share(0, MEASURING_SHARE));
  const doc = newDocument(content, true);
  const stream = new DocumentStream(doc, out, signal);
  try {
    const written = await draw(doc, drawn, {
      measured,
      settle: () => stream.settle(),
      loadPhoto: (id, sha256) => orAborted(photoOrNull(content, id, sha256), signal),
      onCircuit: share(MEASURING_SHARE, 0.99 - MEASURING_SHARE),
    });
    if (written.pages !== measured.pages) {
      throw new TemporaryFailure('A circuit changed while the package was being built');
    }
    await stream.finish();
    options.onProgress(1);
    return { pages: written.pages };
  } finally {
    stream.release();
  }
}

/** A photo that can't be fetched leaves a frame that says so; the rest of the document is worth as much without it. */
async function photoOrNull(content: PackageContent, id: SequenceId, sha256: string): Promise<Buffer | null> {
  try {
    return await content.loadPhoto(id, sha256);
  } catch {
    return null;
  }
}

async function measure(
  drawn: Drawn,
  signal: AbortSignal,
  onCircuit: (drawn: number) => void,
): Promise<Measured> {
  const doc = newDocument(drawn.content, false);
  // Nobody reads the measuring pass; what it pushes is dropped at once.
  doc.resume();
  return draw(doc, drawn, {
    measured: null,
    settle: () => orAborted(new Promise<void>((resolve) => setImmediate(resolve)), signal),
    loadPhoto: async () => 'skip',
    onCircuit,
  });
}

async function draw(
  doc: Doc,
  { content, source, survey }: Drawn,
  pass: {
    readonly measured: Measured | null;
    readonly settle: () => Promise<void>;
    readonly loadPhoto: DocumentContext['loadPhoto'];
    readonly onCircuit: (drawn: number) => void;
  },
): Promise<Measured> {
  const words = DOCUMENT_WORDS[content.package.language];
  const sheet = new Sheet(doc, {
    tagged: pass.measured !== null,
    settle: pass.settle,
    drawFooter: (page, number) => drawFooter(page, content, number, pass.measured?.pages ?? number),
  });
  const foundPages = new Map<string, number>();
  const { language } = content.package;
  const { unitSystem, timeZone } = content.opening;
  const context: DocumentContext = {
    sheet,
    words,
    format: new DocumentFormat(language, unitSystem, timeZone, words),
    language,
    content,
    survey,
    knownPages: pass.measured?.chapters ?? new Map(),
    foundPages,
    loadPhoto: pass.loadPhoto,
  };
  await drawDocument(context, source, pass.onCircuit);
  return { pages: sheet.page, chapters: foundPages };
}

function newDocument(content: PackageContent, forReading: boolean): Doc {
  const words = DOCUMENT_WORDS[content.package.language];
  const title = `${content.opening.name}: ${words.title}, ${words.version(content.package.version)}`;
  return new PDFDocument({
    autoFirstPage: false,
    size: [PAGE.width, PAGE.height],
    margin: 0,
    compress: forReading,
    tagged: forReading,
    pdfVersion: '1.7',
    lang: content.package.language === 'es' ? 'es-US' : 'en-US',
    displayTitle: true,
    info: {
      Title: title,
      Author: content.opening.companyName,
      Subject: words.subject,
      Creator: 'Firstcold',
      CreationDate: new Date(content.package.createdAt),
    },
  });
}

function drawFooter(sheet: Sheet, content: PackageContent, page: number, total: number): void {
  const words = DOCUMENT_WORDS[content.package.language];
  const style = STYLES.small;
  sheet.line(PAGE.left, PAGE.footer - 13, PAGE.right, PAGE.footer - 13, COLOURS.faintRule, 0.6);
  const number = words.page(page, total);
  // A long name gives way to the version, which tells one printed package from the next.
  const version = ` · ${words.title} · ${words.version(content.package.version)}`;
  const room = PAGE.right - PAGE.left - 100 - sheet.width(sheet.printable(version, style.face), style);
  const name = sheet.fitted(content.opening.name, style, room);
  sheet.text(`${name}${version}`, PAGE.left, PAGE.footer, style);
  sheet.text(number, PAGE.right, PAGE.footer, style, 'right');
}
