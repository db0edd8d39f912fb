/** One line of the key map. */
export interface KeyRow {
  /** The combinations that do it, each as `matchesKeys` reads it. */
  keys: readonly string[];
  /** What the line shows instead, where the combinations make a range, e.g. "0 … 9". */
  shown?: string;
  /** In trade words. */
  words: string;
}

/** Every key that works in one place. */
export interface KeyTable {
  place: string;
  rows: readonly KeyRow[];
}
