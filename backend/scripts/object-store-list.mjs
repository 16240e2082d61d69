import { listDocument, S3Failure } from './object-store-replies.mjs';

const LARGEST_PAGE = 1000;

/**
 * Answers ListObjectsV2: prefix, delimiter, paging.
 * @param {import('./object-store-files.mjs').ObjectFiles} files
 * @param {string} bucket
 * @param {URLSearchParams} query
 * @returns {Promise<string>} the XML document
 */
export async function listObjects(files, bucket, query) {
  const prefix = query.get('prefix') ?? '';
  const delimiter = query.get('delimiter') ?? '';
  const maxKeys = Math.min(Number(query.get('max-keys') ?? LARGEST_PAGE), LARGEST_PAGE);
  if (!Number.isInteger(maxKeys) || maxKeys < 0) {
    throw new S3Failure('InvalidArgument', 'max-keys is not a number.');
  }
  const token = query.get('continuation-token');
  const after =
    token === null ? (query.get('start-after') ?? '') : Buffer.from(token, 'base64url').toString('utf8');
  const objects = (await files.list(bucket)).filter(
    ({ key }) => key.startsWith(prefix) && isAfter(key, after),
  );
  const page = takePage(objects, { prefix, delimiter, maxKeys, after });
  return listDocument({
    bucket,
    prefix,
    delimiter,
    maxKeys,
    urlEncoded: query.get('encoding-type') === 'url',
    objects: page.objects,
    commonPrefixes: page.commonPrefixes,
    nextToken: page.last === undefined ? undefined : Buffer.from(page.last).toString('base64url'),
  });
}

/**
 * @param {string} key
 * @param {string} after
 */
function isAfter(key, after) {
  return Buffer.compare(Buffer.from(key), Buffer.from(after)) > 0;
}

/**
 * @param {import('./object-store-files.mjs').StoredObject[]} objects in order
 * @param {{ prefix: string, delimiter: string, maxKeys: number, after: string }} options
 * @returns {{ objects: import('./object-store-files.mjs').StoredObject[], commonPrefixes: string[], last: string | undefined }}
 *   `last` is where the next page goes on; undefined on the last page
 */
function takePage(objects, { prefix, delimiter, maxKeys, after }) {
  const taken = /** @type {import('./object-store-files.mjs').StoredObject[]} */ ([]);
  const commonPrefixes = /** @type {string[]} */ ([]);
  let last = after;
  for (const object of objects) {
    const cut = delimiter === '' ? -1 : object.key.indexOf(delimiter, prefix.length);
    const group = cut < 0 ? undefined : object.key.slice(0, cut + delimiter.length);
    const isKnownGroup = group !== undefined && (commonPrefixes.at(-1) === group || after === group);
    if (isKnownGroup || (group !== undefined && after.startsWith(group))) {
      continue;
    }
    if (taken.length + commonPrefixes.length === maxKeys) {
      return { objects: taken, commonPrefixes, last: maxKeys === 0 ? undefined : last };
    }
    if (group === undefined) {
      taken.push(object);
    } else {
      commonPrefixes.push(group);
    }
    last = group ?? object.key;
  }
  return { objects: taken, commonPrefixes, last: undefined };
}
