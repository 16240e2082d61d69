import fs from 'node:fs';
import path from 'node:path';

/**
 * The scripts that a page runs before anything is loaded on demand: those that index.html names, and what
 * they import. The page's own list of preloads is cut off by the builder, so imports are followed.
 * @param {string} folder of a built page
 * @returns {Set<string>} file names
 */
export function initialScripts(folder) {
  const html = fs.readFileSync(path.join(folder, 'index.html'), 'utf8');
  const named = [...html.matchAll(/(?:src|href)="([\w-]+\.js)"/g)].map((match) => match[1]);
  const found = new Set();
  const waiting = [...named];
  for (let file = waiting.pop(); file !== undefined; file = waiting.pop()) {
    if (found.has(file)) {
      continue;
    }
    found.add(file);
    const script = fs.readFileSync(path.join(folder, file), 'utf8');
    waiting.push(...[...script.matchAll(/\b(?:from|import)\s*"\.\/([\w-]+\.js)"/g)].map((match) => match[1]));
  }
  return found;
}

/**
 * What these scripts weigh on the way to a browser that takes brotli: the twin beside the file, or the file
 * itself where it is too small to have one.
 * @param {string} folder
 * @param {Iterable<string>} files
 * @returns {number} bytes
 */
export function packedBytes(folder, files) {
  let bytes = 0;
  for (const file of files) {
    const twin = path.join(folder, `${file}.br`);
    bytes += fs.statSync(fs.existsSync(twin) ? twin : path.join(folder, file)).size;
  }
  return bytes;
}
