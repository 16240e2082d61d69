import type PDFDocument from 'pdfkit';
import { TemporaryFailure } from '#shared/failures/failure';

type Doc = InstanceType<typeof PDFDocument>;

/** The error that an aborted document ends with, whatever reason its signal was given. */
export function abortError(signal: AbortSignal): Error {
  const reason: unknown = signal.reason;
  if (reason instanceof Error && reason.name === 'AbortError') return reason;
  return new DOMException('The document was aborted', 'AbortError');
}

/** The promise's result, or an AbortError as soon as the signal fires; the work behind the promise goes on unheard. */
export async function orAborted<T>(work: Promise<T>, signal: AbortSignal): Promise<T> {
  if (signal.aborted) throw abortError(signal);
  let stop: () => void = () => undefined;
  const aborted = new Promise<never>((_resolve, reject) => {
    stop = () => reject(abortError(signal));
    signal.addEventListener('abort', stop, { once: true });
  });
  try {
    return await Promise.race([work, aborted]);
  } finally {
    signal.removeEventListener('abort', stop);
  }
}

/**
 * Carries a document's bytes to a stream at the stream's pace. pdfkit pushes without being asked, so whoever draws calls
 * `settle` between blocks: that is where it waits.
 */
export class DocumentStream {
  private isFull = false;
  private failure: Error | null = null;
  private wake: (() => void) | null = null;

  constructor(
    private readonly doc: Doc,
    private readonly out: NodeJS.WritableStream,
    private readonly signal: AbortSignal,
  ) {
    doc.on('data', this.write);
    out.on('drain', this.drained);
    out.on('error', this.failed);
    out.on('close', this.closed);
    signal.addEventListener('abort', this.woken, { once: true });
  }

  /**
   * Waits until the reader has room.
   *
   * @throws an AbortError when the signal fired, the stream's own error when it failed
   */
  async settle(): Promise<void> {
    // What pdfkit pushed is emitted by then.
    await new Promise((resolve) => setImmediate(resolve));
    this.check();
    while (this.isFull) {
      await new Promise<void>((resolve) => (this.wake = resolve));
      this.check();
    }
  }

  /** Ends the document and the stream, and waits until all of it has been taken. */
  async finish(): Promise<void> {
    const ended = new Promise<void>((resolve, reject) => {
      this.doc.once('end', resolve);
      this.doc.once('error', reject);
    });
    this.doc.end();
    await ended;
    await this.settle();
    const finished = new Promise<void>((resolve, reject) => {
      this.out.once('finish', resolve);
      this.out.once('error', reject);
      this.out.once('close', () =>
        reject(new TemporaryFailure('The stream was closed before it had taken all')),
      );
    });
    this.out.end();
    await orAborted(finished, this.signal);
  }

  /** Lets go of the stream; without `finish` it stays open, for its owner to throw away. */
  release(): void {
    this.doc.removeListener('data', this.write);
    this.out.removeListener('drain', this.drained);
    this.out.removeListener('close', this.closed);
    // The listener for its errors stays: a stream that is thrown away may still fail, and nobody else may be listening.
    this.signal.removeEventListener('abort', this.woken);
  }

  private readonly write = (chunk: Buffer): void => {
    if (this.failure === null && !this.out.write(chunk)) this.isFull = true;
  };

  private readonly drained = (): void => {
    this.isFull = false;
    this.woken();
  };

  private readonly failed = (error: Error): void => {
    this.failure ??= error;
    this.woken();
  };

  private readonly closed = (): void => {
    this.failed(new TemporaryFailure('The stream was closed before the document was complete'));
  };

  private readonly woken = (): void => {
    this.wake?.();
    this.wake = null;
  };

  private check(): void {
    if (this.signal.aborted) throw abortError(this.signal);
    if (this.failure !== null) throw this.failure;
  }
}
