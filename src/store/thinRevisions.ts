import type { KeptRevision } from './archive.ts';

const newestKept = 50;
const tenMinutes = 600_000;
const day = 86_400_000;
const daysKept = 90;

/**
 * The revisions to let go, of one document's: the newest 50 stay, before them the last of every ten minutes
 * for a day, then the last of every day for 90 days. Named ones stay for good and count nowhere.
 */
export function revisionsToDrop(revisions: readonly KeptRevision[], now: number): string[] {
  const automatic = revisions.filter(({ name }) => name === null).toSorted((a, b) => b.at - a.at);
  const taken = new Set<string>();
  return automatic.slice(newestKept).flatMap(({ id, at }) => {
    const window = windowOf(at, now);
    if (window === null || taken.has(window)) return [id];
    taken.add(window);
    return [];
  });
}

/** The stretch of time of which one revision stays; null where none does. */
function windowOf(at: number, now: number): string | null {
  if (now - at <= day) return `ten minutes ${Math.floor(at / tenMinutes)}`;
  return now - at <= daysKept * day ? `day ${Math.floor(at / day)}` : null;
}
