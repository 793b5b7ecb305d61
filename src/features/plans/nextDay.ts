import type { CalendarDate } from '../../../shared/domain/values';

/** The first day from tomorrow on that has no session yet: what a coach most likely plans next. */
export function nextDay(today: CalendarDate, taken: readonly CalendarDate[]): CalendarDate {
  const day = new Date(`${today}T12:00:00Z`);
  for (;;) {
    day.setUTCDate(day.getUTCDate() + 1);
    const date = day.toISOString().slice(0, 10);
    if (!taken.includes(date)) return date;
  }
}
