/** Frames in which the lines are made anew at the latest: half a second. */
const mostFrames = 30;

/**
 * Runs what makes a form's lines anew, and puts the focus and the writing mark back where they were.
 * @param form the form, or null while there is none
 */
export function keepPlace(form: HTMLFormElement | null, change: () => void): void {
  const at = document.activeElement;
  const name = at instanceof HTMLElement && form?.contains(at) ? at.getAttribute('name') : null;
  const mark = at instanceof HTMLInputElement || at instanceof HTMLTextAreaElement ? at.selectionStart : null;
  change();
  if (!name || !at) return;
  const look = (framesLeft: number) => {
    if (at.isConnected) return framesLeft > 0 && requestAnimationFrame(() => look(framesLeft - 1));
    // the person went elsewhere meanwhile
    if (document.activeElement !== document.body) return;
    const same = form?.querySelector<HTMLInputElement>(`[name="${CSS.escape(name)}"]`);
    same?.focus();
    if (mark !== null) same?.setSelectionRange(mark, mark);
  };
  requestAnimationFrame(() => look(mostFrames));
}
