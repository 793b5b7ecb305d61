import path from 'node:path';
import { z } from 'zod';
import { makeBucket } from '../../storage/local/bucket';
import { openLog } from './logFiles';
import { openMailbox } from './mail/mailbox';
import { serveMail } from './mail/mailPage';
import { freePort } from './ports';
import { type Durability, startCluster, stopCluster } from './postgres/cluster';
import { makeDatabase } from './postgres/databases';
import { secretsIn } from './secrets';
import { keepRunning } from './supervisor';

type Environment = Record<string, string | undefined>;

export type Wanted = {
  dataFolder: string;
  durability: Durability;
  /** Node's arguments for the fake store */
  fakeStore: string[];
  /** pages of these may send parts to the store */
  origins: readonly string[];
  say(line: string): void;
  /** called as soon as something runs, with what ends it */
  onEnd(end: () => Promise<void>): void;
};

const databaseName = 'tapeline';
const bucket = 'tapeline';

/** A database of our own, unless DATABASE_URL names one. */
export async function localDatabase(
  given: Environment,
  { dataFolder, durability, onEnd }: Wanted,
): Promise<Environment> {
  if (given.DATABASE_URL) return {};
  const cluster = await startCluster(dataFolder, durability);
  onEnd(() => stopCluster(cluster.folder, 2500));
  await makeDatabase(cluster.urlOf('postgres'), databaseName);
  return { DATABASE_URL: cluster.urlOf(databaseName) };
}

/** The fake store, unless S3_ENDPOINT (or a bucket of the cloud's own) is named. */
export async function localStore(given: Environment, wanted: Wanted): Promise<Environment> {
  if (given.S3_ENDPOINT || given.S3_BUCKET) return {};
  const { S3_ACCESS_KEY_ID: accessKeyId, S3_SECRET_ACCESS_KEY: secretAccessKey } = secretsIn(wanted.dataFolder);
  const options = {
    folder: path.join(wanted.dataFolder, 'store'),
    port: await freePort(),
    accessKeyId,
    secretAccessKey,
  };
  const endpoint = await new Promise<string>((resolve, reject) => {
    const late = setTimeout(() => reject(new Error('The object store does not start; see its log.')), 20_000);
    const store = keepRunning(
      {
        name: 'The object store',
        args: wanted.fakeStore,
        env: { PATH: process.env.PATH, FAKE_STORE: JSON.stringify(options) },
        output: openLog(wanted.dataFolder, 'store'),
        onMessage(message) {
          clearTimeout(late);
          resolve(z.object({ endpoint: z.string() }).parse(message).endpoint);
        },
      },
      wanted.say,
    );
    wanted.onEnd(() => store.stop(1000));
  });
  const region = 'us-east-1';
  await makeBucket({ endpoint, region, accessKeyId, secretAccessKey }, bucket, wanted.origins);
  return {
    S3_ENDPOINT: endpoint,
    S3_REGION: region,
    S3_BUCKET: bucket,
    S3_ACCESS_KEY_ID: accessKeyId,
    S3_SECRET_ACCESS_KEY: secretAccessKey,
  };
}

/** A mailbox that keeps everything, unless SMTP_URL names a server. */
export async function localMail(
  given: Environment,
  { dataFolder, onEnd }: Wanted,
): Promise<Environment & { mailPage?: string }> {
  if (given.SMTP_URL) return {};
  const mailbox = await openMailbox(path.join(dataFolder, 'mail'));
  onEnd(mailbox.close);
  const page = await serveMail(mailbox);
  onEnd(page.close);
  return { SMTP_URL: mailbox.smtpUrl, mailPage: page.url };
}
