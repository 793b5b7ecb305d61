import type { CalendarDate } from '../../shared/domain/values';

/** Dates, amounts and lists as people read them. Times inside a recording are in shared/domain/timecode.ts. */

const language = 'en-GB';

/** A calendar date has no zone: it is read and written at noon UTC, where no zone can move it. */
const noon = (date: CalendarDate) => new Date(`${date}T12:00:00Z`);

const parts = (at: Date, options: Intl.DateTimeFormatOptions) => {
  const found = new Intl.DateTimeFormat(language, options).formatToParts(at);
  return (type: Intl.DateTimeFormatPartTypes) => found.find((part) => part.type === type)?.value ?? '';
};

/** Today's calendar date in a time zone: a session is “today” where its team is. */
export function todayIn(timeZone: string, now = new Date()): CalendarDate {
  const part = parts(now, { timeZone, year: 'numeric', month: '2-digit', day: '2-digit' });
  return `${part('year')}-${part('month')}-${part('day')}`;
}

/** “Tue 3 March”, with the year when it is not `today`'s. */
export function formatDate(date: CalendarDate, today?: CalendarDate): string {
  const part = parts(noon(date), { timeZone: 'UTC', weekday: 'short', day: 'numeric', month: 'long', year: 'numeric' });
  const year = today && today.slice(0, 4) !== date.slice(0, 4) ? ` ${part('year')}` : '';
  return `${part('weekday')} ${part('day')} ${part('month')}${year}`;
}

/** “Today”, “Tomorrow”, “Yesterday”, else the date. */
export function formatDay(date: CalendarDate, today: CalendarDate): string {
  const days = Math.round((noon(date).getTime() - noon(today).getTime()) / 86_400_000);
  if (days === 0) return 'Today';
  if (days === 1) return 'Tomorrow';
  if (days === -1) return 'Yesterday';
  return formatDate(date, today);
}

/** “Tue 3 March, 18:00” of an ISO 8601 instant, in the team's time zone. */
export function formatInstant(instant: string, timeZone: string): string {
  const at = new Date(instant);
  const part = parts(at, { timeZone, hour: '2-digit', minute: '2-digit', hourCycle: 'h23' });
  return `${formatDate(todayIn(timeZone, at))}, ${part('hour')}:${part('minute')}`;
}

const steps = [
  ['day', 86_400],
  ['hour', 3600],
  ['minute', 60],
] as const;

/** “5 minutes ago”, “yesterday”, “just now”. */
export function formatAgo(instant: string, now = new Date()): string {
  const seconds = (new Date(instant).getTime() - now.getTime()) / 1000;
  const step = steps.find(([, size]) => Math.abs(seconds) >= size);
  if (!step) return 'just now';
  return new Intl.RelativeTimeFormat('en', { numeric: 'auto' }).format(Math.round(seconds / step[1]), step[0]);
}

/** A length for planning: “40 s”, “46 min”, “1 h 5 min”. */
export function formatSpan(ms: number): string {
  if (ms < 60_000) return `${Math.round(ms / 1000)} s`;
  const minutes = Math.round(ms / 60_000);
  if (minutes < 60) return `${minutes} min`;
  const rest = minutes % 60;
  return rest === 0 ? `${minutes / 60} h` : `${Math.floor(minutes / 60)} h ${rest} min`;
}

const sizes = ['bytes', 'kB', 'MB', 'GB', 'TB'] as const;

/** “320 kB”, “1.2 GB”: decimal units, as file managers and phones show them. */
export function formatBytes(bytes: number): string {
  let size = bytes;
  let unit = 0;
  while (size >= 999.5 && unit < sizes.length - 1) {
    size /= 1000;
    unit += 1;
  }
  const digits = unit === 0 || size >= 99.95 ? 0 : 1;
  return `${new Intl.NumberFormat(language, { maximumFractionDigits: digits }).format(size)} ${sizes[unit]}`;
}

/** “14 members”, “1 member”; a count that reached `cap` is “1000+ members”. */
export function formatCount(count: number, one: string, many: string, cap = Number.POSITIVE_INFINITY): string {
  const figure = count >= cap ? `${cap}+` : new Intl.NumberFormat(language, { useGrouping: 'min2' }).format(count);
  return `${figure} ${count === 1 ? one : many}`;
}

/** “rings, rope and box”. */
export function formatList(words: readonly string[], join: 'and' | 'or' = 'and'): string {
  return new Intl.ListFormat(language, { type: join === 'and' ? 'conjunction' : 'disjunction' }).format(words);
}

/** “42 %” of a share between 0 and 1; never 100 before it is done. */
export function formatShare(share: number): string {
  return `${Math.floor(Math.min(1, Math.max(0, share)) * 100)} %`;
}
