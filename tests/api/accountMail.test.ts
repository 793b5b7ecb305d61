import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { sendMailHandler } from '../../server/jobs/handlers/sendMail';
import { openLog } from '../../server/middleware/log';
import { type Mailbox, openMailbox } from '../../server/start/mail/mailbox';
import { openRunFolder } from '../support/runFolder';

const from = 'Quayside <quayside@mail.example>';
const context = {
  signal: new AbortController().signal,
  log: openLog('silent', 'worker'),
  attempt: 1,
  maxAttempts: 12,
};
const mail = {
  id: '6f0c3c2e-8f3e-4c8e-9d55-2f5a4f4c9a10',
  to: 'runa@mail.example',
  subject: 'Žofie invites you to Quayside',
  text: 'Hello,\n\nhttps://tapeline.example/join#abc\n',
};

describe('sending a mail', () => {
  let run: Awaited<ReturnType<typeof openRunFolder>>;
  let mailbox: Mailbox;
  beforeAll(async () => {
    run = await openRunFolder('mail');
    mailbox = await openMailbox(run.folder);
  });
  afterAll(async () => {
    await mailbox.close();
    await run.remove();
  });

  it('hands it to the server as plain text, whole', async () => {
    await sendMailHandler({ url: mailbox.smtpUrl, from }).run(mail, context);
    const [kept] = await mailbox.messages();
    expect(kept).toMatchObject({ to: [mail.to], subject: mail.subject, links: ['https://tapeline.example/join#abc'] });
    expect(kept?.from).toContain('quayside@mail.example');
    const source = String(await mailbox.source(kept?.id ?? ''));
    expect(source).toContain(`Message-ID: <${mail.id}@127.0.0.1>`);
    expect(source).toContain('Content-Type: text/plain; charset=utf-8');
    expect(source).not.toContain('text/html');
  });

  it('sends to one address, whatever it holds', async () => {
    const before = (await mailbox.messages()).length;
    await sendMailHandler({ url: mailbox.smtpUrl, from })
      .run({ ...mail, to: 'runa@mail.example, other@mail.example' }, context)
      .catch(() => undefined);
    const newer = (await mailbox.messages()).slice(0, -before);
    expect(newer.flatMap((message) => message.to)).not.toContain('other@mail.example');
  });

  it('fails, so that the queue tries again, while nobody answers', async () => {
    const gone = await openMailbox(run.folder);
    await gone.close();
    await expect(sendMailHandler({ url: gone.smtpUrl, from }).run(mail, context)).rejects.toThrow();
  });

  it.each([
    [450, false],
    [550, true],
  ])('after a refusal with %i is done: %s', async (responseCode, done) => {
    const server = new SMTPServer({
      authOptional: true,
      disabledCommands: ['AUTH', 'STARTTLS'],
      logger: false,
      onRcptTo: (_address, _session, answer) => answer(Object.assign(new Error('No such mailbox'), { responseCode })),
    });
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    const { port } = server.server.address() as AddressInfo;
    try {
      const sending = sendMailHandler({ url: `smtp://127.0.0.1:${port}`, from }).run(mail, context);
      if (done) await expect(sending).resolves.toBeUndefined();
      else await expect(sending).rejects.toThrow('No such mailbox');
    } finally {
      await new Promise<void>((resolve) => server.close(() => resolve()));
    }
  });
});
