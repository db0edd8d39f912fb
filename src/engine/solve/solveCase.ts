import type { Study } from '../../study/index.ts';
import { type CompileOptions, compileNetwork } from '../network/compileNetwork.ts';
import type { Network } from '../network/Network.ts';
import type { CaseSolution } from '../types.ts';
import { activeSources, groupCurrents, sourceGroups, summationExponent } from './harmonicSources.ts';
import { type OrderSolver, SingularNetworkError } from './OrderSolver.ts';
import { SolutionWriter } from './SolutionWriter.ts';
import { type Fundamental, solveFundamental } from './solveFundamental.ts';
import { solverFor } from './solverFor.ts';
import { injectionsOf } from './sourceCurrents.ts';
import { TerminalCurrents } from './terminalCurrents.ts';

export interface SolveOptions extends CompileOptions {
  /** 'auto' takes decoupled sequence networks where everything in service is balanced. */
  coordinates?: 'auto' | 'phase';
}

/**
 * One case of a study at every integer order 1 … maxOrder: rms phasors, volts phase-to-neutral and amperes
 * into the elements (types.ts gives the indexing). A case that cannot be solved comes back with converged
 * false, the reason in `error`, and empty arrays. RangeError for an unknown case or unchecked data.
 */
export function solveCase(study: Study, caseId: string, options: SolveOptions = {}): CaseSolution {
  const network = compileNetwork(study, caseId, options);
  if (network.error) return failed(network, network.error, 0);
  try {
    return solve(network, solverFor(network, options.coordinates));
  } catch (error) {
    if (error instanceof SingularNetworkError) return failed(network, error.message, 0);
    throw error;
  }
}

function solve(network: Network, solver: OrderSolver): CaseSolution {
  const fundamental = solveFundamental(network, solver);
  if (fundamental.error) return failed(network, fundamental.error, fundamental.iterations);
  const writer = new SolutionWriter(network);
  const currents = new TerminalCurrents(network);
  const i = new Float64Array(6 * network.terminals.length);
  currents.compute('fundamental', fundamental.v, fundamental.own, i);
  writer.add(fundamental.v, i, 1);
  writer.end(1, 1, { groups: 1, magnitudesOnly: false, anglesUnknown: false });
  const rescued = solveOrders(network, solver, fundamental, currents, writer);
  const head = header(network, fundamental.iterations);
  return {
    ...head,
    warnings: [...head.warnings, ...rescued.map(rescueWarning)],
    converged: true,
    ...writer.result(),
  };
}

function solveOrders(
  network: Network,
  solver: OrderSolver,
  fundamental: Fundamental,
  currents: TerminalCurrents,
  writer: SolutionWriter,
): number[] {
  const rescued: number[] = [];
  const alpha = network.summation === 'alpha';
  const v = new Float64Array(6 * network.nodeCount);
  const own = new Float64Array(6 * network.shunts.length);
  const i = new Float64Array(6 * network.terminals.length);
  for (let h = 2; h <= network.maxOrder; h++) {
    const active = activeSources(network, h, fundamental.own);
    if (active.length === 0) continue;
    solver.prepare(h, 'harmonic');
    if (solver.method === 'pivoted') rescued.push(h);
    const groups = sourceGroups(active, alpha);
    const anglesUnknown = !alpha && groups.length > 1;
    const exponent = alpha ? summationExponent(h) : 1;
    for (const group of groups) {
      groupCurrents(network, h, group, fundamental.own, own);
      injectionsOf(network, own, v);
      solver.solve(v);
      currents.compute('harmonic', v, own, i);
      writer.add(v, i, exponent);
    }
    writer.end(h, exponent, { groups: groups.length, magnitudesOnly: alpha, anglesUnknown });
  }
  return rescued;
}

function rescueWarning(h: number): string {
  return `at order ${h} the network's admittances nearly cancel (a resonance almost without losses); digits are lost there`;
}

function header(
  network: Network,
  iterations: number,
): Omit<CaseSolution, 'converged' | 'voltage' | 'current' | 'lineVoltage' | 'neutralCurrent' | 'judged'> {
  return {
    caseId: network.caseId,
    frequencyHz: network.frequencyHz,
    maxOrder: network.maxOrder,
    summation: network.summation,
    iterations,
    buses: network.buses.map((bus) => bus.id),
    nominalV: Float64Array.from(network.buses, (bus) => bus.nominalV),
    terminals: network.terminals.map((terminal) => ({ ...terminal })),
    deenergised: network.buses.filter((_, bus) => network.nodeOfBus[bus] === -1).map((bus) => bus.id),
    warnings: [...network.warnings],
  };
}

function failed(network: Network, error: string, iterations: number): CaseSolution {
  const none = (): Float64Array => new Float64Array(0);
  return {
    ...header(network, iterations),
    converged: false,
    error,
    voltage: { re: none(), im: none() },
    current: { re: none(), im: none() },
    lineVoltage: none(),
    neutralCurrent: none(),
    judged: {
      voltage: none(),
      lineVoltage: none(),
      current: none(),
      neutralCurrent: none(),
      anglesUnknown: [],
    },
  };
}
