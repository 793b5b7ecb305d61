import { useSuspenseQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useParams } from 'react-router-dom';
import { SkeletonRows } from '../components/Skeleton';
import { FloorMovement } from '../features/dictionary/FloorMovement';
import { kitById } from '../features/dictionary/kitWords';
import { MovementFault } from '../features/dictionary/MovementFault';
import { useMovementPage } from '../features/dictionary/useMovementPage';
import { kitQuery } from '../lib/libraryQueries';
import { teamPath, useTeam } from '../lib/session';

/** A movement for those who train. */
export function MovementPage() {
  const { slug } = useTeam();
  const { movementId = '' } = useParams();
  const { data: items } = useSuspenseQuery(kitQuery(slug));
  const kit = useMemo(() => kitById(items), [items]);
  const { query, page, arrival } = useMovementPage(slug, movementId, (id) => teamPath(slug, 'dictionary', id));
  if (page)
    return (
      <FloorMovement
        key={page.movement.id}
        team={slug}
        kit={kit}
        page={page}
        arrived={arrival.ledOn ? 'from a merged one' : 'directly'}
      />
    );
  if (!query.error) return <SkeletonRows label="The movement" still="large" count={5} />;
  return (
    <MovementFault
      error={query.error}
      listPath={teamPath(slug, 'dictionary')}
      busy={query.isFetching ? 'Trying' : undefined}
      onRetry={() => void query.refetch()}
    />
  );
}
