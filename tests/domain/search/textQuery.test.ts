import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { allWords, anyWord, markWords, unfinishedWords } from '../../../shared/domain/search/textQuery';

describe('left-over words as a text query', () => {
  it('asks for all of them or any of them', () => {
    expect(allWords(['knees', 'caving'])).toBe('"knees" "caving"');
    expect(anyWord(['knees', 'caving'])).toBe('"knees" or "caving"');
    expect(unfinishedWords(['knees', 'cav'])).toBe(`'knees' & 'cav':*`);
  });

  it('takes operators as words or leaves them out', () => {
    expect(allWords(['-knees', 'or', '"pain"', "o'clock", '!&|():*'])).toBe('"knees" "pain" "oclock"');
    expect(allWords([])).toBe('');
    expect(allWords(['-', '"'])).toBe('');
  });

  it('never looks for beginnings of one or two letters', () => {
    expect(unfinishedWords(['knees', 'ca'])).toBe(`'knees' & 'ca'`);
    expect(unfinishedWords(['k'])).toBe('');
  });

  it('holds nothing but quoted words of letters and digits, whatever comes in', () => {
    fc.assert(
      fc.property(fc.array(fc.string({ unit: 'binary', maxLength: 30 })), (words) => {
        expect(allWords(words)).toMatch(/^(?:"[\p{L}\p{N}]{2,}"(?: (?=")|$))*$/u);
        expect(anyWord(words)).toMatch(/^(?:"[\p{L}\p{N}]{2,}"(?: or (?=")|$))*$/u);
        expect(unfinishedWords(words)).toMatch(/^(?:'[\p{L}\p{N}]{2,}'(?::\*$)?(?: & (?=')|$))*$/u);
      }),
    );
  });
});

describe('the words in a line that was found', () => {
  const marked = (line: string, words: string[]) =>
    markWords(line, words)
      .filter((piece) => piece.marked)
      .map((piece) => piece.text);

  it.each([
    ['Knees out, no caving in.', ['knee', 'cave'], ['Knees', 'caving']],
    ['squatting to a box; squat tall', ['squats'], ['squatting', 'squat']],
    ['press, presses and pressing', ['press'], ['press', 'presses', 'pressing']],
    ['Le développé, slowly', ['developpe'], ['développé']],
    ['the ring swings', ['ring'], ['ring']],
    ['scorpion', ['row'], []],
  ])('%s', (line, words, expected) => {
    expect(marked(line, words)).toEqual(expected);
  });

  it('loses nothing of the line', () => {
    fc.assert(
      fc.property(
        fc.string({ unit: 'grapheme', maxLength: 80 }),
        fc.array(fc.string({ maxLength: 8 })),
        (line, words) => {
          expect(
            markWords(line, words)
              .map((piece) => piece.text)
              .join(''),
          ).toBe(line);
        },
      ),
    );
  });
});
