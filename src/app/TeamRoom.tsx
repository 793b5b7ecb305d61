import { useEffect } from 'react';
import { Outlet, useParams } from 'react-router-dom';
import { ErrorPage } from '../components/ErrorPage';
import { GoLink } from '../components/GoButton';
import { useMe } from '../lib/session';
import { writeStored } from '../lib/stored';
import { FirstUseNotice } from './FirstUseNotice';
import { lastTeamKey } from './lastTeam';
import { PlainLayout } from './layouts/PlainLayout';

/** A team's pages, for its own people. */
export function TeamRoom() {
  const { team: slug = '' } = useParams();
  const me = useMe();
  const team = me?.teams.find((mine) => mine.slug === slug);
  useEffect(() => {
    if (team) writeStored(lastTeamKey, team.slug);
  }, [team]);
  if (!team)
    return (
      <PlainLayout>
        <ErrorPage title="There is nothing here" actions={<GoLink to="/">To your team</GoLink>}>
          The address is wrong, or the page belongs to a team that you are not in.
        </ErrorPage>
      </PlainLayout>
    );
  return (
    <>
      {me && me.noticeReadAt === null && <FirstUseNotice />}
      <Outlet key={slug} />
    </>
  );
}
