import { isSeries, type ResolvedElement, type Study, studyInCase, withDefaults } from '../../study/index.ts';
import { seriesFloats, shuntFloats } from '../models/PartLaw.ts';
import type { Terminal } from '../types.ts';
import { settleGeneratorAngles } from './generatorAngles.ts';
import { findIslands, type Islands } from './islands.ts';
import type { Network, SeriesPart, ShuntPart } from './Network.ts';
import { labelOf, seriesWarnings } from './networkWarnings.ts';
import { findPhaseHours } from './phaseHours.ts';
import { clockOf, fourWireEnds, type ResolvedSeries, seriesLaw } from './readSeries.ts';
import { isFourWire, isPresent, type ResolvedShunt, shuntNature } from './readShunt.ts';
import { restrictDemands } from './restrictDemands.ts';
import { findZeroPaths } from './zeroPaths.ts';

export interface CompileOptions {
  /** Ids of parts taken out of service, e.g. all banks and filters. */
  without?: ReadonlySet<string> | undefined;
  /** Actual over rated frequency, 1 when absent: orders then count from the actual fundamental. */
  frequencyFactor?: number | undefined;
}

const compiled = new WeakMap<Study, Map<string, Network>>();

/**
 * The study in one case as a network: buses with a source become nodes, each part in service gets its
 * admittance law and its place. Remembered per study object, case and options; a study is never mutated,
 * so an edited study compiles afresh. Throws RangeError for data no validated study has, or a frequency
 * factor that is not above 0.
 */
export function compileNetwork(study: Study, caseId: string, options: CompileOptions = {}): Network {
  const factor = options.frequencyFactor ?? 1;
  if (!(factor > 0 && Number.isFinite(factor)))
    throw new RangeError(`frequency factor ${factor} must be above 0`);
  const key = JSON.stringify([caseId, factor, ...[...(options.without ?? [])].sort()]);
  const known = compiled.get(study) ?? new Map<string, Network>();
  compiled.set(study, known);
  const network = known.get(key) ?? build(study, caseId, factor, options.without);
  known.set(key, network);
  return network;
}

function build(
  study: Study,
  caseId: string,
  frequencyFactor: number,
  without?: ReadonlySet<string>,
): Network {
  const inCase = studyInCase(study, caseId);
  const parts = inCase.elements
    .filter((element) => element.on !== false && !without?.has(element.id))
    .map((element) => withDefaults(element, inCase) as ResolvedElement)
    .filter(isPresent);
  const islands = findIslands(
    inCase.buses.map((bus) => bus.id),
    parts,
  );
  const placed = place(inCase, parts, islands);
  const { series, shunts } = placed;
  const nodeCount = islands.busOfNode.length;
  const { hours, clashes } = findPhaseHours(nodeCount, series);
  settleGeneratorAngles(nodeCount, shunts, series);
  const zeroPaths = findZeroPaths(nodeCount, shunts, series);
  const dead = inCase.buses.filter((_, bus) => islands.nodeOfBus[bus] === -1);
  const network: Network = {
    ...placed,
    ...islands,
    study: inCase,
    caseId,
    frequencyHz: inCase.frequencyHz,
    frequencyFactor,
    maxOrder: inCase.maxOrder ?? 50,
    summation: inCase.summation ?? 'phasor',
    buses: inCase.buses,
    nodeCount,
    edges: Int32Array.from(series.filter(({ from }) => from >= 0).flatMap(({ from, to }) => [from, to])),
    zeroPaths,
    balanced: clashes.length === 0 && shunts.every(({ node, phases }) => node < 0 || phases.p < 0),
    hours,
    warnings: [
      ...dead.map((bus) => `bus ${labelOf(bus)} has no path to a source`),
      ...seriesWarnings(series, clashes, inCase.buses),
    ],
    error: null,
  };
  restrictDemands(network);
  return network;
}

type Placed = Pick<Network, 'series' | 'shunts' | 'terminals' | 'values'>;

/** Gives every part its nodes, its terminals in study order and its room among the laws' values. */
function place(study: Study, parts: readonly ResolvedElement[], { nodeOfBus }: Islands): Placed {
  const omega = 2 * Math.PI * study.frequencyHz;
  const busIndex = new Map(study.buses.map((bus, k) => [bus.id, k]));
  const series: SeriesPart[] = [];
  const shunts: ShuntPart[] = [];
  const terminals: Terminal[] = [];
  let at = 0;
  for (const element of parts) {
    const terminal = terminals.length;
    if (isSeries(element)) {
      const part = element as ResolvedSeries;
      const [fromBus, toBus] = [busIndex.get(part.from) as number, busIndex.get(part.to) as number];
      series.push({
        element,
        fromBus,
        toBus,
        from: nodeOfBus[fromBus] as number,
        to: nodeOfBus[toBus] as number,
        terminal,
        law: seriesLaw(part, omega),
        at,
        clock: clockOf(part),
      });
      at += seriesFloats;
      const [fromFour, toFour] = fourWireEnds(part);
      terminals.push({ element: part.id, bus: part.from, fourWire: fromFour });
      terminals.push({ element: part.id, bus: part.to, fourWire: toFour });
    } else {
      const part = element as ResolvedShunt;
      const bus = busIndex.get(part.bus) as number;
      const nominalV = study.buses[bus]?.nominalV as number;
      const nature = shuntNature(part, { study, nominalV, omega, maxOrder: study.maxOrder ?? 50 });
      shunts.push({ ...nature, element, bus, node: nodeOfBus[bus] as number, terminal, at });
      if (nature.law) at += shuntFloats;
      terminals.push({ element: part.id, bus: part.bus, fourWire: isFourWire(part) });
    }
  }
  return { series, shunts, terminals, values: new Float64Array(at) };
}
