import type PDFDocument from 'pdfkit';

type Doc = InstanceType<typeof PDFDocument>;
type StructureElement = ReturnType<Doc['struct']>;

export interface ElementOptions {
  /** What a screen reader says in place of a drawing. */
  readonly alt?: string;
}

/**
 * One element of the document's structure: what is drawn inside `mark` is read as part of it. An element may go on over a
 * page break. Without tagging (the measuring pass) it only draws.
 */
export class TaggedElement {
  constructor(
    private readonly doc: Doc,
    private readonly element: StructureElement | null,
    private readonly type: string,
  ) {}

  child(type: string, options: ElementOptions = {}): TaggedElement {
    if (!this.element) return new TaggedElement(this.doc, null, type);
    const child = this.doc.struct(type, { ...options });
    this.element.add(child);
    child.setAttached();
    return new TaggedElement(this.doc, child, type);
  }

  mark(draw: () => void): this {
    if (!this.element) {
      draw();
      return this;
    }
    const content = this.doc.markStructureContent(this.type);
    draw();
    this.doc.endMarkedContent();
    this.element.add(content);
    return this;
  }

  end(): void {
    this.element?.end();
  }
}

/** The root of a document's structure. */
export function rootElement(doc: Doc, tagged: boolean): TaggedElement {
  if (!tagged) return new TaggedElement(doc, null, 'Document');
  const root = doc.struct('Document');
  doc.addStructure(root);
  return new TaggedElement(doc, root, 'Document');
}
