import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { planElimination } from '../../../src/engine/kernel/index.ts';
import { meshedEdges, seededRandom } from './randomNetwork.ts';

describe('elimination plan', () => {
  it('a radial network is eliminated without fill, whatever busbar comes last', () => {
    const edges = Int32Array.from([0, 1, 1, 2, 1, 3, 3, 4, 3, 5, 0, 6]);
    for (let last = 0; last < 7; last++) expect(planElimination(7, edges, last).slotCount).toBe(6);
  });

  it('the chosen busbar is eliminated last', () => {
    const edges = meshedEdges(60, seededRandom(3));
    for (const last of [0, 17, 59]) {
      const plan = planElimination(60, edges, last);
      expect(plan.order[59]).toBe(last);
      expect(plan.diagonalSlot(last)).toBe(59);
    }
  });

  it('the order is a permutation and every pair of the pattern has one slot, below the diagonal', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 120 }), fc.integer(), (n, seed) => {
        const edges = meshedEdges(n, seededRandom(seed));
        const plan = planElimination(n, edges);
        expect([...plan.order].sort((a, b) => a - b)).toEqual(Array.from({ length: n }, (_, i) => i));
        for (let e = 0; e < edges.length; e += 2) {
          const i = edges[e]!;
          const j = edges[e + 1]!;
          if (i === j) continue;
          const slot = plan.offDiagonalSlot(i, j);
          expect(plan.offDiagonalSlot(j, i)).toBe(slot);
          expect(plan.isTransposed(i, j)).toBe(!plan.isTransposed(j, i));
          expect(plan.rowPosition[slot]).toBe(Math.max(plan.position[i]!, plan.position[j]!));
        }
      }),
      { seed: 20250101, numRuns: 60 },
    );
  });

  it('fill is exactly what symbolic elimination of the graph gives', () => {
    const n = 40;
    const edges = meshedEdges(n, seededRandom(11));
    const plan = planElimination(n, edges);
    const linked = Array.from({ length: n }, () => new Array<boolean>(n).fill(false));
    for (let e = 0; e < edges.length; e += 2) {
      const p = plan.position[edges[e]!]!;
      const q = plan.position[edges[e + 1]!]!;
      linked[p]![q] = linked[q]![p] = true;
    }
    let count = 0;
    for (let k = 0; k < n; k++)
      for (let a = k + 1; a < n; a++) {
        if (!linked[a]![k]) continue;
        count++;
        for (let b = k + 1; b < n; b++) if (b !== a && linked[b]![k]) linked[a]![b] = true;
      }
    expect(plan.slotCount).toBe(count);
  });

  it('islands, repeated pairs and a busbar tied to itself are allowed', () => {
    const plan = planElimination(5, Int32Array.from([0, 1, 1, 0, 2, 2, 3, 4]));
    expect(plan.slotCount).toBe(2);
  });

  it('a busbar number outside the network and an unknown pair are refused with the range', () => {
    expect(() => planElimination(3, Int32Array.from([0, 3]))).toThrow('node 3 is outside 0 … 2');
    expect(() => planElimination(3, Int32Array.from([0, 1]), 5)).toThrow('node 5 is outside 0 … 2');
    const plan = planElimination(3, Int32Array.from([0, 1]));
    expect(() => plan.offDiagonalSlot(0, 2)).toThrow('no pair (0, 2)');
    expect(() => plan.offDiagonalSlot(1, 1)).toThrow('no pair (1, 1)');
  });
});
