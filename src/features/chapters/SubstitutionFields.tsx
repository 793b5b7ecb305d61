import type { Chapter } from '../../../shared/domain/chapters/chapter';
import { type MissingThing, missingThings } from '../../../shared/domain/words';
import { MovementField } from '../../components/MovementField';
import { SelectField } from '../../components/TextField';
import type { Library } from './library';
import type { ChapterEdits } from './useChapterEdits';

const missingNames = {
  kit: 'Kit',
  space: 'Space',
  ability: 'Ability: it is easier',
} as const satisfies Record<MissingThing, string>;

/** What leads a member from a line of the plan to this chapter. */
export function SubstitutionFields({
  chapter,
  edits,
  library,
}: {
  chapter: Chapter;
  edits: ChapterEdits;
  library: Library;
}) {
  const { id } = chapter;
  return (
    <div className="grid gap-3.5 @md:grid-cols-2">
      <MovementField
        label="Stands in for"
        className="@md:col-span-2"
        movements={library.movements}
        value={chapter.standsInForMovementId}
        placeholder="Type a name"
        onChange={(movement) => edits.set(id, { standsInForMovementId: movement?.id ?? null })}
        onCreate={(name) => library.add(name, (movement) => edits.set(id, { standsInForMovementId: movement.id }))}
      />
      <SelectField
        label="Does without"
        value={chapter.missing ?? ''}
        onChange={(event) =>
          edits.set(id, { missing: missingThings.find((thing) => thing === event.target.value) ?? null })
        }
      >
        <option value="">Not said yet</option>
        {missingThings.map((thing) => (
          <option key={thing} value={thing}>
            {missingNames[thing]}
          </option>
        ))}
      </SelectField>
      {chapter.missing === 'kit' && (
        <SelectField
          label="Which kit"
          value={chapter.missingKitItemId ?? ''}
          onChange={(event) => edits.set(id, { missingKitItemId: event.target.value || null })}
        >
          <option value="">Not said yet</option>
          {library.kit.map((item) => (
            <option key={item.id} value={item.id}>
              {item.name}
            </option>
          ))}
        </SelectField>
      )}
    </div>
  );
}
