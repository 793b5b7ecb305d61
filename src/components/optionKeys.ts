import type { KeyboardEvent } from 'react';

type Moves = {
  state: 'open' | 'closed';
  count: number;
  active: number;
  open: () => void;
  close: () => void;
  point: (index: number) => void;
  take: (index: number) => void;
};

/**
 * The keys of an editable combobox, as the ARIA Authoring Practices list them: arrows move and open, Enter takes,
 * Escape closes. Home, End and letters stay the text's own.
 * @returns whether the key was used up
 */
export function pressInCombobox(event: KeyboardEvent, moves: Moves): boolean {
  const { state, count, active } = moves;
  // Enter that ends a composed character belongs to the keyboard's own input method
  if (event.nativeEvent.isComposing) return false;
  if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
    event.preventDefault();
    if (state === 'closed') moves.open();
    if (count === 0) return true;
    const step = event.key === 'ArrowDown' ? 1 : -1;
    moves.point(active < 0 ? (step === 1 ? 0 : count - 1) : (active + step + count) % count);
    return true;
  }
  if (event.key === 'Enter' && state === 'open' && active >= 0 && active < count) {
    event.preventDefault();
    moves.take(active);
    return true;
  }
  if (event.key === 'Escape' && state === 'open') {
    event.preventDefault();
    event.stopPropagation();
    moves.close();
    return true;
  }
  return false;
}
