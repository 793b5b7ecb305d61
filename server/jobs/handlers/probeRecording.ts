import { join } from 'node:path';
import { probeRecording as probe } from '../../media/probe';
import { askForMaking, noteProbed, recordingToMake } from '../../services/recordingMaking';
import { finishStep, inputOf, isDone, startStep } from '../../services/recordingSteps';
import { probeRecording } from '../definitions';
import { handle } from '../handler';
import { fetchObject, givenUpAt, inPrivateFolder, orGiveUp } from './making';

/** Bumped when the same file is read differently. */
const version = 1;

/** Reads the original once from its first byte to its last and finds out what it is; then asks for what is made from it. */
export const probeRecordingHandler = handle(
  probeRecording,
  async (of, context) => {
    const recording = await recordingToMake(of);
    if (!recording) return;
    const input = inputOf('probe', version, recording.originalKey);
    if (await isDone(of, 'probe', input)) {
      await finishStep(of, 'probe', input);
      return askForMaking(of);
    }
    await startStep(of, 'probe');
    await orGiveUp(of, 'probe', context, () =>
      inPrivateFolder(async (folder) => {
        const path = join(folder, 'original');
        const sha256 = await fetchObject(recording.originalKey, path, context.signal);
        const { durationMs, width, height, fps, recordedAt } = await probe(path, context.signal);
        await noteProbed(of, recording.originalKey, input, { durationMs, width, height, fps, recordedAt, sha256 });
      }),
    );
  },
  givenUpAt('probe'),
);
