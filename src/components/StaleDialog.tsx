import { clsx } from 'clsx';
import { type ReactNode, useState } from 'react';
import { type Difference, mergeVersions, type Side } from '../lib/mergeVersions';
import { Button } from './Button';
import { Dialog } from './Dialog';
import { GoButton } from './GoButton';

type Props<Item> = {
  open: boolean;
  onClose: () => void;
  /** “chapters” */
  of: string;
  differences: readonly Difference<Item>[];
  theirs: readonly Item[];
  /** what becomes of the version that is not kept, where no history keeps it */
  note?: string;
  /** an entry in a line or two */
  show: (item: Item) => ReactNode;
  onDecide: (choice: 'theirs' | 'mine' | { both: Item[] }) => void;
};

/** Enough to decide by; the rest is counted. */
const shownAtOnce = 60;

const keptInHistory = 'Their version stays in the history whatever you choose; taking theirs can be undone here.';

/** Two people saved: what I changed beside what they changed, and the three ways on. */
export function StaleDialog<Item>(props: Props<Item>) {
  const { open, onClose, of, differences, theirs, note = keptInHistory, show, onDecide } = props;
  const [chosen, setChosen] = useState<(Side | undefined)[]>([]);
  const conflicts = differences.filter(({ conflict }) => conflict).length;
  const open_ = differences.filter(({ conflict }, at) => conflict && !chosen[at]).length;
  const choose = (at: number, side: Side) => setChosen(differences.map((_, i) => (i === at ? side : chosen[i])));
  const shown = differences.map((difference, at) => ({ difference, at }));
  // what needs a decision is never left out
  const first = [...shown.filter((one) => one.difference.conflict), ...shown.filter((one) => !one.difference.conflict)];
  return (
    <Dialog
      open={open}
      onClose={onClose}
      size="wide"
      title={`Somebody else saved the ${of} meanwhile`}
      actions={
        <>
          <Button onClick={() => onDecide('theirs')}>Take theirs</Button>
          <Button onClick={() => onDecide('mine')}>Keep mine</Button>
          <GoButton disabled={open_ > 0} onClick={() => onDecide({ both: mergeVersions(theirs, differences, chosen) })}>
            Keep both changes
          </GoButton>
        </>
      }
    >
      <p className="text-sm">
        {conflicts === 0
          ? 'You changed different things, so both can be kept.'
          : `${conflicts === 1 ? 'One entry was' : `${conflicts} entries were`} changed by both of you: choose a side there to keep the rest of both.`}{' '}
        {note}
      </p>
      <div className="mt-3 grid grid-cols-2 gap-x-3 border-b border-line pb-1 text-xs font-bold text-ink2">
        <span>Yours</span>
        <span>Theirs</span>
      </div>
      <ul>
        {first.slice(0, Math.max(shownAtOnce, conflicts)).map(({ difference, at }) => (
          <li key={at} className={clsx('border-b border-line py-2', difference.conflict && 'bg-tint px-2')}>
            <div className="grid grid-cols-2 gap-x-3 text-sm">
              <SideOf difference={difference} side="mine" show={show} />
              <SideOf difference={difference} side="theirs" show={show} />
            </div>
            {difference.conflict && (
              <fieldset className="mt-1 grid grid-cols-2 gap-x-3 text-sm font-bold">
                <legend className="sr-only">Which one to keep</legend>
                {(['mine', 'theirs'] as const).map((side) => (
                  <label key={side} className="flex min-h-targetSmall items-center gap-2">
                    <input
                      type="radio"
                      name={`side-${at}`}
                      className="size-5 accent-ink"
                      checked={chosen[at] === side}
                      onChange={() => choose(at, side)}
                    />
                    {side === 'mine' ? 'Keep yours' : 'Keep theirs'}
                  </label>
                ))}
              </fieldset>
            )}
          </li>
        ))}
      </ul>
      {differences.length > shownAtOnce && (
        <p className="mt-2 text-sm text-ink2">and {differences.length - Math.max(shownAtOnce, conflicts)} more</p>
      )}
    </Dialog>
  );
}

const words = { same: 'as before', added: 'added', removed: 'removed', changed: 'changed' } as const;

function SideOf<Item>({
  difference,
  side,
  show,
}: {
  difference: Difference<Item>;
  side: Side;
  show: (item: Item) => ReactNode;
}) {
  const change = side === 'mine' ? difference.myChange : difference.theirChange;
  const item = difference[side] ?? difference.base;
  return (
    <div className={clsx('min-w-0 wrap-anywhere', change === 'same' && 'text-ink2')}>
      <div className="text-xs font-bold">{words[change]}</div>
      {item && (change === 'removed' ? <s>{show(item)}</s> : show(item))}
    </div>
  );
}
