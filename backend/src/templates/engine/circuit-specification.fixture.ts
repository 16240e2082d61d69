import type { MakersTableFacts } from '#shared/checklist/facts';
import type { Circuit, CircuitSpecification, Fixture } from '#shared/plant/plant';
import { circuitSpecificationSchema } from '#shared/plant/plant';
import type { Level } from '#shared/plant/words';

/** Ids that a test can read: the digit tells what it is, the number which. */
const uuid = (digit: number, number: number) =>
  `${String(digit).repeat(8)}-0000-4000-8000-${String(number).padStart(12, '0')}`;
export const FIXTURE_A = uuid(5, 1);
export const FIXTURE_B = uuid(5, 2);
export const COIL_A1 = uuid(6, 11);
export const COIL_B1 = uuid(6, 21);
export const COIL_B2 = uuid(6, 22);

interface Changes {
  readonly circuit?: Partial<Omit<Circuit, 'id' | 'fixtures' | 'defrost'>>;
  readonly defrost?: Partial<Circuit['defrost']>;
  /** Applied to both fixtures. */
  readonly fixtures?: Partial<Omit<Fixture, 'id' | 'coils'>>;
  readonly system?: Partial<Omit<CircuitSpecification['system'], 'id'>>;
  readonly opening?: Partial<Omit<CircuitSpecification['opening'], 'id'>>;
}

/** A circuit with fixture A of one coil and fixture B of two. */
export function specificationWith(changes: Changes = {}): CircuitSpecification {
  const fixture = (id: string, tag: string, coils: { id: string; number: number }[]) => ({
    id,
    tag,
    description: 'Multideck, dairy',
    kind: 'case',
    lengthM: 3.658,
    evaporatingTemperatureK: 266.5,
    evaporatingBasis: 'dew',
    dischargeAirTemperatureK: 272.5,
    superheatLowK: 3.5,
    superheatHighK: 4.5,
    valveKind: 'thermostatic',
    coils,
    ...changes.fixtures,
  });
  return circuitSpecificationSchema.parse({
    revision: 1,
    opening: {
      id: uuid(1, 1),
      name: 'Invented Market 12',
      elevationM: 300,
      unitSystem: 'us',
      ...changes.opening,
    },
    system: { id: uuid(2, 1), name: 'Rack A', kind: 'rack', refrigerant: 'R-448A', ...changes.system },
    suctionGroup: {
      id: uuid(3, 1),
      name: 'A1',
      temperatureClass: 'medium',
      saturatedSuctionTemperatureK: 265.5,
    },
    circuit: {
      id: uuid(4, 1),
      code: 'A07',
      description: 'Dairy',
      area: 'Dairy wall',
      temperatureClass: 'medium',
      feed: 'homeRun',
      control: 'evaporatorPressureRegulator',
      loadW: null,
      ...changes.circuit,
      defrost: {
        type: 'offTime',
        perDay: 4,
        failSafeS: 2700,
        terminationTemperatureK: null,
        dripS: null,
        ...changes.defrost,
      },
      fixtures: [
        fixture(FIXTURE_A, 'D-1', [{ id: COIL_A1, number: 1 }]),
        fixture(FIXTURE_B, 'D-2', [
          { id: COIL_B1, number: 1 },
          { id: COIL_B2, number: 2 },
        ]),
      ],
    },
  });
}

/** A maker's table of which only the safety class matters: expanding works nothing out of its figures. */
export const classedTable = (
  designation: string,
  safetyClass: MakersTableFacts['safetyClass'],
): MakersTableFacts => ({
  designation,
  issuer: 'Example Gases',
  edition: '2026-01',
  printedStepPa: 690,
  safetyClass,
  points: [],
});

/** The same plant, for the own work of its suction group or its system. */
export function atLevel(level: Level, specification: CircuitSpecification): CircuitSpecification {
  if (level === 'circuit') return specification;
  const { system, suctionGroup, circuit } = specification;
  return {
    ...specification,
    level,
    suctionGroup: level === 'system' ? null : suctionGroup,
    circuit: {
      ...circuit,
      code: level === 'system' ? system.name : `${system.name} ${suctionGroup?.name ?? ''}`,
      fixtures: [],
    },
  };
}
