import { Bug } from '#shared/failures/failure';
import type { Defrost } from '#shared/plant/plant';
import { TEMPERATURE_CLASSES, type DefrostType, type TemperatureClass } from '#shared/plant/words';
import type {
  ParsedCircuit,
  ParsedFixture,
  ParsedSchedule,
  ParsedSuctionGroup,
  ParsedSystem,
} from './parsed-schedule';
import type { ColumnId, ColumnValues } from './schedule-columns';
import type { CircuitPart, Part, SuctionGroupPart, SystemPart } from './schedule-tree';

// What is taken where the schedule is silent. Lengths, loads, fail-safe, termination and drip stay null.
//   system type         CO2 booster for R-744, a rack otherwise
//   SST                 the lowest evaporating temperature of the group's fixtures
//   circuit description the descriptions of its fixtures
//   area, description   empty
//   feed                home run
//   control             evaporator pressure regulator
//   defrost             electric on low-temperature circuits, off-time otherwise
//   defrosts per day    4, none without a defrost
//   fixture type        walk-in when the description says so, a case otherwise
//   evaporating basis   dew
//   valve               electronic on circuits controlled by electronic valves, thermostatic otherwise
//   coils               1

const DEFROSTS_PER_DAY = 4;
const LONGEST_DESCRIPTION = 120;

function needed<Id extends ColumnId>({ values, line }: Part, id: Id): ColumnValues[Id] {
  const value: Partial<ColumnValues>[Id] = values[id];
  if (value === undefined) throw new Bug(`line ${line}: ${id} was not checked before building`);
  return value as ColumnValues[Id];
}

function buildFixture(fixture: Part, circuit: CircuitPart): ParsedFixture {
  const { values } = fixture;
  const description = values.fixtureDescription ?? '';
  const isWalkIn = /\bwalk[\s-]?in\b/i.test(description);
  return {
    tag: fixture.name,
    description,
    kind: values.fixtureKind ?? (isWalkIn ? 'walkIn' : 'case'),
    lengthM: values.length ?? null,
    evaporatingTemperatureK: needed(fixture, 'evaporatingTemperature'),
    evaporatingBasis: values.evaporatingBasis ?? 'dew',
    dischargeAirTemperatureK: needed(fixture, 'dischargeAirTemperature'),
    superheatLowK: needed(fixture, 'superheatLow'),
    superheatHighK: needed(fixture, 'superheatHigh'),
    valveKind:
      values.valveKind ?? (circuit.values.control === 'electronicValve' ? 'electronic' : 'thermostatic'),
    coilCount: values.coilCount ?? 1,
  };
}

function buildDefrost({ values }: CircuitPart, temperatureClass: TemperatureClass): Defrost {
  const type: DefrostType = values.defrostType ?? (temperatureClass === 'low' ? 'electric' : 'offTime');
  return {
    type,
    perDay: values.defrostsPerDay ?? (type === 'none' ? 0 : DEFROSTS_PER_DAY),
    failSafeS: values.failSafe ?? null,
    terminationTemperatureK: values.terminationTemperature ?? null,
    dripS: values.drip ?? null,
  };
}

/** The fixtures' descriptions, each once, as far as they fit. */
function describe(fixtures: readonly ParsedFixture[]): string {
  const texts = new Set(fixtures.map(({ description }) => description).filter((text) => text !== ''));
  const joined = [...texts].join(', ');
  return joined.length <= LONGEST_DESCRIPTION ? joined : `${joined.slice(0, LONGEST_DESCRIPTION - 1)}…`;
}

function buildCircuit(circuit: CircuitPart): ParsedCircuit {
  const { values } = circuit;
  const temperatureClass = needed(circuit, 'temperatureClass');
  const fixtures = circuit.fixtures.map((fixture) => buildFixture(fixture, circuit));
  return {
    code: circuit.name,
    description: values.circuitDescription ?? describe(fixtures),
    area: values.area ?? '',
    temperatureClass,
    feed: values.feed ?? 'homeRun',
    control: values.control ?? 'evaporatorPressureRegulator',
    loadW: values.load ?? null,
    defrost: buildDefrost(circuit, temperatureClass),
    fixtures,
  };
}

function buildGroup(group: SuctionGroupPart): ParsedSuctionGroup {
  const circuits = group.circuits.map(buildCircuit);
  const classes = new Set(circuits.map(({ temperatureClass }) => temperatureClass));
  // In ascending order: the coldest circuit sets what the group has to draw down to.
  const coldest = TEMPERATURE_CLASSES.find((temperatureClass) => classes.has(temperatureClass));
  if (!coldest) throw new Bug(`suction group ${group.name} has no circuit`);
  const evaporating = circuits.flatMap(({ fixtures }) =>
    fixtures.map((fixture) => fixture.evaporatingTemperatureK),
  );
  return {
    name: group.name,
    temperatureClass: coldest,
    saturatedSuctionTemperatureK: group.values.saturatedSuctionTemperature ?? Math.min(...evaporating),
    circuits,
  };
}

function buildSystem(system: SystemPart): ParsedSystem {
  const refrigerant = needed(system, 'refrigerant');
  return {
    name: system.name,
    kind: system.values.systemKind ?? (refrigerant === 'R-744' ? 'co2Booster' : 'rack'),
    refrigerant,
    suctionGroups: system.groups.map(buildGroup),
  };
}

/**
 * Makes the schedule, filling in the defaults listed in this file.
 *
 * @param systems in which no problem was found
 * @throws {Bug} when something needed is missing all the same
 */
export const buildSchedule = (systems: readonly SystemPart[]): ParsedSchedule => ({
  systems: systems.map(buildSystem),
});
