import { useSuspenseQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { CalendarDate } from '../../shared/domain/values';
import { LinkChip } from '../components/Chip';
import { EmptyState } from '../components/EmptyState';
import { ErrorPage } from '../components/ErrorPage';
import { GoLink } from '../components/GoButton';
import { Icon } from '../components/Icon';
import { PageTitle } from '../components/PageTitle';
import { TextLink } from '../components/TextLink';
import { myDayQuery } from '../features/day/api';
import { DaySteps } from '../features/day/DaySteps';
import { changedWords, MySession } from '../features/day/MySession';
import { formatDate, formatDay } from '../lib/format';
import { teamPath, useTeam } from '../lib/session';

/** A member's first page: the day's session as they can do it, with what they own. */
export function TodayPage() {
  const { slug, name } = useTeam();
  const { date } = useParams();
  // an address typed by hand, or one that lost its end
  if (date !== undefined && !CalendarDate.safeParse(date).success)
    return (
      <ErrorPage
        title="There is no such day"
        actions={<GoLink to={teamPath(slug, 'today')}>To today’s session</GoLink>}
      >
        A day’s address ends like 2026-03-14: year, month, day.
      </ErrorPage>
    );
  return <Day slug={slug} name={name} date={date} />;
}

function Day({ slug, name, date }: { slug: string; name: string; date: string | undefined }) {
  const { data: day } = useSuspenseQuery(myDayQuery(slug, date));
  const dayWords = formatDay(day.date, day.today);
  return (
    <div className="pt-2 pb-8">
      <div className="flex flex-wrap items-center gap-x-2 gap-y-2 text-sm text-ink2">
        <span className="font-bold">{dayWords}</span>
        <span aria-hidden="true">·</span>
        <span>{name}</span>
        <LinkChip to={teamPath(slug, 'my-kit')} className="ms-auto">
          <Icon name="kit" size={16} />
          My kit
        </LinkChip>
      </div>
      {day.sessions.length === 0 && (
        <>
          <PageTitle title={noSessionWords(day.date, day.today)} tab={dayWords} />
          <EmptyState title={`Your coach has published nothing for this day${day.date < day.today ? '' : ' yet'}.`}>
            Look at another day, or <TextLink to={teamPath(slug, 'find')}>find a movement</TextLink>.
          </EmptyState>
        </>
      )}
      <div className="space-y-12">
        {day.sessions.map((session, index) => (
          <article key={session.id} aria-label={session.title}>
            <div className="mt-2">
              {index === 0 ? (
                <PageTitle title={session.title} tab={`${session.title}, ${dayWords}`} />
              ) : (
                <h1 className="text-xl font-black">{session.title}</h1>
              )}
              <p className="mt-1.5 text-sm text-ink2">
                {session.coach && <>With {session.coach}. </>}
                {day.kitUnknown ? (
                  <>
                    As planned. <TextLink to={teamPath(slug, 'my-kit')}>Say what kit you have</TextLink>, and it is made
                    for you.
                  </>
                ) : (
                  <>
                    Made for your kit
                    {changedWords(session) ? (
                      <>
                        : <strong className="text-ink">{changedWords(session)}</strong>.
                      </>
                    ) : (
                      ', nothing changed.'
                    )}
                  </>
                )}
              </p>
            </div>
            <div className="mt-5">
              <MySession team={slug} session={session} />
            </div>
          </article>
        ))}
      </div>
      <div className="mt-8">
        <DaySteps team={slug} day={day} />
      </div>
    </div>
  );
}

/** “No session tomorrow”, “No session on Tue 3 March”. */
function noSessionWords(date: string, today: string): string {
  const words = formatDay(date, today);
  return `No session ${words === formatDate(date) ? `on ${words}` : words.toLowerCase()}`;
}
