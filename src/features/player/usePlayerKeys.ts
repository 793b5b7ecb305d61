import type { KeyboardEvent } from 'react';
import { useKeys } from '../../lib/keys';
import type { Playhead } from '../../lib/playhead';
import { type Moves, stepMs } from './moves';

const volumeStep = 0.1;

type Press = (playhead: Playhead, moves: Moves) => void;

const onPage: Record<string, Press> = {
  Space: (playhead) => playhead.toggle(),
  ArrowLeft: (_, moves) => moves.by(-stepMs),
  ArrowRight: (_, moves) => moves.by(stepMs),
};

const inPlayer: Record<string, Press> = {
  ArrowUp: (playhead) => playhead.setVolume(playhead.current().volume + volumeStep),
  ArrowDown: (playhead) => playhead.setVolume(playhead.current().volume - volumeStep),
  Home: (_, moves) => moves.start(),
  End: (_, moves) => moves.end(),
};

/**
 * The keys that browsers' own video controls have. Space and the arrows to the side work on the whole page; those that would
 * keep a page from being scrolled work only while the player has the focus.
 * @returns what the player's frame listens with
 */
export function usePlayerKeys(playhead: Playhead, moves: Moves) {
  useKeys(Object.fromEntries(Object.entries(onPage).map(([name, press]) => [name, () => press(playhead, moves)])));
  return (event: KeyboardEvent) => {
    const press = inPlayer[event.key];
    if (!press || event.defaultPrevented || event.altKey || event.ctrlKey || event.metaKey || event.shiftKey) return;
    event.preventDefault();
    press(playhead, moves);
  };
}
