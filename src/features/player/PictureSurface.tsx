import { clsx } from 'clsx';
import { useEffect, useRef, useState } from 'react';
import type { Playhead } from '../../lib/playhead';
import { type Moves, stepMs } from './moves';

type Props = { playhead: Playhead; moves: Moves };
type Side = 'left' | 'middle' | 'right';

/** A second tap within this time makes two of them one. */
const twiceMs = 280;

/**
 * The picture itself as the largest button: a press plays or pauses, two taps at an edge go 5 s.
 * Keyboards and screen readers have the same as buttons below.
 */
export function PictureSurface({ playhead, moves }: Props) {
  const by = useRef('mouse');
  const waiting = useRef<{ side: Side; timer: ReturnType<typeof setTimeout> } | null>(null);
  const [gone, setGone] = useState<{ side: Side; count: number } | null>(null);
  useEffect(() => () => clearTimeout(waiting.current?.timer), []);
  useEffect(() => {
    if (!gone) return;
    const timer = setTimeout(() => setGone(null), 700);
    return () => clearTimeout(timer);
  }, [gone]);

  const tap = (side: Side) => {
    const first = waiting.current;
    clearTimeout(first?.timer);
    if (first?.side === side) {
      moves.by(side === 'left' ? -stepMs : stepMs);
      setGone((before) => ({ side, count: before?.side === side ? before.count + 1 : 1 }));
      // a third tap goes on from here
      waiting.current = { side, timer: setTimeout(() => (waiting.current = null), 2 * twiceMs) };
      return;
    }
    waiting.current = {
      side,
      timer: setTimeout(() => {
        waiting.current = null;
        playhead.toggle();
      }, twiceMs),
    };
  };

  return (
    <>
      <button
        type="button"
        tabIndex={-1}
        aria-hidden="true"
        className="absolute inset-0 size-full cursor-default touch-manipulation outline-none"
        onPointerDown={(event) => {
          by.current = event.pointerType;
        }}
        onClick={(event) => {
          const { left, width } = event.currentTarget.getBoundingClientRect();
          const share = (event.clientX - left) / width;
          const side = share < 0.3 ? 'left' : share > 0.7 ? 'right' : 'middle';
          if (by.current !== 'touch' || side === 'middle') playhead.toggle();
          else tap(side);
        }}
      />
      {gone && (
        <span
          aria-hidden="true"
          className={clsx(
            'pointer-events-none absolute top-1/2 -translate-y-1/2 rounded bg-shade px-3 py-1.5 font-extrabold text-onShade',
            gone.side === 'left' ? 'left-4' : 'right-4',
          )}
        >
          {gone.side === 'left' ? '−' : '+'}
          {(gone.count * stepMs) / 1000} s
        </span>
      )}
    </>
  );
}
