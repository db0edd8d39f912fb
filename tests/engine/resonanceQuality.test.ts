import { describe, expect, it } from 'vitest';
import { scanImpedance } from '../../src/engine/index.ts';
import { readStudy } from '../../src/study/index.ts';

/** Two detuned banks behind two cables: between their series resonances stands a narrow peak. */
const site = {
  format: 'varwright-study',
  version: 1,
  title: 'Two detuned banks',
  frequencyHz: 50,
  buses: [
    { id: 'main', nominalV: 400 },
    { id: 'end', nominalV: 400 },
  ],
  elements: [
    { id: 'grid', kind: 'supply', bus: 'main', shortCircuitMVA: 18, xOverR: 6 },
    {
      id: 'k',
      kind: 'cable',
      from: 'main',
      to: 'end',
      lengthM: 60,
      resistanceOhmPerKm: 0.12,
      reactanceOhmPerKm: 0.08,
      ratedA: 300,
    },
    { id: 'load', kind: 'load', bus: 'main', kW: 80, powerFactor: 0.9 },
    { id: 'a', kind: 'bank', bus: 'main', ratedV: 440, detuningPercent: 7, steps: [{ kvar: 100 }] },
    { id: 'b', kind: 'bank', bus: 'end', ratedV: 440, detuningPercent: 5.67, steps: [{ kvar: 60 }] },
  ],
};

function qualities(points: number): { kind: string; order: number; q: number | null }[] {
  const { study } = readStudy(JSON.stringify(site));
  if (!study) throw new Error('the site is refused');
  return scanImpedance(study, 'base', { bus: 'main', sequence: 'positive', fromHz: 50, toHz: 1000, points })
    .resonances;
}

describe('Q of a resonance', () => {
  it('is the same from a coarse scan as from a fine one: the half-power points may lie between scan points', () => {
    const fine = qualities(4001);
    expect(fine.some(({ q }) => q !== null)).toBe(true);
    let compared = 0;
    for (const points of [31, 41, 51, 61, 77, 96, 121]) {
      for (const { kind, order, q } of qualities(points)) {
        const same = fine.find((one) => one.kind === kind && Math.abs(one.order - order) < 2e-6);
        if (!same) continue;
        compared += 1;
        if (same.q === null) expect(q).toBeNull();
        else expect(Math.abs((q ?? 0) / same.q - 1)).toBeLessThan(1e-4);
      }
    }
    expect(compared).toBeGreaterThan(10);
  });
});
