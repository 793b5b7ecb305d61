import { useEffect, useState } from 'react';
import { formatMs } from '../../../shared/domain/timecode';
import { GoButton } from '../../components/GoButton';
import { Icon } from '../../components/Icon';
import { Waiting } from '../../components/Waiting';
import { type Playhead, usePlayState } from '../../lib/playhead';
import type { Moves } from './moves';
import type { Start } from './whereToStart';

/** A wait this long is told as what it is. */
const slowMs = 6000;
/** The word about where it started stays this long once it plays. */
const noteMs = 12_000;

/** Over the picture: the one thing to do before it plays and after its end, waits, and what went wrong. */
export function PictureNotes({ playhead, moves, start }: { playhead: Playhead; moves: Moves; start: Start }) {
  const { state, frame, fault } = usePlayState(playhead);
  const [begun, setBegun] = useState<'not yet' | 'plays'>('not yet');
  useEffect(() => {
    if (state === 'playing') setBegun('plays');
  }, [state]);
  const isReady = state === 'paused' || state === 'ended';
  const carriesOn = start.because === 'place';
  const startOver = () => moves.show(0);
  return (
    <div className="pointer-events-none absolute inset-0 *:pointer-events-auto">
      {fault ? (
        <div
          role="alert"
          className="absolute inset-x-3 top-3 border-l-4 border-danger bg-ground px-3 py-2 text-sm font-bold"
        >
          {fault}
        </div>
      ) : (
        frame === 'awaited' && <LongWait />
      )}
      {!fault && begun === 'plays' && carriesOn && <CarriedOn from={start.atMs} onStartOver={startOver} />}
      {!fault && isReady && (begun === 'not yet' || state === 'ended') && (
        <div className="pointer-events-none! absolute inset-0 flex flex-col items-center justify-center gap-2 *:pointer-events-auto">
          <GoButton size="large" onClick={() => (state === 'ended' ? startOver() : playhead.play())}>
            <Icon name={state === 'ended' ? 'loop' : 'play'} />
            {state === 'ended' ? 'From the beginning' : carriesOn ? `Carry on at ${formatMs(start.atMs)}` : 'Play'}
          </GoButton>
          {begun === 'not yet' && carriesOn && (
            <div className="rounded bg-shade">
              <StartOver onPress={startOver} />
            </div>
          )}
        </div>
      )}
    </div>
  );
}

function LongWait() {
  const [length, setLength] = useState<'short' | 'long'>('short');
  useEffect(() => {
    const timer = setTimeout(() => setLength('long'), slowMs);
    return () => clearTimeout(timer);
  }, []);
  return (
    <div className="shown-late pointer-events-none! absolute top-3 left-3 rounded bg-ground px-3 py-2">
      <Waiting
        label={
          length === 'short'
            ? 'The picture is on its way'
            : navigator.onLine
              ? 'The connection is slow; it goes on by itself'
              : 'There is no connection; it goes on by itself when it is back'
        }
      />
    </div>
  );
}

function CarriedOn({ from, onStartOver }: { from: number; onStartOver: () => void }) {
  const [shown, setShown] = useState<'shown' | 'gone'>('shown');
  useEffect(() => {
    const timer = setTimeout(() => setShown('gone'), noteMs);
    return () => clearTimeout(timer);
  }, []);
  if (shown === 'gone') return null;
  return (
    <div className="absolute top-2 left-2 flex items-center gap-1 rounded bg-shade ps-3 text-sm text-onShade">
      <span role="status">From {formatMs(from)}, where you stopped</span>
      <StartOver
        onPress={() => {
          setShown('gone');
          onStartOver();
        }}
      />
    </div>
  );
}

function StartOver({ onPress }: { onPress: () => void }) {
  return (
    <button
      type="button"
      className="min-h-12 px-3 text-sm font-extrabold text-onShade underline underline-offset-3"
      onClick={onPress}
    >
      Start over
    </button>
  );
}
