import type { Resolved, ResolvedElement } from '../../study/index.ts';
import { windingOf } from '../models/vectorGroup.ts';
import { Jet } from './Jet.ts';
import type { Quantities } from './parameters.ts';
import { complexOf, freeAdmittance, type Place, skin } from './shuntJets.ts';

/**
 * Two-port admittances of a series part, siemens, zero and positive sequence before the clock's rotation:
 * [If; It] = [[ff, ft], [ft, tt]]·[Vf; Vt]. null where a sequence is open.
 */
export interface SeriesJets {
  ff0: Jet | null;
  ff1: Jet;
  tt0: Jet | null;
  tt1: Jet;
  ft0: Jet | null;
  ft1: Jet;
}

export type SeriesElement = Extract<ResolvedElement, { from: string }>;

/** Admittances of a series part at order h with their derivatives, in the manner of shuntJets. */
export function seriesJets(
  part: SeriesElement,
  read: Quantities,
  h: Jet,
  { omega }: Omit<Place, 'nominalV'>,
): SeriesJets {
  switch (part.kind) {
    case 'transformer':
      return transformer(part, read, h);
    case 'cable':
      return cable(read, h, omega);
    case 'reactor':
      return plain(
        complexOf(
          read('resistanceOhm').times(skin(read, 'skin', h)),
          read('inductanceMH')
            .times(omega * 1e-3)
            .times(h),
        ).inverse(),
      );
    case 'coupler':
      return plain(complexOf(read('resistanceMOhm'), read('reactanceMOhm').times(h)).times(1e-3).inverse());
    case 'branch':
      return plain(freeAdmittance(part, read, h, omega));
  }
}

/** A series admittance alike in all sequences. */
function plain(y: Jet): SeriesJets {
  const minus = y.times(-1);
  return { ff0: y, ff1: y, tt0: y, tt1: y, ft0: minus, ft1: minus };
}

function transformer(part: Resolved<'transformer'>, read: Quantities, h: Jet): SeriesJets {
  const volts = read('lvV');
  const base = volts.times(volts).over(read('ratedKVA').times(1e3)); // U²/S
  const absZ = base.times(read('ukPercent')).times(1e-2);
  const resistance = base.times(read('loadLossKW')).over(read('ratedKVA'));
  const reactance = absZ.times(absZ).minus(resistance.times(resistance)).squareRoot();
  const ratio = read('hvV')
    .times(read('tapPercent').times(1e-2).plus(Jet.constant(1)))
    .over(volts);
  const z = complexOf(resistance.times(skin(read, 'skin', h)), reactance.times(h));
  const y = z.inverse();
  const earthing = read('neutralOhm').times(3);
  const { clock, zeroPath } = windingOf(part.vectorGroup);
  const z0 = z.times(read('z0OverZ1'));
  const square = ratio.times(ratio);
  const jets: SeriesJets = {
    ff0: null,
    ff1: y.over(square),
    tt0: null,
    tt1: y.plus(magnetising(part, read, h)),
    ft0: null,
    ft1: y.over(ratio).times(-1),
  };
  if (zeroPath === 'hv') jets.ff0 = z0.times(square).plus(earthing).inverse();
  if (zeroPath === 'lv') jets.tt0 = z0.plus(earthing).inverse();
  if (zeroPath === 'through') {
    jets.tt0 = z0.inverse();
    jets.ff0 = jets.tt0.over(square);
    jets.ft0 = jets.tt0.over(ratio).times(clock % 4 === 2 ? 1 : -1);
  }
  return jets;
}

/** G − jB/h of the magnetising branch at LV. */
function magnetising(part: Resolved<'transformer'>, read: Quantities, h: Jet): Jet {
  if (!(part.noLoadCurrentPercent > 0)) return Jet.constant(0);
  const square = read('lvV').times(read('lvV'));
  const conductance = read('noLoadLossKW').times(1e3).over(square);
  const size = read('noLoadCurrentPercent').times(read('ratedKVA')).times(10).over(square);
  const gap = size.times(size).minus(conductance.times(conductance));
  if (!(gap.c[0]! > 0)) return conductance;
  return complexOf(conductance, gap.squareRoot().over(h).times(-1));
}

function cable(read: Quantities, h: Jet, omega: number): SeriesJets {
  const km = read('lengthM').times(1e-3);
  const r = read('resistanceOhmPerKm')
    .times(km)
    .times(skin(read, 'skin', h));
  const x = read('reactanceOhmPerKm').times(km).times(h);
  const b = read('capacitanceNFPerKm')
    .times(km)
    .times(omega * 1e-9)
    .times(h);
  const positive = line(complexOf(r, x), b, read('runs'));
  const z0 = complexOf(r.times(read('r0OverR1')), x.times(read('x0OverX1')));
  const zero = line(z0, b.times(read('c0OverC1')), read('runs'));
  return {
    ff0: zero.end,
    tt0: zero.end,
    ft0: zero.through,
    ff1: positive.end,
    tt1: positive.end,
    ft1: positive.through,
  };
}

/** Equivalent π of series z and shunt jb: end admittance and coupling, of `runs` in parallel. */
function line(z: Jet, b: Jet, runs: Jet): { end: Jet; through: Jet } {
  const admittance = b.turned();
  const { sinhc, coshc } = entire(z.times(admittance));
  const y = runs.over(z.times(sinhc));
  const half = runs.times(admittance).times(coshc).over(sinhc);
  return { end: y.plus(half), through: y.times(-1) };
}

/** sinh(√w)/√w and (cosh(√w) − 1)/w: power series where |w| < 1, closed forms beyond. */
function entire(w: Jet): { sinhc: Jet; coshc: Jet } {
  if (Math.hypot(w.c[0]!, w.c[1]!) >= 1) {
    const root = w.squareRoot();
    const grown = root.exponential();
    const shrunk = grown.inverse();
    const sinhc = grown.minus(shrunk).times(0.5).over(root);
    return { sinhc, coshc: grown.plus(shrunk).times(0.5).minus(Jet.constant(1)).over(w) };
  }
  let term = Jet.constant(1);
  let sinhc = Jet.constant(1);
  let coshc = Jet.constant(0.5);
  for (let k = 1; k <= 12; k++) {
    term = term.times(w).times(1 / (2 * k * (2 * k + 1)));
    sinhc = sinhc.plus(term);
    coshc = coshc.plus(term.times(1 / (2 * k + 2)));
  }
  return { sinhc, coshc };
}
