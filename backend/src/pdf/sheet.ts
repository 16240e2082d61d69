import type PDFDocument from 'pdfkit';
import type { Block } from './block';
import { COLOURS } from './colours';
import { registerFaces, SUBSTITUTES, type Face } from './fonts';
import { PAGE } from './page-geometry';
import { printableText } from './printable-text';
import { rootElement, type TaggedElement } from './structure';
import type { TextStyle } from './text-style';
import { wrapText } from './wrap-text';

type Doc = InstanceType<typeof PDFDocument>;

export interface SheetOptions {
  readonly tagged: boolean;
  /** Draws what stands on every page; it must not change the layout. */
  readonly drawFooter: (sheet: Sheet, page: number) => void;
  /** Called after every group of blocks: waits for the reader of the stream, and ends an aborted document. */
  readonly settle: () => Promise<void>;
}

/** Where a piece of text goes: to the right of x, or to the left of it. */
export type Align = 'left' | 'right' | 'centre';

/** Pages that blocks flow onto, from top to bottom. Owns the pdfkit document's state: nothing else adds a page. */
export class Sheet {
  /** Top of the next block, in points from the page's top. */
  y: number = PAGE.top;
  /** Number of the current page, from 1; 0 before the first. */
  page = 0;
  /** Set small at the top of pages that begin in the middle of something. */
  runningHead: string | null = null;
  /** Whether the notebook's margin line is drawn down new pages. */
  hasMarginRule = false;
  private parents: TaggedElement[];
  private readonly widths = new Map<string, number>();
  private readonly glyphs = new Map<Face, Map<number, boolean>>();

  constructor(
    readonly doc: Doc,
    private readonly options: SheetOptions,
  ) {
    registerFaces(doc);
    this.parents = [rootElement(doc, options.tagged)];
  }

  /** The structure element that new content belongs to. */
  get parent(): TaggedElement {
    return this.parents.at(-1) as TaggedElement;
  }

  openPart(type: string): void {
    this.parents.push(this.parent.child(type));
  }

  closePart(): void {
    this.parents.pop()?.end();
  }

  /** Begins a page, with the running head where there is one. */
  newPage(withRunningHead = false): void {
    this.doc.addPage({ size: [PAGE.width, PAGE.height], margin: 0 });
    this.page += 1;
    this.y = PAGE.top;
    this.artifact(() => {
      if (this.hasMarginRule)
        this.line(PAGE.marginRule, 30, PAGE.marginRule, PAGE.footer + 8, COLOURS.faintRule, 0.6);
      if (withRunningHead && this.runningHead !== null) {
        const style: TextStyle = { face: 'body', size: 8, lead: 10, colour: COLOURS.inkSoft };
        this.text(this.fitted(this.runningHead, style, 440), PAGE.right, PAGE.runningHead, style, 'right');
      }
      this.options.drawFooter(this, this.page);
    });
  }

  /** Places blocks one below the other, breaking pages between groups that belong together. */
  async place(blocks: readonly Block[]): Promise<void> {
    let index = 0;
    while (index < blocks.length) {
      let end = index;
      while (end < blocks.length - 1 && blocks[end]?.keepWithNext) end += 1;
      const group = blocks.slice(index, end + 1);
      await this.placeGroup(group);
      index = end + 1;
    }
  }

  private async placeGroup(group: readonly Block[]): Promise<void> {
    const height = group.reduce((sum, block) => sum + block.height, 0);
    const first = group[0];
    if (!first || (first.isGap && group.length === 1 && this.y <= PAGE.top)) return;
    if (first.isGap && group.length === 1) {
      this.y += first.height;
      return;
    }
    if (this.y + height > PAGE.bottom && this.y > PAGE.top) this.breakBefore(first);
    for (const block of group) {
      // Only a group taller than a page gets here: it is cut between its blocks.
      if (this.y + block.height > PAGE.bottom && this.y > PAGE.top) this.breakBefore(block);
      if (block.isGap && this.y <= PAGE.top) continue;
      if (block.prepare) await block.prepare();
      block.draw(this, this.y);
      this.y += block.height;
    }
    await this.options.settle();
  }

  private breakBefore(block: Block): void {
    this.newPage(true);
    if (!block.repeated) return;
    block.repeated.draw(this, this.y);
    this.y += block.repeated.height;
  }

  /** Text as the face can print it. */
  printable(text: string, face: Face): string {
    return printableText(text, (codePoint) => this.hasGlyph(face, codePoint), SUBSTITUTES[face]);
  }

  /** Width in points of printable text. */
  width(text: string, style: TextStyle): number {
    const key = `${style.face}|${style.size}|${text}`;
    const known = this.widths.get(key);
    if (known !== undefined) return known;
    const width = this.doc.font(style.face).fontSize(style.size).widthOfString(text);
    // Bounded: words repeat, hashes and times don't.
    if (this.widths.size > 20_000) this.widths.clear();
    this.widths.set(key, width);
    return width;
  }

  wrap(text: string, style: TextStyle, width: number): string[] {
    return wrapText(this.printable(text, style.face), width, (piece) => this.width(piece, style));
  }

  /** One line of text that fits into `width`, with an ellipsis where it had to be cut. */
  fitted(text: string, style: TextStyle, width: number): string {
    const line = this.printable(text, style.face).replace(/\n/g, ' ');
    if (this.width(line, style) <= width) return line;
    const signs = [...line];
    while (signs.length > 1 && this.width(`${signs.join('')}…`, style) > width) signs.pop();
    return `${signs.join('').trimEnd()}…`;
  }

  /** Draws one line, its baseline at `baseline`. */
  text(text: string, x: number, baseline: number, style: TextStyle, align: Align = 'left'): void {
    const line = this.printable(text, style.face).replace(/\n/g, ' ');
    if (line === '') return;
    const shift = align === 'left' ? 0 : this.width(line, style) / (align === 'right' ? 1 : 2);
    this.doc.font(style.face).fontSize(style.size).fillColor(style.colour);
    this.doc.text(line, x - shift, baseline, { lineBreak: false, baseline: 'alphabetic' });
  }

  line(x1: number, y1: number, x2: number, y2: number, colour: string = COLOURS.rule, thickness = 0.6): void {
    this.doc.lineWidth(thickness).strokeColor(colour).moveTo(x1, y1).lineTo(x2, y2).stroke();
  }

  /** Draws what a screen reader should pass over: rules, ornaments, page numbers. */
  artifact(draw: () => void): void {
    if (!this.options.tagged) {
      draw();
      return;
    }
    this.doc.markContent('Artifact', {});
    draw();
    this.doc.endMarkedContent();
  }

  /** Draws one closed piece of content under the current part. */
  tagged(type: string, draw: () => void, alt?: string): void {
    this.parent
      .child(type, alt === undefined ? {} : { alt: this.printable(alt, 'body') })
      .mark(draw)
      .end();
  }

  /** Ends the structure; the document itself is ended by whoever made it. */
  finish(): void {
    while (this.parents.length > 0) this.closePart();
  }

  private hasGlyph(face: Face, codePoint: number): boolean {
    const known = this.glyphs.get(face) ?? new Map<number, boolean>();
    this.glyphs.set(face, known);
    const answer = known.get(codePoint);
    if (answer !== undefined) return answer;
    this.doc.font(face);
    // pdfkit's types leave out the font's own reader, which is what knows its letters.
    const { font } = (
      this.doc as unknown as { _font: { font: { hasGlyphForCodePoint(code: number): boolean } } }
    )._font;
    const has = font.hasGlyphForCodePoint(codePoint);
    known.set(codePoint, has);
    return has;
  }
}
