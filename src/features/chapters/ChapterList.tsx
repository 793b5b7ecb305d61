import type { Chapter } from '../../../shared/domain/chapters/chapter';
import { chapterAt } from '../../../shared/domain/chapters/chapterAt';
import { EmptyState } from '../../components/EmptyState';
import { Key } from '../../components/Key';
import { type Playhead, useAtPlayhead } from '../../lib/playhead';
import { blockNames } from './blockNames';
import { ChapterForm } from './ChapterForm';
import { ChapterRow, rowColumns } from './ChapterRow';
import type { Library } from './library';
import type { RowFault } from './rowFaults';
import type { ChapterEdits } from './useChapterEdits';

type Props = {
  chapters: readonly Chapter[];
  edits: ChapterEdits;
  faults: ReadonlyMap<string, RowFault[]>;
  playhead: Playhead;
  library: Library;
  canPlace: boolean;
};

/** A recording's chapters in order of time; the chosen one is open for editing. */
export function ChapterList({ chapters, edits, faults, playhead, library, canPlace }: Props) {
  const playingId = useAtPlayhead(playhead, (ms) => chapterAt(chapters, ms)?.id ?? null);
  const blocks = blockNames(library.blocks ?? []);
  if (chapters.length === 0)
    return (
      <div className="px-3">
        <EmptyState title="No chapter yet.">
          {canPlace ? (
            <p>
              Play the recording and press <Key name="s" /> where the first thing worth finding starts. Each new chapter
              ends the one before it.
            </p>
          ) : (
            <p>Chapters can be marked as soon as the recording plays.</p>
          )}
        </EmptyState>
      </div>
    );
  return (
    <div className="@container">
      <div
        aria-hidden="true"
        className={`${rowColumns} border-b border-line px-2.5 py-2 text-xs font-bold text-ink2 @max-md:hidden!`}
      >
        <span>Start</span>
        <span>Length</span>
        <span />
        <span>Shows</span>
        <span>Block</span>
      </div>
      <ol aria-label="Chapters">
        {chapters.map((chapter) => {
          const selected = chapter.id === edits.selectedId;
          return (
            <ChapterRow
              key={chapter.id}
              chapter={chapter}
              state={selected ? 'open' : 'closed'}
              playing={chapter.id === playingId}
              faults={faults.get(chapter.id) ?? []}
              names={library.names}
              kit={library.kit}
              block={chapter.blockId === null ? '' : (blocks.get(chapter.blockId) ?? '')}
              onSelect={() => edits.select(selected ? null : chapter.id, 'seek')}
            >
              {selected && (
                <ChapterForm chapter={chapter} edits={edits} library={library} blocks={blocks} playhead={playhead} />
              )}
            </ChapterRow>
          );
        })}
      </ol>
    </div>
  );
}
