import { type KeyboardEvent, type PointerEvent, useEffect, useRef, useState } from 'react';
import type { Watch } from '../../../shared/contracts/watch';
import { chapterAt } from '../../../shared/domain/chapters/chapterAt';
import { formatMs } from '../../../shared/domain/timecode';
import { TapeStrip } from '../../components/TapeStrip';
import { type Playhead, useAtMs, useAtPlayhead } from '../../lib/playhead';
import { type Moves, stepMs } from './moves';
import { gapsOf } from './playRules';
import { SeekBubble } from './SeekBubble';
import { useDrag } from './useDrag';

type Props = {
  playhead: Playhead;
  moves: Moves;
  chapters: Watch['chapters'];
  skips: Watch['skips'];
  durationMs: number;
};

const pageMs = 30_000;

/** Source: ARIA Authoring Practices, slider pattern. */
const sliderKeys: Record<string, (moves: Moves) => void> = {
  ArrowRight: (moves) => moves.by(stepMs),
  ArrowUp: (moves) => moves.by(stepMs),
  ArrowLeft: (moves) => moves.by(-stepMs),
  ArrowDown: (moves) => moves.by(-stepMs),
  PageUp: (moves) => moves.by(pageMs),
  PageDown: (moves) => moves.by(-pageMs),
  Home: (moves) => moves.start(),
  End: (moves) => moves.end(),
};

/** The recording as strips of tape: drag, press, or move with a slider's keys. */
export function SeekBar({ playhead, moves, chapters, skips, durationMs }: Props) {
  const bar = useRef<HTMLDivElement>(null);
  const [pointedMs, setPointedMs] = useState<number | null>(null);
  const [focus, setFocus] = useState<'seen' | 'none'>('none');
  const atMs = useAtMs(playhead, 1000);
  const playingId = useAtPlayhead(playhead, (ms) => chapterAt(chapters, ms)?.id);
  const drag = useDrag(playhead, moves);

  const msAt = ({ clientX }: PointerEvent) => {
    const box = bar.current?.getBoundingClientRect();
    if (!box || box.width === 0) return 0;
    return Math.min(1, Math.max(0, (clientX - box.left) / box.width)) * durationMs;
  };
  const press = (event: KeyboardEvent) => {
    const move = sliderKeys[event.key];
    if (!move || event.altKey || event.ctrlKey || event.metaKey) return;
    event.preventDefault();
    setFocus('seen');
    move(moves);
  };

  const shownMs = pointedMs ?? (focus === 'seen' ? atMs : null);
  const shownChapter = shownMs === null ? undefined : chapterAt(chapters, shownMs);
  const title = chapters.find(({ id }) => id === playingId)?.title;
  return (
    <div
      ref={bar}
      className="seek-bar"
      role="slider"
      tabIndex={0}
      aria-label="Place in the recording"
      aria-valuemin={0}
      aria-valuemax={Math.round(durationMs / 1000)}
      aria-valuenow={Math.floor(atMs / 1000)}
      aria-valuetext={`${formatMs(atMs)} of ${formatMs(durationMs)}${title ? `, ${title}` : ''}`}
      onKeyDown={press}
      onFocus={(event) => setFocus(event.target.matches(':focus-visible') ? 'seen' : 'none')}
      onBlur={() => setFocus('none')}
      onPointerDown={(event) => {
        if (event.button !== 0) return;
        event.currentTarget.setPointerCapture(event.pointerId);
        setPointedMs(msAt(event));
        drag.begin(msAt(event));
      }}
      onPointerMove={(event) => {
        if (event.pointerType === 'mouse' || drag.isGoing()) setPointedMs(msAt(event));
        drag.move(msAt(event));
      }}
      onPointerUp={(event) => {
        drag.end();
        if (event.pointerType !== 'mouse') setPointedMs(null);
      }}
      onPointerCancel={() => {
        drag.end();
        setPointedMs(null);
      }}
      onPointerLeave={() => setPointedMs(null)}
    >
      {gapsOf(chapters, skips, durationMs).map(({ startMs, endMs, gap }) => (
        <span key={startMs} className="seek-gap" data-gap={gap} style={stretch(startMs, endMs, durationMs)} />
      ))}
      {chapters.map(({ id, kind, startMs, endMs }) => (
        <TapeStrip
          key={id}
          kind={kind}
          size={id === playingId ? 'tall' : 'regular'}
          className="absolute!"
          style={stretch(startMs, endMs, durationMs)}
        />
      ))}
      <PlayLine playhead={playhead} durationMs={durationMs} />
      {shownMs !== null && <SeekBubble atMs={shownMs} durationMs={durationMs} chapter={shownChapter} />}
    </div>
  );
}

const share = (ms: number, durationMs: number) => `${durationMs > 0 ? (100 * ms) / durationMs : 0}%`;

/** Strips lie a hand's breadth apart. */
const stretch = (startMs: number, endMs: number, durationMs: number) => ({
  left: share(startMs, durationMs),
  width: `calc(${share(endMs - startMs, durationMs)} - 3px)`,
});

/** Follows the picture frame by frame, without drawing anything else again. */
function PlayLine({ playhead, durationMs }: { playhead: Playhead; durationMs: number }) {
  const line = useRef<HTMLSpanElement>(null);
  useEffect(() => {
    const place = () => {
      if (line.current) line.current.style.left = share(Math.min(playhead.atMs(), durationMs), durationMs);
    };
    place();
    return playhead.subscribeTime(place);
  }, [playhead, durationMs]);
  return <span ref={line} className="seek-line" />;
}
