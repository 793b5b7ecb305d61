import { useSuspenseQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useParams, useSearchParams } from 'react-router-dom';
import { SkeletonRows } from '../components/Skeleton';
import { DeskMovement } from '../features/dictionary/DeskMovement';
import { kitById } from '../features/dictionary/kitWords';
import { MovementFault } from '../features/dictionary/MovementFault';
import { NewMovement } from '../features/dictionary/NewMovement';
import { useMovementPage } from '../features/dictionary/useMovementPage';
import { kitQuery } from '../lib/libraryQueries';
import { teamPath, useTeam } from '../lib/session';

/** A movement at the desk; `new` in the address is one that is not there yet. */
export function MovementDeskPage() {
  const { slug } = useTeam();
  const { movementId = '' } = useParams();
  const [search] = useSearchParams();
  const { data: items } = useSuspenseQuery(kitQuery(slug));
  const kit = useMemo(() => kitById(items), [items]);
  if (movementId === 'new') return <NewMovement team={slug} kit={kit} name={(search.get('name') ?? '').slice(0, 80)} />;
  return <Known team={slug} kit={kit} movementId={movementId} />;
}

function Known({ team, kit, movementId }: { team: string; kit: ReturnType<typeof kitById>; movementId: string }) {
  const pathOf = (id: string) => teamPath(team, 'movements', id);
  const { query, page, arrival } = useMovementPage(team, movementId, pathOf);
  if (page) return <DeskMovement key={page.movement.id} team={team} kit={kit} page={page} arrival={arrival} />;
  if (!query.error) return <SkeletonRows label="The movement" count={6} />;
  return (
    <MovementFault
      error={query.error}
      listPath={teamPath(team, 'movements')}
      busy={query.isFetching ? 'Trying' : undefined}
      onRetry={() => void query.refetch()}
    />
  );
}
