/** What Escape does first on a page with keys of its own: out of the field, so that letters are keys again. @returns whether one was left */
export function leaveField(): boolean {
  const field = document.activeElement;
  if (!(field instanceof HTMLElement) || !field.matches('input, textarea, select')) return false;
  field.blur();
  return true;
}
