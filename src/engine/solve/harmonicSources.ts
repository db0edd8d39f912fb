import type { Network } from '../network/Network.ts';
import { converterCurrent, emfCurrent } from './sourceCurrents.ts';

/** What acts at one order, by index of the shunt part. */
export interface ActiveSource {
  part: number;
  angleKnown: boolean;
}

/** Converters with a current and supplies with background at order h. */
export function activeSources(network: Network, h: number, bridge: Float64Array): ActiveSource[] {
  const active: ActiveSource[] = [];
  network.shunts.forEach(({ node, injector, emf }, part) => {
    const table = injector?.table ?? emf?.background;
    if (node < 0 || !table || !(table.percent[h]! > 0)) return;
    if (injector && !bridge.subarray(6 * part, 6 * part + 6).some((value) => value !== 0)) return;
    active.push({ part, angleKnown: table.angleKnown[h] === 1 });
  });
  return active;
}

/**
 * Groups whose mutual phase is known: all sources with angles together, then each without by itself;
 * under the IEC 61000-3-6 law every source by itself (one converter, or one supply's background).
 */
export function sourceGroups(active: readonly ActiveSource[], each: boolean): ActiveSource[][] {
  if (each) return active.map((source) => [source]);
  const known = active.filter(({ angleKnown }) => angleKnown);
  const unknown = active.filter(({ angleKnown }) => !angleKnown).map((source) => [source]);
  return known.length > 0 ? [known, ...unknown] : unknown;
}

/** Writes the group's currents INTO its parts at order h into `own`, everything else zero. */
export function groupCurrents(
  network: Network,
  h: number,
  group: readonly ActiveSource[],
  bridge: Float64Array,
  own: Float64Array,
): void {
  own.fill(0);
  for (const { part: k } of group) {
    const part = network.shunts[k]!;
    if (part.injector) converterCurrent(part, h, bridge, own, 6 * k);
    else if (part.emf?.background) {
      const { background, backgroundBase, angleRad } = part.emf;
      const volts = (background.percent[h]! / 100) * backgroundBase;
      emfCurrent(network, part, h, volts, background.angleRad[h]! + h * angleRad, own, 6 * k);
    }
  }
}

/** IEC TR 61000-3-6 summation exponent (from memory): 1 below order 5, 1.4 from 5 to 10, 2 above. */
export function summationExponent(h: number): number {
  if (h < 5) return 1;
  return h <= 10 ? 1.4 : 2;
}
