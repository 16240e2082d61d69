import { randomUUID } from 'node:crypto';
import type { RequestHandler, Response } from 'express';

/** Gives each request an id, which stands in its log lines, its problem document and a response header. */
export const giveRequestId: RequestHandler = (_request, response, next) => {
  const id = randomUUID();
  response.locals['requestId'] = id;
  response.setHeader('X-Request-Id', id);
  next();
};

export function requestIdOf(response: Response): string {
  return String(response.locals['requestId'] ?? '');
}
