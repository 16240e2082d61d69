import type { Language, Text } from '#shared/checklist/text';
import type { SequenceId } from '#shared/plant/ids';
import { PAGE } from '../../pdf/page-geometry';
import type { Sheet } from '../../pdf/sheet';
import type { DocumentFormat } from './document-format';
import type { DocumentWords } from './document-words';
import type { Survey } from './circuit-survey';
import type { PackageCircuitRef, PackageContent } from './package-content';

/** What every part of the document draws with. */
export interface DocumentContext {
  readonly sheet: Sheet;
  readonly words: DocumentWords;
  readonly format: DocumentFormat;
  readonly language: Language;
  readonly content: PackageContent;
  readonly survey: Survey;
  /** Page of each chapter as the measuring pass found it; empty during that pass. */
  readonly knownPages: ReadonlyMap<string, number>;
  /** Page of each chapter as this pass finds it. */
  readonly foundPages: Map<string, number>;
  /** The bytes, `null` when there are none to show, `'skip'` while measuring. */
  readonly loadPhoto: (sequenceId: SequenceId, sha256: string) => Promise<Buffer | null | 'skip'>;
}

/** A template's words in the document's language; the other one where a translation is empty. */
export function say(context: DocumentContext, text: Text): string {
  const other = context.language === 'en' ? text.es : text.en;
  return text[context.language].trim() === '' ? other : text[context.language];
}

/** The circuits that have a chapter, in the order of the chapters. */
export function chaptersOf(context: DocumentContext): readonly PackageCircuitRef[] {
  return context.content.circuits.filter(({ sequenceId }) => context.survey.get(sequenceId)?.isBegun);
}

/** What a chapter is about: a circuit's description, or that it is the work of a whole system or suction group. */
export function subjectOf(
  { words }: Pick<DocumentContext, 'words'>,
  { level, description }: Pick<PackageCircuitRef, 'level' | 'description'>,
): string {
  return level === 'circuit' ? description : words.levels[level];
}

/** Notes that a chapter begins on this page: for the contents, for links and for the outline. */
export function beginChapter(
  context: DocumentContext,
  key: string,
  title: string,
  outline: PDFKit.PDFOutline = context.sheet.doc.outline,
): PDFKit.PDFOutline {
  const { sheet, foundPages } = context;
  foundPages.set(key, sheet.page);
  sheet.doc.addNamedDestination(key, 'XYZ', PAGE.left, PAGE.top - 20, 0);
  return outline.addItem(title);
}

export const SUMMARY_KEY = 'summary';
export const DEFROST_KEY = 'defrost-plan';
export const HASHES_KEY = 'hashes';
export const circuitKey = (sequenceId: SequenceId): string => `circuit-${sequenceId}`;
