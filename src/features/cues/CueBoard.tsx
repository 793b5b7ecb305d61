import { clsx } from 'clsx';
import { useState } from 'react';
import { cueShown } from '../../../shared/domain/chapters/chapterAt';
import type { Cue } from '../../../shared/domain/chapters/cue';
import { formatMsWithTenths } from '../../../shared/domain/timecode';
import { Button } from '../../components/Button';
import { IconButton } from '../../components/IconButton';
import { Key } from '../../components/Key';
import { keepKeys } from '../../components/keepKeys';
import type { MovementName } from '../../components/MovementField';
import { Section } from '../../components/PageTitle';
import { SaveState } from '../../components/SaveState';
import { UndoButtons } from '../../components/UndoButtons';
import { announce } from '../../lib/announce';
import type { KeptDocument } from '../../lib/keptDocument';
import { useKeys } from '../../lib/keys';
import { type Playhead, useAtPlayhead } from '../../lib/playhead';
import { useDocumentDialog, useSnapshot } from '../../lib/useDocument';
import type { CueList } from './api';
import { CueDialogs } from './CueDialogs';
import { CueForm } from './CueForm';
import { cueFromLine, putCue, removeCue } from './editCues';

type Props = {
  team: string;
  recordingId: string;
  kept: KeptDocument<CueList>;
  playhead: Playhead;
  movements: readonly MovementName[];
  names: ReadonlyMap<string, string>;
  onAddMovement: (name: string, then: (movement: { id: string; name: string }) => void) => void;
  /** what is said and shown at a time: a new cue starts from it */
  momentAt: (ms: number) => { text: string; movementId: string | null };
  canPin: boolean;
};

/** The coaching cues of a recording, in order of time, and the way to pin another at the picture's place. */
export function CueBoard(props: Props) {
  const { team, recordingId, kept, playhead, movements, names, onAddMovement, momentAt, canPin } = props;
  const { content: cues, save, canUndo, canRedo } = useSnapshot(kept);
  const [dialog, setDialog] = useDocumentDialog(save);
  const [open, setOpen] = useState<{ cue: Cue; state: 'fresh' | 'pinned' } | null>(null);
  const shown = useAtPlayhead(playhead, (ms) =>
    cues
      .filter(({ atMs }) => atMs - cueShown.beforeMs <= ms && ms < atMs + cueShown.afterMs)
      .map(({ id }) => id)
      .join(' '),
  );

  const pin = () => {
    playhead.pause();
    const atMs = Math.round(playhead.atMs());
    const { text, movementId } = momentAt(atMs);
    setOpen({
      cue: { id: crypto.randomUUID(), atMs, kind: 'go', text: cueFromLine(text), movementId },
      state: 'fresh',
    });
  };
  useKeys(canPin ? { c: pin } : {});
  const take = (cue: Cue): string | null => {
    const edit = putCue(kept.current().content, cue);
    if ('refused' in edit) return edit.refused;
    kept.change(edit.cues);
    announce('Cue pinned');
    setOpen(null);
    return null;
  };
  const form = open && (
    <CueForm
      key={open.cue.id}
      cue={open.cue}
      state={open.state}
      movements={movements}
      onAddMovement={onAddMovement}
      onSave={take}
      onClose={() => setOpen(null)}
      onRemove={() => {
        kept.change(removeCue(kept.current().content, open.cue.id));
        announce('Cue deleted. Undo brings it back');
        setOpen(null);
      }}
    />
  );

  return (
    <Section
      title="Cues"
      place="aside"
      actions={
        <>
          {(cues.length > 0 || save.is !== 'saved') && (
            <SaveState
              state={save}
              of="Cues"
              onRetry={() => void kept.flush()}
              onCompare={() => setDialog('compare')}
            />
          )}
          <UndoButtons {...{ canUndo, canRedo }} keys="hidden" onUndo={() => kept.undo()} onRedo={() => kept.redo()} />
          <IconButton
            icon="clock"
            label="Versions of the cues"
            look="quiet"
            size="small"
            onClick={() => setDialog('history')}
          />
        </>
      }
    >
      {cues.length === 0 && !open && (
        <p className="border-b border-line py-2.5 text-sm text-ink2">
          No cue yet. A cue is one short point that members read beside the picture at its moment.
        </p>
      )}
      {open?.state === 'fresh' && form}
      <ul>
        {cues.map((cue) => (
          <li key={cue.id}>
            {open?.state === 'pinned' && open.cue.id === cue.id ? (
              form
            ) : (
              <CueRow
                cue={cue}
                movement={cue.movementId === null ? undefined : names.get(cue.movementId)}
                state={shown.split(' ').includes(cue.id) ? 'shown' : 'plain'}
                onPlay={() => playhead.seekTo(cue.atMs)}
                onChange={() => setOpen({ cue, state: 'pinned' })}
              />
            )}
          </li>
        ))}
      </ul>
      {/* biome-ignore lint/a11y/noStaticElementInteractions: the button inside does the work */}
      <div className="mt-2.5" onMouseDown={keepKeys}>
        <Button size="small" disabled={!canPin} onClick={pin}>
          Pin what is said here as a cue <Key name="c" />
        </Button>
      </div>
      <CueDialogs {...{ team, recordingId, kept, names }} open={dialog} onClose={() => setDialog('none')} />
    </Section>
  );
}

type RowProps = {
  cue: Cue;
  movement: string | undefined;
  /** `shown` while members see it beside the picture */
  state: 'plain' | 'shown';
  onPlay: () => void;
  onChange: () => void;
};

function CueRow({ cue, movement, state, onPlay, onChange }: RowProps) {
  return (
    <div
      className={clsx(
        'grid grid-cols-[3.5rem_4rem_minmax(0,1fr)_auto] items-center gap-x-2 border-b border-line text-sm',
        state === 'shown' && 'bg-tint',
      )}
    >
      <span className={clsx('font-bold', cue.kind === 'safety' ? 'text-danger' : 'text-ink2')}>{cue.kind}</span>
      <button
        type="button"
        aria-label={`Show ${formatMsWithTenths(cue.atMs)}`}
        className="min-h-targetSmall rounded px-1 text-start text-ink2 hover:bg-raised"
        onMouseDown={keepKeys}
        onClick={onPlay}
      >
        {formatMsWithTenths(cue.atMs)}
      </button>
      <span className="min-w-0 py-2 wrap-anywhere">
        <b>{cue.text}</b>
        {movement && <span className="block text-ink2">{movement}</span>}
      </span>
      <IconButton icon="edit" label={`Change “${cue.text}”`} look="quiet" size="small" onClick={onChange} />
    </div>
  );
}
