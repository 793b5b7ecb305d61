import type { Chapter } from '../../../shared/domain/chapters/chapter';
import { type ChapterEdge, nudgeSteps } from '../../../shared/domain/chapters/editChapters';
import { Button } from '../../components/Button';
import { Key } from '../../components/Key';
import { keepKeys } from '../../components/keepKeys';
import { TimeField } from '../../components/TimeField';
import type { Playhead } from '../../lib/playhead';
import type { ChapterEdits } from './useChapterEdits';

/** Keys for the small nudges: side by side on the keyboard, earlier on the left. */
export const nudgeKeys = {
  start: { '-100': 'g', '100': 'h' },
  end: { '-100': 'b', '100': 'n' },
} as const satisfies Record<ChapterEdge, Record<string, string>>;

type Props = { edge: ChapterEdge; chapter: Chapter; edits: ChapterEdits; playhead: Playhead };

/** One edge of a chapter: its time, typed or nudged or taken from the picture. */
export function EdgeField({ edge, chapter, edits, playhead }: Props) {
  const value = edge === 'start' ? chapter.startMs : chapter.endMs;
  const name = edge === 'start' ? 'Start' : 'End';
  return (
    <div>
      <div className="flex items-start gap-2">
        <TimeField
          label={name}
          value={value}
          className="w-26 flex-none"
          onCommit={(ms) => edits.move(chapter.id, edge, ms)}
        />
        <Button
          size="small"
          // the height of the label, and half of what a field is taller
          className="mt-6.5"
          aria-label={`Set the ${edge} to where the picture is`}
          onClick={() => edits.move(chapter.id, edge, playhead.atMs())}
        >
          Set here
        </Button>
      </div>
      {/* biome-ignore lint/a11y/useSemanticElements: a fieldset would need a legend that is shown */}
      <div role="group" aria-label={`Nudge the ${edge}`} className="mt-1.5 flex flex-wrap gap-1" onMouseDown={keepKeys}>
        {nudgeSteps.map((by) => (
          <Button
            key={by}
            look="quiet"
            size="small"
            className="px-1.5!"
            aria-label={`${name} ${by < 0 ? 'earlier' : 'later'} by ${Math.abs(by) / 1000} s`}
            onClick={() => edits.nudge(edge, by)}
          >
            {by < 0 ? '−' : '+'}
            {Math.abs(by) / 1000}
            {(by === 100 || by === -100) && <Key name={nudgeKeys[edge][by]} />}
          </Button>
        ))}
      </div>
    </div>
  );
}
