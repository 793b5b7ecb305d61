import {
  BucketAlreadyExists,
  BucketAlreadyOwnedByYou,
  CreateBucketCommand,
  PutBucketCorsCommand,
  S3Client,
} from '@aws-sdk/client-s3';

type Access = { endpoint: string; region: string; accessKeyId: string; secretAccessKey: string };

/** Makes the bucket where it is missing and lets pages of these origins send parts to it and read their ETags. */
export async function makeBucket(access: Access, bucket: string, origins: readonly string[]) {
  const client = new S3Client({
    region: access.region,
    endpoint: access.endpoint,
    forcePathStyle: true,
    credentials: access,
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
  });
  try {
    await client.send(new CreateBucketCommand({ Bucket: bucket })).catch((error: unknown) => {
      if (!(error instanceof BucketAlreadyExists || error instanceof BucketAlreadyOwnedByYou)) throw error;
    });
    await client.send(
      new PutBucketCorsCommand({
        Bucket: bucket,
        CORSConfiguration: {
          CORSRules: [
            {
              AllowedOrigins: [...origins],
              AllowedMethods: ['GET', 'HEAD', 'PUT'],
              AllowedHeaders: ['*'],
              ExposeHeaders: ['ETag'],
              MaxAgeSeconds: 3600,
            },
          ],
        },
      }),
    );
  } finally {
    client.destroy();
  }
}
