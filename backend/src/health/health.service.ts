import type { Health } from '#shared/contracts/health';
import { TemporaryFailure } from '#shared/failures/failure';

/** One part that the product can't do without, and how to ask whether it answers. */
export type Probe = () => Promise<unknown>;

const TIMEOUT_MS = 3_000;

export class HealthService {
  constructor(private readonly probes: Readonly<Record<keyof Health['parts'], Probe>>) {}

  async check(): Promise<Health> {
    const [database, files, mail] = await Promise.all([
      ask(this.probes.database),
      ask(this.probes.files),
      ask(this.probes.mail),
    ]);
    return { up: database.up && files.up && mail.up, parts: { database, files, mail } };
  }
}

async function ask(probe: Probe): Promise<Health['parts']['database']> {
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<never>((_resolve, reject) => {
    timer = setTimeout(() => reject(new TemporaryFailure('No answer in 3 seconds')), TIMEOUT_MS);
  });
  try {
    await Promise.race([probe(), late]);
    return { up: true, reason: null };
  } catch (error) {
    // Whatever a driver throws here is the reason that the caller asked for.
    return { up: false, reason: error instanceof Error ? error.message : String(error) };
  } finally {
    clearTimeout(timer);
  }
}
