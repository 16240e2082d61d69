import { createHash } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';

/** Tests, scripts and tools' caches do not end up in a build, so changing them must not cause one. */
const IGNORED = /(^|\/)(e2e|scripts|node_modules|\.angular)(\/|$)|\.spec\.ts$/;

/**
 * A fingerprint of files: names and contents, not times, so that a fresh checkout of the same sources
 * counts as unchanged.
 * @param {string} root
 * @param {string[]} sources files and folders below root; what does not exist counts as absent
 * @param {string[]} command what is run on them, since other options give another result
 * @returns {string} in hex
 */
export function hashSources(root, sources, command) {
  const hash = createHash('sha1').update(JSON.stringify([process.versions.node, command]));
  for (const source of sources) {
    for (const file of filesBelow(root, source)) {
      const content = fs.readFileSync(path.join(root, file));
      hash.update(`\0${file}\0${content.length}\0`).update(content);
    }
  }
  return hash.digest('hex');
}

/**
 * @param {string} root
 * @param {string} source
 * @returns {string[]} sorted, relative to root
 */
function filesBelow(root, source) {
  const stats = fs.statSync(path.join(root, source), { throwIfNoEntry: false });
  if (!stats) {
    return [];
  }
  if (stats.isFile()) {
    return [source];
  }
  return fs
    .readdirSync(path.join(root, source), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.relative(root, path.join(entry.parentPath ?? entry.path, entry.name)))
    .filter((file) => !IGNORED.test(file))
    .sort();
}
