import { BlockLdl, BlockLu, type BlockMatrix, GuardedSolver } from '../kernel/index.ts';
import type { Network, Role } from '../network/Network.ts';
import { NodeAdmittances } from './NodeAdmittances.ts';
import { type FactorMethod, type OrderSolver, SingularNetworkError } from './OrderSolver.ts';
import { PhaseStamps } from './PhaseStamps.ts';
import { planFor } from './planFor.ts';

interface Factor {
  guard: GuardedSolver<BlockLdl> | GuardedSolver<BlockLu>;
  stamp: Record<Role, () => void>;
}

/**
 * Phase coordinates, three unknowns a node: the truth. Reciprocal parts make Y complex symmetric, for the
 * block L·D·Lᵀ; a motor's negative-sequence admittance at the fundamental does not, so where there is one
 * that single matrix goes to the block L·D·U on the same plan.
 */
export class PhaseSolver implements OrderSolver {
  method: FactorMethod = 'direct';
  private readonly network: Network;
  private readonly lastNode: number | undefined;
  private readonly admittances: NodeAdmittances;
  private readonly reciprocal: Factor;
  private general: Factor | null = null;
  private current: Factor;

  constructor(network: Network, lastNode?: number) {
    this.network = network;
    this.lastNode = lastNode;
    this.admittances = new NodeAdmittances(network);
    const matrix = new BlockLdl(planFor(network, lastNode));
    this.reciprocal = {
      guard: new GuardedSolver(matrix, (plan) => new BlockLdl(plan)),
      stamp: this.stampsInto(matrix),
    };
    this.current = this.reciprocal;
  }

  prepare(h: number, role: Role): void {
    this.admittances.evaluate(h, role);
    this.current = this.admittances.negativeParts(role).length > 0 ? this.generalFactor() : this.reciprocal;
    const { guard, stamp } = this.current;
    stamp[role]();
    const { status, method } = guard.factor(stamp[role]);
    this.method = method;
    if (status !== 'factored') throw new SingularNetworkError(h);
  }

  solve(x: Float64Array): void {
    this.current.guard.solve(x);
  }

  /** Volts at the plan's last node for amperes injected there, three complex in `x`, in place. */
  solveLast(x: Float64Array): void {
    this.current.guard.lastSolve(x);
  }

  private generalFactor(): Factor {
    if (this.general) return this.general;
    const matrix = new BlockLu(planFor(this.network, this.lastNode));
    this.general = {
      guard: new GuardedSolver(matrix, (plan) => new BlockLu(plan)),
      stamp: this.stampsInto(matrix),
    };
    return this.general;
  }

  private stampsInto(matrix: BlockMatrix): Record<Role, () => void> {
    const stamps = new PhaseStamps(this.admittances, matrix);
    return { fundamental: () => stamps.write('fundamental'), harmonic: () => stamps.write('harmonic') };
  }
}
