import { useSuspenseInfiniteQuery, useSuspenseQuery } from '@tanstack/react-query';
import type { AuditEntry } from '../../shared/contracts/people';
import { EmptyState } from '../components/EmptyState';
import { MoreButton } from '../components/MoreButton';
import { PageTitle } from '../components/PageTitle';
import { Table } from '../components/Table';
import { TextLink } from '../components/TextLink';
import { teamQuery, trailQuery } from '../features/people/api';
import { trailDetails, trailPlaces, trailWords } from '../features/people/trailWords';
import { formatInstant } from '../lib/format';
import { teamPath, useTeam } from '../lib/session';

export function TrailPage() {
  const { slug } = useTeam();
  const trail = useSuspenseInfiniteQuery(trailQuery(slug));
  const { data: team } = useSuspenseQuery(teamQuery(slug));
  const entries = trail.data.pages.flatMap((page) => page.items);
  return (
    <div className="space-y-4">
      <PageTitle title="What was changed" meta="newest first" />
      {entries.length === 0 ? (
        <EmptyState title="Nothing was changed yet">
          Every change in the team is noted here with who made it.
        </EmptyState>
      ) : (
        <Table
          caption="Changes"
          rows={entries}
          rowKey={(entry) => entry.id}
          columns={[
            { key: 'at', head: 'When', role: 'figure', cell: (entry) => formatInstant(entry.at, team.timeZone) },
            { key: 'who', head: 'Who', role: 'name', cell: (entry) => entry.actor ?? 'somebody who is gone' },
            { key: 'what', head: 'What', cell: (entry) => trailWords(entry.action) },
            { key: 'about', head: 'About', cell: (entry) => <About team={slug} entry={entry} /> },
            {
              key: 'more',
              head: 'Details',
              cell: (entry) => <span className="text-ink2 wrap-anywhere">{trailDetails(entry.details)}</span>,
            },
          ]}
        />
      )}
      <MoreButton query={trail} />
    </div>
  );
}

/** What was changed, with the way to it where it has a page. */
function About({ team, entry }: { team: string; entry: AuditEntry }) {
  const place = trailPlaces[entry.subjectType];
  if (entry.subject === null || entry.subjectId === null) return null;
  if (!place) return <span className="wrap-anywhere">{entry.subject}</span>;
  return <TextLink to={teamPath(team, place, entry.subjectId)}>{entry.subject}</TextLink>;
}
