import { clsx } from 'clsx';
import type { Watch } from '../../../shared/contracts/watch';
import { cuesAround } from '../../../shared/domain/chapters/chapterAt';
import { formatMs } from '../../../shared/domain/timecode';
import { Section } from '../../components/PageTitle';
import { type Playhead, useAtPlayhead } from '../../lib/playhead';
import type { Moves } from './moves';

type Props = { playhead: Playhead; moves: Moves; cues: Watch['cues'] };

const said = { 'set-up': 'Before you start', go: null, safety: 'To stay safe' } as const;

/** The coaching cues of the chapter that plays; the one that is meant now has the yellow edge. A press goes to its moment. */
export function CueList({ playhead, moves, cues }: Props) {
  const nowId = useAtPlayhead(playhead, (ms) => cuesAround(cues, ms).at(-1)?.id);
  if (cues.length === 0) return null;
  return (
    <Section title="Cues" place="aside">
      <ul>
        {cues.map(({ id, atMs, kind, text }) => (
          <li key={id}>
            <button
              type="button"
              aria-current={id === nowId ? 'true' : undefined}
              className={clsx(
                'flex min-h-12 w-full items-baseline gap-4 border-l-4 py-2.5 ps-3 text-start hover:bg-surface focus-visible:outline-offset-[-3px]',
                id === nowId ? 'cue-now font-bold' : 'border-line',
              )}
              onClick={() => moves.to(atMs)}
            >
              <span className="w-10 flex-none text-sm font-bold text-ink2">{formatMs(atMs)}</span>
              <span className="min-w-0 wrap-anywhere">
                {said[kind] && <span className="block text-sm font-normal text-ink2">{said[kind]}</span>}
                {text}
              </span>
            </button>
          </li>
        ))}
      </ul>
    </Section>
  );
}
