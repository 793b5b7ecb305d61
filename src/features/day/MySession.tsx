import type { MyDay } from '../../../shared/contracts/sessions';
import { formatMs } from '../../../shared/domain/timecode';
import { MediaRow } from '../../components/MediaRow';
import { formatCount, formatList } from '../../lib/format';
import { teamPath } from '../../lib/session';
import { MyBlockView } from './MyBlockView';

type Session = MyDay['sessions'][number];

/** What the member's kit changed, in a sentence. */
export function changedWords(session: Session): string | null {
  if (session.changedLines === 0) return null;
  const lines = formatCount(session.changedLines, 'line', 'lines');
  return session.missingTexts.length > 0 ? `${lines} changed: ${formatList(session.missingTexts)}` : `${lines} changed`;
}

/** One session in the member's own version. */
export function MySession({ team, session }: { team: string; session: Session }) {
  return (
    <div className="space-y-5">
      {session.note && <p className="max-w-prose whitespace-pre-line wrap-anywhere">{session.note}</p>}
      {session.blocks.map((block) => (
        <MyBlockView key={block.id} team={team} block={block} />
      ))}
      {session.aim && (
        <p className="border-t-thin border-line pt-4">
          <strong>{session.aim}</strong>
        </p>
      )}
      {session.recordings.length > 0 && (
        <section aria-label="Recordings" className="border-t-thin border-line pt-4">
          <h2 className="text-md font-extrabold">Watch it whole</h2>
          <ul>
            {session.recordings.map((recording) => (
              <MediaRow
                key={recording.id}
                title={recording.title}
                {...(recording.state === 'ready' ? { to: teamPath(team, 'watch', recording.id) } : {})}
                still={{
                  src: recording.posterUrl,
                  ...(recording.durationMs ? { length: formatMs(recording.durationMs) } : {}),
                }}
                notes={[
                  recording.state === 'ready'
                    ? formatCount(recording.chapterCount, 'chapter', 'chapters')
                    : 'Being made',
                ]}
              />
            ))}
          </ul>
        </section>
      )}
    </div>
  );
}
