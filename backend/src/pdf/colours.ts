/** The product's colours on white paper, each readable as text except `copperLine` and `rule`, which are for lines. */
export const COLOURS = {
  ink: '#16332D',
  inkSoft: '#4C625C',
  copper: '#9A4F24',
  copperLine: '#C8743C',
  frost: '#1F6484',
  plum: '#7C1F4B',
  ochre: '#7A5600',
  rule: '#8C8471',
  /** Hairlines between rows: they lead the eye and carry no meaning. */
  faintRule: '#CFC9BA',
  /** Ground of a strip's channel. */
  channel: '#F6E7DB',
  white: '#FFFFFF',
} as const;

export type Colour = (typeof COLOURS)[keyof typeof COLOURS];
