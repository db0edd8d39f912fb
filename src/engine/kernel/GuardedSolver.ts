import type { EliminationPlan } from './EliminationPlan.ts';
import type { KernelMatrix } from './KernelMatrix.ts';
import { PivotedLu } from './PivotedLu.ts';
import { planElimination } from './planElimination.ts';
import { StampedEntries } from './StampedEntries.ts';

/** Above this growth one step of iterative refinement is made. */
const REFINE_ABOVE = 1e6;
/** Above this growth, or this backward error, the factor is given up for another elimination order. */
const REROOT_ABOVE = 1e10;
const BACKWARD_ERROR_LIMIT = 1e-12;

/**
 * How a guarded factorisation went. `method` names what gave the factor in use; anything but "direct"
 * deserves a word in the result. `backwardError` is that of a probe solve, undefined when none was needed.
 * "singular": no method found a finite factor (or, with `notFinite`, a stamped value was not finite).
 */
export interface GuardedOutcome {
  status: 'factored' | 'singular' | 'notFinite';
  method: 'direct' | 'refined' | 'rerooted' | 'pivoted';
  growth: number;
  worstNode: number;
  backwardError: number | undefined;
}

/**
 * The net under a factorisation without pivoting:
 *
 *   factor ── growth ≤ 1e6 ─────────────────────────────► direct
 *      │ growth ≤ 1e10, refined probe ≤ 1e-12 ──────────► refined
 *      │ offending node eliminated last, same two tests ► rerooted
 *      └ sparse LU with partial pivoting ───────────────► pivoted (or singular)
 *
 * The direct path costs one comparison and keeps no copy: `restamp` fills the matrix again only when
 * something is wrong. The thresholds hold for equations in siemens, where a transformer's ratio alone
 * brings growth up to some hundreds.
 */
export class GuardedSolver<M extends KernelMatrix> {
  readonly matrix: M;
  private readonly rebuild: (plan: EliminationPlan) => M;
  private rerooted: { node: number; matrix: M } | undefined;
  private readonly outcome: GuardedOutcome = {
    status: 'singular',
    method: 'direct',
    growth: 0,
    worstNode: 0,
    backwardError: undefined,
  };
  private current: { solve(x: Float64Array, count?: number): void };
  private entries: StampedEntries | undefined;

  /** `rebuild` makes an empty matrix of the same kind on another plan: `(plan) => new BlockLdl(plan)`. */
  constructor(matrix: M, rebuild: (plan: EliminationPlan) => M) {
    this.matrix = matrix;
    this.rebuild = rebuild;
    this.current = matrix;
  }

  /** Factors the stamped matrix; `restamp` clears it and stamps the same values again. */
  factor(restamp: () => void): GuardedOutcome {
    const outcome = this.outcome;
    const { status, growth, worstNode } = this.matrix.factor();
    this.current = this.matrix;
    this.entries = undefined;
    outcome.status = status;
    outcome.method = 'direct';
    outcome.growth = growth;
    outcome.worstNode = worstNode;
    outcome.backwardError = undefined;
    if (status === 'singular' || growth > REFINE_ABOVE) this.rescue(restamp);
    return outcome;
  }

  /** x ← A⁻¹·x, refined once unless the factor is direct. */
  solve(x: Float64Array, count = 1): void {
    const { entries } = this;
    const length = x.length / count;
    if (!entries) this.current.solve(x, count);
    else for (let c = 0; c < count; c++) this.refinedSolve(entries, x.subarray(c * length, (c + 1) * length));
  }

  /** x ← Z_kk·x at the last node of the matrix's plan, whatever order the factor in use has. */
  lastSolve(x: Float64Array, offset = 0): void {
    if (!this.entries) this.matrix.lastSolve(x, offset);
    else this.refinedLastSolve(this.entries, x, offset);
  }

  private refinedLastSolve(entries: StampedEntries, x: Float64Array, offset: number): void {
    const { plan, blockSize } = this.matrix;
    const width = 2 * blockSize;
    const at = width * plan.order[plan.nodeCount - 1]!;
    const whole = new Float64Array(width * plan.nodeCount);
    whole.set(x.subarray(offset, offset + width), at);
    this.refinedSolve(entries, whole);
    x.set(whole.subarray(at, at + width), offset);
  }

  private rescue(restamp: () => void): void {
    const { matrix, outcome } = this;
    restamp();
    const entries = new StampedEntries(matrix.blockSize * matrix.plan.nodeCount, matrix);
    this.entries = entries;
    if (!entries.isFinite()) {
      outcome.status = 'notFinite';
      return;
    }
    matrix.factor();
    if (outcome.status === 'factored' && this.accepts(entries, matrix, outcome.growth, 'refined')) return;
    const other = this.reroot(entries, outcome.worstNode);
    const second = other.factor();
    if (second.status === 'factored' && this.accepts(entries, other, second.growth, 'rerooted')) return;
    const pivoted = new PivotedLu(entries.size, entries, scalarOrder(matrix.plan, matrix.blockSize));
    outcome.method = 'pivoted';
    outcome.status = pivoted.status;
    this.current = pivoted;
    if (pivoted.status === 'factored') outcome.backwardError = this.probe(entries);
  }

  /** Takes a factor into use when its growth and the backward error of a probe allow. */
  private accepts(
    entries: StampedEntries,
    factor: M,
    growth: number,
    method: 'refined' | 'rerooted',
  ): boolean {
    if (growth > REROOT_ABOVE) return false;
    this.current = factor;
    const error = this.probe(entries);
    if (error > BACKWARD_ERROR_LIMIT) return false;
    Object.assign(this.outcome, { status: 'factored', method, growth, backwardError: error });
    return true;
  }

  /** Backward error of a refined solve for a current into every unknown. */
  private probe(entries: StampedEntries): number {
    const b = new Float64Array(2 * entries.size);
    for (let i = 0; i < b.length; i += 2) b[i] = 1;
    const x = b.slice();
    this.refinedSolve(entries, x);
    return entries.backwardError(b, x);
  }

  private refinedSolve(entries: StampedEntries, x: Float64Array): void {
    const b = x.slice();
    this.current.solve(x);
    const correction = entries.residual(b, x);
    this.current.solve(correction);
    for (let i = 0; i < x.length; i++) x[i] = x[i]! + correction[i]!;
  }

  /** The same matrix with `node` eliminated last; kept, the offender is usually the same one again. */
  private reroot(entries: StampedEntries, node: number): M {
    if (this.rerooted?.node !== node) {
      const { plan } = this.matrix;
      this.rerooted = { node, matrix: this.rebuild(planElimination(plan.nodeCount, pairs(plan), node)) };
    }
    const other = this.rerooted.matrix;
    other.clear();
    entries.forEachEntry((row, column, re, im) => {
      other.setEntry(row, column, re, im);
    });
    return other;
  }
}

/** Every pair of nodes in the pattern, fill included. */
function pairs(plan: EliminationPlan): Int32Array {
  const edges = new Int32Array(2 * plan.slotCount);
  for (let k = 0; k < plan.nodeCount; k++)
    for (let s = plan.columnStart[k]!; s < plan.columnStart[k + 1]!; s++) {
      edges[2 * s] = plan.order[k]!;
      edges[2 * s + 1] = plan.order[plan.rowPosition[s]!]!;
    }
  return edges;
}

function scalarOrder(plan: EliminationPlan, blockSize: number): Int32Array {
  return Int32Array.from(
    { length: blockSize * plan.nodeCount },
    (_, i) => blockSize * plan.order[Math.trunc(i / blockSize)]! + (i % blockSize),
  );
}
