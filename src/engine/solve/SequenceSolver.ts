import { GuardedSolver, ScalarLdl } from '../kernel/index.ts';
import type { Network, Role } from '../network/Network.ts';
import { addPhases, toSequences } from './fortescue.ts';
import { NodeAdmittances } from './NodeAdmittances.ts';
import {
  type FactorMethod,
  type OrderSolver,
  type SequenceNumber,
  SingularNetworkError,
} from './OrderSolver.ts';
import { planFor } from './planFor.ts';

/**
 * One sequence network of a balanced network, one unknown a node. Each node's quantities are referred to
 * its own clock-shifted frame, V = V′·e^(∓j·30°·hours), so that a transformer's shift leaves the matrix
 * and it stays symmetric; angles are put back on the way out. At integer h a balanced network carries the
 * sequence h mod 3 alone.
 */
export class SequenceSolver implements OrderSolver {
  method: FactorMethod = 'direct';
  private readonly admittances: NodeAdmittances;
  private readonly matrix: ScalarLdl;
  private readonly guard: GuardedSolver<ScalarLdl>;
  private readonly network: Network;
  private readonly diagonalOffset: Int32Array;
  private readonly seriesOffset: Int32Array;
  private readonly cos: Float64Array;
  private readonly sin: Float64Array;
  private readonly x: Float64Array;
  private readonly six = new Float64Array(6);
  private readonly restamp = (): void => this.stamp();
  private sequence: SequenceNumber = 1;

  constructor(network: Network, lastNode?: number) {
    if (!network.balanced) throw new RangeError('a sequence solver needs a balanced network');
    this.network = network;
    this.admittances = new NodeAdmittances(network);
    this.matrix = new ScalarLdl(planFor(network, lastNode));
    this.guard = new GuardedSolver(this.matrix, (plan) => new ScalarLdl(plan));
    const nodes = Int32Array.from({ length: network.nodeCount }, (_, node) => node);
    this.diagonalOffset = nodes.map((node) => this.matrix.diagonalOffset(node));
    this.seriesOffset = Int32Array.from(this.admittances.series, ({ from, to }) =>
      this.matrix.offDiagonalOffset(from, to),
    );
    this.cos = Float64Array.from(network.hours, (hours) => Math.cos((hours * Math.PI) / 6));
    this.sin = Float64Array.from(network.hours, (hours) => Math.sin((hours * Math.PI) / 6));
    this.x = new Float64Array(2 * network.nodeCount);
  }

  prepare(h: number, role: Role, sequence: SequenceNumber = sequenceOf(h)): void {
    this.sequence = sequence;
    this.admittances.evaluate(h, role);
    this.stamp();
    const { status, method } = this.guard.factor(this.restamp);
    this.method = method;
    if (status !== 'factored') throw new SingularNetworkError(h);
  }

  solve(x: Float64Array): void {
    const own = this.x;
    const s = 2 * this.sequence;
    const sense = this.sequence === 0 ? 0 : this.sequence === 1 ? 1 : -1;
    const six = this.six;
    for (let node = 0; node < this.cos.length; node++) {
      toSequences(x, 6 * node, six, 0);
      const c = sense === 0 ? 1 : this.cos[node]!;
      const d = sense * this.sin[node]!;
      own[2 * node] = six[s]! * c - six[s + 1]! * d;
      own[2 * node + 1] = six[s]! * d + six[s + 1]! * c;
    }
    this.solveSequence(own);
    six.fill(0);
    x.fill(0, 0, 6 * this.cos.length);
    for (let node = 0; node < this.cos.length; node++) {
      const c = sense === 0 ? 1 : this.cos[node]!;
      const d = -sense * this.sin[node]!;
      six[s] = own[2 * node]! * c - own[2 * node + 1]! * d;
      six[s + 1] = own[2 * node]! * d + own[2 * node + 1]! * c;
      addPhases(six, 0, x, 6 * node);
    }
  }

  /** Amperes into volts of the prepared sequence, two numbers a node, in the nodes' shifted frames. */
  solveSequence(x: Float64Array): void {
    this.guard.solve(x);
  }

  /** Volts at the plan's last node for amperes injected there, one complex in `x`, in place. */
  solveLast(x: Float64Array): void {
    this.guard.lastSolve(x);
  }

  private stamp(): void {
    const { values: v } = this.matrix;
    const { diagonal, series } = this.admittances;
    const { values } = this.network;
    v.fill(0);
    const part = this.sequence === 0 ? 0 : 2;
    for (let node = 0; node < this.diagonalOffset.length; node++) {
      const offset = this.diagonalOffset[node]!;
      v[offset] = diagonal[4 * node + part]!;
      v[offset + 1] = diagonal[4 * node + part + 1]!;
    }
    for (let k = 0; k < series.length; k++) {
      const offset = this.seriesOffset[k]!;
      const at = series[k]!.at + 8 + part;
      v[offset] = v[offset]! + values[at]!;
      v[offset + 1] = v[offset + 1]! + values[at + 1]!;
    }
  }
}

/** The sequence a balanced, time-shifted set of order h forms: 1 positive, 2 negative, 0 zero. */
function sequenceOf(h: number): SequenceNumber {
  if (!Number.isInteger(h)) throw new RangeError(`order ${h} is no integer: name its sequence`);
  return (h % 3) as SequenceNumber;
}
