import type { Network } from '../network/Network.ts';
import { toSequences } from '../solve/fortescue.ts';
import type { SequenceNumber } from '../solve/OrderSolver.ts';
import { PhaseSolver } from '../solve/PhaseSolver.ts';
import { SequenceSolver } from '../solve/SequenceSolver.ts';

const halfRoot3 = Math.sqrt(3) / 2;

/**
 * Driving-point impedance V_s/I_s at one node, frequency after frequency, ohms: harmonic models at every
 * h, EMFs shorted, bridges open. The node is eliminated last, so its pivot alone gives the answer. Where
 * the network is balanced one sequence network is enough. Nothing is allocated per frequency.
 */
export class DrivingPointProbe {
  re = 0;
  im = 0;
  private readonly sequence: SequenceNumber;
  private readonly solver: PhaseSolver | SequenceSolver;
  private readonly x = new Float64Array(6);
  private readonly s = new Float64Array(6);

  constructor(network: Network, node: number, sequence: SequenceNumber) {
    this.sequence = sequence;
    this.solver = network.balanced ? new SequenceSolver(network, node) : new PhaseSolver(network, node);
  }

  /** Puts Z(h) into `re` and `im`. */
  at(h: number): void {
    const { solver, sequence, x, s } = this;
    if (solver instanceof SequenceSolver) {
      solver.prepare(h, 'harmonic', sequence);
      x[0] = 1;
      x[1] = 0;
      solver.solveLast(x);
      this.re = x[0]!;
      this.im = x[1]!;
      return;
    }
    solver.prepare(h, 'harmonic');
    this.inject();
    solver.solveLast(x);
    toSequences(x, 0, s, 0);
    this.re = s[2 * sequence]!;
    this.im = s[2 * sequence + 1]!;
  }

  /** |Z(h)|, ohms. */
  magnitude(h: number): number {
    this.at(h);
    return Math.sqrt(this.re * this.re + this.im * this.im);
  }

  /** Phases of a unit current in the sequence: 1, a^(−s), a^(+s). */
  private inject(): void {
    const { x, sequence } = this;
    const c = sequence === 0 ? 1 : -0.5;
    const d = sequence === 0 ? 0 : sequence === 1 ? -halfRoot3 : halfRoot3;
    x[0] = 1;
    x[1] = 0;
    x[2] = c;
    x[3] = d;
    x[4] = c;
    x[5] = -d;
  }
}
