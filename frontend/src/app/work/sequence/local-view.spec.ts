import { describe, expect, it } from '@jest/globals';
import { knownEntries, localView, restsOn } from './local-view';
import {
  bodyOf,
  cachedOf,
  CONFIRMED,
  confirmStep,
  contentOf,
  PHONE,
  storedOf,
  waitingOf,
} from './sequence.fixture';

const STEPS = [confirmStep('a'), confirmStep('b')];
const onServer = storedOf(1, bodyOf(1, contentOf('a', CONFIRMED)));
const unsent = waitingOf(bodyOf(2, contentOf('b', CONFIRMED)));

describe('localView', () => {
  it('counts what is on this phone like what is on the server', () => {
    const view = localView(cachedOf(STEPS, [onServer]), [unsent]);
    expect(view.doneCount).toBe(2);
    expect(view.missing).toEqual([]);
  });

  it('shows an entry once while it is on its way from the outbox to the server', () => {
    const both = waitingOf(onServer.body);
    expect(knownEntries(cachedOf(STEPS, [onServer]), [both])).toHaveLength(1);
  });

  it('keeps a refused entry out of what is done', () => {
    const refused = { ...unsent, state: 'refused' as const, reason: 'not yours' };
    expect(localView(cachedOf(STEPS, [onServer]), [refused]).doneCount).toBe(1);
  });

  it('takes acknowledged entries in order of position, behind those that were read', () => {
    const acknowledged = storedOf(2, bodyOf(2, contentOf('b', CONFIRMED)));
    const cached = { ...cachedOf(STEPS, [onServer]), acknowledged: [acknowledged] };
    expect(knownEntries(cached, []).map((entry) => entry.server.position)).toEqual([1, 2]);
  });

  it('takes a submission made here as submitted, before the server knows of it', () => {
    const first = localView(cachedOf(STEPS, [onServer]), [unsent]);
    const submission = waitingOf(bodyOf(3, { kind: 'submission', restsOn: restsOn(first) }));
    expect(localView(cachedOf(STEPS, [onServer]), [unsent, submission]).fold.state).toBe('submitted');
  });
});

describe('restsOn', () => {
  it('names the highest count of each device up to which nothing is missing', () => {
    const view = localView(cachedOf(STEPS, [onServer]), [waitingOf(bodyOf(3, contentOf('b', CONFIRMED)))]);
    expect(restsOn(view)).toEqual([{ deviceId: PHONE, count: 1 }]);
  });
});
