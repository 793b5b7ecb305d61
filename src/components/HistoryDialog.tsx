import { useState } from 'react';
import type { SavedVersion } from '../../shared/contracts/marks';
import { formatAgo, formatCount, formatInstant } from '../lib/format';
import { Button } from './Button';
import { ConfirmDialog } from './ConfirmDialog';
import { Dialog } from './Dialog';
import { ErrorPanel } from './ErrorPanel';
import { SkeletonRows } from './Skeleton';

type Props = {
  open: boolean;
  onClose: () => void;
  /** “chapter”, “chapters” */
  one: string;
  many: string;
  versions: readonly SavedVersion[] | undefined;
  error?: { message: string } | null;
  onRetry: () => void;
  /** the version that is shown now */
  current: number;
  /** brings a version back; a sentence when it did not work */
  onRestore: (version: number) => Promise<string | null>;
};

const zone = Intl.DateTimeFormat().resolvedOptions().timeZone;

/** Every saved version with its author; one that is brought back becomes the newest, so that nothing is lost by it. */
export function HistoryDialog(props: Props) {
  const { open, onClose, one, many, versions, error, onRetry, current, onRestore } = props;
  const [asked, setAsked] = useState<SavedVersion | null>(null);
  const [busy, setBusy] = useState<string>();
  const [fault, setFault] = useState<string | null>(null);
  const restore = async () => {
    if (!asked) return;
    setBusy('Bringing it back');
    const reason = await onRestore(asked.version);
    setBusy(undefined);
    setFault(reason);
    if (reason !== null) return;
    setAsked(null);
    onClose();
  };
  return (
    <Dialog open={open} onClose={onClose} size="wide" title={`Versions of the ${many}`}>
      {error ? (
        <ErrorPanel title="The versions did not arrive." message={error.message} onRetry={onRetry} />
      ) : !versions ? (
        <SkeletonRows label="Versions" />
      ) : versions.length === 0 ? (
        <p className="text-ink2">Nothing was saved yet. From the first save on, every version is kept here.</p>
      ) : (
        <ol>
          {versions.map((saved) => (
            <li key={saved.version} className="flex flex-wrap items-center gap-x-4 gap-y-1 border-b border-line py-2.5">
              <div className="min-w-0 grow basis-60">
                <div className="font-extrabold">
                  {howOf(saved)}
                  {saved.version === current && <span className="font-bold text-good"> · shown now</span>}
                </div>
                <div className="text-sm text-ink2">
                  {saved.author ?? 'Tapeline'} · {formatInstant(saved.at, zone)} · {formatAgo(saved.at)}
                </div>
                <div className="text-sm text-ink2">
                  {formatCount(saved.count, one, many)}
                  {changesOf(saved)}
                </div>
              </div>
              {saved.version !== current && (
                <Button size="small" onClick={() => setAsked(saved)}>
                  Bring back<span className="sr-only"> version {saved.version}</span>
                </Button>
              )}
            </li>
          ))}
        </ol>
      )}
      <ConfirmDialog
        open={asked !== null}
        title={`Bring version ${asked?.version} back?`}
        confirm="Bring it back"
        busy={busy}
        error={fault}
        onConfirm={() => void restore()}
        onClose={() => {
          setAsked(null);
          setFault(null);
        }}
      >
        The present {many} stay in the history, so this can be taken back the same way.
      </ConfirmDialog>
    </Dialog>
  );
}

function howOf({ version, how, origin }: SavedVersion): string {
  if (how === 'import') return `Version ${version}, from ${origin ? `the file “${origin}”` : 'a file'}`;
  if (how === 'restore')
    return `Version ${version}, ${origin ? `version ${origin} brought back` : 'an earlier one brought back'}`;
  if (how === 'made') return `Version ${version}, made with the recording`;
  return `Version ${version}`;
}

function changesOf({ added, removed, changed }: SavedVersion): string {
  const parts = [
    added > 0 && `${added} added`,
    removed > 0 && `${removed} removed`,
    changed > 0 && `${changed} changed`,
  ].filter(Boolean);
  return parts.length > 0 ? `: ${parts.join(', ')}` : '';
}
