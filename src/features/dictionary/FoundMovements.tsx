import { useInfiniteQuery } from '@tanstack/react-query';
import { type ReactNode, useEffect } from 'react';
import type { MovementInList } from '../../../shared/contracts/movements';
import { ErrorPanel } from '../../components/ErrorPanel';
import { MoreButton } from '../../components/MoreButton';
import { SkeletonRows } from '../../components/Skeleton';
import { announce } from '../../lib/announce';
import { ApiError } from '../../lib/api';
import { formatCount } from '../../lib/format';
import { movementsQuery } from './api';
import type { DictionaryAddress } from './useDictionaryAddress';

type Props = {
  team: string;
  address: DictionaryAddress;
  still: 'none' | 'small';
  /** in place of an empty list */
  empty: ReactNode;
  children: (movements: readonly MovementInList[]) => ReactNode;
};

/** The movements that the address asks for: by name, or for words typed the best first. */
export function FoundMovements({ team, address, still, empty, children }: Props) {
  const list = useInfiniteQuery(movementsQuery(team, address));
  const movements = list.data?.pages.flatMap((page) => page.items);
  const settled = list.isSuccess && !list.isPlaceholderData;
  const count = movements?.length ?? 0;
  const isNarrowed = address.q !== '' || address.pattern !== undefined;
  useEffect(() => {
    if (settled && isNarrowed) announce(formatCount(count, 'movement', 'movements'));
  }, [settled, isNarrowed, count]);

  if (!movements) {
    if (!list.isError) return <SkeletonRows label="Movements" still={still} count={8} />;
    return (
      <ErrorPanel
        title="The movements did not arrive."
        message={list.error.message}
        requestId={list.error instanceof ApiError ? (list.error.requestId ?? undefined) : undefined}
        busy={list.isFetching ? 'Trying' : undefined}
        onRetry={() => void list.refetch()}
      />
    );
  }
  return (
    <div className={list.isPlaceholderData ? 'opacity-60' : undefined} aria-busy={list.isPlaceholderData}>
      {movements.length === 0 ? empty : children(movements)}
      <MoreButton query={list} />
    </div>
  );
}
