import { createHash, randomUUID } from 'node:crypto';
import { createReadStream, createWriteStream } from 'node:fs';
import { mkdir, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { uuidv7 } from 'uuidv7';
import type { Language } from '#shared/checklist/text';
import { Bug } from '#shared/failures/failure';
import type { OpeningId, PackageId } from '#shared/plant/ids';
import { canonicalJson } from '#shared/sequences/canonical-json';
import type { Context, Transactions } from '../database/transactions';
import type { DefrostPlansService } from '../defrosts/defrost-plans.service';
import type { LiveEventsService } from '../events/live-events.service';
import type { ObjectStorage } from '../files/object-storage';
import type { JobPayloads } from '../jobs/job-kinds';
import type { JobRun } from '../jobs/job-worker';
import type { JobsService } from '../jobs/jobs.service';
import { packageIssuedMail } from '../mail/mail-texts';
import type { OpeningsService } from '../openings/openings.service';
import type { PeopleService } from '../people/people.service';
import type { PhotosService } from '../sequences/photos.service';
import type { SequencesService } from '../sequences/sequences.service';
import type { InstallationKey } from '../signing/installation-key';
import type { PackageContent } from './document/package-content';
import { writePackageDocument } from './document/write-package-document';
import { packageFailureOf } from './package-failure';
import { sequencesOf, summaryOf, type PackageSnapshot } from './package-snapshot';
import { packageKey } from './packages.service';
import type { PackageRow, PackagesRepository } from './packages.repository';

const PROGRESS_EVERY_MS = 600;

interface Written {
  readonly file: string;
  readonly pages: number;
  readonly bytes: number;
  readonly sha256: string;
}

/** The job that builds a package: streamed to a file, hashed on the way, stored, signed, and told to the contractor. */
export class PackageBuilder {
  constructor(
    private readonly transactions: Transactions,
    private readonly packages: PackagesRepository,
    private readonly openings: OpeningsService,
    private readonly defrosts: DefrostPlansService,
    private readonly people: PeopleService,
    private readonly sequences: SequencesService,
    private readonly photos: PhotosService,
    private readonly storage: ObjectStorage,
    private readonly jobs: JobsService,
    private readonly key: InstallationKey,
    private readonly events: LiveEventsService,
    private readonly place: { readonly temporaryFolder: string; readonly publicUrl: string },
  ) {}

  /** Builds the package; when it can't be built it is not issued, and says why. */
  async build({ packageId, openingId }: JobPayloads['package'], run: JobRun): Promise<void> {
    const row = await this.packages.find(this.transactions.outside, packageId);
    if (row?.state !== 'building') return;
    const cancelled = new AbortController();
    const signal = AbortSignal.any([run.signal, cancelled.signal]);
    try {
      const written = await this.write(row, signal, this.follower(row, run, cancelled));
      try {
        await this.storage.put(
          packageKey(row.companyId, packageId),
          createReadStream(written.file),
          written.bytes,
          'application/pdf',
        );
        await this.issue(row, written);
      } finally {
        await rm(written.file, { force: true });
      }
    } catch (error) {
      // Cancelled by a person: the row says so already, and nothing is to be tried again.
      if (cancelled.signal.aborted && !run.signal.aborted) return;
      if (run.isLastTry && !run.signal.aborted) await this.giveUp(packageId, openingId, row.companyId, error);
      throw error;
    }
  }

  /** Says that a package can't be built whose workers died with it. */
  async abandon({ packageId, openingId }: JobPayloads['package']): Promise<void> {
    const row = await this.packages.find(this.transactions.outside, packageId);
    if (row?.state === 'building')
      await this.giveUp(packageId, openingId, row.companyId, new Bug('Its workers died with it.'));
  }

  /** Tells watchers how far it is, at a pace that a database likes, and notices a cancellation. */
  private follower(row: PackageRow, run: JobRun, cancelled: AbortController): (fraction: number) => void {
    let told = 0;
    return (fraction) => {
      run.progress(fraction);
      if (Date.now() - told < PROGRESS_EVERY_MS) return;
      told = Date.now();
      this.transactions
        .run(async (context) => {
          const id = row.id as PackageId;
          if (!(await this.packages.setProgress(context, id, Math.min(0.99, fraction)))) cancelled.abort();
          await this.announce(context, row.companyId, row.openingId as OpeningId, id);
        })
        // Progress that isn't told is no reason to stop building.
        .catch(() => undefined);
    };
  }

  private async write(
    row: PackageRow,
    signal: AbortSignal,
    onProgress: (fraction: number) => void,
  ): Promise<Written> {
    await mkdir(this.place.temporaryFolder, { recursive: true });
    const file = join(this.place.temporaryFolder, `package-${row.id}-${randomUUID()}.pdf`);
    const hash = createHash('sha256');
    const hashing = new Transform({
      transform(chunk: Buffer, _encoding, done) {
        hash.update(chunk);
        done(null, chunk);
      },
    });
    // A full disk fails the pipeline, and with it the document that is being written into it.
    const piped = pipeline(hashing, createWriteStream(file));
    piped.catch(() => undefined);
    try {
      const { pages } = await writePackageDocument(await this.contentOf(row), hashing, {
        signal,
        onProgress,
      });
      hashing.end();
      await piped;
      return { file, pages, bytes: (await stat(file)).size, sha256: hash.digest('hex') };
    } catch (error) {
      hashing.destroy();
      await rm(file, { force: true });
      throw error;
    }
  }

  private async contentOf(row: PackageRow): Promise<PackageContent> {
    const opening = await this.openings.find(this.transactions.outside, row.openingId as OpeningId);
    const snapshot = JSON.parse(row.heads) as PackageSnapshot;
    const circuits = sequencesOf(snapshot);
    const positions = new Map(circuits.map((circuit) => [circuit.sequenceId, circuit.position]));
    return {
      opening: {
        name: opening.name,
        address: opening.address,
        openingDate: opening.openingDate,
        timeZone: opening.timeZone,
        elevationM: opening.elevationM,
        unitSystem: opening.unitSystem as 'us' | 'si',
        contractorName: opening.contractorName,
        companyName: await this.people.companyName(opening.companyId),
      },
      package: {
        id: row.id as PackageId,
        version: row.version,
        language: row.language as Language,
        createdAt: row.createdAt.toISOString(),
        createdByName: row.createdByName,
      },
      installation: { fingerprint: this.key.fingerprint },
      summary: { systems: summaryOf(snapshot) },
      defrostPlan: await this.defrostPlanOf(opening.id as OpeningId, snapshot),
      circuits: circuits.map(({ sequenceId, level = 'circuit', code, description, systemName, state }) => ({
        sequenceId,
        level,
        code,
        description,
        systemName,
        state,
      })),
      // Up to the position of the snapshot: what arrives while it is built belongs to the next version.
      loadCircuit: (id) => this.sequences.show(id, positions.get(id)),
      loadPhoto: (id, sha256) => this.photos.readForPrint(id, sha256),
    };
  }

  private async defrostPlanOf(
    openingId: OpeningId,
    { defrostPlanId }: PackageSnapshot,
  ): Promise<PackageContent['defrostPlan']> {
    return defrostPlanId ? this.defrosts.read(openingId, defrostPlanId) : null;
  }

  private async issue(row: PackageRow, written: Written): Promise<void> {
    const id = row.id as PackageId;
    const openingId = row.openingId as OpeningId;
    const issuedAt = new Date();
    const statement = canonicalJson({
      kind: 'package',
      packageId: id,
      openingId,
      version: row.version,
      sha256: written.sha256,
      heads: sequencesOf(JSON.parse(row.heads) as PackageSnapshot).map(({ sequenceId, headHash }) => [
        sequenceId,
        headHash,
      ]),
    });
    await this.transactions.run(async (context) => {
      const current = await this.packages.lock(context, id);
      if (current?.state !== 'building') return;
      await this.packages.update(context, id, {
        state: 'issued',
        progress: 1,
        issuedAt,
        pages: written.pages,
        bytes: written.bytes,
        sha256: written.sha256,
        installationSignature: this.key.sign(statement),
      });
      await this.mailContractors(context, row, written.sha256);
      await this.announce(context, row.companyId, openingId, id);
    });
  }

  private async mailContractors(context: Context, row: PackageRow, sha256: string): Promise<void> {
    for (const person of await this.people.recipients(context, row.openingId as OpeningId)) {
      if (person.role !== 'contractor') continue;
      const mail = packageIssuedMail(person, {
        opening: row.openingName,
        version: row.version,
        approved: row.circuitsApproved,
        total: row.circuitsTotal,
        sha256,
        fingerprint: this.key.fingerprint,
        url: `${this.place.publicUrl}/packages/${row.id}`,
      });
      await this.jobs.enqueue(context, row.companyId, 'mail', `mail ${uuidv7()}`, mail);
    }
  }

  private async giveUp(
    id: PackageId,
    openingId: OpeningId,
    companyId: string,
    error: unknown,
  ): Promise<void> {
    const failure = packageFailureOf(error);
    await this.transactions.run(async (context) => {
      await this.packages.update(context, id, { state: 'failed', failure });
      await this.announce(context, companyId, openingId, id);
    });
  }

  private async announce(
    context: Context,
    companyId: string,
    openingId: OpeningId,
    packageId: PackageId,
  ): Promise<void> {
    await this.events.announce(context, companyId, { kind: 'packageChanged', openingId, packageId });
  }
}
