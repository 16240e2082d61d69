import { describe, expect, it } from '@jest/globals';
import { NEEDED_COLUMN_IDS } from '#shared/contracts/schedule-reasons';
import { recogniseHeading } from './find-columns';
import { COLUMN_IDS, SCHEDULE_COLUMNS } from './schedule-columns';
import { bare } from './schedule-words';

describe('recogniseHeading', () => {
  it.each([
    ['Length (ft)', 'length', 'ft'],
    ['LENGTH [FT]', 'length', 'FT'],
    ['Length, ft', 'length', 'ft'],
    ['length_ft', 'length', 'ft'],
    ['Case Length', 'length', ''],
    ['SST (°F)', 'saturatedSuctionTemperature', '°F'],
    ['SST deg F', 'saturatedSuctionTemperature', 'deg F'],
    ['Evap. Temp. (°F)', 'evaporatingTemperature', '°F'],
    ['Load BTU/h', 'load', 'BTU/h'],
    ['Fail-safe (min)', 'failSafe', 'min'],
    ['LT/MT', 'temperatureClass', ''],
    ['Feed (home run or loop)', 'feed', 'home run or loop'],
    ['Circuit #', 'circuit', ''],
  ])('reads %j as %s', (heading, id, unitText) => {
    expect(recogniseHeading(heading)).toEqual({ id, unitText });
  });

  it.each(['', '()', 'Volts', 'Evaporating mean (°F)', 'Length of warranty', 'Circuit breaker'])(
    'knows no %j',
    (heading) => {
      expect(recogniseHeading(heading)).toBeUndefined();
    },
  );

  it('needs the columns that the contract names, and no others', () => {
    expect(COLUMN_IDS.filter((id) => SCHEDULE_COLUMNS[id].isNeeded).sort()).toEqual(
      [...NEEDED_COLUMN_IDS].sort(),
    );
  });

  it('knows every spelling for one column only', () => {
    for (const id of COLUMN_IDS) {
      const { label, spellings } = SCHEDULE_COLUMNS[id];
      for (const spelling of [label, ...spellings]) {
        expect([spelling, recogniseHeading(spelling)?.id]).toEqual([spelling, id]);
        expect(bare(spelling)).not.toBe('');
      }
    }
  });
});
