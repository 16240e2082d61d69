import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { Bug } from '#shared/failures/failure';

/** The folder with package.json: files that the compiler doesn't copy (templates, fonts, the built pages) lie below it. */
export const PROJECT_FOLDER = findUp(__dirname);

function findUp(folder: string): string {
  if (existsSync(join(folder, 'package.json'))) return folder;
  const parent = dirname(folder);
  if (parent === folder) throw new Bug('No package.json above the server');
  return findUp(parent);
}
