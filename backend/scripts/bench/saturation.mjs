import { findRefrigerant } from '#shared/refrigeration/saturation/refrigerants';
import { dewTemperature } from '#shared/refrigeration/saturation/saturation-curve';
import { pascalAbsolute } from '#shared/units/quantity';
import { count } from './report.mjs';
import { median } from './statistics.mjs';

const PRESSURES = 4096;
const CALLS = 2_000_000;

/**
 * Dew temperatures a second against a bare search of the same table that interpolates pressures in a straight
 * line: what the range checks, the logarithm and the result object cost.
 * @param {{ quick: boolean, log: (line: string) => void }} context
 * @returns {Promise<import('./report.mjs').Row[]>}
 */
export async function measureSaturation({ quick, log }) {
  const table = /** @type {NonNullable<ReturnType<typeof findRefrigerant>>} */ (findRefrigerant('R-448A'));
  const [low, high] = [table.dewPa[5], table.dewPa[table.dewPa.length - 40]];
  const pressures = Float64Array.from(
    { length: PRESSURES },
    (_, index) => low + (high - low) * ((index * 0.618034) % 1),
  );
  const search = tableSearch(table);
  const ours = (/** @type {number} */ pressure) => {
    const result = dewTemperature(table, pascalAbsolute(pressure));
    return result.ok ? result.temperature : NaN;
  };
  const rates = { ours: /** @type {number[]} */ ([]), search: /** @type {number[]} */ ([]) };
  for (let round = 0; round < (quick ? 3 : 7); round += 1) {
    rates.search.push(callsPerSecond(search, pressures));
    rates.ours.push(callsPerSecond(ours, pressures));
  }
  const [own, bare] = [median(rates.ours), median(rates.search)];
  log(
    `  ${count(own)} against ${count(bare)} calls/s; at 3 bar ${ours(3e5).toFixed(3)} and ${search(3e5).toFixed(3)} K`,
  );
  return [
    {
      what: 'Dew temperatures worked out',
      ours: `${count(own / 1e6, 1)} million/s`,
      reference: `${count(bare / 1e6, 1)} million/s of a bare table search`,
      ratio: own / bare,
      goal: '',
      isMet: null,
    },
  ];
}

/**
 * @param {NonNullable<ReturnType<typeof findRefrigerant>>} table
 * @returns {(pressure: number) => number} kelvin
 */
function tableSearch({ dewPa, temperaturesK }) {
  const pressures = Float64Array.from(dewPa);
  const temperatures = Float64Array.from(dewPa, (_, row) =>
    'startK' in temperaturesK ? temperaturesK.startK + row * temperaturesK.stepK : temperaturesK[row],
  );
  return (pressure) => {
    let low = 0;
    let high = pressures.length - 1;
    while (high - low > 1) {
      const middle = (low + high) >>> 1;
      if (pressures[middle] <= pressure) low = middle;
      else high = middle;
    }
    const share = (pressure - pressures[low]) / (pressures[high] - pressures[low]);
    return temperatures[low] + share * (temperatures[high] - temperatures[low]);
  };
}

/**
 * @param {(pressure: number) => number} work
 * @param {Float64Array} pressures
 */
function callsPerSecond(work, pressures) {
  let sum = 0;
  const begin = performance.now();
  for (let call = 0; call < CALLS; call += 1) {
    sum += work(pressures[call % PRESSURES]);
  }
  const seconds = (performance.now() - begin) / 1000;
  // The sum is looked at, so that no compiler leaves the work out.
  if (!Number.isFinite(sum)) throw new RangeError('A pressure of the table has no temperature');
  return CALLS / seconds;
}
