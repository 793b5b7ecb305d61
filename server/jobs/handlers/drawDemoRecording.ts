import { stat } from 'node:fs/promises';
import { join } from 'node:path';
import type { Chapter } from '../../../shared/domain/chapters/chapter';
import type { Cue } from '../../../shared/domain/chapters/cue';
import { originalKey } from '../../../storage/keys';
import { demoId } from '../../demo/demoId';
import type { Timing } from '../../demo/layOutScript';
import { drawDemoRecording as draw } from '../../demo/makeClip';
import { demoTeams } from '../../demo/scenario/scenario';
import { inTransaction } from '../../models/database';
import { Membership, Person, Team } from '../../models/people';
import { Recording } from '../../models/recordings';
import type { Actor } from '../../services/actor';
import * as captions from '../../services/captions';
import * as chapters from '../../services/chapters';
import { store } from '../../services/context';
import * as cues from '../../services/cues';
import { giveUp, startMaking } from '../../services/recordingMaking';
import { finishStep, inputOf, progressOf, startStep } from '../../services/recordingSteps';
import { drawDemoRecording } from '../definitions';
import { handle } from '../handler';
import { inPrivateFolder } from './making';

/** Bumped when the generator draws or says something else. */
const drawingVersion = 1;

/** Draws and speaks a recording of the demo team, marks it as its script says, and hands it on like any other footage. */
export const drawDemoRecordingHandler = handle(
  drawDemoRecording,
  async ({ teamId, recordingId, script: name }, { signal }) => {
    const of = { teamId, recordingId };
    const recording = await Recording.findOne({ where: { teamId, id: recordingId } });
    if (!recording || recording.originalKey) return;
    const { team, session, script } = scriptOf(name);
    await startStep(of, 'drawing');
    const progress = progressOf(of, 'drawing');
    const key = originalKey(teamId, recordingId, demoId(team, 'upload', session));
    await inPrivateFolder(async (folder) => {
      const file = join(folder, 'drawn.mp4');
      const timing = await draw(script, file, { signal, onProgress: (percent) => progress.report(percent) });
      await progress.settle();
      const { size } = await stat(file);
      await store().putFile(key, file, 'video/mp4');
      const actor = await coachOf(recording);
      await inTransaction(async () => {
        await recording.update({ sizeBytes: size, durationMs: timing.durationMs });
        const id = (...parts: string[]) => demoId(team, ...parts);
        const marked = chaptersOf(timing, session, id);
        await chapters.save(actor, recordingId, 0, marked, 'made');
        await cues.save(actor, recordingId, 0, cuesOf(timing, marked, session, id), 'made');
        await captions.save(actor, recordingId, 0, timing.captions, 'made');
        await finishStep(of, 'drawing', inputOf('drawing', drawingVersion, name));
        await startMaking(recording, key);
      });
    });
  },
  (of) =>
    giveUp(of, 'drawing', {
      code: 'notDrawn',
      message: 'This demo recording could not be drawn. Everything else works; upload one of your own instead.',
      retry: false,
    }),
);

function scriptOf(name: string) {
  const [teamSlug, sessionSlug] = name.split('/');
  const session = demoTeams.find(({ slug }) => slug === teamSlug)?.sessions.find(({ slug }) => slug === sessionSlug);
  if (!teamSlug || !session?.recording) throw new Error(`The demo teams have no script ${name}.`);
  return { team: teamSlug, session: session.slug, script: session.recording.script };
}

/** The marks are made in the coach's name, as if they had made them. */
async function coachOf(recording: Recording): Promise<Actor> {
  const { teamId, coachId, id } = recording;
  const [team, person, membership] = await Promise.all([
    Team.findByPk(teamId, { rejectOnEmpty: true }),
    Person.findByPk(coachId ?? '', { rejectOnEmpty: true }),
    Membership.findOne({ where: { teamId, personId: coachId ?? '' }, rejectOnEmpty: true }),
  ]);
  return {
    person: { id: person.id, name: person.name, email: person.email },
    team: { id: team.id, slug: team.slug, name: team.name, timeZone: team.timeZone },
    role: membership.role,
    requestId: `drawing-${id}`,
  };
}

type IdOf = (...parts: string[]) => string;

function chaptersOf(timing: Timing, session: string, id: IdOf): Chapter[] {
  const linked = (kind: string, slug: string | undefined) => (slug ? id(kind, slug) : null);
  return timing.chapters.map((chapter, index) => ({
    id: id('session', session, 'chapter', String(index)),
    startMs: chapter.startMs,
    endMs: chapter.endMs,
    kind: chapter.kind,
    title: chapter.title,
    note: chapter.note ?? '',
    blockId: chapter.block ? id('session', session, 'block', chapter.block) : null,
    movementId: linked('movement', chapter.movement),
    standsInForMovementId: linked('movement', chapter.standsInFor),
    missing: chapter.missing ?? null,
    missingKitItemId: linked('kit', chapter.missingKit),
  }));
}

function cuesOf(timing: Timing, marked: Chapter[], session: string, id: IdOf): Cue[] {
  return timing.cues.map((cue, index) => ({
    id: id('session', session, 'cue', String(index)),
    atMs: cue.atMs,
    kind: cue.kind,
    text: cue.text,
    movementId: marked[cue.chapter]?.movementId ?? null,
  }));
}
