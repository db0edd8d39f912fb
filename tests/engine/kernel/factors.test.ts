import { complex, lusolve, matrix } from 'mathjs';
import { describe, expect, it } from 'vitest';
import {
  BlockLdl,
  BlockLu,
  type KernelMatrix,
  PivotedLu,
  planElimination,
  RealBlockLu,
  ScalarLdl,
  StampedEntries,
} from '../../../src/engine/kernel/index.ts';
import { meshedEdges, randomVector, seededRandom, stampNetwork } from './randomNetwork.ts';

const SIZES = [1, 2, 3, 5, 12, 30, 100, 300, 1000];

function network(nodeCount: number, seed: number, lastNode?: number) {
  const edges = meshedEdges(nodeCount, seededRandom(seed));
  return { edges, plan: planElimination(nodeCount, edges, lastNode) };
}

function scalarNetwork(nodeCount: number, seed: number): ScalarLdl {
  const { edges, plan } = network(nodeCount, seed);
  const sequence = new ScalarLdl(plan);
  const random = seededRandom(seed + 1);
  for (let i = 0; i < nodeCount; i++) sequence.addDiagonal(i, 0.1 * random(), random() - 0.5);
  for (let e = 0; e < edges.length; e += 2) {
    const [i, j, g, b] = [edges[e]!, edges[e + 1]!, random(), -3 * random()];
    if (i === j) continue;
    sequence.addDiagonal(i, g, b);
    sequence.addDiagonal(j, g, b);
    sequence.addOffDiagonal(i, j, -g, -b);
  }
  return sequence;
}

/** Solves Y·V = I by the kernel; returns the matrix as stamped, the currents and the voltages. */
function solved(kernel: KernelMatrix, seed: number) {
  const size = kernel.blockSize * kernel.plan.nodeCount;
  const entries = new StampedEntries(size, kernel);
  const b = randomVector(2 * size, seed);
  expect(kernel.factor().status).toBe('factored');
  const x = b.slice();
  kernel.solve(x);
  return { entries, b, x, error: entries.backwardError(b, x) };
}

/** Dense solution by a general-purpose library. */
function denseSolution(entries: StampedEntries, b: Float64Array): Float64Array {
  const n = entries.size;
  const dense = Array.from({ length: n }, () => Array.from({ length: n }, () => complex(0, 0)));
  entries.forEachEntry((row, column, re, im) => {
    dense[row]![column] = complex(re, im);
  });
  const right = Array.from({ length: n }, (_, i) => complex(b[2 * i]!, b[2 * i + 1]!));
  const x = lusolve(matrix(dense), matrix(right));
  return Float64Array.from(
    (x.valueOf() as unknown as { re: number; im: number }[][]).flatMap(([z]) => [z!.re, z!.im]),
  );
}

function largestDifference(a: ArrayLike<number>, b: ArrayLike<number>): number {
  let worst = 0;
  for (let i = 0; i < b.length; i++) worst = Math.max(worst, Math.abs(a[i]! - b[i]!));
  return worst;
}

describe('three-phase networks in phase coordinates', () => {
  it.each(SIZES)('%i busbars: Y·V = I holds to the normalised residual', (n) => {
    for (const seed of [1, 2, 3]) {
      const { edges, plan } = network(n, seed);
      const ldl = new BlockLdl(plan);
      stampNetwork(ldl, n, edges, seed);
      expect(solved(ldl, seed).error).toBeLessThan(1e-15);
    }
  });

  it.each([1, 2, 3, 5, 12, 20])('%i busbars: voltages equal a dense library solution', (n) => {
    const { edges, plan } = network(n, 40 + n);
    const ldl = new BlockLdl(plan);
    stampNetwork(ldl, n, edges, 7);
    const { entries, b, x } = solved(ldl, 8);
    const dense = denseSolution(entries, b);
    const scale = Math.max(...dense.map(Math.abs));
    expect(largestDifference(x, dense)).toBeLessThan(1e-11 * scale);
  });

  it('voltages agree with the pivoted factor at 300 busbars', () => {
    const { edges, plan } = network(300, 5);
    const ldl = new BlockLdl(plan);
    stampNetwork(ldl, 300, edges, 6);
    const { entries, b, x } = solved(ldl, 9);
    const y = b.slice();
    new PivotedLu(900, entries).solve(y);
    const scale = Math.max(...y.map(Math.abs));
    expect(largestDifference(x, y)).toBeLessThan(1e-10 * scale);
  });

  it('a network whose zero sequence conducts ten million times less keeps its positive-sequence digits', () => {
    const plan = planElimination(2, Int32Array.from([0, 1]), 1);
    const ldl = new BlockLdl(plan);
    const y1 = 50;
    const y0 = 5e-6;
    for (const node of [0, 1])
      ldl.addBalancedDiagonal(
        ldl.diagonalOffset(node),
        Float64Array.of((y0 + 2 * y1) / 3, 0, (y0 - y1) / 3, 0),
      );
    ldl.addCirculantOffDiagonal(
      ldl.offDiagonalOffset(0, 1),
      false,
      Float64Array.of(0.4 * -y1, 0, 0.4 * 0.5 * y1, 0, 0.4 * 0.5 * y1, 0),
    );
    const x = new Float64Array(12);
    for (let k = 0; k < 3; k++) {
      x[2 * k] = Math.cos((-2 * Math.PI * k) / 3);
      x[2 * k + 1] = Math.sin((-2 * Math.PI * k) / 3);
    }
    ldl.factor();
    ldl.solve(x);
    // Positive sequence alone: [50, −30; −30, 50]⁻¹·[1, 0].
    const expected = 50 / (50 * 50 - 30 * 30);
    const v1 = (x[0]! - 0.5 * (x[2]! + x[4]!) - (Math.sqrt(3) / 2) * (x[3]! - x[5]!)) / 3;
    expect(Math.abs(v1 / expected - 1)).toBeLessThan(1e-14);
  });

  it('several right-hand sides give what each gives alone', () => {
    const { edges, plan } = network(15, 9);
    const ldl = new BlockLdl(plan);
    stampNetwork(ldl, 15, edges, 10);
    ldl.factor();
    const both = randomVector(180, 11);
    const alone = both.slice(90);
    ldl.solve(both, 2);
    ldl.solve(alone);
    expect(both.slice(90)).toEqual(alone);
  });

  it('the driving-point impedance of the last busbar needs no solve', () => {
    const last = 4;
    const { edges, plan } = network(25, 12, last);
    const ldl = new BlockLdl(plan);
    stampNetwork(ldl, 25, edges, 13);
    ldl.factor();
    const z = ldl.lastInverseDiagonal(new Float64Array(18));
    for (let phase = 0; phase < 3; phase++) {
      const x = new Float64Array(150);
      x[6 * last + 2 * phase] = 1;
      ldl.solve(x);
      expect(
        largestDifference(z.slice(6 * phase, 6 * phase + 6), x.slice(6 * last, 6 * last + 6)),
      ).toBeLessThan(1e-15);
    }
  });

  it('balanced and circulant stamps write what whole blocks write', () => {
    const plan = planElimination(3, Int32Array.from([0, 1, 1, 2, 2, 0]));
    const circulant = { re: [1, 2, 3, 3, 1, 2, 2, 3, 1], im: [4, 5, 6, 6, 4, 5, 5, 6, 4] };
    const balanced = { re: [7, 8, 8, 8, 7, 8, 8, 8, 7], im: [1, 9, 9, 9, 1, 9, 9, 9, 1] };
    for (const make of [() => new BlockLdl(plan), () => new BlockLu(plan)]) {
      const fast = make();
      const whole = make();
      for (const [i, j] of [
        [0, 1],
        [1, 0],
        [1, 2],
        [2, 0],
      ] as const) {
        fast.addCirculantOffDiagonal(
          fast.offDiagonalOffset(i, j),
          plan.isTransposed(i, j),
          Float64Array.of(1, 4, 2, 5, 3, 6),
        );
        whole.addOffDiagonalBlock(i, j, circulant.re, circulant.im);
        fast.addCirculantOffDiagonal(fast.offDiagonalOffset(i, j), false, Float64Array.of(7, 1, 8, 9, 8, 9));
        whole.addOffDiagonalBlock(i, j, balanced.re, balanced.im);
        fast.addBalancedDiagonal(fast.diagonalOffset(i), Float64Array.of(7, 1, 8, 9));
        whole.addDiagonalBlock(i, balanced.re, balanced.im);
      }
      expect(fast.values).toEqual(whole.values);
    }
  });

  it('the same stamps and factor in place write into the same array every time', () => {
    const { edges, plan } = network(50, 14);
    const ldl = new BlockLdl(plan);
    const { values } = ldl;
    let first: Float64Array | undefined;
    for (let round = 0; round < 3; round++) {
      ldl.clear();
      stampNetwork(ldl, 50, edges, 15);
      const outcome = ldl.factor();
      first ??= values.slice();
      expect(ldl.values).toBe(values);
      expect(values).toEqual(first);
      expect(outcome.growth).toBeLessThan(1e3);
    }
  });

  it('a busbar without any admittance is reported as singular, by node', () => {
    const plan = planElimination(4, Int32Array.from([0, 1, 1, 2]));
    const ldl = new BlockLdl(plan);
    for (const node of [0, 1, 2])
      ldl.addBalancedDiagonal(ldl.diagonalOffset(node), Float64Array.of(1, 0, 0, 0));
    expect({ ...ldl.factor() }).toEqual({
      status: 'singular',
      growth: Number.POSITIVE_INFINITY,
      worstNode: 3,
    });
  });

  it('a value that is not a number is reported as singular', () => {
    const { edges, plan } = network(6, 16);
    const ldl = new BlockLdl(plan);
    stampNetwork(ldl, 6, edges, 17);
    ldl.setEntry(6, 6, Number.NaN, 0);
    expect(ldl.factor().status).toBe('singular');
  });
});

describe('sequence networks', () => {
  it.each(SIZES)('%i busbars: Y·V = I holds to the normalised residual', (n) => {
    for (const seed of [21, 22]) expect(solved(scalarNetwork(n, seed), seed).error).toBeLessThan(1e-15);
  });

  it('voltages equal a dense library solution', () => {
    const { entries, b, x } = solved(scalarNetwork(40, 23), 24);
    const dense = denseSolution(entries, b);
    expect(largestDifference(x, dense)).toBeLessThan(1e-11 * Math.max(...dense.map(Math.abs)));
  });

  it('the driving-point impedance of the last busbar needs no solve', () => {
    const sequence = scalarNetwork(20, 25);
    sequence.factor();
    const last = sequence.plan.order[19]!;
    const x = new Float64Array(40);
    x[2 * last] = 1;
    sequence.solve(x);
    const z = sequence.lastInverseDiagonal(new Float64Array(2));
    expect(largestDifference(z, x.slice(2 * last, 2 * last + 2))).toBeLessThan(1e-15);
  });
});

describe('networks that are not reciprocal', () => {
  it.each(SIZES.slice(0, 8))('%i busbars: Y·V = I holds to the normalised residual', (n) => {
    for (const seed of [31, 32]) {
      const { edges, plan } = network(n, seed);
      const lu = new BlockLu(plan);
      stampNetwork(lu, n, edges, seed);
      // A machine conducting in the negative sequence alone: y₂/3·(1, a, a²)ᴴ-circulant.
      const s = Math.sqrt(3) / 6;
      for (let node = 0; node < n; node += 3)
        lu.addDiagonalBlock(
          node,
          [1 / 3, -1 / 6, -1 / 6, -1 / 6, 1 / 3, -1 / 6, -1 / 6, -1 / 6, 1 / 3],
          [0, -s, s, s, 0, -s, -s, s, 0],
        );
      const { error, entries } = solved(lu, seed);
      expect(error).toBeLessThan(1e-15);
      const [upper, lower] = [new Map<string, number>(), new Map<string, number>()];
      entries.forEachEntry((row, column, _re, im) => {
        if (row < column) upper.set(`${row},${column}`, im);
        if (row > column) lower.set(`${column},${row}`, im);
      });
      expect([...upper].some(([key, value]) => lower.get(key) !== value)).toBe(true);
    }
  });

  it('voltages equal a dense library solution', () => {
    const { edges, plan } = network(12, 33);
    const lu = new BlockLu(plan);
    stampNetwork(lu, 12, edges, 34);
    lu.addDiagonalBlock(3, [1, 2, 3, 4, 5, 6, 7, 8, 9], [9, 8, 7, 6, 5, 4, 3, 2, 1]);
    const { entries, b, x } = solved(lu, 35);
    const dense = denseSolution(entries, b);
    expect(largestDifference(x, dense)).toBeLessThan(1e-11 * Math.max(...dense.map(Math.abs)));
  });

  it('a reciprocal network gives the voltages of the symmetric factor', () => {
    const { edges, plan } = network(80, 36, 5);
    const lu = new BlockLu(plan);
    const ldl = new BlockLdl(plan);
    for (const kernel of [lu, ldl]) {
      stampNetwork(kernel, 80, edges, 37);
      kernel.factor();
    }
    const x = randomVector(480, 38);
    const y = x.slice();
    lu.solve(x);
    ldl.solve(y);
    expect(largestDifference(x, y)).toBeLessThan(1e-12 * Math.max(...y.map(Math.abs)));
    const [p, q] = [Float64Array.from([1, 2, 3, 4, 5, 6]), Float64Array.from([1, 2, 3, 4, 5, 6])];
    lu.lastSolve(p);
    ldl.lastSolve(q);
    expect(largestDifference(p, q)).toBeLessThan(1e-12);
  });
});

describe('pivoted factor', () => {
  it('solves a matrix whose diagonal is zero', () => {
    const random = seededRandom(41);
    const entries: [number, number, number, number][] = [];
    for (let i = 0; i < 30; i++)
      for (let j = 0; j < 30; j++) if (i !== j) entries.push([i, j, random() - 0.5, random() - 0.5]);
    const source = new StampedEntries(30, {
      forEachEntry: (visit) => {
        for (const entry of entries) visit(...entry);
      },
    });
    const b = randomVector(60, 42);
    const x = b.slice();
    new PivotedLu(30, source).solve(x);
    expect(source.backwardError(b, x)).toBeLessThan(1e-15);
    expect(largestDifference(x, denseSolution(source, b))).toBeLessThan(1e-11);
  });

  it('reports a singular matrix and refuses to solve with it', () => {
    const lu = new PivotedLu(2, {
      forEachEntry: (visit) => {
        visit(0, 0, 1, 0);
        visit(1, 0, 2, 0);
      },
    });
    expect(lu.status).toBe('singular');
    expect(() => lu.solve(new Float64Array(4))).toThrow(RangeError);
  });
});

describe('real block factor', () => {
  it.each([1, 2, 9, 60])('%i busbars: the residual vanishes, also with zeros on the diagonal', (n) => {
    const { edges, plan } = network(n, 51);
    const lu = new RealBlockLu(plan, 6);
    const random = seededRandom(52);
    const entries: [number, number, number][] = [];
    const block = (i: number, j: number, size: number) => {
      for (let r = 0; r < 6; r++)
        for (let c = 0; c < 6; c++) {
          const value =
            i === j && r === c ? 0 : size * (random() - 0.5) + (i === j && (r + 3) % 6 === c ? 20 : 0);
          entries.push([6 * i + r, 6 * j + c, value]);
          lu.add(i, r, j, c, value);
        }
    };
    for (let i = 0; i < n; i++) block(i, i, 1);
    for (let e = 0; e < edges.length; e += 2)
      if (edges[e] !== edges[e + 1]) {
        block(edges[e]!, edges[e + 1]!, 1);
        block(edges[e + 1]!, edges[e]!, 1);
      }
    expect(lu.factor()).toBe('factored');
    const b = randomVector(6 * n, 53);
    const x = b.slice();
    lu.solve(x);
    const r = b.slice();
    for (const [row, column, value] of entries) r[row] = r[row]! - value * x[column]!;
    expect(Math.max(...r.map(Math.abs))).toBeLessThan(1e-13);
  });

  it('reports a block without a pivot', () => {
    expect(new RealBlockLu(planElimination(2, new Int32Array(0)), 2).factor()).toBe('singular');
  });
});
