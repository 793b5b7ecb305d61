import { useEffect, useMemo, useState } from 'react';
import { FormProvider } from 'react-hook-form';
import { Movement } from '../../../shared/contracts/movements';
import { StaleDialog } from '../../components/StaleDialog';
import { TextButton } from '../../components/TextLink';
import { announce } from '../../lib/announce';
import { ApiError } from '../../lib/api';
import { useUpdateMovement } from './api';
import { compareMovements, entriesOf, fieldNames, linesOf, movementOf } from './compareMovements';
import type { KitById } from './kitWords';
import { MovementFieldset } from './MovementFieldset';
import { fieldsOf, valuesOf } from './movementValues';
import { SaveBar } from './SaveBar';
import { UnsavedGuard } from './UnsavedGuard';
import { useMovementForm } from './useMovementForm';

type Fields = Parameters<ReturnType<typeof useUpdateMovement>['mutate']>[0];

/** A movement as the form would send it, so that two versions compare like with like. */
const written = (movement: Movement) => fieldsOf(valuesOf(movement));

/** Saves with the version that the changes were made on; who was faster is never overwritten unasked. */
export function EditMovement({ team, movement, kit }: { team: string; movement: Movement; kit: KitById }) {
  const [base, setBase] = useState(movement);
  const [theirs, setTheirs] = useState<Movement | null>(null);
  const [comparing, setComparing] = useState(false);
  const [justSaved, setJustSaved] = useState(false);
  const update = useUpdateMovement(team, base.id);
  const { form, element, fault, setFault, isDirty, unsaved, show, refuse, send } = useMovementForm(
    valuesOf(movement),
    (fields) => (theirs ? setComparing(true) : save({ ...fields, version: base.version })),
  );

  function save(change: Fields) {
    setFault(null);
    const sent = JSON.stringify(form.getValues());
    update.mutate(change, {
      onSuccess: (saved) => {
        const now = form.getValues();
        const wroteOn = JSON.stringify(now) !== sent;
        take(saved);
        if (wroteOn) show(now, 'unsaved');
        setJustSaved(!wroteOn);
        announce('Saved');
      },
      onError: (error) => {
        const current = error instanceof ApiError && error.code === 'stale' ? Movement.safeParse(error.current) : null;
        if (!current?.success) return refuse(error);
        setTheirs(current.data);
        setComparing(true);
      },
    });
  }

  /** What the server has is now the ground that changes stand on. */
  function take(saved: Movement) {
    setBase(saved);
    setTheirs(null);
    show(valuesOf(saved), 'saved');
  }

  // somebody else's change arrived while nothing of one's own was at stake
  // biome-ignore lint/correctness/useExhaustiveDependencies: only a new version is a reason
  useEffect(() => {
    if (movement.version > base.version && !isDirty && !update.isPending) take(movement);
  }, [movement.version, isDirty]);

  const differences = useMemo(
    () =>
      theirs && comparing
        ? compareMovements(written(base), fieldsOf(form.getValues()), entriesOf(written(theirs)))
        : [],
    [theirs, comparing, base, form],
  );
  const theirEntries = differences.flatMap((difference) => difference.theirs ?? []);

  return (
    <>
      <FormProvider {...form}>
        <form ref={element} noValidate aria-label="The movement" onSubmit={send} onChange={() => setJustSaved(false)}>
          <MovementFieldset kit={kit} formerName={base.name} />
          <SaveBar
            state={update.isPending ? 'saving' : isDirty ? 'changed' : justSaved ? 'saved' : 'unchanged'}
            fault={fault}
            save="Save"
            saving="Saving"
          >
            {theirs && (
              <p className="text-sm font-bold text-danger">
                Somebody else was faster. <TextButton onClick={() => setComparing(true)}>Compare the two</TextButton>
              </p>
            )}
          </SaveBar>
        </form>
      </FormProvider>
      <UnsavedGuard unsaved={unsaved} />
      {theirs && (
        <StaleDialog
          open={comparing}
          onClose={() => setComparing(false)}
          of="movement"
          note="What you don’t keep is gone; the team’s trail says who changed the movement."
          differences={differences}
          theirs={theirEntries}
          show={(entry) => (
            <>
              <span className="block font-extrabold">{fieldNames[entry.field]}</span>
              {linesOf(entry, kit).map((line) => (
                <span key={line} className="block">
                  {line}
                </span>
              ))}
            </>
          )}
          onDecide={(choice) => {
            const mine = fieldsOf(form.getValues());
            setComparing(false);
            take(theirs);
            if (choice === 'theirs') return;
            const kept = choice === 'mine' ? mine : movementOf(choice.both, written(theirs));
            show(valuesOf(kept), 'unsaved');
            save({ ...kept, version: theirs.version });
          }}
        />
      )}
    </>
  );
}
