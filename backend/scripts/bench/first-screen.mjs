import path from 'node:path';
import { PROJECT_ROOT } from '../paths.mjs';
import { buildEmptyPage } from './empty-page.mjs';
import { kilobytes } from './report.mjs';
import { initialScripts, packedBytes } from './script-sizes.mjs';

export const PAGES_FOLDER = path.join(PROJECT_ROOT, 'dist', 'frontend', 'browser');

/**
 * The scripts of the phone's first screen against an empty page of the same libraries, both as brotli.
 * @param {import('../shutdown.mjs').Shutdown} shutdown
 * @param {{ signIn: Set<string> } | null} visit what a browser loaded, where there was one
 * @returns {Promise<import('./report.mjs').Row[]>}
 */
export async function measureFirstScreen(shutdown, visit) {
  const emptyFolder = await buildEmptyPage(shutdown);
  const emptyBytes = packedBytes(emptyFolder, initialScripts(emptyFolder));
  const initial = initialScripts(PAGES_FOLDER);
  const reference = `${kilobytes(emptyBytes)} of an empty Angular Material page`;
  const row = (/** @type {string} */ what, /** @type {Iterable<string>} */ files) => {
    const bytes = packedBytes(PAGES_FOLDER, files);
    const ratio = bytes / emptyBytes;
    return { what, ours: kilobytes(bytes), reference, ratio, goal: 'at most 1.5', isMet: ratio <= 1.5 };
  };
  const rows = [row('Scripts of the first screen, initial', initial)];
  if (visit) {
    rows.push(row('Scripts of the first screen, all until the sign-in form shows', visit.signIn));
  }
  for (const { what, ours, ratio } of rows) {
    shutdown.log(`  ${what}: ${ours}, ratio ${ratio.toFixed(2)}`);
  }
  return rows;
}
