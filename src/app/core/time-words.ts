/** Times as people at the bench say them. Local time, 24 hours. */

/** `10:42`. */
export function clockTime(at: number): string {
  const date = new Date(at);
  return `${date.getHours()}:${String(date.getMinutes()).padStart(2, '0')}`;
}

const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** `today 07:55`, `yesterday 16:20` or `12 Nov`. */
export function dayTime(at: number, now: number): string {
  const days = dayNumber(now) - dayNumber(at);
  if (days === 0) return `today ${clockTime(at)}`;
  if (days === 1) return `yesterday ${clockTime(at)}`;
  const date = new Date(at);
  const year = date.getFullYear() === new Date(now).getFullYear() ? '' : ` ${date.getFullYear()}`;
  return `${date.getDate()} ${months[date.getMonth()] ?? ''}${year}`;
}

/** `under a minute`, `6 min`, `2 h`, `3 days`: how long something lies back. */
export function howLong(ms: number): string {
  const minutes = Math.floor(ms / 60_000);
  if (minutes < 1) return 'under a minute';
  if (minutes < 60) return `${minutes} min`;
  const hours = Math.floor(minutes / 60);
  if (hours < 48) return `${hours} h`;
  return `${Math.floor(hours / 24)} days`;
}

/** Whole days from now to a date such as `2026-12-10`; negative once it has passed. */
export function daysUntil(day: string, now: number): number {
  const [year = 0, month = 1, date = 1] = day.split('-').map(Number);
  return Math.round((new Date(year, month - 1, date).getTime() - startOfDay(now)) / 86_400_000);
}

function startOfDay(at: number): number {
  const date = new Date(at);
  return new Date(date.getFullYear(), date.getMonth(), date.getDate()).getTime();
}

const dayNumber = (at: number): number => Math.round(startOfDay(at) / 86_400_000);
