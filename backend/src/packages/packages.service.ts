import { uuidv7 } from 'uuidv7';
import { isSignedBy, type Signature } from '#shared/checklist/signature';
import type { Language } from '#shared/checklist/text';
import type { HandoverPackage } from '#shared/contracts/packages';
import { DomainFailure } from '#shared/failures/failure';
import type { OpeningId, PackageId } from '#shared/plant/ids';
import { canonicalJson } from '#shared/sequences/canonical-json';
import type { AuditService } from '../audit/audit.service';
import type { DefrostPlansService } from '../defrosts/defrost-plans.service';
import { isDuplicate, type Context, type Transactions } from '../database/transactions';
import type { LiveEventsService } from '../events/live-events.service';
import type { ObjectStorage, StoredObject } from '../files/object-storage';
import { byteRange } from '../http/byte-range';
import type { Caller } from '../http/define-route';
import { requireFreshPassword } from '../http/password-age';
import type { JobsService } from '../jobs/jobs.service';
import type { OpeningsService } from '../openings/openings.service';
import type { InstallationKey } from '../signing/installation-key';
import { isCircuit } from './package-snapshot';
import { packageView } from './package-view';
import type { PackageRow, PackagesRepository } from './packages.repository';

/** Where a package's document is kept. */
export function packageKey(companyId: string, id: string): string {
  return `${companyId}/packages/${id}.pdf`;
}

/** Handover packages: asked for by a lead, built by a job, read and accepted by the contractor. */
export class PackagesService {
  constructor(
    private readonly transactions: Transactions,
    private readonly packages: PackagesRepository,
    private readonly openings: OpeningsService,
    private readonly defrosts: DefrostPlansService,
    private readonly storage: ObjectStorage,
    private readonly jobs: JobsService,
    private readonly key: InstallationKey,
    private readonly audit: AuditService,
    private readonly events: LiveEventsService,
  ) {}

  async list(openingId: OpeningId): Promise<HandoverPackage[]> {
    const { outside } = this.transactions;
    const rows = await this.packages.findOfOpening(outside, openingId);
    const acceptances = await this.packages.findAcceptances(
      outside,
      rows.map((row) => row.id),
    );
    const byPackage = new Map(acceptances.map((acceptance) => [acceptance.packageId, acceptance]));
    return rows.map((row) => packageView(row, byPackage.get(row.id)));
  }

  async show(id: PackageId): Promise<HandoverPackage> {
    const row = await this.find(id);
    const [acceptance] = await this.packages.findAcceptances(this.transactions.outside, [id]);
    return packageView(row, acceptance);
  }

  /**
   * Takes the moment that the package will show, and has it built.
   *
   * @throws {DomainFailure} nothingToHandOver: no circuit has anything recorded
   */
  async request(caller: Caller, openingId: OpeningId, language: Language): Promise<HandoverPackage> {
    const id = uuidv7() as PackageId;
    await this.transactions.run(async (context) => {
      const opening = await this.openings.lockForSchedule(context, openingId);
      const snapshot = {
        ...(await this.packages.takeSnapshot(context, openingId)),
        defrostPlanId: await this.defrosts.newestId(context, openingId),
      };
      const circuits = snapshot.systems.flatMap((system) => system.circuits);
      const counted = circuits.filter(isCircuit);
      if (!circuits.some((circuit) => circuit.position > 1)) {
        throw new DomainFailure('nothingToHandOver', 'Nothing has been recorded in this opening yet.');
      }
      await this.packages.insert(context, {
        id,
        companyId: opening.companyId,
        openingId,
        version: (await this.packages.findLastVersion(context, openingId)) + 1,
        language,
        state: 'building',
        progress: 0,
        heads: JSON.stringify(snapshot),
        circuitsApproved: counted.filter((circuit) => circuit.state === 'approved').length,
        circuitsTotal: counted.length,
        createdBy: caller.person.id,
        createdAt: new Date(),
        issuedAt: null,
        pages: null,
        bytes: null,
        sha256: null,
        installationSignature: null,
        failure: null,
      });
      await this.jobs.enqueue(context, opening.companyId, 'package', `package ${id}`, {
        packageId: id,
        openingId,
      });
      await this.record(context, caller, opening.companyId, openingId, id, 'package.requested');
    });
    return this.show(id);
  }

  /** Stops a package that is still being built; one that is done stays as it is. */
  async cancel(caller: Caller, id: PackageId): Promise<HandoverPackage> {
    await this.transactions.run(async (context) => {
      const row = await this.packages.lock(context, id);
      if (!row) throw new DomainFailure('notFound', 'There is no such package.');
      if (row.state !== 'building') {
        throw new DomainFailure('wrongState', 'This package is not being built any more.', [], {
          state: row.state,
        });
      }
      await this.packages.update(context, id, { state: 'cancelled' });
      await this.record(context, caller, row.companyId, row.openingId as OpeningId, id, 'package.cancelled');
    });
    return this.show(id);
  }

  /** The document's bytes, or a range of them; `null` for a range that isn't in it. */
  async read(
    id: PackageId,
    header: string | undefined,
  ): Promise<(StoredObject & { fileName: string }) | null> {
    const row = await this.find(id);
    if (row.state !== 'issued') {
      throw new DomainFailure('wrongState', 'This package is not issued.', [], { state: row.state });
    }
    const range = byteRange(header, row.bytes ?? 0);
    if (range === 'unsatisfiable') return null;
    const part = range === 'whole' ? undefined : `bytes=${range.first}-${range.last}`;
    const object = await this.storage.get(packageKey(row.companyId, id), part);
    if (!object) throw new DomainFailure('notFound', 'The document is not in the store.');
    return { ...object, fileName: `${fileNameOf(row.openingName)}-handover-${row.version}.pdf` };
  }

  /**
   * The contractor's signature under exactly the document that was read.
   *
   * @throws {DomainFailure} changedMeanwhile: the hash is of another document; alreadyThere; passwordNeeded
   */
  async accept(
    caller: Caller,
    id: PackageId,
    sha256: string,
    signature: Signature,
  ): Promise<HandoverPackage> {
    requireFreshPassword(caller);
    if (!isSignedBy(signature, caller.personName))
      throw new DomainFailure('invalidInput', 'The signature box is empty.');
    const row = await this.find(id);
    if (row.state !== 'issued') {
      throw new DomainFailure('wrongState', 'This package is not issued.', [], { state: row.state });
    }
    if (row.sha256 !== sha256)
      throw new DomainFailure('changedMeanwhile', 'This is not the document that you read.');
    const signed = { ...signature, printedName: caller.personName };
    const createdAt = new Date();
    const statement = canonicalJson({
      kind: 'acceptance',
      packageId: id,
      sha256,
      personId: caller.person.id,
      at: createdAt.toISOString(),
      signature: signed,
    });
    try {
      await this.transactions.run(async (context) => {
        await this.packages.insertAcceptance(context, {
          id: uuidv7(),
          companyId: row.companyId,
          packageId: id,
          personId: caller.person.id,
          sha256,
          statement,
          installationSignature: this.key.sign(statement),
          createdAt,
        });
        await this.record(context, caller, row.companyId, row.openingId as OpeningId, id, 'package.accepted');
      });
    } catch (error) {
      if (!isDuplicate(error)) throw error;
      throw new DomainFailure('alreadyThere', 'This package has been accepted already.');
    }
    return this.show(id);
  }

  private async record(
    context: Context,
    caller: Caller,
    companyId: string,
    openingId: OpeningId,
    id: PackageId,
    action: string,
  ): Promise<void> {
    await this.audit.append(context, {
      companyId,
      openingId,
      personId: caller.person.id,
      action,
      subject: id,
    });
    await this.events.announce(context, companyId, { kind: 'packageChanged', openingId, packageId: id });
  }

  private async find(id: PackageId): Promise<PackageRow> {
    const row = await this.packages.find(this.transactions.outside, id);
    if (!row) throw new DomainFailure('notFound', 'There is no such package.');
    return row;
  }
}

function fileNameOf(name: string): string {
  const plain = name
    .normalize('NFKD')
    .replace(/[^A-Za-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '');
  return plain === '' ? 'opening' : plain.slice(0, 60);
}
