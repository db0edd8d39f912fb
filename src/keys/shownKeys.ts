const onMac = typeof navigator !== 'undefined' && /Mac|iPhone|iPad/.test(navigator.userAgent);

/** A key combination as this machine's keyboard names it. */
export function shownKeys(keys: string): string {
  return keys.replace('Mod', onMac ? '⌘' : 'Ctrl');
}
