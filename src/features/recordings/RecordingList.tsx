import { useInfiniteQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import type { Recording } from '../../../shared/contracts/recordings';
import { Button } from '../../components/Button';
import { ErrorPanel } from '../../components/ErrorPanel';
import { SkeletonRows } from '../../components/Skeleton';
import { ApiError } from '../../lib/api';
import { recordingsQuery } from './api';
import { RecordingRow } from './RecordingRow';

type Props = {
  team: string;
  /** shown while a recording's file is on its way */
  uploadOf: (recording: Recording) => ReactNode;
  empty: ReactNode;
};

/** All footage, newest first. */
export function RecordingList({ team, uploadOf, empty }: Props) {
  const list = useInfiniteQuery(recordingsQuery(team));
  const recordings = list.data?.pages.flatMap((page) => page.items) ?? [];
  if (list.isPending) return <SkeletonRows label="Recordings" count={5} still="large" />;
  if (list.isError && recordings.length === 0)
    return (
      <ErrorPanel
        title="The recordings did not arrive."
        message={list.error.message}
        requestId={list.error instanceof ApiError ? (list.error.requestId ?? undefined) : undefined}
        busy={list.isFetching ? 'Asking again' : undefined}
        onRetry={() => void list.refetch()}
      />
    );
  if (recordings.length === 0) return empty;
  return (
    <>
      <ul className="border-t border-line">
        {recordings.map((recording) => (
          <RecordingRow key={recording.id} team={team} recording={recording} upload={uploadOf(recording)} />
        ))}
      </ul>
      {list.isFetchNextPageError && (
        <p role="alert" className="mt-3 text-sm font-bold text-danger">
          The next ones did not arrive. {list.error?.message}
        </p>
      )}
      {list.hasNextPage && (
        <Button
          className="mt-4"
          busy={list.isFetchingNextPage ? 'Fetching' : undefined}
          onClick={() => void list.fetchNextPage()}
        >
          More recordings
        </Button>
      )}
    </>
  );
}
