import { randomUUID } from 'node:crypto';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type KitItem, Movement } from '../../server/models/dictionary';
import { AuditEvent, Team } from '../../server/models/people';
import { store } from '../../server/services/context';
import { dictionaryOf } from '../../server/services/dictionary';
import { limits } from '../../shared/limits';
import { madePrefix } from '../../storage/keys';
import { type Api, makeTeamOfFour, startApi, type TeamOfFour, type Visitor } from '../support/api';
import { chapter, makeKitItem, makeMovement, makeRecording, makeSession, needs } from '../support/library';

let api: Api;
let ours: TeamOfFour;
let theirs: TeamOfFour;
let editor: Visitor;
let member: Visitor;
let rings: KitItem;

beforeAll(async () => {
  api = await startApi();
  [ours, theirs] = [await makeTeamOfFour(), await makeTeamOfFour()];
  [editor, member] = [await api.signedIn(ours.editor), await api.signedIn(ours.member)];
  rings = await makeKitItem(ours.team, 'rings');
});
afterAll(() => api.close());

const at = (path: string, { team } = ours) => `/api/teams/${team.slug}/${path}`;
const fields = (name: string, more: object = {}) => ({ name, pattern: 'pull', ...more });
const create = async (name: string, more: object = {}) =>
  (await editor.post(at('movements')).send(fields(name, more)).expect(201)).body;
const namesIn = (body: { items: { name: string }[] }) => body.items.map(({ name }) => name);

describe('a new movement', () => {
  it('is kept as it was written, and anybody in the team reads it', async () => {
    const made = await create('Ring row', {
      otherNames: ['Body row', 'ring row', 'body row'],
      kitNeeded: needs(rings),
      points: ['Heels down, ribs down.'],
      faults: ['Hips sag.'],
      cautions: [{ say: 'Check the anchor before you hang.', more: '' }],
    });
    expect(made).toMatchObject({ otherNames: ['Body row'], pictureUrl: null, version: 1 });
    const { body } = await member.get(at(`movements/${made.id}`)).expect(200);
    expect(body).toEqual({ movement: made, substitutions: [], standsInFor: [], moments: [] });
  });

  it('is made once by a double click', async () => {
    const answers = await Promise.all([1, 2].map(() => editor.post(at('movements')).send(fields('Wall sit'))));
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409]);
    expect(await Movement.count({ where: { teamId: ours.team.id, name: 'Wall sit' } })).toBe(1);
  });

  it('takes no name twice, whatever signs it has', async () => {
    const odd = "Row for $1 \\ 'x' :id";
    await create(odd);
    expect((await editor.post(at('movements')).send(fields(odd)).expect(409)).body.error.code).toBe('nameTaken');
  });

  it('takes no name that another one has in any case; a name that is only another name is free', async () => {
    await create('Skips', { otherNames: ['Rope hops'] });
    const { body } = await editor.post(at('movements')).send(fields('sKIPs')).expect(409);
    expect(body.error).toMatchObject({ code: 'nameTaken', fields: { name: expect.any(String) } });
    await create('Rope hops');
    await (await api.signedIn(theirs.editor)).post(at('movements', theirs)).send(fields('Skips')).expect(201);
  });

  it('asks for kit that the team has', async () => {
    const foreign = await makeKitItem(theirs.team, 'their bar');
    const { body } = await editor
      .post(at('movements'))
      .send(fields('Toes up', { kitNeeded: [{ anyOf: [needs(rings)[0]?.anyOf[0], { kitItemId: foreign.id }] }] }))
      .expect(400);
    expect(Object.keys(body.error.fields)).toEqual(['kitNeeded.0.anyOf.1.kitItemId']);
  });

  it('refuses text that no database keeps, at its field', async () => {
    const cautions = [{ say: 'Clear the floor.', more: 'a\u0000b' }];
    const { body } = await editor.post(at('movements')).send(fields('Nul hop', { cautions })).expect(400);
    expect(Object.keys(body.error.fields)).toEqual(['cautions.0.more']);
  });

  it('is not a member’s to make', async () => {
    await member.post(at('movements')).send(fields('Handstand')).expect(403);
  });
});

describe('a changed movement', () => {
  it('keeps its former name as another name, and is found by it', async () => {
    const made = await create('Table row');
    const { body } = await editor
      .put(at(`movements/${made.id}`))
      .send(fields('Desk row', { version: 1 }))
      .expect(200);
    expect(body).toMatchObject({ name: 'Desk row', otherNames: ['Table row'], version: 2 });
    const found = await member.get(at('movements')).query({ q: 'table row' }).expect(200);
    expect(found.body.items[0]).toMatchObject({ id: made.id, name: 'Desk row' });
    const events = await AuditEvent.findAll({ where: { subjectId: made.id, action: 'movement.renamed' } });
    expect(events.map(({ details }) => details)).toEqual([{ from: 'Table row', to: 'Desk row' }]);
  });

  it('gets no double of a name that only changed its case', async () => {
    const made = await create('Box step');
    const { body } = await editor.put(at(`movements/${made.id}`)).send(fields('box step', { version: 1 }));
    expect(body).toMatchObject({ name: 'box step', otherNames: [] });
  });

  it('is refused to the second of two tabs, with what is there', async () => {
    const made = await create('Bear crawl');
    const save = (points: string[]) =>
      editor.put(at(`movements/${made.id}`)).send(fields('Bear crawl', { points, version: 1 }));
    const answers = await Promise.all([save(['Knees low.']), save(['Back flat.'])]);
    const [saved, refused] = answers.toSorted((a, b) => a.status - b.status);
    expect([saved?.status, refused?.status]).toEqual([200, 409]);
    expect(refused?.body.error).toMatchObject({ code: 'stale', current: { points: saved?.body.points, version: 2 } });
  });

  it('is stale before its name is taken: the newer version is what the person has to see', async () => {
    const made = await create('Crab walk');
    await editor
      .put(at(`movements/${made.id}`))
      .send(fields('Crab walk', { version: 1 }))
      .expect(200);
    const { body } = await editor.put(at(`movements/${made.id}`)).send(fields('Crab walk', { version: 1 }));
    expect(body.error.code).toBe('stale');
  });

  it('refuses the name of another one', async () => {
    const made = await create('Plank');
    await create('Side plank');
    const { body } = await editor.put(at(`movements/${made.id}`)).send(fields('SIDE PLANK', { version: 1 }));
    expect(body.error.code).toBe('nameTaken');
  });

  it('is not lost in more names than fit', async () => {
    const made = await create('Long story');
    const otherNames = Array.from({ length: 40 }, (_, i) => `Story ${i}`);
    const { body } = await editor
      .put(at(`movements/${made.id}`))
      .send(fields('Short story', { otherNames, version: 1 }))
      .expect(400);
    expect(body.error.fields.otherNames).toContain('40');
  });

  it('of another team is not there', async () => {
    const foreign = await makeMovement(theirs.team, 'Their row');
    await editor.get(at(`movements/${foreign.id}`)).expect(404);
    await editor
      .put(at(`movements/${foreign.id}`))
      .send(fields('Mine', { version: 1 }))
      .expect(404);
    await editor.get(at(`movements/${foreign.id}`, theirs)).expect(404);
  });
});

describe('the dictionary', () => {
  let team: TeamOfFour;
  let reader: Visitor;
  let writer: Visitor;
  const path = (rest: string) => at(rest, team);

  beforeAll(async () => {
    team = await makeTeamOfFour();
    [reader, writer] = [await api.signedIn(team.member), await api.signedIn(team.coach)];
    for (const name of ['Goblet squat', 'air squat', 'Jump squat', 'Push-up', 'Hip hinge'])
      await makeMovement(team.team, name, { pattern: name.includes('squat') ? 'squat' : 'hinge' });
  });

  it('is walked by name in any case, page by page, with nothing twice', async () => {
    const seen: string[] = [];
    let cursor: string | null = null;
    do {
      const { body }: { body: { items: { name: string }[]; nextCursor: string | null } } = await reader
        .get(path('movements'))
        .query({ limit: 2, ...(cursor ? { cursor } : {}) })
        .expect(200);
      seen.push(...namesIn(body));
      cursor = body.nextCursor;
    } while (cursor);
    expect(seen).toEqual(['air squat', 'Goblet squat', 'Hip hinge', 'Jump squat', 'Push-up']);
  });

  it('is narrowed to a pattern', async () => {
    const { body } = await reader.get(path('movements')).query({ pattern: 'squat' }).expect(200);
    expect(namesIn(body)).toEqual(['air squat', 'Goblet squat', 'Jump squat']);
  });

  it.each([
    ['nonsense', 'nonsense'],
    ['another list’s', Buffer.from(JSON.stringify(['2026-03-03'])).toString('base64url')],
    ['one without an id', Buffer.from(JSON.stringify(['air squat', 'x'])).toString('base64url')],
    ['one with a NUL', Buffer.from(JSON.stringify(['\u0000', randomUUID()])).toString('base64url')],
  ])('refuses a cursor that is %s', async (_what, cursor) => {
    const { body } = await reader.get(path('movements')).query({ cursor }).expect(400);
    expect(body.error.fields).toHaveProperty('cursor');
  });

  it('finds what a typo means, best first', async () => {
    const { body } = await reader.get(path('movements')).query({ q: 'goblit sqaut' }).expect(200);
    expect(namesIn(body)[0]).toBe('Goblet squat');
    expect(body.nextCursor).toBeNull();
    const nothing = await reader.get(path('movements')).query({ q: 'xylophone' }).expect(200);
    expect(nothing.body.items).toEqual([]);
  });

  it('understands “without”: what does not ask for that kit', async () => {
    const other = await makeTeamOfFour();
    const rope = await makeKitItem(other.team, 'rope');
    const band = await makeKitItem(other.team, 'band');
    const either = [{ anyOf: [...needs(rope), ...needs(band)].flatMap(({ anyOf }) => anyOf) }];
    await makeMovement(other.team, 'Rope skip', { kitNeeded: needs(rope) });
    await makeMovement(other.team, 'Side skip');
    await makeMovement(other.team, 'Pulled skip', { kitNeeded: either });
    const browser = await api.signedIn(other.member);
    const found = async (q: string) =>
      namesIn((await browser.get(at('movements', other)).query({ q }).expect(200)).body).sort();
    expect(await found('skip without a rope')).toEqual(['Pulled skip', 'Side skip']);
    expect(await found('no rope')).toEqual(['Pulled skip', 'Side skip']);
  });

  it('knows a new movement, a new name and new kit at once', async () => {
    const before = await dictionaryOf(team.team.id);
    const made = (await writer.post(path('movements')).send(fields('Sea otter roll')).expect(201)).body;
    const { body } = await reader.get(path('movement-names')).expect(200);
    expect(body.items).toContainEqual({ id: made.id, name: 'Sea otter roll', otherNames: [], pattern: 'pull' });
    await writer.post(path('kit')).send({ name: 'driftwood', withoutText: 'no driftwood' }).expect(201);
    const after = await dictionaryOf(team.team.id);
    expect([...after.kitItems.values()].map(({ name }) => name)).toEqual(['driftwood']);
    expect(after.version).toBe(before.version + 2);
    expect(await dictionaryOf(team.team.id)).toBe(after);
  });

  it('is not fooled by a change that another process made', async () => {
    await dictionaryOf(team.team.id);
    await Movement.create({ teamId: team.team.id, name: 'Pebble carry', pattern: 'carry' });
    await Team.increment('dictionaryVersion', { where: { id: team.team.id } });
    const { body } = await reader.get(path('movements')).query({ q: 'pebble carry' }).expect(200);
    expect(namesIn(body)[0]).toBe('Pebble carry');
  });

  it('counts and shows the moments that somebody may see', async () => {
    const movement = await makeMovement(team.team, 'Lateral hop', { pattern: 'jump' });
    const { session: open } = await makeSession(team.team, { date: '2026-03-02' });
    const { session: newer } = await makeSession(team.team, { date: '2026-03-09', title: 'Newer' });
    const { session: draft } = await makeSession(team.team, { date: '2026-03-16', state: 'draft' });
    const shows = { movementId: movement.id };
    for (const session of [open, newer, draft]) {
      const recording = await makeRecording(team.team, { session });
      await writer
        .put(path(`recordings/${recording.id}/chapters`))
        .send({
          version: 0,
          items: [chapter(0, 9000, shows), chapter(9000, 12_000, { ...shows, kind: 'aside', title: 'Outtake' })],
        })
        .expect(200);
    }
    const countFor = async (browser: Visitor) =>
      (await browser.get(path('movements')).query({ pattern: 'jump' }).expect(200)).body.items[0].demoCount;
    expect(await countFor(reader)).toBe(2);
    expect(await countFor(writer)).toBe(3);
    const momentsFor = async (browser: Visitor) =>
      (await browser.get(path(`movements/${movement.id}`)).expect(200)).body.moments.map(
        (moment: { session: { date: string }; kind: string }) => [moment.session.date, moment.kind],
      );
    expect(await momentsFor(reader)).toEqual([
      ['2026-03-09', 'demo'],
      ['2026-03-02', 'demo'],
    ]);
    expect(await momentsFor(writer)).toHaveLength(3);
  });
});

describe('a picture', () => {
  const upload = (id: string, bytes: Buffer, name = 'row.jpg') =>
    editor.post(at(`movements/${id}/picture`)).attach('file', bytes, name);
  const photograph = (width = 2000, height = 1000) =>
    sharp({ create: { width, height, channels: 3, background: '#345' } })
      .withExif({ IFD0: { Copyright: 'A secret place' } })
      .jpeg();
  const kept = async (id: string) => {
    const keys: string[] = [];
    for await (const key of store().list(madePrefix(ours.team.id, id))) keys.push(key);
    return keys;
  };
  const fetched = async (url: string) => Buffer.from(await (await fetch(`${api.url}${url}`)).arrayBuffer());

  it('is drawn anew: small enough, as WebP, without what the file said beside it', async () => {
    const made = await create('Picture row');
    const file = await photograph().withMetadata({ orientation: 6 }).toBuffer();
    const { body } = await upload(made.id, file).expect(200);
    const bytes = await fetched(body.pictureUrl);
    const { format, width, height, exif, orientation } = await sharp(bytes).metadata();
    // orientation 6 says "turn it clockwise" (Exif 2.32, tag 0x0112)
    expect({ format, width, height, exif, orientation }).toEqual({
      format: 'webp',
      width: 640,
      height: 1280,
      exif: undefined,
      orientation: undefined,
    });
    expect(bytes.includes('A secret place')).toBe(false);
    const list = await member.get(at('movements')).query({ q: 'picture row' }).expect(200);
    expect(list.body.items[0].pictureUrl).toBe(body.pictureUrl);
  });

  it('takes the place of the one before, and goes away', async () => {
    const made = await create('Two pictures');
    const first = (await upload(made.id, await photograph().toBuffer()).expect(200)).body.pictureUrl;
    const second = (await upload(made.id, await photograph(300, 300).toBuffer()).expect(200)).body.pictureUrl;
    expect(second).not.toBe(first);
    await expect.poll(() => kept(made.id)).toHaveLength(1);
    const { body } = await editor.delete(at(`movements/${made.id}/picture`)).expect(200);
    expect(body.pictureUrl).toBeNull();
    await expect.poll(() => kept(made.id)).toHaveLength(0);
    await editor.delete(at(`movements/${made.id}/picture`)).expect(200);
  });

  it.each([
    ['text with a picture’s name', () => Buffer.from('<svg onload="alert(1)"/>'), 415, 'wrongType'],
    ['a GIF with a picture’s name', () => Buffer.from('R0lGODlhAQABAAAAACw=', 'base64'), 415, 'wrongType'],
    ['a cut-off JPEG', async () => (await photograph().toBuffer()).subarray(0, 900), 400, 'badFile'],
    ['60 million pixels in a small PNG', () => bomb(), 400, 'badFile'],
    ['more bytes than fit', () => Buffer.alloc(limits.pictureBytes + 1), 413, 'tooLarge'],
  ] as const)('refuses %s and leaves nothing behind', async (what, bytes, status, code) => {
    const made = await create(`Refuses ${what}`);
    const { body } = await upload(made.id, await bytes()).expect(status);
    expect(body.error.code).toBe(code);
    expect(await kept(made.id)).toEqual([]);
  });

  const bomb = () =>
    sharp({ create: { width: 10_000, height: 6000, channels: 3, background: '#000' }, limitInputPixels: false })
      .png()
      .toBuffer();

  it('is refused for a movement of another team, and without a file', async () => {
    const foreign = await makeMovement(theirs.team, 'Their picture');
    await upload(foreign.id, await photograph(10, 10).toBuffer()).expect(404);
    const made = await create('No file');
    await editor
      .post(at(`movements/${made.id}/picture`))
      .field('other', 'x')
      .expect(400);
    await member
      .post(at(`movements/${made.id}/picture`))
      .attach('file', await photograph(9, 9).toBuffer(), 'a.jpg')
      .expect(403);
  });
});

describe('substitutions', () => {
  let from: { id: string; name: string };
  let to: { id: string; name: string };
  const same = { type: 'same' };
  const substitution = (more: object = {}) => ({
    toMovementId: to.id,
    missing: 'kit',
    missingKitItemId: rings.id,
    doseRule: same,
    reason: 'The same pull.',
    ...more,
  });
  const path = (rest = '') => at(`movements/${from.id}/substitutions${rest}`);

  beforeAll(async () => {
    const [a, b] = [await create('High ring row'), await create('Towel pull')];
    [from, to] = [
      { id: a.id, name: a.name },
      { id: b.id, name: b.name },
    ];
  });

  it('is there once, seen from both sides, and a double click adds it once', async () => {
    const answers = await Promise.all([1, 2].map(() => editor.post(path()).send(substitution())));
    const [added, refused] = answers.toSorted((a, b) => a.status - b.status);
    expect([added?.status, refused?.body.error.code]).toEqual([201, 'nameTaken']);
    const left = (await member.get(at(`movements/${from.id}`)).expect(200)).body;
    const right = (await member.get(at(`movements/${to.id}`)).expect(200)).body;
    expect(left.substitutions).toEqual([
      expect.objectContaining({ from, to, missing: 'kit', missingKitItemId: rings.id, version: 1 }),
    ]);
    expect(right.standsInFor).toEqual(left.substitutions);
    expect(right.substitutions).toEqual([]);
  });

  it('refuses what makes no sense, naming the field', async () => {
    const foreign = await makeMovement(theirs.team, 'Their other row');
    const faults = async (more: object) =>
      Object.keys((await editor.post(path()).send(substitution(more)).expect(400)).body.error.fields);
    expect(await faults({ toMovementId: from.id })).toEqual(['toMovementId']);
    expect(await faults({ toMovementId: foreign.id })).toEqual(['toMovementId']);
    expect(await faults({ missingKitItemId: null })).toEqual(['missingKitItemId']);
    expect(await faults({ missing: 'space' })).toEqual(['missingKitItemId']);
    expect(await faults({ missingKitItemId: randomUUID() })).toEqual(['missingKitItemId']);
    expect(await faults({ doseRule: { type: 'times', factor: 0 } })).toEqual(['doseRule.factor']);
    await editor
      .post(at(`movements/${foreign.id}/substitutions`))
      .send(substitution())
      .expect(404);
  });

  it('changes with its version, into nothing that is there already', async () => {
    const fresh = (
      await editor
        .post(path())
        .send(substitution({ missing: 'space', missingKitItemId: null }))
        .expect(201)
    ).body;
    const change = (more: object) => editor.put(path(`/${fresh.id}`)).send(substitution(more));
    const { body } = await change({ missing: 'ability', missingKitItemId: null, version: 1 }).expect(200);
    expect(body).toMatchObject({ missing: 'ability', version: 2 });
    const stale = await change({ missing: 'ability', missingKitItemId: null, version: 1 }).expect(409);
    expect(stale.body.error).toMatchObject({ code: 'stale', current: body });
    await change({ version: 2 }).expect(400);
    // it belongs to the movement that it starts from
    await editor
      .put(at(`movements/${to.id}/substitutions/${fresh.id}`))
      .send(substitution({ version: 2 }))
      .expect(404);
    await editor.delete(path(`/${fresh.id}`)).expect(200);
    await editor.delete(path(`/${fresh.id}`)).expect(404);
  });
});
