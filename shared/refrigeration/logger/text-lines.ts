// Longer than any heading row of a logger: such a "line" is no delimited text.
const LONGEST_LINE = 1_000_000;
const LOOKED_AT = 4096;

/** Whether the text's beginning is mostly control characters or bytes that were no UTF-8. */
function looksBinary(text: string): boolean {
  const length = Math.min(text.length, LOOKED_AT);
  let odd = 0;
  for (let index = 0; index < length; index++) {
    const code = text.charCodeAt(index);
    const isControl = code < 32 && (code < 9 || code > 13);
    // U+FFFD stands for a byte that was no UTF-8; a degree sign of an older encoding gives a few.
    if (isControl || code === 0xfffd) odd++;
  }
  return odd > length / 20;
}

/**
 * The lines of a text that comes whole or in pieces, without their line ends and without a byte order mark. Only the
 * piece at hand is kept. A quoted cell ends with its line: one stray quote must not swallow the file.
 */
export class TextLines {
  /** Lines given so far. */
  count = 0;
  /** Set when the text turned out to be none; no line comes after that. */
  isBinary = false;

  readonly #pieces: Iterator<string>;
  #text = '';
  #from = 0;
  #searched = 0;
  #started = false;

  constructor(text: string | Iterable<string>) {
    this.#pieces = typeof text === 'string' ? [text].values() : text[Symbol.iterator]();
  }

  /** The next line, or undefined at the end. */
  next(): string | undefined {
    for (;;) {
      const end = this.#text.indexOf('\n', this.#searched);
      if (end !== -1) return this.#take(end, end + 1);
      this.#searched = this.#text.length;
      if (this.#refill()) continue;
      if (this.isBinary || this.#from >= this.#text.length) return undefined;
      return this.#take(this.#text.length, this.#text.length);
    }
  }

  #take(end: number, next: number): string {
    const isCarriage = end > this.#from && this.#text.charCodeAt(end - 1) === 13;
    const line = this.#text.slice(this.#from, isCarriage ? end - 1 : end);
    this.#from = next;
    this.#searched = next;
    this.count++;
    return line;
  }

  #refill(): boolean {
    const piece = this.#pieces.next();
    if (piece.done === true || this.isBinary) return false;
    const kept = this.#text.slice(this.#from);
    this.#text = kept + this.#opening(piece.value);
    this.#from = 0;
    this.#searched = kept.length;
    if (piece.value.includes('\0') || kept.length > LONGEST_LINE) {
      this.isBinary = true;
      this.#text = '';
      return false;
    }
    return true;
  }

  /** The first piece without its byte order mark, after a look at whether it is text at all. */
  #opening(piece: string): string {
    if (this.#started || piece === '') return piece;
    this.#started = true;
    if (looksBinary(piece)) this.isBinary = true;
    return piece.charCodeAt(0) === 0xfeff ? piece.slice(1) : piece;
  }
}
