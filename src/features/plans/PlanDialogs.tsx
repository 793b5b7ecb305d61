import { useMemo, useState } from 'react';
import { LeaveDialog } from '../../components/LeaveDialog';
import { LeftoverDialog } from '../../components/LeftoverDialog';
import { StaleDialog } from '../../components/StaleDialog';
import { formatDate } from '../../lib/format';
import type { KeptDocument } from '../../lib/keptDocument';
import { useSnapshot } from '../../lib/useDocument';
import type { LeaveQuestion } from '../../lib/useLeaveGuard';
import { blockName } from './blockWords';
import { comparePlans, entriesOf, joinEntries, type PlanEntry } from './comparePlans';
import { movementName } from './planLibrary';
import type { WrittenPlan } from './writtenPlan';

type Props = {
  kept: KeptDocument<WrittenPlan>;
  names: ReadonlyMap<string, string>;
  question: LeaveQuestion | null;
  compare: 'open' | 'closed';
  onClose: () => void;
};

const headWords = { date: 'Day', title: 'Title', aim: 'Aim', note: 'Note' } as const;

/** The questions that a plan can ask: whose version, what was left unsaved, whether to leave. */
export function PlanDialogs({ kept, names, question, compare, onClose }: Props) {
  const { content, base, save, left } = useSnapshot(kept);
  const theirs = useMemo(() => (save.is === 'stale' ? entriesOf(save.theirs.content) : null), [save]);
  const differences = useMemo(
    () => (theirs ? comparePlans(base.content, content, theirs) : []),
    [base.content, content, theirs],
  );
  return (
    <>
      <LeaveDialog question={question} />
      <LeftoverDialog left={left} of="plan" onChoose={(choice) => kept.takeUp(choice)} />
      <StaleDialog
        open={theirs !== null && compare === 'open'}
        onClose={onClose}
        of="plan"
        differences={differences}
        theirs={theirs ?? []}
        note="Taking theirs can be undone here. Keeping yours replaces theirs for good."
        show={(entry) => <EntryText entry={entry} names={names} />}
        onDecide={(choice) => {
          kept.decide(typeof choice === 'object' ? { both: joinEntries(choice.both, content) } : choice);
          onClose();
        }}
      />
    </>
  );
}

function EntryText({ entry, names }: { entry: PlanEntry; names: ReadonlyMap<string, string> }) {
  if (entry.is === 'order') return 'the order of the blocks';
  if (entry.is === 'head')
    return (
      <>
        {headWords[entry.id]}:{' '}
        <b>{(entry.id === 'date' && entry.text ? formatDate(entry.text) : entry.text) || 'none'}</b>
      </>
    );
  const { block } = entry;
  return (
    <>
      <b>{blockName(block)}</b>
      {block.scheme && `, ${block.scheme}`}
      {block.note && <span className="block">{block.note}</span>}
      {block.lines.map((line) => (
        <span key={line.id} className="block">
          {line.movementId === null ? 'no movement yet' : movementName(names, line.movementId)}, {line.dose}
          {line.note && ` (${line.note})`}
          {line.substitutions.length > 0 &&
            ` · instead: ${line.substitutions
              .map((one) => (one.movementId === null ? '' : `${movementName(names, one.movementId)}, ${one.dose}`))
              .join('; ')}`}
        </span>
      ))}
    </>
  );
}

/** The comparison opens by itself when somebody else was faster, and can be opened again. */
export function useCompare(isStale: boolean) {
  const [open, setOpen] = useState<'open' | 'closed'>('closed');
  const [was, setWas] = useState(isStale);
  if (was !== isStale) {
    setWas(isStale);
    setOpen(isStale ? 'open' : 'closed');
  }
  return [open, setOpen] as const;
}
