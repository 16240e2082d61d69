import { describe, expect, it } from '@jest/globals';
import type { CircuitId } from '#shared/plant/ids';
import { USUAL_DEFROST_RULES } from '#shared/refrigeration/defrost/defrost-plan-types';
import { detailsOf, isKept, keeping, moved, withDetails, type PlanDraft } from './plan-draft';

const A = 'a' as CircuitId;
const draft = (startsS: number[]): PlanDraft => ({
  rules: { ...USUAL_DEFROST_RULES, quietHours: [] },
  details: [],
  plan: [{ circuitId: A, startsS }],
});

describe('moved', () => {
  it('goes round midnight both ways and keeps the starts in order', () => {
    const back = moved(draft([0, 43_200]), { circuitId: A, startS: 0 }, -300);
    expect(back.draft.plan[0]?.startsS).toEqual([43_200, 86_100]);
    expect(back.chosen.startS).toBe(86_100);
    expect(moved(back.draft, back.chosen, 600).draft.plan[0]?.startsS).toEqual([300, 43_200]);
  });

  it('keeps the start where it was put, and only there', () => {
    const first = moved(draft([0]), { circuitId: A, startS: 0 }, 300);
    const second = moved(first.draft, first.chosen, 300);
    expect(detailsOf(second.draft, A).fixedStartsS).toEqual([600]);
  });

  it('changes nothing for a start that is not there', () => {
    const before = draft([0]);
    expect(moved(before, { circuitId: A, startS: 900 }, 300).draft).toBe(before);
  });
});

describe('keeping and withDetails', () => {
  it('leaves nothing behind of a circuit of which nothing is said any more', () => {
    const chosen = { circuitId: A, startS: 0 };
    const kept = keeping(draft([0]), chosen, true);
    expect(isKept(kept, chosen)).toBe(true);
    expect(keeping(kept, chosen, false).details).toEqual([]);
    const given = withDetails(draft([0]), A, { box: 'Ice cream' });
    expect(withDetails(given, A, { box: null }).details).toEqual([]);
  });

  it('takes a figure of zero for something said', () => {
    expect(withDetails(draft([]), A, { dripS: 0 }).details).toHaveLength(1);
  });
});
