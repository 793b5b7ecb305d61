import { chapterKinds } from '../../../shared/domain/words';
import { Button } from '../../components/Button';
import { GoButton } from '../../components/GoButton';
import { Key } from '../../components/Key';
import { keepKeys } from '../../components/keepKeys';
import { UndoButtons } from '../../components/UndoButtons';
import { useKeys } from '../../lib/keys';
import { kindKeys } from './chapterNames';
import { nudgeKeys } from './EdgeField';
import type { ChapterEdits } from './useChapterEdits';

type Props = {
  edits: ChapterEdits;
  canUndo: boolean;
  canRedo: boolean;
  /** whether the picture is there to mark by */
  canPlace: boolean;
};

/** What marks chapters at the playhead, and every key of the marking page. */
export function ChapterTools({ edits, canUndo, canRedo, canPlace }: Props) {
  const { selectedId } = edits;
  useKeys({
    ...(canPlace ? { s: edits.startHere, e: edits.endHere, x: edits.splitHere } : {}),
    ArrowUp: edits.selectBefore,
    ArrowDown: edits.selectAfter,
    'Mod+z': edits.undo,
    'Mod+Shift+z': edits.redo,
    ...(selectedId === null
      ? {}
      : {
          m: edits.join,
          Delete: edits.remove,
          t: () => document.getElementById('chapter-title')?.focus(),
          Escape: edits.close,
          [nudgeKeys.start['-100']]: () => edits.nudge('start', -100),
          [nudgeKeys.start['100']]: () => edits.nudge('start', 100),
          [nudgeKeys.end['-100']]: () => edits.nudge('end', -100),
          [nudgeKeys.end['100']]: () => edits.nudge('end', 100),
          ...Object.fromEntries(chapterKinds.map((kind) => [kindKeys[kind], () => edits.setSelected({ kind })])),
        }),
  });
  return (
    <div>
      {/* biome-ignore lint/a11y/useSemanticElements: a fieldset would need a legend that is shown */}
      <div
        role="group"
        aria-label="Mark at the picture’s place"
        className="flex flex-wrap gap-2"
        onMouseDown={keepKeys}
      >
        <GoButton size="small" disabled={!canPlace} onClick={edits.startHere}>
          Start here <Key name="s" />
        </GoButton>
        <Button size="small" disabled={!canPlace} onClick={edits.endHere}>
          End here <Key name="e" />
        </Button>
        <Button size="small" disabled={!canPlace} onClick={edits.splitHere}>
          Split here <Key name="x" />
        </Button>
        <span className="ms-auto">
          <UndoButtons {...{ canUndo, canRedo }} onUndo={edits.undo} onRedo={edits.redo} />
        </span>
      </div>
      {edits.refused && <p className="mt-2 text-sm font-bold text-danger">{edits.refused}</p>}
      <p className="mt-2 flex flex-wrap items-center gap-x-1.5 gap-y-1 text-sm text-ink2 max-sm:hidden">
        <Key name="ArrowUp" /> <Key name="ArrowDown" /> chapter before, after <span aria-hidden="true">·</span>{' '}
        <Key name="Mod+z" /> undo <span aria-hidden="true">·</span> <Key name="Escape" /> out of a field, then close
      </p>
    </div>
  );
}
