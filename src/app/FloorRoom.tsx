import { Suspense } from 'react';
import { Outlet } from 'react-router-dom';
import { Waiting } from '../components/Waiting';
import { FindBar } from '../features/search/FindBar';
import { teamPath, useTeam } from '../lib/session';
import { FloorLayout } from './layouts/FloorLayout';
import { PersonMenu } from './PersonMenu';
import { floorPlaces } from './places';

type Props = { phoneTop?: 'mark' | 'none'; width?: 'column' | 'full' };

/** Watching and training. */
export function FloorRoom({ phoneTop, width }: Props) {
  const team = useTeam();
  return (
    <FloorLayout
      places={floorPlaces(team.slug, team.role)}
      home={teamPath(team.slug, 'today')}
      search={<FindBar team={team.slug} />}
      right={<PersonMenu room="floor" />}
      {...(phoneTop ? { phoneTop } : {})}
      {...(width ? { width } : {})}
    >
      <Suspense fallback={<Waiting label="The page is on its way" />}>
        <Outlet />
      </Suspense>
    </FloorLayout>
  );
}
