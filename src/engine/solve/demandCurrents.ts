import type { Demand, Network, ShuntPart } from '../network/Network.ts';

const halfRoot3 = Math.sqrt(3) / 2;
/** cos and sin of −k·120°. */
const turnCos = [1, -0.5, -0.5] as const;
const turnSin = [0, -halfRoot3, halfRoot3] as const;

/**
 * Currents INTO the constant-power parts at node voltages `v` (six numbers a node), written into `own`
 * (six numbers a shunt part). Wye: I_k = conj((S/3)/V_k). Three-wire: u_k = V_k − mean(V), i_k =
 * conj((S/3)/u_k), I_k = i_k − mean(i). Motor: I1 = conj(S/(3·V1)) in the positive sequence.
 */
export function demandCurrents(network: Network, v: Float64Array, own: Float64Array): void {
  const { shunts } = network;
  for (let k = 0; k < shunts.length; k++) {
    const part = shunts[k]!;
    if (part.demand && part.node >= 0) currentOf(part, part.demand, v, own, 6 * k);
  }
}

function currentOf(part: ShuntPart, demand: Demand, v: Float64Array, own: Float64Array, o: number): void {
  const i = 6 * part.node;
  const { p, q } = part.phases;
  const { active, reactive } = demand;
  switch (demand.form) {
    case 'wye':
      for (let k = 0; k < 6; k += 2) divide(active / 3, reactive / 3, v[i + k]!, v[i + k + 1]!, own, o + k);
      return;
    case 'three-wire': {
      const meanR = (v[i]! + v[i + 2]! + v[i + 4]!) / 3;
      const meanI = (v[i + 1]! + v[i + 3]! + v[i + 5]!) / 3;
      for (let k = 0; k < 6; k += 2)
        divide(active / 3, reactive / 3, v[i + k]! - meanR, v[i + k + 1]! - meanI, own, o + k);
      removeMean(own, o);
      return;
    }
    case 'single':
      divide(active, reactive, v[i + 2 * p]!, v[i + 2 * p + 1]!, own, o + 2 * p);
      return;
    case 'pair':
      divide(
        active,
        reactive,
        v[i + 2 * p]! - v[i + 2 * q]!,
        v[i + 2 * p + 1]! - v[i + 2 * q + 1]!,
        own,
        o + 2 * p,
      );
      own[o + 2 * q] = -own[o + 2 * p]!;
      own[o + 2 * q + 1] = -own[o + 2 * p + 1]!;
      return;
    case 'motor':
      motorCurrent(active / 3, reactive / 3, v, i, own, o);
  }
}

function motorCurrent(
  active: number,
  reactive: number,
  v: Float64Array,
  i: number,
  own: Float64Array,
  o: number,
): void {
  // V1 = (V_L1 + a·V_L2 + a²·V_L3)/3.
  const re = (v[i]! - (v[i + 2]! + v[i + 4]!) / 2 - halfRoot3 * (v[i + 3]! - v[i + 5]!)) / 3;
  const im = (v[i + 1]! - (v[i + 3]! + v[i + 5]!) / 2 + halfRoot3 * (v[i + 2]! - v[i + 4]!)) / 3;
  divide(active, reactive, re, im, own, o);
  const a = own[o]!;
  const b = own[o + 1]!;
  for (let k = 0; k < 3; k++) {
    own[o + 2 * k] = a * turnCos[k]! - b * turnSin[k]!;
    own[o + 2 * k + 1] = a * turnSin[k]! + b * turnCos[k]!;
  }
}

/** conj((P + jQ)/u) into `out`. */
function divide(
  active: number,
  reactive: number,
  re: number,
  im: number,
  out: Float64Array,
  o: number,
): void {
  const square = re * re + im * im;
  out[o] = (active * re + reactive * im) / square;
  out[o + 1] = (active * im - reactive * re) / square;
}

/** Frees three phases of their zero sequence. */
export function removeMean(x: Float64Array, o: number): void {
  const re = (x[o]! + x[o + 2]! + x[o + 4]!) / 3;
  const im = (x[o + 1]! + x[o + 3]! + x[o + 5]!) / 3;
  for (let k = 0; k < 6; k += 2) {
    x[o + k] = x[o + k]! - re;
    x[o + k + 1] = x[o + k + 1]! - im;
  }
}
