import { randomUUID } from 'node:crypto';
import { afterAll, describe, expect, it } from 'vitest';
import { KitItem, Movement, Substitution } from '../../server/models/dictionary';
import { CaptionTrack } from '../../server/models/marks';
import { Recording } from '../../server/models/recordings';
import { Session } from '../../server/models/sessions';
import { allEndpoints } from '../../shared/contracts/all';
import { freshAddress, makeTeamOfFour, startApi, testPassword } from '../support/api';
import {
  chapter,
  makeKitItem,
  makeMovement,
  makeRecording,
  makeSession,
  makeSubstitution,
  reps,
} from '../support/library';

/** Bodies that fit, but for one value in them: every answer is a refusal in the documented shape or a good one, never a failure of ours. */

const api = await startApi();
afterAll(() => api.close());

const ours = await makeTeamOfFour();
const theirs = await makeTeamOfFour();
const rings = await makeKitItem(ours.team, 'rings');
const [row, hop, third] = [
  await makeMovement(ours.team, 'Ring row'),
  await makeMovement(ours.team, 'Lateral hop'),
  await makeMovement(ours.team, 'Box step'),
];
const way = await makeSubstitution(ours.team, row, hop, rings);
const { session, block, lines } = await makeSession(ours.team, { state: 'draft', movements: [row] });
const recording = await makeRecording(ours.team, { session });
const [marked, cued] = [chapter(0, 5000, { movementId: row.id, blockId: block.id }), randomUUID()];
const theirMovement = await makeMovement(theirs.team, 'Their row');

const browser = await api.signedIn(ours.owner);
const { body: upload } = await browser
  .post(`/api/teams/${ours.team.slug}/uploads`)
  .send({ requestKey: randomUUID(), fileName: 'a.mp4', sizeBytes: 1000, contentType: 'video/mp4' })
  .expect(201);

const dose = { ...reps(8), amountTo: 10, load: { kg: 16, typed: '16 kg' }, tempo: '3-0-1-0' };
const movement = (name: string) => ({
  name,
  otherNames: ['Row'],
  pattern: 'pull',
  kitNeeded: [{ anyOf: [{ kitItemId: rings.id, count: 1, minLoadKg: 5 }] }],
  points: ['Chest up'],
  faults: ['Shrugging'],
  cautions: [{ say: 'Stop when it hurts.', more: 'Rest.' }],
});
const substitution = {
  toMovementId: third.id,
  missing: 'kit',
  missingKitItemId: rings.id,
  doseRule: { type: 'fixed', dose },
  reason: 'The same pull.',
};
const plan = () => ({
  date: '2026-03-03',
  title: 'Step, row, hop',
  note: 'Slow.',
  aim: '5 rounds',
  blocks: [
    {
      id: block.id,
      kind: 'workout',
      title: 'Main',
      scheme: { type: 'intervals', rounds: 3, workSeconds: 20, restSeconds: 10, restAfterLast: false },
      note: '',
      lines: [
        {
          id: lines[0]?.id,
          movementId: row.id,
          dose,
          note: 'Slow.',
          substitutions: [
            { id: randomUUID(), movementId: hop.id, missing: 'kit', missingKitItemId: rings.id, dose, reason: 'So.' },
          ],
        },
      ],
    },
  ],
});
const sha256 = `${'A'.repeat(43)}=`;
const versionOf = async (row: { reload(): Promise<{ version: number }> }) => (await row.reload()).version;
const marksOf = async () => (await recording.reload()) as Recording;
const linesVersion = async () => (await CaptionTrack.findOne({ where: { recordingId: recording.id } }))?.version ?? 0;

/** For each operation with a body one that fits, as things are now. */
const bodies: Record<string, () => unknown> = {
  signIn: () => ({ email: ours.owner.email, password: testPassword }),
  changePassword: () => ({ current: 'not this one', password: 'lanterns over quiet water' }),
  renameMe: () => ({ name: 'Ilva Marten' }),
  forgotPassword: () => ({ email: `${randomUUID()}@mail.example` }),
  resetPassword: () => ({ secret: 'x'.repeat(40), password: 'lanterns over quiet water' }),
  readInvitation: () => ({ secret: 'x'.repeat(40) }),
  acceptInvitation: () => ({ secret: 'x'.repeat(40), name: 'Ilva', password: 'lanterns over quiet water' }),
  updateTeam: () => ({ name: 'Quayside', timeZone: 'Europe/Berlin' }),
  invitePerson: () => ({ email: `${randomUUID()}@mail.example`, name: 'Ilva', role: 'member' }),
  changeRole: () => ({ role: 'member' }),
  addKitItem: () => ({ name: randomUUID(), otherNames: ['ring'], withoutText: 'no rings', loadMatters: true }),
  updateKitItem: async () => ({
    name: 'rings',
    otherNames: ['ring'],
    withoutText: 'no rings',
    loadMatters: true,
    version: await versionOf(rings),
  }),
  saveMyKit: () => ({ items: [{ kitItemId: rings.id, count: 2, loadsKg: [8, 12.5] }] }),
  createMovement: () => movement(`Row ${randomUUID()}`),
  updateMovement: async () => ({ ...movement('Ring row'), version: await versionOf(row) }),
  mergeMovements: async () => ({
    duplicateId: randomUUID(),
    version: await versionOf(row),
    duplicateVersion: await versionOf(hop),
  }),
  addSubstitution: () => substitution,
  updateSubstitution: async () => ({ ...substitution, version: await versionOf(way) }),
  createSession: () => ({ ...plan(), id: randomUUID(), blocks: [] }),
  saveSession: async () => ({ ...plan(), version: await versionOf(session) }),
  publishSession: async () => ({ version: 0 }),
  unpublishSession: async () => ({ version: 0 }),
  updateRecording: async () => ({
    title: 'First take',
    take: 1,
    sessionId: session.id,
    version: await versionOf(recording),
  }),
  createUpload: () => ({
    requestKey: randomUUID(),
    fileName: 'take.mp4',
    sizeBytes: 1000,
    contentType: 'video/mp4',
    sessionId: session.id,
    fileDate: '2026-03-03T06:00:00Z',
  }),
  signPart: () => ({ number: 1, sizeBytes: 1000, sha256 }),
  reportPart: () => ({ number: 1, sizeBytes: 1000, sha256, etag: '"abc"' }),
  saveChapters: async () => ({
    version: (await marksOf()).chaptersVersion,
    items: [
      marked,
      {
        ...chapter(6000, 9000, { kind: 'substitution', movementId: hop.id, standsInForMovementId: row.id }),
        id: cued,
        missing: 'kit',
        missingKitItemId: rings.id,
      },
    ],
  }),
  restoreChapters: async () => ({ restore: 1, version: (await marksOf()).chaptersVersion }),
  saveCues: async () => ({
    version: (await marksOf()).cuesVersion,
    items: [
      { id: cued, atMs: 100, kind: 'go', text: 'Up', movementId: row.id },
      { id: marked.id, atMs: 100, kind: 'go', text: 'Up', movementId: row.id },
    ],
  }),
  restoreCues: async () => ({ restore: 1, version: (await marksOf()).cuesVersion }),
  saveCaptions: async () => ({
    version: await linesVersion(),
    lines: [{ startMs: 0, endMs: 900, text: 'Chest up.' }],
  }),
  restoreCaptions: async () => ({ restore: 1, version: await linesVersion() }),
  keepPlace: () => ({ atMs: 100 }),
};

const deep = JSON.parse(`${'['.repeat(3000)}${']'.repeat(3000)}`) as unknown;
const texts = [
  '',
  'a\u0000b',
  '\ud800',
  "'; select ':id' $1 \\",
  'x'.repeat(20_000),
  '0000-01-01',
  '0000-01-01T00:00:00Z',
  '9999-12-31T23:59:59.999Z',
  randomUUID(),
  theirMovement.id,
  // the same ids to PostgreSQL
  ...[cued, row.id, hop.id, third.id, session.id].map((id) => id.toUpperCase()),
];
const numbers = [-1, 0, 0.5, 1e-300, 1e308, 2 ** 31, 2 ** 53 - 1];
const shapes = [
  null,
  true,
  [],
  deep,
  JSON.parse('{"__proto__":{"role":"owner"},"constructor":{"prototype":1},"type":"__proto__"}'),
];

/** What to put in a value's place: of its own type what is least expected, of other types one of each. */
function hostileTo(value: unknown): unknown[] {
  if (typeof value === 'string') return [...texts, 1e308, ...shapes];
  if (typeof value === 'number') return [...numbers, '1', ...shapes];
  return ['x', 2 ** 31, ...shapes];
}

type Path = (string | number)[];

/** Every place in a value that holds something. */
const placesIn = (value: unknown, path: Path = []): Path[] => [
  ...(path.length > 0 ? [path] : []),
  ...(typeof value === 'object' && value !== null
    ? Object.entries(value).flatMap(([key, inner]) =>
        placesIn(inner, [...path, Array.isArray(value) ? Number(key) : key]),
      )
    : []),
];

const valueAt = (value: unknown, path: Path): unknown =>
  path.reduce((inner, key) => (inner as Record<string | number, unknown>)[key], value);

function withValue(value: unknown, [key, ...rest]: Path, put: unknown): unknown {
  if (key === undefined) return put;
  if (Array.isArray(value)) return value.map((inner, i) => (i === key ? withValue(inner, rest, put) : inner));
  return { ...(value as object), [key]: withValue((value as Record<string, unknown>)[key], rest, put) };
}

const ids: Record<string, string> = {
  kitItemId: rings.id,
  movementId: row.id,
  substitutionId: way.id,
  sessionId: session.id,
  recordingId: recording.id,
  uploadId: upload.uploadId,
  personId: ours.member.id,
  invitationId: randomUUID(),
};
const addressOf = (path: string) =>
  `/api${path.replace(':team', ours.team.slug).replace(/:(\w+)/g, (_, name: string) => ids[name] ?? randomUUID())}`;

// merging comes last: it takes away what the others are about
const withBody = allEndpoints
  .filter(({ endpoint }) => endpoint.body && !endpoint.file)
  .toSorted((a, b) => Number(a.name === 'mergeMovements') - Number(b.name === 'mergeMovements'));

it('there is a body for every operation that takes one', () => {
  expect(Object.keys(bodies).toSorted()).toEqual(withBody.map(({ name }) => name).toSorted());
});

describe.each(withBody)('$name', ({ name, endpoint }) => {
  it('never breaks', { timeout: 120_000 }, async () => {
    const made = bodies[name] as () => unknown;
    const broken: string[] = [];
    const fitting = await made();
    for (const place of placesIn(fitting))
      for (const value of hostileTo(valueAt(fitting, place))) {
        const answer = await browser[endpoint.method](addressOf(endpoint.path))
          .set('X-Forwarded-For', freshAddress())
          .send(withValue(await made(), place, value) as object);
        const fits = answer.status < 400 || (answer.status < 500 && typeof answer.body.error?.code === 'string');
        if (!fits) broken.push(`${place.join('.')} = ${JSON.stringify(value)?.slice(0, 60)}: ${answer.status}`);
      }
    expect(broken).toEqual([]);
  });
});

const cursor = (...parts: unknown[]) => Buffer.from(JSON.stringify(parts)).toString('base64url');
const queried = allEndpoints.filter(({ endpoint }) => endpoint.query);
const typed = [
  ...texts,
  ...numbers.map(String),
  cursor('2026-99-99 99:99:99+00', row.id),
  cursor('0000-01-01 00:00:00+00', row.id),
  cursor('0000-01-01', row.id),
  cursor('9999-12-31', row.id),
  cursor('2026-03-03 00:00:00+99', row.id),
  cursor('2026-03-03 00:00:00+00', '-'.repeat(36)),
  cursor('a\u0000b', row.id),
  cursor('\ud800', row.id),
  cursor("'\\", row.id),
  cursor(1e308, 1e308),
  cursor('a', 'b', 'c', 'd'),
  'bnVsbA',
];

describe.each(queried)('$name', ({ endpoint }) => {
  it('never breaks at its query', { timeout: 60_000 }, async () => {
    const broken: string[] = [];
    for (const field of Object.keys(endpoint.query.shape))
      for (const value of typed) {
        const answer = await browser
          .get(addressOf(endpoint.path))
          .set('X-Forwarded-For', freshAddress())
          .query({ ...('q' in endpoint.query.shape ? { q: 'row' } : {}), [field]: value.slice(0, 4000) });
        const fits = answer.status < 400 || (answer.status < 500 && typeof answer.body.error?.code === 'string');
        if (!fits) broken.push(`${field} = ${JSON.stringify(value).slice(0, 80)}: ${answer.status}`);
      }
    expect(broken).toEqual([]);
  });
});

it('nobody gained anything by it', async () => {
  expect(await Movement.count({ where: { teamId: theirs.team.id } })).toBe(1);
  expect(
    await Promise.all(
      [KitItem, Session, Substitution, Recording].map((model) =>
        (model as typeof KitItem).count({ where: { teamId: theirs.team.id } }),
      ),
    ),
  ).toEqual([0, 0, 0, 0]);
});
