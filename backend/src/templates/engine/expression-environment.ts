import { Environment } from '@marcbachmann/cel-js';
import { toSi } from '#shared/units/convert';
import { UNITS, type UnitId } from '#shared/units/unit';
import { FACT_FIELDS, NAMES, SCOPES, type Scope } from './fact-fields';
import { isQuantityDimension, QUANTITIES, Temperature, TemperatureDifference } from './quantity-facts';

/** How an expression writes a quantity of its own: a number in a unit. */
export const QUANTITY_FUNCTIONS: Readonly<Record<string, UnitId>> = {
  temperatureK: 'K',
  temperatureC: 'degC',
  temperatureF: 'degF',
  differenceK: 'K_diff',
  differenceF: 'degF_diff',
  durationMin: 'min',
  lengthM: 'm',
  lengthFt: 'ft',
  heatFlowW: 'W',
};

const TYPE_OF_NAME: Readonly<Record<string, keyof typeof FACT_FIELDS>> = {
  opening: 'Opening',
  system: 'System',
  suctionGroup: 'SuctionGroup',
  circuit: 'Circuit',
  fixture: 'Fixture',
  coil: 'Coil',
};

const LIMITS = { maxAstNodes: 200, maxDepth: 30, maxListElements: 50, maxMapEntries: 0, maxCallArguments: 3 };

interface Sized {
  readonly si: number;
}

function environmentOf(scope: Scope): Environment {
  const environment = new Environment({ limits: LIMITS });
  for (const quantity of Object.values(QUANTITIES)) {
    environment.registerType(quantity.name, { ctor: quantity, fields: {} });
    const name = quantity.name;
    environment
      .registerOperator(`${name} < ${name}: bool`, (a: Sized, b: Sized) => a.si < b.si)
      .registerOperator(`${name} <= ${name}: bool`, (a: Sized, b: Sized) => a.si <= b.si)
      .registerOperator(`${name} > ${name}: bool`, (a: Sized, b: Sized) => a.si > b.si)
      .registerOperator(`${name} >= ${name}: bool`, (a: Sized, b: Sized) => a.si >= b.si);
    // Everything but a temperature counts from a true zero: such quantities add up and scale.
    if (quantity === Temperature) continue;
    environment
      .registerOperator(`${name} + ${name}: ${name}`, (a: Sized, b: Sized) => new quantity(a.si + b.si))
      .registerOperator(`${name} - ${name}: ${name}`, (a: Sized, b: Sized) => new quantity(a.si - b.si))
      .registerOperator(
        `${name} * double: ${name}`,
        (a: Sized, factor: number) => new quantity(a.si * factor),
      )
      .registerOperator(
        `${name} / double: ${name}`,
        (a: Sized, divisor: number) => new quantity(a.si / divisor),
      );
  }
  environment
    .registerOperator(
      'Temperature + TemperatureDifference: Temperature',
      (a: Sized, b: Sized) => new Temperature(a.si + b.si),
    )
    .registerOperator(
      'Temperature - TemperatureDifference: Temperature',
      (a: Sized, b: Sized) => new Temperature(a.si - b.si),
    )
    .registerOperator(
      'Temperature - Temperature: TemperatureDifference',
      (a: Sized, b: Sized) => new TemperatureDifference(a.si - b.si),
    );
  for (const [name, unit] of Object.entries(QUANTITY_FUNCTIONS)) {
    const { dimension } = UNITS[unit];
    if (!isQuantityDimension(dimension)) continue;
    const quantity = QUANTITIES[dimension];
    const make = (value: number | bigint) => new quantity(toSi(Number(value), unit));
    environment
      .registerFunction(`${name}(double): ${quantity.name}`, make)
      .registerFunction(`${name}(int): ${quantity.name}`, make);
  }
  for (const [name, fields] of Object.entries(FACT_FIELDS)) environment.registerType(name, { fields });
  for (const name of NAMES[scope]) environment.registerVariable(name, TYPE_OF_NAME[name] ?? 'dyn');
  return environment;
}

/** What expressions can say at each place of a template. Nothing in it reads a clock, a file or a network. */
export const ENVIRONMENTS = Object.fromEntries(
  SCOPES.map((scope) => [scope, environmentOf(scope)]),
) as Readonly<Record<Scope, Environment>>;
