import { useSuspenseQuery } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { EmptyState } from '../components/EmptyState';
import { PageTitle } from '../components/PageTitle';
import { myKitQuery } from '../features/kit/api';
import { MyKitForm } from '../features/kit/MyKitForm';
import { kitQuery } from '../lib/libraryQueries';
import { teamPath, useTeam } from '../lib/session';

export function MyKitPage() {
  const { slug } = useTeam();
  const navigate = useNavigate();
  const { data: items } = useSuspenseQuery(kitQuery(slug));
  const { data: mine } = useSuspenseQuery(myKitQuery(slug));
  return (
    <div className="flex min-h-full flex-col pt-2">
      <PageTitle title="My kit" />
      <p className="mt-1.5 mb-3 text-ink2">
        Where you train, what is there? Sessions and search then show what you can do with it.
      </p>
      {items.length === 0 ? (
        <EmptyState title="The team has named no kit yet.">
          Everything is shown as planned until your coach does.
        </EmptyState>
      ) : (
        <MyKitForm team={slug} items={items} mine={mine} onSaved={() => navigate(teamPath(slug, 'today'))} />
      )}
    </div>
  );
}
