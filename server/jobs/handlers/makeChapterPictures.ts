import { join } from 'node:path';
import sharp from 'sharp';
import { madeKey } from '../../../storage/keys';
import { makeThumbnails } from '../../media/pictures';
import {
  finishChapterPictures,
  type MadePicture,
  noteChapterPictures,
  picturesToMake,
  type WantedPicture,
} from '../../services/chapterPictures';
import { store } from '../../services/context';
import { type OfRecording, progressOf, startStep } from '../../services/recordingSteps';
import { makeChapterPictures } from '../definitions';
import { handle } from '../handler';
import { fetchObject, givenUpAt, inPrivateFolder, orGiveUp } from './making';

/** So many are taken in one run and noted together: what is done survives a worker that is lost. */
const atOnce = 6;

/** A picture for each chapter that has none at its time; those that no chapter shows any more go. */
export const makeChapterPicturesHandler = handle(
  makeChapterPictures,
  async (of, context) => {
    const pictures = await picturesToMake(of);
    // nothing plays yet: whoever makes it ready asks again
    if (!pictures) return;
    const { missing, playback } = pictures;
    if (missing.length === 0) return finishChapterPictures(of);
    await startStep(of, 'chapterPictures');
    const progress = progressOf(of, 'chapterPictures');
    await orGiveUp(of, 'chapterPictures', context, () =>
      inPrivateFolder(async (folder) => {
        const path = join(folder, 'playback.mp4');
        await fetchObject(madeKey(of.teamId, of.recordingId, playback), path, context.signal);
        for (let i = 0; i < missing.length; i += atOnce) {
          await take(of, path, folder, missing.slice(i, i + atOnce), context.signal);
          progress.report(Math.floor((100 * i) / missing.length));
        }
        await progress.settle();
        await finishChapterPictures(of);
      }),
    );
  },
  givenUpAt('chapterPictures'),
);

async function take(
  of: OfRecording,
  input: string,
  folder: string,
  wanted: readonly WantedPicture[],
  signal: AbortSignal,
): Promise<void> {
  const files = await makeThumbnails({
    input,
    folder,
    signal,
    times: wanted.map(({ chapterId, atMs }) => ({ id: chapterId, atMs })),
  });
  const made: MadePicture[] = [];
  for (const picture of wanted) {
    const file = files.find(({ id }) => id === picture.chapterId);
    if (!file) continue;
    const { width, height } = await sharp(file.path).metadata();
    const key = madeKey(of.teamId, of.recordingId, picture.name);
    made.push({ ...picture, width, height, sizeBytes: await store().putFile(key, file.path, 'image/jpeg') });
  }
  await noteChapterPictures(of, made);
}
