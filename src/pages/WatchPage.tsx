import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { ErrorPage } from '../components/ErrorPage';
import { ErrorPanel } from '../components/ErrorPanel';
import { GoLink } from '../components/GoButton';
import { PageTitle } from '../components/PageTitle';
import { watchQuery } from '../features/player/api';
import { NotReady } from '../features/player/NotReady';
import { WatchedRecording } from '../features/player/WatchedRecording';
import { WatchSkeleton } from '../features/player/WatchSkeleton';
import { ApiError } from '../lib/api';
import { teamPath, useTeam } from '../lib/session';

export function WatchPage() {
  const { slug } = useTeam();
  const { recordingId = '' } = useParams();
  const { data: watch, error, isFetching, refetch } = useQuery(watchQuery(slug, recordingId));
  if (watch) return <WatchedRecording key={recordingId} team={slug} watch={watch} />;
  if (!error) return <WatchSkeleton />;
  const { code, message, requestId } =
    error instanceof ApiError ? error : { code: 'odd', message: '', requestId: null };
  if (code === 'notReady') return <NotReady team={slug} recordingId={recordingId} message={message} />;
  if (code === 'notFound' || code === 'invalid')
    return (
      <ErrorPage
        title="This recording is not here"
        actions={<GoLink to={teamPath(slug, 'today')}>To today’s session</GoLink>}
      >
        The address is wrong, or its session is not published.
      </ErrorPage>
    );
  return (
    <div className="space-y-4 pt-6">
      <PageTitle title="Watch" />
      <ErrorPanel
        title="The recording did not arrive."
        message={message}
        requestId={requestId ?? undefined}
        busy={isFetching ? 'Trying' : undefined}
        onRetry={() => void refetch()}
      />
    </div>
  );
}
