import { type KeyboardEvent, memo, useState } from 'react';
import { IconButton } from '../../components/IconButton';
import { MovementField } from '../../components/MovementField';
import { TextField } from '../../components/TextField';
import { DemoCell } from './DemoCell';
import { DoseField } from './DoseField';
import { InsteadCell } from './InsteadCell';
import { LineSubstitutions } from './LineSubstitutions';
import { movementName, type PlanLibrary } from './planLibrary';
import { Toolbar } from './Toolbar';
import type { PlanEdits } from './usePlanEdits';
import type { WrittenLine } from './writtenPlan';

type Props = {
  line: WrittenLine;
  /** counted from one */
  place: number;
  /** of the whole plan: from a block's edge a line goes on into the block beside it */
  isFirst: boolean;
  isLast: boolean;
  edits: PlanEdits;
  library: PlanLibrary;
};

/** One grid for the lines and for the names of their columns. */
export const lineGrid =
  '@[32rem]:grid-cols-[minmax(0,1.3fr)_minmax(0,1fr)_calc(4*var(--target-small))] @[50rem]:grid-cols-[minmax(9rem,1.2fr)_minmax(8rem,1.1fr)_6.5rem_minmax(7rem,0.9fr)_calc(4*var(--target-small))]';

/** A line of a block: movement and dose to type into, what shows it, what to do instead. Enter goes on to the next. */
export const LineEditor = memo(function LineEditor({ line, place, isFirst, isLast, edits, library }: Props) {
  const { id } = line;
  const [more, setMore] = useState<'open' | 'closed'>('closed');
  const called = line.movementId === null ? `line ${place}` : movementName(library.names, line.movementId);
  const isStarted = line.dose.trim() !== '' || line.substitutions.length > 0;
  const goOn = (event: KeyboardEvent) => {
    if (event.key !== 'Enter' || event.defaultPrevented || event.nativeEvent.isComposing) return;
    if (!(event.target instanceof HTMLInputElement)) return;
    event.preventDefault();
    edits.nextLine(id);
  };
  return (
    <li data-of={id} className="border-b border-line py-2" onKeyDown={goOn}>
      <fieldset
        aria-label={`Line ${place}${line.movementId === null ? '' : `: ${called}`}`}
        className={`grid min-w-0 grid-cols-[minmax(0,1fr)_auto] items-start gap-x-2.5 gap-y-1.5 ${lineGrid} @[32rem]:[&_label]:sr-only @[50rem]:pointer-fine:[&_input]:text-sm`}
      >
        <div data-part="movement" className="col-span-full @[32rem]:col-auto [&_input]:font-extrabold">
          <MovementField
            label="Movement"
            movements={library.movements}
            value={line.movementId}
            placeholder="Type a name"
            error={line.movementId === null && isStarted ? 'Choose a movement.' : undefined}
            onChange={(movement) => edits.chooseMovement(id, movement?.id ?? null)}
            onCreate={(name) => library.add(name, (movement) => edits.chooseMovement(id, movement.id))}
          />
          {more === 'closed' && line.note && <p className="mt-1 text-sm text-ink2 wrap-anywhere">{line.note}</p>}
        </div>
        <div data-part="dose" className="row-start-2 @[32rem]:row-auto">
          <DoseField
            label="Dose"
            value={line.dose}
            empty={line.movementId === null ? 'fine' : 'fault'}
            onChange={(dose) => edits.setLine(id, { dose })}
          />
        </div>
        <div className="col-span-full text-sm @[32rem]:col-span-1 @[32rem]:row-start-2 @[50rem]:row-auto @[50rem]:pt-2.5">
          {line.movementId !== null && (
            <>
              <span className="font-bold @[50rem]:hidden">Demo: </span>
              <DemoCell team={library.team} facts={library.facts.get(line.movementId)} />
            </>
          )}
        </div>
        <div className="col-span-full text-sm @[32rem]:col-span-2 @[32rem]:row-start-2 @[50rem]:col-span-1 @[50rem]:row-auto @[50rem]:pt-2.5">
          <InsteadCell line={line} library={library} />
        </div>
        <Toolbar
          label={`Change ${called}`}
          className="col-start-2 row-start-2 flex self-end @[32rem]:col-start-3 @[32rem]:row-start-1 @[32rem]:mt-0.5 @[32rem]:self-start @[50rem]:col-start-5"
        >
          <IconButton
            icon="chevron"
            label="Move up"
            look="quiet"
            size="small"
            className="rotate-180"
            disabled={isFirst}
            data-part="up"
            onClick={() => edits.moveLine(id, -1)}
          />
          <IconButton
            icon="chevron"
            label="Move down"
            look="quiet"
            size="small"
            disabled={isLast}
            data-part="down"
            onClick={() => edits.moveLine(id, 1)}
          />
          <IconButton
            icon="swap"
            label="Note, and what to do instead"
            look="quiet"
            size="small"
            aria-expanded={more === 'open'}
            onClick={() => setMore(more === 'open' ? 'closed' : 'open')}
          />
          <IconButton
            icon="trash"
            label="Remove the line"
            look="quiet"
            size="small"
            onClick={() => edits.removeLine(id)}
          />
        </Toolbar>
      </fieldset>
      {more === 'open' && (
        <div className="mt-2 grid gap-4 bg-surface p-3">
          <TextField
            label="Note"
            optional
            maxLength={200}
            placeholder="slow on the way down"
            value={line.note}
            onChange={(event) => edits.setLine(id, { note: event.target.value })}
          />
          <div>
            <h4 className="mb-1.5 text-sm font-extrabold">Instead of {called}</h4>
            <LineSubstitutions line={line} edits={edits} library={library} />
          </div>
        </div>
      )}
    </li>
  );
});
