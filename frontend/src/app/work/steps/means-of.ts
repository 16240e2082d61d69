import type { Judgement } from '#shared/checklist/judgement';
import type { SuperheatStep } from '#shared/checklist/kinds/superheat';
import { formatQuantity } from '#shared/units/format';
import { UNITS, type Dimension } from '#shared/units/unit';
import { displayUnit, type UnitSystem } from '#shared/units/unit-system';

export interface MeanLine {
  readonly label: string;
  readonly value: number;
  readonly dimension: Dimension;
  /** Whether this is the mean that is held against the band. */
  readonly isJudged: boolean;
}

const SWING = ['superheatLow', 'superheatHigh', 'amplitude', 'period'];

/**
 * The means of a series with its swing. Where both averages read the same there is one line of them: two of the same would
 * only puzzle.
 *
 * @returns nothing for a single pair and for a valve typed by its lowest and highest, which the strip shows whole
 */
export function meansOf(judgement: Judgement | null, step: SuperheatStep, system: UnitSystem): MeanLine[] {
  const figures = judgement?.figures ?? [];
  const named = (label: string) => figures.find((figure) => figure.label === label);
  const weighted = named('superheatTimeWeighted');
  const midpoint = named('superheatMidpoint');
  if (!weighted || !midpoint) return [];
  const isWeightedJudged = step.judgedBy === 'timeWeighted';
  const shown = (value: number): string =>
    formatQuantity(value, displayUnit('temperatureDifference', system), 'en');
  const isSame = shown(weighted.value) === shown(midpoint.value);
  const line = ({ label, value, unit }: (typeof figures)[number], isJudged: boolean): MeanLine => ({
    label,
    value,
    dimension: UNITS[unit].dimension,
    isJudged,
  });
  const means = [line(weighted, isWeightedJudged), line(midpoint, !isWeightedJudged)];
  return [
    ...(isSame ? means.filter(({ isJudged }) => isJudged) : means),
    ...SWING.flatMap((label) => named(label) ?? []).map((figure) => line(figure, false)),
  ];
}
