import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { kvarForTarget, tanPhi } from '../../src/sizing/index.ts';

const kvar = (kW: number, pf1: number, pf2: number) => kvarForTarget({ kW, pf1, pf2 }).kvar;

describe('kvar for a target power factor', () => {
  // Public worked examples, second-hand: an article, a catalogue, a bank data sheet, an encyclopaedia text.
  it('620 kW from 0.65 to 0.90 takes factor 0.685 and 425 kvar (second-hand, printed rounded)', () => {
    const result = kvarForTarget({ kW: 620, pf1: 0.65, pf2: 0.9 });
    expect(result.tanPhi1 - result.tanPhi2).toBeCloseTo(0.68481, 5);
    expect(result.kvar).toBeCloseTo(424.58, 2);
    expect(Math.round(result.kvar)).toBe(425);
  });

  it.each([
    [100, 0.75, 0.95, 55.323, 55],
    [5, 0.75, 0.9, 1.988, 1.99],
    [164.6, 0.86, 0.95, 43.567, 44],
  ])('%f kW from %f to %f takes %f kvar (second-hand, printed %f)', (kW, pf1, pf2, exact, printed) => {
    expect(kvar(kW, pf1, pf2)).toBeCloseTo(exact, 3);
    expect(Math.abs(kvar(kW, pf1, pf2) - printed)).toBeLessThanOrEqual(0.5);
  });

  it('0.80 to 0.93 takes 0.355 kvar for each kW (computed twice, independently)', () => {
    expect(kvar(1, 0.8, 0.93)).toBeCloseTo(0.355, 3);
  });

  // Multiplier table tan φ1 − tan φ2, computed from the identity, exact to three decimals.
  const targets = [0.9, 0.92, 0.95, 0.96, 0.98, 1];
  it.each([
    [0.5, [1.248, 1.306, 1.403, 1.44, 1.529, 1.732]],
    [0.55, [1.034, 1.092, 1.19, 1.227, 1.315, 1.518]],
    [0.6, [0.849, 0.907, 1.005, 1.042, 1.13, 1.333]],
    [0.65, [0.685, 0.743, 0.84, 0.877, 0.966, 1.169]],
    [0.7, [0.536, 0.594, 0.692, 0.729, 0.817, 1.02]],
    [0.75, [0.398, 0.456, 0.553, 0.59, 0.679, 0.882]],
    [0.8, [0.266, 0.324, 0.421, 0.458, 0.547, 0.75]],
    [0.85, [0.135, 0.194, 0.291, 0.328, 0.417, 0.62]],
  ])('from cos φ %f the multipliers match the table', (pf1, row) => {
    targets.forEach((pf2, index) => {
      expect(Math.abs(kvar(1, pf1, pf2) - (row[index] ?? Number.NaN))).toBeLessThanOrEqual(0.0005 + 1e-9);
    });
  });

  it('at constant kW 1200 kVA from 0.75 to 0.96 takes 531.2 kvar, not the 457.7 of constant kVA', () => {
    // Dugan et al., Electrical Power Systems Quality, 2nd ed. 2003, filter-design case study (from memory).
    expect(kvar(900, 0.75, 0.96)).toBeCloseTo(531.2, 1);
    expect(1200 * (Math.sin(Math.acos(0.75)) - Math.sin(Math.acos(0.96)))).toBeCloseTo(457.7, 1);
  });

  it('is negative, a surplus, where the load is better than the target', () => {
    expect(kvar(100, 0.98, 0.95)).toBeLessThan(0);
  });

  it('corrects to exactly the target: tan φ after = tan φ2', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 1e5, noNaN: true }),
        fc.double({ min: 0.2, max: 1, noNaN: true }),
        fc.double({ min: 0.2, max: 1, noNaN: true }),
        (kW, pf1, pf2) => {
          const after = kW * tanPhi(pf1) - kvar(kW, pf1, pf2);
          expect(after).toBeCloseTo(kW * tanPhi(pf2), 6);
        },
      ),
      { seed: 20260 },
    );
  });

  it('refuses a power factor outside 0 to 1 and negative power, naming the value', () => {
    expect(() => kvar(100, 0, 0.95)).toThrow(/0: above 0/);
    expect(() => kvar(100, 0.8, 1.01)).toThrow(/1.01/);
    expect(() => kvar(-5, 0.8, 0.95)).toThrow(/-5 kW/);
  });
});
