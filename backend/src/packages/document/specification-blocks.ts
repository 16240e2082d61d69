import type { CircuitSpecification, Fixture } from '#shared/plant/plant';
import { gap, type Block } from '../../pdf/block';
import { factGrid, type Fact } from '../../pdf/fact-grid';
import { paragraph } from '../../pdf/paragraph';
import { ruledTable } from '../../pdf/ruled-table';
import { STYLES } from '../../pdf/text-style';
import type { DocumentContext } from './document-context';

/** What was specified for a circuit when it was commissioned: its facts, then its fixtures as a table. */
export function specificationBlocks(context: DocumentContext, specification: CircuitSpecification): Block[] {
  const { sheet, words } = context;
  return [
    ...paragraph(
      sheet,
      `${words.specification}, ${words.facts.revision.toLowerCase()} ${specification.revision}`,
      STYLES.section,
      { tag: 'H2' },
    ),
    gap(2),
    ...factGrid(sheet, circuitFacts(context, specification), 4),
    gap(10),
    ...fixtureTable(context, specification.circuit.fixtures),
  ];
}

function circuitFacts(context: DocumentContext, specification: CircuitSpecification): Fact[] {
  const { words, format } = context;
  const { circuit, system, suctionGroup, level = 'circuit' } = specification;
  const { defrost } = circuit;
  const plant: Fact[] = [
    { label: words.facts.system, value: system.name },
    { label: words.facts.refrigerant, value: system.refrigerant },
    ...(suctionGroup
      ? [
          { label: words.facts.suctionGroup, value: suctionGroup.name },
          {
            label: words.facts.suctionTemperature,
            value: format.ofDimension(suctionGroup.saturatedSuctionTemperatureK, 'temperature'),
          },
        ]
      : []),
  ];
  // The work of a whole group or system has nothing of what follows.
  if (level !== 'circuit') return plant;
  const facts: Fact[] = [
    ...plant,
    { label: words.facts.temperatureClass, value: words.temperatureClasses[circuit.temperatureClass] },
    { label: words.facts.feed, value: words.feeds[circuit.feed] },
    { label: words.facts.control, value: words.controls[circuit.control] },
    {
      label: words.facts.load,
      value: optional(context, circuit.loadW, (watts) => format.ofDimension(watts, 'heatFlow')),
    },
  ];
  if (defrost.type === 'none') return [...facts, { label: words.facts.defrost, value: words.defrosts.none }];
  const duration = (seconds: number): string => format.ofDimension(seconds, 'duration');
  return [
    ...facts,
    { label: words.facts.defrost, value: `${words.defrosts[defrost.type]}, ${words.perDay(defrost.perDay)}` },
    { label: words.facts.failSafe, value: optional(context, defrost.failSafeS, duration) },
    {
      label: words.facts.termination,
      value: optional(context, defrost.terminationTemperatureK, (kelvins) =>
        format.ofDimension(kelvins, 'temperature'),
      ),
    },
    { label: words.facts.drip, value: optional(context, defrost.dripS, duration) },
  ];
}

function optional(context: DocumentContext, value: number | null, write: (value: number) => string): string {
  return value === null ? context.words.notStated : write(value);
}

function fixtureTable(context: DocumentContext, fixtures: readonly Fixture[]): Block[] {
  const { sheet, words, format } = context;
  if (fixtures.length === 0) return [];
  const columns = [
    { title: words.columns.fixture, share: 28 },
    { title: words.columns.evaporating, share: 19, style: STYLES.mono },
    { title: words.columns.dischargeAir, share: 15, style: STYLES.mono },
    { title: words.columns.superheat, share: 23, style: STYLES.mono },
    { title: words.columns.coils, share: 16, style: STYLES.mono },
    { title: words.columns.valve, share: 17 },
  ];
  const rows = fixtures.map((fixture) => [
    { text: fixtureName(context, fixture) },
    {
      text: `${format.ofDimension(fixture.evaporatingTemperatureK, 'temperature')} ${words.bases[fixture.evaporatingBasis]}`,
    },
    { text: format.ofDimension(fixture.dischargeAirTemperatureK, 'temperature') },
    { text: format.range(fixture.superheatLowK, fixture.superheatHighK, 'temperatureDifference') },
    { text: String(fixture.coils.length) },
    { text: words.valves[fixture.valveKind] },
  ]);
  return ruledTable(sheet, columns, rows, { hasRowHeads: true });
}

function fixtureName(context: DocumentContext, fixture: Fixture): string {
  const { words, format } = context;
  const length = fixture.lengthM === null ? '' : `, ${format.ofDimension(fixture.lengthM, 'length')}`;
  const description = fixture.description === '' ? words.fixtureKinds[fixture.kind] : fixture.description;
  return `${fixture.tag}\n${description}${length}`;
}
