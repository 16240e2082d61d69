import type { SavedDefrostPlan } from '#shared/contracts/defrost-plans';
import {
  breachInWords,
  clockText,
  noteInWords,
  percentText,
  type DefrostSpeech,
} from '#shared/contracts/defrost-words';
import { formatQuantity } from '#shared/units/format';
import { gap, type Block } from '../../pdf/block';
import { factGrid } from '../../pdf/fact-grid';
import { drawOutcomeMark } from '../../pdf/outcome-mark';
import { PAGE, TEXT_WIDTH } from '../../pdf/page-geometry';
import { paragraph } from '../../pdf/paragraph';
import { ruledTable } from '../../pdf/ruled-table';
import { STYLES } from '../../pdf/text-style';
import { defrostChartBlocks, startsText } from './defrost-chart-blocks';
import { SECTION_WORDS as WORDS } from './defrost-section-words';
import { beginChapter, DEFROST_KEY, say, type DocumentContext } from './document-context';

/** The defrost plan that counted when the package was asked for; nothing when there was none. */
export async function drawDefrostPlan(context: DocumentContext): Promise<void> {
  const { sheet, content, format } = context;
  const saved = content.defrostPlan;
  if (!saved) return;
  const title = say(context, WORDS.title);
  const version = `${say(context, WORDS.saved)} ${saved.version} ${say(context, WORDS.by)} ${saved.createdByName}, ${format.dateTime(saved.createdAt)}`;
  sheet.newPage();
  sheet.runningHead = title;
  sheet.openPart('Sect');
  beginChapter(context, DEFROST_KEY, title);
  await sheet.place([
    ...paragraph(sheet, title, STYLES.chapter, { tag: 'H1' }),
    ...paragraph(sheet, version, STYLES.small),
    gap(8),
  ]);
  await sheet.place(findingBlocks(context, saved));
  await sheet.place(paragraph(sheet, say(context, WORDS.keyOfChart), STYLES.small));
  await sheet.place([gap(6), ...defrostChartBlocks(context, saved)]);
  await sheet.place(ruleBlocks(context, saved));
  await sheet.place(startBlocks(context, saved));
  sheet.closePart();
  sheet.runningHead = null;
}

function findingBlocks(context: DocumentContext, saved: SavedDefrostPlan): Block[] {
  const { sheet } = context;
  const speech = speechOf(context, saved);
  const sentences = saved.breaches.map((breach) => breachInWords(breach, speech));
  const notes = saved.notes.map((note) => noteInWords(note, speech));
  const ornament = (page: typeof sheet, baseline: number): void =>
    drawOutcomeMark(page, PAGE.left + 5, baseline - 3, 'outside', 'high');
  const indent = { x: PAGE.left + 16, width: TEXT_WIDTH - 16 };
  const breaches =
    sentences.length === 0
      ? paragraph(sheet, say(context, WORDS.noBreach), STYLES.strong)
      : [
          ...paragraph(sheet, say(context, WORDS.breaches), STYLES.step, { tag: 'H2' }),
          ...sentences.flatMap((text) => paragraph(sheet, text, STYLES.body, { ...indent, ornament })),
        ];
  const known =
    notes.length === 0
      ? []
      : [
          gap(6),
          ...paragraph(sheet, say(context, WORDS.notes), STYLES.step, { tag: 'H2' }),
          ...notes.flatMap((text) => paragraph(sheet, text, STYLES.small)),
        ];
  return [...breaches, ...known, gap(8)];
}

function ruleBlocks(context: DocumentContext, { rules }: SavedDefrostPlan): Block[] {
  const { sheet, format, language } = context;
  const fact = (label: keyof typeof WORDS, value: string) => ({ label: say(context, WORDS[label]), value });
  const none = say(context, WORDS.none);
  const running = [
    ...(rules.leastRunningLoadForHotGasW === null
      ? []
      : [format.ofDimension(rules.leastRunningLoadForHotGasW, 'heatFlow')]),
    ...(rules.leastRunningShareForHotGas === null
      ? []
      : [percentText(rules.leastRunningShareForHotGas, language)]),
  ].join(', ');
  const quiet = rules.quietHours.map(({ fromS, toS }) => `${clockText(fromS)}–${clockText(toS)}`).join(', ');
  const heaters = rules.largestHeaterDemandW;
  return [
    gap(12),
    ...paragraph(sheet, say(context, WORDS.rules), STYLES.section, { tag: 'H2' }),
    ...paragraph(sheet, say(context, WORDS.rulesNote), STYLES.small, { keepWithNext: true }),
    { ...gap(4), keepWithNext: true },
    ...factGrid(
      sheet,
      [
        fact('largestShare', percentText(rules.largestShareOfLoad, language)),
        fact('largestHotGas', percentText(rules.largestShareInHotGas, language)),
        fact('leastGap', formatQuantity(rules.leastGapBetweenStartsS, 'min', language)),
        fact('quietHours', quiet || none),
        fact('largestHeaters', heaters === null ? none : formatQuantity(heaters, 'kW_el', language)),
        fact('leastRunning', running || none),
      ],
      2,
    ),
    gap(12),
  ];
}

function startBlocks(context: DocumentContext, saved: SavedDefrostPlan): Block[] {
  const { sheet, words, language } = context;
  const minutes = (seconds: number): string => formatQuantity(seconds, 'min', language);
  const columns = [
    { title: words.columns.circuit, share: 14, style: STYLES.mono },
    { title: words.facts.suctionGroup, share: 12 },
    { title: words.facts.defrost, share: 18 },
    { title: say(context, WORDS.lasts), share: 26, style: STYLES.mono },
    { title: say(context, WORDS.starts), share: 38, style: STYLES.mono },
  ];
  const rows = saved.circuits.map((circuit) => {
    const isNone = circuit.type === 'none';
    const drip = circuit.dripS > 0 ? ` + ${minutes(circuit.dripS)}` : '';
    return [
      { text: circuit.code },
      { text: circuit.groupName },
      { text: words.defrosts[circuit.type] },
      { text: isNone ? '—' : `${minutes(circuit.durationS)}${drip}` },
      { text: startsText(saved.plan, circuit.id) || (isNone ? '—' : say(context, WORDS.noStart)) },
    ];
  });
  return [
    ...paragraph(sheet, say(context, WORDS.starts), STYLES.section, { tag: 'H2' }),
    ...ruledTable(sheet, columns, rows, { hasRowHeads: true, padding: 2.5 }),
  ];
}

function speechOf({ language, content }: DocumentContext, saved: SavedDefrostPlan): DefrostSpeech {
  const codes = new Map<string, string>(saved.circuits.map(({ id, code }) => [id, code]));
  return {
    language,
    unitSystem: content.opening.unitSystem,
    rules: saved.rules,
    codeOf: (id) => codes.get(id) ?? id,
  };
}
