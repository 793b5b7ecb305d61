import type { MouseEvent, MouseEventHandler } from 'react';

/**
 * A busy button keeps the focus and its place, says that it is busy, and takes no second press:
 * `disabled` would throw the focus away, and a double click would send a form twice.
 */
export function pressOf(busy: string | undefined, onClick: MouseEventHandler<HTMLButtonElement> | undefined) {
  if (busy === undefined) return { onClick };
  return {
    'aria-disabled': true,
    'aria-busy': true,
    onClick: (event: MouseEvent<HTMLButtonElement>) => event.preventDefault(),
  };
}
