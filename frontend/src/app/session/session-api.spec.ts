import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { beforeEach, describe, expect, it } from '@jest/globals';
import { SessionApi } from './session-api';

const ID = '01920000-0000-7000-8000-000000000001';
const ME = {
  id: ID,
  name: 'Dana Ruiz',
  email: 'dana@example.com',
  language: 'en',
  companyId: ID,
  companyName: 'Northgate',
  companyRole: 'installer',
  memberships: [],
};

describe('SessionApi', () => {
  let http: HttpTestingController;

  beforeEach(() => {
    TestBed.configureTestingModule({ providers: [provideHttpClientTesting()] });
    http = TestBed.inject(HttpTestingController);
  });

  async function read(answer: object | null): Promise<unknown> {
    const reading = TestBed.inject(SessionApi).read();
    http.expectOne('/api/session').flush(answer);
    return reading;
  }

  it('knows that nobody is here', async () => {
    expect(await read({ me: null })).toBeNull();
  });

  it('hands on a person whom the contract knows', async () => {
    expect(await read({ me: ME })).toEqual(ME);
  });

  it.each([[null], [{}], [{ me: { ...ME, companyRole: 'owner' } }], [{ me: undefined }]])(
    'refuses an answer that the contract does not know: %j',
    async (answer) => {
      await expect(read(answer)).rejects.toThrow();
    },
  );
});
