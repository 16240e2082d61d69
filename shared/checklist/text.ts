import * as z from 'zod/mini';

export const LANGUAGES = ['en', 'es'] as const;
export type Language = (typeof LANGUAGES)[number];

/** Words of a template, side by side in both languages: a phone may switch languages without asking the server. */
export const textSchema = z.object({ en: z.string(), es: z.string() });
export type Text = z.infer<typeof textSchema>;

export const HAZARDS = [
  'pressure',
  'electricity',
  'asphyxiation',
  'co2',
  'flammable',
  'cold',
  'rotating',
  'height',
] as const;
export type Hazard = (typeof HAZARDS)[number];

/** A caution belongs to the step where the danger is; the hazard's name stands before the sentence. */
export const cautionSchema = z.object({ hazard: z.enum(HAZARDS), text: textSchema });
export type Caution = z.infer<typeof cautionSchema>;
