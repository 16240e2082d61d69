import type { Text } from '../text';

/** What a formula says, by its key: in words, with the names that its working's lines have. */
export const FORMULA_WORDS: Readonly<Record<string, Text>> = {
  superheatFromDew: {
    en: 'Superheat = line temperature − dew temperature at the absolute pressure',
    es: 'Sobrecalentamiento = temperatura de la línea − temperatura de rocío a la presión absoluta',
  },
  subcoolingFromBubble: {
    en: 'Subcooling = bubble temperature at the absolute pressure − line temperature',
    es: 'Subenfriamiento = temperatura de burbuja a la presión absoluta − temperatura de la línea',
  },
  pressureTestCorrected: {
    en: 'Expected pressure = start pressure (absolute) × end temperature ÷ start temperature, less the atmosphere; what is left beyond the instruments’ room is a leak',
    es: 'Presión esperada = presión inicial (absoluta) × temperatura final ÷ temperatura inicial, menos la atmósfera; lo que sobra del margen de los instrumentos es fuga',
  },
  vacuumRise: {
    en: 'Rise after the pump was isolated, against the limit; the shape of the curve tells moisture from a leak',
    es: 'Aumento después de aislar la bomba, contra el límite; la forma de la curva distingue humedad de fuga',
  },
  supplyVoltage: {
    en: 'Unbalance = largest distance from the average ÷ average; each voltage against the nameplate',
    es: 'Desbalance = mayor distancia al promedio ÷ promedio; cada voltaje contra la placa',
  },
  heaterCurrentOnePhase: {
    en: 'Expected current = nameplate power ÷ nameplate voltage, times measured ÷ nameplate voltage',
    es: 'Corriente esperada = potencia de placa ÷ voltaje de placa, por voltaje medido ÷ voltaje de placa',
  },
  heaterCurrentThreePhase: {
    en: 'Expected current = nameplate power ÷ (√3 × nameplate voltage), times measured ÷ nameplate voltage',
    es: 'Corriente esperada = potencia de placa ÷ (√3 × voltaje de placa), por voltaje medido ÷ voltaje de placa',
  },
  returnGasSuperheat: {
    en: 'Superheat = return gas temperature − dew temperature at the absolute suction pressure',
    es: 'Sobrecalentamiento = temperatura del gas de retorno − temperatura de rocío a la presión absoluta de succión',
  },
  defrostEndsOnTemperature: {
    en: 'A defrost ends on its temperature, before its longest time',
    es: 'Un deshielo termina por temperatura, antes de su tiempo máximo',
  },
  defrostEndsOnTime: {
    en: 'A defrost without an end temperature ends on its time',
    es: 'Un deshielo sin temperatura final termina por tiempo',
  },
  leakRateAnnualised: {
    en: 'For later years: leak rate = added ÷ full charge × 365 ÷ days since the last addition (365 at most). Shown: what reaches the threshold of commercial refrigeration',
    es: 'Para años siguientes: tasa de fuga = agregado ÷ carga completa × 365 ÷ días desde la última adición (365 como máximo). Se muestra lo que alcanza el umbral de refrigeración comercial',
  },
  chargeByWeight: {
    en: 'Charge = all that went in − all that came out, by the scale',
    es: 'Carga = todo lo que entró − todo lo que salió, según la báscula',
  },
  'electronicValve.transducer': {
    en: 'Driver minus gauge, at the same moment',
    es: 'Controlador menos manómetro, en el mismo momento',
  },
  'electronicValve.sensor': {
    en: 'Sensor in ice water minus 0 °C (32 °F)',
    es: 'Sensor en agua con hielo menos 0 °C (32 °F)',
  },
  'electronicValve.stroke': {
    en: 'The valve sits in the middle of its stroke',
    es: 'La válvula queda a media carrera',
  },
  pullDown: {
    en: 'Hold = time from when the band was reached for good to the last moment in it',
    es: 'Sostenido = tiempo desde que se alcanzó la banda definitivamente hasta el último momento en ella',
  },
  superheatTrace: {
    en: 'Superheat at each reading = line temperature − dew temperature at the absolute pressure',
    es: 'Sobrecalentamiento en cada lectura = temperatura de la línea − temperatura de rocío a la presión absoluta',
  },
  superheatTraceMean: {
    en: 'Time-weighted mean by straight lines between readings; middle = (highest + lowest) ÷ 2',
    es: 'Media ponderada en el tiempo con líneas rectas entre lecturas; punto medio = (máximo + mínimo) ÷ 2',
  },
  'evaporatingTemperature.dew': {
    en: 'Evaporating temperature = dew temperature at the absolute pressure',
    es: 'Temperatura de evaporación = temperatura de rocío a la presión absoluta',
  },
  'evaporatingTemperature.mean': {
    en: 'Evaporating temperature = middle of bubble and dew temperature at the absolute pressure',
    es: 'Temperatura de evaporación = punto medio entre burbuja y rocío a la presión absoluta',
  },
  'evaporatingPressure.dew': {
    en: 'Pressure at which the dew temperature is the one asked for',
    es: 'Presión a la que la temperatura de rocío es la pedida',
  },
  'evaporatingPressure.mean': {
    en: 'Pressure at which the middle of bubble and dew temperature is the one asked for',
    es: 'Presión a la que el punto medio entre burbuja y rocío es el pedido',
  },
  superheatUncertainty: {
    en: 'Error = √(gauge’s error as a temperature² + thermometer’s error²)',
    es: 'Error = √(error del manómetro como temperatura² + error del termómetro²)',
  },
};
