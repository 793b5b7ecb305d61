import { createReadStream } from 'node:fs';
import { stat } from 'node:fs/promises';
import http from 'node:http';
import https from 'node:https';
import type { Readable } from 'node:stream';
import {
  AbortMultipartUploadCommand,
  type CompletedPart,
  CompleteMultipartUploadCommand,
  CreateMultipartUploadCommand,
  DeleteObjectCommand,
  GetObjectCommand,
  HeadBucketCommand,
  HeadObjectCommand,
  ListObjectsV2Command,
  ListPartsCommand,
  PutObjectCommand,
  S3Client,
  UploadPartCommand,
} from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { NodeHttpHandler } from '@smithy/node-http-handler';

export type StoreConfig = {
  endpoint: string | undefined;
  publicEndpoint: string | undefined;
  region: string;
  bucket: string;
  accessKeyId: string;
  secretAccessKey: string;
};

export type ObjectStore = ReturnType<typeof openStore>;

const isMissing = (error: unknown) =>
  error instanceof Error && (error.name === 'NotFound' || error.name === 'NoSuchKey' || error.name === 'NoSuchUpload');

/** The one way to the object store, whichever S3 endpoint it is. */
export function openStore(config: StoreConfig) {
  const { bucket: Bucket } = config;
  const client = clientFor(config, config.endpoint);
  const publicClient = config.publicEndpoint === config.endpoint ? client : clientFor(config, config.publicEndpoint);

  return {
    /** Writes a file under a name, whole or not at all. @returns its size in bytes */
    async putFile(key: string, path: string, contentType: string): Promise<number> {
      const { size } = await stat(path);
      await client.send(
        new PutObjectCommand({
          Bucket,
          Key: key,
          Body: createReadStream(path),
          ContentLength: size,
          ContentType: contentType,
        }),
      );
      return size;
    },
    async putBytes(key: string, bytes: Uint8Array, contentType: string): Promise<void> {
      await client.send(new PutObjectCommand({ Bucket, Key: key, Body: bytes, ContentType: contentType }));
    },
    async read(key: string, signal?: AbortSignal): Promise<Readable> {
      const answer = await client.send(new GetObjectCommand({ Bucket, Key: key }), {
        ...(signal ? { abortSignal: signal } : {}),
      });
      return answer.Body as Readable;
    },
    /** Size and type of an object, or null where there is none. */
    async head(key: string): Promise<{ sizeBytes: number; contentType: string } | null> {
      try {
        const answer = await client.send(new HeadObjectCommand({ Bucket, Key: key }));
        return { sizeBytes: answer.ContentLength ?? 0, contentType: answer.ContentType ?? 'application/octet-stream' };
      } catch (error) {
        if (isMissing(error)) return null;
        throw error;
      }
    },
    /** Every key under a prefix, a page at a time. */
    async *list(prefix: string): AsyncGenerator<string> {
      let token: string | undefined;
      do {
        const answer = await client.send(
          new ListObjectsV2Command({ Bucket, Prefix: prefix, ContinuationToken: token }),
        );
        for (const object of answer.Contents ?? []) if (object.Key) yield object.Key;
        token = answer.IsTruncated ? answer.NextContinuationToken : undefined;
      } while (token);
    },
    async remove(key: string): Promise<void> {
      await client.send(new DeleteObjectCommand({ Bucket, Key: key }));
    },
    /** An address that the web process itself reads from; never handed to a browser. */
    presignRead(key: string, seconds: number): Promise<string> {
      return getSignedUrl(client, new GetObjectCommand({ Bucket, Key: key }), { expiresIn: seconds });
    },
    async openUpload(key: string, contentType: string): Promise<string> {
      const answer = await client.send(
        new CreateMultipartUploadCommand({ Bucket, Key: key, ContentType: contentType, ChecksumAlgorithm: 'SHA256' }),
      );
      if (!answer.UploadId) throw new Error('The store opened no upload.');
      return answer.UploadId;
    },
    /** An address at which a browser may put exactly these bytes; the store refuses any others. */
    presignPart(
      key: string,
      part: { uploadId: string; number: number; sizeBytes: number; sha256: string },
      seconds: number,
    ): Promise<string> {
      return getSignedUrl(
        publicClient,
        new UploadPartCommand({
          Bucket,
          Key: key,
          UploadId: part.uploadId,
          PartNumber: part.number,
          ContentLength: part.sizeBytes,
          ChecksumSHA256: part.sha256,
        }),
        { expiresIn: seconds, unhoistableHeaders: new Set(['x-amz-checksum-sha256']) },
      );
    },
    /** What the store holds of an upload; null when it knows none. */
    async partsOf(
      key: string,
      uploadId: string,
    ): Promise<{ number: number; etag: string; sizeBytes: number }[] | null> {
      const parts: { number: number; etag: string; sizeBytes: number }[] = [];
      let marker: string | undefined;
      try {
        do {
          const answer = await client.send(
            new ListPartsCommand({ Bucket, Key: key, UploadId: uploadId, PartNumberMarker: marker }),
          );
          for (const part of answer.Parts ?? [])
            parts.push({ number: part.PartNumber ?? 0, etag: part.ETag ?? '', sizeBytes: part.Size ?? 0 });
          marker = answer.IsTruncated ? answer.NextPartNumberMarker : undefined;
        } while (marker);
        return parts;
      } catch (error) {
        if (isMissing(error)) return null;
        throw error;
      }
    },
    async completeUpload(
      key: string,
      uploadId: string,
      parts: { number: number; etag: string; sha256: string }[],
    ): Promise<void> {
      const Parts: CompletedPart[] = parts.map((part) => ({
        PartNumber: part.number,
        ETag: part.etag,
        ChecksumSHA256: part.sha256,
      }));
      await client.send(
        new CompleteMultipartUploadCommand({ Bucket, Key: key, UploadId: uploadId, MultipartUpload: { Parts } }),
      );
    },
    async abortUpload(key: string, uploadId: string): Promise<void> {
      try {
        await client.send(new AbortMultipartUploadCommand({ Bucket, Key: key, UploadId: uploadId }));
      } catch (error) {
        if (!isMissing(error)) throw error;
      }
    },
    async isReachable(): Promise<boolean> {
      try {
        await client.send(new HeadBucketCommand({ Bucket }), { abortSignal: AbortSignal.timeout(2000) });
        return true;
      } catch {
        return false;
      }
    },
    /** the origin that browsers send parts to, for the content security policy */
    publicOrigin: config.publicEndpoint ? new URL(config.publicEndpoint).origin : null,
    close() {
      client.destroy();
      if (publicClient !== client) publicClient.destroy();
    },
  };
}

function clientFor(config: StoreConfig, endpoint: string | undefined): S3Client {
  return new S3Client({
    region: config.region,
    ...(endpoint ? { endpoint, forcePathStyle: true } : {}),
    credentials: { accessKeyId: config.accessKeyId, secretAccessKey: config.secretAccessKey },
    // checksums that nobody asked for break stores that speak an older S3
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    requestHandler: new NodeHttpHandler({
      httpAgent: new http.Agent({ keepAlive: true, maxSockets: 256 }),
      httpsAgent: new https.Agent({ keepAlive: true, maxSockets: 256 }),
    }),
  });
}
