import { useSuspenseQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { EmptyState } from '../components/EmptyState';
import { PageTitle } from '../components/PageTitle';
import { SearchBox } from '../components/SearchBox';
import { TextButton } from '../components/TextLink';
import { VisuallyHidden } from '../components/VisuallyHidden';
import { FoundMovements } from '../features/dictionary/FoundMovements';
import { kitById } from '../features/dictionary/kitWords';
import { MovementRows } from '../features/dictionary/MovementRows';
import { PatternChips } from '../features/dictionary/PatternChips';
import { useAddress } from '../features/dictionary/useAddress';
import { useDictionaryAddress } from '../features/dictionary/useDictionaryAddress';
import { kitQuery } from '../lib/libraryQueries';
import { useTeam } from '../lib/session';

/** The dictionary for those who train. */
export function DictionaryPage() {
  const { slug } = useTeam();
  const { data: items } = useSuspenseQuery(kitQuery(slug));
  const kit = useMemo(() => kitById(items), [items]);
  const address = useDictionaryAddress(useAddress());
  const { q, pattern } = address;
  return (
    <div className="pt-3 pb-8">
      <VisuallyHidden>
        <PageTitle title="Movements" />
      </VisuallyHidden>
      <SearchBox label="Find a movement" value={address.text} onChange={address.type} onSubmit={address.submit} />
      <PatternChips address={address} />
      <div className="mt-2">
        <FoundMovements
          team={slug}
          address={address}
          still="small"
          empty={
            q === '' && !pattern ? (
              <EmptyState title="No movements yet.">Your coach has not written the first one.</EmptyState>
            ) : (
              <EmptyState
                title={q === '' ? `No movement of this pattern: ${pattern}.` : `Nothing for “${q}”.`}
                action={
                  pattern && (
                    <TextButton onClick={() => address.choosePattern(undefined)}>Look in every pattern</TextButton>
                  )
                }
              >
                Try fewer words, or the name that your coach uses.
              </EmptyState>
            )
          }
        >
          {(movements) => <MovementRows team={slug} movements={movements} kit={kit} />}
        </FoundMovements>
      </div>
    </div>
  );
}
