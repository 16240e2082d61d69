import { existsSync, readdirSync } from 'node:fs';
import { join, relative, sep } from 'node:path';
import express, { Router, type RequestHandler } from 'express';
import { DomainFailure } from '#shared/failures/failure';

const HASHED = /-[A-Z0-9]{8}\.(?:js|css|woff2?|svg|png)$/;
const TYPES: Readonly<Record<string, string>> = {
  js: 'text/javascript; charset=utf-8',
  css: 'text/css; charset=utf-8',
  html: 'text/html; charset=utf-8',
  svg: 'image/svg+xml',
  json: 'application/json; charset=utf-8',
  webmanifest: 'application/manifest+json',
};

/**
 * The built pages. Files with a hash in their name are kept by browsers for good; a brotli twin is sent to those that
 * take it; every path that is no file is a page of the application.
 */
export function staticFiles(folder: string): RequestHandler {
  const router = Router();
  const twins = findTwins(folder);
  router.use((request, response, next) => {
    if (request.path.endsWith('.br')) throw new DomainFailure('notFound', 'There is no such file.');
    const type = TYPES[request.path.split('.').at(-1) ?? ''];
    if (
      !type ||
      !twins.has(request.path) ||
      !/\bbr\b/.test(String(request.headers['accept-encoding'] ?? ''))
    ) {
      next();
      return;
    }
    response.setHeader('Content-Encoding', 'br');
    response.setHeader('Content-Type', type);
    response.setHeader('Vary', 'Accept-Encoding');
    request.url = request.url.replace(request.path, `${request.path}.br`);
    next();
  });
  router.use(
    express.static(folder, {
      index: false,
      redirect: false,
      setHeaders(response, path) {
        const plain = path.replace(/\.br$/, '');
        response.setHeader(
          'Cache-Control',
          HASHED.test(plain) ? 'public, max-age=31536000, immutable' : 'no-cache',
        );
        const type = TYPES[plain.split('.').at(-1) ?? ''];
        if (path.endsWith('.br') && type) response.setHeader('Content-Type', type);
      },
    }),
  );
  router.get('/{*page}', (request, response) => {
    // A missing script or picture is missing; answering it with a page would only hide that.
    if (/\.\w+$/.test(request.path)) throw new DomainFailure('notFound', 'There is no such file.');
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile(join(folder, 'index.html'));
  });
  return router;
}

function findTwins(folder: string): ReadonlySet<string> {
  if (!existsSync(folder)) return new Set();
  return new Set(
    readdirSync(folder, { recursive: true, encoding: 'utf8' })
      .filter((name) => name.endsWith('.br'))
      .map((name) => `/${relative('', name).split(sep).join('/').slice(0, -3)}`),
  );
}
