import type { Text } from '#shared/checklist/text';

/** The sources of the shipped templates that are plain words; titles of publications stay as they are published. */
const IN_SPANISH: Readonly<Record<string, string>> = {
  'Common practice': 'Práctica común',
  'From the schedule': 'Según la cédula',
  'From the schedule; the tolerance is common practice': 'Según la cédula; la tolerancia es práctica común',
  'From the schedule; ending on temperature is common practice':
    'Según la cédula; terminar por temperatura es práctica común',
  'Application and Field Recommendations (appendix to display case manuals)':
    'Recomendaciones de aplicación y de campo (anexo de los manuales de exhibidores)',
};

/** Where a step's criterion comes from, in both languages; one that isn't known here is shown as it is written. */
export function sourceText(source: string): Text {
  return { en: source, es: IN_SPANISH[source] ?? source };
}
