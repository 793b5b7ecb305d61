import { formatMs } from '../../../shared/domain/timecode';
import { IconButton } from '../../components/IconButton';
import { type Playhead, useAtMs, usePlayState } from '../../lib/playhead';
import type { Moves } from './moves';
import type { useFullScreen } from './useFullScreen';
import { useOwnWindow } from './useOwnWindow';

type Props = {
  playhead: Playhead;
  moves: Moves;
  durationMs: number;
  full: ReturnType<typeof useFullScreen>;
};

/** Under the seek bar: chapter back, play, chapter on; the time; sound and the places where the picture can be. */
export function Transport({ playhead, moves, durationMs, full }: Props) {
  const { sound } = usePlayState(playhead);
  const atMs = useAtMs(playhead, 1000);
  const own = useOwnWindow(playhead);
  return (
    <div className="stage-transport">
      <p className="stage-time">
        <span className="font-extrabold">{formatMs(atMs)}</span>
        <span className="text-ink2"> of {formatMs(durationMs)}</span>
      </p>
      <div className="flex grow items-center md:grow-0">
        <IconButton icon="previous" label="Chapter before" look="quiet" onClick={moves.previous} />
        <PlayButton playhead={playhead} />
        <IconButton icon="next" label="Next chapter" look="quiet" onClick={moves.next} />
      </div>
      <div className="flex items-center">
        <IconButton
          icon={sound === 'on' ? 'sound' : 'mute'}
          label={sound === 'on' ? 'Sound off' : 'Sound on'}
          look="quiet"
          onClick={() => playhead.setSound(sound === 'on' ? 'muted' : 'on')}
        />
        {own.isOffered && (
          <IconButton
            icon="window"
            label="In a window of its own"
            look="quiet"
            className="max-md:hidden"
            onClick={own.toggle}
          />
        )}
        {full.isOffered && (
          <IconButton
            icon={full.isFull ? 'fullOff' : 'full'}
            label={full.isFull ? 'Leave full screen' : 'Full screen'}
            look="quiet"
            onClick={full.toggle}
          />
        )}
      </div>
    </div>
  );
}

/** A component of its own: it changes when the rest does not. */
function PlayButton({ playhead }: { playhead: Playhead }) {
  const { state } = usePlayState(playhead);
  const isGoing = state === 'playing' || state === 'waiting';
  return (
    <IconButton
      icon={isGoing ? 'pause' : 'play'}
      label={isGoing ? 'Pause' : 'Play'}
      className="min-w-16! grow"
      onClick={() => playhead.toggle()}
    />
  );
}
