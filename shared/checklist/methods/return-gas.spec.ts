import { describe, expect, it } from '@jest/globals';
import { doubtsOf, fahrenheit, figure, GOOD, judgeMeasured, withBoxes } from './measurement.fixture';

const LIMITS = { superheatLow: 10, superheatHigh: 30, returnGasHigh: fahrenheit(65), dischargeHigh: null };

/** R-744 at 200 psig: dew −20.1 °F (computed with a Helmholtz-energy property program). */
const returned = (degF: string, criteria: Record<string, number | null> = LIMITS, discharge?: string) =>
  judgeMeasured({
    ...withBoxes(GOOD.returnGas, {
      returnGasTemperature: `${degF} degF`,
      dischargeTemperature: discharge === undefined ? null : `${discharge} degF`,
    }),
    criteria,
  });

describe('a return gas', () => {
  it('has the superheat over the dew temperature at the compressor', () => {
    const judgement = returned('-5');
    expect((figure(judgement, 'superheat') * 9) / 5).toBeCloseTo(15.1, 0);
    expect(Math.abs((figure(judgement, 'saturation') * 9) / 5 - 459.67 + 20.1)).toBeLessThanOrEqual(0.3);
  });

  // 10 K at least, common for R-744 boosters (from memory): a difference of 18 °F, never 50 °F.
  it.each([
    ['-3', 'outside', 'low'],
    ['-1', 'within', null],
    // 30 K are 54 °F, so up to 33.9 °F.
    ['33', 'within', null],
    ['35', 'outside', 'high'],
  ])('of %s °F at −20.1 °F is %s', (degF, outcome, side) => {
    expect(returned(degF)).toMatchObject({ outcome, side, counts: true, doubts: [] });
  });

  it('is held to nothing above where the template gives no most', () => {
    expect(returned('60', { ...LIMITS, superheatHigh: null }).outcome).toBe('within');
    expect(returned('60', { ...LIMITS, superheatHigh: null }).limit).toMatchObject({ low: 10, high: null });
  });

  it.each([
    ['-10', undefined, {}, ['liquidFloodback', 'breach_superheatLow']],
    ['40', undefined, {}, ['hotDischarge', 'breach_superheatHigh']],
    ['66', undefined, { superheatHigh: null }, ['hotDischarge', 'breach_returnGasHigh']],
    ['0', '260', { dischargeHigh: fahrenheit(250) }, ['hotDischarge', 'breach_dischargeHigh']],
    ['0', undefined, { dischargeHigh: fahrenheit(250) }, ['dischargeNotMeasured']],
    ['0', '240', { dischargeHigh: fahrenheit(250) }, undefined],
    // Liquid first: it ruins a compressor sooner than heat.
    [
      '-10',
      '260',
      { dischargeHigh: fahrenheit(250) },
      ['liquidFloodback', 'breach_superheatLow', 'breach_dischargeHigh'],
    ],
  ])('of %s °F with a discharge of %s °F and %j says %j', (degF, discharge, criteria, verdicts) => {
    const judgement = returned(degF, { ...LIMITS, ...criteria }, discharge);
    expect(judgement.verdicts).toEqual(verdicts?.map((verdict) => `returnGas_${verdict}`));
  });

  it.each([['-25'], ['-40']])('at or below saturation is never within, whatever the least: %s °F', (degF) => {
    const judgement = returned(degF, { ...LIMITS, superheatLow: -50 });
    expect(judgement).toMatchObject({ outcome: 'outside', side: 'low', counts: true });
    expect(doubtsOf(judgement)).toEqual(['ask liquidRisk']);
    expect(figure(judgement, 'superheat')).toBeLessThan(0);
  });

  it('names its limits as limits in the working, not as what was measured', () => {
    const labels = returned('-1').working[0]?.lines.map(({ label }) => label) ?? [];
    expect(labels).toEqual(
      expect.arrayContaining(['leastSuperheat', 'mostSuperheat', 'returnGasTemperature']),
    );
    expect(labels).not.toContain('superheatLow');
    expect(labels.at(-1)).toBe('superheat');
  });

  it('knows none of a refrigerant without a table, nor above its critical point', () => {
    const unknown = { ...GOOD.returnGas, facts: { refrigerant: 'R-999X' } };
    expect(doubtsOf(judgeMeasured(unknown))).toEqual(['refuse unknownRefrigerant']);
    // critical at 1070 psia (NIST Chemistry WebBook, from memory).
    const high = withBoxes(GOOD.returnGas, { suctionPressure: '1100 psig' });
    expect(doubtsOf(judgeMeasured(high))).toEqual(['refuse aboveCritical']);
  });
});
