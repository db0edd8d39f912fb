import type { Network } from '../network/Network.ts';
import { DenseLu } from './DenseLu.ts';
import { demandCurrents } from './demandCurrents.ts';
import { addDemandSlopes } from './demandSlopes.ts';
import { largestChange, phaseVolts } from './fixedPoint.ts';
import type { OrderSolver } from './OrderSolver.ts';
import { injectionsOf } from './sourceCurrents.ts';

export interface Continuation {
  converged: boolean;
  /** Node voltages at the last share reached. */
  v: Float64Array;
  /** Share of the demand up to which a solution was followed. */
  share: number;
  /** Newton steps taken. */
  steps: number;
  worstNode: number;
}

const smallestStep = 1e-4;

/**
 * Newton's method on the nodes that carry constant power, the demand raised from nothing in steps:
 * F(V) = V − V0 + Z·λ·I(V) = 0 with V0 the voltages without demand and Z the transfer impedances between
 * those nodes. I depends on conj(V) alone, so the Jacobian is ΔV + λ·Z·D·conj(ΔV), solved as a real system.
 * A step is kept only while the determinant keeps the sign it has without load: the upper voltage.
 * V. Ajjarapu and C. Christy, Trans. PWRS 7 (1992) 416 (from memory) for following the curve by load.
 */
export function continueFromNoLoad(
  network: Network,
  solver: OrderSolver,
  noLoad: Float64Array,
  own: Float64Array,
): Continuation {
  const newton = new ReducedNewton(network, solver, noLoad, own);
  let v: Float64Array = noLoad.slice();
  let share = 0;
  let step = 0.5;
  while (share < 1 && step >= smallestStep) {
    const target = Math.min(1, share + step);
    const trial = newton.solveAt(target, v);
    if (trial) {
      v = trial;
      share = target;
      step *= 2;
    } else {
      step /= 2;
    }
  }
  demandCurrents(network, v, own);
  return { converged: share === 1, v, share, steps: newton.steps, worstNode: lowestNode(network, v) };
}

class ReducedNewton {
  steps = 0;
  private readonly nodes: Int32Array; //     nodes with constant power
  private readonly z: Float64Array; //       Z between them, interleaved, (3m)² complex row by row
  private readonly size: number; //          3m

  constructor(
    private readonly network: Network,
    private readonly solver: OrderSolver,
    private readonly noLoad: Float64Array,
    private readonly own: Float64Array,
  ) {
    const carrying = new Set(
      network.shunts.filter(({ demand, node }) => demand && node >= 0).map(({ node }) => node),
    );
    this.nodes = Int32Array.from([...carrying].sort((a, b) => a - b));
    this.size = 3 * this.nodes.length;
    this.z = this.transferImpedances();
  }

  /** Voltages of the whole network at a share of the demand, or null where Newton does not get there. */
  solveAt(share: number, start: Float64Array): Float64Array | null {
    let v = start;
    let before = Number.POSITIVE_INFINITY;
    for (let round = 0; round < 12; round++) {
      this.steps += 1;
      const next = this.step(share, v);
      if (!next) return null;
      const change = largestChange(this.network, v, next.v);
      if (!Number.isFinite(change) || change > 0.5) return null;
      v = next.v;
      if (change < 1e-12 || (change >= before && change < 1e-10)) return next.sign > 0 ? v : null;
      before = change;
    }
    return null;
  }

  /** One Newton step; the whole network's voltages follow from the new demand nodes' currents. */
  private step(share: number, v: Float64Array): { v: Float64Array; sign: number } | null {
    const slopes = this.slopes(share, v);
    const lu = new DenseLu(this.jacobian(slopes), 2 * this.size);
    if (lu.sign === 0) return null;
    const fixed = this.voltagesFor(share, v);
    const correction = new Float64Array(2 * this.size);
    for (let a = 0; a < this.size; a++) {
      const place = this.place(a);
      correction[a] = fixed[place]! - v[place]!;
      correction[this.size + a] = fixed[place + 1]! - v[place + 1]!;
    }
    lu.solve(correction);
    return { v: this.spread(slopes, fixed, correction), sign: lu.sign };
  }

  /** V0 − Z·λ·I(V) on all nodes. */
  private voltagesFor(share: number, v: Float64Array): Float64Array {
    const { network, own } = this;
    demandCurrents(network, v, own);
    const x = new Float64Array(v.length);
    const demands = new Float64Array(own.length);
    network.shunts.forEach((part, k) => {
      if (part.demand) for (let c = 6 * k; c < 6 * k + 6; c++) demands[c] = share * own[c]!;
    });
    injectionsOf(network, demands, x);
    this.solver.solve(x);
    for (let c = 0; c < x.length; c++) x[c] = x[c]! + this.noLoad[c]!;
    return x;
  }

  /** Full voltages after the correction: V0 − Z·λ·(I + D·conj(ΔV)). */
  private spread(slopes: Float64Array, fixed: Float64Array, correction: Float64Array): Float64Array {
    const x = new Float64Array(fixed.length);
    for (let a = 0; a < this.size; a++) {
      const node = (a / 3) | 0;
      const place = this.place(a);
      for (let b = 0; b < 3; b++) {
        const d = 18 * node + 6 * (a % 3) + 2 * b;
        const re = correction[3 * node + b]!;
        const im = -correction[this.size + 3 * node + b]!;
        x[place] = x[place]! - (slopes[d]! * re - slopes[d + 1]! * im);
        x[place + 1] = x[place + 1]! - (slopes[d]! * im + slopes[d + 1]! * re);
      }
    }
    this.solver.solve(x);
    for (let c = 0; c < x.length; c++) x[c] = x[c]! + fixed[c]!;
    return x;
  }

  /** λ·D per demand node, 3 × 3 complex row by row. */
  private slopes(share: number, v: Float64Array): Float64Array {
    const slopes = new Float64Array(18 * this.nodes.length);
    const rowOf = new Map([...this.nodes].map((node, row) => [node, row]));
    for (const part of this.network.shunts) {
      const row = rowOf.get(part.node);
      if (part.demand && row !== undefined) addDemandSlopes(part, part.demand, share, v, slopes, 18 * row);
    }
    return slopes;
  }

  /** Real form of ΔV + M·conj(ΔV), M = Z·λD: [[1 + Mr, Mi], [Mi, 1 − Mr]], row by row. */
  private jacobian(slopes: Float64Array): Float64Array {
    const n = this.size;
    const j = new Float64Array(4 * n * n);
    for (let row = 0; row < n; row++)
      for (let column = 0; column < n; column++) {
        const node = (column / 3) | 0;
        let re = 0;
        let im = 0;
        for (let b = 0; b < 3; b++) {
          const z = 2 * (row * n + 3 * node + b);
          const d = 18 * node + 6 * b + 2 * (column % 3);
          re += this.z[z]! * slopes[d]! - this.z[z + 1]! * slopes[d + 1]!;
          im += this.z[z]! * slopes[d + 1]! + this.z[z + 1]! * slopes[d]!;
        }
        const unit = row === column ? 1 : 0;
        j[row * 2 * n + column] = unit + re;
        j[row * 2 * n + n + column] = im;
        j[(n + row) * 2 * n + column] = im;
        j[(n + row) * 2 * n + n + column] = unit - re;
      }
    return j;
  }

  private transferImpedances(): Float64Array {
    const n = this.size;
    const z = new Float64Array(2 * n * n);
    const x = new Float64Array(6 * this.network.nodeCount);
    for (let column = 0; column < n; column++) {
      x.fill(0);
      x[this.place(column)] = 1;
      this.solver.solve(x);
      for (let row = 0; row < n; row++) {
        z[2 * (row * n + column)] = x[this.place(row)]!;
        z[2 * (row * n + column) + 1] = x[this.place(row) + 1]!;
      }
    }
    return z;
  }

  /** Offset of the a-th phase of the demand nodes in a vector over all nodes. */
  private place(a: number): number {
    return 6 * this.nodes[(a / 3) | 0]! + 2 * (a % 3);
  }
}

/** Node with the lowest phase voltage in per unit of its nominal. */
function lowestNode(network: Network, v: Float64Array): number {
  let worst = 0;
  let lowest = Number.POSITIVE_INFINITY;
  for (let node = 0; node < network.nodeCount; node++)
    for (let c = 6 * node; c < 6 * node + 6; c += 2) {
      const level = Math.hypot(v[c]!, v[c + 1]!) / phaseVolts(network, node);
      if (level < lowest) {
        lowest = level;
        worst = node;
      }
    }
  return worst;
}
