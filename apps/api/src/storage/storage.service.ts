import { createHash } from 'node:crypto';
import { Readable } from 'node:stream';
import {
  CreateBucketCommand,
  DeleteObjectCommand,
  GetObjectCommand,
  HeadBucketCommand,
  HeadObjectCommand,
  ListObjectsV2Command,
  PutObjectCommand,
  S3Client,
  S3ServiceException,
} from '@aws-sdk/client-s3';
import { Injectable, type OnApplicationBootstrap, type OnApplicationShutdown } from '@nestjs/common';
import { Env } from '../config/env.validation';
import { ObjectDamagedError, ObjectMissingError, StorageUnavailableError } from './storage.errors';

const CONNECTION_TIMEOUT_MS = 1000;
/** Longest silence on a connection. */
const IDLE_TIMEOUT_MS = 5000;
/** Longest whole call with a body of the largest upload. */
const TRANSFER_TIMEOUT_MS = 30_000;
const ANSWER_TIMEOUT_MS = 5000;
const ATTEMPTS = 2;
/** A store on our own machine takes any region; hosted ones read it from their endpoint. */
const REGION = 'us-east-1';

export type StoredObject = { readonly key: string; readonly bytes: number; readonly storedAt: Date };
export type ObjectStream = { readonly stream: Readable; readonly bytes: number };
export type ObjectContent = { readonly body: Buffer | (() => Readable); readonly bytes: number; readonly contentType: string };

/** Bytes of photos and files in an S3-compatible store. Knows no rows: who may see an object is its caller's business. */
@Injectable()
export class StorageService implements OnApplicationBootstrap, OnApplicationShutdown {
  private readonly client: S3Client;
  private readonly bucket: string;

  constructor(private readonly env: Env) {
    this.bucket = env.OBJECT_STORE_BUCKET;
    this.client = new S3Client({
      endpoint: env.OBJECT_STORE_ENDPOINT,
      region: REGION,
      forcePathStyle: true,
      credentials: { accessKeyId: env.OBJECT_STORE_ACCESS_KEY, secretAccessKey: env.OBJECT_STORE_SECRET_KEY },
      // The default adds trailing checksums that many compatible stores do not understand.
      requestChecksumCalculation: 'WHEN_REQUIRED',
      responseChecksumValidation: 'WHEN_REQUIRED',
      maxAttempts: ATTEMPTS,
      requestHandler: { connectionTimeout: CONNECTION_TIMEOUT_MS, socketTimeout: IDLE_TIMEOUT_MS },
    });
  }

  /** In production the bucket, its rights and its backup are made by whoever runs the service. A store that is down must not stop the start. */
  async onApplicationBootstrap(): Promise<void> {
    if (this.env.isProduction) return;
    await this.ensureBucket().catch((error: unknown) => {
      if (!(error instanceof StorageUnavailableError)) throw error;
    });
  }

  onApplicationShutdown(): void {
    this.client.destroy();
  }

  /**
   * Stores an object and checks that the store kept all of it. An object of that key and size is left alone, so a key that names its
   * content is written once.
   *
   * @throws StorageUnavailableError, ObjectDamagedError
   */
  async put(key: string, content: ObjectContent): Promise<void> {
    if ((await this.head(key))?.bytes === content.bytes) return;
    const body = typeof content.body === 'function' ? content.body() : content.body;
    const command = new PutObjectCommand({
      Bucket: this.bucket,
      Key: key,
      Body: body,
      ContentLength: content.bytes,
      ContentType: content.contentType,
    });
    await reaching(() => this.client.send(command, { abortSignal: AbortSignal.timeout(TRANSFER_TIMEOUT_MS) }));
    if ((await this.head(key))?.bytes !== content.bytes) throw new ObjectDamagedError(key);
  }

  /** @throws ObjectMissingError, StorageUnavailableError */
  async get(key: string): Promise<ObjectStream> {
    const command = new GetObjectCommand({ Bucket: this.bucket, Key: key });
    const answer = await reaching(() => this.client.send(command, { abortSignal: AbortSignal.timeout(TRANSFER_TIMEOUT_MS) }), key);
    if (!(answer.Body instanceof Readable) || answer.ContentLength === undefined) throw new StorageUnavailableError();
    return { stream: answer.Body, bytes: answer.ContentLength };
  }

  /**
   * A whole object, checked against the hash that its row promises.
   *
   * @throws ObjectMissingError, ObjectDamagedError, StorageUnavailableError
   */
  async getWhole(key: string, sha256: string): Promise<Buffer> {
    const { stream } = await this.get(key);
    const bytes = await reaching(async () => Buffer.concat(await stream.toArray()));
    if (createHash('sha256').update(bytes).digest('hex') !== sha256) throw new ObjectDamagedError(key);
    return bytes;
  }

  async head(key: string): Promise<StoredObject | undefined> {
    try {
      const command = new HeadObjectCommand({ Bucket: this.bucket, Key: key });
      const answer = await reaching(() => this.client.send(command, { abortSignal: AbortSignal.timeout(ANSWER_TIMEOUT_MS) }), key);
      return { key, bytes: answer.ContentLength ?? 0, storedAt: answer.LastModified ?? new Date(0) };
    } catch (error) {
      if (error instanceof ObjectMissingError) return undefined;
      throw error;
    }
  }

  /** Deleting what is not there succeeds. */
  async delete(key: string): Promise<void> {
    const command = new DeleteObjectCommand({ Bucket: this.bucket, Key: key });
    await reaching(() => this.client.send(command, { abortSignal: AbortSignal.timeout(ANSWER_TIMEOUT_MS) }));
  }

  async *list(prefix: string): AsyncGenerator<StoredObject> {
    let continuation: string | undefined;
    do {
      const command = new ListObjectsV2Command({ Bucket: this.bucket, Prefix: prefix, ContinuationToken: continuation });
      const page = await reaching(() => this.client.send(command, { abortSignal: AbortSignal.timeout(ANSWER_TIMEOUT_MS) }));
      for (const object of page.Contents ?? []) {
        if (object.Key !== undefined) yield { key: object.Key, bytes: object.Size ?? 0, storedAt: object.LastModified ?? new Date() };
      }
      continuation = page.IsTruncated ? page.NextContinuationToken : undefined;
    } while (continuation !== undefined);
  }

  /** For readiness: does the store answer, and is our bucket there? */
  async isReachable(): Promise<boolean> {
    const command = new HeadBucketCommand({ Bucket: this.bucket });
    return this.client.send(command, { abortSignal: AbortSignal.timeout(ANSWER_TIMEOUT_MS) }).then(
      () => true,
      () => false,
    );
  }

  async ensureBucket(): Promise<void> {
    if (await this.isReachable()) return;
    const command = new CreateBucketCommand({ Bucket: this.bucket });
    await reaching(() => this.client.send(command, { abortSignal: AbortSignal.timeout(ANSWER_TIMEOUT_MS) })).catch((error: unknown) => {
      // Two processes may start at once: the second finds the bucket made.
      if (!isBucketOurs(error)) throw error;
    });
  }
}

/** The store's failures in our words; a missing object is told apart only where a key is asked for. */
async function reaching<T>(call: () => Promise<T>, key?: string): Promise<T> {
  try {
    return await call();
  } catch (error) {
    if (key !== undefined && error instanceof S3ServiceException && error.$metadata.httpStatusCode === 404)
      throw new ObjectMissingError(key);
    throw new StorageUnavailableError({ cause: error });
  }
}

function isBucketOurs(error: unknown): boolean {
  const cause = error instanceof StorageUnavailableError ? error.cause : undefined;
  return cause instanceof S3ServiceException && ['BucketAlreadyOwnedByYou', 'BucketAlreadyExists'].includes(cause.name);
}
