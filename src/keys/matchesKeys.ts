/** What of a keyboard event a key combination is read from. */
export interface KeyPress {
  key: string;
  ctrlKey: boolean;
  metaKey: boolean;
  altKey: boolean;
  shiftKey: boolean;
}

const ARROWS: Readonly<Record<string, string>> = {
  '←': 'ArrowLeft',
  '→': 'ArrowRight',
  '↑': 'ArrowUp',
  '↓': 'ArrowDown',
  Space: ' ',
};

/**
 * Whether a keyboard event is the given combination, e.g. "Mod+S", "Shift+P", "Alt+↑", "?", or one of those
 * joined by "or"; Mod is Ctrl, or ⌘ on a Mac. Shift is left open where a sign other than a letter may need it.
 */
export function matchesKeys(keys: string, event: KeyPress): boolean {
  return keys.split(' or ').some((one) => matchesOne(one, event));
}

function matchesOne(keys: string, event: KeyPress): boolean {
  const parts = keys === '+' ? ['+'] : keys.split('+');
  const named = parts.at(-1) as string;
  const key = ARROWS[named] ?? named;
  if (parts.includes('Mod') !== (event.ctrlKey || event.metaKey)) return false;
  if (parts.includes('Alt') !== event.altKey) return false;
  const sign = key.length === 1 && !/[a-z ]/i.test(key);
  if (!sign && parts.includes('Shift') !== event.shiftKey) return false;
  return event.key.toLowerCase() === key.toLowerCase();
}
