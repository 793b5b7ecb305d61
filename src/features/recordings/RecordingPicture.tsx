import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import type { Recording } from '../../../shared/contracts/recordings';
import { ErrorPanel } from '../../components/ErrorPanel';
import { Skeleton } from '../../components/Skeleton';
import { Still } from '../../components/Still';
import { VideoPlayer } from '../../components/VideoPlayer';
import type { Playhead } from '../../lib/playhead';
import { pictureQuery } from './pictureQuery';
import { RecordingState } from './RecordingState';

type Props = {
  team: string;
  recording: Recording;
  playhead: Playhead;
  /** how far the file is while it is on its way */
  upload: ReactNode;
  /** laid over the picture */
  children?: ReactNode;
};

/** A recording's picture on the desk; while there is none, how far it is. */
export function RecordingPicture({ team, recording, playhead, upload, children }: Props) {
  const ready = recording.state === 'ready';
  const { data, error, refetch, isFetching } = useQuery({ ...pictureQuery(team, recording.id), enabled: ready });
  if (!ready)
    return (
      <div>
        <Still src={recording.posterUrl} className="w-full" loading="eager" />
        <div className="mt-3">
          <RecordingState team={team} recording={recording} upload={upload} />
          <p className="mt-2 text-sm text-ink2">What was written already can be read and changed.</p>
        </div>
      </div>
    );
  if (data)
    return (
      <VideoPlayer
        playhead={playhead}
        source={data.playback}
        posterUrl={data.posterUrl}
        fps={data.fps}
        label={`${data.title}, take ${data.take}`}
        onExpired={() => void refetch()}
      >
        {children}
      </VideoPlayer>
    );
  if (error)
    return (
      <ErrorPanel
        title="The picture did not arrive."
        message={error.message}
        onRetry={() => void refetch()}
        busy={isFetching ? 'Trying' : undefined}
      />
    );
  return <Skeleton className="aspect-video w-full" />;
}
