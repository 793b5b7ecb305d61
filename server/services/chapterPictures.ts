import { enqueue, makeChapterPictures } from '../jobs/definitions';
import { inTransaction } from '../models/database';
import { waitForStep } from './recordingSteps';

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
