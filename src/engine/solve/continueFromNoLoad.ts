import type { Network } from '../network/Network.ts';
import { demandCurrents } from './demandCurrents.ts';
import { largestChange, phaseVolts } from './fixedPoint.ts';
import { PowerJacobian } from './PowerJacobian.ts';
import { solverFor } from './solverFor.ts';

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

/** A point of the curve: voltages at a share of the demand, and their slope by that share. */
interface CurvePoint {
  v: Float64Array;
  slope: Float64Array;
}

const smallestStep = 1e-4;
/** Per unit by which Newton may move a prediction before the step counts as too bold. */
const boldest = 0.1;

/**
 * Newton's method with the demand raised from nothing in steps, along the tangent; a step is halved where
 * Newton does not settle, moves the prediction far, or lands where the slope of the voltages by the demand
 * has turned round: there the curve has passed its nose, and only the upper voltage is an answer.
 * V. Ajjarapu and C. Christy, Trans. PWRS 7 (1992) 416 (from memory) follow the curve the same way.
 */
export function continueFromNoLoad(network: Network, noLoad: Float64Array, own: Float64Array): Continuation {
  // Phase coordinates also where the case is balanced: the Jacobian couples the sequences.
  const solver = solverFor(network, 'phase');
  solver.prepare(1, 'fundamental');
  const walk = new CurveWalk(network, new PowerJacobian(network, solver, noLoad, own));
  let point = walk.start(noLoad);
  let share = 0;
  let step = 0.25;
  while (point && share < 1 && step >= smallestStep) {
    const target = Math.min(1, share + step);
    const next = walk.advance(point, share, target);
    if (next) {
      point = next;
      share = target;
      step *= 2;
    } else {
      step /= 2;
    }
  }
  const v = point?.v ?? noLoad;
  demandCurrents(network, v, own);
  return { converged: share === 1, v, share, steps: walk.steps, worstNode: lowestNode(network, v) };
}

class CurveWalk {
  steps = 0;

  constructor(
    private readonly network: Network,
    private readonly jacobian: PowerJacobian,
  ) {}

  start(noLoad: Float64Array): CurvePoint | null {
    return this.pointAt(0, noLoad);
  }

  /** The point at a larger share, or null where it cannot be trusted. */
  advance(from: CurvePoint, share: number, target: number): CurvePoint | null {
    const predicted = from.v.map((value, c) => value + (target - share) * from.slope[c]!);
    const v = this.settle(target, predicted);
    if (!v || !(largestChange(this.network, predicted, v) < boldest)) return null;
    const point = this.pointAt(target, v);
    return point && product(point.slope, from.slope) > 0 ? point : null;
  }

  private settle(share: number, start: Float64Array): Float64Array | null {
    let v = start;
    let before = Number.POSITIVE_INFINITY;
    for (let round = 0; round < 15; round++) {
      this.steps += 1;
      if (!this.jacobian.factor(share, v)) return null;
      const correction = this.jacobian.mismatch(share, v);
      this.jacobian.solve(correction);
      const next = v.map((value, c) => value + correction[c]!);
      const change = largestChange(this.network, v, next);
      if (!Number.isFinite(change) || change > 0.3 || (round > 1 && change > 2 * before)) return null;
      v = next;
      if (change < 1e-12 || (change >= before && change < 1e-10)) return v;
      before = change;
    }
    return null;
  }

  private pointAt(share: number, v: Float64Array): CurvePoint | null {
    if (!this.jacobian.factor(share, v)) return null;
    const slope = this.jacobian.loading(v);
    this.jacobian.solve(slope);
    return { v, slope };
  }
}

function product(a: Float64Array, b: Float64Array): number {
  return a.reduce((sum, value, c) => sum + value * b[c]!, 0);
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
