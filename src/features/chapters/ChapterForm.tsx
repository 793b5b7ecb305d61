import type { Chapter } from '../../../shared/domain/chapters/chapter';
import { Button } from '../../components/Button';
import { Key } from '../../components/Key';
import { keepKeys } from '../../components/keepKeys';
import { MovementField } from '../../components/MovementField';
import { SelectField, TextAreaField, TextField } from '../../components/TextField';
import { useTyped } from '../../components/useTyped';
import type { Playhead } from '../../lib/playhead';
import { kindNames, ownName } from './chapterNames';
import { EdgeField } from './EdgeField';
import { KindChoice } from './KindChoice';
import type { Library } from './library';
import { SubstitutionFields } from './SubstitutionFields';
import type { ChapterEdits } from './useChapterEdits';

type Props = {
  chapter: Chapter;
  edits: ChapterEdits;
  library: Library;
  /** names of the session's blocks by id */
  blocks: ReadonlyMap<string, string>;
  playhead: Playhead;
};

/** Everything that can be said about a chapter; every change is taken over at once. */
export function ChapterForm({ chapter, edits, library, blocks, playhead }: Props) {
  const { id } = chapter;
  const title = useTyped(
    chapter.title,
    (text) => edits.set(id, { title: text }),
    () => edits.set(id, { title: ownName(chapter, library.names) }),
  );
  const note = useTyped(chapter.note, (text) => edits.set(id, { note: text }));
  return (
    // biome-ignore lint/a11y/useSemanticElements: a fieldset would need a legend that is shown
    <div role="group" aria-label={`Edit “${chapter.title}”`} className="grid gap-3.5 px-2.5 pt-1 pb-4">
      <div className="grid gap-3.5 @md:grid-cols-2">
        <EdgeField edge="start" chapter={chapter} edits={edits} playhead={playhead} />
        <EdgeField edge="end" chapter={chapter} edits={edits} playhead={playhead} />
      </div>
      <KindChoice kind={chapter.kind} onChange={(kind) => edits.set(id, { kind })} />
      <div className="grid items-end gap-3.5 @md:grid-cols-2">
        <MovementField
          label="Movement"
          optional={chapter.kind !== 'demo' && chapter.kind !== 'substitution'}
          movements={library.movements}
          value={chapter.movementId}
          placeholder="Type a name"
          onChange={(movement) => edits.set(id, { movementId: movement?.id ?? null })}
          onCreate={(name) => library.add(name, (movement) => edits.set(id, { movementId: movement.id }, movement))}
        />
        <TextField
          id="chapter-title"
          label={
            <>
              Title {/* no higher than the label beside it */}
              <span className="-my-1 inline-flex align-middle">
                <Key name="t" />
              </span>
            </>
          }
          maxLength={120}
          value={title.text}
          error={title.problem}
          onChange={(event) => title.type(event.target.value)}
          onBlur={title.leave}
        />
      </div>
      {chapter.kind === 'substitution' && <SubstitutionFields chapter={chapter} edits={edits} library={library} />}
      <div className="grid items-start gap-3.5 @md:grid-cols-2">
        <SelectField
          label="Block of the session"
          hint={library.blocks === null ? 'Link the recording to a session to choose one of its blocks.' : undefined}
          value={chapter.blockId ?? ''}
          onChange={(event) => edits.set(id, { blockId: event.target.value || null })}
        >
          <option value="">None</option>
          {chapter.blockId !== null && !blocks.has(chapter.blockId) && (
            <option value={chapter.blockId}>A block of another session</option>
          )}
          {[...blocks].map(([blockId, name]) => (
            <option key={blockId} value={blockId}>
              {name}
            </option>
          ))}
        </SelectField>
        <TextAreaField
          label="Note"
          optional
          rows={1}
          maxLength={1000}
          value={note.text}
          error={note.problem}
          onChange={(event) => note.type(event.target.value)}
          onBlur={note.leave}
        />
      </div>
      {/* biome-ignore lint/a11y/noStaticElementInteractions: the buttons inside do the work */}
      <div className="flex flex-wrap gap-2" onMouseDown={keepKeys}>
        <Button size="small" onClick={edits.join}>
          Join with the next <Key name="m" />
        </Button>
        <Button size="small" look="danger" onClick={edits.remove}>
          Remove <Key name="Delete" />
        </Button>
      </div>
      {chapter.kind === 'aside' && (
        <p className="text-sm text-ink2">{kindNames.aside}: members neither see this stretch nor find it.</p>
      )}
    </div>
  );
}
