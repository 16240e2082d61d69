import type { ErrorRequestHandler, Request, Response } from 'express';
import type { Logger } from 'pino';
import type { Problem } from '#shared/contracts/problem';
import { DomainFailure, TemporaryFailure, type FailureCode } from '#shared/failures/failure';
import { requestIdOf } from './request-id';

const STATUS: Readonly<Record<FailureCode, number>> = {
  invalidInput: 400,
  notSignedIn: 401,
  wrongCredentials: 401,
  passwordNeeded: 403,
  notAllowed: 403,
  notFound: 404,
  fourEyes: 403,
  wrongState: 409,
  changedMeanwhile: 409,
  alreadyThere: 409,
  tooLarge: 413,
  notAnImage: 415,
  notATable: 415,
  scheduleRefused: 422,
  templateRefused: 422,
  nothingToHandOver: 422,
  tooManyTries: 429,
  requestForged: 403,
};

const TITLES: Readonly<Record<number, string>> = {
  400: 'Bad request',
  401: 'Not signed in',
  403: 'Not allowed',
  404: 'Not found',
  409: 'Conflict',
  413: 'Too large',
  415: 'Unsupported content',
  422: 'Refused',
  429: 'Too many tries',
  500: 'Error',
  503: 'Not available',
};

/** What Express itself, its body parser and multer throw: they carry an HTTP status or a code. */
interface EdgeError {
  readonly status?: unknown;
  readonly code?: unknown;
  readonly type?: unknown;
}

/** The one place where a failure becomes a response (RFC 9457). What isn't a failure is a bug: logged whole, told in one sentence. */
export function errorResponse(logger: Logger): ErrorRequestHandler {
  return (error: unknown, request: Request, response: Response, next) => {
    if (response.headersSent) {
      next(error);
      return;
    }
    const problem = problemFor(error, requestIdOf(response));
    if (problem.status >= 500)
      logger.error({ err: error, requestId: problem.requestId, path: request.path }, 'failed');
    if (error instanceof TemporaryFailure) response.setHeader('Retry-After', String(error.retryAfterS));
    sendProblem(response, problem);
  };
}

/** Writes a problem document. */
export function sendProblem(response: Response, problem: Problem): void {
  response.status(problem.status).type('application/problem+json').send(JSON.stringify(problem));
}

/** The problem document of any error. */
export function problemFor(error: unknown, requestId: string): Problem {
  if (error instanceof DomainFailure) {
    return make(STATUS[error.code], error.code, error.message, requestId, error);
  }
  if (error instanceof TemporaryFailure) return make(503, 'temporary', error.message, requestId);
  if (isUnreachable(error))
    return make(503, 'temporary', 'The database does not answer. Try again shortly.', requestId);
  const edge = (error ?? {}) as EdgeError;
  if (edge.code === 'LIMIT_FILE_SIZE') return make(413, 'tooLarge', 'The file is too large.', requestId);
  if (edge.type === 'entity.too.large') return make(413, 'tooLarge', 'The request is too large.', requestId);
  const isClientError = typeof edge.status === 'number' && edge.status >= 400 && edge.status < 500;
  if (isClientError || (typeof edge.code === 'string' && edge.code.startsWith('LIMIT_'))) {
    return make(400, 'invalidInput', 'The request could not be read.', requestId);
  }
  return make(500, 'bug', 'Something went wrong on our side. It has been logged.', requestId);
}

/** What a driver throws when the other side is gone; all of it passes by itself. */
const UNREACHABLE = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'EPIPE',
  'ETIMEDOUT',
  'ENOTFOUND',
  'PROTOCOL_CONNECTION_LOST',
  'ER_SERVER_SHUTDOWN',
  'ER_CON_COUNT_ERROR',
]);

function isUnreachable(error: unknown): boolean {
  const { code, driverError } = (error ?? {}) as { code?: unknown; driverError?: { code?: unknown } };
  return [code, driverError?.code].some(
    (candidate) => typeof candidate === 'string' && UNREACHABLE.has(candidate),
  );
}

function make(
  status: number,
  code: Problem['code'],
  detail: string,
  requestId: string,
  failure?: DomainFailure,
): Problem {
  return {
    type: `urn:firstcold:problem:${code}`,
    title: TITLES[status] ?? 'Error',
    status,
    detail,
    code,
    places: [...(failure?.places ?? [])],
    facts: { ...failure?.facts },
    requestId,
  };
}
