import { join } from 'node:path';
import { constants } from 'node:zlib';
import compression from 'compression';
import express, { type Express, type RequestHandler } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';
import { DomainFailure } from '#shared/failures/failure';
import { errorResponse } from '../http/error-response';
import { mountRoutes } from '../http/mount-routes';
import { openApiDocument } from '../http/openapi';
import { giveRequestId, requestIdOf } from '../http/request-id';
import { requestDeadline } from '../http/request-deadline';
import { securityHeaders } from '../http/security-headers';
import { PROJECT_FOLDER } from './project-folder';
import { listRoutes } from './routes';
import type { Services } from './services';
import { staticFiles } from './static-files';

/** The largest body of JSON: 50 entries with signatures. */
const JSON_LIMIT = '2mb';
/** Batches of entries stay below: what is written often is not worth the processor's time. */
const COMPRESS_FROM_BYTES = 24_000;

/** Longer than any answer takes, shorter than a person waits: a database that hangs must not hold phones. */
const ANSWER_WITHIN_MS = 40_000;

export interface AppOptions {
  readonly secure: boolean;
  /** Whether answers are checked against their schemas: in tests. */
  readonly checkResponses: boolean;
}

/** The whole HTTP side: security headers, the API, the pages, and errors last. */
export function createApp(services: Services, logger: Logger, options: AppOptions): Express {
  const app = express();
  app.disable('x-powered-by');
  app.set('etag', false);
  // Behind a load balancer the client's address comes in a header; only one on this machine is believed.
  app.set('trust proxy', 'loopback');
  app.set('query parser', 'simple');
  app.use(giveRequestId);
  app.use(accessLog(logger));
  app.use(securityHeaders(options.secure));
  const routes = listRoutes(services);
  const document = openApiDocument(routes);
  app.use('/api', requestDeadline(ANSWER_WITHIN_MS));
  app.use('/api', compressLargeAnswers());
  app.use('/api', services.forgery.issue);
  app.get('/api/openapi.json', (_request, response) => {
    response.json(document);
  });
  app.use(
    '/api',
    mountRoutes(
      routes,
      { desk: services.desk, forgery: services.forgery, checkResponses: options.checkResponses },
      express.json({ limit: JSON_LIMIT }),
    ),
  );
  app.use('/api', () => {
    throw new DomainFailure('notFound', 'There is no such address.');
  });
  app.use(staticFiles(join(PROJECT_FOLDER, 'dist', 'frontend', 'browser')));
  app.use(errorResponse(logger));
  return app;
}

/** A circuit is 85 kB of JSON and 11 kB on the air. Small answers and the event stream go out as they are. */
function compressLargeAnswers(): RequestHandler {
  return compression({
    threshold: COMPRESS_FROM_BYTES,
    filter: (_request, response) => String(response.getHeader('Content-Type')).startsWith('application/json'),
    brotli: { params: { [constants.BROTLI_PARAM_QUALITY]: 4 } },
  });
}

/** One line a request, without cookies, bodies or query strings: logs hold no secrets. */
function accessLog(logger: Logger) {
  return pinoHttp({
    logger,
    quietReqLogger: true,
    autoLogging: { ignore: (request) => !request.url?.startsWith('/api/') || request.url === '/api/health' },
    customLogLevel: (_request, response, error) =>
      error || response.statusCode >= 500 ? 'error' : response.statusCode >= 400 ? 'info' : 'debug',
    genReqId: (_request, response) => requestIdOf(response as never),
    serializers: {
      req: (request: { id: string; method: string; url: string }) => ({
        id: request.id,
        method: request.method,
        path: request.url.split('?')[0],
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
  });
}
