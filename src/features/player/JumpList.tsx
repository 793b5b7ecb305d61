import { clsx } from 'clsx';
import type { Watch } from '../../../shared/contracts/watch';
import { formatMs, spokenMs } from '../../../shared/domain/timecode';
import { Section } from '../../components/PageTitle';
import { TapeStrip } from '../../components/TapeStrip';
import { notRepeated } from '../../lib/notRepeated';
import type { Moves } from './moves';

type Props = { moves: Moves; chapters: Watch['chapters']; playingId: string | null };

/** Every chapter, one press away; the one that plays stands out. */
export function JumpList({ moves, chapters, playingId }: Props) {
  if (chapters.length === 0)
    return <p className="text-ink2">No chapters are marked here yet; it plays as one piece.</p>;
  return (
    <Section title="In this recording" place="aside">
      <ol>
        {chapters.map(({ id, kind, title, startMs, ...chapter }) => {
          const missingText = notRepeated(chapter.missingText, title);
          return (
            <li key={id} className="-mx-2 border-b border-line">
              <button
                type="button"
                aria-current={id === playingId ? 'true' : undefined}
                aria-label={`${title}, ${kind}${missingText ? `, ${missingText}` : ''}, at ${spokenMs(startMs)}`}
                className={clsx(
                  'flex min-h-12 w-full items-center gap-3 px-2 py-1.5 text-start hover:bg-surface focus-visible:outline-offset-[-3px]',
                  id === playingId && 'bg-surface',
                )}
                onClick={() => moves.show(startMs)}
              >
                <span className="w-10 flex-none text-sm font-bold text-ink2">{formatMs(startMs)}</span>
                <TapeStrip kind={kind} className="w-8.5" />
                <span className="min-w-0 wrap-anywhere">
                  <span className={clsx(id === playingId && 'font-extrabold')}>{title}</span>
                  {missingText && <span className="text-sm text-ink2"> · {missingText}</span>}
                </span>
              </button>
            </li>
          );
        })}
      </ol>
    </Section>
  );
}
