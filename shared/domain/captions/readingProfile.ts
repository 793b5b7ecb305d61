import type { CaptionLine } from './captionLine';

/** A figure and where it comes from. `memory` was not looked up, `derived` was worked out from another figure. */
export type Figure = { value: number; source: string; standing: 'read' | 'memory' | 'derived' };

export type PictureShape = 'landscape' | 'square' | 'portrait';

export type ReadingProfile = {
  name: string;
  wordsPerMinute: Figure;
  /** least time on the screen for every word; null where the body gives a time for the whole line */
  shortestMsPerWord: Figure | null;
  shortestMs: Figure | null;
  longestMs: Figure | null;
  charactersPerRow: Figure;
  rows: Record<PictureShape, Figure> | null;
  /** two lines follow at once, or leave at least this much between them */
  gapMs: Figure | null;
  charactersPerSecond: Figure;
};

const figure = (value: number, source: string, standing: Figure['standing'] = 'read'): Figure => ({
  value,
  source,
  standing,
});

const charactersAWord = 5;

/**
 * Named profiles and no blend of them: the two bodies disagree (four words: 1.2 s against 2 s).
 * Neither gives characters a second; that figure is worked out from words a minute at five characters a word.
 */
export const readingProfiles = {
  bbc: {
    name: 'BBC',
    wordsPerMinute: figure(180, 'BBC Subtitle Guidelines §4: 160–180 words a minute'),
    shortestMsPerWord: figure(300, 'BBC Subtitle Guidelines §4.1: about 0.3 s a word; four words, 1.2 s'),
    shortestMs: null,
    longestMs: null,
    charactersPerRow: figure(37, 'BBC Subtitle Guidelines §3.1: 37 characters, broadcast'),
    rows: {
      landscape: figure(2, 'BBC Subtitle Guidelines §3.3'),
      square: figure(2, 'BBC Subtitle Guidelines §3.3'),
      portrait: figure(3, 'BBC Subtitle Guidelines §3.3'),
    },
    gapMs: figure(1000, 'BBC Subtitle Guidelines §4.5: no gap, or 1 s and more'),
    charactersPerSecond: figure((180 * charactersAWord) / 60, '180 words a minute × 5 characters', 'derived'),
  },
  dcmp: {
    name: 'DCMP',
    wordsPerMinute: figure(160, 'DCMP Captioning Key, older edition, adult special interest: 150–160 words a minute'),
    shortestMsPerWord: null,
    shortestMs: figure(2000, 'DCMP Captioning Key, older edition: 2 s on the screen'),
    longestMs: figure(6000, 'DCMP Captioning Key', 'memory'),
    charactersPerRow: figure(32, 'DCMP Captioning Key, older edition: 32 characters'),
    rows: null,
    gapMs: null,
    charactersPerSecond: figure((160 * charactersAWord) / 60, '160 words a minute × 5 characters', 'derived'),
  },
} as const satisfies Record<string, ReadingProfile>;
export type ReadingProfileName = keyof typeof readingProfiles;

export type ReadingFault = {
  code: 'tooFast' | 'tooShort' | 'tooLong' | 'rowTooLong' | 'tooManyRows';
  message: string;
  /** the figure that the line goes past */
  figure: Figure;
};

/** Words that are read: what stands between spaces and has a letter or a digit. */
export function wordCount(text: string): number {
  return text.split(/\s+/).filter((word) => /[\p{L}\p{N}]/u.test(word)).length;
}

/** How fast a line has to be read, in words a minute. */
export function wordsPerMinute(line: CaptionLine): number {
  return (wordCount(line.text) * 60_000) / (line.endMs - line.startMs);
}

/** Characters a second, line breaks counted as the space they stand for. */
export function charactersPerSecond(line: CaptionLine): number {
  return ([...line.text].length * 1000) / (line.endMs - line.startMs);
}

const seconds = (ms: number) => `${(ms / 1000).toFixed(1)} s`;

/** What keeps a caption line from being read in comfort, by one body's figures. */
export function readingFaults(
  line: CaptionLine,
  profile: ReadingProfile,
  picture: PictureShape = 'landscape',
): ReadingFault[] {
  const lasts = line.endMs - line.startMs;
  const words = wordCount(line.text);
  const rate = wordsPerMinute(line);
  const rows = line.text.split('\n');
  const longestRow = Math.max(...rows.map((row) => [...row].length));
  const least = profile.shortestMs ?? profile.shortestMsPerWord;
  const leastMs = profile.shortestMs?.value ?? (profile.shortestMsPerWord?.value ?? 0) * words;
  const rowFigure = profile.rows?.[picture];
  const faults: ReadingFault[] = [];

  if (rate > profile.wordsPerMinute.value)
    faults.push({
      code: 'tooFast',
      message: `${Math.round(rate)} words a minute; ${profile.name} asks for ${profile.wordsPerMinute.value} at most.`,
      figure: profile.wordsPerMinute,
    });
  if (least && lasts < leastMs)
    faults.push({
      code: 'tooShort',
      message: `On the screen for ${seconds(lasts)}; ${profile.name} asks for ${seconds(leastMs)}.`,
      figure: least,
    });
  if (profile.longestMs && lasts > profile.longestMs.value)
    faults.push({
      code: 'tooLong',
      message: `On the screen for ${seconds(lasts)}; ${profile.name} asks for ${seconds(profile.longestMs.value)} at most.`,
      figure: profile.longestMs,
    });
  if (longestRow > profile.charactersPerRow.value)
    faults.push({
      code: 'rowTooLong',
      message: `${longestRow} characters in a row; ${profile.name} asks for ${profile.charactersPerRow.value} at most.`,
      figure: profile.charactersPerRow,
    });
  if (rowFigure && rows.length > rowFigure.value)
    faults.push({
      code: 'tooManyRows',
      message: `${rows.length} rows; ${profile.name} asks for ${rowFigure.value} at most in this shape of picture.`,
      figure: rowFigure,
    });
  return faults;
}

/** Places of lines that leave a gap before them which is neither none nor long enough to be noticed as one. */
export function shortGaps(lines: readonly CaptionLine[], profile: ReadingProfile): number[] {
  const least = profile.gapMs?.value ?? 0;
  return lines.flatMap((line, i) => {
    const before = lines[i - 1];
    const gap = before ? line.startMs - before.endMs : 0;
    return gap > 0 && gap < least ? [i] : [];
  });
}
