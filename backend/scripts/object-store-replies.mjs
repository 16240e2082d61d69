/**
 * The failures that we answer, by S3's own codes: clients decide by them.
 * @type {Record<string, number>}
 */
const STATUS = {
  AccessDenied: 403,
  BadDigest: 400,
  EntityTooLarge: 400,
  IncompleteBody: 400,
  InternalError: 500,
  InvalidAccessKeyId: 403,
  InvalidArgument: 400,
  InvalidBucketName: 400,
  InvalidRange: 416,
  InvalidRequest: 400,
  InvalidURI: 400,
  KeyTooLongError: 400,
  MethodNotAllowed: 405,
  NoSuchBucket: 404,
  NoSuchKey: 404,
  NotImplemented: 501,
  PreconditionFailed: 412,
  XAmzContentSHA256Mismatch: 400,
};

/** A request that is answered with an error document. */
export class S3Failure extends Error {
  /**
   * @param {string} code one of S3's error codes
   * @param {string} message
   */
  constructor(code, message) {
    super(message);
    this.name = 'S3Failure';
    this.code = code;
    this.status = STATUS[code] ?? 500;
  }
}

/**
 * @param {S3Failure} failure
 * @param {string} resource the path asked for
 * @returns {string}
 */
export function errorDocument(failure, resource) {
  const fields = `<Code>${failure.code}</Code><Message>${escapeXml(failure.message)}</Message>`;
  return `${DECLARATION}<Error>${fields}<Resource>${escapeXml(resource)}</Resource></Error>`;
}

/**
 * @param {object} listing
 * @param {string} listing.bucket
 * @param {string} listing.prefix
 * @param {string} listing.delimiter
 * @param {number} listing.maxKeys
 * @param {boolean} listing.urlEncoded whether names are percent-encoded, which clients ask for by default
 * @param {import('./object-store-files.mjs').StoredObject[]} listing.objects
 * @param {string[]} listing.commonPrefixes
 * @param {string | undefined} listing.nextToken
 * @returns {string}
 */
export function listDocument(listing) {
  const name = (/** @type {string} */ text) =>
    escapeXml(listing.urlEncoded ? encodeURIComponent(text).replaceAll('%2F', '/') : text);
  const contents = listing.objects.map(
    (object) =>
      `<Contents><Key>${name(object.key)}</Key><LastModified>${object.lastModified}</LastModified>` +
      `<ETag>&quot;${object.md5}&quot;</ETag><Size>${object.size}</Size><StorageClass>STANDARD</StorageClass></Contents>`,
  );
  const prefixes = listing.commonPrefixes.map(
    (prefix) => `<CommonPrefixes><Prefix>${name(prefix)}</Prefix></CommonPrefixes>`,
  );
  return [
    `${DECLARATION}<ListBucketResult xmlns="http://s3.amazonaws.com/doc/2006-03-01/">`,
    `<Name>${listing.bucket}</Name><Prefix>${name(listing.prefix)}</Prefix>`,
    listing.delimiter ? `<Delimiter>${name(listing.delimiter)}</Delimiter>` : '',
    `<MaxKeys>${listing.maxKeys}</MaxKeys><KeyCount>${contents.length + prefixes.length}</KeyCount>`,
    listing.urlEncoded ? '<EncodingType>url</EncodingType>' : '',
    `<IsTruncated>${listing.nextToken !== undefined}</IsTruncated>`,
    listing.nextToken ? `<NextContinuationToken>${listing.nextToken}</NextContinuationToken>` : '',
    ...contents,
    ...prefixes,
    '</ListBucketResult>',
  ].join('');
}

const DECLARATION = '<?xml version="1.0" encoding="UTF-8"?>\n';

/** @param {string} text */
function escapeXml(text) {
  return text.replace(/[<>&"']/g, (character) => `&#${character.charCodeAt(0)};`);
}
