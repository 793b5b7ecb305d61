import { useEffect, useMemo, useRef, useState } from 'react';
import { useLocation, useSearchParams } from 'react-router-dom';
import type { Watch } from '../../../shared/contracts/watch';
import { chapterAt } from '../../../shared/domain/chapters/chapterAt';
import { TextLink } from '../../components/TextLink';
import { Playhead, useAtPlayhead } from '../../lib/playhead';
import { teamPath, useMay } from '../../lib/session';
import { useKeepPlace } from './api';
import { CueList } from './CueList';
import { JumpList } from './JumpList';
import { MovementCautions, MovementNotes } from './MovementNotes';
import { movesOf } from './moves';
import { PlayingTitle } from './PlayingTitle';
import { skipAt } from './playRules';
import { Switches } from './Switches';
import { Takes } from './Takes';
import { useCaptionChoice } from './useCaptionChoice';
import { useMediaSession } from './useMediaSession';
import { usePlace } from './usePlace';
import { useSpokenChapter } from './useSpokenChapter';
import { useStretches } from './useStretches';
import { useWakeLock } from './useWakeLock';
import { WatchStage } from './WatchStage';
import './watch.css';
import { whereToStart } from './whereToStart';

/** One recording, watched: the picture, and beside it what is said about what plays. */
export function WatchedRecording({ team, watch }: { team: string; watch: Watch }) {
  const { chapters } = watch;
  const skips = useMemo(() => unseen(watch), [watch]);
  const { playhead, start } = useStart(watch, skips);
  const moves = useMemo(() => movesOf(playhead, chapters, skips), [playhead, chapters, skips]);
  const [loop, setLoop] = useState<'on' | 'off'>('off');
  const [picture, setPicture] = useState<'as filmed' | 'mirrored'>('as filmed');
  const [captions, toggleCaptions] = useCaptionChoice();
  const mayEdit = useMay('readDrafts');

  const playingId = useAtPlayhead(playhead, (ms) => chapterAt(chapters, ms)?.id ?? null);
  const chapter = chapters.find(({ id }) => id === playingId);
  const movement = watch.movements.find(({ id }) => id === chapter?.movementId);
  const cues = useMemo(
    () =>
      watch.cues
        .filter(({ atMs }) => chapterAt(chapters, atMs)?.id === (playingId ?? undefined))
        .toSorted((a, b) => a.atMs - b.atMs),
    [watch.cues, chapters, playingId],
  );

  usePlace(playhead, useKeepPlace(team, watch.recordingId));
  useStretches(playhead, { chapters, skips, loop });
  useWakeLock(playhead);
  useSpokenChapter(playingId, chapter?.title ?? null);
  useMediaSession(
    playhead,
    {
      title: chapter?.title ?? watch.title,
      artist: watch.coach ?? '',
      album: watch.session?.title ?? watch.title,
      pictureUrl: chapter?.pictureUrl ?? watch.posterUrl,
    },
    moves,
  );

  return (
    <div className="watch gap-y-4">
      <div className="watch-main">
        <WatchStage
          team={team}
          watch={watch}
          skips={skips}
          playhead={playhead}
          moves={moves}
          start={start}
          captions={captions}
          picture={picture}
        />
        <div className="watch-switches">
          <Switches
            playhead={playhead}
            loop={loop}
            onLoop={() => setLoop(loop === 'on' ? 'off' : 'on')}
            picture={picture}
            onMirror={() => setPicture(picture === 'mirrored' ? 'as filmed' : 'mirrored')}
            captions={watch.captions.length > 0 ? captions : 'none'}
            onCaptions={toggleCaptions}
          />
        </div>
      </div>
      <div className="watch-side">
        <div className="watch-title">
          <PlayingTitle
            team={team}
            watch={watch}
            chapter={chapter}
            actions={mayEdit && <DeskLinks team={team} recordingId={watch.recordingId} />}
          />
        </div>
        <div className="watch-lists space-y-6">
          {movement && movement.cautions.length > 0 && (
            <div className="space-y-2">
              <MovementCautions movement={movement} />
            </div>
          )}
          <CueList playhead={playhead} moves={moves} cues={cues} />
          <JumpList moves={moves} chapters={chapters} playingId={playingId} />
        </div>
      </div>
      <div className="watch-more space-y-6 pt-2">
        {movement && <MovementNotes team={team} movement={movement} />}
        <Takes team={team} takes={watch.takes} />
      </div>
    </div>
  );
}

function DeskLinks({ team, recordingId }: { team: string; recordingId: string }) {
  return (
    <p className="flex gap-4 text-sm">
      <TextLink to={teamPath(team, 'footage', recordingId)} className="inline-flex min-h-12 items-center">
        Mark chapters
      </TextLink>
      <TextLink to={teamPath(team, 'words', recordingId)} className="inline-flex min-h-12 items-center">
        Correct words
      </TextLink>
    </p>
  );
}

/** What is passed over: asides that the person has no chapter of. Who works on drafts sees them in the list. */
function unseen({ skips, chapters }: Watch): Watch['skips'] {
  return skips.filter((skip) => !chapters.some((c) => c.startMs <= skip.startMs && skip.endMs <= c.endMs));
}

/**
 * A playhead that stands where the address says. A press inside the application plays at once; who opens a link finds
 * the frame, and starts it by hand.
 */
function useStart(watch: Watch, skips: Watch['skips']) {
  const [search] = useSearchParams();
  const { key } = useLocation();
  const wanted = () => {
    const start = whereToStart(search, watch);
    return { ...start, atMs: skipAt(skips, start.atMs)?.endMs ?? start.atMs };
  };
  const [{ playhead, start }] = useState(() => {
    const made = { playhead: new Playhead(), start: wanted() };
    if (made.start.atMs > 0) made.playhead.seekTo(made.start.atMs);
    if (key !== 'default') made.playhead.play();
    return made;
  });
  const seenKey = useRef(key);
  useEffect(() => {
    if (seenKey.current === key) return;
    seenKey.current = key;
    const next = whereToStart(search, { ...watch, placeMs: null });
    if (next.because === 'beginning') return;
    playhead.seekTo(skipAt(skips, next.atMs)?.endMs ?? next.atMs);
    playhead.play();
  }, [key, search, watch, skips, playhead]);
  return { playhead, start };
}
