import { useSuspenseInfiniteQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import { EmptyState } from '../components/EmptyState';
import { MoreButton } from '../components/MoreButton';
import { PageTitle } from '../components/PageTitle';
import { TextLink } from '../components/TextLink';
import { noticesQuery, useReadNotices } from '../features/people/api';
import { formatAgo } from '../lib/format';
import { teamPath, useMay, useTeam } from '../lib/session';

export function NoticesPage() {
  const { slug } = useTeam();
  const toDesk = useMay('readDrafts');
  const notices = useSuspenseInfiniteQuery(noticesQuery(slug));
  const { mutate: read } = useReadNotices(slug);
  const unread = notices.data.pages[0]?.unread ?? 0;
  useEffect(() => {
    // seen is read; what was new stays marked until the page is left
    if (unread > 0) return () => read();
  }, [unread, read]);
  const items = notices.data.pages.flatMap((page) => page.items);
  const linkOf = (kind: (typeof items)[number]['kind'], id: string | null) => {
    if (!id) return null;
    if (kind === 'sessionPublished') return toDesk ? teamPath(slug, 'sessions', id) : null;
    return toDesk ? teamPath(slug, 'footage', id) : null;
  };
  return (
    <div className="space-y-4 pt-2">
      <PageTitle title="Notices" meta={unread > 0 ? `${unread} new` : undefined} />
      {items.length === 0 && (
        <EmptyState title="Nothing happened yet">
          When a recording is ready or a session is published, it says so here.
        </EmptyState>
      )}
      <ul>
        {items.map((notice) => {
          const to = linkOf(notice.kind, notice.subjectId);
          return (
            <li key={notice.id} className="flex min-h-target items-baseline gap-3 border-b border-line py-2.5">
              <span className={notice.readAt ? 'min-w-0 grow' : 'min-w-0 grow border-l-4 border-yellow pl-3 font-bold'}>
                {to ? <TextLink to={to}>{notice.text}</TextLink> : notice.text}
              </span>
              <span className="flex-none text-sm text-ink2">{formatAgo(notice.at)}</span>
            </li>
          );
        })}
      </ul>
      <MoreButton query={notices} />
    </div>
  );
}
