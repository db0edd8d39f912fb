import type { ScanRequest, Study } from '../../study/index.ts';
import { type CompileOptions, compileNetwork } from '../network/compileNetwork.ts';
import type { Network } from '../network/Network.ts';
import { labelOf } from '../network/networkWarnings.ts';
import { SingularNetworkError } from '../solve/OrderSolver.ts';
import type { ImpedanceScan } from '../types.ts';
import { DrivingPointProbe } from './DrivingPointProbe.ts';
import { findResonances } from './resonances.ts';

/** A bus, a sequence, and frequencies: listed, or `points` equidistant ones with both ends. */
export type ScanSpan =
  | ScanRequest
  | { bus: string; sequence: 'positive' | 'zero'; frequencyHz: Float64Array };

/**
 * Driving-point impedance of a bus over frequency, V_s for unit I_s injected, ohms per phase of the named
 * sequence, with its resonances. EMFs shorted, bridges open, loads and motors by their harmonic model at
 * every frequency. A bus without a source, or without a zero-sequence path, gives `error` and no points.
 * RangeError for a bus the study does not have or frequencies that do not rise.
 */
export function scanImpedance(
  study: Study,
  caseId: string,
  span: ScanSpan,
  options: CompileOptions = {},
): ImpedanceScan {
  const network = compileNetwork(study, caseId, options);
  const frequencyHz = frequenciesOf(span);
  const refusal = refusalOf(network, span);
  if (refusal !== null) return empty(span, refusal);
  const probe = probeFor(network, span);
  const orders = frequencyHz.map((f) => f / network.frequencyHz);
  const [re, im, magnitudes] = [orders.slice(), orders.slice(), orders.slice()];
  try {
    for (let k = 0; k < orders.length; k++) {
      magnitudes[k] = probe.magnitude(orders[k]!);
      re[k] = probe.re;
      im[k] = probe.im;
    }
    const resonances = findResonances({ orders, magnitudes, magnitude: (h) => probe.magnitude(h) });
    return { bus: span.bus, sequence: span.sequence, frequencyHz, re, im, resonances };
  } catch (error) {
    if (error instanceof SingularNetworkError) return empty(span, error.message);
    throw error;
  }
}

function frequenciesOf(span: ScanSpan): Float64Array {
  if ('frequencyHz' in span) {
    if (span.frequencyHz.some((f, k) => !(f > 0) || (k > 0 && f <= span.frequencyHz[k - 1]!)))
      throw new RangeError('scan frequencies must be above 0 Hz and rise');
    return span.frequencyHz;
  }
  const { fromHz, toHz, points } = span;
  if (!(fromHz > 0 && toHz > fromHz && points >= 2))
    throw new RangeError(
      `scan ${fromHz} … ${toHz} Hz in ${points} points: 0 < from < to and at least 2 points`,
    );
  return Float64Array.from({ length: points }, (_, k) => fromHz + ((toHz - fromHz) * k) / (points - 1));
}

function refusalOf(network: Network, { bus, sequence }: ScanSpan): string | null {
  const index = network.buses.findIndex(({ id }) => id === bus);
  const named = network.buses[index];
  if (!named) throw new RangeError(`no busbar "${bus}" in the study`);
  const node = network.nodeOfBus[index]!;
  if (node < 0) return `bus ${labelOf(named)} has no path to a source`;
  if (sequence === 'zero' && network.zeroPaths.harmonic[node] === 0)
    return `bus ${labelOf(named)} has no zero-sequence path`;
  return null;
}

const probes = new WeakMap<Network, Map<string, DrivingPointProbe>>();
const keptProbes = 4;

function probeFor(network: Network, { bus, sequence }: ScanSpan): DrivingPointProbe {
  const kept = probes.get(network) ?? new Map<string, DrivingPointProbe>();
  probes.set(network, kept);
  const key = `${sequence} ${bus}`;
  const known = kept.get(key);
  if (known) return known;
  const node = network.nodeOfBus[network.buses.findIndex(({ id }) => id === bus)]!;
  const probe = new DrivingPointProbe(network, node, sequence === 'zero' ? 0 : 1);
  const oldest = kept.keys().next().value;
  if (kept.size >= keptProbes && oldest !== undefined) kept.delete(oldest);
  kept.set(key, probe);
  return probe;
}

function empty({ bus, sequence }: ScanSpan, error: string): ImpedanceScan {
  const none = new Float64Array(0);
  return { bus, sequence, frequencyHz: none, re: none.slice(), im: none.slice(), resonances: [], error };
}
