import { limits } from '../../../shared/limits';
import { Button } from '../../components/Button';
import { IconButton } from '../../components/IconButton';
import { MovementField } from '../../components/MovementField';
import { SelectField, TextField } from '../../components/TextField';
import { DoseField } from './DoseField';
import { newSubstitution } from './editPlan';
import { dictionaryWays, lackText } from './lineWays';
import { movementName, type PlanLibrary } from './planLibrary';
import type { PlanEdits } from './usePlanEdits';
import type { WrittenLine, WrittenSubstitution } from './writtenPlan';

type Props = { line: WrittenLine; edits: PlanEdits; library: PlanLibrary };

/** What to do instead of a line, in this session. Without any, members get what the dictionary has. */
export function LineSubstitutions({ line, edits, library }: Props) {
  const facts = line.movementId === null ? undefined : library.facts.get(line.movementId);
  const known = facts ? dictionaryWays(line, facts, () => crypto.randomUUID()) : [];
  const room = limits.substitutionsPerLine - line.substitutions.length;
  const [firstItem] = facts?.movement.kitNeeded[0]?.anyOf ?? [];
  const set = (substitutions: WrittenSubstitution[]) => edits.setLine(line.id, { substitutions });
  return (
    <div className="grid gap-3">
      {line.substitutions.length === 0 && (
        <p className="text-sm text-ink2">
          {known.length > 0
            ? 'Members without the kit get what the dictionary has. Fill it in here to change its dose or its reason for this session.'
            : 'Say what to do when kit, space or ability is missing.'}
        </p>
      )}
      {line.substitutions.map((one, at) => (
        <SubstitutionRow
          key={one.id}
          one={one}
          place={at + 1}
          line={line}
          library={library}
          onChange={(change) =>
            set(line.substitutions.map((other) => (other.id === one.id ? { ...other, ...change } : other)))
          }
          onRemove={() => set(line.substitutions.filter((other) => other.id !== one.id))}
        />
      ))}
      {room > 0 ? (
        <div className="flex flex-wrap gap-2">
          {known.length > 0 && (
            <Button size="small" onClick={() => set([...line.substitutions, ...known.slice(0, room)])}>
              Fill in from the dictionary: {[...new Set(known.map((one) => nameOf(one, library)))].join(', ')}
            </Button>
          )}
          <Button
            size="small"
            look="quiet"
            onClick={() =>
              set([
                ...line.substitutions,
                newSubstitution(crypto.randomUUID(), {
                  missing: firstItem ? 'kit' : 'space',
                  missingKitItemId: firstItem?.kitItemId ?? null,
                }),
              ])
            }
          >
            Add another way
          </Button>
        </div>
      ) : (
        <p className="text-sm text-ink2">A line has at most {limits.substitutionsPerLine} ways to do without.</p>
      )}
    </div>
  );
}

const nameOf = ({ movementId }: WrittenSubstitution, { names }: PlanLibrary) =>
  movementId === null ? '' : movementName(names, movementId);

type RowProps = {
  one: WrittenSubstitution;
  place: number;
  line: WrittenLine;
  library: PlanLibrary;
  onChange: (change: Partial<WrittenSubstitution>) => void;
  onRemove: () => void;
};

function SubstitutionRow({ one, place, line, library, onChange, onRemove }: RowProps) {
  const isSame = one.movementId !== null && one.movementId === line.movementId;
  return (
    <fieldset
      aria-label={`Way ${place} to do without`}
      className="grid min-w-0 gap-2 border-s-4 border-line ps-3 @[34rem]:grid-cols-[minmax(0,1fr)_minmax(0,1fr)_auto] @[48rem]:grid-cols-[10.5rem_minmax(0,1fr)_minmax(0,1fr)_minmax(0,1.2fr)_auto]"
    >
      <SelectField
        label="When missing"
        value={lackValue(one)}
        error={one.missing === 'kit' && one.missingKitItemId === null ? 'Say which kit is missing.' : undefined}
        onChange={(event) => onChange(lackOf(event.target.value))}
      >
        <LackOptions needed={library.facts.get(line.movementId ?? '')?.movement.kitNeeded ?? []} library={library} />
      </SelectField>
      <MovementField
        label="Do instead"
        movements={library.movements}
        value={one.movementId}
        placeholder="Type a name"
        error={
          isSame
            ? 'That is the planned movement itself. Choose another.'
            : one.movementId === null && one.dose
              ? 'Choose a movement.'
              : undefined
        }
        onChange={(movement) => onChange({ movementId: movement?.id ?? null })}
        onCreate={(name) => library.add(name, (movement) => onChange({ movementId: movement.id }))}
      />
      <DoseField
        label="Dose"
        className="@[34rem]:col-start-1 @[48rem]:col-auto"
        value={one.dose}
        empty={one.movementId === null ? 'fine' : 'fault'}
        onChange={(dose) => onChange({ dose })}
      />
      <TextField
        label="Reason"
        optional
        maxLength={200}
        placeholder="keeps the pull"
        value={one.reason}
        onChange={(event) => onChange({ reason: event.target.value })}
      />
      <IconButton
        icon="trash"
        label={`Remove way ${place}`}
        look="quiet"
        className="justify-self-start @[34rem]:col-start-3 @[34rem]:row-start-2 @[34rem]:mt-6 @[48rem]:col-start-5 @[48rem]:row-start-1"
        onClick={onRemove}
      />
    </fieldset>
  );
}

type Need = { anyOf: readonly { kitItemId: string }[] };

/** The kit that the movement needs comes first. */
function LackOptions({ needed, library }: { needed: readonly Need[]; library: PlanLibrary }) {
  const ids = new Set(needed.flatMap(({ anyOf }) => anyOf.map(({ kitItemId }) => kitItemId)));
  const items = [...library.kit.values()];
  const option = ({ id }: { id: string }) => (
    <option key={id} value={id}>
      {lackText({ missing: 'kit', missingKitItemId: id }, library.kit)}
    </option>
  );
  return (
    <>
      <option value="kit" hidden>
        Choose one
      </option>
      {ids.size > 0 && (
        <optgroup label="This movement needs">{items.filter(({ id }) => ids.has(id)).map(option)}</optgroup>
      )}
      <option value="space">little space</option>
      <option value="ability">something easier</option>
      <optgroup label="Other kit">{items.filter(({ id }) => !ids.has(id)).map(option)}</optgroup>
    </>
  );
}

const lackValue = ({ missing, missingKitItemId }: WrittenSubstitution) =>
  missing === 'kit' ? (missingKitItemId ?? 'kit') : missing;

const lackOf = (value: string): Pick<WrittenSubstitution, 'missing' | 'missingKitItemId'> =>
  value === 'space' || value === 'ability'
    ? { missing: value, missingKitItemId: null }
    : { missing: 'kit', missingKitItemId: value };
