import { formatNumber } from '#shared/units/format';
import type { Joint } from '#shared/contracts/openings';
import type { HandoverPackage } from '#shared/contracts/packages';
import type { Language } from '#shared/checklist/text';

const MEGABYTE = 1_000_000;

/** How many circuits of all are approved. */
export interface Coverage {
  readonly approved: number;
  readonly total: number;
}

/** What a package of these systems would cover; a circuit without a checklist counts as one that isn't approved. */
export function coverageOf(
  systems: readonly { readonly joints: readonly Pick<Joint, 'state'>[] }[],
): Coverage {
  const joints = systems.flatMap((system) => system.joints);
  return { approved: joints.filter(({ state }) => state === 'approved').length, total: joints.length };
}

/** Versions, the newest on top. */
export function newestFirst(packages: readonly HandoverPackage[]): readonly HandoverPackage[] {
  return [...packages].sort((a, b) => b.version - a.version);
}

/** The size of a document for people, in MB (10⁶ bytes). */
export function sizeText(bytes: number, language: Language): string {
  return `${formatNumber(bytes / MEGABYTE, bytes < 10 * MEGABYTE ? 1 : 0, language)} MB`;
}

/** A hash in groups of four, so that two people can compare it aloud. */
export function grouped(hash: string): string {
  return hash.replace(/(.{4})(?=.)/g, '$1 ');
}

/** A name to save the document under that sorts by opening and version, without anything a file system minds. */
export function fileNameOf(pack: Pick<HandoverPackage, 'openingName' | 'version'>): string {
  const name = pack.openingName
    .normalize('NFD')
    .replace(/\p{M}/gu, '')
    .replace(/[^A-Za-z0-9]+/g, '-')
    .replace(/^-|-$/g, '')
    .toLowerCase();
  return `handover-${name || 'package'}-v${pack.version}.pdf`;
}
