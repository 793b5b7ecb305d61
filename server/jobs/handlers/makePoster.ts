import { join } from 'node:path';
import sharp from 'sharp';
import { madeKey } from '../../../storage/keys';
import { makePoster as drawPoster } from '../../media/pictures';
import { probeRecording } from '../../media/probe';
import { store } from '../../services/context';
import { notePoster, recordingToMake } from '../../services/recordingMaking';
import { finishStep, inputOf, isDone, startStep } from '../../services/recordingSteps';
import { makePoster } from '../definitions';
import { handle } from '../handler';
import { fetchObject, givenUpAt, inPrivateFolder, orGiveUp } from './making';

/** Bumped when the same recording gets another poster. */
const version = 1;
const contentType = 'image/jpeg';

/** One picture that stands for the recording, before it plays. */
export const makePosterHandler = handle(
  makePoster,
  async (of, context) => {
    const recording = await recordingToMake(of);
    if (!recording) return;
    const { originalKey } = recording;
    const { signal } = context;
    const input = inputOf('poster', version, originalKey);
    if (await isDone(of, 'poster', input)) return finishStep(of, 'poster', input);
    await startStep(of, 'poster');
    await orGiveUp(of, 'poster', context, () =>
      inPrivateFolder(async (folder) => {
        const original = join(folder, 'original');
        const output = join(folder, 'poster.jpg');
        await fetchObject(originalKey, original, signal);
        await drawPoster({ input: original, output, probed: await probeRecording(original, signal), signal });
        const { width, height } = await sharp(output).metadata();
        const name = `poster-${input}.jpg`;
        const sizeBytes = await store().putFile(madeKey(of.teamId, of.recordingId, name), output, contentType);
        await notePoster(of, originalKey, input, { kind: 'poster', name, contentType, sizeBytes, width, height });
      }),
    );
  },
  givenUpAt('poster'),
);
