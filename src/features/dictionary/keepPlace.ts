/**
 * Runs what makes a form's lines anew, and puts the focus and the writing mark back where they were.
 * @param form the form, or null while there is none
 */
export function keepPlace(form: HTMLFormElement | null, change: () => void): void {
  const at = document.activeElement;
  const name = at instanceof HTMLElement && form?.contains(at) ? at.getAttribute('name') : null;
  const mark = at instanceof HTMLInputElement || at instanceof HTMLTextAreaElement ? at.selectionStart : null;
  change();
  if (!name) return;
  requestAnimationFrame(() => {
    const same = form?.querySelector<HTMLInputElement>(`[name="${CSS.escape(name)}"]`);
    if (!same || same === document.activeElement) return;
    same.focus();
    if (mark !== null) same.setSelectionRange(mark, mark);
  });
}
