import type { Config } from '../../config';
import type { Handler } from '../handler';
import { drawDemoRecordingHandler } from './drawDemoRecording';
import { makeChapterPicturesHandler } from './makeChapterPictures';
import { makePlaybackHandler } from './makePlayback';
import { makePosterHandler } from './makePoster';
import { probeRecordingHandler } from './probeRecording';
import { removeObjectsHandler } from './removeObjects';
import { sendMailHandler } from './sendMail';

/** Every job that the worker can do. */
export function allHandlers(config: Config): Handler[] {
  return [
    probeRecordingHandler,
    makePosterHandler,
    makePlaybackHandler,
    makeChapterPicturesHandler,
    removeObjectsHandler,
    drawDemoRecordingHandler,
    sendMailHandler(config.mail),
  ];
}
