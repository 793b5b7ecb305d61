import { join } from 'node:path';
import { madeKey } from '../../../storage/keys';
import { makePlayback as producePlayback } from '../../media/makePlayback';
import { probeRecording } from '../../media/probe';
import { store } from '../../services/context';
import { becomeReady, notePlayback, recordingToMake } from '../../services/recordingMaking';
import { finishStep, inputOf, isDone, progressOf, startStep } from '../../services/recordingSteps';
import { makePlayback } from '../definitions';
import { handle } from '../handler';
import { fetchObject, givenUpAt, inPrivateFolder, orGiveUp } from './making';

/** Bumped when the same recording comes out differently. */
const version = 1;
const contentType = 'video/mp4';

/** The file that browsers play; with it the recording is ready. */
export const makePlaybackHandler = handle(
  makePlayback,
  async (of, context) => {
    const recording = await recordingToMake(of);
    if (!recording) return;
    const { originalKey } = recording;
    const { signal } = context;
    const input = inputOf('playback', version, originalKey);
    if (await isDone(of, 'playback', input)) {
      await finishStep(of, 'playback', input);
      return becomeReady(recording);
    }
    await startStep(of, 'playback');
    const progress = progressOf(of, 'playback');
    await orGiveUp(of, 'playback', context, () =>
      inPrivateFolder(async (folder) => {
        const original = join(folder, 'original');
        const output = join(folder, 'playback.mp4');
        await fetchObject(originalKey, original, signal);
        const probed = await probeRecording(original, signal);
        const made = await producePlayback({
          input: original,
          output,
          probed,
          signal,
          onProgress: progress.report,
        }).finally(progress.settle);
        const name = `playback-${input}.mp4`;
        const sizeBytes = await store().putFile(madeKey(of.teamId, of.recordingId, name), output, contentType);
        const { how, width, height, durationMs } = made;
        await notePlayback(of, originalKey, input, {
          kind: 'playback',
          name,
          contentType,
          sizeBytes,
          width,
          height,
          details: { how, durationMs },
        });
      }),
    );
  },
  givenUpAt('playback'),
);
