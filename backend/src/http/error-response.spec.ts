import { describe, expect, it } from '@jest/globals';
import express from 'express';
import multer from 'multer';
import { pino } from 'pino';
import request from 'supertest';
import { problemSchema } from '#shared/contracts/problem';
import {
  Bug,
  DomainFailure,
  FAILURE_CODES,
  TemporaryFailure,
  type FailureCode,
} from '#shared/failures/failure';
import { errorResponse, problemFor } from './error-response';

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

describe('problemFor', () => {
  it.each(FAILURE_CODES)('answers the failure %s with its status, code and sentence', (code) => {
    const failure = new DomainFailure(code, 'A sentence.', [{ path: 'body.a', message: 'no' }], {
      rows: [1],
    });
    const problem = problemFor(failure, 'r-1');
    expect(problem).toMatchObject({ status: STATUS[code], code, detail: 'A sentence.', requestId: 'r-1' });
    expect(problem).toMatchObject({ places: [{ path: 'body.a', message: 'no' }], facts: { rows: [1] } });
    expect(problem.title).not.toBe('Error');
    expect(problemSchema.parse(problem)).toEqual(problem);
  });

  it('asks to try again after what is temporary', () => {
    expect(problemFor(new TemporaryFailure('The database is busy'), '')).toMatchObject({
      status: 503,
      code: 'temporary',
    });
  });

  it.each(['ECONNREFUSED', 'ECONNRESET', 'PROTOCOL_CONNECTION_LOST'])(
    'asks to try again, without saying where, when a driver throws %s',
    (code) => {
      const error = Object.assign(new Error('connect to 10.0.0.7:3306'), { code });
      for (const thrown of [error, Object.assign(new Error('query failed'), { driverError: error })]) {
        expect(problemFor(thrown, '')).toMatchObject({ status: 503, code: 'temporary' });
        expect(JSON.stringify(problemFor(thrown, ''))).not.toContain('10.0.0.7');
      }
    },
  );

  it.each([
    ['a bug', new Bug('SELECT secret FROM person')],
    ['an error', new Error('connect ECONNREFUSED 10.0.0.7:3306')],
    [
      'a driver error',
      Object.assign(new Error("Duplicate entry 'secret'"), { code: 'ER_DUP_ENTRY', errno: 1062 }),
    ],
    ['a text', 'secret'],
    ['an object', { message: 'secret', status: 200, stack: 'secret' }],
    ['nothing', undefined],
    ['null', null],
    ['an error that claims a status of ours', Object.assign(new Error('secret'), { status: 502 })],
  ])('tells nothing of %s but that it was logged', (_name, error) => {
    const problem = problemFor(error, 'r-1');
    expect(problem).toMatchObject({ status: 500, code: 'bug', places: [], facts: {} });
    expect(JSON.stringify(problem)).not.toMatch(/secret|SELECT|ECONN|stack/);
  });

  it.each([
    [new multer.MulterError('LIMIT_FILE_SIZE'), 413, 'tooLarge'],
    [new multer.MulterError('LIMIT_UNEXPECTED_FILE', 'virus'), 400, 'invalidInput'],
    [new multer.MulterError('LIMIT_PART_COUNT'), 400, 'invalidInput'],
    [Object.assign(new Error('x'), { type: 'entity.too.large', status: 413 }), 413, 'tooLarge'],
    [Object.assign(new SyntaxError('Unexpected token in JSON'), { status: 400 }), 400, 'invalidInput'],
  ])('takes what the edge throws for the caller’s: %s', (error, status, code) => {
    expect(problemFor(error, '')).toMatchObject({ status, code });
    expect(problemFor(error, '').detail).not.toMatch(/token|virus/);
  });
});

describe('errorResponse', () => {
  function serverThatThrows(error: unknown, logged: string[] = []) {
    const app = express();
    app.use(express.json({ limit: 100 }));
    app.all('/', () => {
      throw error;
    });
    app.use(errorResponse(pino({ level: 'info' }, { write: (line: string) => void logged.push(line) })));
    return request(app);
  }

  it('is a problem document', async () => {
    const response = await serverThatThrows(new DomainFailure('notFound', 'No such thing.')).get('/');
    expect(response.status).toBe(404);
    expect(response.headers['content-type']).toContain('application/problem+json');
    expect(JSON.parse(response.text)).toMatchObject({ type: 'urn:firstcold:problem:notFound', status: 404 });
  });

  it('says when to try again', async () => {
    const response = await serverThatThrows(new TemporaryFailure('Busy', 7)).get('/');
    expect(response.headers['retry-after']).toBe('7');
  });

  it('logs a bug whole, and a failure not at all', async () => {
    const logged: string[] = [];
    await serverThatThrows(new Error('the whole story'), logged).get('/');
    expect(logged.join()).toContain('the whole story');
    const quiet: string[] = [];
    await serverThatThrows(new DomainFailure('notFound', 'No.'), quiet).get('/');
    expect(quiet).toEqual([]);
  });

  it.each([
    ['{"a":', 400, 'invalidInput'],
    [JSON.stringify({ a: 'x'.repeat(200) }), 413, 'tooLarge'],
  ])('takes a body that can’t be read for the caller’s: %s', async (body, status, code) => {
    const response = await serverThatThrows(new Bug('not reached'))
      .post('/')
      .set('Content-Type', 'application/json')
      .send(body);
    expect(response.status).toBe(status);
    expect(JSON.parse(response.text)).toMatchObject({ code });
  });
});
