import type { MakersTableFacts } from '#shared/checklist/facts';
import type { Circuit, CircuitSpecification, Coil, Fixture } from '#shared/plant/plant';
import { findRefrigerant } from '#shared/refrigeration/saturation/refrigerants';
import { Duration, HeatFlow, Length, Temperature, TemperatureDifference } from './quantity-facts';

/** The values that expressions are evaluated with: plain data by name, quantities by class, whole numbers as bigint. */
export type Facts = Readonly<Record<string, unknown>>;

/**
 * What expressions of steps that are there once can ask. A value that the schedule leaves out is `null`.
 *
 * @param makersTable of the system's refrigerant, where the company works by one
 */
export function specificationFacts(
  specification: CircuitSpecification,
  makersTable?: MakersTableFacts,
): Facts {
  const { opening, system, suctionGroup, circuit, level = 'circuit' } = specification;
  return {
    opening: {
      name: opening.name,
      elevationM: new Length(opening.elevationM),
      unitSystem: opening.unitSystem,
    },
    system: {
      name: system.name,
      kind: system.kind,
      refrigerant: system.refrigerant,
      safetyClass: safetyClassOf(system.refrigerant, makersTable),
    },
    ...(suctionGroup && {
      suctionGroup: {
        name: suctionGroup.name,
        temperatureClass: suctionGroup.temperatureClass,
        saturatedSuctionTemperatureK: new Temperature(suctionGroup.saturatedSuctionTemperatureK),
      },
    }),
    ...(level === 'circuit' && { circuit: circuitFacts(circuit) }),
  };
}

/** Never A1 by default: who asks for what isn't known to be A1 is told "unknown". */
function safetyClassOf(refrigerant: string, makersTable: MakersTableFacts | undefined): string {
  const known = findRefrigerant(refrigerant)?.safetyClass ?? null;
  // A slip in the form must not take the caution away from propane.
  if (known !== null && known !== 'A1') return known;
  return makersTable?.safetyClass ?? known ?? 'unknown';
}

function circuitFacts(circuit: Circuit): Facts {
  const { defrost } = circuit;
  // A regulator holds what the coldest of its fixtures needs.
  const coldest = circuit.fixtures.reduce<Fixture | null>(
    (cold, fixture) =>
      cold !== null && cold.evaporatingTemperatureK <= fixture.evaporatingTemperatureK ? cold : fixture,
    null,
  );
  return {
    code: circuit.code,
    description: circuit.description,
    area: circuit.area,
    temperatureClass: circuit.temperatureClass,
    feed: circuit.feed,
    control: circuit.control,
    evaporatingTemperatureK: coldest && new Temperature(coldest.evaporatingTemperatureK),
    evaporatingBasis: coldest?.evaporatingBasis ?? 'dew',
    hasLoad: circuit.loadW !== null,
    loadW: circuit.loadW === null ? null : new HeatFlow(circuit.loadW),
    defrost: {
      type: defrost.type,
      perDay: BigInt(defrost.perDay),
      hasFailSafe: defrost.failSafeS !== null,
      failSafeS: defrost.failSafeS === null ? null : new Duration(defrost.failSafeS),
      hasTerminationTemperature: defrost.terminationTemperatureK !== null,
      terminationTemperatureK:
        defrost.terminationTemperatureK === null ? null : new Temperature(defrost.terminationTemperatureK),
      hasDrip: defrost.dripS !== null,
      dripS: defrost.dripS === null ? null : new Duration(defrost.dripS),
    },
    fixtures: circuit.fixtures.map(fixtureFacts),
    hasWalkIn: circuit.fixtures.some((fixture) => fixture.kind === 'walkIn'),
    hasElectronicValve: circuit.fixtures.some((fixture) => fixture.valveKind === 'electronic'),
  };
}

/** A fixture as expressions see it. */
export function fixtureFacts(fixture: Fixture): Facts {
  return {
    tag: fixture.tag,
    description: fixture.description,
    kind: fixture.kind,
    hasLength: fixture.lengthM !== null,
    lengthM: fixture.lengthM === null ? null : new Length(fixture.lengthM),
    evaporatingTemperatureK: new Temperature(fixture.evaporatingTemperatureK),
    evaporatingBasis: fixture.evaporatingBasis,
    dischargeAirTemperatureK: new Temperature(fixture.dischargeAirTemperatureK),
    superheatLowK: new TemperatureDifference(fixture.superheatLowK),
    superheatHighK: new TemperatureDifference(fixture.superheatHighK),
    valveKind: fixture.valveKind,
    coils: fixture.coils.map(coilFacts),
  };
}

/** A coil as expressions see it. */
export function coilFacts(coil: Coil): Facts {
  return { number: BigInt(coil.number) };
}
