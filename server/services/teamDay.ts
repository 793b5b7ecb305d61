/** The calendar date in a time zone at an instant: `2026-03-03`. */
export function dateInZone(timeZone: string, at: Date = new Date()): string {
  // the Swedish locale writes ISO dates
  return new Intl.DateTimeFormat('sv-SE', { timeZone, year: 'numeric', month: '2-digit', day: '2-digit' }).format(at);
}

export function isTimeZone(timeZone: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone });
    return true;
  } catch {
    return false;
  }
}
