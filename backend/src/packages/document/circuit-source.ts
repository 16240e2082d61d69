import type { SequenceDetail } from '#shared/contracts/sequences';
import { TemporaryFailure } from '#shared/failures/failure';
import type { SequenceId } from '#shared/plant/ids';
import type { PackageContent } from './package-content';

interface Seen {
  readonly position: number;
  readonly stepListHash: string;
}

/**
 * Loads circuits so that both passes see the same: an entry that arrives between them is left for the next package,
 * because the page numbers already rest on those before it.
 */
export class CircuitSource {
  private readonly seen = new Map<SequenceId, Seen>();

  constructor(private readonly content: PackageContent) {}

  /**
   * @throws {TemporaryFailure} when the circuit's steps changed meanwhile, which a new attempt puts right
   */
  async load(sequenceId: SequenceId): Promise<SequenceDetail> {
    const detail = await this.content.loadCircuit(sequenceId);
    const known = this.seen.get(sequenceId);
    if (!known) {
      const position = detail.entries.at(-1)?.server.position ?? 0;
      this.seen.set(sequenceId, { position, stepListHash: detail.stepListHash });
      return detail;
    }
    if (known.stepListHash !== detail.stepListHash) {
      throw new TemporaryFailure('The steps of a circuit changed while the package was being built');
    }
    return { ...detail, entries: detail.entries.filter((entry) => entry.server.position <= known.position) };
  }
}
