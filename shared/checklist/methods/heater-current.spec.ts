import { describe, expect, it } from '@jest/globals';
import { doubtsOf, figure, GOOD, judgeMeasured, withBoxes } from './measurement.fixture';

const heater = (change: Readonly<Record<string, string | null>>, tolerance: number | null = 0.1) =>
  judgeMeasured({ ...withBoxes(GOOD.heaterCurrent, change), criteria: { tolerance } });

const legs = (one: string, two: string, three: string) => ({
  leg1: `${one} A`,
  leg2: `${two} A`,
  leg3: `${three} A`,
});

const ONE_PHASE = { supply: '=onePhase', leg2: null, leg3: null };

describe('a heater’s current', () => {
  it('is expected by Ohm’s law, worked by hand: 6 kW and 208 V on three phases, 3 kW on one', () => {
    expect(figure(heater({}), 'expectedCurrent')).toBeCloseTo(16.65, 2);
    const one = heater({ ...ONE_PHASE, platePower: '3 kW_el', leg1: '14.4 A' });
    expect(figure(one, 'expectedCurrent')).toBeCloseTo(14.42, 2);
    expect(one).toMatchObject({ outcome: 'within', counts: true });
    expect(one.figures.map(({ label }) => label)).not.toContain('imbalance');
  });

  // The power follows the square of the voltage.
  it.each([
    ['240', '208', 0.751],
    ['480', '460', 0.918],
  ])('rated for %s V on %s V gives %d of the power', (rated, measured, share) => {
    const judgement = heater({ plateVoltage: `${rated} V`, voltage: `${measured} V` });
    expect(figure(judgement, 'expectedPower') / 6000).toBeCloseTo(share, 3);
  });

  it.each([
    [legs('16.6', '16.7', '16.5'), 'within', null],
    [legs('15.0', '16.6', '16.6'), 'within', null],
    [legs('14.9', '16.6', '16.6'), 'outside', 'low'],
    [legs('18.4', '16.6', '16.6'), 'outside', 'high'],
  ])('is judged leg by leg, a tenth either way: %j', (boxes, outcome, side) => {
    expect(heater(boxes)).toMatchObject({ outcome, side, counts: true, doubts: [] });
  });

  it('is judged a tenth either way where the template says nothing (common practice, no source)', () => {
    expect(heater(legs('14.9', '16.6', '16.6'), null)).toMatchObject({ outcome: 'outside', side: 'low' });
    expect(heater(legs('15.0', '16.6', '16.6'), null)).toMatchObject({
      outcome: 'within',
      limit: { unit: 'A' },
    });
    expect(heater(legs('15.0', '16.6', '16.6'), 0.05).outcome).toBe('outside');
  });

  // Kirchhoff's laws on three equal resistances: √3/2 and 1/√3 of 16.65 A are 14.42 A and 9.61 A.
  it.each([
    [legs('0', '0', '0'), 'noCurrent'],
    [legs('14.4', '0', '14.4'), 'lineOrWyeElementOpen'],
    [legs('16.6', '0', '16.7'), 'wyeElementOpenWithNeutral'],
    [legs('9.6', '16.6', '9.6'), 'deltaElementOpen'],
    [legs('9.6', '9.6', '0'), 'twoDeltaElementsOpen'],
    [legs('12', '0', '16'), 'legOpen'],
  ])('tells what is open: %j', (boxes, pattern) => {
    expect(heater(boxes)).toMatchObject({
      outcome: 'outside',
      side: 'low',
      verdicts: [`heaterCurrent_${pattern}`],
    });
  });

  it('is held against a nameplate current, at the nameplate’s voltage where that is known', () => {
    const plate = { platePower: null, plateCurrent: '20 A', ...ONE_PHASE, leg1: '17.3 A' };
    // 20 A × 208 ÷ 240.
    expect(figure(heater({ ...plate, plateVoltage: '240 V' }), 'expectedCurrent')).toBeCloseTo(17.33, 2);
    expect(figure(heater({ ...plate, plateVoltage: null }), 'expectedCurrent')).toBe(20);
  });

  it('falls back on the nameplate’s current where its power has no voltage', () => {
    const judgement = heater({ plateVoltage: null, plateCurrent: '16.6 A' });
    expect(judgement).toMatchObject({ outcome: 'within', counts: true });
    expect(figure(judgement, 'expectedCurrent')).toBe(16.6);
  });

  it.each([
    { plateVoltage: null },
    { platePower: null },
    { platePower: null, plateVoltage: null },
    { leg2: null },
    { leg3: null },
  ])('is incomplete without enough to go by: %j', (boxes) => {
    expect(doubtsOf(heater(boxes))).toEqual(['refuse incomplete']);
  });

  it('refuses a voltage of nothing', () => {
    expect(doubtsOf(heater({ voltage: '0 V' }))).toEqual(['refuse notPlausible']);
  });
});
