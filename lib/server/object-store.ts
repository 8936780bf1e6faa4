import {
  CreateBucketCommand,
  DeleteObjectsCommand,
  GetObjectCommand,
  HeadBucketCommand,
  NoSuchKey,
  PutObjectCommand,
  S3Client,
  S3ServiceException,
} from '@aws-sdk/client-s3';
import { env } from './env';

/** Pictures live here, never in the database; keys are ours and never made from what a user typed. */

let sharedClient: S3Client | null = null;

function client(): S3Client {
  sharedClient ??= new S3Client({
    endpoint: env.S3_ENDPOINT,
    region: env.S3_REGION,
    credentials: { accessKeyId: env.S3_ACCESS_KEY_ID, secretAccessKey: env.S3_SECRET_ACCESS_KEY },
    forcePathStyle: true,
    // With the defaults some stores keep streamed uploads with the checksum framing inside the object.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
  });
  return sharedClient;
}

export interface StoredObject {
  readonly body: Uint8Array<ArrayBuffer>;
  readonly contentType: string;
}

/** Stores `body` under `key`, over whatever was there. Throws the store's error when it cannot be reached. */
export async function putObject(key: string, body: Uint8Array, contentType: string): Promise<void> {
  await client().send(
    new PutObjectCommand({
      Bucket: env.S3_BUCKET,
      Key: key,
      Body: body,
      ContentLength: body.byteLength,
      ContentType: contentType,
    }),
  );
}

/** The object under `key`; null where there is none. */
export async function getObject(key: string): Promise<StoredObject | null> {
  try {
    const answer = await client().send(new GetObjectCommand({ Bucket: env.S3_BUCKET, Key: key }));
    if (!answer.Body) return null;
    const body = await answer.Body.transformToByteArray();
    return { body: new Uint8Array(body), contentType: answer.ContentType ?? 'application/octet-stream' };
  } catch (error) {
    if (error instanceof NoSuchKey) return null;
    throw error;
  }
}

/** Removes objects; keys without an object are passed over. */
export async function deleteObjects(keys: readonly string[]): Promise<void> {
  if (keys.length === 0) return;
  const answer = await client().send(
    new DeleteObjectsCommand({ Bucket: env.S3_BUCKET, Delete: { Objects: keys.map((Key) => ({ Key })), Quiet: true } }),
  );
  const failed = answer.Errors ?? [];
  if (failed.length > 0) throw new Error(`The object store kept ${failed.map(({ Key }) => Key).join(', ')}`);
}

/** Makes the bucket where it is missing; for the setup step and for tests. */
export async function ensureBucket(): Promise<void> {
  try {
    await client().send(new HeadBucketCommand({ Bucket: env.S3_BUCKET }));
  } catch (error) {
    if (!(error instanceof S3ServiceException) || error.$metadata.httpStatusCode !== 404) throw error;
    await client().send(new CreateBucketCommand({ Bucket: env.S3_BUCKET }));
  }
}
