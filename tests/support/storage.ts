import { ListObjectsV2Command, S3Client } from "@aws-sdk/client-s3";
import { env } from "@/app/platform/env.server";

/** Everything in the bucket, so that a test can say that nothing was left behind. */
export async function storedKeys(): Promise<string[]> {
  const client = new S3Client({
    endpoint: env.S3_ENDPOINT,
    region: env.S3_REGION,
    forcePathStyle: true,
    credentials: { accessKeyId: env.S3_ACCESS_KEY_ID, secretAccessKey: env.S3_SECRET_ACCESS_KEY },
  });
  const keys: string[] = [];
  let token: string | undefined;
  do {
    const page = await client.send(
      new ListObjectsV2Command({ Bucket: env.S3_BUCKET, ContinuationToken: token }),
    );
    keys.push(...(page.Contents ?? []).flatMap((object) => object.Key ?? []));
    token = page.NextContinuationToken;
  } while (token);
  client.destroy();
  return keys.sort();
}
