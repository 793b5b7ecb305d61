/** A person's small choices in this browser. Without storage (private windows) a choice lasts as long as the page. */
export function readStored(key: string): string | null {
  try {
    return localStorage.getItem(key);
  } catch {
    return null;
  }
}

export function writeStored(key: string, value: string): void {
  try {
    localStorage.setItem(key, value);
  } catch {
    // full or switched off: the choice holds until the page is left
  }
}
