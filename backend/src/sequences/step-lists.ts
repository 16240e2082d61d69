import type { ExpansionDocument } from '#shared/checklist/step';
import { Bug } from '#shared/failures/failure';
import type { CompanyId } from '#shared/plant/ids';
import type { Context } from '../database/transactions';
import type { SequencesRepository } from './sequences.repository';

/** A few stores' worth; one document takes some 50 kB. */
const MAX_CACHED = 1000;

/** Expanded step lists, each with the specification it was made from, by hash. What a hash stands for never changes, so every server may keep the ones in use. */
export class StepLists {
  private readonly cache = new Map<string, ExpansionDocument>();

  constructor(private readonly sequences: SequencesRepository) {}

  async find(context: Context, companyId: CompanyId, hash: string): Promise<ExpansionDocument> {
    const key = `${companyId} ${hash}`;
    const cached = this.cached(key);
    if (cached) return cached;
    const content = await this.sequences.findStepList(context, companyId, hash);
    if (content === null) throw new Bug(`The step list ${hash} is missing`);
    return this.keep(key, content);
  }

  /** Several at once, by hash; those that aren't kept here are read in one query. */
  async findAll(
    context: Context,
    companyId: CompanyId,
    hashes: readonly string[],
  ): Promise<ReadonlyMap<string, ExpansionDocument>> {
    const found = new Map<string, ExpansionDocument>();
    const missing: string[] = [];
    for (const hash of new Set(hashes)) {
      const cached = this.cached(`${companyId} ${hash}`);
      if (cached) found.set(hash, cached);
      else missing.push(hash);
    }
    for (const { hash, content } of await this.sequences.findStepLists(context, companyId, missing))
      found.set(hash, this.keep(`${companyId} ${hash}`, content));
    return found;
  }

  private cached(key: string): ExpansionDocument | undefined {
    const document = this.cache.get(key);
    if (!document) return undefined;
    // Least recently used goes first: what is in use moves to the end.
    this.cache.delete(key);
    this.cache.set(key, document);
    return document;
  }

  private keep(key: string, content: string): ExpansionDocument {
    const document = JSON.parse(content) as ExpansionDocument;
    if (this.cache.size >= MAX_CACHED) this.cache.delete(this.cache.keys().next().value as string);
    this.cache.set(key, document);
    return document;
  }
}
