import type { Readable } from 'node:stream';
import {
  CreateBucketCommand,
  DeleteObjectCommand,
  GetObjectCommand,
  HeadBucketCommand,
  HeadObjectCommand,
  NoSuchKey,
  NotFound,
  PutObjectCommand,
  S3Client,
  S3ServiceException,
} from '@aws-sdk/client-s3';
import { TemporaryFailure } from '#shared/failures/failure';

export interface StorageConfig {
  readonly endpoint: string | null;
  readonly region: string;
  readonly bucket: string;
  readonly accessKeyId: string;
  readonly secretAccessKey: string;
}

export interface StoredObject {
  readonly stream: Readable;
  readonly bytes: number;
  readonly contentRange: string | null;
}

/** Object storage through the S3 protocol: photos, thumbnails and packages, by keys that begin with the company's id. */
export class ObjectStorage {
  private readonly client: S3Client;
  private readonly bucket: string;

  constructor(config: StorageConfig) {
    this.bucket = config.bucket;
    this.client = new S3Client({
      region: config.region,
      ...(config.endpoint ? { endpoint: config.endpoint, forcePathStyle: true } : {}),
      credentials: { accessKeyId: config.accessKeyId, secretAccessKey: config.secretAccessKey },
      maxAttempts: 3,
      requestHandler: { connectionTimeout: 3_000, requestTimeout: 20_000 },
      // Stores that don't know the SDK's trailing checksums keep their framing inside the object; ours are checked by hash.
      requestChecksumCalculation: 'WHEN_REQUIRED',
      responseChecksumValidation: 'WHEN_REQUIRED',
    });
  }

  /** Makes the bucket where it is missing: a local store begins empty. */
  async prepare(): Promise<void> {
    try {
      await this.client.send(new HeadBucketCommand({ Bucket: this.bucket }));
    } catch (error) {
      // 404: not there yet. Anything else is a store that can't be used, and creating will say so.
      if (!(error instanceof S3ServiceException)) throw error;
      await this.client.send(new CreateBucketCommand({ Bucket: this.bucket }));
    }
  }

  async put(key: string, body: Buffer | Readable, bytes: number, contentType: string): Promise<void> {
    await this.reach(() =>
      this.client.send(
        new PutObjectCommand({
          Bucket: this.bucket,
          Key: key,
          Body: body,
          ContentLength: bytes,
          ContentType: contentType,
        }),
      ),
    );
  }

  /**
   * An object, whole or in part.
   *
   * @param range an HTTP Range header's value
   * @returns `null` when there is no such object
   */
  async get(key: string, range?: string): Promise<StoredObject | null> {
    try {
      const answer = await this.client.send(
        new GetObjectCommand({ Bucket: this.bucket, Key: key, ...(range ? { Range: range } : {}) }),
      );
      return {
        stream: answer.Body as Readable,
        bytes: answer.ContentLength ?? 0,
        contentRange: answer.ContentRange ?? null,
      };
    } catch (error) {
      if (error instanceof NoSuchKey || error instanceof NotFound) return null;
      throw this.unreachable(error);
    }
  }

  async getBuffer(key: string): Promise<Buffer | null> {
    const object = await this.get(key);
    if (!object) return null;
    const parts: Buffer[] = [];
    for await (const part of object.stream) parts.push(part as Buffer);
    return Buffer.concat(parts);
  }

  async exists(key: string): Promise<boolean> {
    try {
      await this.client.send(new HeadObjectCommand({ Bucket: this.bucket, Key: key }));
      return true;
    } catch (error) {
      if (error instanceof NotFound || error instanceof NoSuchKey) return false;
      throw this.unreachable(error);
    }
  }

  async remove(key: string): Promise<void> {
    await this.reach(() => this.client.send(new DeleteObjectCommand({ Bucket: this.bucket, Key: key })));
  }

  /** @throws when the store can't be reached */
  async ping(): Promise<void> {
    await this.client.send(new HeadBucketCommand({ Bucket: this.bucket }), {
      abortSignal: AbortSignal.timeout(2_500),
    });
  }

  close(): void {
    this.client.destroy();
  }

  private async reach<T>(call: () => Promise<T>): Promise<T> {
    try {
      return await call();
    } catch (error) {
      throw this.unreachable(error);
    }
  }

  private unreachable(error: unknown): TemporaryFailure {
    return new TemporaryFailure('The file store does not answer', 10, { cause: error });
  }
}
