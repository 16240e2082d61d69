import { describe, expect, it, jest } from '@jest/globals';
import { withPassword } from './with-password';

const needed = {
  status: 403,
  error: {
    type: '',
    title: '',
    status: 403,
    detail: '',
    code: 'passwordNeeded',
    places: [],
    facts: {},
    requestId: '',
  },
};

describe('withPassword', () => {
  it('asks and calls again when the password is needed', async () => {
    const call = jest
      .fn<() => Promise<string>>()
      .mockRejectedValueOnce(needed)
      .mockResolvedValueOnce('signed');
    expect(await withPassword(call, async () => true)).toBe('signed');
    expect(call).toHaveBeenCalledTimes(2);
  });

  it('fails as it did when the person turns back', async () => {
    const call = jest.fn<() => Promise<string>>().mockRejectedValue(needed);
    await expect(withPassword(call, async () => false)).rejects.toBe(needed);
    expect(call).toHaveBeenCalledTimes(1);
  });

  it('asks for nothing on any other failure', async () => {
    const ask = jest.fn<() => Promise<boolean>>();
    await expect(withPassword(() => Promise.reject(new TypeError('x')), ask)).rejects.toThrow('x');
    expect(ask).not.toHaveBeenCalled();
  });
});
