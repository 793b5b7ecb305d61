import { Suspense } from 'react';
import { Outlet } from 'react-router-dom';
import { may } from '../../shared/domain/permissions';
import { ErrorPage } from '../components/ErrorPage';
import { GoLink } from '../components/GoButton';
import { Waiting } from '../components/Waiting';
import { LiveUpdates } from '../features/recordings/LiveUpdates';
import { UploadTray } from '../features/upload/UploadTray';
import { teamPath, useTeam } from '../lib/session';
import { DeskLayout } from './layouts/DeskLayout';
import { PersonMenu } from './PersonMenu';
import { deskPlaces } from './places';

/** Planning, marking and correcting, for those who make the library. */
export function DeskRoom() {
  const team = useTeam();
  const allowed = may(team.role, 'readDrafts');
  return (
    <DeskLayout places={deskPlaces(team.slug, team.role)} home={teamPath(team.slug)} right={<PersonMenu room="desk" />}>
      {allowed ? (
        <>
          <LiveUpdates team={team.slug} />
          <Suspense fallback={<Waiting label="The page is on its way" />}>
            <Outlet />
          </Suspense>
          <UploadTray team={team.slug} />
        </>
      ) : (
        <ErrorPage
          title="This is where coaches work"
          actions={<GoLink to={teamPath(team.slug, 'today')}>To today’s session</GoLink>}
        >
          Your role in this team is member. If that is wrong, ask the owner.
        </ErrorPage>
      )}
    </DeskLayout>
  );
}
