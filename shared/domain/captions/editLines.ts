import { inOrder } from './captionFaults';
import { CaptionLine } from './captionLine';

/** What an edit leaves: the new lines and the place of the one to go on with, or a sentence that says why not. */
export type LineEdit = { lines: CaptionLine[]; index: number } | { refused: string };

const noSuchLine: LineEdit = { refused: 'This line is not there any more.' };

/** Puts `fresh` in the place of `count` lines from `index`, in order, each checked as it would be on saving. */
function replaceLines(
  lines: readonly CaptionLine[],
  index: number,
  count: number,
  fresh: readonly CaptionLine[],
): LineEdit {
  const checked: CaptionLine[] = [];
  for (const line of fresh) {
    const parsed = CaptionLine.safeParse(line);
    if (!parsed.success) return { refused: parsed.error.issues[0]?.message ?? 'This line does not fit.' };
    checked.push(parsed.data);
  }
  const next = inOrder([...lines.slice(0, index), ...checked, ...lines.slice(index + count)]);
  const last = checked.at(-1);
  return { lines: next, index: last ? next.indexOf(last) : Math.max(0, Math.min(index, next.length - 1)) };
}

/** A place that doesn't cut a character in two: emoji are two units of a string. */
function wholeCharacter(text: string, place: number): number {
  const unit = text.charCodeAt(place);
  return unit >= 0xdc00 && unit <= 0xdfff ? place - 1 : place;
}

/**
 * Cuts a line in two at a place in its text. The time of the cut goes by the share of characters unless it is given
 * (the playhead, where somebody listens along).
 */
export function splitLine(
  lines: readonly CaptionLine[],
  index: number,
  at: { character: number; timeMs?: number },
): LineEdit {
  const line = lines[index];
  if (!line) return noSuchLine;
  const place = wholeCharacter(line.text, at.character);
  const before = line.text.slice(0, place).trim();
  const after = line.text.slice(place).trim();
  if (before === '' || after === '') return { refused: 'Put the cursor between two words to split here.' };
  const share = before.length / (before.length + after.length);
  const lasts = line.endMs - line.startMs;
  const cutMs = at.timeMs ?? line.startMs + Math.max(1, Math.min(Math.round(lasts * share), lasts - 1));
  if (cutMs <= line.startMs || cutMs >= line.endMs)
    return { refused: 'The cut has to lie between the line’s start and its end.' };
  return replaceLines(lines, index, 1, [
    { startMs: line.startMs, endMs: cutMs, text: before },
    { startMs: cutMs, endMs: line.endMs, text: after },
  ]);
}

/** Makes one line of this and the next, from the first start to the last end. */
export function joinWithNext(lines: readonly CaptionLine[], index: number): LineEdit {
  const line = lines[index];
  const next = lines[index + 1];
  if (!line) return noSuchLine;
  if (!next) return { refused: 'There is no line after this one.' };
  return replaceLines(lines, index, 2, [
    {
      startMs: Math.min(line.startMs, next.startMs),
      endMs: Math.max(line.endMs, next.endMs),
      text: `${line.text} ${next.text}`,
    },
  ]);
}

/** Gives a line other times; it takes its new place in the order. */
export function moveTimes(
  lines: readonly CaptionLine[],
  index: number,
  times: { startMs?: number; endMs?: number },
): LineEdit {
  const line = lines[index];
  return line ? replaceLines(lines, index, 1, [{ ...line, ...times }]) : noSuchLine;
}

/** Gives a line other words. */
export function setText(lines: readonly CaptionLine[], index: number, text: string): LineEdit {
  const line = lines[index];
  return line ? replaceLines(lines, index, 1, [{ ...line, text }]) : noSuchLine;
}

export function insertLine(lines: readonly CaptionLine[], line: CaptionLine): LineEdit {
  return replaceLines(lines, lines.length, 0, [line]);
}

export function deleteLine(lines: readonly CaptionLine[], index: number): LineEdit {
  return lines[index] ? replaceLines(lines, index, 1, []) : noSuchLine;
}
