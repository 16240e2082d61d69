import type { Text } from '../text';

/** What was concluded, by its code: method and finding. */
export const VERDICT_WORDS: Readonly<Record<string, Text>> = {
  pressureTest_tight: { en: 'Tight: the change is the weather.', es: 'Sin fuga: el cambio es por el clima.' },
  pressureTest_leak: {
    en: 'Leak: more pressure was lost than the weather explains.',
    es: 'Fuga: se perdió más presión de la que explica el clima.',
  },
  pressureTest_rising: {
    en: 'Pressure is above what the weather explains: cylinder open, or a wrong reading?',
    es: 'La presión es mayor de lo que explica el clima: ¿cilindro abierto o lectura equivocada?',
  },
  pressureTest_tooShort: { en: 'It did not stand long enough.', es: 'No estuvo en prueba el tiempo pedido.' },
  pressureTest_pressureTooLow: {
    en: 'The test pressure was below the least asked.',
    es: 'La presión de prueba fue menor que la mínima pedida.',
  },
  evacuation_dryAndTight: { en: 'Dry and tight.', es: 'Seco y sin fuga.' },
  evacuation_moisture: { en: 'Moisture: it rises and levels off.', es: 'Humedad: sube y se estabiliza.' },
  evacuation_leak: { en: 'Leak: it keeps rising.', es: 'Fuga: sigue subiendo.' },
  evacuation_overLimit: {
    en: 'Over the limit; too few readings to tell a leak from moisture.',
    es: 'Sobre el límite; muy pocas lecturas para distinguir fuga de humedad.',
  },
  evacuation_tooShort: {
    en: 'It did not stand isolated long enough.',
    es: 'No estuvo aislado el tiempo pedido.',
  },
  evacuation_falling: {
    en: 'The vacuum got deeper while isolated: valve not shut, pump still on, or rows mixed up.',
    es: 'El vacío aumentó estando aislado: válvula sin cerrar, bomba encendida o renglones cambiados.',
  },
  evacuation_notDeepEnough: {
    en: 'Isolated before the target was reached.',
    es: 'Se aisló antes de alcanzar el objetivo.',
  },
  evacuation_waterFreezing: {
    en: 'It levels off where water freezes: there is liquid water.',
    es: 'Se estabiliza donde se congela el agua: hay agua líquida.',
  },
  evacuation_nearWaterSaturation: {
    en: 'It levels off near the pressure of water at this air temperature: moisture.',
    es: 'Se estabiliza cerca de la presión del agua a esta temperatura: humedad.',
  },
  evacuation_aboveWaterSaturation: {
    en: 'It levels off above the pressure of water: not moisture alone.',
    es: 'Se estabiliza por encima de la presión del agua: no es solo humedad.',
  },
  supplyVoltage_lost: { en: 'A line has no voltage.', es: 'Una línea no tiene voltaje.' },
  supplyVoltage_low: {
    en: 'A voltage is too low for the nameplate.',
    es: 'Un voltaje es muy bajo para la placa.',
  },
  supplyVoltage_high: {
    en: 'A voltage is too high for the nameplate.',
    es: 'Un voltaje es muy alto para la placa.',
  },
  supplyVoltage_unbalanced: { en: 'The voltages are unbalanced.', es: 'Los voltajes están desbalanceados.' },
  heaterCurrent_noCurrent: { en: 'No current in any line.', es: 'Ninguna línea tiene corriente.' },
  heaterCurrent_lineOrWyeElementOpen: {
    en: 'One line is dead: the line, or its element of a wye, is open.',
    es: 'Una línea sin corriente: la línea, o su elemento en estrella, está abierta.',
  },
  heaterCurrent_wyeElementOpenWithNeutral: {
    en: 'One line is dead: an element of the wye is open.',
    es: 'Una línea sin corriente: un elemento de la estrella está abierto.',
  },
  heaterCurrent_deltaElementOpen: {
    en: 'Two lines are low: the element between them is open.',
    es: 'Dos líneas bajas: el elemento entre ellas está abierto.',
  },
  heaterCurrent_twoDeltaElementsOpen: {
    en: 'Only one element heats: two of the delta are open.',
    es: 'Solo calienta un elemento: dos de la delta están abiertos.',
  },
  heaterCurrent_legOpen: { en: 'A line is dead.', es: 'Una línea no tiene corriente.' },
  returnGas_liquidFloodback: {
    en: 'Liquid may be coming back to the compressors.',
    es: 'Puede estar regresando líquido a los compresores.',
  },
  returnGas_hotDischarge: { en: 'The discharge gets too hot.', es: 'La descarga se calienta demasiado.' },
  returnGas_breach_superheatLow: {
    en: 'Superheat below the least.',
    es: 'Sobrecalentamiento menor que el mínimo.',
  },
  returnGas_breach_superheatHigh: {
    en: 'Superheat above the most.',
    es: 'Sobrecalentamiento mayor que el máximo.',
  },
  returnGas_breach_returnGasHigh: { en: 'Return gas too warm.', es: 'Gas de retorno muy caliente.' },
  returnGas_breach_dischargeHigh: { en: 'Discharge too hot.', es: 'Descarga muy caliente.' },
  returnGas_dischargeNotMeasured: {
    en: 'The discharge has a limit and was not measured.',
    es: 'La descarga tiene límite y no se midió.',
  },
  witnessedDefrost_endedOnTemperature: { en: 'Ended on temperature.', es: 'Terminó por temperatura.' },
  witnessedDefrost_endedOnTime: { en: 'Ended on its time.', es: 'Terminó por tiempo.' },
  witnessedDefrost_endedEarly: {
    en: 'Ended early: neither temperature nor time was reached.',
    es: 'Terminó antes: sin alcanzar temperatura ni tiempo.',
  },
  witnessedDefrost_endedOnFailSafe: {
    en: 'Its longest time ended it, not the temperature.',
    es: 'La terminó el tiempo máximo, no la temperatura.',
  },
  witnessedDefrost_ranPastItsTime: { en: 'It ran past its longest time.', es: 'Pasó de su tiempo máximo.' },
  electronicValve_refrigerant: {
    en: 'The driver is set to another refrigerant.',
    es: 'El controlador tiene otro refrigerante.',
  },
  electronicValve_transducer: {
    en: 'Driver and gauge disagree.',
    es: 'Controlador y manómetro no coinciden.',
  },
  electronicValve_sensor: { en: 'The sensor is off in ice water.', es: 'El sensor falla en agua con hielo.' },
  electronicValve_stroke: {
    en: 'The valve is not in the middle of its stroke.',
    es: 'La válvula no está a media carrera.',
  },
  trend_held: { en: 'Reached the band and held it.', es: 'Alcanzó la banda y la sostuvo.' },
  trend_notLongEnough: {
    en: 'In the band, but not yet for the time asked.',
    es: 'En la banda, pero todavía no el tiempo pedido.',
  },
  trend_brokeAway: { en: 'Left the band for too long.', es: 'Salió de la banda demasiado tiempo.' },
  trend_neverReached: { en: 'Never reached the band.', es: 'Nunca alcanzó la banda.' },
  superheat_hunts: { en: 'The valve hunts.', es: 'La válvula oscila.' },
  superheat_notSettled: { en: 'Not settled: watch it longer.', es: 'No está estable: obsérvela más tiempo.' },
  superheat_watchLonger: {
    en: 'Watched too short to say that it has settled.',
    es: 'Observado muy poco para decir que está estable.',
  },
  superheat_insideWithinError: {
    en: 'Inside the band, within the instruments’ error of its edge.',
    es: 'Dentro de la banda, dentro del error de los instrumentos respecto al borde.',
  },
  superheat_outsideWithinError: {
    en: 'Outside the band, within the instruments’ error of its edge.',
    es: 'Fuera de la banda, dentro del error de los instrumentos respecto al borde.',
  },
};
