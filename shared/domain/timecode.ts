import { Ms } from './values';

/** Times as people read and type them, as screen readers say them, and as caption files write them. All in whole milliseconds. */

type Parts = { hours: number; minutes: number; seconds: number; ms: number };

function partsOf(time: number): Parts {
  const whole = Math.max(0, Math.floor(time));
  return {
    hours: Math.floor(whole / 3_600_000),
    minutes: Math.floor(whole / 60_000) % 60,
    seconds: Math.floor(whole / 1000) % 60,
    ms: whole % 1000,
  };
}

const two = (n: number) => String(n).padStart(2, '0');

/** `4:31`, `1:02:03`. Rounds down, so that the second shown is the second that plays. */
export function formatMs(time: number): string {
  const { hours, minutes, seconds } = partsOf(time);
  return hours > 0 ? `${hours}:${two(minutes)}:${two(seconds)}` : `${minutes}:${two(seconds)}`;
}

/** `4:31.2`, `1:02:03.0`, for places where a tenth matters. */
export function formatMsWithTenths(time: number): string {
  return `${formatMs(time)}.${Math.floor(partsOf(time).ms / 100)}`;
}

/** `4:31.207`: every millisecond, for fields that give back exactly what they were given. */
export function formatMsExactly(time: number): string {
  const { ms } = partsOf(time);
  return ms === 0 ? formatMs(time) : `${formatMs(time)}.${String(ms).padStart(3, '0').replace(/0+$/, '')}`;
}

/** What a screen reader says: `4 minutes 31 seconds`, `1 hour 3 seconds`, `0 seconds`. */
export function spokenMs(time: number): string {
  const { hours, minutes, seconds } = partsOf(time);
  const said = (n: number, unit: string) => (n === 0 ? [] : [`${n} ${unit}${n === 1 ? '' : 's'}`]);
  const words = [...said(hours, 'hour'), ...said(minutes, 'minute'), ...said(seconds, 'second')];
  return words.length > 0 ? words.join(' ') : '0 seconds';
}

/**
 * What people type: `4:31`, `1:02:03.5`, `271.2` (seconds), `90:00` (minutes beyond an hour), with a point or a comma.
 * @returns milliseconds, or null when it is no time of a day's length at most
 */
export function parseTime(typed: string): number | null {
  const match = /^(?:(?:(\d{1,2}):)?(\d{1,4}):)?(\d{1,5})(?:[.,](\d{1,3}))?$/.exec(typed.trim());
  if (!match) return null;
  const [, hours, minutes, seconds = '', fraction = ''] = match;
  if (minutes !== undefined && (seconds.length > 2 || Number(seconds) > 59)) return null;
  if (hours !== undefined && Number(minutes) > 59) return null;
  const wholeSeconds = Number(hours ?? 0) * 3600 + Number(minutes ?? 0) * 60 + Number(seconds);
  const time = wholeSeconds * 1000 + Number(fraction.padEnd(3, '0'));
  return Ms.safeParse(time).success ? time : null;
}

function fileTimestamp(time: number, separator: '.' | ','): string {
  const { hours, minutes, seconds, ms } = partsOf(time);
  return `${two(hours)}:${two(minutes)}:${two(seconds)}${separator}${String(ms).padStart(3, '0')}`;
}

/** `00:04:31.200`. Source: W3C WebVTT, "WebVTT timestamp": two or more digits of hours, two, two, a full stop, three. */
export const webvttTimestamp = (time: number) => fileTimestamp(time, '.');

/** `00:04:31,200`, as SRT files write it: WebVTT's form with a comma. */
export const srtTimestamp = (time: number) => fileTimestamp(time, ',');
