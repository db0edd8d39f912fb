import { BlockLdl, PivotedLu } from '../kernel/index.ts';
import type { Network, Role, ShuntPart } from '../network/Network.ts';
import { NodeAdmittances } from './NodeAdmittances.ts';
import { type OrderSolver, SingularNetworkError, trustedGrowth } from './OrderSolver.ts';
import { planFor } from './planFor.ts';

/** Packed place, in floats, of an entry (row, column) of a symmetric diagonal block: 00 10 20 11 21 22. */
const packed = [
  [0, 2, 4],
  [2, 6, 8],
  [4, 8, 10],
] as const;

interface SeriesStamp {
  at: number;
  offset: number;
  turned: boolean;
  /** 2·cos(θ + 120°·k), the positive and negative sequence together in a circulant's first row. */
  cos0: number;
  cos1: number;
  cos2: number;
}

/**
 * Phase coordinates, three unknowns a node: the truth. Passive parts are complex symmetric and go to the
 * block L·D·Lᵀ; a motor's negative-sequence admittance at the fundamental is not, so that one matrix and
 * any whose factor grows beyond trust go to the pivoted LU.
 */
export class PhaseSolver implements OrderSolver {
  readonly admittances: NodeAdmittances;
  readonly matrix: BlockLdl;
  private readonly network: Network;
  private readonly diagonalOffset: Int32Array;
  private readonly stamps: readonly SeriesStamp[];
  private pivoted: PivotedLu | null = null;

  constructor(network: Network, lastNode?: number) {
    this.network = network;
    this.admittances = new NodeAdmittances(network);
    this.matrix = new BlockLdl(planFor(network, lastNode));
    this.diagonalOffset = Int32Array.from({ length: network.nodeCount }, (_, node) =>
      this.matrix.diagonalOffset(node),
    );
    this.stamps = this.admittances.series.map(({ at, from, to, clock }) => ({
      at,
      offset: this.matrix.offDiagonalOffset(from, to),
      turned: this.matrix.plan.isTransposed(from, to),
      cos0: 2 * Math.cos((clock * Math.PI) / 6),
      cos1: 2 * Math.cos(((clock + 4) * Math.PI) / 6),
      cos2: 2 * Math.cos(((clock + 8) * Math.PI) / 6),
    }));
  }

  prepare(h: number, role: Role): void {
    this.stamp(h, role);
    this.pivoted = null;
    const motors = this.admittances.negativeParts(role);
    if (motors.length > 0) {
      this.factorWithPivots(h, motors);
      return;
    }
    const { status, growth } = this.matrix.factor();
    if (status === 'factored' && growth < trustedGrowth) return;
    this.stamp(h, role);
    this.factorWithPivots(h, []);
  }

  solve(x: Float64Array): void {
    if (this.pivoted) this.pivoted.solve(x);
    else this.matrix.solve(x);
  }

  /** Writes Y(h) into the matrix, unfactored. */
  stamp(h: number, role: Role): void {
    this.admittances.evaluate(h, role);
    this.matrix.clear();
    this.stampDiagonals();
    this.stampSeries();
    for (const part of this.admittances.unbalancedParts(role)) this.stampPhases(part);
  }

  private stampDiagonals(): void {
    const { diagonal } = this.admittances;
    const { matrix, diagonalOffset } = this;
    for (let node = 0, i = 0; node < diagonalOffset.length; node++, i += 4) {
      const mutualR = (diagonal[i]! - diagonal[i + 2]!) / 3;
      const mutualI = (diagonal[i + 1]! - diagonal[i + 3]!) / 3;
      const selfR = mutualR + diagonal[i + 2]!;
      const selfI = mutualI + diagonal[i + 3]!;
      matrix.addBalancedDiagonal(diagonalOffset[node]!, selfR, selfI, mutualR, mutualI);
    }
  }

  private stampSeries(): void {
    const { values } = this.network;
    for (const { at, offset, turned, cos0, cos1, cos2 } of this.stamps) {
      const zeroR = values[at + 8]! / 3;
      const zeroI = values[at + 9]! / 3;
      const re = values[at + 10]! / 3;
      const im = values[at + 11]! / 3;
      this.matrix.addCirculantOffDiagonal(
        offset,
        turned,
        zeroR + cos0 * re,
        zeroI + cos0 * im,
        zeroR + cos1 * re,
        zeroI + cos1 * im,
        zeroR + cos2 * re,
        zeroI + cos2 * im,
      );
    }
  }

  private stampPhases({ node, at, phases: { p, q } }: ShuntPart): void {
    const { values: v } = this.matrix;
    const offset = this.diagonalOffset[node]!;
    const re = this.network.values[at + 2]!;
    const im = this.network.values[at + 3]!;
    const add = (row: number, column: number, sign: number): void => {
      const place = offset + packed[row as 0 | 1 | 2][column as 0 | 1 | 2];
      v[place] = v[place]! + sign * re;
      v[place + 1] = v[place + 1]! + sign * im;
    };
    add(p, p, 1);
    if (q < 0) return;
    add(q, q, 1);
    add(p, q, -1);
  }

  private factorWithPivots(h: number, motors: readonly ShuntPart[]): void {
    const { matrix } = this;
    const { values } = this.network;
    const order = Int32Array.from(
      [...matrix.plan.order].flatMap((node) => [3 * node, 3 * node + 1, 3 * node + 2]),
    );
    this.pivoted = new PivotedLu(
      3 * this.network.nodeCount,
      {
        forEachEntry(visit) {
          matrix.forEachEntry(visit);
          for (const { node, at } of motors) visitNegative(node, values[at + 2]!, values[at + 3]!, visit);
        },
      },
      order,
    );
    if (this.pivoted.status === 'singular') throw new SingularNetworkError(h);
  }
}

/** Entries (y2/3)·a^(row − column) of an admittance in the negative sequence alone. */
function visitNegative(
  node: number,
  re: number,
  im: number,
  visit: (row: number, column: number, re: number, im: number) => void,
): void {
  for (let row = 0; row < 3; row++)
    for (let column = 0; column < 3; column++) {
      const angle = (2 * Math.PI * (row - column)) / 3;
      const c = Math.cos(angle) / 3;
      const s = Math.sin(angle) / 3;
      visit(3 * node + row, 3 * node + column, re * c - im * s, re * s + im * c);
    }
}
