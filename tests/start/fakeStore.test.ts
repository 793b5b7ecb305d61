import { createHash, randomBytes } from 'node:crypto';
import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import http from 'node:http';
import { tmpdir } from 'node:os';
import path from 'node:path';
import {
  AbortMultipartUploadCommand,
  CompleteMultipartUploadCommand,
  CopyObjectCommand,
  CreateMultipartUploadCommand,
  GetObjectCommand,
  HeadObjectCommand,
  ListMultipartUploadsCommand,
  ListObjectsV2Command,
  ListPartsCommand,
  PutObjectCommand,
  S3Client,
  type S3ClientConfig,
  UploadPartCommand,
} from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeBucket } from '../../storage/local/bucket';
import { type FakeStore, startFakeStore } from '../../storage/local/fakeStore';

const Bucket = 'films';
const origin = 'http://localhost:4310';
const access = { accessKeyId: 'tester', secretAccessKey: randomBytes(24).toString('hex') };
const region = 'us-east-1';
let folder: string;
let store: FakeStore;
let client: S3Client;

const connect = (more: S3ClientConfig = {}) =>
  new S3Client({ region, endpoint: store.endpoint, forcePathStyle: true, credentials: access, ...more });

beforeAll(async () => {
  folder = mkdtempSync(path.join(tmpdir(), 'tapeline-store-'));
  store = await startFakeStore({ folder, port: 0, ...access });
  client = connect({ requestChecksumCalculation: 'WHEN_REQUIRED', responseChecksumValidation: 'WHEN_REQUIRED' });
  await makeBucket({ endpoint: store.endpoint, region, ...access }, Bucket, [origin]);
});
afterAll(async () => {
  client.destroy();
  await store.close();
  rmSync(folder, { recursive: true, force: true });
});

const put = (Key: string, Body: string | Buffer) => client.send(new PutObjectCommand({ Bucket, Key, Body }));
async function get(Key: string, Range?: string) {
  const { Body, ContentRange } = await client.send(new GetObjectCommand({ Bucket, Key, Range }));
  return { bytes: Buffer.from((await Body?.transformToByteArray()) ?? []), range: ContentRange };
}
const sha256 = (bytes: Buffer) => createHash('sha256').update(bytes).digest('base64');
const filesLeft = () => readdirSync(folder, { recursive: true }).filter((name) => String(name).endsWith('.unfinished'));

describe('who may come in', () => {
  it('refuses a request without a signature, with a wrong key, and with a wrong secret', async () => {
    await put('closed', 'secret');
    expect((await fetch(`${store.endpoint}/${Bucket}/closed`)).status).toBe(403);
    for (const wrong of [
      { ...access, secretAccessKey: 'guess' },
      { ...access, accessKeyId: 'S3RVER' },
    ]) {
      const stranger = connect({ credentials: wrong });
      await expect(stranger.send(new GetObjectCommand({ Bucket, Key: 'closed' }))).rejects.toMatchObject({
        $metadata: { httpStatusCode: 403 },
      });
      stranger.destroy();
    }
  });

  it('takes a presigned address as it was signed and not changed, and only until it is over', async () => {
    await put('shown', 'picture');
    const url = await getSignedUrl(client, new GetObjectCommand({ Bucket, Key: 'shown' }), { expiresIn: 60 });
    expect(await (await fetch(url)).text()).toBe('picture');
    expect((await fetch(url.replace('/shown', '/closed'))).status).toBe(403);
    expect((await fetch(url.replace('X-Amz-Expires=60', 'X-Amz-Expires=6000'))).status).toBe(403);
    expect((await fetch(url, { method: 'DELETE' })).status).toBe(403);
    const signingDate = new Date(Date.now() - 120_000);
    const old = await getSignedUrl(client, new GetObjectCommand({ Bucket, Key: 'shown' }), {
      expiresIn: 60,
      signingDate,
    });
    expect((await fetch(old)).status).toBe(403);
  });

  it('keeps a key inside its bucket', async () => {
    // fetch would tidy the path before it is sent
    const status = await new Promise((resolve, reject) => {
      const path = `/${Bucket}/..%2f..%2fetc%2fpasswd`;
      http.get(`${store.endpoint}`, { path }, (answer) => resolve(answer.resume().statusCode)).on('error', reject);
    });
    expect(status).toBe(400);
    await expect(put('up/../../../out', 'x')).rejects.toMatchObject({ $metadata: { httpStatusCode: 400 } });
  });

  it('lets pages of the product send parts and read the ETag, and no others', async () => {
    const asked = (from: string) =>
      fetch(`${store.endpoint}/${Bucket}/part`, {
        method: 'OPTIONS',
        headers: {
          Origin: from,
          'Access-Control-Request-Method': 'PUT',
          'Access-Control-Request-Headers': 'x-amz-checksum-sha256',
        },
      });
    expect((await asked(origin)).status).toBe(200);
    expect((await asked('http://elsewhere.example')).status).toBe(403);
    const url = await getSignedUrl(client, new PutObjectCommand({ Bucket, Key: 'part' }), { expiresIn: 60 });
    const answer = await fetch(url, { method: 'PUT', body: 'x', headers: { Origin: origin } });
    expect(answer.headers.get('access-control-expose-headers')).toContain('ETag');
    // a refusal can be read by the page as well
    const refused = await fetch(`${url}0`, { method: 'PUT', body: 'x', headers: { Origin: origin } });
    expect([refused.status, refused.headers.get('access-control-allow-origin')]).toEqual([403, origin]);
  });
});

// Source: RFC 9110, 14.1.2 and 14.4
describe('ranges', () => {
  const bytes = Buffer.from(Array.from({ length: 1000 }, (_, i) => i % 251));
  beforeAll(() => put('ranged', bytes));

  it.each([
    ['bytes=0-0', 0, 0],
    ['bytes=-500', 500, 999],
    ['bytes=-5000', 0, 999],
    ['bytes=10-19', 10, 19],
    ['bytes=990-', 990, 999],
    ['bytes=990-5000', 990, 999],
  ])('answers %s with bytes %d to %d', async (range, start, end) => {
    const answer = await get('ranged', range);
    expect(answer.range).toBe(`bytes ${start}-${end}/1000`);
    expect(answer.bytes.equals(bytes.subarray(start, end + 1))).toBe(true);
  });

  it.each(['bytes=1000-', 'bytes=-0'])('answers %s with 416', async (range) => {
    await expect(get('ranged', range)).rejects.toMatchObject({ $metadata: { httpStatusCode: 416 } });
  });

  it('refuses when the object is another one than was expected', async () => {
    const ask = new GetObjectCommand({ Bucket, Key: 'ranged', IfMatch: '"00"' });
    await expect(client.send(ask)).rejects.toMatchObject({ $metadata: { httpStatusCode: 412 } });
  });
});

describe('what is stored', () => {
  it('is the content without the framing of a streamed body', async () => {
    const framing = connect({ requestChecksumCalculation: 'WHEN_SUPPORTED' });
    const bytes = randomBytes(300_000);
    await framing.send(new PutObjectCommand({ Bucket, Key: 'framed', Body: bytes, ChecksumAlgorithm: 'CRC32' }));
    const { Readable } = await import('node:stream');
    const parts = [bytes.subarray(0, 100_000), bytes.subarray(100_000)];
    await framing.send(
      new PutObjectCommand({ Bucket, Key: 'streamed', Body: Readable.from(parts), ContentLength: bytes.length }),
    );
    expect((await get('framed')).bytes.equals(bytes)).toBe(true);
    expect((await get('streamed')).bytes.equals(bytes)).toBe(true);
    framing.destroy();
  });

  it('is nothing where the checksum differs', async () => {
    const wrong = new PutObjectCommand({
      Bucket,
      Key: 'broken',
      Body: 'right',
      ChecksumSHA256: sha256(Buffer.from('wrong')),
    });
    await expect(client.send(wrong)).rejects.toMatchObject({ name: 'BadDigest' });
    await expect(get('broken')).rejects.toMatchObject({ name: 'NoSuchKey' });
    expect(filesLeft()).toEqual([]);
  });

  it('is the old object, whole, where the connection closes before the new one came', async () => {
    await put('replaced', 'the old one');
    const url = await getSignedUrl(client, new PutObjectCommand({ Bucket, Key: 'replaced' }), { expiresIn: 60 });
    await new Promise<void>((resolve) => {
      const request = http.request(url, { method: 'PUT', headers: { 'Content-Length': 1_000_000 } });
      request.on('error', () => resolve());
      request.write(randomBytes(200_000), () => setTimeout(() => request.destroy(), 50));
    });
    await expect.poll(filesLeft).toEqual([]);
    expect((await get('replaced')).bytes.toString()).toBe('the old one');
  });

  it('is not written twice where it must be new', async () => {
    await put('once', 'first');
    const second = new PutObjectCommand({ Bucket, Key: 'once', Body: 'second', IfNoneMatch: '*' });
    await expect(client.send(second)).rejects.toMatchObject({ $metadata: { httpStatusCode: 412 } });
    expect((await get('once')).bytes.toString()).toBe('first');
  });

  it('is copied whole with its type', async () => {
    await client.send(new PutObjectCommand({ Bucket, Key: 'a b', Body: 'text', ContentType: 'text/vtt' }));
    await client.send(
      new CopyObjectCommand({ Bucket, Key: 'copied', CopySource: `${Bucket}/${encodeURIComponent('a b')}` }),
    );
    const head = await client.send(new HeadObjectCommand({ Bucket, Key: 'copied' }));
    expect([head.ContentType, head.ContentLength]).toEqual(['text/vtt', 4]);
  });

  it('is listed page by page', async () => {
    const keys = Array.from({ length: 7 }, (_, i) => `listed/${i}`);
    await Promise.all(keys.map((key) => put(key, key)));
    const found: string[] = [];
    let ContinuationToken: string | undefined;
    do {
      const page = await client.send(
        new ListObjectsV2Command({ Bucket, Prefix: 'listed/', MaxKeys: 3, ContinuationToken }),
      );
      found.push(...(page.Contents ?? []).map((object) => object.Key ?? ''));
      ContinuationToken = page.NextContinuationToken;
    } while (ContinuationToken);
    expect(found).toEqual(keys);
  });

  it('loses what a killed store left half written, and nothing else', async () => {
    const other = path.join(folder, '..', `${path.basename(folder)}-killed`);
    const killed = await startFakeStore({ folder: other, port: 0, ...access });
    await makeBucket({ endpoint: killed.endpoint, region, ...access }, Bucket, [origin]);
    writeFileSync(path.join(other, Bucket, 'half._S3rver_object.abc.unfinished'), 'half');
    await killed.close();
    const again = await startFakeStore({ folder: other, port: 0, ...access });
    expect(readdirSync(path.join(other, Bucket)).filter((name) => name.includes('half'))).toEqual([]);
    await again.close();
    rmSync(other, { recursive: true });
  });
});

describe('uploads in parts', () => {
  const big = randomBytes(5 * 1024 * 1024);
  const small = randomBytes(1000);
  const begin = async (Key: string) =>
    (
      await client.send(
        new CreateMultipartUploadCommand({ Bucket, Key, ContentType: 'video/mp4', ChecksumAlgorithm: 'SHA256' }),
      )
    ).UploadId ?? '';
  const send = (Key: string, UploadId: string, PartNumber: number, Body: Buffer) =>
    client.send(new UploadPartCommand({ Bucket, Key, UploadId, PartNumber, Body }));

  it('come through a presigned address that carries the checksum, which is checked', async () => {
    const UploadId = await begin('presigned');
    const command = new UploadPartCommand({
      Bucket,
      Key: 'presigned',
      UploadId,
      PartNumber: 1,
      ContentLength: small.length,
      ChecksumSHA256: sha256(small),
    });
    const url = await getSignedUrl(client, command, {
      expiresIn: 60,
      unhoistableHeaders: new Set(['x-amz-checksum-sha256']),
    });
    const headers = { 'x-amz-checksum-sha256': sha256(small) };
    const changed = Buffer.from(small);
    changed[500] = (changed[500] ?? 0) ^ 1;
    expect((await fetch(url, { method: 'PUT', headers, body: changed })).status).toBe(400);
    const { Parts: none } = await client.send(new ListPartsCommand({ Bucket, Key: 'presigned', UploadId }));
    expect(none ?? []).toEqual([]);
    expect((await fetch(url, { method: 'PUT', body: small })).status).toBe(403);
    const good = await fetch(url, { method: 'PUT', headers, body: small });
    expect(good.status).toBe(200);
    const { Parts } = await client.send(new ListPartsCommand({ Bucket, Key: 'presigned', UploadId }));
    expect(Parts).toMatchObject([
      { PartNumber: 1, Size: 1000, ETag: good.headers.get('etag'), ChecksumSHA256: sha256(small) },
    ]);
  });

  it('become one object, once, though it is asked for twice at the same time', async () => {
    const Key = 'joined';
    const UploadId = await begin(Key);
    const sent = [await send(Key, UploadId, 1, big), await send(Key, UploadId, 2, small)];
    const Parts = sent.map(({ ETag }, i) => ({ ETag, PartNumber: i + 1 }));
    const complete = () =>
      client.send(new CompleteMultipartUploadCommand({ Bucket, Key, UploadId, MultipartUpload: { Parts } }));
    const [one, two] = await Promise.all([complete(), complete()]);
    expect(one.ETag).toBe(two.ETag);
    expect((await get(Key)).bytes.equals(Buffer.concat([big, small]))).toBe(true);
    const head = await client.send(new HeadObjectCommand({ Bucket, Key }));
    expect(head.ContentType).toBe('video/mp4');
    await expect(complete()).rejects.toMatchObject({ name: 'NoSuchUpload' });
  });

  it('are refused with a missing part, another part, and a part that is too small', async () => {
    const Key = 'refused';
    const UploadId = await begin(Key);
    const { ETag } = await send(Key, UploadId, 1, small);
    await send(Key, UploadId, 2, small);
    const complete = (Parts: { ETag: string | undefined; PartNumber: number }[]) =>
      client.send(new CompleteMultipartUploadCommand({ Bucket, Key, UploadId, MultipartUpload: { Parts } }));
    await expect(complete([{ ETag, PartNumber: 3 }])).rejects.toMatchObject({ name: 'InvalidPart' });
    await expect(complete([{ ETag: '"00"', PartNumber: 1 }])).rejects.toMatchObject({ name: 'InvalidPart' });
    const both = [1, 2].map((PartNumber) => ({ ETag, PartNumber }));
    await expect(complete(both)).rejects.toMatchObject({ name: 'EntityTooSmall' });
  });

  it('can be listed and given up, and leave nothing', async () => {
    const Key = 'given-up';
    const UploadId = await begin(Key);
    await send(Key, UploadId, 1, small);
    const list = async () =>
      (await client.send(new ListMultipartUploadsCommand({ Bucket, Prefix: Key }))).Uploads ?? [];
    expect(await list()).toMatchObject([{ Key, UploadId }]);
    await client.send(new AbortMultipartUploadCommand({ Bucket, Key, UploadId }));
    expect(await list()).toEqual([]);
    await expect(send(Key, UploadId, 2, small)).rejects.toMatchObject({ name: 'NoSuchUpload' });
    await expect(client.send(new ListPartsCommand({ Bucket, Key, UploadId }))).rejects.toMatchObject({
      name: 'NoSuchUpload',
    });
  });
});
