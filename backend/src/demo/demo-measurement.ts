import type { Answer, StepOf } from '#shared/checklist/step';
import type { MeasurementBoxes } from '#shared/checklist/kinds/measurement';
import { METHODS } from '#shared/checklist/methods/methods';
import { saturationOf } from '#shared/checklist/saturation-of';
import { toGauge } from '#shared/refrigeration/gauge-pressure';
import { bubblePressure, dewPressure } from '#shared/refrigeration/saturation/saturation-curve';
import { fromSi, toSi } from '#shared/units/convert';
import { decimalsFor } from '#shared/units/format';
import { kelvin, pascalAbsolute } from '#shared/units/quantity';
import { roundTo } from '#shared/units/round';
import { displayUnit } from '#shared/units/unit-system';
import type { DemoScene } from './demo-answer';

interface Values {
  readonly quantities: Readonly<Record<string, number>>;
  readonly words?: Readonly<Record<string, string>>;
  readonly rows?: readonly Omit<Values, 'rows'>[];
}

const HOUR_S = 3600;
const PSI_PA = 6894.757;
const MICRON_PA = 0.1333224;

/** What a careful installer measures: within the criteria, scattered as instruments scatter. */
export function demoMeasurement(step: StepOf<'measurement'>, scene: DemoScene): Answer {
  const method = METHODS[step.method];
  const values = VALUES[step.method](scene, step.criteria);
  const boxes = (given: Omit<Values, 'rows'>, fields = method.fields): MeasurementBoxes => {
    const quantities: MeasurementBoxes['quantities'] = {};
    for (const field of fields) {
      const si = given.quantities[field.key];
      if (field.kind !== 'quantity' || si === undefined) continue;
      const unit = displayUnit(field.dimension, scene.facts.unitSystem);
      quantities[field.key] = { text: String(roundTo(fromSi(si, unit), decimalsFor(unit))), unit };
    }
    return { quantities, words: { ...given.words } };
  };
  return {
    kind: 'measurement',
    method: step.method,
    ...boxes(values),
    rows: (values.rows ?? []).map((row) => boxes(row, method.rows?.fields)),
  };
}

type Maker = (scene: DemoScene, criteria: Readonly<Record<string, number | null>>) => Values;

/** Gauge pressure of dew or bubble at a temperature; 0 where the refrigerant has no table. */
function saturatedGauge(scene: DemoScene, temperatureK: number, of: typeof dewPressure): number {
  const table = saturationOf(scene.facts);
  const found = table && of(table, kelvin(temperatureK));
  return found?.ok ? toGauge(found.pressure, pascalAbsolute(scene.facts.atmospherePaAbs)) : 0;
}

const VALUES: Readonly<Record<StepOf<'measurement'>['method'], Maker>> = {
  pressureTest: ({ facts, random }, criteria) => {
    const startPressure = (criteria['leastPressure'] ?? 300 * PSI_PA) + 2 * PSI_PA;
    const [startTemperature, endTemperature] = [294 + 2 * random(), 291 + 2 * random()];
    const absolute = startPressure + facts.atmospherePaAbs;
    return {
      quantities: {
        startPressure,
        startTemperature,
        endPressure: (absolute * endTemperature) / startTemperature - facts.atmospherePaAbs,
        endTemperature,
        held: (criteria['leastHold'] ?? 24 * HOUR_S) + 0.5 * HOUR_S,
        gaugeAccuracy: 2 * PSI_PA,
      },
    };
  },
  evacuation: ({ random }, criteria) => {
    const hold = criteria['hold'] ?? HOUR_S;
    const start = (criteria['target'] ?? 300 * MICRON_PA) * (0.85 + 0.1 * random());
    const shares = [0, 0.1, 0.25, 0.5, 0.75, 1];
    return {
      quantities: { ambientTemperature: 293 },
      rows: shares.map((share) => ({
        quantities: { since: hold * share, pressure: start + 60 * MICRON_PA * (1 - Math.exp(-3 * share)) },
      })),
    };
  },
  supplyVoltage: ({ random }) => ({
    quantities: {
      nameplate: 208,
      line12: 206 + 2 * random(),
      line23: 206 + 2 * random(),
      line31: 206 + 2 * random(),
    },
  }),
  heaterCurrent: ({ random }) => {
    const expected = 6000 / (Math.sqrt(3) * 208);
    const leg = (): number => expected * (0.97 + 0.04 * random());
    return {
      quantities: {
        platePower: 6000,
        plateVoltage: 208,
        voltage: 208,
        leg1: leg(),
        leg2: leg(),
        leg3: leg(),
      },
      words: { supply: 'threePhase' },
    };
  },
  returnGas: (scene, criteria) => {
    const dewK = (scene.specification.suctionGroup?.saturatedSuctionTemperatureK ?? 263) + 0.5;
    const superheat = (criteria['superheatLow'] ?? 10) + 2 + 3 * scene.random();
    return {
      quantities: {
        suctionPressure: saturatedGauge(scene, dewK, dewPressure),
        returnGasTemperature: dewK + superheat,
        dischargeTemperature: 345 + 5 * scene.random(),
      },
    };
  },
  subcooling: (scene, criteria) => {
    const bubbleK = 308 + 2 * scene.random();
    return {
      quantities: {
        liquidPressure: saturatedGauge(scene, bubbleK, bubblePressure),
        lineTemperature: bubbleK - (criteria['low'] ?? 3) - 2,
      },
    };
  },
  regulatorPressure: (scene, criteria) => {
    const wanted = criteria['dew'] ?? criteria['mean'] ?? 263;
    return { quantities: { pressure: saturatedGauge(scene, wanted + 0.2 * scene.random(), dewPressure) } };
  },
  witnessedDefrost: ({ random }, criteria) => {
    const took = (criteria['failSafe'] ?? HOUR_S) * (0.55 + 0.25 * random());
    const ends = criteria['terminationTemperature'] ?? null;
    return { quantities: ends === null ? { took } : { took, endTemperature: ends + 0.5 * random() } };
  },
  refrigerantCharge: ({ facts, random }) => ({
    quantities: {},
    rows: ['C-1041', 'C-1042', 'C-1077'].map((cylinder) => ({
      quantities: { before: 52 + random(), after: 5 + 4 * random() },
      words: { cylinder, direction: 'in', refrigerant: facts.refrigerant },
    })),
  }),
  electronicValve: (scene) => {
    const gauge = saturatedGauge(scene, 265, dewPressure);
    return {
      quantities: {
        transducer: gauge * (0.995 + 0.01 * scene.random()),
        gauge,
        iceBath: toSi(0.2 * scene.random(), 'degC'),
        opening: 0.42 + 0.15 * scene.random(),
      },
      words: { driverRefrigerant: scene.facts.refrigerant },
    };
  },
};
