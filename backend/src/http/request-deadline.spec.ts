import { describe, expect, it } from '@jest/globals';
import express, { type Express } from 'express';
import { pino } from 'pino';
import supertest from 'supertest';
import { errorResponse } from './error-response';
import { requestDeadline } from './request-deadline';

/** An application whose handlers hang, stream or answer. */
function appWith(limitMs: number): Express {
  const app = express();
  app.use(requestDeadline(limitMs));
  app.use(express.json());
  app.all('/hangs', () => undefined);
  app.get('/answers', (_request, response) => {
    response.json({ fine: true });
  });
  app.get('/streams', (_request, response) => {
    response.write('begun ');
    setTimeout(() => response.end('ended'), limitMs * 4);
  });
  app.use(errorResponse(pino({ level: 'silent' })));
  return app;
}

describe('requestDeadline', () => {
  it.each([
    ['get', undefined],
    ['post', undefined],
    ['post', { some: 'words' }],
  ] as const)('answers 503 when a %s of %j gets no answer', async (method, body) => {
    const response = await supertest(appWith(40))[method]('/hangs').send(body);
    expect(response.status).toBe(503);
    expect(response.type).toBe('application/problem+json');
    expect(response.body).toMatchObject({ code: 'temporary' });
    expect(response.headers['retry-after']).toBe('5');
  });

  it('leaves alone what answers in time, and what has begun', async () => {
    expect((await supertest(appWith(1000)).get('/answers')).body).toEqual({ fine: true });
    expect((await supertest(appWith(40)).get('/streams')).text).toBe('begun ended');
  });
});
