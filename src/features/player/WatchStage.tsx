import { type CSSProperties, useRef } from 'react';
import { exportCaptions } from '../../../shared/contracts/marks';
import type { Watch } from '../../../shared/contracts/watch';
import { VideoPlayer } from '../../components/VideoPlayer';
import { addressOf } from '../../lib/api';
import type { Playhead } from '../../lib/playhead';
import type { Moves } from './moves';
import { PictureNotes } from './PictureNotes';
import { PictureSurface } from './PictureSurface';
import { SeekBar } from './SeekBar';
import { Transport } from './Transport';
import { useControls } from './useControls';
import { useFullScreen } from './useFullScreen';
import { usePictureAddress } from './usePictureAddress';
import { usePlayerKeys } from './usePlayerKeys';
import type { Start } from './whereToStart';

type Props = {
  team: string;
  watch: Watch;
  skips: Watch['skips'];
  playhead: Playhead;
  moves: Moves;
  start: Start;
  captions: 'shown' | 'hidden';
  picture: 'as filmed' | 'mirrored';
};

/** The picture with its seek bar; what full screen shows. */
export function WatchStage({ team, watch, skips, playhead, moves, start, captions, picture }: Props) {
  const stage = useRef<HTMLElement>(null);
  const full = useFullScreen(stage, playhead);
  const { source, onExpired } = usePictureAddress(team, watch);
  const [controls, touch] = useControls(playhead, full.isFull ? 'full' : 'page');
  const onKeyDown = usePlayerKeys(playhead, moves);
  const { recordingId, durationMs, chapters } = watch;
  return (
    <section
      ref={stage}
      aria-label="Player"
      className="stage"
      data-controls={controls}
      // an upright picture stands in the middle of a lying one's place
      style={{ '--shape': Math.max(16 / 9, watch.width / watch.height) } as CSSProperties}
      onKeyDown={(event) => {
        touch();
        onKeyDown(event);
      }}
      onPointerMove={touch}
      onPointerDown={touch}
      onFocus={touch}
    >
      <VideoPlayer
        playhead={playhead}
        source={source}
        posterUrl={watch.posterUrl}
        fps={watch.fps}
        shape={watch}
        label={`Picture: ${watch.title}`}
        captionsUrl={watch.captions.length > 0 ? addressOf(exportCaptions, { team, recordingId }) : null}
        captions={captions}
        picture={picture}
        onExpired={onExpired}
      >
        <PictureSurface playhead={playhead} moves={moves} />
        <PictureNotes playhead={playhead} moves={moves} start={start} />
      </VideoPlayer>
      <div className="stage-controls">
        <SeekBar playhead={playhead} moves={moves} chapters={chapters} skips={skips} durationMs={durationMs} />
        <Transport playhead={playhead} moves={moves} durationMs={durationMs} full={full} />
      </div>
    </section>
  );
}
