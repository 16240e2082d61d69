import { createHash } from 'node:crypto';
import { Jimp } from 'jimp';
import { judge } from '#shared/checklist/judge';
import type { PhotoRef } from '#shared/checklist/kinds/photo';
import type { Answer, Step, StepList } from '#shared/checklist/step';
import type { SequenceDetail } from '#shared/contracts/sequences';
import type { PackageId, SequenceId } from '#shared/plant/ids';
import { bodyHash, chainHash, CHAIN_START } from '#shared/sequences/chain';
import type { EntryBody, EntryContent, Standing, StoredEntry } from '#shared/sequences/entry';
import { foldEntries } from '#shared/sequences/fold';
import { sha256OfJson } from '#shared/sequences/sha256';
import type { PackageCircuitRef, PackageContent } from './package-content';
import { both, PEOPLE, SIGNATURE, specification, stepList, uuid } from './package-steps.fixture';

/** Appends entries to one circuit's chain as the server would. */
export class CircuitBuilder {
  readonly entries: StoredEntry[] = [];
  readonly photos: SequenceDetail['photos'] = [];
  private minutes = 0;

  constructor(
    readonly number: number,
    readonly code: string,
    readonly description: string,
    readonly steps: StepList = stepList(number),
  ) {
    this.append(
      {
        kind: 'expansion',
        templateKey: 'case',
        templateVersion: 4,
        specificationRevision: 2,
        stepListHash: sha256OfJson(this.steps),
        changedSteps: [],
      },
      { by: PEOPLE.lead.id },
    );
  }

  get sequenceId(): SequenceId {
    return uuid('5e', this.number) as SequenceId;
  }

  answer(stepKey: string, answer: Answer, options: { standing?: Standing } = {}): this {
    const step = this.steps.steps.find((candidate) => candidate.key === stepKey);
    const judgement = judge(step as Step, answer, this.steps.facts);
    const { outcome, counts, figures } = judgement;
    return this.append(
      { kind: 'answer', stepKey, answer, workedOut: { outcome, counts, figures } },
      { ...options, judgement },
    );
  }

  append(
    content: EntryContent,
    options: { by?: string; standing?: Standing; judgement?: StoredEntry['server']['judgement'] } = {},
  ): this {
    this.minutes += 4;
    const time = new Date(Date.UTC(2026, 10, 24, 15, this.minutes)).toISOString();
    const position = this.entries.length + 1;
    const id = uuid(`e${this.number}`, position);
    const stepKey = content.kind === 'answer' || content.kind === 'notApplicable' ? content.stepKey : null;
    const earlier = this.entries.filter(
      ({ body }) =>
        (body.content.kind === 'answer' || body.content.kind === 'notApplicable') &&
        body.content.stepKey === stepKey,
    );
    const body = {
      format: 1,
      id,
      sequenceId: this.sequenceId,
      authorId: options.by ?? PEOPLE.installer.id,
      deviceId: null,
      deviceCount: 0,
      countOnSequence: 0,
      deviceTime: time,
      stepListHash: null,
      supersedes: earlier.at(-1)?.body.id ?? null,
      content,
    } as unknown as EntryBody;
    const before = {
      position,
      standing: options.standing ?? ('inOrder' as const),
      judgement: options.judgement ?? null,
    };
    const unsent = { body, server: before, hash: null };
    const server = {
      position,
      standing: options.standing ?? ('inOrder' as const),
      receivedAt: position % 5 === 0 ? new Date(Date.parse(time) + 5_400_000).toISOString() : time,
      judgement: options.judgement ?? null,
      judgingVersion: 1,
      stateAfter: foldEntries([...this.entries, unsent], this.steps.steps).state,
    };
    const previousHash = this.entries.at(-1)?.hash ?? CHAIN_START;
    const hash = chainHash(previousHash, bodyHash(body), server);
    this.entries.push({ body, bodyHash: bodyHash(body), server, previousHash, hash });
    return this;
  }

  review(verdict: 'approved' | 'sentBack', remarks: { stepKey: string; text: string }[] = []): this {
    const signature = verdict === 'approved' ? { ...SIGNATURE, printedName: PEOPLE.lead.name } : null;
    const meaning =
      verdict === 'approved'
        ? both('I looked at every step and answer for it.', 'Vi cada paso y respondo por ello.')
        : null;
    const headHash = this.entries.at(-1)?.hash ?? CHAIN_START;
    return this.append(
      { kind: 'review', verdict, headHash, remarks, signature, meaning },
      { by: PEOPLE.lead.id },
    );
  }

  detail(): SequenceDetail {
    return {
      id: this.sequenceId,
      openingId: uuid('01', 1),
      openingName: 'Willow Bend',
      timeZone: 'America/Chicago',
      specification: specification(this.number, this.code, this.description),
      stepList: this.steps,
      stepListHash: sha256OfJson(this.steps),
      fold: foldEntries(this.entries, this.steps.steps),
      entries: this.entries,
      people: Object.values(PEOPLE),
      photos: this.photos,
    } as unknown as SequenceDetail;
  }

  reference(): PackageCircuitRef {
    return {
      sequenceId: this.sequenceId,
      level: 'circuit',
      code: this.code,
      description: this.description,
      systemName: 'Rack A',
      state: foldEntries(this.entries, this.steps.steps).state,
    };
  }
}

const typed = <U extends string>(text: string, unit: U): { text: string; unit: U } => ({ text, unit });
export const pair = (psig: string, degF: string) => ({
  pressure: typed(psig, 'psig' as const),
  temperature: typed(degF, 'degF' as const),
});

/** Everything that a good circuit has; `photos` are told, not stored. */
export function recordAll(circuit: CircuitBuilder, photos: PhotoRef[], note: string): CircuitBuilder {
  return circuit
    .answer('fans', { kind: 'confirm', confirmed: true })
    .answer('drain', { kind: 'choose', value: 'clear' })
    .answer('hold', { kind: 'override', phase: 'set', remark: 'For pull-down' })
    .answer('air', { kind: 'reading', value: typed('-2.5', 'degC') })
    .answer('fanAmps', { kind: 'reading', value: typed('1.9', 'A') })
    .answer('length', { kind: 'reading', value: typed('18', 'in') })
    .answer('superheat', {
      kind: 'superheat',
      asFound: { valve: 'steady', pair: pair('50.0', '45') },
      asLeft: { valve: 'hunting', low: pair('50.0', '29'), high: pair('50.0', '34') },
    })
    .append({ kind: 'notApplicable', stepKey: 'heater', reason: 'Open case, there is no door' })
    .answer('photos', { kind: 'photo', photos })
    .answer('note', { kind: 'note', text: note })
    .answer('hold', { kind: 'override', phase: 'putBack', remark: '' })
    .answer('signature', { kind: 'signature', signature: SIGNATURE })
    .append({ kind: 'submission', restsOn: [] });
}

/** A small picture with a name of its own. */
export async function madePhoto(
  width: number,
  height: number,
  seed: number,
): Promise<{ ref: PhotoRef; bytes: Buffer }> {
  const image = new Jimp({ width, height, color: 0x8fa39bff });
  for (let x = 0; x < width; x += 1) {
    const y = Math.floor(height / 2 + Math.sin((x + seed * 9) / 18) * height * 0.3);
    for (let thick = 0; thick < 9; thick += 1)
      image.setPixelColor(0xc8743cff, x, Math.min(height - 1, Math.max(0, y + thick)));
  }
  const bytes = await image.getBuffer('image/jpeg');
  const sha256 = createHash('sha256').update(bytes).update(String(seed)).digest('hex');
  return {
    ref: {
      sha256,
      originalSha256: null,
      bytes: bytes.length,
      width,
      height,
      capturedAt: '2026-11-24T15:20:00.000Z',
    },
    bytes,
  };
}

/** The opening around circuits that are there, and circuits that have no checklist. */
export function packageOf(
  circuits: readonly CircuitBuilder[],
  photos: ReadonlyMap<string, Buffer>,
  language: 'en' | 'es' = 'en',
): PackageContent {
  const details = new Map(circuits.map((circuit) => [circuit.sequenceId, circuit.detail()]));
  const references = circuits.map((circuit) => circuit.reference());
  return {
    opening: {
      name: 'Willow Bend',
      address: '2210 Quarry Street, Larkfield',
      openingDate: '2026-12-10',
      timeZone: 'America/Chicago',
      elevationM: 452,
      unitSystem: 'us',
      contractorName: 'Harrow & Finch Builders',
      companyName: 'Coldbrook Refrigeration',
    },
    package: {
      id: uuid('9a', 1) as PackageId,
      version: 3,
      language,
      createdAt: '2026-11-30T18:04:00.000Z',
      createdByName: PEOPLE.lead.name,
    },
    installation: { fingerprint: createHash('sha256').update('key').digest('hex') },
    summary: {
      systems: [
        {
          name: 'Rack A',
          refrigerant: 'R-448A',
          work: [],
          circuits: [
            ...references.map(({ code, description, state }) => ({
              code,
              description,
              area: 'Dairy wall',
              state,
            })),
            { code: 'A-90', description: 'Spare', area: 'Back room', state: 'noSequence' },
          ],
        },
      ],
    },
    defrostPlan: null,
    circuits: references,
    loadCircuit: async (id) => details.get(id) as SequenceDetail,
    loadPhoto: async (_id, sha256) => photos.get(sha256) ?? null,
  };
}
