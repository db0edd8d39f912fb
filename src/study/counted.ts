/** A number of things in words: "1 part", "3 parts", "2 busbars". */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}

/** Counts joined as one reads them, the empty ones left out: "3 parts and 1 busbar". */
export function countedTogether(counts: readonly (readonly [count: number, one: string])[]): string {
  return counts
    .filter(([count]) => count > 0)
    .map(([count, one]) => counted(count, one))
    .join(' and ');
}
