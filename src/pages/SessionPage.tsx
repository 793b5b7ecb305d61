import { useQuery, useSuspenseQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import type { Session } from '../../shared/contracts/sessions';
import { ButtonLink } from '../components/Button';
import { PageTitle } from '../components/PageTitle';
import { useMovementNames } from '../features/movementNames/useMovementNames';
import { teamQuery } from '../features/people/api';
import { sessionQuery, useMovementFacts } from '../features/plans/api';
import { PlanDesk, useMovementIds } from '../features/plans/PlanDesk';
import { PlanReading } from '../features/plans/PlanReading';
import { SessionRecordings } from '../features/plans/SessionRecordings';
import { formatDate } from '../lib/format';
import { kitQuery } from '../lib/libraryQueries';
import { teamPath, useMay, useMe, useTeam } from '../lib/session';

export function SessionPage() {
  const { slug } = useTeam();
  const { sessionId = '' } = useParams();
  const { data: session } = useSuspenseQuery(sessionQuery(slug, sessionId));
  const mayPlan = useMay('editPlan');
  return mayPlan ? <Written key={session.id} session={session} /> : <Read session={session} />;
}

function Written({ session }: { session: Session }) {
  const { slug } = useTeam();
  const me = useMe();
  const navigate = useNavigate();
  const { data: team } = useSuspenseQuery(teamQuery(slug));
  const { movements, names, add, dialog } = useMovementNames(slug);
  const kit = useKitById(slug);
  const library = useMemo(
    () => ({ team: slug, sessionId: session.id, movements, names, kit, add }),
    [slug, session.id, movements, names, kit, add],
  );
  return (
    <>
      <PlanDesk
        session={session}
        person={me?.id ?? ''}
        timeZone={team.timeZone}
        library={library}
        meta={({ date }) => `${date ? formatDate(date, team.today) : 'no day yet'} · ${session.state}`}
        actions={session.state === 'published' && <AsMembers team={slug} date={session.date} />}
        aside={<SessionRecordings team={slug} session={session} />}
        onRemoved={() => navigate(teamPath(slug, 'sessions'), { replace: true })}
      />
      {dialog}
    </>
  );
}

function Read({ session }: { session: Session }) {
  const { slug, role } = useTeam();
  const { data: team } = useSuspenseQuery(teamQuery(slug));
  const kit = useKitById(slug);
  const facts = useMovementFacts(slug, useMovementIds(session));
  const { movements, names, add } = useMovementNames(slug);
  const library = { team: slug, sessionId: session.id, movements, names, kit, facts, add };
  return (
    <div className="space-y-5">
      <PageTitle
        title={session.title}
        meta={`${formatDate(session.date, team.today)} · ${session.state}${session.coach ? ` · ${session.coach.name}` : ''}`}
        actions={session.state === 'published' && <AsMembers team={slug} date={session.date} />}
      />
      <p className="text-sm text-ink2">
        Coaches and owners write and publish plans. Your role here is {role}, so you can read this one.
      </p>
      <div className="grid items-start gap-x-7 gap-y-10 xl:grid-cols-[minmax(0,1fr)_22rem]">
        <PlanReading session={session} library={library} />
        <SessionRecordings team={slug} session={session} />
      </div>
    </div>
  );
}

function AsMembers({ team, date }: { team: string; date: string }) {
  return <ButtonLink to={teamPath(team, 'days', date)}>See it as members do</ButtonLink>;
}

function useKitById(team: string) {
  const { data } = useQuery(kitQuery(team));
  return useMemo(() => new Map((data ?? []).map((item) => [item.id, item])), [data]);
}
