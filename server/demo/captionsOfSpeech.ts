import type { CaptionLine } from '../../shared/domain/captions/captionLine';

/** BBC Subtitle Guidelines §3.1 and §3.3: 37 characters a row, two rows in landscape. */
const rowLength = 37;
const captionLength = rowLength * 2;

/** Words into the fewest parts that `fits` allows, as equal in length as their words let them be. */
function evenly(words: readonly string[], fits: (part: string) => boolean): string[] {
  const text = words.join(' ');
  for (let count = 1; count < words.length; count++) {
    const parts = inParts(words, count, text.length / count);
    if (parts.every(fits)) return parts;
  }
  return [...words];
}

function inParts(words: readonly string[], count: number, ideal: number): string[] {
  const parts: string[] = [];
  let part = '';
  for (const word of words) {
    const longer = part === '' ? word : `${part} ${word}`;
    // a comma is a good place to break: a part that ends with one may be a little shorter
    const wanted = part.endsWith(',') ? ideal - 8 : ideal;
    const isFull = part !== '' && longer.length - wanted > wanted - part.length && parts.length < count - 1;
    if (isFull) {
      parts.push(part);
      part = word;
    } else part = longer;
  }
  return [...parts, part];
}

const inRows = (text: string) => evenly(text.split(' '), (row) => row.length <= rowLength);
const fitsCaption = (text: string) => text.length <= captionLength && inRows(text).length <= 2;

/**
 * The caption lines of one spoken sentence, each of at most two rows of 37 characters.
 * The first starts and the last ends with the voice; in between time goes by the share of the letters.
 * @param startMs where the voice starts, `endMs` where it ends
 */
export function captionsOfSpeech(text: string, startMs: number, endMs: number): CaptionLine[] {
  const parts = evenly(text.split(' '), fitsCaption);
  const letters = parts.reduce((sum, part) => sum + part.length, 0);
  let before = 0;
  return parts.map((part) => {
    const from = startMs + Math.round(((endMs - startMs) * before) / letters);
    before += part.length;
    return {
      startMs: from,
      endMs: startMs + Math.round(((endMs - startMs) * before) / letters),
      text: inRows(part).join('\n'),
    };
  });
}
