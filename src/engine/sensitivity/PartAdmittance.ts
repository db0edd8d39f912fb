import type { SeriesPart, ShuntPart } from '../network/Network.ts';
import { addPhases, toSequences } from '../solve/fortescue.ts';
import { Jet } from './Jet.ts';
import { type Quantities, quantitiesOf } from './parameters.ts';
import { type SeriesElement, seriesJets } from './seriesJets.ts';
import { type ShuntElement, shuntJets } from './shuntJets.ts';

/** Coefficient of a jet: value, ∂/∂h, ½∂²/∂h², ∂/∂p, ∂²/∂h∂p. */
export type Coefficient = 0 | 1 | 2 | 3 | 4;

/**
 * One part's share of the nodal matrix with derivatives, in phase coordinates.
 * `addProduct` adds scale·Y_c·v of one coefficient c to `out`; `v` and `out` hold six numbers a node.
 */
export interface PartAdmittance {
  nodes: readonly number[];
  addProduct(c: Coefficient, scale: number, v: Float64Array, out: Float64Array): void;
}

const near = new Float64Array(6);
const far = new Float64Array(6);
const six = new Float64Array(6);

/** A shunt part with the parameter `varied` (none when absent) at order h. */
export function shuntAdmittance(
  part: ShuntPart,
  h: number,
  omega: number,
  nominalV: number,
  varied?: string,
): PartAdmittance {
  const read: Quantities = quantitiesOf(part.element, varied);
  const { y0, y1 } = shuntJets(part.element as ShuntElement, read, Jet.order(h), { omega, nominalV });
  const { p, q } = part.phases;
  const at = 6 * part.node;
  if (p >= 0)
    return {
      nodes: [part.node],
      addProduct: (c, scale, v, out) =>
        addPhasePair(y1, c, scale, v, out, at + 2 * p, q < 0 ? -1 : at + 2 * q),
    };
  return {
    nodes: [part.node],
    addProduct: (c, scale, v, out) => {
      toSequences(v, at, near, 0);
      six.fill(0);
      if (y0) multiplyAdd(y0, c, scale, near, 0, six, 0);
      multiplyAdd(y1, c, scale, near, 2, six, 2);
      multiplyAdd(y1, c, scale, near, 4, six, 4);
      addPhases(six, 0, out, at);
    },
  };
}

/** A series part likewise; the clock turns positive and negative sequence oppositely. */
export function seriesAdmittance(
  part: SeriesPart,
  h: number,
  omega: number,
  varied?: string,
): PartAdmittance {
  const jets = seriesJets(part.element as SeriesElement, quantitiesOf(part.element, varied), Jet.order(h), {
    omega,
  });
  const theta = (part.clock * Math.PI) / 6;
  const lead = jets.ft1.times(Jet.constant(Math.cos(theta), Math.sin(theta)));
  const lag = jets.ft1.times(Jet.constant(Math.cos(theta), -Math.sin(theta)));
  const ends = [
    { at: 6 * part.from, other: 6 * part.to, own0: jets.ff0, own1: jets.ff1, positive: lead, negative: lag },
    { at: 6 * part.to, other: 6 * part.from, own0: jets.tt0, own1: jets.tt1, positive: lag, negative: lead },
  ];
  return {
    nodes: [part.from, part.to],
    addProduct: (c, scale, v, out) => {
      for (const { at, other, own0, own1, positive, negative } of ends) {
        toSequences(v, at, near, 0);
        toSequences(v, other, far, 0);
        six.fill(0);
        if (own0) multiplyAdd(own0, c, scale, near, 0, six, 0);
        if (jets.ft0) multiplyAdd(jets.ft0, c, scale, far, 0, six, 0);
        multiplyAdd(own1, c, scale, near, 2, six, 2);
        multiplyAdd(positive, c, scale, far, 2, six, 2);
        multiplyAdd(own1, c, scale, near, 4, six, 4);
        multiplyAdd(negative, c, scale, far, 4, six, 4);
        addPhases(six, 0, out, at);
      }
    },
  };
}

function addPhasePair(
  y: Jet,
  c: Coefficient,
  scale: number,
  v: Float64Array,
  out: Float64Array,
  i: number,
  j: number,
): void {
  six[0] = v[i]! - (j < 0 ? 0 : v[j]!);
  six[1] = v[i + 1]! - (j < 0 ? 0 : v[j + 1]!);
  multiplyAdd(y, c, scale, six, 0, out, i);
  if (j >= 0) multiplyAdd(y, c, -scale, six, 0, out, j);
}

function multiplyAdd(
  y: Jet,
  c: Coefficient,
  scale: number,
  v: Float64Array,
  i: number,
  out: Float64Array,
  o: number,
): void {
  const re = scale * y.c[2 * c]!;
  const im = scale * y.c[2 * c + 1]!;
  out[o] = out[o]! + (re * v[i]! - im * v[i + 1]!);
  out[o + 1] = out[o + 1]! + (re * v[i + 1]! + im * v[i]!);
}
