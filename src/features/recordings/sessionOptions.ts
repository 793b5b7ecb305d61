import type { CalendarDate } from '../../../shared/domain/values';
import { formatDate } from '../../lib/format';

type Named = { id: string; date: CalendarDate; title: string };

/** Sessions to choose from, newest first. @param current the chosen one, which may be older than all of them */
export function sessionOptions(sessions: readonly Named[], current: Named | null): { value: string; label: string }[] {
  const isListed = current === null || sessions.some(({ id }) => id === current.id);
  return [...sessions, ...(isListed ? [] : [current])].map(({ id, date, title }) => ({
    value: id,
    label: `${formatDate(date)}: ${title}`,
  }));
}
