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
  'Nameplate; the tolerance is common practice': 'Placa; la tolerancia es práctica común',
  'NEMA MG 1, 12.44 for 10 %; 2 % of unbalance is common practice':
    'NEMA MG 1, 12.44 para 10 %; 2 % de desbalance es práctica común',
  'UFGS 15182 for 24 h without loss, UFGS 15741N for 300 psi':
    'UFGS 15182 para 24 h sin pérdida, UFGS 15741N para 300 psi',
  'UFGS 15182 for 24 h without loss, UFGS 15741N for 150 psi':
    'UFGS 15182 para 24 h sin pérdida, UFGS 15741N para 150 psi',
  'UFGS 15182 for 24 h without loss': 'UFGS 15182 para 24 h sin pérdida',
  "Compressor maker's service guide": 'Guía de servicio del fabricante del compresor',
  "Compressor maker's filling procedure for R-744":
    'Procedimiento de carga de R-744 del fabricante del compresor',
  "Gas detector makers' notes": 'Notas de fabricantes de detectores de gas',
  "Default of 10 K; the compressor maker's minimum goes first":
    'Valor por omisión de 10 K; el mínimo del fabricante del compresor va primero',
};

/** The source of a criterion in the reader's language; one that has no translation here stays as the template says it. */
export function sourceInWords(source: string, language: Language): string {
  return language === 'es' ? (SPANISH[source] ?? source) : source;
}
