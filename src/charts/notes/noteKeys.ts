/**
 * Arrow, Home and End keys in the notes column: calls `focus` with the note to go to and returns whether the
 * key was one of them. Stops at both ends.
 */
export function moveInColumn(
  key: string,
  notes: readonly string[],
  from: string,
  focus: (note: string) => void,
): boolean {
  const at = notes.indexOf(from);
  const target = targetIndex(key, at, notes.length);
  if (target === null) return false;
  const note = notes[target];
  if (note !== undefined && note !== from) focus(note);
  return true;
}

function targetIndex(key: string, at: number, count: number): number | null {
  if (key === 'ArrowDown') return Math.min(count - 1, at + 1);
  if (key === 'ArrowUp') return Math.max(0, at - 1);
  if (key === 'Home') return 0;
  if (key === 'End') return count - 1;
  return null;
}
