import type { MouseEvent } from 'react';

/**
 * A pointer's press on a tool's button leaves the keys to the page, as if nothing had the focus: else Space would press
 * that button again instead of playing. The keyboard's own way to a button stays as it is.
 */
export function keepKeys(event: MouseEvent): void {
  if (!(event.target instanceof Element) || !event.target.closest('button')) return;
  event.preventDefault();
  if (document.activeElement instanceof HTMLElement) document.activeElement.blur();
}
