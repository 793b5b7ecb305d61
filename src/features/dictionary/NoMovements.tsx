import { Button, ButtonLink } from '../../components/Button';
import { EmptyState } from '../../components/EmptyState';
import { teamPath } from '../../lib/session';
import { patternName } from './patternName';
import type { DictionaryAddress } from './useDictionaryAddress';

/** The desk's empty list: what was not found can be added. */
export function NoMovements({ team, address }: { team: string; address: DictionaryAddress }) {
  const { q, pattern } = address;
  if (q === '' && !pattern)
    return (
      <EmptyState title="No movements yet.">
        Add the first one: its name, what it needs and what to look for. Plans, chapters and search then know it.
      </EmptyState>
    );
  const addPath = teamPath(team, 'movements', 'new');
  return (
    <EmptyState
      title={q === '' ? `No movement of this pattern yet: ${pattern}.` : `Nothing for “${q}”.`}
      action={
        <>
          {pattern && q !== '' && (
            <Button onClick={() => address.choosePattern(undefined)}>Look in every pattern</Button>
          )}
          <ButtonLink to={q === '' ? addPath : `${addPath}?name=${encodeURIComponent(q)}`}>
            {q === '' ? 'Add one' : `Add “${q}”`}
          </ButtonLink>
        </>
      }
    >
      {pattern && q !== ''
        ? `Only ${patternName(pattern).toLowerCase()} is shown right now.`
        : 'Typos are fine here, so it is probably not in the dictionary under any name.'}
    </EmptyState>
  );
}
