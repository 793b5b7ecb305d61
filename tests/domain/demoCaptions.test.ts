import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { captionsOfSpeech } from '../../server/demo/captionsOfSpeech';

describe('caption lines of a spoken sentence', () => {
  it('keeps a short sentence on one row', () => {
    expect(captionsOfSpeech('Five counts down.', 500, 1700)).toEqual([
      { startMs: 500, endMs: 1700, text: 'Five counts down.' },
    ]);
  });

  it('breaks a longer one into two rows near the comma', () => {
    expect(captionsOfSpeech('Sit down between your heels, and keep the chest tall.', 0, 3000)).toEqual([
      { startMs: 0, endMs: 3000, text: 'Sit down between your heels,\nand keep the chest tall.' },
    ]);
  });

  // BBC Subtitle Guidelines §3.1 and §3.3 (37 characters a row, two rows)
  it('fits every row, keeps every word, and fills the time without a gap', () => {
    const word = fc.stringMatching(/^[a-z]{1,12}[,.]?$/);
    fc.assert(
      fc.property(
        fc.array(word, { minLength: 1, maxLength: 40 }),
        fc.nat(100_000),
        fc.integer({ min: 2000, max: 30_000 }),
        (words, startMs, length) => {
          const lines = captionsOfSpeech(words.join(' '), startMs, startMs + length);
          expect(lines.flatMap(({ text }) => text.split(/[ \n]/))).toEqual(words);
          expect(lines[0]?.startMs).toBe(startMs);
          expect(lines.at(-1)?.endMs).toBe(startMs + length);
          for (const [i, line] of lines.entries()) {
            expect(line.endMs).toBeGreaterThan(line.startMs);
            if (i > 0) expect(line.startMs).toBe(lines[i - 1]?.endMs);
            const rows = line.text.split('\n');
            expect(rows.length).toBeLessThanOrEqual(2);
            for (const row of rows) expect(row.length).toBeLessThanOrEqual(37);
          }
        },
      ),
    );
  });
});
