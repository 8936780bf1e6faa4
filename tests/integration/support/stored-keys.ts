import { ListObjectsV2Command, S3Client } from '@aws-sdk/client-s3';
import { env } from '@/lib/server/env';

const client = new S3Client({
  endpoint: env.S3_ENDPOINT,
  region: env.S3_REGION,
  credentials: { accessKeyId: env.S3_ACCESS_KEY_ID, secretAccessKey: env.S3_SECRET_ACCESS_KEY },
  forcePathStyle: true,
});

/** What lies in the object store under a prefix, asked of the store itself. */
export async function storedKeys(prefix: string): Promise<string[]> {
  const { Contents = [] } = await client.send(new ListObjectsV2Command({ Bucket: env.S3_BUCKET, Prefix: prefix }));
  return Contents.flatMap(({ Key }) => Key ?? []).sort();
}
