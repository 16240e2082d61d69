import fs from 'node:fs';
import path from 'node:path';

/**
 * Removes compiled files whose source is gone: the compiler only adds, and a left-over migration or
 * entity would be picked up as if it still existed.
 * @param {string} root
 * @param {string[]} folders compiled from `<root>/<folder>` to `<root>/dist/<folder>`
 */
export function removeStaleOutput(root, folders) {
  for (const folder of folders) {
    const output = path.join(root, 'dist', folder);
    if (!fs.existsSync(output)) {
      continue;
    }
    for (const entry of fs.readdirSync(output, { recursive: true, encoding: 'utf8' })) {
      const stem = /^(.*)\.(js|js\.map|d\.ts|d\.ts\.map)$/.exec(entry)?.[1];
      if (stem !== undefined && !fs.existsSync(path.join(root, folder, `${stem}.ts`))) {
        fs.rmSync(path.join(output, entry));
      }
    }
  }
}
