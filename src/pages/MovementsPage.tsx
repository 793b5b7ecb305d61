import { useSuspenseQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useNavigate } from 'react-router-dom';
import { Button } from '../components/Button';
import { GoLink } from '../components/GoButton';
import { PageTitle } from '../components/PageTitle';
import { DictionarySearch } from '../features/dictionary/DictionarySearch';
import { FoundMovements } from '../features/dictionary/FoundMovements';
import { kitById } from '../features/dictionary/kitWords';
import { MergeBar } from '../features/dictionary/MergeBar';
import { MovementTable } from '../features/dictionary/MovementTable';
import { NoMovements } from '../features/dictionary/NoMovements';
import { useAddress } from '../features/dictionary/useAddress';
import { useDictionaryAddress } from '../features/dictionary/useDictionaryAddress';
import { useMergeChoice } from '../features/dictionary/useMergeChoice';
import { kitQuery } from '../lib/libraryQueries';
import { teamPath, useTeam } from '../lib/session';

/** The dictionary at the desk. */
export function MovementsPage() {
  const { slug } = useTeam();
  const navigate = useNavigate();
  const { data: items } = useSuspenseQuery(kitQuery(slug));
  const kit = useMemo(() => kitById(items), [items]);
  const place = useAddress();
  const address = useDictionaryAddress(place);
  const merging = useMergeChoice(place);
  return (
    <div className="space-y-4">
      <PageTitle
        title="Movements"
        actions={
          merging.chosen ? undefined : (
            <>
              <Button size="small" onClick={merging.start}>
                Merge two
              </Button>
              <GoLink size="small" to={teamPath(slug, 'movements', 'new')}>
                Add a movement
              </GoLink>
            </>
          )
        }
      />
      <DictionarySearch address={address} />
      {merging.chosen && (
        <MergeBar
          team={slug}
          kit={kit}
          merging={merging}
          onMerged={(keptId, gone) => navigate(teamPath(slug, 'movements', keptId), { state: { gone } })}
        />
      )}
      <FoundMovements team={slug} address={address} still="none" empty={<NoMovements team={slug} address={address} />}>
        {(movements) => <MovementTable team={slug} movements={movements} kit={kit} merging={merging} />}
      </FoundMovements>
    </div>
  );
}
