import { madeKey } from '../../storage/keys';
import { enqueue, makeChapterPictures } from '../jobs/definitions';
import { currentTransaction, inTransaction } from '../models/database';
import { ChapterRow } from '../models/marks';
import { Recording, RecordingAsset } from '../models/recordings';
import { store } from './context';
import { finishStep, inputOf, type OfRecording, waitForStep } from './recordingSteps';

/** Bumped when pictures of the same moment come out differently. */
const pictureVersion = 1;

/**
 * Asks for the pictures that a recording's chapters lack, in the surrounding transaction; call it whenever chapters
 * change. Asking again while it waits asks once.
 */
export async function requestChapterPictures(teamId: string, recordingId: string): Promise<void> {
  await inTransaction(async () => {
    await waitForStep({ teamId, recordingId }, 'chapterPictures');
    await enqueue(makeChapterPictures, { teamId, recordingId });
  });
}

/** The moment that stands for a chapter: past the set-up, before the talk about it. */
export function pictureAt(chapter: { startMs: number; endMs: number }): number {
  return chapter.startMs + Math.min(Math.round((chapter.endMs - chapter.startMs) * 0.4), 8000);
}

export type WantedPicture = { chapterId: string; atMs: number; name: string };

export type PicturesToMake = {
  /** name of the file to take them from */
  playback: string;
  /** of all chapters */
  wanted: WantedPicture[];
  missing: WantedPicture[];
  /** what all of them together are made from */
  input: string;
};

/** What a recording's chapters should look like and lack; null while nothing plays that pictures could be taken from. */
export async function picturesToMake(of: OfRecording): Promise<PicturesToMake | null> {
  const playback = await RecordingAsset.findOne({ where: { ...of, kind: 'playback' } });
  if (!playback) return null;
  const chapters = await ChapterRow.findAll({
    where: of,
    attributes: ['id', 'startMs', 'endMs'],
    order: [['startMs', 'asc']],
  });
  const pictures = await RecordingAsset.findAll({ where: { ...of, kind: 'chapterPicture' }, attributes: ['name'] });
  const wanted = chapters.map((chapter) => {
    const atMs = pictureAt(chapter);
    const name = `chapter-${inputOf('chapterPictures', pictureVersion, playback.name, chapter.id, atMs)}.jpg`;
    return { chapterId: chapter.id, atMs, name };
  });
  const there = new Set(pictures.map((picture) => picture.name));
  return {
    playback: playback.name,
    wanted,
    missing: wanted.filter((picture) => !there.has(picture.name)),
    input: inputOf('chapterPictures', pictureVersion, ...wanted.map((picture) => picture.name)),
  };
}

export type MadePicture = WantedPicture & { sizeBytes: number; width: number; height: number };

/** Notes pictures that lie in the store, or takes them away where their recording is gone. */
export async function noteChapterPictures(of: OfRecording, made: readonly MadePicture[]): Promise<void> {
  const kept = await inTransaction(async () => {
    if (!(await lockRecording(of))) return false;
    await RecordingAsset.destroy({ where: { ...of, name: made.map((picture) => picture.name) } });
    await RecordingAsset.bulkCreate(
      made.map((picture) => ({ ...of, ...picture, kind: 'chapterPicture' as const, contentType: 'image/jpeg' })),
    );
    return true;
  });
  if (!kept) await removePictures(of, made);
}

/** Takes away what no chapter shows any more, and ends the step unless chapters changed while it ran. */
export async function finishChapterPictures(of: OfRecording): Promise<void> {
  const stale = await inTransaction(async () => {
    if (!(await lockRecording(of))) return [];
    const now = await picturesToMake(of);
    if (!now) return [];
    const names = new Set(now.wanted.map((picture) => picture.name));
    const pictures = await RecordingAsset.findAll({ where: { ...of, kind: 'chapterPicture' } });
    const old = pictures.filter((picture) => !names.has(picture.name));
    await RecordingAsset.destroy({ where: { ...of, id: old.map((picture) => picture.id) } });
    // a change while it ran has asked for another run, which ends the step
    if (now.missing.length === 0) await finishStep(of, 'chapterPictures', now.input);
    return old;
  });
  await removePictures(of, stale);
}

async function removePictures(of: OfRecording, pictures: readonly { name: string }[]): Promise<void> {
  for (const { name } of pictures) await store().remove(madeKey(of.teamId, of.recordingId, name));
}

async function lockRecording({ teamId, recordingId }: OfRecording): Promise<Recording | null> {
  const transaction = currentTransaction();
  return Recording.findOne({
    where: { teamId, id: recordingId },
    attributes: ['id'],
    ...(transaction ? { lock: transaction.LOCK.UPDATE } : {}),
  });
}
