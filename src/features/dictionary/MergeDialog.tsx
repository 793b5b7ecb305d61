import { useQueries, useQueryClient } from '@tanstack/react-query';
import { clsx } from 'clsx';
import { useState } from 'react';
import { Button } from '../../components/Button';
import { Dialog } from '../../components/Dialog';
import { ErrorPanel } from '../../components/ErrorPanel';
import { FormFault } from '../../components/FormFault';
import { SkeletonRows } from '../../components/Skeleton';
import { ApiError } from '../../lib/api';
import { type MovementPage, movementQuery, useMergeMovements } from './api';
import type { KitById } from './kitWords';
import { MergeSide } from './MergeSide';

type Props = {
  team: string;
  kit: KitById;
  ids: readonly [string, string];
  onClose: () => void;
  onMerged: (keptId: string, gone: string) => void;
};

/** The two side by side, and which one stays. It is the one question: a merge can't be undone. */
export function MergeDialog({ team, kit, ids, onClose, onMerged }: Props) {
  const queries = useQueryClient();
  const [one, other] = useQueries({
    queries: [
      { ...movementQuery(team, ids[0]), staleTime: 0 },
      { ...movementQuery(team, ids[1]), staleTime: 0 },
    ],
  });
  const merge = useMergeMovements(team);
  const [choice, setChoice] = useState<string | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const failed = [one, other].find(({ isError, data }) => isError && !data);
  const pair = one.data && other.data ? ([one.data, other.data] as const) : null;
  const isOne = pair !== null && pair[0].movement.id === pair[1].movement.id;
  const stays = pair && !isOne ? (pair.find(({ movement }) => movement.id === choice) ?? shownMore(pair)) : null;
  const goes = pair?.find((page) => page !== stays);

  const submit = () => {
    if (!stays || !goes) return;
    setFault(null);
    merge.mutate(
      {
        movementId: stays.movement.id,
        duplicateId: goes.movement.id,
        version: stays.movement.version,
        duplicateVersion: goes.movement.version,
      },
      {
        onSuccess: (kept) => onMerged(kept.id, goes.movement.name),
        onError: (error) => {
          setFault(sentenceOf(error));
          for (const id of ids) void queries.invalidateQueries({ queryKey: movementQuery(team, id).queryKey });
        },
      },
    );
  };

  return (
    <Dialog
      open
      onClose={onClose}
      size="wide"
      title="Which one stays?"
      actions={
        <>
          <Button data-first-focus onClick={onClose}>
            Leave both
          </Button>
          {stays && (
            <Button look="danger" busy={merge.isPending ? 'Merging' : undefined} onClick={submit}>
              Merge into “{stays.movement.name}”
            </Button>
          )}
        </>
      }
    >
      {failed ? (
        <ErrorPanel
          title="One of the two did not arrive."
          message={failed.error?.message ?? ''}
          onRetry={() => void failed.refetch()}
        />
      ) : !pair ? (
        <SkeletonRows label="The two movements" />
      ) : isOne ? (
        <p>These two are one movement already: “{pair[0].movement.name}”.</p>
      ) : (
        <>
          <fieldset>
            <legend className="sr-only">Which one stays</legend>
            <div className="grid gap-3 sm:grid-cols-2">
              {pair.map((page) => (
                <MergeSide
                  key={page.movement.id}
                  page={page}
                  kit={kit}
                  state={page === stays ? 'stays' : 'goes'}
                  onChoose={() => setChoice(page.movement.id)}
                />
              ))}
            </div>
          </fieldset>
          {stays && goes && (
            <div className={clsx('mt-4 border-l-4 border-danger bg-ground px-3 py-2 text-sm')}>
              <p>
                <strong>
                  “{goes.movement.name}” becomes another name of “{stays.movement.name}”.
                </strong>{' '}
                Its chapters, plan lines, cues and substitutions move over, and so do its cautions. Points, faults, kit,
                pattern and picture stay as “{stays.movement.name}” has them. Old links lead to “{stays.movement.name}”.
              </p>
              <p className="mt-1 font-bold">This can’t be undone.</p>
            </div>
          )}
          <div className="mt-3">
            <FormFault>{fault}</FormFault>
          </div>
        </>
      )}
    </Dialog>
  );
}

/** The one with more to see is offered as the one that stays. */
const shownMore = (pair: readonly [MovementPage, MovementPage]): MovementPage =>
  pair[1].moments.length > pair[0].moments.length ? pair[1] : pair[0];

function sentenceOf(error: Error): string {
  if (!(error instanceof ApiError)) return 'Something broke on this page. Nothing was merged.';
  if (error.code === 'stale')
    return 'Nothing was merged: somebody changed one of the two meanwhile. Above is how they are now; look again.';
  return Object.values(error.fields)[0] ?? error.message;
}
