import { PassThrough, Writable } from 'node:stream';
import { describe, expect, it } from '@jest/globals';
import PDFDocument from 'pdfkit';
import { DocumentStream, orAborted } from './document-stream';

describe('DocumentStream', () => {
  it('waits for a slow reader and loses nothing', async () => {
    const doc = new PDFDocument({ compress: false });
    let taken = 0;
    let last = '';
    const slow = new Writable({
      highWaterMark: 1024,
      write: (chunk: Buffer, _encoding, done) => {
        taken += chunk.length;
        last = chunk.toString('latin1');
        setTimeout(done, 1);
      },
    });
    const stream = new DocumentStream(doc, slow, new AbortController().signal);
    for (let page = 0; page < 5; page += 1) {
      doc.addPage().text('x'.repeat(3000));
      await stream.settle();
      expect(slow.writableLength).toBeLessThanOrEqual(1024);
    }
    await stream.finish();
    expect(taken).toBeGreaterThan(15_000);
    expect(last).toContain('%%EOF');
  });

  it('ends with the error of a stream that fails', async () => {
    const doc = new PDFDocument();
    const broken = new Writable({ write: (_chunk, _encoding, done) => done(new Error('disk full')) });
    const stream = new DocumentStream(doc, broken, new AbortController().signal);
    doc.addPage();
    await expect(stream.finish()).rejects.toThrow('disk full');
  });

  it('wakes up from a reader that never reads when it is aborted', async () => {
    const doc = new PDFDocument({ compress: false });
    const stuck = new PassThrough({ highWaterMark: 16 });
    const controller = new AbortController();
    const stream = new DocumentStream(doc, stuck, controller.signal);
    doc.text('x'.repeat(3000)).addPage();
    setTimeout(() => controller.abort(), 20);
    await expect(stream.settle()).rejects.toMatchObject({ name: 'AbortError' });
  });
});

describe('orAborted', () => {
  it('gives the result of the work', async () => {
    await expect(orAborted(Promise.resolve(7), new AbortController().signal)).resolves.toBe(7);
  });
  it('rejects with an AbortError whatever reason the signal was given', async () => {
    const controller = new AbortController();
    const never = orAborted(new Promise(() => undefined), controller.signal);
    controller.abort('enough');
    await expect(never).rejects.toMatchObject({ name: 'AbortError' });
  });
});
