import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { HttpErrorResponse } from '@angular/common/http';
import { beforeEach, describe, expect, it, jest } from '@jest/globals';
import { Connectivity } from '../offline/connectivity';
import { AppErrors } from './app-errors';

const CHUNK = new TypeError('Failed to fetch dynamically imported module: /chunk-A1.js');

describe('AppErrors', () => {
  const online = signal(true);
  let errors: AppErrors;

  beforeEach(() => {
    online.set(true);
    TestBed.configureTestingModule({ providers: [{ provide: Connectivity, useValue: { online } }] });
    errors = TestBed.inject(AppErrors);
    jest.spyOn(console, 'error').mockReturnValue();
  });

  it('takes a part that is gone for a new version', () => {
    errors.handleError(CHUNK);
    expect(errors.error()).toBe('newVersion');
    expect(errors.mayReload()).toBe(true);
  });

  it.each([
    ['a part of the application', CHUNK],
    ['an icon', new Error('Error retrieving icon set /icons.svg! Http failure response: 0')],
    ['a call that got no answer', new HttpErrorResponse({ status: 0 })],
  ])('takes %s that is not fetched without a network for just that', (_what, error) => {
    online.set(false);
    errors.handleError(error);
    expect(errors.error()).toBe('noNetwork');
  });

  it('offers no reload without a network, whatever went wrong', () => {
    online.set(false);
    errors.handleError(new TypeError('x is undefined'));
    expect(errors.error()).toBe('bug');
    expect(errors.mayReload()).toBe(false);
  });

  it('has nothing to say about the network once it is back', () => {
    online.set(false);
    errors.handleError(CHUNK);
    online.set(true);
    expect(errors.error()).toBeNull();
  });
});
