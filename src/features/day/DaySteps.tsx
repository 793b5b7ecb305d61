import type { MyDay } from '../../../shared/contracts/sessions';
import { LinkChip } from '../../components/Chip';
import { Icon } from '../../components/Icon';
import { formatDay } from '../../lib/format';
import { teamPath } from '../../lib/session';

/** From one published session to the next: what was missed, what comes. */
export function DaySteps({ team, day }: { team: string; day: MyDay }) {
  const { previous, next, today, date } = day;
  if (!previous && !next && date === today) return null;
  return (
    <nav aria-label="Other days" className="flex flex-wrap gap-2">
      {previous && (
        <LinkChip
          to={teamPath(team, 'days', previous.date)}
          aria-label={`${formatDay(previous.date, today)}: ${previous.title}`}
        >
          <Icon name="back" size={16} />
          {formatDay(previous.date, today)}
        </LinkChip>
      )}
      {![date, previous?.date, next?.date].includes(today) && <LinkChip to={teamPath(team, 'today')}>Today</LinkChip>}
      {next && (
        <LinkChip to={teamPath(team, 'days', next.date)} aria-label={`${formatDay(next.date, today)}: ${next.title}`}>
          {formatDay(next.date, today)}
          <Icon name="back" size={16} className="rotate-180" />
        </LinkChip>
      )}
    </nav>
  );
}
