import { useInfiniteQuery, useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { Button } from '../components/Button';
import { GoButton } from '../components/GoButton';
import { PageTitle } from '../components/PageTitle';
import { teamQuery } from '../features/people/api';
import { sessionsQuery } from '../features/plans/api';
import { NewSessionDialog } from '../features/plans/NewSessionDialog';
import { nextDay } from '../features/plans/nextDay';
import { SessionList } from '../features/plans/SessionList';
import { teamPath, useMay, useTeam } from '../lib/session';

export function SessionsPage() {
  const { slug } = useTeam();
  const mayPlan = useMay('editPlan');
  const navigate = useNavigate();
  const { data: team } = useSuspenseQuery(teamQuery(slug));
  const { data: sessions } = useInfiniteQuery(sessionsQuery(slug));
  const [asked, setAsked] = useState<'no' | 'yes'>('no');
  const taken = sessions?.pages.flatMap(({ items }) => items.map(({ date }) => date)) ?? [];
  return (
    <div className="space-y-5">
      <PageTitle
        title="Sessions"
        actions={mayPlan && <GoButton onClick={() => setAsked('yes')}>Plan a session</GoButton>}
      />
      <SessionList
        team={slug}
        today={team.today}
        first={
          mayPlan ? (
            <Button onClick={() => setAsked('yes')}>Plan the first one</Button>
          ) : (
            <p className="text-ink2">A coach plans the first one; it is then listed here.</p>
          )
        }
      />
      {asked === 'yes' && (
        <NewSessionDialog
          team={slug}
          day={nextDay(team.today, taken)}
          onMade={(sessionId) => navigate(teamPath(slug, 'sessions', sessionId))}
          onClose={() => setAsked('no')}
        />
      )}
    </div>
  );
}
