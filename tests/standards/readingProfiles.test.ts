import { describe, expect, it } from 'vitest';
import {
  charactersPerSecond,
  readingFaults,
  readingProfiles,
  shortGaps,
  wordCount,
} from '../../shared/domain/captions/readingProfile';

const { bbc, dcmp } = readingProfiles;
const line = (text: string, lasts: number, startMs = 0) => ({ startMs, endMs: startMs + lasts, text });
const codes = (...args: Parameters<typeof readingFaults>) => readingFaults(...args).map(({ code }) => code);

describe('reading captions at the BBC’s figures', () => {
  // Source: BBC Subtitle Guidelines §4: 160–180 words a minute, 0.33 s a word at the fastest
  it('finds nine words in 2.9 s too fast and in 3 s right', () => {
    const nine = 'one two three four five six\nseven eight nine';
    expect(codes(line(nine, 2999), bbc)).toEqual(['tooFast']);
    expect(codes(line(nine, 3000), bbc)).toEqual([]);
  });

  // Source: BBC Subtitle Guidelines §4.1: about 0.3 s a word; four words, 1.2 s
  it('finds four words too short below 1.2 s', () => {
    expect(codes(line('ribs down and stand', 1199), bbc)).toContain('tooShort');
    expect(codes(line('ribs down and stand', 1200), bbc)).not.toContain('tooShort');
  });

  // Source: BBC Subtitle Guidelines §3.1: 37 characters
  it('takes 37 characters in a row and not 38', () => {
    expect(codes(line('x'.repeat(37), 5000), bbc)).toEqual([]);
    expect(codes(line(`short\n${'x'.repeat(38)}`, 5000), bbc)).toEqual(['rowTooLong']);
  });

  // Source: BBC Subtitle Guidelines §3.3: two rows landscape and square, three portrait
  it('takes two rows, and three in portrait', () => {
    const three = line('a\nb\nc', 5000);
    expect(codes(three, bbc)).toEqual(['tooManyRows']);
    expect(codes(three, bbc, 'square')).toEqual(['tooManyRows']);
    expect(codes(three, bbc, 'portrait')).toEqual([]);
  });

  // Source: BBC Subtitle Guidelines §4.5: no gap, or 1 s and more
  it('finds a gap that is neither none nor a second', () => {
    const lines = [line('a', 1000, 0), line('b', 1000, 1000), line('c', 1000, 2999), line('d', 1000, 4999)];
    expect(shortGaps(lines, bbc)).toEqual([2]);
    expect(shortGaps(lines, dcmp)).toEqual([]);
  });
});

describe('reading captions at the DCMP’s figures', () => {
  // Source: DCMP Captioning Key, older edition: 2 s at least, 32 characters, 150–160 words a minute for adults' special interest
  it('asks for two seconds, 32 characters and 160 words a minute', () => {
    expect(codes(line('ribs down and stand', 1999), dcmp)).toEqual(['tooShort']);
    expect(codes(line('ribs down and stand', 2000), dcmp)).toEqual([]);
    expect(codes(line('x'.repeat(33), 2000), dcmp)).toEqual(['rowTooLong']);
    expect(codes(line('a b c d e f g h', 2999), dcmp)).toEqual(['tooFast']);
    expect(codes(line('a b c d e f g h', 3000), dcmp)).toEqual([]);
  });

  // Source: DCMP, from memory (M): six seconds at most; the figure says so
  it('asks for six seconds at most, and says that the figure is from memory', () => {
    const [fault] = readingFaults(line('ribs down', 6001), dcmp);
    expect(fault).toMatchObject({ code: 'tooLong', figure: { standing: 'memory' } });
  });
});

describe('figures', () => {
  it('of the two bodies stay apart: four words in 1.5 s are long enough for one and not for the other', () => {
    expect(codes(line('ribs down and stand', 1500), bbc)).toEqual([]);
    expect(codes(line('ribs down and stand', 1500), dcmp)).toEqual(['tooShort']);
  });

  // Source: 180 words × 5 characters ÷ 60 s; no public body gives characters a second
  it('of characters a second are marked as derived', () => {
    expect(bbc.charactersPerSecond).toMatchObject({ value: 15, standing: 'derived' });
    expect(charactersPerSecond(line('x'.repeat(15), 1000))).toBe(15);
  });

  it('count words that are read, not dashes', () => {
    expect(wordCount('ribs — down,\nand 10 kg')).toBe(5);
  });
});
