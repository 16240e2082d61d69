import * as z from 'zod/mini';
import {
  circuitIdSchema,
  coilIdSchema,
  fixtureIdSchema,
  openingIdSchema,
  suctionGroupIdSchema,
  systemIdSchema,
} from './ids';
import {
  CONTROLS,
  DEFROST_TYPES,
  EVAPORATING_BASES,
  FEEDS,
  FIXTURE_KINDS,
  LEVELS,
  SYSTEM_KINDS,
  TEMPERATURE_CLASSES,
  VALVE_KINDS,
} from './words';

// Plain numbers carry their SI unit in the name: K is a temperature where the name says temperature, and a temperature
// difference where it says superheat or difference.

export const UNIT_SYSTEMS = ['us', 'si'] as const;

/** One evaporator with its own expansion valve. */
export const coilSchema = z.object({ id: coilIdSchema, number: z.int() });
export type Coil = z.infer<typeof coilSchema>;

/** A display case, or a walk-in box with its unit coolers, as the schedule specifies it. `null`: the schedule is silent. */
export const fixtureSchema = z.object({
  id: fixtureIdSchema,
  tag: z.string(),
  description: z.string(),
  kind: z.enum(FIXTURE_KINDS),
  lengthM: z.nullable(z.number()),
  evaporatingTemperatureK: z.number(),
  evaporatingBasis: z.enum(EVAPORATING_BASES),
  dischargeAirTemperatureK: z.number(),
  superheatLowK: z.number(),
  superheatHighK: z.number(),
  valveKind: z.enum(VALVE_KINDS),
  coils: z.array(coilSchema),
});
export type Fixture = z.infer<typeof fixtureSchema>;

export const defrostSchema = z.object({
  type: z.enum(DEFROST_TYPES),
  perDay: z.int(),
  failSafeS: z.nullable(z.number()),
  terminationTemperatureK: z.nullable(z.number()),
  dripS: z.nullable(z.number()),
});
export type Defrost = z.infer<typeof defrostSchema>;

/** The unit of work and of sign-off. */
export const circuitSchema = z.object({
  id: circuitIdSchema,
  code: z.string(),
  description: z.string(),
  area: z.string(),
  temperatureClass: z.enum(TEMPERATURE_CLASSES),
  feed: z.enum(FEEDS),
  control: z.enum(CONTROLS),
  loadW: z.nullable(z.number()),
  defrost: defrostSchema,
  fixtures: z.array(fixtureSchema),
});
export type Circuit = z.infer<typeof circuitSchema>;

export const suctionGroupSchema = z.object({
  id: suctionGroupIdSchema,
  name: z.string(),
  temperatureClass: z.enum(TEMPERATURE_CLASSES),
  saturatedSuctionTemperatureK: z.number(),
});
export type SuctionGroup = z.infer<typeof suctionGroupSchema>;

export const systemSchema = z.object({
  id: systemIdSchema,
  name: z.string(),
  kind: z.enum(SYSTEM_KINDS),
  refrigerant: z.string(),
});
export type System = z.infer<typeof systemSchema>;

/**
 * Everything that a template may ask about one circuit; `revision` counts the changes of the schedule behind it. For the
 * work of a whole suction group or system, `circuit` holds its code and nothing else that means anything: no fixtures,
 * and for a system no `suctionGroup`.
 */
export const circuitSpecificationSchema = z.object({
  revision: z.int(),
  /** Absent in what was bound before levels came: a circuit. */
  level: z.optional(z.enum(LEVELS)),
  opening: z.object({
    id: openingIdSchema,
    name: z.string(),
    elevationM: z.number(),
    unitSystem: z.enum(UNIT_SYSTEMS),
  }),
  system: systemSchema,
  suctionGroup: z.nullable(suctionGroupSchema),
  circuit: circuitSchema,
});
export type CircuitSpecification = z.infer<typeof circuitSpecificationSchema>;
