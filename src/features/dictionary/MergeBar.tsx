import { useQueries } from '@tanstack/react-query';
import { useState } from 'react';
import { Button } from '../../components/Button';
import { GoButton } from '../../components/GoButton';
import { Icon } from '../../components/Icon';
import { movementQuery } from './api';
import type { KitById } from './kitWords';
import { MergeDialog } from './MergeDialog';
import type { MergeChoice } from './useMergeChoice';

type Props = { team: string; kit: KitById; merging: MergeChoice; onMerged: (keptId: string, gone: string) => void };

/** Stays in view while one looks for the two. */
export function MergeBar({ team, kit, merging, onMerged }: Props) {
  const chosen = merging.chosen ?? [];
  const [comparing, setComparing] = useState(false);
  const pages = useQueries({ queries: chosen.map((id) => movementQuery(team, id)) });
  const [first, second] = chosen;
  return (
    <section
      aria-label="Merge two movements"
      className="sticky top-0 z-20 flex flex-wrap items-center gap-x-4 gap-y-2 border-b-thin border-line bg-tint px-2.5 py-2"
    >
      <p className="min-w-0 grow basis-56 text-sm">
        {chosen.length === 2 ? (
          'Two are chosen. Next you see them side by side; nothing is merged yet.'
        ) : (
          <>
            Tick the <strong>two</strong> that are the same movement. You can look for each by itself.
          </>
        )}
      </p>
      {chosen.map((id, at) => (
        <Button key={id} size="small" onClick={() => merging.toggle(id)}>
          {pages[at]?.data?.movement.name ?? (pages[at]?.isError ? 'Not here any more' : 'On the way')}
          <Icon name="close" size={14} />
          <span className="sr-only">take it out of the two</span>
        </Button>
      ))}
      <Button size="small" look="quiet" onClick={merging.stop}>
        Stop merging
      </Button>
      <GoButton size="small" disabled={chosen.length < 2} onClick={() => setComparing(true)}>
        Compare the two
      </GoButton>
      {comparing && first && second && (
        <MergeDialog
          team={team}
          kit={kit}
          ids={[first, second]}
          onClose={() => setComparing(false)}
          onMerged={onMerged}
        />
      )}
    </section>
  );
}
