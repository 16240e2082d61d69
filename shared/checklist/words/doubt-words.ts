import type { Text } from '../text';
import type { DoubtKind } from '../judgement';

/** What a doubt says to whoever recorded it, to the lead and in the package. */
export const DOUBT_WORDS: Readonly<Record<DoubtKind, Text>> = {
  empty: { en: 'Nothing was entered.', es: 'No se ingresó nada.' },
  notANumber: { en: 'This is not a number.', es: 'Esto no es un número.' },
  ambiguous: {
    en: 'The comma could be a decimal mark or a thousands mark.',
    es: 'La coma puede ser decimal o separador de miles.',
  },
  notFinite: { en: 'The number is too large.', es: 'El número es demasiado grande.' },
  wrongUnit: { en: 'The unit measures something else.', es: 'La unidad mide otra cosa.' },
  belowAbsoluteZero: {
    en: 'Nothing is colder than absolute zero.',
    es: 'Nada está más frío que el cero absoluto.',
  },
  deeperThanVacuum: {
    en: 'No pressure is deeper than a full vacuum.',
    es: 'Ninguna presión es más profunda que el vacío total.',
  },
  aboveCritical: {
    en: 'Above the critical point: there is no saturation here.',
    es: 'Por encima del punto crítico: aquí no hay saturación.',
  },
  aboveTable: {
    en: 'Above what the refrigerant’s table covers.',
    es: 'Por encima de la tabla del refrigerante.',
  },
  belowTable: {
    en: 'Below what the refrigerant’s table covers.',
    es: 'Por debajo de la tabla del refrigerante.',
  },
  notPlausible: {
    en: 'No site instrument shows a value like this.',
    es: 'Ningún instrumento de obra muestra un valor así.',
  },
  swapped: {
    en: 'Pressure and temperature look swapped.',
    es: 'La presión y la temperatura parecen cambiadas.',
  },
  celsiusInFahrenheit: { en: 'This looks like °C typed as °F.', es: 'Parecen °C escritos como °F.' },
  fahrenheitInCelsius: { en: 'This looks like °F typed as °C.', es: 'Parecen °F escritos como °C.' },
  liquidRisk: {
    en: 'Superheat touches zero: liquid may be leaving the coil.',
    es: 'El sobrecalentamiento llega a cero: puede salir líquido del serpentín.',
  },
  unknownOption: { en: 'This choice is no longer offered.', es: 'Esta opción ya no se ofrece.' },
  tooFewPhotos: { en: 'More photos are needed.', es: 'Faltan fotos.' },
  wrongAnswerKind: {
    en: 'The answer is of another kind than the step.',
    es: 'La respuesta es de otro tipo que el paso.',
  },
  unknownRefrigerant: {
    en: 'There is no table for this refrigerant.',
    es: 'No hay tabla para este refrigerante.',
  },
  notNegatable: { en: 'This can’t be negative.', es: 'Esto no puede ser negativo.' },
  lowAboveHigh: { en: 'The lowest is higher than the highest.', es: 'El mínimo es mayor que el máximo.' },
  emptySignature: { en: 'Nothing was signed.', es: 'Falta la firma.' },
  unknownStep: { en: 'The checklist no longer has this step.', es: 'La lista ya no tiene este paso.' },
  incomplete: {
    en: 'Not all of it is there yet: kept, and the step stays open.',
    es: 'Todavía falta una parte: se guarda y el paso queda abierto.',
  },
  tooMany: { en: 'More rows than this step takes.', es: 'Más renglones de los que admite este paso.' },
  noCriterion: {
    en: 'The checklist gives no limit to judge this by.',
    es: 'La lista no da un límite para juzgar esto.',
  },
  preliminary: {
    en: 'Preliminary: the conditions of a valid reading were not met. Kept; take it again when they are.',
    es: 'Preliminar: no se cumplían las condiciones de una lectura válida. Se guarda; repítala cuando se cumplan.',
  },
  estimated: {
    en: 'Estimated: the pressure was taken elsewhere and corrected for line drop.',
    es: 'Estimado: la presión se tomó en otro punto y se corrigió por la caída en la línea.',
  },
  tooFewSamples: { en: 'Too few readings to judge by.', es: 'Muy pocas lecturas para juzgar.' },
  notSettled: {
    en: 'The valve had not settled: watch it longer.',
    es: 'La válvula no estaba estable: obsérvela más tiempo.',
  },
  wrongRefrigerant: {
    en: 'This is another refrigerant than the system’s.',
    es: 'Este refrigerante no es el del sistema.',
  },
  massDoesNotFollow: {
    en: 'A cylinder starts with another mass than it ended with.',
    es: 'Un cilindro empieza con otra masa que con la que terminó.',
  },
  wrongWay: {
    en: 'A cylinder that charges got heavier, or one that recovers got lighter. Swapped?',
    es: 'Un cilindro que carga pesa más, o uno que recupera pesa menos. ¿Están al revés?',
  },
  readTooSoon: {
    en: 'Read before the valve had its time to settle after the last turn.',
    es: 'Leído antes de que la válvula tuviera su tiempo para estabilizarse después de la última vuelta.',
  },
  barometerSeaLevel: {
    en: 'The barometer reading looks corrected to sea level. Use the station pressure.',
    es: 'La lectura del barómetro parece corregida al nivel del mar. Use la presión de la estación.',
  },
  barometerFarOff: {
    en: 'The barometer reading is far from what this elevation gives.',
    es: 'La lectura del barómetro está lejos de lo que da esta altitud.',
  },
  asFoundMissing: {
    en: 'The valve was turned, and nobody recorded the superheat as found.',
    es: 'Se movió la válvula y nadie anotó el sobrecalentamiento como se encontró.',
  },
};
