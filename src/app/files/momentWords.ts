function two(number: number): string {
  return String(number).padStart(2, '0');
}

/** "14:02", in the machine's time. */
export function timeWords(at: number): string {
  const date = new Date(at);
  return `${two(date.getHours())}:${two(date.getMinutes())}`;
}

/** ISO 8601 date in the machine's time: "2026-12-01". */
export function dateWords(at: number): string {
  const date = new Date(at);
  return `${date.getFullYear()}-${two(date.getMonth() + 1)}-${two(date.getDate())}`;
}

/** "Today", "Yesterday", else the date. */
export function dayWords(at: number, now: number): string {
  const day = dateWords(at);
  if (day === dateWords(now)) return 'Today';
  const yesterday = new Date(now);
  yesterday.setDate(yesterday.getDate() - 1);
  return day === dateWords(yesterday.getTime()) ? 'Yesterday' : day;
}

/** "14:02" today, "2026-11-30 14:02" else. */
export function momentWords(at: number, now: number): string {
  return dateWords(at) === dateWords(now) ? timeWords(at) : `${dateWords(at)} ${timeWords(at)}`;
}
