/** A sound template of one step, with lines to put in its place; `steps` are indented by six spaces already. */
export function templateText(parts: { head?: string; steps?: string; sectionWhen?: string } = {}): string {
  return [
    'key: trial',
    'version: 3',
    'level: circuit',
    'title: { en: Trial, es: Prueba }',
    parts.head ?? 'applies: "true"',
    'priority: 5',
    'sections:',
    '  - key: first',
    '    title: { en: First, es: Primero }',
    ...(parts.sectionWhen === undefined ? [] : [`    when: ${parts.sectionWhen}`]),
    '    steps:',
    parts.steps ?? CONFIRM,
    '',
  ].join('\n');
}

/** Line 11 of a template is the first of its steps. */
export const FIRST_STEP_LINE = 11;

export const CONFIRM = stepText('kind: confirm', 'key: look');

/** A step of the given lines, with a title. */
export function stepText(...lines: string[]): string {
  return ['- title: { en: Look, es: Mire }', ...lines.map((line) => `  ${line}`)]
    .map((line) => `      ${line}`)
    .join('\n');
}
