import type { Network, Role, SeriesPart, ShuntPart } from '../network/Network.ts';
import { addPhases, toSequences } from './fortescue.ts';

/**
 * Currents INTO every terminal at one order: I = Y·V + own, with node voltages `v` and the parts' own
 * source currents (six numbers a shunt part). Works on the admittances of the order evaluated last.
 * `out` holds six numbers a terminal; terminals on buses without a source stay zero.
 */
export class TerminalCurrents {
  private readonly network: Network;
  private readonly sequences: Float64Array;
  private readonly six = new Float64Array(6);
  private readonly turn: { cos: number; sin: number }[];

  constructor(network: Network) {
    this.network = network;
    this.sequences = new Float64Array(6 * network.nodeCount);
    this.turn = network.series.map(({ clock }) => ({
      cos: Math.cos((clock * Math.PI) / 6),
      sin: Math.sin((clock * Math.PI) / 6),
    }));
  }

  compute(role: Role, v: Float64Array, own: Float64Array, out: Float64Array): void {
    const { network, sequences } = this;
    out.fill(0);
    for (let node = 0; node < network.nodeCount; node++) toSequences(v, 6 * node, sequences, 6 * node);
    network.shunts.forEach((part, k) => {
      if (part.node < 0) return;
      const o = 6 * part.terminal;
      for (let c = 0; c < 6; c++) out[o + c] = own[6 * k + c]!;
      if (!part.law || (role === 'fundamental' && part.atFundamental === 'none')) return;
      if (part.phases.p >= 0) this.addPhasePart(part, v, out);
      else this.addShunt(part, role === 'fundamental' && part.atFundamental === 'negative', out);
    });
    network.series.forEach((part, k) => {
      if (part.from >= 0) this.addSeries(part, k, out);
    });
  }

  private addShunt({ at, node, terminal }: ShuntPart, negativeOnly: boolean, out: Float64Array): void {
    const { values } = this.network;
    const { sequences: s, six } = this;
    six.fill(0);
    if (!negativeOnly) {
      multiply(values, at, s, 6 * node, six, 0);
      multiply(values, at + 2, s, 6 * node + 2, six, 2);
    }
    multiply(values, at + 2, s, 6 * node + 4, six, 4);
    addPhases(six, 0, out, 6 * terminal);
  }

  private addPhasePart(
    { at, node, terminal, phases: { p, q } }: ShuntPart,
    v: Float64Array,
    out: Float64Array,
  ): void {
    const re = this.network.values[at + 2]!;
    const im = this.network.values[at + 3]!;
    const i = 6 * node + 2 * p;
    const j = 6 * node + 2 * q;
    const ur = v[i]! - (q < 0 ? 0 : v[j]!);
    const ui = v[i + 1]! - (q < 0 ? 0 : v[j + 1]!);
    const ir = re * ur - im * ui;
    const ii = re * ui + im * ur;
    const o = 6 * terminal;
    out[o + 2 * p] = out[o + 2 * p]! + ir;
    out[o + 2 * p + 1] = out[o + 2 * p + 1]! + ii;
    if (q < 0) return;
    out[o + 2 * q] = out[o + 2 * q]! - ir;
    out[o + 2 * q + 1] = out[o + 2 * q + 1]! - ii;
  }

  /** Positive: If = ff·Vf + ft·e^(+jθ)·Vt, It = tt·Vt + ft·e^(−jθ)·Vf; negative with the angles turned. */
  private addSeries({ at, from, to, terminal }: SeriesPart, k: number, out: Float64Array): void {
    const { values } = this.network;
    const { sequences: s, six } = this;
    const { cos, sin } = this.turn[k]!;
    for (const [near, far, own, sense] of [
      [from, to, at, 1],
      [to, from, at + 4, -1],
    ] as const) {
      const i = 6 * near;
      const j = 6 * far;
      multiply(values, own, s, i, six, 0);
      addProduct(values[at + 8]!, values[at + 9]!, s, j, six, 0);
      for (const sequence of [1, 2]) {
        const c = 2 * sequence;
        const d = sequence === 1 ? sense * sin : -sense * sin;
        const re = values[at + 10]! * cos - values[at + 11]! * d;
        const im = values[at + 10]! * d + values[at + 11]! * cos;
        multiply(values, own + 2, s, i + c, six, c);
        addProduct(re, im, s, j + c, six, c);
      }
      addPhases(six, 0, out, 6 * (near === from && sense === 1 ? terminal : terminal + 1));
    }
  }
}

/** out = y·s, one complex each. */
function multiply(
  y: Float64Array,
  a: number,
  s: Float64Array,
  i: number,
  out: Float64Array,
  o: number,
): void {
  out[o] = y[a]! * s[i]! - y[a + 1]! * s[i + 1]!;
  out[o + 1] = y[a]! * s[i + 1]! + y[a + 1]! * s[i]!;
}

function addProduct(re: number, im: number, s: Float64Array, i: number, out: Float64Array, o: number): void {
  out[o] = out[o]! + re * s[i]! - im * s[i + 1]!;
  out[o + 1] = out[o + 1]! + re * s[i + 1]! + im * s[i]!;
}
