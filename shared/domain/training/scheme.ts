import { z } from 'zod';
import { figure, readSpan, secondsText, spanPattern } from './figures';

/** How a block is done. The rest after the last interval is said, never assumed: sources disagree on it. */

const seconds = z.int().min(1).max(7200);
const minutes = z.number().positive().max(180);
const rounds = z.int().min(1).max(100);

export const Scheme = z.discriminatedUnion('type', [
  z.object({ type: z.literal('amrap'), minutes }),
  z.object({ type: z.literal('emom'), minutes, everySeconds: seconds.default(60) }),
  z.object({
    type: z.literal('intervals'),
    rounds,
    workSeconds: seconds,
    restSeconds: z.int().min(0).max(7200),
    restAfterLast: z.boolean().default(false),
  }),
  z.object({ type: z.literal('roundsForTime'), rounds, capMinutes: minutes.nullable().default(null) }),
  z.object({ type: z.literal('sets'), sets: rounds, restSeconds: seconds.nullable().default(null) }),
  z.object({ type: z.literal('holds'), rounds }),
  z.object({
    type: z.literal('quality'),
    rounds: rounds.nullable().default(null),
    minutes: minutes.nullable().default(null),
  }),
]);
export type Scheme = z.infer<typeof Scheme>;

/** A scheme as it is read on a screen: "AMRAP 12", "8 × 20 s on, 10 s off", "5 rounds for time". `parseScheme` reads it back. */
export function formatScheme(scheme: Scheme): string {
  switch (scheme.type) {
    case 'amrap':
      return `AMRAP ${figure(scheme.minutes)}`;
    case 'emom':
      return scheme.everySeconds === 60
        ? `EMOM ${figure(scheme.minutes)}`
        : `every ${secondsText(scheme.everySeconds)} for ${figure(scheme.minutes)} min`;
    case 'intervals': {
      const work = `${scheme.rounds} × ${secondsText(scheme.workSeconds)} on`;
      if (scheme.restSeconds === 0) return `${work}, no rest`;
      return `${work}, ${secondsText(scheme.restSeconds)} off${scheme.restAfterLast ? ', rest after the last' : ''}`;
    }
    case 'roundsForTime':
      return `${roundsText(scheme.rounds)} for time${scheme.capMinutes === null ? '' : `, cap ${figure(scheme.capMinutes)} min`}`;
    case 'sets':
      return `${scheme.sets} ${scheme.sets === 1 ? 'set' : 'sets'}${scheme.restSeconds === null ? '' : `, ${secondsText(scheme.restSeconds)} rest`}`;
    case 'holds':
      return `holds, ${roundsText(scheme.rounds)}`;
    case 'quality': {
      if (scheme.rounds === null && scheme.minutes !== null) return `${figure(scheme.minutes)} min easy`;
      const rounds = scheme.rounds === null ? '' : `, ${roundsText(scheme.rounds)}`;
      return `quality${rounds}${scheme.minutes === null ? '' : `, ${figure(scheme.minutes)} min`}`;
    }
  }
}

const roundsText = (count: number) => `${count} ${count === 1 ? 'round' : 'rounds'}`;

/**
 * How long a block of this scheme lasts, in seconds; null where that depends on who does it (for time, sets, holds, rounds for quality).
 * A cap is no length: most people are done before it.
 * Intervals: work and rests between them; the rest after the last one only where the scheme has it.
 */
export function schemeSeconds(scheme: Scheme): number | null {
  switch (scheme.type) {
    case 'amrap':
    case 'emom':
      return Math.round(scheme.minutes * 60);
    case 'intervals': {
      const rests = scheme.restAfterLast ? scheme.rounds : scheme.rounds - 1;
      return scheme.rounds * scheme.workSeconds + rests * scheme.restSeconds;
    }
    case 'quality':
      return scheme.minutes === null ? null : Math.round(scheme.minutes * 60);
    case 'roundsForTime':
    case 'sets':
    case 'holds':
      return null;
  }
}

export type SchemeFault = { fault: string };

/** Longer than any scheme that a person writes. */
const longestText = 120;
const examples =
  'Write it like “AMRAP 12”, “EMOM 10”, “8 × 20 s on, 10 s off”, “5 rounds for time”, “3 sets” or “quality, 2 rounds”.';

/**
 * Reads a scheme as coaches type it: "12 min AMRAP", "every 1:30 for 12 min", "8 x 20/10", "5 RFT, 20 min cap", "3 sets, rest 90 s".
 * Intervals end with their last work unless the text asks for the rest after it.
 * @returns the scheme, or what is wrong with the text in words for the form's field
 */
export function parseScheme(text: string): Scheme | SchemeFault {
  if (text.length > longestText) return { fault: 'That is too long for a scheme.' };
  const plain = tidy(text);
  for (const read of [readAmrap, readEmom, readIntervals, readSets, readHolds, readForTime, readQuality]) {
    const found = read(plain);
    if (found === undefined) continue;
    const scheme = Scheme.safeParse(found);
    return scheme.success ? scheme.data : { fault: 'Those numbers are outside of what a scheme can be.' };
  }
  if (new RegExp(`^${roundsPattern}$`).test(plain))
    return { fault: 'Say how: “for time”, or “quality” where time does not count.' };
  if (new RegExp(`^\\d+ ?x ?(?:${spanPattern})$`).test(plain))
    return { fault: 'Say the rest too: 8 × 20 s on, 10 s off.' };
  return { fault: examples };
}

const tidy = (text: string) =>
  text
    .toLowerCase()
    .replaceAll('×', 'x')
    .replace(/[–—]/g, '-')
    .replace(/[(),;]+/g, ' ')
    .replace(/[:.\s]+$/, '')
    .replace(/\s+/g, ' ')
    .trim();

type Read = z.input<typeof Scheme> | undefined;

const minutesPattern = `(${spanPattern})`;
const roundsPattern = String.raw`(\d{1,3}) ?(?:x|rounds?)(?: of)?`;
const amrapWords = 'amrap|as many rounds as possible';

function readAmrap(text: string): Read {
  const found =
    match(text, `(?:${amrapWords}) ?:? ?(?:in |of |for )?${minutesPattern}`) ??
    match(text, `${minutesPattern} ?(?:of )?(?:${amrapWords})`);
  return found && { type: 'amrap', minutes: inMinutes(found[1]) };
}

function readEmom(text: string): Read {
  const minute = '(?:emom|every minute(?: on the minute)?)';
  const plain =
    match(text, `${minute} ?:? ?(?:for )?${minutesPattern}`) ?? match(text, `${minutesPattern} ?(?:of )?${minute}`);
  if (plain) return { type: 'emom', minutes: inMinutes(plain[1]), everySeconds: 60 };
  const times = match(text, `every (${spanPattern}) ?(?:x|for) ?(\\d{1,3}) ?(?:x|times|rounds)?`);
  const every = match(text, `every (${spanPattern}) (?:for )?(${spanPattern})`);
  const isCount = times && (/ ?x ?\d+$/.test(text) || /(?:x|times|rounds)$/.test(text));
  if (isCount)
    return { type: 'emom', everySeconds: inSeconds(times[1]), minutes: (inSeconds(times[1]) * Number(times[2])) / 60 };
  return every && { type: 'emom', everySeconds: inSeconds(every[1]), minutes: inMinutes(every[2]) };
}

function readIntervals(text: string): Read {
  const tail = / (?:(?:and )?rest after (?:the )?last(?: one)?|with (?:the )?last rest|last rest (?:too|counted))$/;
  const restAfterLast = tail.test(text);
  const body = text.replace(tail, '');
  const on = `(${spanPattern}) ?(?:on|work|hard)?`;
  const off = String.raw`(?:\/|with|-)? ?(?:(no rest)|(?:rest )?(${spanPattern}) ?(?:off|rest|easy|between)?)`;
  const found =
    match(body, `${roundsPattern} ?${on} ?${off}`) ??
    rotate(match(body, `${on} ?${off} ?(?:x|for) ?(\\d{1,3})(?: ?(?:x|rounds?|times))?`));
  if (!found) return undefined;
  const [, count, work, none, rest] = found;
  return {
    type: 'intervals',
    rounds: Number(count),
    workSeconds: inSeconds(work),
    restSeconds: none ? 0 : inSeconds(rest),
    restAfterLast,
  };
}

/** "20 on 10 off x 8" has its count last: put it first. */
const rotate = (found: readonly string[] | undefined) => found && [found[0], found[4], found[1], found[2], found[3]];

function readSets(text: string): Read {
  const rest = `(?:with |rest |of )*(${spanPattern}) ?(?:rest|off|between(?: sets)?)?`;
  const found = match(text, String.raw`(\d{1,3}) ?sets?(?: ${rest})?`);
  return found && { type: 'sets', sets: Number(found[1]), restSeconds: found[2] ? inSeconds(found[2]) : null };
}

function readHolds(text: string): Read {
  const found = match(text, `holds?(?: ${roundsPattern})?`) ?? match(text, `(?:${roundsPattern} |(\\d{1,3}) )holds?`);
  return found && { type: 'holds', rounds: Number(found[1] ?? found[2] ?? 1) };
}

function readForTime(text: string): Read {
  const cap = `(?: (?:(?:time )?cap(?: of| at)? ?${minutesPattern}|${minutesPattern} ?(?:time )?cap))?`;
  const found = match(text, `(?:${roundsPattern} )?for time${cap}`) ?? match(text, String.raw`(\d{1,3}) ?rft${cap}`);
  if (!found) return undefined;
  const capText = found[2] ?? found[3];
  return { type: 'roundsForTime', rounds: Number(found[1] ?? 1), capMinutes: capText ? inMinutes(capText) : null };
}

function readQuality(text: string): Read {
  const easy = match(text, `${minutesPattern} ?(?:of )?easy`) ?? match(text, `easy ${minutesPattern}`);
  if (easy) return { type: 'quality', rounds: null, minutes: inMinutes(easy[1]) };
  const words = '(?:for )?quality|not for time';
  const found =
    match(text, `(?:${words})(?: ${roundsPattern})?(?: ${minutesPattern})?`) ??
    match(text, `${roundsPattern} (?:${words})(?: ${minutesPattern})?`);
  if (!found) return undefined;
  return {
    type: 'quality',
    rounds: found[1] ? Number(found[1]) : null,
    minutes: found[2] ? inMinutes(found[2]) : null,
  };
}

const match = (text: string, pattern: string) => new RegExp(`^${pattern}$`).exec(text) ?? undefined;
const inSeconds = (text = '') => readSpan(text, 1);
/** "AMRAP 12" counts minutes; "AMRAP 90 s" says otherwise. */
const inMinutes = (text = '') => readSpan(text, 60) / 60;
