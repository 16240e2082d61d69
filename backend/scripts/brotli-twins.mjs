import { readdir, readFile, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { promisify } from 'node:util';
import zlib from 'node:zlib';

const brotli = promisify(zlib.brotliCompress);
const COMPRESSIBLE = /\.(js|css|html|json|svg|webmanifest)$/;
const SMALLEST_BYTES = 1024;

/**
 * Writes `x.js.br` beside every `x.js` and the like, so that the server never compresses anything while
 * people wait. Files that hardly shrink get none.
 * @param {string} directory
 */
export async function writeBrotliTwins(directory) {
  const files = (await readdir(directory, { recursive: true })).filter((file) => COMPRESSIBLE.test(file));
  await Promise.all(
    files.map(async (file) => {
      const content = await readFile(path.join(directory, file));
      if (content.length <= SMALLEST_BYTES) {
        return;
      }
      const packed = await brotli(content, {
        params: {
          [zlib.constants.BROTLI_PARAM_QUALITY]: 11,
          [zlib.constants.BROTLI_PARAM_SIZE_HINT]: content.length,
        },
      });
      if (packed.length < content.length * 0.95) {
        await writeFile(path.join(directory, `${file}.br`), packed);
      }
    }),
  );
}
