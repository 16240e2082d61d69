import type { Signature } from '#shared/checklist/signature';
import type { Language } from '#shared/checklist/text';
import type { HandoverPackage } from '#shared/contracts/packages';
import type { OpeningId, PackageId } from '#shared/plant/ids';
import { storedPackageFailure } from './package-failure';
import type { AcceptanceRow, PackageRow } from './packages.repository';

/** A package as the contract has it. */
export function packageView(row: PackageRow, acceptance: AcceptanceRow | undefined): HandoverPackage {
  return {
    id: row.id as PackageId,
    openingId: row.openingId as OpeningId,
    openingName: row.openingName,
    timeZone: row.timeZone,
    version: row.version,
    language: row.language as Language,
    state: row.state as HandoverPackage['state'],
    progress: row.progress,
    circuitsApproved: row.circuitsApproved,
    circuitsTotal: row.circuitsTotal,
    createdAt: row.createdAt.toISOString(),
    createdBy: row.createdByName,
    issuedAt: row.issuedAt?.toISOString() ?? null,
    pages: row.pages,
    bytes: row.bytes,
    sha256: row.sha256,
    failure: storedPackageFailure(row.failure),
    acceptance: acceptance
      ? {
          personName: acceptance.personName,
          companyName: acceptance.companyName,
          signedAt: acceptance.createdAt.toISOString(),
          signature: (JSON.parse(acceptance.statement) as { signature: Signature }).signature,
        }
      : null,
  };
}
