import { mkdtempSync, rmSync, statSync } from 'node:fs';
import http from 'node:http';
import { tmpdir } from 'node:os';
import path from 'node:path';
import nodemailer from 'nodemailer';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { type Mailbox, openMailbox } from '../../server/start/mail/mailbox';
import { type MailPage, serveMail } from '../../server/start/mail/mailPage';

let folder: string;
let mailbox: Mailbox;
let page: MailPage;

beforeEach(async () => {
  folder = mkdtempSync(path.join(tmpdir(), 'tapeline-mail-'));
  mailbox = await openMailbox(path.join(folder, 'mail'));
  page = await serveMail(mailbox);
});
afterEach(async () => {
  await page.close();
  await mailbox.close();
  rmSync(folder, { recursive: true, force: true });
});

async function send(subject: string, text: string) {
  const transport = nodemailer.createTransport(mailbox.smtpUrl);
  await transport.sendMail({ from: 'team@tapeline.example', to: 'Ida <ida@tapeline.example>', subject, text });
  transport.close();
}

it('keeps every message, newest first, with its links, for its owner alone', async () => {
  await send('First', 'Hello');
  await send('Einladung für Zoë', 'Join: http://localhost:4310/join/abc?x=1&y=2 today');
  const messages = await (await fetch(`${page.url}/messages.json`)).json();
  expect(messages).toMatchObject([
    { subject: 'Einladung für Zoë', to: ['ida@tapeline.example'], links: ['http://localhost:4310/join/abc?x=1&y=2'] },
    { subject: 'First', links: [] },
  ]);
  expect(statSync(path.join(folder, 'mail', `${messages[0].id}.eml`)).mode & 0o077).toBe(0);
});

it('shows text as text, with its links', async () => {
  await send('<script>alert(1)</script>', 'See <b>http://localhost/reset/1?a=1&b=2</b>');
  const html = await (await fetch(page.url)).text();
  expect(html).not.toContain('<script>');
  expect(html).not.toContain('<b>');
  expect(html).toContain('<a href="http://localhost/reset/1?a=1&amp;b=2">');
});

it('shows nothing to a page that reaches it under another name', async () => {
  await send('Secret', 'http://localhost/reset/1');
  const { port } = new URL(page.url);
  const status = await new Promise((resolve, reject) => {
    const headers = { Host: `elsewhere.example:${port}` };
    http
      .get(`${page.url}/messages.json`, { headers }, (answer) => resolve(answer.resume().statusCode))
      .on('error', reject);
  });
  expect(status).toBe(404);
});
