import { useInfiniteQuery } from '@tanstack/react-query';
import { formatMs } from '../../shared/domain/timecode';
import type { RecordingState } from '../../shared/domain/words';
import { Button } from '../components/Button';
import { EmptyState } from '../components/EmptyState';
import { ErrorPanel } from '../components/ErrorPanel';
import { MediaRow } from '../components/MediaRow';
import { PageTitle } from '../components/PageTitle';
import { SkeletonRows } from '../components/Skeleton';
import { TextLink } from '../components/TextLink';
import { recordingsQuery } from '../features/recordings/api';
import { formatCount, formatDate } from '../lib/format';
import { teamPath, useTeam } from '../lib/session';

const stateNotes = {
  uploading: 'still on its way',
  making: 'still being made',
  ready: null,
  failed: 'does not play: see its page',
} as const satisfies Record<RecordingState, string | null>;

/** Whose words are still to be looked at: recordings, newest first. */
export function WordsQueuePage() {
  const { slug } = useTeam();
  const { data, error, refetch, hasNextPage, isFetchingNextPage, fetchNextPage } = useInfiniteQuery(
    recordingsQuery(slug),
  );
  const recordings = data?.pages.flatMap(({ items }) => items) ?? [];
  return (
    <>
      <PageTitle title="Words" meta="Captions and cues of every recording, newest first" />
      <div className="mt-3 max-w-4xl">
        {!data && !error && <SkeletonRows label="Recordings" still="small" />}
        {error && !data && (
          <ErrorPanel title="The recordings did not arrive." message={error.message} onRetry={() => void refetch()} />
        )}
        {data && recordings.length === 0 && (
          <EmptyState title="No recording yet.">
            Captions belong to a recording. <TextLink to={teamPath(slug, 'footage')}>Upload the first one</TextLink>,
            then come back here.
          </EmptyState>
        )}
        <ul className="divide-y divide-line">
          {recordings.map((recording) => (
            <MediaRow
              key={recording.id}
              to={teamPath(slug, 'words', recording.id)}
              title={recording.title}
              still={{
                src: recording.posterUrl,
                ...(recording.durationMs === null ? {} : { length: formatMs(recording.durationMs) }),
              }}
              notes={[
                recording.session
                  ? [formatDate(recording.session.date), recording.session.title, `take ${recording.take}`]
                      .filter((part) => part !== recording.title)
                      .join(' · ')
                  : `take ${recording.take} · not linked to a session`,
                stateNotes[recording.state],
              ]}
              figure={
                recording.captionLineCount === 0 ? (
                  <span className="text-sm font-bold whitespace-normal text-danger">
                    no captions yet:
                    <br />
                    import a file
                  </span>
                ) : (
                  <span className="text-sm">{formatCount(recording.captionLineCount, 'line', 'lines')}</span>
                )
              }
            />
          ))}
        </ul>
        {hasNextPage && (
          <Button
            className="mt-4"
            busy={isFetchingNextPage ? 'On the way' : undefined}
            onClick={() => void fetchNextPage()}
          >
            More
          </Button>
        )}
      </div>
    </>
  );
}
