import { randomUUID } from 'node:crypto';
import { afterAll, describe, expect, it } from 'vitest';
import type { Person } from '../../server/models/people';
import { allRoutes } from '../../server/routes/all';
import { allEndpoints } from '../../shared/contracts/all';
import { type Action, actions, may } from '../../shared/domain/permissions';
import { roles } from '../../shared/domain/words';
import { freshAddress, makeTeamOfFour, startApi, testPassword } from '../support/api';
import { misfit, type Schema } from '../support/misfit';

// ASVS 5.0 8.2.1: every role at every operation; read from the API's own description, so that a new route is in it at once

type Media = { schema: Schema };
type Operation = {
  operationId: string;
  'x-may': string;
  parameters: { name: string; in: 'path' | 'query'; required: boolean }[];
  requestBody?: { content: Record<string, Media> };
  responses: Record<string, { content: Record<string, Media> }>;
};

const api = await startApi();
afterAll(() => api.close());

const description = (await (await fetch(`${api.url}/api/openapi.json`)).json()) as {
  paths: Record<string, Record<string, Operation>>;
};
const operations = Object.entries(description.paths).flatMap(([path, methods]) =>
  Object.entries(methods).map(([method, operation]) => ({ name: operation.operationId, method, path, operation })),
);
type Asked = (typeof operations)[number];
const ofTeams = operations.filter(({ path }) => path.startsWith('/teams/{team}'));
const others = operations.filter(({ path }) => !path.startsWith('/teams/{team}'));

const ours = await makeTeamOfFour();
const theirs = await makeTeamOfFour();
const cookies = Object.fromEntries(
  await Promise.all(roles.map(async (role) => [role, await cookieOf(ours[role])] as const)),
);
const outsider = await cookieOf(theirs.owner);

async function cookieOf(person: Person): Promise<string> {
  const answer = await fetch(`${api.url}/api/sign-in`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json', 'X-Forwarded-For': freshAddress() },
    body: JSON.stringify({ email: person.email, password: testPassword }),
  });
  return answer.headers.get('set-cookie')?.split(';')[0] ?? '';
}

type Answer = { status: number; error?: { code: string; fields?: Record<string, string> } };

/** Asks with made-up ids, no query, and a body in which nothing fits. */
async function ask({ method, path, operation }: Asked, cookie?: string): Promise<Answer> {
  const url = path.replace('{team}', ours.team.slug).replace(/\{\w+Id\}/g, () => randomUUID());
  const content = operation.requestBody?.content ?? {};
  const json = content['application/json'];
  const answer = await fetch(`${api.url}/api${url}`, {
    method: method.toUpperCase(),
    headers: {
      'X-Forwarded-For': freshAddress(),
      ...(cookie ? { Cookie: cookie } : {}),
      ...(json ? { 'Content-Type': 'application/json' } : {}),
    },
    body: json ? JSON.stringify(misfit(json.schema)) : content['multipart/form-data'] ? new FormData() : null,
  });
  // a stream of events would never end
  if (answer.headers.get('content-type')?.startsWith('text/event-stream')) {
    await answer.body?.cancel();
    return { status: answer.status };
  }
  const text = await answer.text();
  return { status: answer.status, error: answer.ok ? undefined : JSON.parse(text).error };
}

describe('the description of the API', () => {
  it('has every route that is mounted, and the other way round', () => {
    expect(new Set(allRoutes.map((route) => route.endpoint))).toEqual(
      new Set(allEndpoints.map(({ endpoint }) => endpoint)),
    );
    expect(operations).toHaveLength(allEndpoints.length);
  });

  it.each(ofTeams)('$method $path has a row of the permissions table', ({ operation }) => {
    expect(actions).toContain(operation['x-may']);
  });

  it('leaves little open to anyone', () => {
    const open = others.filter(({ operation }) => operation['x-may'] === 'anyone').map(({ name }) => name);
    expect(open.toSorted()).toEqual([
      'acceptInvitation',
      'forgotPassword',
      'readInvitation',
      'resetPassword',
      'signIn',
      'signOut',
      'whoAmI',
    ]);
    expect(others.every(({ operation }) => ['anyone', 'signedIn'].includes(operation['x-may']))).toBe(true);
  });

  it('lets a member change nothing but their own things', () => {
    const changes = ofTeams.filter(
      ({ method, operation }) => method !== 'get' && may('member', operation['x-may'] as Action),
    );
    expect(changes.length).toBeGreaterThan(0);
    expect(new Set(changes.map(({ operation }) => operation['x-may']))).toEqual(new Set(['keepOwn']));
  });

  it('lets people be managed by owners alone', () => {
    const people = ofTeams.filter(({ path }) => /\/(people|invitations|audit)/.test(path));
    expect(people.length).toBeGreaterThan(0);
    for (const { operation } of people)
      expect(roles.filter((role) => may(role, operation['x-may'] as Action))).toEqual(['owner']);
  });
});

describe.each(ofTeams)('$method $path', (asked) => {
  const action = asked.operation['x-may'] as Action;
  const allowed = roles.filter((role) => may(role, action));
  const refused = roles.filter((role) => !may(role, action));

  it('answers 401 to nobody', async () => {
    expect(await ask(asked)).toMatchObject({ status: 401, error: { code: 'signInFirst' } });
  });

  // ASVS 5.0 8.2.2
  it('answers 404 to another team’s owner', async () => {
    expect(await ask(asked, outsider)).toMatchObject({ status: 404, error: { code: 'notFound' } });
  });

  if (refused.length > 0)
    it(`answers 403 to ${refused.join(', ')}`, async () => {
      for (const role of refused)
        expect(await ask(asked, cookies[role]), role).toMatchObject({ status: 403, error: { code: 'notAllowed' } });
    });

  it(`lets ${allowed.join(', ')} in, and names the fields of what does not fit`, async () => {
    const { parameters, requestBody } = asked.operation;
    const wanted = parameters.filter((parameter) => parameter.in === 'query' && parameter.required);
    for (const role of allowed) {
      const answer = await ask(asked, cookies[role]);
      if (requestBody || wanted.length > 0) {
        expect(answer, role).toMatchObject({ status: 400, error: { code: 'invalid' } });
        expect(Object.keys(answer.error?.fields ?? {}).length, role).toBeGreaterThan(0);
      } else if (answer.status === 404) {
        // only what was named by a made-up id is not there
        expect(asked.path, role).toMatch(/\{\w+Id\}/);
      } else {
        expect([200, 201, 202], role).toContain(answer.status);
      }
    }
  });
});

describe.each(others.filter(({ operation }) => operation['x-may'] === 'signedIn'))('$method $path', (asked) => {
  it('answers 401 to nobody', async () => {
    expect(await ask(asked)).toMatchObject({ status: 401, error: { code: 'signInFirst' } });
  });
});

describe.each(others.filter(({ operation }) => operation.requestBody))('$method $path', (asked) => {
  it('names the fields of what does not fit', async () => {
    const answer = await ask(asked, asked.operation['x-may'] === 'anyone' ? undefined : outsider);
    expect(answer).toMatchObject({ status: 400, error: { code: 'invalid' } });
    expect(Object.keys(answer.error?.fields ?? {}).length).toBeGreaterThan(0);
  });
});
