/** A user command: one object, listed in the command list and bound to its key. */
export interface Command {
  id: string;
  /** Trade words, as the command list shows them. */
  words: string;
  /** Keys as shown and matched, e.g. "Mod+S", "Shift+P", "?", "] or F8"; Mod is Ctrl, or ⌘ on a Mac. */
  keys?: string;
  enabled?: boolean;
  run(): void;
}

/** Whether a keyboard event is the given key combination, or one of those joined by "or". */
export function matchesKeys(keys: string, event: KeyboardEvent): boolean {
  return keys.split(' or ').some((one) => matchesOne(one, event));
}

function matchesOne(keys: string, event: KeyboardEvent): boolean {
  const parts = keys.split('+');
  const key = parts.at(-1) as string;
  const mod = parts.includes('Mod');
  const shift = parts.includes('Shift');
  if (mod !== (event.ctrlKey || event.metaKey) || event.altKey) return false;
  const letter = key.length === 1 && /[a-z]/i.test(key);
  if (letter || key.length > 1) {
    if (shift !== event.shiftKey) return false;
  }
  return event.key.toLowerCase() === key.toLowerCase();
}

const onMac = typeof navigator !== 'undefined' && /Mac|iPhone|iPad/.test(navigator.userAgent);

/** The keys as this machine's keyboard names them. */
export function shownKeys(keys: string): string {
  return keys.replace('Mod', onMac ? '⌘' : 'Ctrl');
}
