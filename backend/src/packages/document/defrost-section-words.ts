import type { Text } from '#shared/checklist/text';

/** The words of the defrost plan's section that it doesn't share with the screen. */
export const SECTION_WORDS = {
  title: { en: 'Defrost plan', es: 'Plan de deshielo' },
  saved: { en: 'Saved as version', es: 'Guardado como versión' },
  by: { en: 'by', es: 'por' },
  keyOfChart: {
    en: 'Filled: defrost, up to its fail-safe time. Open: drip. Hatched ground: quiet hours. Wedge and heavy outline: breaks a rule.',
    es: 'Lleno: deshielo, hasta su tiempo máximo de seguridad. Abierto: escurrido. Fondo rayado: horas sin deshielo. Cuña y contorno grueso: incumple una regla.',
  },
  shareOfLoad: { en: 'Share of load in defrost', es: 'Parte de la carga en deshielo' },
  shareByCount: { en: 'Share of circuits in defrost', es: 'Parte de los circuitos en deshielo' },
  heaters: { en: 'Heater demand, all groups', es: 'Demanda de resistencias, todos los grupos' },
  peak: { en: 'peak', es: 'máximo' },
  limit: { en: 'limit', es: 'límite' },
  noLimit: { en: 'no limit', es: 'sin límite' },
  starts: { en: 'Starts', es: 'Inicios' },
  lasts: { en: 'Defrost + drip', es: 'Deshielo + escurrido' },
  rules: { en: 'Rules', es: 'Reglas' },
  rulesNote: {
    en: 'Nobody has published figures for staggering defrosts. Those below are the lead’s; where nothing else is agreed, common practice.',
    es: 'Nadie ha publicado cifras para escalonar deshielos. Las siguientes son del responsable; donde no se acordó otra cosa, práctica común.',
  },
  leastGap: { en: 'Least time between starts of a group', es: 'Tiempo mínimo entre inicios de un grupo' },
  largestShare: { en: 'Largest share of load in defrost', es: 'Mayor parte de la carga en deshielo' },
  largestHotGas: {
    en: 'Largest share of hot-gas circuits in defrost',
    es: 'Mayor parte de circuitos de gas caliente en deshielo',
  },
  leastRunning: {
    en: 'Least load running for hot gas',
    es: 'Carga mínima en marcha para gas caliente',
  },
  largestHeaters: { en: 'Largest heater demand', es: 'Mayor demanda de resistencias' },
  quietHours: { en: 'Quiet hours', es: 'Horas sin deshielo' },
  none: { en: 'none', es: 'ninguna' },
  breaches: { en: 'Rules that this plan breaks', es: 'Reglas que este plan incumple' },
  noBreach: { en: 'This plan breaks none of its rules.', es: 'Este plan cumple todas sus reglas.' },
  notes: { en: 'To know', es: 'Para saber' },
  noStart: { en: 'none', es: 'ninguno' },
} as const satisfies Record<string, Text>;
