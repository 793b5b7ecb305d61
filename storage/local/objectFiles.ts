import { randomBytes } from 'node:crypto';
import { constants, createReadStream, createWriteStream } from 'node:fs';
import { copyFile, mkdir, readdir, rename, rm, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { type Readable, Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import S3Error from 's3rver/lib/models/error.js';
import { checksumsOf } from './checksums';

type Headers = Record<string, string | string[] | undefined>;
export type Body = Buffer | (Readable & { headers?: Headers });

const temporary = '.unfinished';
const highWaterMark = 256 * 1024;

/** A file that is being written under another name; `keep` gives it its own in one step, so that half of it is never seen. */
export type UnfinishedFile = { size: number; md5: string; sha256: string | undefined; keep(): Promise<void> };

/**
 * Writes a body beside its place and checks it against its headers and its length.
 * @throws S3Error where it is not what was promised; nothing is left then
 */
export async function receive(body: Body, file: string): Promise<UnfinishedFile> {
  const headers = Buffer.isBuffer(body) ? {} : (body.headers ?? {});
  const promisedSize = headers['x-amz-decoded-content-length'] ?? headers['content-length'];
  const sums = checksumsOf(headers);
  const unfinished = await nameBeside(file);
  try {
    if (Buffer.isBuffer(body)) {
      sums.update(body);
      await writeFile(unfinished, body);
    } else {
      const counting = new Transform({
        highWaterMark,
        transform(chunk: Buffer, _encoding, done) {
          sums.update(chunk);
          done(null, chunk);
        },
      });
      await pipeline(body, counting, createWriteStream(unfinished, { highWaterMark }));
    }
    const sum = sums.finish();
    if (promisedSize !== undefined && Number(promisedSize) !== sum.size) {
      throw new S3Error('IncompleteBody', `${promisedSize} bytes were promised and ${sum.size} came.`);
    }
    return { ...sum, keep: () => rename(unfinished, file) };
  } catch (error) {
    await rm(unfinished, { force: true });
    throw inWordsOfS3(error);
  }
}

/** Puts files one after another into one, and gives it its name when all is there. */
export async function join(parts: readonly string[], file: string): Promise<UnfinishedFile['keep']> {
  const [first, ...others] = parts;
  if (first === undefined) throw new S3Error('MalformedXML', 'An upload is completed from at least one part.');
  const unfinished = await nameBeside(file);
  try {
    // shares the blocks where the file system can
    await copyFile(first, unfinished, constants.COPYFILE_FICLONE);
    for (const part of others) {
      await pipeline(createReadStream(part, { highWaterMark: 1 << 20 }), createWriteStream(unfinished, { flags: 'a' }));
    }
    return () => rename(unfinished, file);
  } catch (error) {
    await rm(unfinished, { force: true });
    throw inWordsOfS3(error);
  }
}

/** Removes what a killed process left half written. To be called before anybody writes. */
export async function sweepUnfinished(folder: string): Promise<number> {
  const entries = await readdir(folder, { recursive: true, withFileTypes: true });
  const left = entries.filter((entry) => entry.isFile() && entry.name.endsWith(temporary));
  await Promise.all(left.map((entry) => rm(path.join(entry.parentPath, entry.name), { force: true })));
  return left.length;
}

async function nameBeside(file: string) {
  await mkdir(path.dirname(file), { recursive: true }).catch((error) => Promise.reject(inWordsOfS3(error)));
  return `${file}.${randomBytes(6).toString('hex')}${temporary}`;
}

function inWordsOfS3(error: unknown) {
  const code = error instanceof Error && 'code' in error ? error.code : undefined;
  if (code === 'ENAMETOOLONG') return new S3Error('KeyTooLongError', 'The key is too long.');
  if (code === 'ERR_STREAM_PREMATURE_CLOSE' || code === 'ECONNRESET') {
    return new S3Error('IncompleteBody', 'The connection closed before the whole body came.');
  }
  return error;
}
