import { describe, expect, it } from '@jest/globals';
import { doubtsOf, figure, GOOD, judgeMeasured, withBoxes } from './measurement.fixture';

function supplied(nameplate: number, lines: readonly number[], criteria: Record<string, number | null> = {}) {
  const [line12, line23, line31] = lines.map((line) => `${line} V`);
  return judgeMeasured({
    method: 'supplyVoltage',
    typed: { nameplate: `${nameplate} V`, line12: line12 ?? '', line23: line23 ?? '', line31: line31 ?? '' },
    criteria: { tolerance: null, greatestUnbalance: null, ...criteria },
  });
}

describe('a supply voltage', () => {
  // Unbalance by the definition of NEMA MG 1: the first worked on a public page, the second exact where a maker's manual
  // prints 1.8 by rounding on the way, the third in the style of a DOE tip sheet (from memory).
  it.each([
    [460, [460, 467, 450], 0.0196],
    [220, [220, 216, 213], 0.0169],
    [460, [462, 463, 455], 0.0109],
  ])('of %d V with %j V is unbalanced by %d', (nameplate, lines, unbalance) => {
    const judgement = supplied(nameplate, lines);
    expect(figure(judgement, 'unbalance')).toBeCloseTo(unbalance, 4);
    expect(judgement).toMatchObject({ outcome: 'within', counts: true, doubts: [] });
    expect(judgement.verdicts).toBeUndefined();
  });

  // NEMA MG 1, 12.44: ±10 % of the nameplate; unbalance up to 2 %: many compressor makers.
  it.each([
    [[414, 414, 414], []],
    [[413, 413, 413], ['low']],
    [[506, 506, 506], []],
    [[507, 507, 507], ['high']],
    [[460, 460, 440], ['unbalanced']],
    [[460, 460, 0], ['lost']],
    [
      [460, 400, 520],
      ['low', 'high', 'unbalanced'],
    ],
  ])('of 460 V with %j V: %j', (lines, problems) => {
    const judgement = supplied(460, lines);
    expect(judgement.outcome).toBe(problems.length === 0 ? 'within' : 'outside');
    expect(judgement.verdicts ?? []).toEqual(problems.map((problem) => `supplyVoltage_${problem}`));
  });

  it('follows the template’s own limits', () => {
    expect(supplied(460, [460, 467, 450], { greatestUnbalance: 0.01 }).verdicts).toEqual([
      'supplyVoltage_unbalanced',
    ]);
    expect(supplied(460, [437, 437, 437], { tolerance: 0.05 }).outcome).toBe('within');
    expect(supplied(460, [436, 437, 437], { tolerance: 0.05 }).verdicts).toEqual(['supplyVoltage_low']);
  });

  it('names the voltage that is furthest from the nameplate, with its sign', () => {
    expect(figure(supplied(460, [460, 467, 450]), 'furthestFromNameplate')).toBeCloseTo(-10 / 460, 9);
  });

  it('says nothing of unbalance where a line is lost', () => {
    expect(supplied(460, [460, 460, 0]).figures.map(({ label }) => label)).toEqual(['furthestFromNameplate']);
  });

  it('refuses a nameplate of nothing and a voltage below it', () => {
    expect(doubtsOf(supplied(0, [460, 460, 460]))).toEqual(['refuse notPlausible']);
    expect(doubtsOf(supplied(460, [460, -460, 460]))).toEqual(['refuse notNegatable']);
  });

  it('refuses what isn’t whole yet', () => {
    const judgement = judgeMeasured(withBoxes(GOOD.supplyVoltage, { line31: null }));
    expect(judgement).toMatchObject({ outcome: 'recorded', counts: false });
    expect(doubtsOf(judgement)).toEqual(['refuse incomplete']);
  });
});
