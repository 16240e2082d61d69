import type { Language } from './text';

/** Where the templates' criteria come from, as they write it, in Spanish. Titles of publications stay as published. */
const SPANISH: Readonly<Record<string, string>> = {
  'Common practice': 'Práctica común',
  'From the schedule': 'De la cédula',
  'From the schedule; the tolerance is common practice': 'De la cédula; la tolerancia es práctica común',
  'From the schedule; ending on temperature is common practice':
    'De la cédula; terminar por temperatura es práctica común',
  'Application and Field Recommendations (appendix to display case manuals)':
    'Application and Field Recommendations (apéndice de manuales de vitrinas)',
};

/** The source of a criterion in the reader's language; one that has no translation here stays as the template says it. */
export function sourceInWords(source: string, language: Language): string {
  return language === 'es' ? (SPANISH[source] ?? source) : source;
}
