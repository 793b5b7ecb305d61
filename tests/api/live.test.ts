import { randomUUID } from 'node:crypto';
import http, { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type App, createApp } from '../../server/app';
import { openLog } from '../../server/middleware/log';
import { inTransaction } from '../../server/models/database';
import type { Person } from '../../server/models/people';
import { tell } from '../../server/services/live';
import { LiveEvent } from '../../shared/contracts/live';
import { type Api, makeTeamOfFour, startApi, type TeamOfFour, testPassword } from '../support/api';
import { until } from '../support/worker';

let api: Api;
let ours: TeamOfFour;
let theirs: TeamOfFour;
/** a second web process's app on the same database */
let second: { app: App; server: http.Server; url: string };

beforeAll(async () => {
  api = await startApi();
  [ours, theirs] = await Promise.all([makeTeamOfFour(), makeTeamOfFour()]);
  const app = await createApp(api.config, openLog('fatal', 'web'));
  const server = createServer(app.express);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  second = { app, server, url: `http://127.0.0.1:${(server.address() as AddressInfo).port}` };
});
afterAll(async () => {
  await second.app.close();
  second.server.closeAllConnections();
  second.server.close();
  await api.close();
});

async function cookieOf(url: string, person: Person): Promise<string> {
  const answer = await fetch(`${url}/api/sign-in`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify({ email: person.email, password: testPassword }),
  });
  return (answer.headers.get('set-cookie') ?? '').split(';')[0] ?? '';
}

type Listener = { events: LiveEvent[]; raw: () => string; close(): void; contentType: string };

async function listen(url: string, slug: string, person: Person): Promise<Listener> {
  const cookie = await cookieOf(url, person);
  return new Promise((resolve, reject) => {
    const request = http.get(`${url}/api/teams/${slug}/live`, { headers: { cookie }, agent: false }, (answer) => {
      if (answer.statusCode !== 200) {
        answer.resume();
        return reject(new Error(String(answer.statusCode)));
      }
      const events: LiveEvent[] = [];
      let text = '';
      answer.setEncoding('utf8').on('data', (piece: string) => {
        text += piece;
        const data = piece.split('\n').filter((line) => line.startsWith('data: '));
        for (const line of data) events.push(LiveEvent.parse(JSON.parse(line.slice(6))));
      });
      answer.on('error', () => undefined);
      resolve({
        events,
        raw: () => text,
        close: () => request.destroy(),
        contentType: String(answer.headers['content-type']),
      });
    });
    request.on('error', reject);
  });
}

const event = (): LiveEvent => ({
  type: 'step',
  recordingId: randomUUID(),
  step: 'playback',
  state: 'running',
  percent: 40,
});

describe('live events', () => {
  it('told in one process are heard in every one, by the team alone', async () => {
    const here = await listen(api.url, ours.team.slug, ours.coach);
    const there = await listen(second.url, ours.team.slug, ours.editor);
    const strangers = await listen(second.url, theirs.team.slug, theirs.coach);
    expect(here.contentType).toBe('text/event-stream; charset=utf-8');
    const [forUs, forThem] = [event(), event()];
    await tell(ours.team.id, forUs);
    await tell(theirs.team.id, forThem);
    await until('all to hear', async () => [here, there, strangers].every(({ events }) => events.length > 0), 5000);
    expect(here.events).toEqual([forUs]);
    expect(there.events).toEqual([forUs]);
    expect(strangers.events).toEqual([forThem]);
    expect(here.raw()).toContain('retry: ');
    for (const listener of [here, there, strangers]) listener.close();
  });

  it('are heard when the transaction commits, and never when it does not', async () => {
    const here = await listen(api.url, ours.team.slug, ours.coach);
    const [undone, done] = [event(), event()];
    await inTransaction(async () => {
      await tell(ours.team.id, undone);
      throw new Error('undone');
    }).catch(() => undefined);
    await inTransaction(() => tell(ours.team.id, done));
    await until('the second', async () => here.events.length > 0, 5000);
    expect(here.events).toEqual([done]);
    here.close();
  });

  it('are not for members, nor for other teams', async () => {
    await expect(listen(api.url, ours.team.slug, ours.member)).rejects.toThrow('403');
    await expect(listen(api.url, ours.team.slug, theirs.owner)).rejects.toThrow('404');
  });
});
