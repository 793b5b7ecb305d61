import type { ChapterKind, CueKind, MissingThing } from '../../shared/domain/words';
import type { DressName } from './drawing/dresses';
import type { MotionName } from './drawing/motions';
import type { Place } from './drawing/place';

/** What is said and shown in a demo recording, before anybody knows how long it takes. */

export type Voice = {
  /** a voice of espeak-ng, with its variant: "en-gb+f3" */
  name: string;
  wordsPerMinute: number;
  /** 0 to 99 */
  pitch: number;
};

export type ScriptCue = { kind: CueKind; text: string };

export type Sentence = {
  text: string;
  /** how to write it so that it is spoken well, where that differs */
  spoken?: string;
  /** pinned to the moment where the sentence starts */
  cue?: ScriptCue;
  /** what the figure does from here, when it isn't the chapter's own motion */
  motion?: MotionName;
  /** silence after it, to watch; 350 ms when left out */
  thenMs?: number;
};

export type ScriptChapter = {
  kind: ChapterKind;
  title: string;
  note?: string;
  /** slugs within the recording's team and session */
  block?: string;
  movement?: string;
  standsInFor?: string;
  missing?: MissingThing;
  missingKit?: string;
  motion: MotionName;
  says: readonly (string | Sentence)[];
};

export type RecordingScript = {
  voice: Voice;
  dress: DressName;
  place: Place;
  chapters: readonly ScriptChapter[];
};
