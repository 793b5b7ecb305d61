import { z } from 'zod';
import { Ms } from '../values';

/** One timed line of what is said (a WebVTT cue). Text may have line breaks, never a blank line, which would end the cue in a file. */
export const CaptionLine = z
  .object({
    startMs: Ms,
    endMs: Ms,
    text: z
      .string()
      .trim()
      .min(1, 'A line without words is deleted instead.')
      .max(500, 'At most 500 characters.')
      .regex(/^\P{Surrogate}*$/u, 'Plain text only.')
      // biome-ignore lint/suspicious/noControlCharactersInRegex: NUL cannot be stored; one way to match only, so that no text makes it slow
      .regex(/^[^\u0000\r\n]+(?:\n[^\u0000\r\n]+)*$/, 'No empty line inside a caption line.'),
  })
  .refine((line) => line.endMs > line.startMs, { path: ['endMs'], error: 'A line ends after it starts.' });
export type CaptionLine = z.infer<typeof CaptionLine>;
