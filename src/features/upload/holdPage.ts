let state: 'held' | 'free' = 'free';

/** Leaving the site asks first while something is under way; without need it must not, or pages are kept out of the browser's cache. */
export function holdPage(next: 'held' | 'free'): void {
  if (next === state) return;
  state = next;
  if (next === 'held') window.addEventListener('beforeunload', ask);
  else window.removeEventListener('beforeunload', ask);
}

function ask(event: BeforeUnloadEvent): void {
  event.preventDefault();
}
