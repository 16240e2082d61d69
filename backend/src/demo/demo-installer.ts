import { createHash } from 'node:crypto';
import { uuidv7 } from 'uuidv7';
import { judge } from '#shared/checklist/judge';
import type { PhotoRef } from '#shared/checklist/kinds/photo';
import type { Step } from '#shared/checklist/step';
import type { DeviceId, EntryId, SequenceId } from '#shared/plant/ids';
import { bodyHash } from '#shared/sequences/chain';
import type { EntryBody, EntryContent } from '#shared/sequences/entry';
import type { Services } from '../app/services';
import type { Caller } from '../http/define-route';
import { demoAnswer, type DemoScene } from './demo-answer';
import { drawDemoPhoto } from './demo-photo';

/** How far a demo circuit is worked on. */
export interface DemoWork {
  /** The share of its steps that are done, in working order. */
  readonly share: number;
  readonly submit: boolean;
  readonly superheatExcessK?: number;
}

/** An installer with a phone, who records what a careful one would, through the very services that phones talk to. */
export class DemoInstaller {
  private deviceCount: number;
  private readonly onSequence = new Map<SequenceId, number>();

  private constructor(
    private readonly services: Services,
    private readonly caller: Caller,
    private readonly deviceId: DeviceId,
    private readonly random: () => number,
    private clock: Date,
  ) {
    this.deviceCount = 0;
  }

  static async begin(
    services: Services,
    caller: Caller,
    random: () => number,
    startsAt: Date,
  ): Promise<DemoInstaller> {
    const { response } = await services.sessions.registerDevice(caller.person, null, 'Demo phone');
    const own = { ...caller, deviceId: response.deviceId };
    return new DemoInstaller(services, own, response.deviceId, random, startsAt);
  }

  /** Works through a circuit's steps; answers only what isn't done. */
  async work(sequenceId: SequenceId, plan: DemoWork): Promise<void> {
    const detail = await this.services.sequences.show(sequenceId);
    const { steps, facts } = detail.stepList;
    const scene: DemoScene = {
      specification: detail.specification,
      facts,
      author: this.caller.personName,
      random: this.random,
      photo: () => this.takePhoto(sequenceId),
      ...(plan.superheatExcessK === undefined ? {} : { superheatExcessK: plan.superheatExcessK }),
    };
    const contents: EntryContent[] = [];
    for (const step of steps.slice(0, Math.ceil(steps.length * plan.share))) {
      contents.push(...(await this.recordings(step, scene)));
    }
    await this.send(sequenceId, detail.stepListHash, contents, new Map());
    if (plan.submit) await this.submit(sequenceId, detail.stepListHash);
  }

  async submit(sequenceId: SequenceId, stepListHash: string): Promise<void> {
    const count = this.onSequence.get(sequenceId) ?? 0;
    const content: EntryContent = { kind: 'submission', restsOn: [{ deviceId: this.deviceId, count }] };
    await this.send(sequenceId, stepListHash, [content], new Map());
  }

  private async recordings(step: Step, scene: DemoScene): Promise<EntryContent[]> {
    // A step that isn't required is left open more often than not, as on site.
    if (!step.required && this.random() < 0.6) return [];
    const answer = await demoAnswer(step, scene);
    const content = (recorded: typeof answer): EntryContent => {
      const { outcome, counts, figures } = judge(step, recorded, scene.facts);
      return { kind: 'answer', stepKey: step.key, answer: recorded, workedOut: { outcome, counts, figures } };
    };
    if (answer.kind !== 'override') return [content(answer)];
    return [content({ ...answer, phase: 'set' }), content(answer)];
  }

  private async takePhoto(sequenceId: SequenceId): Promise<PhotoRef> {
    const bytes = await drawDemoPhoto(this.random);
    const sha256 = createHash('sha256').update(bytes).digest('hex');
    await this.services.photos.add(this.caller, sequenceId, sha256, bytes);
    return {
      sha256,
      originalSha256: null,
      bytes: bytes.length,
      width: 800,
      height: 600,
      capturedAt: this.clock.toISOString(),
    };
  }

  private async send(
    sequenceId: SequenceId,
    stepListHash: string,
    contents: readonly EntryContent[],
    latest: Map<string, EntryId>,
  ): Promise<void> {
    const bodies = contents.map((content) => this.body(sequenceId, stepListHash, content, latest));
    for (let at = 0; at < bodies.length; at += 25) {
      const batch = bodies.slice(at, at + 25).map((body) => ({ body, bodyHash: bodyHash(body) }));
      await this.services.entries.append(this.caller, batch);
    }
  }

  private body(
    sequenceId: SequenceId,
    stepListHash: string,
    content: EntryContent,
    latest: Map<string, EntryId>,
  ): EntryBody {
    this.deviceCount += 1;
    const countOnSequence = (this.onSequence.get(sequenceId) ?? 0) + 1;
    this.onSequence.set(sequenceId, countOnSequence);
    this.clock = new Date(this.clock.getTime() + 60_000 + Math.floor(this.random() * 240_000));
    const id = uuidv7() as EntryId;
    const key = 'stepKey' in content ? content.stepKey : null;
    const supersedes = key === null ? null : (latest.get(key) ?? null);
    if (key !== null) latest.set(key, id);
    return {
      format: 1,
      id,
      sequenceId,
      authorId: this.caller.person.id,
      deviceId: this.deviceId,
      deviceCount: this.deviceCount,
      countOnSequence,
      deviceTime: this.clock.toISOString(),
      stepListHash,
      supersedes,
      content,
    };
  }
}
