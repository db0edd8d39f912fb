/** Combinations of a bank's steps reduced to what the network sees: the distinct kvar in service. */
export interface StepSums {
  /** Ascending, above zero. */
  kvar: number[];
  /** Distinct values there are; larger than kvar.length where the list was thinned. */
  total: number;
}

/**
 * Distinct kvar of every non-empty subset of the steps: n values for n like steps, up to 2ⁿ − 1 for unlike
 * ones. Above `cap` an evenly spread selection with the smallest and largest is kept and `total` tells.
 */
export function stepSums(steps: readonly { kvar: number }[], cap = 256): StepSums {
  // Grouping by milli-kvar keeps rounding from parting equal sums.
  let sums = new Map<number, number>([[0, 0]]);
  for (const { kvar } of steps) {
    const next = new Map(sums);
    for (const sum of sums.values()) next.set(Math.round((sum + kvar) * 1000), sum + kvar);
    sums = thinned(next, 16 * cap);
  }
  const kvar = [...sums.values()].filter((sum) => sum > 0).sort((a, b) => a - b);
  return { kvar: spread(kvar, cap), total: kvar.length };
}

/** Keeps the running sums of very many unlike steps in hand; zero and both ends stay. */
function thinned(sums: Map<number, number>, most: number): Map<number, number> {
  if (sums.size <= most) return sums;
  const positive = [...sums.values()].filter((sum) => sum > 0).sort((a, b) => a - b);
  return new Map([0, ...spread(positive, most)].map((sum) => [Math.round(sum * 1000), sum]));
}

function spread(values: number[], most: number): number[] {
  if (values.length <= most) return values;
  const picked = Array.from(
    { length: most },
    (_, i) => values[Math.round((i * (values.length - 1)) / (most - 1))],
  );
  return picked.filter((value) => value !== undefined);
}
