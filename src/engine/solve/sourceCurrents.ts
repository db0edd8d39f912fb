import type { Network, ShuntPart } from '../network/Network.ts';
import { removeMean } from './demandCurrents.ts';
import { addPhases } from './fortescue.ts';

const six = new Float64Array(6);

/**
 * Norton current −Y·E of a source INTO its part, phases at `own[o …]`, for an EMF of `volts`∠`angleRad` in
 * the sequence h mod 3. Reads the part's admittances of the order prepared last.
 */
export function emfCurrent(
  network: Network,
  part: ShuntPart,
  h: number,
  volts: number,
  angleRad: number,
  own: Float64Array,
  o: number,
): void {
  const sequence = h % 3;
  const at = part.at + (sequence === 0 ? 0 : 2);
  const re = network.values[at]!;
  const im = network.values[at + 1]!;
  const er = volts * Math.cos(angleRad);
  const ei = volts * Math.sin(angleRad);
  six.fill(0);
  six[2 * sequence] = -(re * er - im * ei);
  six[2 * sequence + 1] = -(re * ei + im * er);
  own.fill(0, o, o + 6);
  addPhases(six, 0, own, o);
}

/**
 * Harmonic current of a converter INTO its part at order h: per phase (or pair) percent/100·|I1| at
 * angle + h·φ, I1∠φ its bridge's fundamental current in `bridge[o …]`; three-wire ones freed of zero sequence.
 */
export function converterCurrent(
  part: ShuntPart,
  h: number,
  bridge: Float64Array,
  own: Float64Array,
  o: number,
): void {
  const { injector, phases } = part;
  own.fill(0, o, o + 6);
  if (!injector) return;
  const share = injector.table.percent[h]! / 100;
  const angle = injector.table.angleRad[h]!;
  for (let k = 0; k < 3; k++) {
    if (phases.p >= 0 && k !== phases.p) continue;
    const re = bridge[o + 2 * k]!;
    const im = bridge[o + 2 * k + 1]!;
    const size = share * Math.sqrt(re * re + im * im);
    const turn = angle + h * Math.atan2(im, re);
    own[o + 2 * k] = size * Math.cos(turn);
    own[o + 2 * k + 1] = size * Math.sin(turn);
  }
  if (phases.q >= 0) {
    own[o + 2 * phases.q] = -own[o + 2 * phases.p]!;
    own[o + 2 * phases.q + 1] = -own[o + 2 * phases.p + 1]!;
  } else if (phases.p < 0 && injector.threeWire) {
    removeMean(own, o);
  }
}

/** x = −Σ own currents at their nodes: what the parts' sources inject into the network. */
export function injectionsOf(network: Network, own: Float64Array, x: Float64Array): void {
  const { shunts } = network;
  x.fill(0);
  for (let k = 0; k < shunts.length; k++) {
    const { node } = shunts[k]!;
    if (node < 0) continue;
    for (let c = 0; c < 6; c++) x[6 * node + c] = x[6 * node + c]! - own[6 * k + c]!;
  }
}
