import { type FormEvent, useEffect, useRef, useState } from 'react';
import type { Cue } from '../../../shared/domain/chapters/cue';
import { type CueKind, cueKinds } from '../../../shared/domain/words';
import { Button } from '../../components/Button';
import { MovementField, type MovementName } from '../../components/MovementField';
import { SelectField, TextField } from '../../components/TextField';
import { TimeField } from '../../components/TimeField';

export const cueKindNames = {
  'set-up': 'Set-up: before the first repetition',
  go: 'Go: while moving',
  safety: 'Safety',
} as const satisfies Record<CueKind, string>;

type Props = {
  cue: Cue;
  state: 'fresh' | 'pinned';
  movements: readonly MovementName[];
  onAddMovement: (name: string, then: (movement: { id: string; name: string }) => void) => void;
  /** takes the cue, or says why not */
  onSave: (cue: Cue) => string | null;
  onClose: () => void;
  onRemove: () => void;
};

/** A cue, new or changed: pinned when it is sent, so that half a sentence is never shown to members. */
export function CueForm({ cue, state, movements, onAddMovement, onSave, onClose, onRemove }: Props) {
  const [draft, setDraft] = useState(cue);
  const [problem, setProblem] = useState<string | null>(null);
  const text = useRef<HTMLInputElement>(null);
  useEffect(() => text.current?.focus(), []);
  const send = (event: FormEvent) => {
    event.preventDefault();
    setProblem(onSave(draft));
  };
  return (
    <form
      noValidate
      aria-label={state === 'fresh' ? 'New cue' : 'Change the cue'}
      className="grid gap-3 border-b border-line bg-tint p-3"
      onSubmit={send}
      onKeyDown={(event) => {
        if (event.key !== 'Escape' || event.defaultPrevented) return;
        event.stopPropagation();
        onClose();
      }}
    >
      <TextField
        ref={text}
        label="Cue"
        maxLength={140}
        value={draft.text}
        error={problem}
        placeholder="Ribs down before you press"
        onChange={(event) => setDraft({ ...draft, text: event.target.value })}
      />
      <div className="grid grid-cols-[6.5rem_minmax(0,1fr)] gap-3">
        <TimeField label="At" value={draft.atMs} onCommit={(atMs) => setDraft({ ...draft, atMs })} />
        <SelectField
          label="Kind"
          value={draft.kind}
          onChange={(event) =>
            setDraft({ ...draft, kind: cueKinds.find((kind) => kind === event.target.value) ?? 'go' })
          }
          options={cueKinds.map((kind) => ({ value: kind, label: cueKindNames[kind] }))}
        />
      </div>
      <MovementField
        label="Movement"
        optional
        movements={movements}
        value={draft.movementId}
        placeholder="Type a name"
        onChange={(movement) => setDraft({ ...draft, movementId: movement?.id ?? null })}
        onCreate={(name) => onAddMovement(name, ({ id }) => setDraft((now) => ({ ...now, movementId: id })))}
      />
      <div className="flex flex-wrap gap-2">
        <Button type="submit" size="small">
          {state === 'fresh' ? 'Pin it' : 'Done'}
        </Button>
        <Button size="small" look="quiet" onClick={onClose}>
          Leave it
        </Button>
        {state === 'pinned' && (
          <Button size="small" look="danger" className="ms-auto" onClick={onRemove}>
            Delete
          </Button>
        )}
      </div>
    </form>
  );
}
