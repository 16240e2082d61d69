import type { Language } from '#shared/checklist/text';
import type { Joint } from '#shared/contracts/openings';
import type {
  Control,
  DefrostType,
  EvaporatingBasis,
  Feed,
  FixtureKind,
  TemperatureClass,
  ValveKind,
} from '#shared/plant/words';
import type { Verdict } from '#shared/sequences/entry';
import type { MarkKind } from '../../pdf/outcome-mark';
import { ENGLISH } from './words-en';
import { SPANISH } from './words-es';

type Named<K extends string> = Readonly<Record<K, string>>;
type Said<A extends readonly unknown[]> = (...parts: A) => string;

/** Every word that the document adds to what was recorded; a language that lacks one doesn't compile. */
export interface DocumentWords {
  readonly title: string;
  readonly subject: string;
  readonly version: Said<[version: number]>;
  readonly page: Said<[page: number, total: number]>;
  readonly contents: string;
  readonly summary: string;
  readonly hashPage: string;
  readonly cover: Named<
    | 'openingDate'
    | 'contractor'
    | 'company'
    | 'version'
    | 'built'
    | 'elevation'
    | 'units'
    | 'complete'
    | 'incomplete'
    | 'noCircuits'
    | 'workNotApproved'
    | 'standsAbove'
  > & {
    readonly builtBy: Said<[when: string, who: string]>;
    readonly unitSystems: Named<'us' | 'si'>;
    readonly approvedCount: Said<[approved: number, total: number]>;
  };
  readonly states: Named<Joint['state']>;
  /** What a chapter is about that isn't a circuit's. */
  readonly levels: Named<'system' | 'suctionGroup'>;
  readonly columns: Named<
    | 'circuit'
    | 'work'
    | 'description'
    | 'area'
    | 'state'
    | 'page'
    | 'fixture'
    | 'evaporating'
    | 'dischargeAir'
    | 'superheat'
    | 'coils'
    | 'valve'
    | 'steps'
    | 'approvedHead'
  >;
  readonly lineAlt: Said<[name: string, approved: number, total: number]>;
  readonly circuitCount: Said<[count: number]>;
  readonly specification: string;
  readonly facts: Named<
    | 'system'
    | 'refrigerant'
    | 'suctionGroup'
    | 'suctionTemperature'
    | 'area'
    | 'temperatureClass'
    | 'feed'
    | 'control'
    | 'load'
    | 'defrost'
    | 'failSafe'
    | 'termination'
    | 'drip'
    | 'checklist'
    | 'revision'
    | 'steps'
    | 'outside'
  >;
  readonly checklistVersion: Said<[title: string, version: number]>;
  readonly stepsDone: Said<[done: number, total: number]>;
  readonly temperatureClasses: Named<TemperatureClass>;
  readonly feeds: Named<Feed>;
  readonly controls: Named<Control>;
  readonly defrosts: Named<DefrostType>;
  readonly perDay: Said<[count: number]>;
  readonly fixtureKinds: Named<FixtureKind>;
  readonly valves: Named<ValveKind>;
  readonly bases: Named<EvaporatingBasis>;
  readonly coil: Said<[number: number]>;
  readonly notStated: string;
  readonly outcomes: Named<MarkKind>;
  readonly sides: Named<'low' | 'high'>;
  readonly confirmed: string;
  /** Over the required steps of a chapter that nobody answered yet. */
  readonly stillOpen: string;
  readonly notBegun: string;
  readonly notBegunNote: string;
  readonly doesNotCount: string;
  readonly askedAgain: string;
  readonly reopened: Said<[who: string]>;
  readonly answeredTwice: string;
  readonly recordedBy: Said<[who: string, when: string]>;
  readonly received: Said<[when: string]>;
  readonly unknownPerson: string;
  readonly reason: string;
  readonly entered: Said<[value: string]>;
  readonly criterion: Said<[source: string]>;
  readonly limits: {
    readonly between: Said<[low: string, high: string]>;
    readonly atLeast: Said<[low: string]>;
    readonly atMost: Said<[high: string]>;
    readonly label: string;
  };
  readonly superheat: Named<
    'asFound' | 'asLeft' | 'notAsFound' | 'steady' | 'working' | 'formula' | 'source' | 'inFull' | 'sources'
  > & {
    readonly low: Said<[name: string]>;
    readonly high: Said<[name: string]>;
    readonly hunting: Said<[low: string, high: string, byTime: boolean]>;
    readonly saturation: Said<[value: string]>;
    readonly wasFound: Said<[value: string]>;
    readonly series: Said<[count: number, minutes: string]>;
    readonly log: Said<[file: string, rows: number]>;
    readonly turns: Said<[text: string]>;
    readonly turn: Said<[turns: string, direction: 'clockwise' | 'counterclockwise']>;
    readonly sheet: Said<[raises: boolean]>;
    readonly error: Said<[value: string]>;
    readonly elsewhere: Said<[drop: string]>;
    readonly timeWeighted: Said<[value: string]>;
    readonly gauges: Named<'vented' | 'sealed' | 'absolute'>;
  };
  readonly override: Named<'set' | 'putBack' | 'standing'>;
  readonly photo: Named<'timeUnknown' | 'awaited' | 'broken'> & {
    readonly caption: Said<[when: string, hash: string]>;
    readonly alt: Said<[title: string]>;
    readonly count: Said<[count: number]>;
  };
  readonly signature: Named<'typed' | 'asRecorder' | 'asReviewer'> & {
    readonly alt: Said<[name: string]>;
    readonly account: Said<[name: string]>;
    readonly when: Said<[when: string]>;
    readonly receivedWhen: Said<[when: string]>;
    readonly meaning: Said<[text: string]>;
  };
  readonly earlier: string;
  readonly noLongerAsked: string;
  readonly noLongerAskedNote: string;
  readonly late: string;
  readonly lateNote: string;
  readonly held: string;
  readonly heldNote: string;
  readonly reviews: string;
  readonly verdicts: Named<Verdict>;
  readonly remarks: string;
  readonly reviewedHead: Said<[hash: string]>;
  readonly noReview: string;
  readonly submission: string;
  readonly hash: Named<'intro' | 'notApproved' | 'fingerprint' | 'howTo'> & {
    readonly steps: readonly string[];
  };
}

/** The document's words in each language. */
export const DOCUMENT_WORDS: Readonly<Record<Language, DocumentWords>> = { en: ENGLISH, es: SPANISH };
