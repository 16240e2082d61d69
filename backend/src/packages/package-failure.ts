import { PACKAGE_FAILURES, type PackageFailure } from '#shared/contracts/packages';
import { TemporaryFailure } from '#shared/failures/failure';

/**
 * What a person is told of a package that couldn't be built. The error itself stands in the log and with the job.
 *
 * @param error of the last try
 */
export function packageFailureOf(error: unknown): PackageFailure {
  if (error instanceof TemporaryFailure) return 'temporary';
  const { code } = (error ?? {}) as { code?: unknown };
  return code === 'ENOSPC' || code === 'EDQUOT' ? 'diskFull' : 'bug';
}

/** The failure in a package's row; rows from before there were codes hold the error's own words. */
export function storedPackageFailure(stored: string | null): PackageFailure | null {
  if (stored === null) return null;
  return PACKAGE_FAILURES.find((code) => code === stored) ?? 'bug';
}
