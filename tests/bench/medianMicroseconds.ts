/**
 * Median duration of one call of `work`, microseconds, over about `milliseconds` of calls after a warm-up
 * of a third of that. Calls under 20 µs are timed in batches: the clock itself is too coarse for one.
 */
export function medianMicroseconds(work: () => void, milliseconds: number): number {
  const warm = performance.now() + milliseconds / 3;
  let calls = 0;
  const began = performance.now();
  do {
    work();
    calls++;
  } while (performance.now() < warm);
  const single = ((performance.now() - began) * 1e3) / calls;
  const batch = Math.max(1, Math.ceil(20 / single));
  const times: number[] = [];
  const end = performance.now() + milliseconds;
  do {
    const start = performance.now();
    for (let k = 0; k < batch; k++) work();
    times.push(((performance.now() - start) * 1e3) / batch);
  } while (performance.now() < end);
  return median(times);
}

export function median(values: number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[sorted.length >> 1] ?? Number.NaN;
}
