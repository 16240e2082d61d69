import { UNITS, type Dimension, type UnitId } from './unit';

/**
 * How people write units, after `simplify`; the first unit of a list is meant where no dimension is asked for. The trade
 * writes psi, bar and kPa for gauge pressures.
 */
const SPELLINGS: readonly (readonly [spellings: string, units: readonly UnitId[]])[] = [
  ['f °f degf fdeg f° degreesf degreef fahrenheit', ['degF', 'degF_diff']],
  ['c °c degc cdeg c° degreesc degreec celsius centigrade', ['degC', 'degC_diff']],
  ['k kelvin', ['K', 'K_diff']],
  ['degf_diff δf δ°f deltaf °fdiff fdiff °ftd ftd', ['degF_diff']],
  ['degc_diff δc δ°c deltac °cdiff cdiff °ctd ctd', ['degC_diff']],
  ['k_diff δk deltak kdiff ktd', ['K_diff']],
  ['psig lb/in2g', ['psig']],
  ['psi lb/in2 lbf/in2', ['psig', 'psia', 'psi_diff']],
  ['psia', ['psia']],
  ['bar', ['barg', 'bara', 'bar_diff']],
  ['barg', ['barg']],
  ['bara', ['bara']],
  ['kpa', ['kPag', 'kPaa', 'kPa_diff']],
  ['kpag', ['kPag']],
  ['kpaa', ['kPaa']],
  ['pa', ['Pa', 'Pag', 'Pa_vac', 'Pa_diff']],
  ['pag', ['Pag']],
  ['paa', ['Pa']],
  ['pa_vac', ['Pa_vac']],
  ['psi_diff', ['psi_diff']],
  ['bar_diff', ['bar_diff']],
  ['kpa_diff', ['kPa_diff']],
  ['pa_diff', ['Pa_diff']],
  ['inhg "hg inchhg incheshg', ['inHg']],
  ['micron microns micrometer micrometers µmhg umhg mtorr millitorr', ['micron']],
  ['torr mmhg', ['Torr']],
  ['m meter meters metre metres', ['m']],
  ["ft foot feet ' lf linft linearft linearfeet", ['ft']],
  ['in inch inches "', ['in']],
  ['m2 sqm squaremeters squaremetres', ['m2']],
  ['ft2 sqft sf squarefeet', ['ft2']],
  ['w watt watts', ['W', 'W_el']],
  ['kw kilowatt kilowatts', ['kW', 'kW_el']],
  ['w_el', ['W_el']],
  ['kw_el', ['kW_el']],
  ['btu/h btu/hr btuh btuhr btu_h btu/hour btus/h btus/hr', ['BTU_h']],
  ['mbh mbtuh mbtu/h mbtu/hr kbtu/h kbtu/hr kbtuh', ['MBH']],
  ['ton tons tr tonr tonsr', ['ton']],
  ['kg kgs kilogram kilograms', ['kg']],
  ['lb lbs lbm pound pounds #', ['lb']],
  ['oz ounce ounces', ['oz']],
  ['s sec secs second seconds', ['s']],
  ['min mins minute minutes minutos', ['min']],
  ['h hr hrs hour hours horas', ['h']],
  ['a amp amps ampere amperes', ['A']],
  ['v volt volts', ['V']],
  ['% percent pct', ['percent']],
  ['fraction', ['fraction']],
  ['count ea each pcs qty', ['count']],
];

const UNITS_BY_SPELLING: ReadonlyMap<string, readonly UnitId[]> = new Map(
  SPELLINGS.flatMap(([spellings, units]) =>
    spellings.split(' ').map((spelling) => [spelling, units] as const),
  ),
);

/** Lower case; without spaces, full stops and brackets; one sign each for degree, prime, micro, delta and square. */
const simplify = (text: string): string =>
  text
    .toLowerCase()
    .replace(/[\s.()[\]]/g, '')
    .replace(/[º˚∘]/g, '°')
    .replace(/[’′‘]/g, "'")
    .replace(/[”″“]|''/g, '"')
    .replace(/μ/g, 'µ')
    .replace(/[Δ∆]/g, 'δ')
    .replace(/²|\^2/g, '2')
    .replace(/^deg°|^°deg/, '°');

/**
 * The unit that a schedule's heading or cell names. "°F" is a temperature unless a difference is asked for, "psi" a gauge
 * pressure unless an absolute one is; "K" is never a thousand.
 *
 * @param text such as "°F", "(deg F)", "BTUH", "psi(g)", "MBH" or a unit's own id
 * @param dimension that the column must have, where that is known
 * @returns the unit, or undefined when the text names none or none of that dimension
 * @example parseUnit('ºF', 'temperatureDifference') // 'degF_diff'
 */
export function parseUnit(text: string, dimension?: Dimension): UnitId | undefined {
  const units = UNITS_BY_SPELLING.get(simplify(text));
  if (dimension === undefined) return units?.[0];
  return units?.find((unit) => UNITS[unit].dimension === dimension);
}
