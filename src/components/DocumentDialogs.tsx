import { type UseQueryOptions, useQuery } from '@tanstack/react-query';
import { type ReactNode, useMemo } from 'react';
import type { SavedVersion } from '../../shared/contracts/marks';
import { ApiError } from '../lib/api';
import type { KeptDocument, Saved } from '../lib/keptDocument';
import type { Difference } from '../lib/mergeVersions';
import { type OpenDialog, useSnapshot } from '../lib/useDocument';
import { HistoryDialog } from './HistoryDialog';
import { LeftoverDialog } from './LeftoverDialog';
import { StaleDialog } from './StaleDialog';

// biome-ignore lint/suspicious/noExplicitAny: the key of whichever document it is
type Versions = UseQueryOptions<SavedVersion[], Error, SavedVersion[], any>;

type Props<Item> = {
  kept: KeptDocument<readonly Item[]>;
  /** “chapter”, “chapters” */
  one: string;
  many: string;
  open: OpenDialog;
  onClose: () => void;
  versions: Versions;
  /** @throws ApiError */
  restore: (restore: number, version: number) => Promise<Saved<readonly Item[]>>;
  compare: (base: readonly Item[], mine: readonly Item[], theirs: readonly Item[]) => readonly Difference<Item>[];
  /** puts what was merged in order */
  order: (items: Item[]) => Item[];
  /** an entry in a line or two */
  show: (item: Item) => ReactNode;
};

/** The questions that a document can ask: what was left unsaved, whose version, which earlier one. */
export function DocumentDialogs<Item>(props: Props<Item>) {
  const { kept, one, many, open, onClose, restore, compare, order, show } = props;
  const { content, base, save, left } = useSnapshot(kept);
  const versions = useQuery({ ...props.versions, enabled: open === 'history' });
  const theirs = save.is === 'stale' ? save.theirs : null;
  const differences = useMemo(
    () => (theirs ? compare(base.content, content, theirs.content) : []),
    [theirs, base.content, content, compare],
  );
  const bringBack = async (version: number) => {
    if (!(await kept.flush()))
      return 'Your last changes are not saved yet. Save them first, so that they are kept too.';
    try {
      kept.adopt(await restore(version, kept.current().base.version));
      return null;
    } catch (error) {
      if (error instanceof ApiError) return Object.values(error.fields)[0] ?? error.message;
      throw error;
    }
  };
  return (
    <>
      <LeftoverDialog left={left} of={many} onChoose={(choice) => kept.takeUp(choice)} />
      <StaleDialog
        open={theirs !== null && open === 'compare'}
        onClose={onClose}
        of={many}
        differences={differences}
        theirs={theirs?.content ?? []}
        show={show}
        onDecide={(choice) => {
          kept.decide(typeof choice === 'object' ? { both: order(choice.both) } : choice);
          onClose();
        }}
      />
      <HistoryDialog
        open={open === 'history'}
        onClose={onClose}
        one={one}
        many={many}
        versions={versions.data}
        error={versions.error}
        onRetry={() => void versions.refetch()}
        current={base.version}
        onRestore={bringBack}
      />
    </>
  );
}
