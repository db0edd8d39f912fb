import { BlockLu, RealBlockLu, StampedEntries } from '../kernel/index.ts';
import type { Network } from '../network/Network.ts';
import { demandCurrents } from './demandCurrents.ts';
import { addDemandSlopes } from './demandSlopes.ts';
import { NodeAdmittances } from './NodeAdmittances.ts';
import type { OrderSolver } from './OrderSolver.ts';
import { PhaseStamps } from './PhaseStamps.ts';
import { planFor } from './planFor.ts';

/**
 * Newton's equations of the fundamental with the demand scaled by λ, in phase coordinates:
 * F(V) = Y·V − I_sources + λ·I(V) = 0, and since I depends on conj(V) alone, J·ΔV = Y·ΔV + λ·D·conj(ΔV),
 * solved as 6 × 6 real blocks a node: [[G + λDr, λDi − B], [B + λDi, G − λDr]]. Amperes and volts,
 * six interleaved numbers a node (re, im of L1, L2, L3).
 */
export class PowerJacobian {
  private readonly network: Network;
  private readonly solver: OrderSolver;
  private readonly noLoad: Float64Array;
  private readonly own: Float64Array;
  private readonly entries: StampedEntries;
  private readonly lu: RealBlockLu;

  /**
   * `solver` prepared at the fundamental, `noLoad` its voltages without demand, `own` scratch for the
   * parts' currents.
   */
  constructor(network: Network, solver: OrderSolver, noLoad: Float64Array, own: Float64Array) {
    this.network = network;
    this.solver = solver;
    this.noLoad = noLoad;
    this.own = own;
    const admittances = new NodeAdmittances(network);
    admittances.evaluate(1, 'fundamental');
    const plan = planFor(network);
    const matrix = new BlockLu(plan);
    new PhaseStamps(admittances, matrix).write('fundamental');
    this.entries = new StampedEntries(3 * network.nodeCount, matrix);
    this.lu = new RealBlockLu(plan);
  }

  /**
   * −F(V), amperes, as Y·(V0 − λ·Z·I(V) − V): formed from the small difference of voltages, since
   * I_sources − Y·V loses every digit where a tie of micro-ohms joins two busbars.
   */
  mismatch(share: number, v: Float64Array): Float64Array {
    const x = this.demand(v).map((value) => -share * value);
    this.solver.solve(x);
    // residual(0, x) = −Y·x, hence the turned difference.
    for (let c = 0; c < x.length; c++) x[c] = v[c]! - this.noLoad[c]! - x[c]!;
    return this.entries.residual(new Float64Array(x.length), x);
  }

  /** −∂F/∂λ = −I(V), amperes. */
  loading(v: Float64Array): Float64Array {
    return this.demand(v).map((value) => -value);
  }

  /** Factors J at V; false where it is singular. */
  factor(share: number, v: Float64Array): boolean {
    const { lu, network } = this;
    lu.clear();
    this.entries.forEachEntry((row, column, re, im) => {
      const [i, r] = [Math.trunc(row / 3), 2 * (row % 3)];
      const [j, c] = [Math.trunc(column / 3), 2 * (column % 3)];
      lu.add(i, r, j, c, re);
      lu.add(i, r, j, c + 1, -im);
      lu.add(i, r + 1, j, c, im);
      lu.add(i, r + 1, j, c + 1, re);
    });
    const block = new Float64Array(18);
    for (const part of network.shunts) {
      if (!part.demand || part.node < 0) continue;
      block.fill(0);
      addDemandSlopes(part, part.demand, share, v, block, 0);
      this.addSlopes(part.node, block);
    }
    return lu.factor() === 'factored';
  }

  /** x ← J⁻¹·x of the last factor. */
  solve(x: Float64Array): void {
    this.lu.solve(x);
  }

  private addSlopes(node: number, block: Float64Array): void {
    for (let e = 0; e < 9; e++) {
      const [r, c] = [2 * Math.trunc(e / 3), 2 * (e % 3)];
      const re = block[2 * e]!;
      const im = block[2 * e + 1]!;
      this.lu.add(node, r, node, c, re);
      this.lu.add(node, r, node, c + 1, im);
      this.lu.add(node, r + 1, node, c, im);
      this.lu.add(node, r + 1, node, c + 1, -re);
    }
  }

  /** Currents INTO the constant-power parts at V, summed per node. */
  private demand(v: Float64Array): Float64Array {
    const { network, own } = this;
    demandCurrents(network, v, own);
    const sum = new Float64Array(v.length);
    network.shunts.forEach(({ demand, node }, k) => {
      if (!demand || node < 0) return;
      for (let c = 0; c < 6; c++) sum[6 * node + c] = sum[6 * node + c]! + own[6 * k + c]!;
    });
    return sum;
  }
}
