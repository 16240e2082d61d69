import { Router, type NextFunction, type Request, type RequestHandler, type Response } from 'express';
import multer from 'multer';
import { may, type AccessSubject } from '#shared/access/may';
import { Bug, DomainFailure } from '#shared/failures/failure';
import type { AccessRule, AnyRoute, Caller } from './define-route';
import { parseInput } from './parse-input';
import type { ForgeryGuard } from './csrf';
import { requestIdOf } from './request-id';

/** What mounting needs to know about people and things; implemented by the people feature. */
export interface AccessDesk {
  /** The caller by session, or `null`. Runs the session middleware. */
  bySession(request: Request, response: Response): Promise<Caller | null>;
  /** The caller by device credential, or `null`. */
  byDevice(request: Request): Promise<Caller | null>;
  /** What the id names, or `null` when there is no such thing. */
  subject(kind: 'opening' | 'sequence' | 'package', id: string): Promise<AccessSubject | null>;
}

export interface MountOptions {
  readonly desk: AccessDesk;
  readonly forgery: ForgeryGuard;
  /** Whether responses are checked against their schema too: in tests. */
  readonly checkResponses: boolean;
}

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/i;

/** Mounts the list of routes. Each request is authorised before its body is read. */
export function mountRoutes(
  routes: readonly AnyRoute[],
  options: MountOptions,
  jsonParser: RequestHandler,
): Router {
  const router = Router({ caseSensitive: true });
  for (const route of routes) {
    const readBody = route.upload ? uploadReader(route.upload.field, route.upload.maxBytes) : jsonParser;
    router[route.method](route.path, authorise(route, options), readBody, handler(route, options));
  }
  return router;
}

function authorise(route: AnyRoute, { desk, forgery }: MountOptions): RequestHandler {
  return async (request, response, next) => {
    if (route.method !== 'get') forgery.check(request);
    response.locals['caller'] = await admit(route.access, desk, request, response);
    next();
  };
}

async function admit(
  rule: AccessRule,
  desk: AccessDesk,
  request: Request,
  response: Response,
): Promise<Caller | null> {
  if (rule.kind === 'public') return null;
  const caller =
    (rule.device === 'first' ? await desk.byDevice(request) : null) ??
    (await desk.bySession(request, response)) ??
    (rule.device === 'fallback' ? await desk.byDevice(request) : null);
  if (!caller) throw new DomainFailure('notSignedIn', 'Sign in first.');
  if (rule.kind === 'self') return caller;
  const subject = await subjectOf(rule, desk, request, caller);
  if (!subject || !may(caller.person, 'opening.read', subject)) {
    // Whoever may not even see the opening learns nothing about what is in it.
    if (rule.subject !== 'company') throw new DomainFailure('notFound', 'There is no such thing here.');
  }
  if (!subject || !may(caller.person, rule.action, subject)) {
    throw new DomainFailure('notAllowed', 'Your role does not allow this.');
  }
  return caller;
}

async function subjectOf(
  rule: Extract<AccessRule, { kind: 'action' }>,
  desk: AccessDesk,
  request: Request,
  caller: Caller,
): Promise<AccessSubject | null> {
  if (rule.subject === 'company') return { companyId: caller.person.companyId };
  const id = request.params[rule.param ?? ''];
  if (typeof id !== 'string') throw new Bug(`The route ${request.path} names no parameter for its subject`);
  return UUID.test(id) ? desk.subject(rule.subject, id) : null;
}

function handler(route: AnyRoute, options: MountOptions): RequestHandler {
  return async (request, response) => {
    const result = await route.handle({
      params: route.params ? parseInput(route.params, request.params, 'path') : undefined,
      query: route.query ? parseInput(route.query, request.query, 'query') : undefined,
      body: route.body ? parseInput(route.body, request.body, 'body') : undefined,
      caller: response.locals['caller'],
      file: request.file ? { bytes: request.file.buffer, name: request.file.originalname } : null,
      headers: request.headers,
      requestId: requestIdOf(response),
      exchange: { request, response },
    });
    if (route.response === 'stream') return;
    response.setHeader('Cache-Control', 'no-store');
    if (route.response === 'nothing') {
      response.status(204).end();
      return;
    }
    if (options.checkResponses) {
      const checked = route.response.safeParse(result);
      if (!checked.success) {
        throw new Bug(
          `${route.method} ${route.path} answers against its schema: ${JSON.stringify(checked.error.issues)}`,
        );
      }
    }
    if (route.status) response.status(route.status);
    response.json(result);
  };
}

/** multer names its limits; everything else it throws is a body that is no multipart form. */
function isLimit(error: unknown): boolean {
  const code = (error as { code?: unknown }).code;
  return typeof code === 'string' && code.startsWith('LIMIT_');
}

function uploadReader(field: string, maxBytes: number): RequestHandler {
  const single = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: maxBytes, files: 1, fields: 5, parts: 8 },
    defParamCharset: 'utf8',
  }).single(field);
  return (request: Request, response: Response, next: NextFunction) => {
    single(request, response, (error: unknown) => {
      if (error)
        next(isLimit(error) ? error : new DomainFailure('invalidInput', 'The upload could not be read.'));
      else if (!request.file)
        next(new DomainFailure('invalidInput', `Send one file in the field "${field}".`));
      else next();
    });
  };
}
