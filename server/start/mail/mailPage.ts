import { createServer, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { KeptMessage, Mailbox } from './mailbox';

export type MailPage = { url: string; close(): Promise<void> };

/** Shows the kept messages on loopback: as a page, as JSON at /messages.json, and each as it came at /messages/<id>.eml. */
export async function serveMail(mailbox: Mailbox): Promise<MailPage> {
  const server = createServer((request, response) => {
    const url = new URL(request.url ?? '/', 'http://mail');
    // the messages hold links that sign people in: another site's name that points here gets nothing
    const host = (request.headers.host ?? '').replace(/:\d+$/, '');
    const answering = ['127.0.0.1', 'localhost'].includes(host)
      ? answer(mailbox, url.pathname, response)
      : notHere(response);
    Promise.resolve(answering).catch(() => response.destroy());
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(0, '127.0.0.1', resolve);
  });
  const { port } = server.address() as AddressInfo;
  return {
    url: `http://127.0.0.1:${port}`,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}

async function answer(mailbox: Mailbox, path: string, response: ServerResponse) {
  if (path === '/') return send(response, 'text/html; charset=utf-8', page(await mailbox.messages()));
  if (path === '/messages.json') return send(response, 'application/json', JSON.stringify(await mailbox.messages()));
  const id = /^\/messages\/([\w-]+)\.eml$/.exec(path)?.[1];
  const source = id === undefined ? undefined : await mailbox.source(id);
  return source ? send(response, 'text/plain; charset=utf-8', source) : notHere(response);
}

function send(response: ServerResponse, type: string, body: string | Buffer) {
  response.writeHead(200, {
    'Content-Type': type,
    'Cache-Control': 'no-store',
    'X-Content-Type-Options': 'nosniff',
    'Content-Security-Policy': "default-src 'none'; style-src 'unsafe-inline'",
  });
  response.end(body);
}

function notHere(response: ServerResponse) {
  response.writeHead(404, { 'Content-Type': 'text/plain' }).end('There is nothing here.\n');
}

const style = `body { font: 16px/1.5 system-ui, sans-serif; margin: 2rem auto; max-width: 44rem; padding: 0 1rem; }
article { border-top: 4px dashed; padding: 1rem 0; } pre { white-space: pre-wrap; overflow-wrap: anywhere; font: inherit; }
h2 { margin: 0; font-size: 1.25rem; } p { margin: 0; } :root { color-scheme: light dark; }`;

function page(messages: readonly KeptMessage[]) {
  const list = messages.map(
    (message) => `<article><h2>${inHtml(message.subject)}</h2>
<p>to ${inHtml(message.to.join(', '))}, <time datetime="${inHtml(message.date)}">${inHtml(message.date)}</time></p>
<pre>${linked(message.text)}</pre><p><a href="/messages/${inHtml(message.id)}.eml">As it was sent</a></p></article>`,
  );
  const empty = '<p>No mail yet. Invitations and password links appear here.</p>';
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>Mail</title>
<meta name="viewport" content="width=device-width, initial-scale=1"><style>${style}</style></head>
<body><main><h1>Mail that Tapeline sent</h1>${list.join('\n') || empty}</main></body></html>`;
}

const signs: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
const inHtml = (text: string) => text.replace(/[&<>"']/g, (sign) => signs[sign] ?? sign);
const linked = (text: string) =>
  inHtml(text).replace(/https?:\/\/(?:(?!&(?:lt|gt|quot|#39);)[^\s])+/g, (url) => `<a href="${url}">${url}</a>`);
