import { captionFaults } from '../../../shared/domain/captions/captionFaults';
import type { CaptionLine } from '../../../shared/domain/captions/captionLine';
import {
  charactersPerSecond,
  type PictureShape,
  type ReadingFault,
  type ReadingProfile,
  readingFaults,
  wordsPerMinute,
} from '../../../shared/domain/captions/readingProfile';

/** What a row has room for; the whole sentence is its title and is read out. */
export type LineFault = { kind: 'speed' | 'length' | 'place'; short: string; message: string };

const seconds = (ms: number) => `${(ms / 1000).toFixed(1)} s`;

function shortly(fault: ReadingFault, line: CaptionLine): string {
  const lasts = line.endMs - line.startMs;
  const rows = line.text.split('\n');
  switch (fault.code) {
    case 'tooFast':
      return `${Math.round(wordsPerMinute(line))} words a min`;
    case 'tooShort':
      return `only ${seconds(lasts)}`;
    case 'tooLong':
      return `${seconds(lasts)} is long`;
    case 'rowTooLong':
      return `${Math.max(...rows.map((row) => [...row].length))} characters in a row`;
    case 'tooManyRows':
      return `${rows.length} rows`;
  }
}

/** What keeps one line from being read in comfort. A line that is too fast is too short as well: said once. */
export function lineFaults(line: CaptionLine, profile: ReadingProfile, picture: PictureShape): LineFault[] {
  const faults = readingFaults(line, profile, picture);
  const fast = faults.some(({ code }) => code === 'tooFast');
  return faults
    .filter(({ code }) => !(fast && code === 'tooShort'))
    .map((fault) => ({
      kind: fault.code === 'tooFast' || fault.code === 'tooShort' || fault.code === 'tooLong' ? 'speed' : 'length',
      short: shortly(fault, line),
      message: `${fault.message} (${Math.round(charactersPerSecond(line))} characters a second)`,
    }));
}

/** What is odd about where lines lie, by the line's place in the list: overlaps, past the recording's end. */
export function placeFaults(lines: readonly CaptionLine[], durationMs: number | null): Map<number, LineFault[]> {
  const places = new Map<number, LineFault[]>();
  const short = {
    overlap: 'overlaps',
    pastEnd: 'after the end',
    order: 'out of order',
    noLength: 'no length',
  } as const;
  for (const { index, code, message } of captionFaults(lines, durationMs))
    places.set(index, [...(places.get(index) ?? []), { kind: 'place', short: short[code], message }]);
  return places;
}

/** Places of lines that somebody should look at, in order. */
export function faultyPlaces(
  lines: readonly CaptionLine[],
  profile: ReadingProfile,
  picture: PictureShape,
  places: ReadonlyMap<number, LineFault[]>,
): { all: number[]; tooFast: number } {
  let tooFast = 0;
  const all: number[] = [];
  lines.forEach((line, index) => {
    const faults = readingFaults(line, profile, picture);
    if (faults.some(({ code }) => code === 'tooFast')) tooFast += 1;
    if (faults.length > 0 || places.has(index)) all.push(index);
  });
  return { all, tooFast };
}

/** The line that is said at a time; of two that overlap, the later. Lines are in order. @returns its place, or -1 */
export function lineAt(lines: readonly CaptionLine[], ms: number): number {
  let [low, high] = [0, lines.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((lines[middle]?.startMs ?? 0) <= ms) low = middle + 1;
    else high = middle;
  }
  // a long line may go on under later ones that have ended
  for (let place = low - 1; place >= Math.max(0, low - 8); place -= 1)
    if ((lines[place]?.endMs ?? 0) > ms) return place;
  return -1;
}

/** How many rows of text a picture has room for depends on its shape. */
export function pictureShape({ width, height }: { width: number | null; height: number | null }): PictureShape {
  if (width === null || height === null || width > height) return 'landscape';
  return width === height ? 'square' : 'portrait';
}
