import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import type { Signature } from '#shared/checklist/signature';
import type { Language } from '#shared/checklist/text';
import { openingDetailSchema } from '#shared/contracts/openings';
import {
  installationKeySchema,
  packageListSchema,
  packageSchema,
  type HandoverPackage,
} from '#shared/contracts/packages';
import type { OpeningId, PackageId } from '#shared/plant/ids';
import { parsed } from '../ui/pages/parsed';
import { coverageOf, type Coverage } from './package-facts';

/** Handover packages: issued by a lead, received and accepted by the contractor. */
@Injectable({ providedIn: 'root' })
export class PackagesApi {
  private readonly http = inject(HttpClient);

  async packages(openingId: OpeningId): Promise<readonly HandoverPackage[]> {
    return (await parsed(this.http.get(`/api/openings/${openingId}/packages`), packageListSchema)).packages;
  }

  /** How much a version issued now would cover: circuits approved, of all there are, with or without a checklist. */
  async coverage(openingId: OpeningId): Promise<Coverage> {
    const { systems } = await parsed(this.http.get(`/api/openings/${openingId}`), openingDetailSchema);
    return coverageOf(systems);
  }

  package(packageId: PackageId): Promise<HandoverPackage> {
    return parsed(this.http.get(`/api/packages/${packageId}`), packageSchema);
  }

  /** Starts building a new version; it is done when its state says so. */
  issue(openingId: OpeningId, language: Language): Promise<HandoverPackage> {
    return parsed(this.http.post(`/api/openings/${openingId}/packages`, { language }), packageSchema);
  }

  cancel(packageId: PackageId): Promise<HandoverPackage> {
    return parsed(this.http.post(`/api/packages/${packageId}/cancellation`, {}), packageSchema);
  }

  /** Accepts exactly the document of this hash. Fails with `passwordNeeded`, `changedMeanwhile` or `alreadyThere`. */
  accept(packageId: PackageId, sha256: string, signature: Signature): Promise<HandoverPackage> {
    return parsed(
      this.http.post(`/api/packages/${packageId}/acceptances`, { sha256, signature }),
      packageSchema,
    );
  }

  /** SHA-256 of the installation's public key, as it stands in the mail and on the hash page. */
  async fingerprint(): Promise<string> {
    return (await parsed(this.http.get('/api/installation-key'), installationKeySchema)).fingerprint;
  }

  /** Address of the PDF itself. */
  documentUrl(packageId: PackageId): string {
    return `/api/packages/${packageId}/document`;
  }
}
