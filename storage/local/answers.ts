import type { S3Context } from 's3rver';
import S3Error from 's3rver/lib/models/error.js';
import type { Objects } from './objects';

const xmlns = { '@': { xmlns: 'http://s3.amazonaws.com/doc/2006-03-01/' } };
const pageMax = 1000;

export type Address = { bucket: string; key: string; query: URLSearchParams };

/**
 * Answers the operations that s3rver lacks or gets wrong; undefined where the request is none of them.
 * Source: Amazon S3 API Reference, the operation named at each line.
 */
export function answerFor(method: string, { bucket, key, query }: Address) {
  const uploadId = query.get('uploadId');
  if (bucket === '') return undefined;
  if (key !== '' && uploadId !== null && method === 'DELETE') return abortMultipartUpload;
  if (key !== '' && uploadId !== null && method === 'GET') return listParts;
  if (key === '' && query.has('uploads') && method === 'GET') return listMultipartUploads;
  if (key === '' && query.get('list-type') === '2' && method === 'GET') return listObjectsV2;
  return undefined;
}

async function abortMultipartUpload(ctx: S3Context, objects: Objects, { bucket, query }: Address) {
  await objects.uploadsOf(bucket).remove(query.get('uploadId') ?? '');
  ctx.status = 204;
}

async function listParts(ctx: S3Context, objects: Objects, { bucket, key, query }: Address) {
  const uploads = objects.uploadsOf(bucket);
  const upload = await uploads.one(query.get('uploadId') ?? '');
  if (upload.key !== key) throw new S3Error('NoSuchUpload', 'This upload belongs to another key.');
  const after = Number(query.get('part-number-marker') ?? 0);
  const size = pageSize(query.get('max-parts'));
  const left = (await uploads.parts(upload)).filter((part) => part.number > after);
  const page = left.slice(0, size);
  ctx.body = {
    ListPartsResult: {
      ...xmlns,
      Bucket: bucket,
      Key: key,
      UploadId: upload.id,
      PartNumberMarker: after,
      NextPartNumberMarker: page.at(-1)?.number ?? after,
      MaxParts: size,
      IsTruncated: left.length > page.length,
      Part: page.map((part) => ({
        PartNumber: part.number,
        LastModified: part.receivedAt.toISOString(),
        ETag: `"${part.md5}"`,
        Size: part.size,
        ChecksumSHA256: part.sha256,
      })),
    },
  };
}

async function listMultipartUploads(ctx: S3Context, objects: Objects, { bucket, query }: Address) {
  const prefix = query.get('prefix') ?? '';
  const uploads = await objects.uploadsOf(bucket).all();
  ctx.body = {
    ListMultipartUploadsResult: {
      ...xmlns,
      Bucket: bucket,
      MaxUploads: pageMax,
      IsTruncated: false,
      Upload: uploads
        .filter((upload) => upload.key.startsWith(prefix))
        .map((upload) => ({
          Key: upload.key,
          UploadId: upload.id,
          Initiated: upload.startedAt.toISOString(),
          StorageClass: 'STANDARD',
        })),
    },
  };
}

async function listObjectsV2(ctx: S3Context, objects: Objects, { bucket, query }: Address) {
  const size = pageSize(query.get('max-keys'));
  const token = query.get('continuation-token');
  const startAfter = token ? Buffer.from(token, 'base64url').toString() : (query.get('start-after') ?? '');
  const prefix = query.get('prefix') ?? '';
  const delimiter = query.get('delimiter') ?? '';
  const found =
    size === 0
      ? { objects: [], commonPrefixes: [], isTruncated: false }
      : await objects.listObjects(bucket, { delimiter, prefix, startAfter, maxKeys: size });
  const last = found.objects.at(-1);
  ctx.body = {
    ListBucketResult: {
      ...xmlns,
      Name: bucket,
      Prefix: prefix,
      KeyCount: found.objects.length,
      MaxKeys: size,
      IsTruncated: found.isTruncated,
      NextContinuationToken: found.isTruncated && last ? Buffer.from(last.key).toString('base64url') : undefined,
      Contents: found.objects.map((object) => ({
        Key: object.key,
        LastModified: object.lastModifiedDate.toISOString(),
        ETag: object.metadata.etag,
        Size: object.size,
        StorageClass: 'STANDARD',
      })),
      CommonPrefixes: found.commonPrefixes.map((Prefix) => ({ Prefix })),
    },
  };
}

function pageSize(asked: string | null) {
  const size = asked === null ? pageMax : Number(asked);
  if (!Number.isInteger(size) || size < 0)
    throw new S3Error('InvalidArgument', 'A page size is a whole number from 0.');
  return Math.min(pageMax, size);
}
