import type { BlockMatrix } from '../kernel/index.ts';
import type { Network, Role, ShuntPart } from '../network/Network.ts';
import type { NodeAdmittances } from './NodeAdmittances.ts';

interface SeriesStamp {
  at: number;
  offset: number;
  turned: boolean;
  /** 2·cos(θ + 120°·k): positive and negative sequence together in a circulant's first row. */
  cos0: number;
  cos1: number;
  cos2: number;
}

/**
 * Writes a network's Y(h) into one block matrix, from the sequence admittances evaluated last. A vector
 * group is a real rotation in phase coordinates, entry (i, j) = (y0 + 2·y1·cos(θ − 120°·(i − j)))/3, so
 * that Y_LH = Y_HLᵀ. Offsets are looked up once; nothing is allocated per order.
 */
export class PhaseStamps {
  private readonly network: Network;
  private readonly admittances: NodeAdmittances;
  private readonly matrix: BlockMatrix;
  private readonly diagonalOffset: Int32Array;
  private readonly series: readonly SeriesStamp[];
  private readonly entries = new Float64Array(6);
  private readonly re = new Float64Array(9);
  private readonly im = new Float64Array(9);

  constructor(admittances: NodeAdmittances, matrix: BlockMatrix) {
    this.network = admittances.network;
    this.admittances = admittances;
    this.matrix = matrix;
    this.diagonalOffset = Int32Array.from({ length: this.network.nodeCount }, (_, node) =>
      matrix.diagonalOffset(node),
    );
    this.series = admittances.series.map(({ at, from, to, clock }) => ({
      at,
      offset: matrix.offDiagonalOffset(from, to),
      turned: matrix.plan.isTransposed(from, to),
      cos0: 2 * Math.cos((clock * Math.PI) / 6),
      cos1: 2 * Math.cos(((clock + 4) * Math.PI) / 6),
      cos2: 2 * Math.cos(((clock + 8) * Math.PI) / 6),
    }));
  }

  write(role: Role): void {
    this.matrix.clear();
    this.writeDiagonals();
    this.writeSeries();
    for (const part of this.admittances.unbalancedParts(role)) this.addPhasePart(part);
    for (const part of this.admittances.negativeParts(role)) this.addNegative(part);
  }

  private writeDiagonals(): void {
    const { diagonal } = this.admittances;
    const { matrix, diagonalOffset, entries } = this;
    for (let node = 0, i = 0; node < diagonalOffset.length; node++, i += 4) {
      const mutualR = (diagonal[i]! - diagonal[i + 2]!) / 3;
      const mutualI = (diagonal[i + 1]! - diagonal[i + 3]!) / 3;
      entries[0] = mutualR + diagonal[i + 2]!;
      entries[1] = mutualI + diagonal[i + 3]!;
      entries[2] = mutualR;
      entries[3] = mutualI;
      matrix.addBalancedDiagonal(diagonalOffset[node]!, entries);
    }
  }

  private writeSeries(): void {
    const { values } = this.network;
    const { entries } = this;
    for (const { at, offset, turned, cos0, cos1, cos2 } of this.series) {
      const zeroR = values[at + 8]! / 3;
      const zeroI = values[at + 9]! / 3;
      const re = values[at + 10]! / 3;
      const im = values[at + 11]! / 3;
      entries[0] = zeroR + cos0 * re;
      entries[1] = zeroI + cos0 * im;
      entries[2] = zeroR + cos1 * re;
      entries[3] = zeroI + cos1 * im;
      entries[4] = zeroR + cos2 * re;
      entries[5] = zeroI + cos2 * im;
      this.matrix.addCirculantOffDiagonal(offset, turned, entries);
    }
  }

  private addPhasePart({ node, at, phases: { p, q } }: ShuntPart): void {
    const re = this.network.values[at + 2]!;
    const im = this.network.values[at + 3]!;
    this.re.fill(0);
    this.im.fill(0);
    this.setEntry(p, p, re, im);
    if (q >= 0) {
      this.setEntry(q, q, re, im);
      this.setEntry(p, q, -re, -im);
      this.setEntry(q, p, -re, -im);
    }
    this.matrix.addDiagonalBlock(node, this.re, this.im);
  }

  /** Entries (y2/3)·a^(row − column): an admittance in the negative sequence alone is not symmetric. */
  private addNegative({ node, at }: ShuntPart): void {
    const re = this.network.values[at + 2]! / 3;
    const im = this.network.values[at + 3]! / 3;
    for (let row = 0; row < 3; row++)
      for (let column = 0; column < 3; column++) {
        const c = Math.cos((2 * Math.PI * (row - column)) / 3);
        const s = Math.sin((2 * Math.PI * (row - column)) / 3);
        this.setEntry(row, column, re * c - im * s, re * s + im * c);
      }
    this.matrix.addDiagonalBlock(node, this.re, this.im);
  }

  private setEntry(row: number, column: number, re: number, im: number): void {
    this.re[3 * row + column] = re;
    this.im[3 * row + column] = im;
  }
}
