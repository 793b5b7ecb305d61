import type { Session } from '../../../shared/contracts/sessions';
import { formatMs } from '../../../shared/domain/timecode';
import { MediaRow } from '../../components/MediaRow';
import { Section } from '../../components/PageTitle';
import { TextLink } from '../../components/TextLink';
import { formatCount } from '../../lib/format';
import { teamPath } from '../../lib/session';

type Recording = Session['recordings'][number];

/** The footage of a session, with the ways to mark it and to watch it. */
export function SessionRecordings({ team, session: { id, recordings } }: { team: string; session: Session }) {
  return (
    <Section
      title="Recordings"
      place="aside"
      actions={<TextLink to={`${teamPath(team, 'footage')}?session=${id}`}>Bring footage in</TextLink>}
    >
      {recordings.length === 0 ? (
        <p className="text-sm text-ink2">
          None yet. A file that was filmed on the session’s day finds its session by itself.
        </p>
      ) : (
        <ul>
          {recordings.map((recording) => (
            <MediaRow
              key={recording.id}
              title={recording.title}
              still={{
                src: recording.posterUrl,
                ...(recording.durationMs === null ? {} : { length: formatMs(recording.durationMs) }),
              }}
              notes={[
                `take ${recording.take} · ${stateText(recording)}`,
                <span key="ways" className="flex flex-wrap gap-x-4 pt-1">
                  <TextLink to={teamPath(team, 'footage', recording.id)}>
                    Mark<span className="sr-only"> chapters of {recording.title}</span>
                  </TextLink>
                  {recording.state === 'ready' && (
                    <TextLink to={teamPath(team, 'watch', recording.id)}>
                      Watch<span className="sr-only"> {recording.title}</span>
                    </TextLink>
                  )}
                </span>,
              ]}
            />
          ))}
        </ul>
      )}
    </Section>
  );
}

function stateText({ state, chapterCount }: Recording): string {
  if (state === 'failed') return 'could not be made ready';
  if (state === 'uploading') return 'on its way up';
  if (state !== 'ready') return 'being made ready';
  return chapterCount === 0 ? 'no chapters yet' : formatCount(chapterCount, 'chapter', 'chapters');
}
