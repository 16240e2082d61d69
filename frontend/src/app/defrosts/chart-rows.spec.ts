import { describe, expect, it } from '@jest/globals';
import type { PlannedCircuit } from '#shared/contracts/defrost-plans';
import { concurrentLoad } from '#shared/refrigeration/defrost/concurrent-load';
import { chartRows, chartStrip, quietRows } from './chart-rows';

const circuit = {
  id: 'a',
  code: 'A1',
  groupId: 'g',
  groupName: 'AS-1',
  type: 'electric',
  perDay: 1,
  durationS: 1800,
  dripS: 600,
  loadW: 3000,
  heaterW: 4000,
  box: null,
  airCurtain: null,
  fixedStartsS: [85_800],
} as unknown as PlannedCircuit;

describe('chartRows', () => {
  it('draws in minutes, wraps at midnight and marks what is kept', () => {
    const plan = [{ circuitId: 'a', startsS: [85_800] }];
    const rows = chartRows(
      [circuit],
      plan,
      { largestShareOfLoad: 0.25 },
      concurrentLoad([circuit], plan),
      new Set(),
    );
    const [bar] = rows[0]?.rows[0]?.bars ?? [];
    expect(bar).toMatchObject({
      from: '23:50',
      to: '00:30',
      defrost: [
        { x: 1430, width: 10 },
        { x: 0, width: 20 },
      ],
      drip: [{ x: 20, width: 10 }],
      isKept: true,
      isMarked: false,
    });
    expect(rows[0]?.strip).toMatchObject({ peak: 1, isOver: true });
  });
});

describe('chartStrip', () => {
  it('steps from moment to moment under its limit', () => {
    const steps = [
      { fromS: 0, value: 0.5 },
      { fromS: 3600, value: 0 },
    ];
    const strip = chartStrip(steps, 1, 0.5, 0);
    expect(strip.path).toBe('M0 100L0 53.70L60 53.70L60 100.00L1440 100.00L1440 100Z');
    expect(strip.limitY).toBeCloseTo(100 - 100 / 1.08, 9);
    expect(strip.isOver).toBe(false);
  });

  it('is flat, not endless, where there is nothing and no limit', () => {
    expect(chartStrip([{ fromS: 0, value: 0 }], null, 0, 0).path).not.toMatch(/NaN|Infinity/);
  });
});

describe('quietRows', () => {
  it('wraps a night', () => {
    expect(quietRows({ quietHours: [{ fromS: 79_200, toS: 21_600 }] })).toEqual([
      { x: 1320, width: 120 },
      { x: 0, width: 360 },
    ]);
  });
});
