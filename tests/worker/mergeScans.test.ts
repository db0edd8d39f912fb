import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { ImpedanceScan } from '../../src/engine/index.ts';
import { mergeScans } from '../../src/worker/scanAxis.ts';

/** A scan whose value at f is f − j·2f. */
function scanAt(frequencies: readonly number[]): ImpedanceScan {
  const frequencyHz = Float64Array.from(new Set(frequencies)).sort();
  return {
    bus: 'main',
    sequence: 'positive',
    frequencyHz,
    re: frequencyHz.slice(),
    im: frequencyHz.map((f) => -2 * f),
    resonances: [],
  };
}

describe('two scans merged', () => {
  it('hold every frequency of either once, rising, each with its own impedance', () => {
    const frequencies = fc.array(fc.integer({ min: 1, max: 60 }), { maxLength: 40 });
    fc.assert(
      fc.property(frequencies, frequencies, (a, b) => {
        const merged = mergeScans(scanAt(a), scanAt(b));
        const union = [...new Set([...a, ...b])].sort((x, y) => x - y);
        expect([...merged.frequencyHz]).toEqual(union);
        expect([...merged.re]).toEqual(union);
        expect([...merged.im]).toEqual(union.map((f) => -2 * f));
      }),
      { seed: 20, numRuns: 200 },
    );
  });
});
