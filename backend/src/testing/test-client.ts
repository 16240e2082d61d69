import { createHash } from 'node:crypto';
import request, { type Agent, type Response } from 'supertest';
import { uuidv7 } from 'uuidv7';
import { judge } from '#shared/checklist/judge';
import type { Answer, Step } from '#shared/checklist/step';
import type { Me } from '#shared/contracts/session';
import type { EntryResult, SequenceDetail } from '#shared/contracts/sequences';
import type { DeviceId, EntryId, SequenceId } from '#shared/plant/ids';
import { bodyHash } from '#shared/sequences/chain';
import type { EntryBody, EntryContent } from '#shared/sequences/entry';
import type { TestServer } from './test-server';

export const PASSWORD = 'fifteen characters or more';

/** A browser with cookies that talks to a test server as one person. */
export class TestClient {
  readonly agent: Agent;
  me: Me | null = null;
  deviceId: DeviceId | null = null;
  private deviceCount = 0;
  private readonly onSequence = new Map<string, number>();

  constructor(readonly testServer: TestServer) {
    this.agent = request.agent(testServer.server);
  }

  get(path: string) {
    return this.agent.get(path);
  }

  /** A write with the token that Angular would copy from its cookie. */
  async send(method: 'post' | 'put' | 'delete', path: string, body?: object): Promise<Response> {
    const token = await this.token();
    const call = this.agent[method](path).set('X-XSRF-TOKEN', token);
    return body === undefined ? call : call.send(body);
  }

  async upload(
    method: 'post' | 'put',
    path: string,
    field: string,
    bytes: Buffer,
    name: string,
  ): Promise<Response> {
    return this.agent[method](path)
      .set('X-XSRF-TOKEN', await this.token())
      .attach(field, bytes, name);
  }

  async token(): Promise<string> {
    const jar = (
      this.agent as unknown as {
        jar: { getCookie(name: string, access: object): { value: string } | undefined };
      }
    ).jar;
    const access = { domain: '127.0.0.1', path: '/', secure: false, script: true };
    const known = jar.getCookie('XSRF-TOKEN', access);
    if (known) return known.value;
    await this.agent.get('/api/session');
    return jar.getCookie('XSRF-TOKEN', access)?.value ?? '';
  }

  async signIn(email: string, password = PASSWORD): Promise<Response> {
    const response = await this.send('post', '/api/session', { email, password });
    if (response.status === 200) this.me = response.body as Me;
    return response;
  }

  async registerDevice(): Promise<void> {
    const response = await this.send('post', '/api/devices', { deviceId: this.deviceId, label: 'test' });
    this.deviceId = (response.body as { deviceId: DeviceId }).deviceId;
  }

  async sequence(id: SequenceId): Promise<SequenceDetail> {
    return (await this.get(`/api/sequences/${id}`)).body as SequenceDetail;
  }

  /** Makes an entry as a phone does. */
  body(sequenceId: SequenceId, content: EntryContent, supersedes: EntryId | null = null): EntryBody {
    this.deviceCount += 1;
    const countOnSequence = (this.onSequence.get(sequenceId) ?? 0) + 1;
    this.onSequence.set(sequenceId, countOnSequence);
    return {
      format: 1,
      id: uuidv7() as EntryId,
      sequenceId,
      authorId: this.me?.id as Me['id'],
      deviceId: this.deviceId,
      deviceCount: this.deviceCount,
      countOnSequence,
      deviceTime: new Date().toISOString(),
      stepListHash: null,
      supersedes,
      content,
    };
  }

  answer(detail: SequenceDetail, step: Step, answer: Answer, supersedes: EntryId | null = null): EntryBody {
    const { outcome, counts, figures } = judge(step, answer, detail.stepList.facts);
    const content: EntryContent = {
      kind: 'answer',
      stepKey: step.key,
      answer,
      workedOut: { outcome, counts, figures },
    };
    return this.body(detail.id, content, supersedes);
  }

  submission(sequenceId: SequenceId): EntryBody {
    const count = this.onSequence.get(sequenceId) ?? 0;
    return this.body(sequenceId, {
      kind: 'submission',
      restsOn: this.deviceId ? [{ deviceId: this.deviceId, count }] : [],
    });
  }

  async post(bodies: readonly EntryBody[]): Promise<EntryResult[]> {
    const response = await this.send('post', '/api/entries', {
      entries: bodies.map((body) => ({ body, bodyHash: bodyHash(body) })),
    });
    return (response.body as { results: EntryResult[] }).results;
  }

  async addPhoto(sequenceId: SequenceId, bytes: Buffer): Promise<Response> {
    const sha256 = createHash('sha256').update(bytes).digest('hex');
    return this.upload('put', `/api/sequences/${sequenceId}/photos/${sha256}`, 'photo', bytes, 'photo.jpg');
  }
}
