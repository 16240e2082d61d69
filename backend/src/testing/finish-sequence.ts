import type { EntryResult } from '#shared/contracts/sequences';
import type { SequenceId } from '#shared/plant/ids';
import { demoAnswer } from '../demo/demo-answer';
import { drawDemoPhoto } from '../demo/demo-photo';
import type { TestClient } from './test-client';

/** Answers every required step within its limits, photos included; then submits. */
export async function finishSequence(
  client: TestClient,
  id: SequenceId,
  random: () => number,
  superheatExcessK = 0,
): Promise<EntryResult[]> {
  const detail = await client.sequence(id);
  const photo = async () => {
    const bytes = await drawDemoPhoto(random, 160);
    const response = await client.addPhoto(id, bytes);
    return {
      sha256: response.body.sha256 as string,
      originalSha256: null,
      bytes: bytes.length,
      width: 160,
      height: 120,
      capturedAt: null,
    };
  };
  const { specification } = detail;
  const scene = {
    specification,
    facts: detail.stepList.facts,
    author: 'Test',
    random,
    photo,
    superheatExcessK,
  };
  const bodies = [];
  for (const step of detail.stepList.steps.filter((candidate) => candidate.required)) {
    const known = detail.fold.steps[step.key]?.entryId ?? null;
    bodies.push(client.answer(detail, step, await demoAnswer(step, scene), known));
  }
  return client.post([...bodies, client.submission(id)]);
}
