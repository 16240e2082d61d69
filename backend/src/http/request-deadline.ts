import type { RequestHandler } from 'express';
import { TemporaryFailure } from '#shared/failures/failure';

/**
 * Ends the wait of a client whose request gets no answer, as when the database hangs rather than refuses. The clock runs
 * from the moment when the whole request has arrived: a photo on a bad network may take as long as it takes. An answer
 * that has begun (the event stream, a download) is left alone.
 *
 * @param limitMs time for an answer to begin
 */
export function requestDeadline(limitMs: number): RequestHandler {
  return (request, response, next) => {
    let timer: NodeJS.Timeout | undefined;
    const start = (): void => {
      timer ??= setTimeout(() => {
        if (!response.headersSent) next(new TemporaryFailure('This takes too long. Try again shortly.'));
      }, limitMs);
    };
    // A body that isn't there is never read to its end.
    const hasBody =
      request.headers['transfer-encoding'] !== undefined || Number(request.headers['content-length']) > 0;
    if (hasBody) request.once('end', start);
    else start();
    response.once('close', () => clearTimeout(timer));
    next();
  };
}
