import { useRef } from 'react';
import type { Playhead } from '../../lib/playhead';
import type { Moves } from './moves';

/** A finger or pointer that drags the playhead: it stands still meanwhile, and goes on afterwards if it was going. */
export function useDrag(playhead: Playhead, moves: Moves) {
  const before = useRef<'going' | 'still' | null>(null);
  return {
    isGoing: () => before.current !== null,
    begin(ms: number) {
      before.current = playhead.isGoing() ? 'going' : 'still';
      playhead.pause();
      moves.to(ms);
    },
    move(ms: number) {
      if (before.current !== null) moves.to(ms);
    },
    end() {
      if (before.current === 'going') playhead.play();
      before.current = null;
    },
  };
}
