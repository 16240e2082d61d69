import type { Judgement } from '#shared/checklist/judgement';
import type { SuperheatAnswer, SuperheatObservation, SuperheatPair } from '#shared/checklist/kinds/superheat';
import { unreachable } from '#shared/failures/unreachable';
import type { StepOf } from '#shared/checklist/step';
import type { FoldEntry } from '#shared/sequences/fold';
import { gap, kept, type Block } from '../../pdf/block';
import { paragraph } from '../../pdf/paragraph';
import { STYLES } from '../../pdf/text-style';
import type { DocumentContext } from './document-context';
import { judgedOf, type CircuitContext } from './judged-entry';
import { gaugeBlock } from './reading-blocks';
import { workingBlocks, type Working, type WorkingColumn } from './working-blocks';

/** Superheat of a coil: the value as left on its strip, how the valve behaved, and the whole working as a slip. */
export function superheatBlocks(
  circuit: CircuitContext,
  entry: FoldEntry,
  step: StepOf<'superheat'>,
): Block[] {
  const { content } = entry.body;
  if (content.kind !== 'answer' || content.answer.kind !== 'superheat') return [];
  const judged = judgedOf(entry);
  if (!judged) return [];
  const { answer } = content;
  // A result and how it was worked out are read together: they never stand on two pages.
  return kept([
    ...resultBlocks(circuit, answer, judged, step.judgedBy === 'timeWeighted'),
    gap(3),
    ...slipsOf(circuit.context, answer, judged.working).flatMap((columns) => [
      ...workingBlocks(circuit.context, columns),
      gap(2),
    ]),
  ]);
}

function resultBlocks(
  circuit: CircuitContext,
  answer: SuperheatAnswer,
  judged: Judgement,
  byTime: boolean,
): Block[] {
  const { sheet, words, format } = circuit.context;
  const figure = (label: string): number | null =>
    judged.figures.find((one) => one.label === label)?.value ?? null;
  const value = figure('superheat');
  if (value === null) return [];
  const low = figure('superheatLow');
  const high = figure('superheatHigh');
  const hunting = low !== null && high !== null ? { low, high } : null;
  const asFound = figure('superheatAsFound');
  const saturation = figure('saturation');
  const difference = (kelvins: number): string => format.ofDimension(kelvins, 'temperatureDifference');
  const facts = [
    hunting === null
      ? words.superheat.steady
      : words.superheat.hunting(difference(hunting.low), difference(hunting.high), byTime),
    saturation === null ? '' : words.superheat.saturation(format.ofDimension(saturation, 'temperature')),
    asFound === null ? words.superheat.notAsFound : words.superheat.wasFound(difference(asFound)),
    ...circumstances(circuit.context, answer, judged),
  ];
  const { limit } = judged;
  return kept([
    gaugeBlock(circuit, {
      figures: { value, low: limit?.low ?? null, high: limit?.high ?? null, hunting, asFound },
      dimension: 'temperatureDifference',
      isOutside: judged.outcome === 'outside',
    }),
    ...paragraph(sheet, facts.filter((fact) => fact !== '').join(' · '), STYLES.body),
  ]);
}

/** How it was read and what was done to the valve, as far as it was said. */
function circumstances(context: DocumentContext, answer: SuperheatAnswer, judged: Judgement): string[] {
  const { words, format } = context;
  const { superheat } = words;
  const figure = (label: string): string | null => {
    const found = judged.figures.find((one) => one.label === label);
    return found ? format.quantity(found.value, found.unit) : null;
  };
  const timeWeighted = figure('superheatTimeWeighted');
  const error = figure('superheatUncertainty');
  const { asLeft, turns = [], clockwise, takenAt, lineDrop, instruments } = answer;
  return [
    ...(asLeft.valve === 'series'
      ? [superheat.series(asLeft.readings.length, lastedFor(context, asLeft))]
      : []),
    ...(asLeft.valve === 'log' ? [superheat.log(asLeft.file.name, asLeft.file.rows)] : []),
    ...(timeWeighted === null ? [] : [superheat.timeWeighted(timeWeighted)]),
    ...(turns.length === 0
      ? []
      : [superheat.turns(turns.map((one) => superheat.turn(String(one.turns), one.direction)).join(', '))]),
    ...(clockwise ? [superheat.sheet(clockwise === 'raisesSuperheat')] : []),
    ...(takenAt === 'elsewhere' && lineDrop ? [superheat.elsewhere(format.typed(lineDrop))] : []),
    ...(instruments ? [superheat.gauges[instruments.gauge]] : []),
    ...(error === null ? [] : [superheat.error(error)]),
  ];
}

function lastedFor({ format }: DocumentContext, series: SuperheatObservation & { valve: 'series' }): string {
  const first = series.readings[0]?.atS ?? 0;
  return format.ofDimension((series.readings.at(-1)?.atS ?? first) - first, 'duration');
}

/**
 * The slips of an answer: all single pairs side by side on one, each working of a series on its own, the instruments'
 * error last. Judging writes the workings of the value as left first; an observation that couldn't be read has none.
 */
function slipsOf(
  context: DocumentContext,
  answer: SuperheatAnswer,
  workings: readonly Working[],
): WorkingColumn[][] {
  const { words } = context;
  const errors = workings.filter(isOfError);
  const others = workings.filter((working) => !isOfError(working));
  const leftCount = workingCount(answer.asLeft);
  const looks = [
    ...(answer.asFound
      ? [{ look: answer.asFound, name: words.superheat.asFound, own: others.slice(leftCount) }]
      : []),
    { look: answer.asLeft, name: words.superheat.asLeft, own: others.slice(0, leftCount) },
  ].map(({ look, name, own }) => ({
    isSeries: look.valve === 'series' || look.valve === 'log',
    name,
    own,
    columns: observationColumns(context, look, name).map((column, index) => ({
      ...column,
      working: own.length === workingCount(look) ? own[index] : undefined,
    })),
  }));
  const pairs = looks.filter(({ isSeries }) => !isSeries).flatMap(({ columns }) => columns);
  const series = looks.filter(({ isSeries }) => isSeries);
  return [
    ...(pairs.length > 0 ? [pairs] : []),
    ...series.flatMap(({ name, own }) => own.map((working) => [{ title: name, typed: {}, working }])),
    ...errors.map((working) => [{ title: words.superheat.asLeft, typed: {}, working }]),
  ];
}

const isOfError = ({ formula }: Working): boolean => formula === 'superheatUncertainty';

/** How many workings judging writes for a look that it can read: a series has its readings and what they give. */
const workingCount = ({ valve }: SuperheatObservation): number => (valve === 'steady' ? 1 : 2);

function observationColumns(
  context: DocumentContext,
  observation: SuperheatObservation,
  name: string,
): WorkingColumn[] {
  const { words, format } = context;
  const column = (title: string, pair: SuperheatPair): WorkingColumn => ({
    title,
    typed: { suctionPressure: format.typed(pair.pressure), lineTemperature: format.typed(pair.temperature) },
    working: undefined,
  });
  switch (observation.valve) {
    case 'steady':
      return [column(name, observation.pair)];
    case 'hunting':
      return [
        column(words.superheat.low(name), observation.low),
        column(words.superheat.high(name), observation.high),
      ];
    case 'series':
    case 'log':
      return [{ title: name, typed: {}, working: undefined }];
    default:
      return unreachable(observation);
  }
}
