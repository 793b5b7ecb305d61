import { type ReadingProfileName, readingProfiles } from '../../../shared/domain/captions/readingProfile';
import { Button } from '../../components/Button';
import { ToggleChip } from '../../components/Chip';
import { Key } from '../../components/Key';
import { keepKeys } from '../../components/keepKeys';
import { SmallSelect } from '../../components/SmallSelect';
import { UndoButtons } from '../../components/UndoButtons';
import { useKeys } from '../../lib/keys';
import type { LineEdits } from './useLineEdits';

type Props = {
  edits: LineEdits;
  /** places of lines to look at */
  faulty: readonly number[];
  follow: 'on' | 'off';
  onFollow: (next: 'on' | 'off') => void;
  profile: ReadingProfileName;
  onProfile: (next: ReadingProfileName) => void;
  canUndo: boolean;
  canRedo: boolean;
};

const profileNames = Object.keys(readingProfiles) as ReadingProfileName[];

/** Over the list of lines: what to look at next, and the keys for the line that one is at. */
export function CaptionTools(props: Props) {
  const { edits, faulty, follow, onFollow, profile, onProfile, canUndo, canRedo } = props;
  const { at } = edits;
  const nextFault = () => {
    const next = faulty.find((place) => place > (at ?? -1)) ?? faulty[0];
    if (next !== undefined) edits.select(next, 'seek');
  };
  const toggle = () => onFollow(follow === 'on' ? 'off' : 'on');
  const before = () => edits.step(-1);
  const after = () => edits.step(1);
  const remove = () => void (at !== null && edits.remove(at));
  useKeys({
    ArrowUp: before,
    ArrowDown: after,
    f: toggle,
    a: () => edits.insert(at),
    ...(faulty.length > 0 ? { n: nextFault } : {}),
    ...(at === null
      ? {}
      : {
          m: () => void edits.join(at),
          s: edits.startHere,
          e: edits.endHere,
          t: () => edits.writeIn(at),
          Delete: remove,
          Escape: edits.close,
        }),
  });
  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: the buttons inside do the work
    <div className="flex flex-wrap items-center gap-2 border-b border-line p-2" onMouseDown={keepKeys}>
      <ToggleChip pressed={follow === 'on'} onClick={toggle}>
        Follow the picture <Key name="f" />
      </ToggleChip>
      <Button size="small" disabled={faulty.length === 0} onClick={nextFault}>
        {faulty.length === 0 ? 'Nothing to mend' : `Next of ${faulty.length} to mend`} <Key name="n" />
      </Button>
      <Button size="small" onClick={() => edits.insert(at)}>
        Add a line <Key name="a" />
      </Button>
      <UndoButtons {...{ canUndo, canRedo }} onUndo={edits.undo} onRedo={edits.redo} />
      <SmallSelect
        label="Reading speed in words a minute, by"
        className="ms-auto"
        value={profile}
        onChange={(event) => onProfile(profileNames.find((name) => name === event.target.value) ?? 'bbc')}
        options={profileNames.map((name) => ({
          value: name,
          label: `${readingProfiles[name].name}, ${readingProfiles[name].wordsPerMinute.value} a min`,
        }))}
      />
    </div>
  );
}
