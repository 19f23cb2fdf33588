const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' });

/** The day of a record's entry, `1 Dec 2026`. */
export function dayText(at: number): string {
  return day.format(at);
}

/** How long something took: `24 min`, `1 h 05 min`, `40 s`. */
export function durationText(ms: number): string {
  const seconds = Math.round(ms / 1000);
  if (seconds < 60) return `${seconds} s`;
  const minutes = Math.round(seconds / 60);
  if (minutes < 60) return `${minutes} min`;
  return `${Math.floor(minutes / 60)} h ${String(minutes % 60).padStart(2, '0')} min`;
}

/** Milliseconds since 1970, however the server wrote the moment. */
export function momentOf(at: string | number): number {
  return typeof at === 'number' ? at : Date.parse(at);
}
