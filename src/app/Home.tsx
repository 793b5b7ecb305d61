import { Navigate, useParams } from 'react-router-dom';
import { may } from '../../shared/domain/permissions';
import { EmptyState } from '../components/EmptyState';
import { teamPath, useMe } from '../lib/session';
import { readStored } from '../lib/stored';
import { lastTeamKey } from './lastTeam';
import { PlainLayout } from './layouts/PlainLayout';

/** Where each role's day begins: members on the floor, those who make the library at the desk. */
export function Home() {
  const { team: slug } = useParams();
  const teams = useMe()?.teams ?? [];
  const wanted = slug ?? readStored(lastTeamKey);
  const team = teams.find((mine) => mine.slug === wanted) ?? teams[0];
  if (!team)
    return (
      <PlainLayout>
        <EmptyState title="You are in no team">
          Ask the owner of your team for an invitation; it comes by mail.
        </EmptyState>
      </PlainLayout>
    );
  return <Navigate to={teamPath(team.slug, may(team.role, 'readDrafts') ? 'sessions' : 'today')} replace />;
}
