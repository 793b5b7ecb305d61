import { useQuery } from '@tanstack/react-query';
import { type ReactNode, useCallback, useMemo, useState } from 'react';
import { flushSync } from 'react-dom';
import { movementNamesQuery } from '../../lib/libraryQueries';
import { NewMovementDialog } from './NewMovementDialog';

type Named = { id: string; name: string };
type Asked = { name: string; then: (movement: Named) => void };

/**
 * The dictionary's names for a page that lets people type movements, and the way to add one on the spot.
 * The page shows `dialog`; `add` opens it and calls back only when a movement was made.
 */
export function useMovementNames(team: string) {
  const { data } = useQuery(movementNamesQuery(team));
  const [asked, setAsked] = useState<Asked | null>(null);
  const movements = useMemo(() => data ?? [], [data]);
  const names = useMemo(() => new Map(movements.map(({ id, name }) => [id, name])), [movements]);
  const add = useCallback((name: string, then: (movement: Named) => void) => setAsked({ name, then }), []);
  const dialog: ReactNode = asked && (
    <NewMovementDialog
      team={team}
      name={asked.name}
      onClose={() => setAsked(null)}
      onMade={(movement) => {
        // the focus is back in the field before the movement is taken, so that it goes on from there
        flushSync(() => setAsked(null));
        asked.then(movement);
      }}
    />
  );
  return { movements, names, add, dialog };
}
