import { createHash } from 'node:crypto';
import { once } from 'node:events';
import { createReadStream } from 'node:fs';
import type { Readable } from 'node:stream';
import S3Error from 's3rver/lib/models/error.js';
import S3Object from 's3rver/lib/models/object.js';
import FilesystemStore, { type Metadata } from 's3rver/lib/stores/filesystem.js';
import { join, receive } from './objectFiles';
import { UnfinishedUploads } from './unfinishedUploads';

/** Source: Amazon S3 User Guide, "Amazon S3 multipart upload limits": every part but the last. */
const smallestPartBytes = 5 * 1024 * 1024;

/** s3rver's store on files, with what it does wrong put right: half-written objects, keys that leave the folder, ranges, parts. */
export class Objects extends FilesystemStore {
  private readonly completing = new Map<string, Promise<{ md5: string; size: number }>>();

  uploadsOf(bucket: string) {
    return new UnfinishedUploads(this.getResourcePath(bucket, undefined, 'uploads'));
  }

  override getResourcePath(bucket: string, key: string | undefined, resource: string) {
    const names = (key ?? '').split('/');
    if (names.includes('..') || names.includes('.') || key?.includes('\0'))
      throw new S3Error('InvalidArgument', 'Bad key.');
    // a name of a file has room for 255 bytes, and the store adds its suffixes
    if (names.some((name) => Buffer.byteLength(name) > 200))
      throw new S3Error('KeyTooLongError', 'The key is too long.');
    return super.getResourcePath(bucket, key, resource);
  }

  override async getObject(bucket: string, key: string, asked: { start?: number; end?: number } = {}) {
    if (asked.start === undefined || asked.end === undefined) return super.getObject(bucket, key, asked);
    const metadata = await this.getMetadata(bucket, key);
    const { start, end } = asked;
    const content: Readable = createReadStream(this.getResourcePath(bucket, key, 'object'), { start, end });
    await once(content, 'open');
    return Object.assign(new S3Object(bucket, key, content, metadata), { range: { start, end } });
  }

  override async putObject({ bucket, key, content, metadata }: S3Object) {
    const { keep, size, md5 } = await receive(content ?? Buffer.alloc(0), this.getResourcePath(bucket, key, 'object'));
    await this.putMetadata(bucket, key, metadata, md5);
    await keep();
    return { size, md5 };
  }

  override async copyObject(
    fromBucket: string,
    fromKey: string,
    toBucket: string,
    toKey: string,
    given: Metadata | null,
  ) {
    const from = this.getResourcePath(fromBucket, fromKey, 'object');
    const to = this.getResourcePath(toBucket, toKey, 'object');
    const { etag, ...stored } = await this.getMetadata(fromBucket, fromKey);
    const keep = from === to ? undefined : await join([from], to);
    await this.putMetadata(toBucket, toKey, given ?? stored, JSON.parse(etag));
    await keep?.();
    return this.getMetadata(toBucket, toKey);
  }

  override async putPart(bucket: string, uploadId: string, partNumber: string, content: Readable) {
    return this.uploadsOf(bucket).receivePart(uploadId, partNumber, content);
  }

  /** Asked twice at once (a double click, a retry after a lost answer), both get the one result. */
  override putObjectMultipart(bucket: string, uploadId: string, parts: { number: number; etag: string }[]) {
    const running = this.completing.get(uploadId);
    if (running) return running;
    const result = this.complete(bucket, uploadId, parts).finally(() => this.completing.delete(uploadId));
    this.completing.set(uploadId, result);
    return result;
  }

  private async complete(bucket: string, uploadId: string, asked: { number: number; etag: string }[]) {
    const uploads = this.uploadsOf(bucket);
    const upload = await uploads.one(uploadId);
    const here = new Map((await uploads.parts(upload)).map((part) => [part.number, part]));
    const parts = asked.map(({ number, etag }, i) => {
      const part = here.get(number);
      if (part?.md5 !== etag) throw new S3Error('InvalidPart', `Part ${number} is missing or another one.`);
      if (number <= (asked[i - 1]?.number ?? 0)) throw new S3Error('InvalidPartOrder', 'The parts are not in order.');
      if (i < asked.length - 1 && part.size < smallestPartBytes) {
        throw new S3Error('EntityTooSmall', `Part ${number} has ${part.size} bytes.`);
      }
      return part;
    });
    const md5s = Buffer.concat(parts.map((part) => Buffer.from(part.md5, 'hex')));
    const etag = `${createHash('md5').update(md5s).digest('hex')}-${parts.length}`;
    const keep = await join(
      parts.map((part) => part.file),
      this.getResourcePath(bucket, upload.key, 'object'),
    );
    const object = new S3Object(bucket, upload.key, null, upload.metadata);
    await this.putMetadata(bucket, upload.key, object.metadata, etag);
    await keep();
    await uploads.remove(uploadId);
    return { md5: etag, size: parts.reduce((sum, part) => sum + part.size, 0) };
  }
}
