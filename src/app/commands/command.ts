/** A user command: one object, listed in the command list and bound to its key. */
export interface Command {
  id: string;
  /** Trade words, as the command list shows them. */
  words: string;
  /** Keys as `matchesKeys` reads them, e.g. "Mod+S", "Shift+F8", "?", "] or F8". */
  keys?: string;
  enabled?: boolean;
  run(): void;
}
