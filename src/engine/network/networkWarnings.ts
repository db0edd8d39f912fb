import type { Bus } from '../../study/index.ts';
import type { SeriesPart } from './Network.ts';

/** Id, with the name where the study gives one: how warnings and errors name a part or busbar. */
export function labelOf(named: { id: string; name?: string }): string {
  const name = named.name?.trim();
  return name && name !== named.id ? `${named.id} (${name})` : named.id;
}

/** What is worth a word about the series parts: turned rings, and nominal voltages that do not fit. */
export function seriesWarnings(
  series: readonly SeriesPart[],
  clashes: readonly SeriesPart[],
  buses: readonly Bus[],
): string[] {
  const warnings = clashes.map(
    ({ element }) =>
      `${element.kind} ${labelOf(element)} closes a ring of transformers of different phase shift; ` +
      'a circulating current flows, check the vector groups',
  );
  for (const part of series) {
    const from = buses[part.fromBus];
    const to = buses[part.toBus];
    if (!from || !to) continue;
    if (part.element.kind === 'transformer') {
      const { hvV, lvV } = part.element;
      if (isFar(from.nominalV, hvV)) warnings.push(misfit(part, 'HV', hvV, from));
      if (isFar(to.nominalV, lvV)) warnings.push(misfit(part, 'LV', lvV, to));
    } else if (from.nominalV !== to.nominalV) {
      warnings.push(
        `${part.element.kind} ${labelOf(part.element)} joins busbars of unequal nominal voltage: ` +
          `${from.nominalV} V at ${labelOf(from)}, ${to.nominalV} V at ${labelOf(to)}`,
      );
    }
  }
  return warnings;
}

function isFar(nominalV: number, ratedV: number): boolean {
  return Math.abs(nominalV - ratedV) > 0.15 * ratedV;
}

function misfit({ element }: SeriesPart, side: string, volts: number, bus: Bus): string {
  return (
    `transformer ${labelOf(element)}: its ${side} rating ${volts} V is more than 15 % away from ` +
    `the ${bus.nominalV} V nominal of busbar ${labelOf(bus)}`
  );
}
