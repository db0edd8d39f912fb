import type { Resolved, ResolvedElement } from '../../study/index.ts';
import { Jet } from './Jet.ts';
import type { Quantities } from './parameters.ts';

/** Where a part stands: nominal line-to-line volts of its busbar and 2π·fn, rad/s. */
export interface Place {
  nominalV: number;
  omega: number;
}

/** Harmonic-model admittances of a shunt part, siemens; null where a sequence is open. */
export interface ShuntJets {
  y0: Jet | null;
  y1: Jet;
}

export type ShuntElement = Extract<ResolvedElement, { bus: string }>;

/**
 * Admittances of a shunt part at order h, with their derivatives: the formulas of the element models
 * written in jets. A test holds the values equal to the models'.
 */
export function shuntJets(part: ShuntElement, read: Quantities, h: Jet, place: Place): ShuntJets {
  switch (part.kind) {
    case 'supply':
      return source(part, supplyOhm(read, place), skin(read, 'skin', h), read, h);
    case 'generator':
      return source(part, generatorOhm(read, place), Jet.constant(1), read, h);
    case 'load':
      return load(part, read, h, place);
    case 'motor':
      return motor(read, h, place);
    case 'converter':
      return {
        y0: null,
        y1: read('filterCapacitanceUF')
          .times(place.omega * 1e-6)
          .times(h)
          .turned(),
      };
    case 'bank':
      return withZero(part.connection === 'star-earthed', bank(read, h));
    case 'filter':
      return withZero(part.connection === 'star-earthed', filter(part, read, h, place));
    case 'shunt':
      return withZero(part.neutral, freeAdmittance(part, read, h, place.omega));
  }
}

/** R(h)/R = (1 − s) + s·h^e. */
export function skin(read: Quantities, field: string, h: Jet): Jet {
  const s = read(`${field}[0]`);
  const power = h
    .logarithm()
    .times(read(`${field}[1]`))
    .exponential();
  return s.times(power.minus(Jet.constant(1))).plus(Jet.constant(1));
}

/** r + jx. */
export function complexOf(r: Jet, x: Jet): Jet {
  return r.plus(x.turned());
}

function withZero(joins: boolean, y1: Jet): ShuntJets {
  return { y0: joins ? y1 : null, y1 };
}

function supplyOhm(read: Quantities, { nominalV }: Place): Jet {
  return Jet.constant(nominalV * nominalV * 1e-6).over(read('shortCircuitMVA'));
}

function generatorOhm(read: Quantities, { nominalV }: Place): Jet {
  return read('xdSubtransientPercent')
    .times((nominalV * nominalV) / 1e5)
    .over(read('ratedKVA'));
}

function source(part: { neutral: boolean }, ohm: Jet, skinFactor: Jet, read: Quantities, h: Jet): ShuntJets {
  const ratio = read('xOverR');
  const r = ohm.over(ratio.times(ratio).plus(Jet.constant(1)).squareRoot());
  const y1 = complexOf(r.times(skinFactor), r.times(ratio).times(h)).inverse();
  return { y0: part.neutral ? y1.over(read('z0OverZ1')) : null, y1 };
}

function load(part: Resolved<'load'>, read: Quantities, h: Jet, { nominalV }: Place): ShuntJets {
  const toNeutral = /^L\d$/.test(part.connection);
  const square = toNeutral ? (nominalV * nominalV) / 3 : nominalV * nominalV;
  const conductance = read('kW').times(1e3 / square);
  if (part.powerFactor === 1) return withZero(part.neutral, conductance);
  const factor = read('powerFactor');
  const tangent = Jet.constant(1).minus(factor.times(factor)).squareRoot().over(factor);
  const size = conductance.times(tangent);
  const susceptance = part.leading ? size.times(h) : size.over(h).times(-1);
  return withZero(part.neutral, complexOf(conductance, susceptance));
}

function motor(read: Quantities, h: Jet, { nominalV }: Place): ShuntJets {
  const va = read('ratedKW')
    .times(read('count'))
    .times(1e3)
    .over(read('efficiency').times(read('powerFactor')));
  const ohm = Jet.constant(nominalV * nominalV).over(va.times(read('lockedRotorRatio')));
  const share = read('lockedRotorPowerFactor');
  const r = ohm.times(share);
  const x = ohm.times(Jet.constant(1).minus(share.times(share)).squareRoot());
  return { y0: null, y1: complexOf(r.times(h.squareRoot()), x.times(h)).inverse() };
}

function bank(read: Quantities, h: Jet): Jet {
  const volts = read('ratedV');
  const xc = volts.times(volts).times(1e-3).over(read('kvar'));
  const xl = xc.times(read('detuningPercent')).times(1e-2);
  const rl = xl.over(read('reactorQ')).times(skin(read, 'reactorSkin', h));
  const rc = xc.times(read('lossWPerKvar')).times(1e-3);
  return complexOf(rc.plus(rl), xl.times(h).minus(xc.over(h))).inverse();
}

function filter(part: Resolved<'filter'>, read: Quantities, h: Jet, { nominalV }: Place): Jet {
  const n = read('tunedOrder');
  const q = read('qFactor');
  const one = Jet.constant(1);
  const square = n.times(n);
  const net = Jet.constant(nominalV * nominalV * 1e-3).over(read('kvar'));
  const cType = part.type === 'c-type';
  const xc = cType ? net : net.times(square).over(square.minus(one));
  const xl = cType ? xc.over(square.minus(one)) : xc.over(square);
  const rc = xc.times(read('lossWPerKvar')).times(1e-3);
  const capacitor = complexOf(rc, xc.over(h).times(-1));
  if (part.type === 'single-tuned')
    return capacitor.plus(complexOf(n.times(xl).over(q), xl.times(h))).inverse();
  const r = q.times(n).times(xl);
  const inner = (cType ? xl.times(h).minus(xl.over(h)) : xl.times(h)).turned();
  return capacitor.plus(r.times(inner).over(r.plus(inner))).inverse();
}

/** R, L, C in series or in parallel; absent parts are absent. */
export function freeAdmittance(
  part: Resolved<'shunt' | 'branch'>,
  read: Quantities,
  h: Jet,
  omega: number,
): Jet {
  const resistance = part.resistanceOhm === undefined ? null : read('resistanceOhm');
  const reactance =
    part.inductanceMH === undefined
      ? null
      : read('inductanceMH')
          .times(omega * 1e-3)
          .times(h);
  const susceptance =
    part.capacitanceUF === undefined
      ? null
      : read('capacitanceUF')
          .times(omega * 1e-6)
          .times(h);
  const none = Jet.constant(0);
  if (part.arrangement === 'series') {
    const capacitive = susceptance ? susceptance.inverse() : none;
    return complexOf(resistance ?? none, (reactance ?? none).minus(capacitive)).inverse();
  }
  const inductive = reactance ? reactance.inverse() : none;
  return complexOf(resistance ? resistance.inverse() : none, (susceptance ?? none).minus(inductive));
}
