import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { KitItem, Movement } from '../../server/models/dictionary';
import { CaptionLineRow, CaptionTrack, ChapterRow, CueRow } from '../../server/models/marks';
import { Recording, WatchPlace } from '../../server/models/recordings';
import type { Session } from '../../server/models/sessions';
import { presentMoments, visibleChaptersWhere } from '../../server/services/moments';
import { Moment } from '../../shared/contracts/moments';
import { Watch } from '../../shared/contracts/watch';
import type { Role } from '../../shared/domain/words';
import { type Api, makeTeamOfFour, startApi, type TeamOfFour, type Visitor } from '../support/api';
import { makeReadyRecording, makeSession } from '../support/footage';

let api: Api;
let ours: TeamOfFour;
let session: Session;
let recording: Recording;
let secret: Movement;
let member: Visitor;
let coach: Visitor;

beforeAll(async () => {
  api = await startApi();
  ours = await makeTeamOfFour();
  const teamId = ours.team.id;
  session = await makeSession(teamId, { published: true });
  recording = await makeReadyRecording(teamId, { sessionId: session.id, coachId: ours.coach.id });
  const rings = await KitItem.create({ teamId, name: 'Rings', withoutText: 'nothing to hang from' });
  const row = await Movement.create({
    teamId,
    name: 'Towel row',
    pattern: 'pull',
    points: ['Ribs down'],
    cautions: [{ say: 'Check the door before you lean.', more: '' }],
  });
  const ringRow = await Movement.create({ teamId, name: 'Ring row', pattern: 'pull' });
  secret = await Movement.create({ teamId, name: 'Spoken of in an aside', pattern: 'push' });
  const of = { teamId, recordingId: recording.id };
  await ChapterRow.bulkCreate([
    { ...of, id: randomUUID(), startMs: 0, endMs: 10_000, kind: 'briefing', title: 'Today' },
    { ...of, id: randomUUID(), startMs: 10_000, endMs: 20_000, kind: 'aside', title: 'The cat', movementId: secret.id },
    {
      ...of,
      id: randomUUID(),
      startMs: 20_000,
      endMs: 40_000,
      kind: 'substitution',
      title: 'With a towel',
      movementId: row.id,
      standsInForMovementId: ringRow.id,
      missing: 'kit',
      missingKitItemId: rings.id,
    },
  ]);
  const track = await CaptionTrack.create(of);
  const lines = [
    [8000, 9900, 'Good morning.'],
    [9900, 11_900, 'Look at the cat.'],
    [15_000, 17_000, 'She wants out.'],
    [19_500, 21_500, 'Now the towel.'],
  ] as const;
  await CaptionLineRow.bulkCreate(
    lines.map(([startMs, endMs, text], position) => ({ teamId, trackId: track.id, position, startMs, endMs, text })),
  );
  await CueRow.bulkCreate([
    { ...of, id: randomUUID(), atMs: 12_000, kind: 'go', text: 'Mind the cat', movementId: secret.id },
    { ...of, id: randomUUID(), atMs: 22_000, kind: 'set-up', text: 'Towel in the hinge side', movementId: row.id },
  ]);
  await makeReadyRecording(teamId, { sessionId: session.id, take: 2, title: 'Take two' });
  member = await api.signedIn(ours.member);
  coach = await api.signedIn(ours.coach);
});
afterAll(() => api.close());

const path = (id = recording.id) => `/api/teams/${ours.team.slug}/watch/${id}`;

describe('what a member gets', () => {
  it('is all that the player needs, without asides and what is said or pinned in them', async () => {
    const { body } = await member.get(path()).expect(200);
    expect(Watch.parse(body)).toEqual(body);
    expect(body.chapters.map((chapter: { title: string }) => chapter.title)).toEqual(['Today', 'With a towel']);
    expect(body.chapters[1].missingText).toBe('nothing to hang from');
    expect(body.skips).toEqual([{ startMs: 10_000, endMs: 20_000 }]);
    expect(body.captions.map((line: { text: string }) => line.text)).toEqual(['Good morning.', 'Now the towel.']);
    expect(body.cues.map((cue: { text: string }) => cue.text)).toEqual(['Towel in the hinge side']);
    expect(body.movements.map((movement: { name: string }) => movement.name)).toEqual(['Ring row', 'Towel row']);
    expect(body.movements[1].cautions).toEqual([{ say: 'Check the door before you lean.', more: '' }]);
    expect(body).toMatchObject({
      durationMs: 60_000,
      fps: 30,
      coach: 'The coach',
      session: { id: session.id, published: true },
      takes: [{ title: 'Take two', take: 2 }],
      placeMs: null,
    });
    expect(JSON.stringify(body)).not.toMatch(/cat|aside/i);
    expect(await (await fetch(`${api.url}${body.playback.url}`)).text()).toBe(`playback of ${recording.id}`);
    const lives = Date.parse(body.addressesEndAt) - Date.now();
    expect(lives).toBeGreaterThan(59 * 60_000);
    expect(Number(body.playback.url.split('/')[2])).toBeGreaterThanOrEqual(Date.parse(body.addressesEndAt));
  });

  it('is nothing of drafts, of footage without a session, or of what does not play yet', async () => {
    const draft = await makeSession(ours.team.id);
    const unseen = await Promise.all([
      makeReadyRecording(ours.team.id, { sessionId: draft.id }),
      makeReadyRecording(ours.team.id),
    ]);
    const making = await makeReadyRecording(ours.team.id, { sessionId: session.id, take: 3 });
    await making.update({ state: 'making' });
    for (const { id } of [...unseen, making]) {
      await member.get(path(id)).expect(404);
      await member
        .put(`${path(id)}/place`)
        .send({ atMs: 10 })
        .expect(404);
    }
    await coach.get(path(unseen[0].id)).expect(200);
    const bare = await Recording.create({
      teamId: ours.team.id,
      title: 'On its way',
      fileName: 'a.mp4',
      sizeBytes: 1,
      contentType: 'video/mp4',
    });
    const { body } = await coach.get(path(bare.id)).expect(409);
    expect(body.error.code).toBe('notReady');
    await member.get(path(bare.id)).expect(404);
    await making.destroy();
  });
});

it('shows those who work on drafts the asides too', async () => {
  const { body } = await coach.get(path()).expect(200);
  expect(body.chapters).toHaveLength(3);
  expect(body.captions).toHaveLength(4);
  expect(body.skips).toEqual([]);
});

it('shows other teams nothing', async () => {
  const theirs = await makeTeamOfFour();
  const stranger = await api.signedIn(theirs.owner);
  await stranger.get(`/api/teams/${theirs.team.slug}/watch/${recording.id}`).expect(404);
  await stranger.get(path()).expect(404);
});

describe('where one stopped', () => {
  it('is kept for each person, the last time counts, never past the end', async () => {
    await member.put(`${path()}/place`).send({ atMs: 12_345 }).expect(200);
    await member.put(`${path()}/place`).send({ atMs: 23_456 }).expect(200);
    expect((await member.get(path())).body.placeMs).toBe(23_456);
    expect((await coach.get(path())).body.placeMs).toBeNull();
    await coach.put(`${path()}/place`).send({ atMs: 999_999 }).expect(200);
    expect((await coach.get(path())).body.placeMs).toBe(60_000);
    expect(await WatchPlace.count({ where: { recordingId: recording.id } })).toBe(2);
    await member.put(`${path()}/place`).send({ atMs: -1 }).expect(400);
  });
});

describe('moments', () => {
  const actor = (role: Role) => ({
    person: { id: ours[role].id, name: ours[role].name, email: ours[role].email },
    team: { id: ours.team.id, slug: ours.team.slug, name: ours.team.name, timeZone: ours.team.timeZone },
    role,
    requestId: 'test',
  });
  const visible = (role: Role) =>
    ChapterRow.findAll({ where: visibleChaptersWhere(actor(role)), order: [['startMs', 'asc']] });

  it('are of visible chapters, with movement, kit, session, coach', async () => {
    const moments = await presentMoments(actor('member'), await visible('member'));
    for (const moment of moments) expect(Moment.parse(moment)).toEqual(moment);
    expect(moments.map((moment) => moment.title)).toEqual(['Today', 'With a towel']);
    expect(moments[1]).toMatchObject({
      movement: { name: 'Towel row' },
      standsInFor: { name: 'Ring row' },
      missingText: 'nothing to hang from',
      session: { id: session.id, date: '2026-03-03' },
      coach: 'The coach',
    });
    expect(await visible('editor')).toHaveLength(3);
  });

  it('are none for members once the session is a draft again', async () => {
    await session.update({ state: 'draft', publishedAt: null });
    expect(await visible('member')).toEqual([]);
    await session.update({ state: 'published', publishedAt: new Date() });
    expect(await visible('member')).toHaveLength(2);
  });
});
