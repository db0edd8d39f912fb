import type { Generator, Study, StudyElement, Supply } from '../study/index.ts';
import { elementsAt, isOn, isSeries } from '../study/index.ts';
import type { SolvedCase } from './SolvedCase.ts';
import { positiveSequence, type Rectangular } from './sequences.ts';

/** Fundamental power a busbar takes from the network side, and the positive-sequence displacement factor. */
export interface Inflow {
  kW: number;
  /** Positive: inductive (lagging). */
  kvar: number;
  /** cos φ1 = Re(V⁺I⁺*)/|V⁺I⁺|, signed; null without current. */
  displacementPF: number | null;
  /** Indices of the network-side terminals, whose currents point back into the network. */
  terminals: number[];
}

/** The supplies in service; a site on its own generators is fed by those. */
function sourcesOf(study: Study): (Supply | Generator)[] {
  const supplies = study.elements.filter((part) => part.kind === 'supply' && isOn(part));
  const sources = supplies.length > 0 ? supplies : study.elements.filter((part) => isOn(part));
  return sources.filter((part) => part.kind === 'supply' || part.kind === 'generator');
}

/** Busbars with a path to a source that does not lead through `bus`. */
function networkSide(study: Study, bus: string, sources: readonly (Supply | Generator)[]): Set<string> {
  const reached = new Set<string>();
  const queue = sources.map((source) => source.bus).filter((id) => id !== bus);
  while (queue.length > 0) {
    const next = queue.pop();
    if (next === undefined || next === bus || reached.has(next)) continue;
    reached.add(next);
    for (const part of elementsAt(study, next)) {
      if (isOn(part) && isSeries(part)) queue.push(part.from === next ? part.to : part.from);
    }
  }
  return reached;
}

/** Busbars on the network's side of a busbar, itself left out. */
export const networkSideOf = (study: Study, bus: string): ReadonlySet<string> =>
  networkSide(study, bus, sourcesOf(study));

/** The in-service parts at a busbar through which the network feeds it. */
function feedersOf(study: Study, bus: string): StudyElement[] {
  const sources = sourcesOf(study);
  const side = networkSide(study, bus, sources);
  const ids = new Set(sources.map((source) => source.id));
  return elementsAt(study, bus).filter((part) => {
    if (!isOn(part)) return false;
    if (ids.has(part.id)) return true;
    return isSeries(part) && part.from !== part.to && side.has(part.from === bus ? part.to : part.from);
  });
}

/**
 * P + jQ = −Σ V·conj(I) at h = 1 over the terminals through which the network feeds the busbar
 * (terminal currents point into the element). Works for radial, parallel and ring feeding.
 * null where nothing feeds the busbar.
 */
export function inflowAt(study: Study, solved: SolvedCase, bus: string): Inflow | null {
  const { voltage, current, maxOrder } = solved.solution;
  const terminals = feedersOf(study, bus)
    .map((part) => solved.terminal(part.id, bus))
    .filter((index) => index !== undefined);
  if (terminals.length === 0 || !solved.energised(bus)) return null;
  const atBus = solved.bus(bus) * maxOrder * 3;
  const volts = [0, 1, 2].map((k) => ({ re: voltage.re[atBus + k] ?? 0, im: voltage.im[atBus + k] ?? 0 }));
  const amperes = [0, 1, 2].map((k) => {
    let re = 0;
    let im = 0;
    for (const terminal of terminals) {
      re -= current.re[terminal * maxOrder * 3 + k] ?? 0;
      im -= current.im[terminal * maxOrder * 3 + k] ?? 0;
    }
    return { re, im };
  });
  let watts = 0;
  let vars = 0;
  volts.forEach((v, k) => {
    const i = amperes[k];
    if (!i) return;
    watts += v.re * i.re + v.im * i.im;
    vars += v.im * i.re - v.re * i.im;
  });
  return {
    kW: watts / 1000,
    kvar: vars / 1000,
    displacementPF: displacementFactor(positiveSequence(volts), positiveSequence(amperes)),
    terminals,
  };
}

function displacementFactor(v: Rectangular, i: Rectangular): number | null {
  const size = Math.hypot(v.re, v.im) * Math.hypot(i.re, i.im);
  return Math.hypot(i.re, i.im) < 1e-6 ? null : (v.re * i.re + v.im * i.im) / size;
}
