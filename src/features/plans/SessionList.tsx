import { useInfiniteQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import type { SessionInList } from '../../../shared/contracts/sessions';
import { EmptyState } from '../../components/EmptyState';
import { ErrorPanel } from '../../components/ErrorPanel';
import { MoreButton } from '../../components/MoreButton';
import { Section } from '../../components/PageTitle';
import { SkeletonRows } from '../../components/Skeleton';
import { sessionsQuery } from './api';
import { SessionRow } from './SessionRow';

type Props = { team: string; today: string /** what to do when there is no session at all */; first: ReactNode };

/** Sessions, the latest day first: what comes, what is today, what was. */
export function SessionList({ team, today, first }: Props) {
  const query = useInfiniteQuery(sessionsQuery(team));
  if (query.isPending) return <SkeletonRows label="Sessions" count={8} />;
  if (!query.data)
    return (
      <ErrorPanel
        title="The sessions did not arrive."
        message={query.error.message}
        requestId={'requestId' in query.error ? (query.error.requestId as string) : undefined}
        onRetry={() => void query.refetch()}
      />
    );
  const sessions = query.data.pages.flatMap(({ items }) => items);
  if (sessions.length === 0)
    return (
      <EmptyState title="No session is planned yet." action={first}>
        A session is one day’s training: what is done, in which order, and the recordings that show it.
      </EmptyState>
    );
  const groups = groupsOf(sessions, today);
  return (
    <div className="grid gap-6">
      {groups.map(({ title, items }) => (
        <Section key={title} title={title}>
          <ul>
            {items.map((session) => (
              <SessionRow key={session.id} team={team} session={session} today={today} />
            ))}
          </ul>
        </Section>
      ))}
      <MoreButton query={query} />
    </div>
  );
}

function groupsOf(sessions: readonly SessionInList[], today: string) {
  return [
    { title: 'Coming', items: sessions.filter(({ date }) => date > today) },
    { title: 'Today', items: sessions.filter(({ date }) => date === today) },
    { title: 'Past', items: sessions.filter(({ date }) => date < today) },
  ].filter(({ items }) => items.length > 0);
}
