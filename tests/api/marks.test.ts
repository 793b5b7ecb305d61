import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeChapterPictures } from '../../server/jobs/definitions';
import type { Movement } from '../../server/models/dictionary';
import { ChapterRow } from '../../server/models/marks';
import { AuditEvent } from '../../server/models/people';
import type { Recording } from '../../server/models/recordings';
import { type Api, makeTeamOfFour, queuedJobs, startApi, type TeamOfFour, type Visitor } from '../support/api';
import { chapter, makeMovement, makeRecording, makeSession } from '../support/library';

let api: Api;
let ours: TeamOfFour;
let theirs: TeamOfFour;
let coach: Visitor;
let editor: Visitor;
let member: Visitor;
let row: Movement;

beforeAll(async () => {
  api = await startApi();
  ours = await makeTeamOfFour();
  theirs = await makeTeamOfFour();
  coach = await api.signedIn(ours.coach);
  editor = await api.signedIn(ours.editor);
  member = await api.signedIn(ours.member);
  row = await makeMovement(ours.team, 'Ring row');
});
afterAll(() => api.close());

const pathOf = (recording: Recording, rest = '') => `/api/teams/${ours.team.slug}/recordings/${recording.id}/${rest}`;

describe('chapters', () => {
  it('are saved whole, read back in order and asked pictures for', async () => {
    const recording = await makeRecording(ours.team);
    const items = [chapter(20_000, 30_000), chapter(0, 20_000, { kind: 'briefing', title: 'Today' })];
    await coach.put(pathOf(recording, 'chapters')).send({ version: 0, items }).expect(200);
    const { body } = await coach.get(pathOf(recording, 'chapters')).expect(200);
    expect(body.version).toBe(1);
    expect(body.items.map((item: { title: string }) => item.title)).toEqual(['Today', 'Ring row']);
    expect(await queuedJobs(makeChapterPictures)).toContainEqual({ teamId: ours.team.id, recordingId: recording.id });
    expect(await AuditEvent.count({ where: { subjectId: recording.id, action: 'chapters.saved' } })).toBe(1);
  });

  it('are refused with the current ones when somebody saved meanwhile, and nothing is lost', async () => {
    const recording = await makeRecording(ours.team);
    const first = [chapter(0, 5000, { title: 'Theirs' })];
    await coach.put(pathOf(recording, 'chapters')).send({ version: 0, items: first }).expect(200);
    const late = await editor
      .put(pathOf(recording, 'chapters'))
      .send({ version: 0, items: [chapter(0, 9000, { title: 'Mine' })] })
      .expect(409);
    expect(late.body.error.code).toBe('stale');
    expect(late.body.error.current).toMatchObject({ version: 1, items: [{ title: 'Theirs' }] });
    const { body } = await coach.get(pathOf(recording, 'chapters'));
    expect(body.items).toHaveLength(1);
  });

  it('let one of two saves at the same moment through', async () => {
    const recording = await makeRecording(ours.team);
    const saves = await Promise.all(
      ['A', 'B'].map((title) =>
        coach.put(pathOf(recording, 'chapters')).send({ version: 0, items: [chapter(0, 5000, { title })] }),
      ),
    );
    expect(saves.map(({ status }) => status).sort()).toEqual([200, 409]);
    expect(await ChapterRow.count({ where: { recordingId: recording.id } })).toBe(1);
  });

  it.each([
    ['overlap', [chapter(0, 6000), chapter(5000, 9000)]],
    ['end after the recording', [chapter(0, 60_001)]],
    ['end before they start', [chapter(5000, 5000)]],
    ['show a movement of nobody', [chapter(0, 5000, { movementId: randomUUID() })]],
  ])('are refused naming the one at fault when they %s', async (_fault, items) => {
    const recording = await makeRecording(ours.team);
    const { body } = await coach.put(pathOf(recording, 'chapters')).send({ version: 0, items }).expect(400);
    expect(body.error.code).toBe('invalid');
    expect(Object.keys(body.error.fields)[0]).toMatch(/^items\.\d/);
    expect(await ChapterRow.count({ where: { recordingId: recording.id } })).toBe(0);
  });

  it('never take over a chapter of another recording', async () => {
    const [one, other] = [await makeRecording(ours.team), await makeRecording(theirs.team)];
    const stolen = chapter(0, 5000);
    await (await api.signedIn(theirs.coach))
      .put(`/api/teams/${theirs.team.slug}/recordings/${other.id}/chapters`)
      .send({ version: 0, items: [stolen] })
      .expect(200);
    await coach
      .put(pathOf(one, 'chapters'))
      .send({ version: 0, items: [{ ...stolen, title: 'Taken' }] })
      .expect(400);
    expect((await ChapterRow.findByPk(stolen.id))?.title).toBe('Ring row');
  });

  it('may not point at a movement of another team', async () => {
    const recording = await makeRecording(ours.team);
    const foreign = await makeMovement(theirs.team, 'Their row');
    const { body } = await coach
      .put(pathOf(recording, 'chapters'))
      .send({ version: 0, items: [chapter(0, 5000, { movementId: foreign.id })] })
      .expect(400);
    expect(body.error.fields).toHaveProperty(['items.0.movementId']);
  });

  it('point at each kind of thing in its own field', async () => {
    const { session, block } = await makeSession(ours.team, { state: 'draft', movements: [row] });
    const recording = await makeRecording(ours.team, { session });
    const { body } = await coach
      .put(pathOf(recording, 'chapters'))
      .send({ version: 0, items: [chapter(0, 5000, { blockId: row.id, movementId: block.id })] })
      .expect(400);
    expect(Object.keys(body.error.fields).toSorted()).toEqual(['items.0.blockId', 'items.0.movementId']);
  });

  it('never take over a chapter of another recording by its id in capital letters', async () => {
    const [one, other] = [await makeRecording(ours.team), await makeRecording(ours.team)];
    const held = chapter(0, 5000);
    await coach
      .put(pathOf(other, 'chapters'))
      .send({ version: 0, items: [held] })
      .expect(200);
    const { body } = await coach
      .put(pathOf(one, 'chapters'))
      .send({ version: 0, items: [chapter(0, 2000), chapter(3000, 5000, { id: held.id.toUpperCase() })] })
      .expect(400);
    expect(Object.keys(body.error.fields)).toEqual(['items.1.id']);
  });

  it('keep every version, and bring one back as a new one', async () => {
    const recording = await makeRecording(ours.team);
    const kept = chapter(0, 5000, { title: 'First', movementId: row.id });
    await coach
      .put(pathOf(recording, 'chapters'))
      .send({ version: 0, items: [kept, chapter(5000, 9000)] })
      .expect(200);
    await editor
      .put(pathOf(recording, 'chapters'))
      .send({ version: 1, items: [{ ...kept, title: 'Second' }] })
      .expect(200);
    const history = await coach.get(pathOf(recording, 'chapters/versions')).expect(200);
    expect(history.body.items).toMatchObject([
      { version: 2, author: 'The editor', how: 'edit', count: 1, added: 0, removed: 1, changed: 1 },
      { version: 1, author: 'The coach', count: 2, added: 2 },
    ]);
    const back = await editor.post(pathOf(recording, 'chapters/restore')).send({ restore: 1, version: 2 }).expect(200);
    expect(back.body).toMatchObject({
      version: 3,
      items: [{ title: 'First', movementId: row.id }, { title: 'Ring row' }],
    });
    await editor.post(pathOf(recording, 'chapters/restore')).send({ restore: 99, version: 3 }).expect(404);
  });

  it('leave as a WebVTT file, without asides for members', async () => {
    const { session } = await makeSession(ours.team);
    const recording = await makeRecording(ours.team, { session });
    const items = [
      chapter(0, 5000, { title: 'Row & hang <loop>' }),
      chapter(5000, 8000, { kind: 'aside', title: 'Lost the dog' }),
    ];
    await coach.put(pathOf(recording, 'chapters')).send({ version: 0, items }).expect(200);
    const forMembers = await member.get(pathOf(recording, 'chapters.vtt')).expect(200);
    expect(forMembers.headers['content-type']).toBe('text/vtt; charset=utf-8');
    expect(forMembers.text).toContain('00:00:00.000 --> 00:00:05.000\nRow &amp; hang &lt;loop&gt;');
    expect(forMembers.text).not.toContain('dog');
    expect((await coach.get(pathOf(recording, 'chapters.vtt'))).text).toContain('dog');
  });

  it('of a draft stay hidden from members', async () => {
    const { session } = await makeSession(ours.team, { state: 'draft' });
    const recording = await makeRecording(ours.team, { session });
    await member.get(pathOf(recording, 'chapters.vtt')).expect(404);
    await member.get(pathOf(recording, 'captions.vtt')).expect(404);
    await member.get(pathOf(recording, 'chapters')).expect(403);
  });

  it('wait until the length is known', async () => {
    const recording = await makeRecording(ours.team, { state: 'making' });
    await recording.update({ durationMs: null });
    const { body } = await coach.put(pathOf(recording, 'chapters')).send({ version: 0, items: [] }).expect(409);
    expect(body.error.code).toBe('notReady');
  });
});

const vtt =
  'WEBVTT\n\n00:00.500 --> 00:02.000\nFeet under the bar.\n\n00:02.000 --> 00:04.000\n<v Ada>Pull <b>slowly</b>.\n';

describe('captions', () => {
  it('are imported, corrected line by line, and every version is kept', async () => {
    const recording = await makeRecording(ours.team);
    const imported = await editor
      .post(pathOf(recording, 'captions/import'))
      .field('version', '0')
      .attach('file', Buffer.from(vtt), { filename: 'take.vtt', contentType: 'text/vtt' })
      .expect(200);
    expect(imported.body).toMatchObject({
      version: 1,
      lines: [
        { startMs: 500, endMs: 2000, text: 'Feet under the bar.' },
        { startMs: 2000, endMs: 4000, text: 'Pull slowly.' },
      ],
    });
    const lines = imported.body.lines.map((line: { text: string }, index: number) =>
      index === 0 ? { ...line, text: 'Feet under the rings.' } : line,
    );
    await editor.put(pathOf(recording, 'captions')).send({ version: 1, lines }).expect(200);
    const stale = await coach.put(pathOf(recording, 'captions')).send({ version: 1, lines: [] }).expect(409);
    expect(stale.body.error.current.lines[0].text).toBe('Feet under the rings.');
    const history = await editor.get(pathOf(recording, 'captions/versions'));
    expect(history.body.items).toMatchObject([
      { version: 2, how: 'edit', changed: 1, added: 0, removed: 0 },
      { version: 1, how: 'import', origin: 'take.vtt' },
    ]);
    const back = await editor.post(pathOf(recording, 'captions/restore')).send({ restore: 1, version: 2 }).expect(200);
    expect(back.body.lines[0].text).toBe('Feet under the bar.');
    const file = await editor.get(pathOf(recording, 'captions.vtt')).expect(200);
    expect(file.text).toContain('00:00:00.500 --> 00:00:02.000\nFeet under the bar.');
  });

  it('are taken from an SRT file too', async () => {
    const recording = await makeRecording(ours.team);
    const srt = '1\r\n00:00:01,000 --> 00:00:02,500\r\nStand tall.\r\n';
    const { body } = await editor
      .post(pathOf(recording, 'captions/import'))
      .field('version', '0')
      .attach('file', Buffer.from(srt), 'take.srt')
      .expect(200);
    expect(body.lines).toEqual([{ startMs: 1000, endMs: 2500, text: 'Stand tall.' }]);
  });

  it.each([
    ['a malformed line', 'WEBVTT\n\n00:05.000 --> 00:02.000\nBackwards\n', /line 3/i],
    ['no signature', '00:05.000 --> 00:06.000\nNo head\n', /./],
    ['lines after the end of the recording', 'WEBVTT\n\n01:10.000 --> 01:12.000\nToo late\n', /end of the recording/],
    ['nothing in it', '', /empty/i],
  ])('of a file with %s change nothing and say why', async (_what, text, reason) => {
    const recording = await makeRecording(ours.team);
    await editor
      .put(pathOf(recording, 'captions'))
      .send({ version: 0, lines: [{ startMs: 0, endMs: 1000, text: 'Stays' }] })
      .expect(200);
    const { body } = await editor
      .post(pathOf(recording, 'captions/import'))
      .field('version', '1')
      .attach('file', Buffer.from(text), 'take.vtt')
      .expect(400);
    expect(body.error.code).toBe('badFile');
    expect(body.error.message).toMatch(reason);
    expect((await editor.get(pathOf(recording, 'captions'))).body).toMatchObject({
      version: 1,
      lines: [{ text: 'Stays' }],
    });
  });

  it('refuse a file that is too large, and a request without one', async () => {
    const recording = await makeRecording(ours.team);
    const large = Buffer.alloc(2 * 1024 * 1024 + 1, 'a');
    await editor
      .post(pathOf(recording, 'captions/import'))
      .field('version', '0')
      .attach('file', large, 'take.vtt')
      .expect(413);
    await editor.post(pathOf(recording, 'captions/import')).field('version', '0').expect(400);
    await editor.post(pathOf(recording, 'captions/import')).send({ version: 0 }).expect(415);
  });

  it('show a script as text and keep what is said in an aside from members', async () => {
    const { session } = await makeSession(ours.team);
    const recording = await makeRecording(ours.team, { session });
    await coach
      .put(pathOf(recording, 'chapters'))
      .send({ version: 0, items: [chapter(0, 5000), chapter(5000, 9000, { kind: 'aside' })] })
      .expect(200);
    const lines = [
      { startMs: 0, endMs: 2000, text: '<script>alert(1)</script>' },
      { startMs: 6000, endMs: 8000, text: 'Where is the dog?' },
    ];
    await editor.put(pathOf(recording, 'captions')).send({ version: 0, lines }).expect(200);
    const { text } = await member.get(pathOf(recording, 'captions.vtt')).expect(200);
    // ASVS 5.0 3.2.2: shown as text
    expect(text).toContain('&lt;script&gt;alert(1)&lt;/script&gt;');
    expect(text).not.toContain('dog');
  });
});

describe('cues', () => {
  const cue = (atMs: number, text: string, more: object = {}) => ({
    id: randomUUID(),
    atMs,
    kind: 'go',
    text,
    movementId: null,
    ...more,
  });

  it('are pinned to a moment with a movement, corrected and restored', async () => {
    const recording = await makeRecording(ours.team);
    const pinned = cue(3000, 'Ribs down before you press', { movementId: row.id });
    await editor
      .put(pathOf(recording, 'cues'))
      .send({ version: 0, items: [cue(9000, 'Stand tall'), pinned] })
      .expect(200);
    const corrected = { ...pinned, text: 'Ribs down' };
    const saved = await editor
      .put(pathOf(recording, 'cues'))
      .send({ version: 1, items: [corrected] })
      .expect(200);
    expect(saved.body).toEqual({ version: 2, items: [corrected] });
    const back = await editor.post(pathOf(recording, 'cues/restore')).send({ restore: 1, version: 2 }).expect(200);
    expect(back.body.items.map(({ text }: { text: string }) => text)).toEqual([
      'Ribs down before you press',
      'Stand tall',
    ]);
    await coach.put(pathOf(recording, 'cues')).send({ version: 1, items: [] }).expect(409);
  });

  it('are refused past the end, with a foreign movement, or under a taken id', async () => {
    const [one, other] = [await makeRecording(ours.team), await makeRecording(ours.team)];
    const taken = cue(0, 'Here');
    await editor
      .put(pathOf(other, 'cues'))
      .send({ version: 0, items: [taken] })
      .expect(200);
    const foreign = await makeMovement(theirs.team, 'Their hop');
    for (const wrong of [cue(60_001, 'Late'), cue(0, 'Foreign', { movementId: foreign.id }), taken])
      await editor
        .put(pathOf(one, 'cues'))
        .send({ version: 0, items: [wrong] })
        .expect(400);
    expect((await editor.get(pathOf(other, 'cues'))).body.items).toHaveLength(1);
  });

  it('are not a member’s to save', async () => {
    const recording = await makeRecording(ours.team);
    await member.put(pathOf(recording, 'cues')).send({ version: 0, items: [] }).expect(403);
  });
});
