import { readdir, readFile, rm, stat, writeFile } from 'node:fs/promises';
import path from 'node:path';
import S3Error from 's3rver/lib/models/error.js';
import { type Body, receive } from './objectFiles';

/** Source: Amazon S3 User Guide, "Amazon S3 multipart upload limits". */
const partsMax = 10_000;

export type Part = {
  number: number;
  size: number;
  md5: string;
  sha256?: string | undefined;
  receivedAt: Date;
  file: string;
};
export type Upload = { id: string; key: string; metadata: Record<string, string>; startedAt: Date; folder: string };

/** One bucket's multipart uploads that are neither complete nor given up: a folder each, with a file a part. */
export class UnfinishedUploads {
  constructor(private readonly folder: string) {}

  /** @throws S3Error NoSuchUpload */
  async one(id: string): Promise<Upload> {
    const folder = path.join(this.folder, /^[0-9a-f]{32}$/.test(id) ? id : 'none');
    try {
      const [key, metadata, { mtime }] = await Promise.all([
        readFile(path.join(folder, 'key'), 'utf8'),
        readFile(path.join(folder, 'metadata'), 'utf8'),
        stat(path.join(folder, 'key')),
      ]);
      return { id, key, metadata: JSON.parse(metadata), startedAt: mtime, folder };
    } catch {
      throw new S3Error('NoSuchUpload', 'This upload does not exist, or it was completed or given up.');
    }
  }

  async all(): Promise<Upload[]> {
    const ids = await readdir(this.folder).catch(() => []);
    const uploads = await Promise.all(ids.map((id) => this.one(id).catch(() => undefined)));
    return uploads.filter((upload) => upload !== undefined).toSorted((a, b) => (a.key < b.key ? -1 : 1));
  }

  async receivePart(id: string, partNumber: string, body: Body): Promise<{ size: number; md5: string }> {
    const number = Number(partNumber);
    if (!Number.isInteger(number) || number < 1 || number > partsMax) {
      throw new S3Error('InvalidArgument', `A part's number is between 1 and ${partsMax}.`);
    }
    const { folder } = await this.one(id);
    const file = path.join(folder, `${number}.part`);
    const { keep, size, md5, sha256 } = await receive(body, file);
    await keep();
    await writeFile(path.join(folder, `${number}.json`), JSON.stringify({ md5, sha256 }));
    return { size, md5 };
  }

  /** The parts that are there, by number. */
  async parts(upload: Upload): Promise<Part[]> {
    const names = await readdir(upload.folder);
    const numbers = names.flatMap((name) => /^(\d+)\.json$/.exec(name)?.[1] ?? []).map(Number);
    const parts = await Promise.all(
      numbers.map(async (number) => {
        const file = path.join(upload.folder, `${number}.part`);
        const [sums, { size, mtime }] = await Promise.all([
          readFile(path.join(upload.folder, `${number}.json`), 'utf8'),
          stat(file),
        ]);
        return { number, size, receivedAt: mtime, file, ...(JSON.parse(sums) as Pick<Part, 'md5' | 'sha256'>) };
      }),
    );
    return parts.toSorted((a, b) => a.number - b.number);
  }

  async remove(id: string) {
    const { folder } = await this.one(id);
    await rm(folder, { recursive: true, force: true });
  }
}
