import type { Study } from '../../study/index.ts';
import { type CompileOptions, compileNetwork } from '../network/compileNetwork.ts';
import { addPhases, toSequences } from '../solve/fortescue.ts';
import { solverFor } from '../solve/solverFor.ts';
import type { DrivingPoints } from '../types.ts';

/**
 * Positive-sequence driving-point impedance of every bus at one real order h, ohms, in study order, with
 * the harmonic models of a scan. Buses without a source have `present` 0. RangeError unless h > 0;
 * SingularNetworkError at a resonance without any losses.
 */
export function drivingPoints(
  study: Study,
  caseId: string,
  order: number,
  options: CompileOptions = {},
): DrivingPoints {
  if (!(order > 0 && Number.isFinite(order))) throw new RangeError(`order ${order} must be above 0`);
  const network = compileNetwork(study, caseId, options);
  const count = network.buses.length;
  const points: DrivingPoints = {
    re: new Float64Array(count),
    im: new Float64Array(count),
    present: new Uint8Array(count),
  };
  if (network.nodeCount === 0) return points;
  const solver = solverFor(network);
  solver.prepare(order, 'harmonic', 1);
  const x = new Float64Array(6 * network.nodeCount);
  const unit = Float64Array.of(0, 0, 1, 0, 0, 0);
  const s = new Float64Array(6);
  for (let node = 0; node < network.nodeCount; node++) {
    x.fill(0);
    addPhases(unit, 0, x, 6 * node);
    solver.solve(x);
    toSequences(x, 6 * node, s, 0);
    const bus = network.busOfNode[node]!;
    points.re[bus] = s[2]!;
    points.im[bus] = s[3]!;
    points.present[bus] = 1;
  }
  return points;
}
