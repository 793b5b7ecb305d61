import type { ReactNode } from 'react';
import type { Recording } from '../../../shared/contracts/recordings';
import { Button } from '../../components/Button';
import { Progress } from '../../components/Progress';
import { useRetryMaking } from './api';
import { makingOf, notMadeOf } from './makingWords';

type Props = { team: string; recording: Recording; upload: ReactNode };

/** How far a recording is, or why it stopped and what to do about it. A recording that simply plays says nothing. */
export function RecordingState({ team, recording, upload }: Props) {
  const { state, failure } = recording;
  if (state === 'uploading') return upload;
  if (state === 'failed')
    return (
      <Broken
        team={team}
        recording={recording}
        sentence={failure?.message ?? 'This recording cannot be shown.'}
        retry={failure?.retry ?? false}
      />
    );
  const making = makingOf(recording);
  const notMade = notMadeOf(recording);
  return (
    <>
      {making && <Progress {...making} />}
      {notMade && <Broken team={team} recording={recording} sentence={notMade} retry />}
    </>
  );
}

type BrokenProps = { team: string; recording: Recording; sentence: string; retry: boolean };

function Broken({ team, recording, sentence, retry }: BrokenProps) {
  const again = useRetryMaking(team);
  return (
    <div className="border-l-4 border-danger ps-3 text-sm">
      <p className="font-bold text-danger">{sentence}</p>
      {retry ? (
        <Button
          size="small"
          className="mt-1.5"
          busy={again.isPending ? 'Asking for it' : undefined}
          onClick={() => again.mutate(recording.id)}
          aria-label={`Try again: ${recording.title}`}
        >
          Try again
        </Button>
      ) : (
        <p className="text-ink2">
          Another try with the same file cannot help. Remove this one when the new one is there.
        </p>
      )}
      {again.error && (
        <p role="alert" className="mt-1 font-bold text-danger">
          {again.error.message}
        </p>
      )}
    </div>
  );
}
