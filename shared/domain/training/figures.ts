/** Numbers and lengths of time as coaches write them. */

/** A number without trailing zeros: 12, 7.5. */
export const figure = (value: number) => String(Math.round(value * 1000) / 1000);

/** The pattern of a number as people type it: "12", "7.5", "7,5", "1,000". */
export const figurePattern = String.raw`\d{1,3}(?:,\d{3})+(?:\.\d+)?|\d+(?:[.,]\d+)?`;

/** Reads what `figurePattern` found. */
export function readFigure(text: string): number {
  const thousands = /^\d{1,3}(?:,\d{3})+(?:\.\d+)?$/.test(text);
  return Number(thousands ? text.replaceAll(',', '') : text.replace(',', '.'));
}

/** Whole minutes from two on, seconds otherwise: people say "90 s" and "60 s", but "2 min". */
export const saidInMinutes = (seconds: number) => seconds >= 120 && seconds % 60 === 0;

/** "30 s", "90 s", "4 min". */
export const secondsText = (seconds: number) =>
  saidInMinutes(seconds) ? `${figure(seconds / 60)} min` : `${figure(seconds)} s`;

/** How many seconds one of the unit is; undefined where the word is no unit of time. */
export function secondsPerUnit(unit: string): number | undefined {
  if (/^(?:s|secs?|seconds?|")$/.test(unit)) return 1;
  if (/^(?:mins?|minutes?|')$/.test(unit)) return 60;
  return undefined;
}

/** A length of time as typed, to put into a pattern: "30 s", "4 min", "1:30", or a bare number. */
export const spanPattern = String.raw`\d{1,3}:[0-5]\d|(?:${figurePattern})(?!\d)\s*(?:s|secs?|seconds?|mins?|minutes?)?`;

/**
 * Seconds of what `spanPattern` found.
 * @param bareUnit seconds that a bare number counts in: 1 or 60
 */
export function readSpan(text: string, bareUnit: number): number {
  const clock = /^(\d{1,3}):([0-5]\d)$/.exec(text.trim());
  if (clock) return Number(clock[1]) * 60 + Number(clock[2]);
  const [, amount = '', unit = ''] = /^([\d.,]+)\s*([a-z]*)$/.exec(text.trim()) ?? [];
  return readFigure(amount) * (secondsPerUnit(unit) ?? bareUnit);
}
