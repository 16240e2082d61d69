import type { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Response } from 'express';

export interface FileAnswer {
  readonly stream: Readable;
  readonly bytes: number;
  readonly contentRange: string | null;
}

/** Writes a stored file as the response; a client that goes away ends the reading too. */
export async function streamFile(
  response: Response,
  file: FileAnswer,
  headers: Record<string, string>,
): Promise<void> {
  response.writeHead(file.contentRange ? 206 : 200, {
    'Content-Length': String(file.bytes),
    'Accept-Ranges': 'bytes',
    ...(file.contentRange ? { 'Content-Range': file.contentRange } : {}),
    ...headers,
  });
  try {
    await pipeline(file.stream, response);
  } catch (error) {
    // The browser closed the connection: nobody is left to tell.
    if (!response.destroyed) throw error;
  }
}
