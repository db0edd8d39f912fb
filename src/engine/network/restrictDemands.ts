import type { Network, ShuntPart } from './Network.ts';
import { labelOf } from './networkWarnings.ts';

/**
 * What a missing zero-sequence path does to the parts that would use it, with a word for each: a
 * three-phase part with neutral is treated as three-wire; a single-phase-to-neutral demand is the case's
 * error; a bus without any path is said to have zero zero-sequence voltage. Changes the network's parts.
 */
export function restrictDemands(network: Network): void {
  const { shunts, zeroPaths, warnings } = network;
  for (const part of shunts) {
    if (part.node < 0) continue;
    const carries = zeroPaths.demand[part.node] === 1;
    const carriesHarmonics = zeroPaths.harmonic[part.node] === 1;
    const where = `${labelOf(part.element)} on bus ${busLabel(network, part)}`;
    if (part.demand?.form === 'single' && !carries) {
      network.error ??=
        `${part.element.kind} ${where} draws from phase to neutral, ` +
        'but the bus has no zero-sequence path to carry it: earth a star point or connect it between phases';
    }
    if (part.demand?.form === 'wye' && !carries) {
      part.demand = { ...part.demand, form: 'three-wire' };
      const also = part.injector && !carriesHarmonics ? ' at every order' : ' at the fundamental';
      warnings.push(
        `${part.element.kind} ${where} has a neutral, but the bus has no zero-sequence path for it; ` +
          `it is treated as three-wire${also}`,
      );
    }
    if (part.injector && !carriesHarmonics) part.injector = { ...part.injector, threeWire: true };
  }
  warnings.push(...untiedBuses(network));
}

function busLabel({ buses }: Network, part: ShuntPart): string {
  const bus = buses[part.bus];
  return bus ? labelOf(bus) : '';
}

function untiedBuses({ busOfNode, buses, zeroPaths }: Network): string[] {
  return [...busOfNode].flatMap((bus, node) => {
    const named = buses[bus];
    if (!named || zeroPaths.fundamental[node] === 1) return [];
    const when = zeroPaths.harmonic[node] === 1 ? ' at the fundamental' : '';
    return [
      `bus ${labelOf(named)} has no zero-sequence path${when}; its zero-sequence voltage is taken as zero there`,
    ];
  });
}
