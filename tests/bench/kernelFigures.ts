import { BlockLdl, ScalarLdl, StampedEntries } from '../../src/engine/kernel/index.ts';
import { compileNetwork } from '../../src/engine/network/compileNetwork.ts';
import { NodeAdmittances } from '../../src/engine/solve/NodeAdmittances.ts';
import { PhaseStamps } from '../../src/engine/solve/PhaseStamps.ts';
import { planFor } from '../../src/engine/solve/planFor.ts';
import type { Yardstick } from './kluYardstick.ts';
import { median, medianMicroseconds } from './medianMicroseconds.ts';
import { benchStudy } from './network.ts';

/** Times of the three-phase kernel on one site's matrix, microseconds, beside the yardstick's. */
export interface KernelFigure {
  busbars: number;
  slots: number;
  refactor: number;
  oneSolve: number;
  threeSolves: number;
  residual: number;
  /** Kernel over yardstick, medians of interleaved rounds; absent without the yardstick. */
  ratios?: { refactor: number; oneSolve: number; threeSolves: number };
}

const ROUNDS = 3;
const MILLISECONDS = 100;
/** The compiler needs some ten thousand calls before it settles on the kernel's fastest code. */
const WARM_UP_MILLISECONDS = 600;

/** Refactorisation (values copied in, then factored) and solutions of a site's matrix at order 5. */
export function kernelFigure(busbars: number, yardstick: Yardstick): KernelFigure {
  const network = compileNetwork(benchStudy(busbars), 'base');
  const matrix = new BlockLdl(planFor(network));
  const admittances = new NodeAdmittances(network);
  admittances.evaluate(5, 'harmonic');
  new PhaseStamps(admittances, matrix).write('harmonic');
  const entries = new StampedEntries(3 * network.nodeCount, matrix);
  const stamped = matrix.values.slice();
  const b = Float64Array.from({ length: 18 * network.nodeCount }, (_, k) => 1 / (1 + (k % 7)));
  const x = b.slice();
  const run = (solves: number) => () => {
    matrix.values.set(stamped);
    matrix.factor();
    if (solves === 0) return;
    x.set(b);
    matrix.solve(x, solves);
  };
  for (const solves of [0, 1, 3]) medianMicroseconds(run(solves), WARM_UP_MILLISECONDS / 3);
  const own = [0, 1, 3].map(() => [] as number[]);
  const ratios = [0, 1, 3].map(() => [] as number[]);
  for (let round = 0; round < ROUNDS; round++) {
    const native = 'missing' in yardstick ? undefined : yardstick.measure(entries, 3 * MILLISECONDS);
    [0, 1, 3].forEach((solves, k) => {
      const time = medianMicroseconds(run(solves), MILLISECONDS);
      own[k]?.push(time);
      if (native) ratios[k]?.push(time / [native.refactor, native.oneSolve, native.threeSolves][k]!);
    });
  }
  const length = 6 * network.nodeCount;
  return {
    busbars,
    slots: matrix.plan.slotCount,
    refactor: median(own[0]!),
    oneSolve: median(own[1]!),
    threeSolves: median(own[2]!),
    residual: entries.backwardError(b.slice(0, length), x.slice(0, length)),
    ...('missing' in yardstick
      ? {}
      : {
          ratios: {
            refactor: median(ratios[0]!),
            oneSolve: median(ratios[1]!),
            threeSolves: median(ratios[2]!),
          },
        }),
  };
}

/** Refactorisation of one sequence network of the same sites, microseconds. */
export function sequenceRefactor(busbars: number): number {
  const plan = planFor(compileNetwork(benchStudy(busbars), 'base'));
  const matrix = new ScalarLdl(plan);
  for (let node = 0; node < plan.nodeCount; node++) matrix.addDiagonal(node, 4, -9);
  for (let k = 2 * plan.nodeCount; k < matrix.values.length; k += 2) matrix.addAt(k, -0.3, 0.8);
  const stamped = matrix.values.slice();
  return medianMicroseconds(() => {
    matrix.values.set(stamped);
    matrix.factor();
  }, MILLISECONDS);
}
