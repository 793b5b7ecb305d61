import { randomBytes } from 'node:crypto';
import { mkdirSync } from 'node:fs';
import { readdir, readFile, rename, writeFile } from 'node:fs/promises';
import type { AddressInfo } from 'node:net';
import path from 'node:path';
import { type AddressObject, simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';

export type KeptMessage = {
  id: string;
  date: string;
  from: string;
  to: string[];
  subject: string;
  text: string;
  /** the addresses in the text, in order */
  links: string[];
};

export type Mailbox = {
  smtpUrl: string;
  /** newest first */
  messages(): Promise<KeptMessage[]>;
  /** a message as it came; undefined where there is none */
  source(id: string): Promise<Buffer | undefined>;
  close(): Promise<void>;
};

/** Larger than any message that the product writes. */
const messageBytes = 2 * 1024 * 1024;

/** Takes every message that is sent to it on loopback and keeps it as a file instead of delivering it. */
export async function openMailbox(folder: string): Promise<Mailbox> {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  let count = 0;
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    size: messageBytes,
    logger: false,
    async onData(stream, _session, done) {
      try {
        const chunks: Buffer[] = [];
        for await (const chunk of stream) chunks.push(chunk);
        const order = String(count++).padStart(6, '0');
        const id = `${new Date().toISOString().replace(/[:.]/g, '-')}-${order}-${randomBytes(3).toString('hex')}`;
        // named when whole, so that a reader never sees half of one
        await writeFile(path.join(folder, `${id}.new`), Buffer.concat(chunks), { mode: 0o600 });
        await rename(path.join(folder, `${id}.new`), path.join(folder, `${id}.eml`));
        done();
      } catch (error) {
        done(error instanceof Error ? error : new Error(String(error)));
      }
    },
  });
  server.on('error', () => {});
  await new Promise<void>((resolve, reject) => {
    server.server.once('error', reject);
    server.listen(0, '127.0.0.1', resolve);
  });
  const { port } = server.server.address() as AddressInfo;

  return {
    smtpUrl: `smtp://127.0.0.1:${port}`,
    async messages() {
      const names = (await readdir(folder)).filter((name) => name.endsWith('.eml')).sort();
      return Promise.all(
        names.toReversed().map(async (name) => read(name.slice(0, -4), await readFile(path.join(folder, name)))),
      );
    },
    async source(id) {
      if (!/^[\w-]+$/.test(id)) return undefined;
      return readFile(path.join(folder, `${id}.eml`)).catch(() => undefined);
    },
    close: () => new Promise((resolve) => server.close(resolve)),
  };
}

async function read(id: string, source: Buffer): Promise<KeptMessage> {
  const mail = await simpleParser(source);
  const text = mail.text ?? '';
  return {
    id,
    date: (mail.date ?? new Date(0)).toISOString(),
    from: mail.from?.text ?? '',
    to: addressesOf(mail.to),
    subject: mail.subject ?? '',
    text,
    links: text.match(/https?:\/\/[^\s<>"]+/g) ?? [],
  };
}

function addressesOf(to: AddressObject | AddressObject[] | undefined): string[] {
  return [to ?? []].flat().flatMap((field) => field.value.flatMap((entry) => entry.address ?? []));
}
