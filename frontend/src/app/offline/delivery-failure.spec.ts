import { HttpErrorResponse } from '@angular/common/http';
import { describe, expect, it } from '@jest/globals';
import { TimeoutError } from 'rxjs';
import { backOff } from './back-off';
import { deliveryFailure, refusalOf } from './delivery-failure';

const answer = (status: number, error: unknown = null) => new HttpErrorResponse({ status, error });

describe('deliveryFailure', () => {
  it.each([
    [answer(0), 'later'],
    [answer(500), 'later'],
    [answer(503), 'later'],
    [answer(429), 'later'],
    [new TimeoutError(), 'later'],
    [answer(401), 'signIn'],
    [answer(400, { code: 'invalidInput' }), 'refused'],
    [answer(413, { code: 'tooLarge' }), 'refused'],
    // Something on the way answered, not our server.
    [answer(404), 'later'],
    [answer(400, '<html>'), 'later'],
    [answer(403, { code: 'notAllowed' }), 'refused'],
    [answer(403, { code: 'requestForged' }), 'later'],
  ])('sorts %p as %s', (error, expected) => {
    expect(deliveryFailure(error)).toBe(expected);
  });
});

describe('refusalOf', () => {
  it('is the code of the server’s problem', () => {
    expect(refusalOf(answer(413, { code: 'tooLarge', detail: 'Too large.' }))).toEqual({
      code: 'callRefused',
      params: { failure: 'tooLarge' },
    });
    expect(refusalOf(answer(404))).toEqual({ code: 'callRefused', params: { failure: 'unknown' } });
  });
});

describe('backOff', () => {
  it('waits 20 s, then twice as long with each failure, up to 5 min', () => {
    expect([0, 1, 2, 3, 9].map((failures) => backOff(failures, 0))).toEqual([
      20_000, 20_000, 40_000, 80_000, 300_000,
    ]);
  });

  it('spreads phones by up to a quarter', () => {
    expect(backOff(1, 1)).toBe(25_000);
  });
});
