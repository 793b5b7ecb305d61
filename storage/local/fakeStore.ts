import { mkdir } from 'node:fs/promises';
import S3rver, { type S3Context, type S3Middleware } from 's3rver';
import Account from 's3rver/lib/models/account.js';
import S3Error from 's3rver/lib/models/error.js';
import { type Address, answerFor } from './answers';
import { isChunked, UnframeChunks } from './awsChunked';
import { sweepUnfinished } from './objectFiles';
import { Objects } from './objects';
import { bytesAsked } from './ranges';
import { checkSignature } from './signature';

export type FakeStoreOptions = {
  folder: string;
  /** 0 takes a free one */
  port: number;
  accessKeyId: string;
  secretAccessKey: string;
};

export type FakeStore = { endpoint: string; port: number; close(): Promise<void> };

/**
 * An S3 for development and tests, on loopback only: s3rver 3.7.1 with what is unsafe in it put right.
 * Not there: copying parts, lifecycle, tagging, and `//` in keys.
 */
export async function startFakeStore(options: FakeStoreOptions): Promise<FakeStore> {
  await mkdir(options.folder, { recursive: true });
  await sweepUnfinished(options.folder);
  // s3rver comes with a key of its own that everybody knows
  Account.registry.clear();
  new Account('1', 'local').createKeyPair(options.accessKeyId, options.secretAccessKey);

  const server = new S3rver({
    directory: options.folder,
    address: '127.0.0.1',
    port: options.port,
    silent: true,
    vhostBuckets: false,
  });
  const objects = new Objects(options.folder);
  server.store = objects;
  server.context.store = objects;
  // errors are answered and need no second word on the terminal
  server.silent = true;
  server.on('error', () => {});
  const router = server.middleware.pop();
  if (!router) throw new Error('s3rver has no router: another version?');
  server.middleware.push(repairs(objects, options), router);

  const { port } = await server.run();
  // an upload of a large part on a slow line takes longer than Node's five minutes
  server.httpServer.requestTimeout = 0;
  return {
    endpoint: `http://127.0.0.1:${port}`,
    port,
    async close() {
      const closed = server.close();
      server.httpServer.closeAllConnections();
      await closed;
    },
  };
}

function repairs(objects: Objects, keys: Pick<FakeStoreOptions, 'accessKeyId' | 'secretAccessKey'>): S3Middleware {
  const secretOf = (id: string) => (id === keys.accessKeyId ? keys.secretAccessKey : undefined);
  return async (ctx, next) => {
    const address = addressOf(ctx.req.url ?? '/');
    if (ctx.method === 'OPTIONS') return next();
    // first, so that a page can read why it was refused
    await allowOrigin(ctx, objects, address.bucket);
    checkSignature({ method: ctx.method, url: ctx.req.url ?? '/', headers: ctx.headers }, secretOf);
    unframe(ctx);
    await checkPreconditions(ctx, objects, address);
    const answer = answerFor(ctx.method, address);
    if (!answer) return next();
    if (!(await objects.getBucket(address.bucket))) throw new S3Error('NoSuchBucket', 'There is no such bucket.');
    return answer(ctx, objects, address);
  };
}

/** @throws S3Error where the key would leave its bucket or cannot be read */
function addressOf(url: string): Address {
  const [path = '', query = ''] = url.split(/\?(.*)/s);
  try {
    const [, bucket = '', ...names] = path.split('/').map(decodeURIComponent);
    const key = names.join('/');
    if (key.split('/').some((name) => name === '..' || name === '.')) throw new Error('leaves the bucket');
    if (/[/\\]|^\.+$/.test(bucket)) throw new Error('no name of a bucket');
    return { bucket, key, query: new URLSearchParams(query) };
  } catch {
    throw new S3Error('InvalidURI', 'This address cannot be read.');
  }
}

async function allowOrigin(ctx: S3Context, objects: Objects, bucket: string) {
  const origin = ctx.headers.origin;
  if (origin === undefined || bucket === '') return;
  const rule = (await objects.getSubresource(bucket, undefined, 'cors'))?.matchRule(origin, ctx.method);
  if (!rule) return;
  ctx.set('Access-Control-Allow-Origin', rule.hasWildcardOrigin ? '*' : origin);
  if (rule.exposeHeaders.length > 0) ctx.set('Access-Control-Expose-Headers', rule.exposeHeaders.join(', '));
  ctx.set('Vary', 'Origin');
}

function unframe(ctx: S3Context) {
  const { headers } = ctx.req;
  if (!isChunked(headers)) return;
  const encodings = String(headers['content-encoding'] ?? '').split(/,\s*/);
  const own = encodings.filter((encoding) => encoding !== '' && encoding !== 'aws-chunked').join(',');
  if (own === '') delete headers['content-encoding'];
  else headers['content-encoding'] = own;
  // the framed length says nothing about the content; the decoded one does
  delete headers['content-length'];
  const body = new UnframeChunks(headers);
  ctx.req.on('error', (error) => body.destroy(error));
  ctx.req.on('close', () => {
    if (!body.writableEnded) body.destroy(Object.assign(new Error('aborted'), { code: 'ECONNRESET' }));
  });
  ctx.req.pipe(body);
  ctx.req = body;
}

async function checkPreconditions(ctx: S3Context, objects: Objects, { bucket, key, query }: Address) {
  if (key === '' || query.has('uploadId')) return;
  const { range } = ctx.headers;
  const ifMatch = ctx.headers['if-match'];
  const onlyNew = ctx.method === 'PUT' && ctx.headers['if-none-match'] === '*';
  if (range === undefined && ifMatch === undefined && !onlyNew) return;
  const exists = await objects.existsObject(bucket, key);
  if (onlyNew && exists) throw new S3Error('PreconditionFailed', 'There is an object of this name already.');
  if (!exists) {
    // s3rver opens the range before it looks for the object, and breaks
    delete ctx.req.headers.range;
    return;
  }
  const { etag, 'content-length': size } = await objects.getMetadata(bucket, key);
  if (ifMatch !== undefined && ifMatch !== '*' && !ifMatch.split(/,\s*/).includes(etag)) {
    throw new S3Error('PreconditionFailed', 'The object is another one now.');
  }
  if (range === undefined) return;
  const asked = bytesAsked(range, Number(size));
  if (asked) ctx.req.headers.range = `bytes=${asked.start}-${asked.end}`;
  else delete ctx.req.headers.range;
}
