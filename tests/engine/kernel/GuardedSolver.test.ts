import { describe, expect, it } from 'vitest';
import {
  BlockLdl,
  GuardedSolver,
  planElimination,
  ScalarLdl,
  StampedEntries,
} from '../../../src/engine/kernel/index.ts';
import { meshedEdges, randomVector, seededRandom, stampNetwork } from './randomNetwork.ts';

/** A chain of inductive lines; the shunts make chosen busbars' own admittances nearly vanish. */
function resonantChain(nodeCount: number, resonant: Map<number, number>, last?: number) {
  const edges: number[] = [];
  for (let i = 1; i < nodeCount; i++) edges.push(i - 1, i);
  const matrix = new ScalarLdl(planElimination(nodeCount, Int32Array.from(edges), last));
  const stamp = () => {
    matrix.clear();
    for (let i = 1; i < nodeCount; i++) {
      matrix.addDiagonal(i - 1, 0, -1);
      matrix.addDiagonal(i, 0, -1);
      matrix.addOffDiagonal(i - 1, i, 0, 1);
    }
    matrix.addDiagonal(Math.floor(nodeCount / 2), 2, 0.3);
    for (const [node, rest] of resonant) {
      const ends = node === 0 || node === nodeCount - 1 ? 1 : 2;
      matrix.addDiagonal(node, rest, ends);
    }
  };
  stamp();
  return { matrix, stamp };
}

function guardedError(matrix: ScalarLdl | BlockLdl, stamp: () => void) {
  const size = matrix.blockSize * matrix.plan.nodeCount;
  const entries = new StampedEntries(size, matrix);
  const guard =
    matrix instanceof ScalarLdl
      ? new GuardedSolver(matrix, (plan) => new ScalarLdl(plan))
      : new GuardedSolver(matrix, (plan) => new BlockLdl(plan));
  const outcome = { ...guard.factor(stamp) };
  const b = randomVector(2 * size, 4);
  const x = b.slice();
  if (outcome.status === 'factored') guard.solve(x);
  return { guard, outcome, error: entries.backwardError(b, x), entries };
}

describe('the net under the factorisation without pivoting', () => {
  it('a network with physical resistance stays on the direct path', () => {
    const edges = meshedEdges(100, seededRandom(1));
    const matrix = new BlockLdl(planElimination(100, edges));
    stampNetwork(matrix, 100, edges, 2);
    const { outcome, error } = guardedError(matrix, () => {
      throw new Error('the direct path must not stamp again');
    });
    expect(outcome).toMatchObject({ status: 'factored', method: 'direct' });
    expect(error).toBeLessThan(1e-15);
  });

  it('a growth of ten million is mended by one step of refinement', () => {
    const { matrix, stamp } = resonantChain(8, new Map([[0, 1e-7]]));
    const { outcome, error } = guardedError(matrix, stamp);
    expect(outcome).toMatchObject({ status: 'factored', method: 'refined', worstNode: 0 });
    expect(outcome.growth).toBeGreaterThan(1e6);
    expect(error).toBeLessThan(1e-15);
  });

  it('a vanishing own admittance is mended by eliminating its busbar last', () => {
    for (const rest of [1e-13, 0]) {
      const { matrix, stamp } = resonantChain(8, new Map([[0, rest]]), 4);
      const { outcome, error, guard, entries } = guardedError(matrix, stamp);
      expect(outcome).toMatchObject({ status: 'factored', method: 'rerooted', worstNode: 0 });
      expect(error).toBeLessThan(1e-15);
      // The busbar asked for keeps its driving-point impedance.
      const z = Float64Array.from([1, 0]);
      guard.lastSolve(z);
      const x = new Float64Array(16);
      x[8] = 1;
      const b = x.slice();
      guard.solve(x);
      expect(entries.backwardError(b, x)).toBeLessThan(1e-15);
      expect([z[0], z[1]]).toEqual([x[8], x[9]]);
    }
  });

  it('two vanishing own admittances need the pivoted factor', () => {
    const { matrix, stamp } = resonantChain(
      9,
      new Map([
        [0, 0],
        [8, 0],
      ]),
      4,
    );
    const { outcome, error } = guardedError(matrix, stamp);
    expect(outcome).toMatchObject({ status: 'factored', method: 'pivoted' });
    expect(error).toBeLessThan(1e-15);
  });

  it('an island floating without earth is singular in every order', () => {
    const matrix = new ScalarLdl(planElimination(2, Int32Array.from([0, 1])));
    const stamp = () => {
      matrix.clear();
      matrix.addDiagonal(0, 1, 0);
      matrix.addDiagonal(1, 1, 0);
      matrix.addOffDiagonal(0, 1, -1, 0);
    };
    stamp();
    expect(guardedError(matrix, stamp).outcome.status).toBe('singular');
  });

  it('a stamped value that is not finite is told apart from a singular network', () => {
    const { matrix, stamp } = resonantChain(5, new Map([[2, Number.NaN]]));
    expect(guardedError(matrix, stamp).outcome.status).toBe('notFinite');
  });

  it('a good network after a bad one is direct again', () => {
    const { matrix, stamp } = resonantChain(8, new Map([[0, 0]]), 4);
    const guard = new GuardedSolver(matrix, (plan) => new ScalarLdl(plan));
    expect(guard.factor(stamp).method).toBe('rerooted');
    stamp();
    matrix.addDiagonal(0, 5, 0);
    expect(guard.factor(stamp).method).toBe('direct');
    const x = randomVector(16, 5);
    const y = x.slice();
    guard.solve(x);
    matrix.solve(y);
    expect(x).toEqual(y);
  });
});
