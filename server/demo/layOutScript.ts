import type { CaptionLine } from '../../shared/domain/captions/captionLine';
import { captionsOfSpeech } from './captionsOfSpeech';
import { pictureMs } from './drawing/frames';
import type { MotionName } from './drawing/motions';
import type { RecordingScript, ScriptChapter, ScriptCue, Sentence } from './script';
import { type Spoken, speak } from './speech';

export type TimedChapter = ScriptChapter & { startMs: number; endMs: number };
/** `chapter` is the place in `chapters`; the cue is about that chapter's movement. */
export type TimedCue = ScriptCue & { atMs: number; chapter: number };

/** A script with its times: everything that marks a recording, known before a picture of it is drawn. */
export type Timing = {
  durationMs: number;
  captions: CaptionLine[];
  chapters: TimedChapter[];
  cues: TimedCue[];
};

/** What to draw and to sound, for `drawDemoRecording`. */
export type Layout = Timing & {
  /** one after another from 0 to the end, on whole pictures */
  shots: { startMs: number; motion: MotionName }[];
  voices: { startMs: number; spoken: Spoken }[];
};

/** A breath before the first word of a chapter, and a moment to watch after the last. */
const leadMs = 500;
const restMs = 350;
const tailMs = 900;

const sentenceOf = (said: string | Sentence): Sentence => (typeof said === 'string' ? { text: said } : said);
const toPicture = (ms: number) => Math.round(ms / pictureMs) * pictureMs;

/** Places every sentence, chapter, cue and caption line of a script. The same script gives the same times. */
export async function layOutScript(script: RecordingScript, options: { signal?: AbortSignal } = {}): Promise<Layout> {
  const layout: Layout = { durationMs: 0, captions: [], chapters: [], cues: [], shots: [], voices: [] };
  let atMs = 0;
  for (const [index, chapter] of script.chapters.entries()) {
    const startMs = atMs;
    layout.shots.push({ startMs, motion: chapter.motion });
    atMs += leadMs;
    for (const sentence of chapter.says.map(sentenceOf)) {
      options.signal?.throwIfAborted();
      const spoken = await speak(sentence.spoken ?? sentence.text, script.voice);
      const from = Math.round(atMs);
      const to = Math.round(atMs + spoken.durationMs);
      const last = layout.shots[layout.shots.length - 1];
      if (sentence.motion && sentence.motion !== last?.motion) {
        layout.shots.push({ startMs: toPicture(from), motion: sentence.motion });
      }
      layout.voices.push({ startMs: from, spoken });
      layout.captions.push(...captionsOfSpeech(sentence.text, from, to));
      if (sentence.cue) layout.cues.push({ ...sentence.cue, atMs: from, chapter: index });
      atMs = to + (sentence.thenMs ?? restMs);
    }
    atMs = toPicture(atMs + tailMs - restMs);
    layout.chapters.push({ ...chapter, startMs, endMs: atMs });
  }
  return { ...layout, durationMs: atMs };
}
