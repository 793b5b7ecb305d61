import type { Recording } from '../../../shared/contracts/recordings';
import type { MakingStep } from '../../../shared/domain/words';
import { Button } from '../../components/Button';
import { Progress } from '../../components/Progress';
import { ApiError } from '../../lib/api';
import { useRetryMaking } from './oneRecording';

const stepNames = {
  drawing: 'Drawing the demo recording',
  probe: 'Looking at the file',
  poster: 'Taking a first picture',
  playback: 'Making it playable',
  chapterPictures: 'Taking a picture of each chapter',
} as const satisfies Record<MakingStep, string>;

/** How far a recording is that does not play yet, or why it never will as it is. Nothing once it is ready. */
export function MakingState({ team, recording }: { team: string; recording: Recording }) {
  const retry = useRetryMaking(team);
  const { state, steps, failure } = recording;
  if (state === 'failed')
    return (
      <div role="alert" className="border-l-4 border-danger bg-surface px-4 py-3">
        <p className="font-extrabold">This recording does not play.</p>
        <p>{failure?.message ?? 'Something broke while it was made.'}</p>
        {failure?.retry && (
          <Button
            className="mt-3"
            size="small"
            busy={retry.isPending ? 'Trying' : undefined}
            onClick={() => retry.mutate(recording.id)}
          >
            Try again
          </Button>
        )}
        {retry.error && <p className="mt-2 font-bold text-danger">{sentence(retry.error)}</p>}
      </div>
    );
  if (state === 'ready') return null;
  if (state === 'uploading')
    return <p className="text-ink2">The file is still on its way. It plays here once it has arrived.</p>;
  const step = steps.find((one) => one.state === 'running') ?? steps.find((one) => one.state === 'waiting');
  const done = steps.filter((one) => one.state === 'done').length;
  return (
    <Progress
      label={step ? stepNames[step.step] : 'Waiting for its turn'}
      share={step?.state === 'running' && step.percent > 0 ? step.percent / 100 : null}
      note={`Step ${Math.min(done + 1, Math.max(steps.length, 1))} of ${Math.max(steps.length, 1)}. It plays here as soon as it can; what is written already can be read and changed.`}
    />
  );
}

const sentence = (error: Error) => (error instanceof ApiError ? error.message : 'That did not work. Try again.');
