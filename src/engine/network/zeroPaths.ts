import { windingOf } from '../models/vectorGroup.ts';
import { DisjointSets } from './islands.ts';
import type { SeriesPart, ShuntPart, ZeroPaths } from './Network.ts';

/**
 * Where zero-sequence current finds a path to earth, per node: earthed there or reached through cable,
 * reactor, coupler, branch or YNyn. Constant-power parts and converters are no path; for them, at the
 * fundamental, the large impedances of cables, banks, filters and shunts do not count either.
 */
export function findZeroPaths(
  nodeCount: number,
  shunts: readonly ShuntPart[],
  series: readonly SeriesPart[],
): ZeroPaths {
  const group = new DisjointSets(nodeCount);
  const earths = { fundamental: new Set<number>(), harmonic: new Set<number>(), demand: new Set<number>() };
  const earth = (node: number, kinds: readonly (keyof ZeroPaths)[]): void => {
    for (const kind of kinds) earths[kind].add(node);
  };
  for (const part of series) {
    if (part.from < 0) continue;
    if (part.element.kind !== 'transformer') {
      group.join(part.from, part.to);
      if (hasZeroCapacitance(part)) for (const node of [part.from, part.to]) earth(node, weak);
      continue;
    }
    const { zeroPath } = windingOf(part.element.vectorGroup);
    if (zeroPath === 'through') group.join(part.from, part.to);
    if (zeroPath === 'lv') earth(part.to, strong);
    if (zeroPath === 'hv') earth(part.from, strong);
  }
  for (const part of shunts) if (part.node >= 0) earth(part.node, pathsOfShunt(part));
  const marked = (kind: keyof ZeroPaths): Uint8Array => {
    const roots = new Set([...earths[kind]].map((node) => group.find(node)));
    return Uint8Array.from({ length: nodeCount }, (_, node) => (roots.has(group.find(node)) ? 1 : 0));
  };
  return { fundamental: marked('fundamental'), harmonic: marked('harmonic'), demand: marked('demand') };
}

const strong = ['fundamental', 'harmonic', 'demand'] as const;
const weak = ['fundamental', 'harmonic'] as const;
const harmonicOnly = ['harmonic'] as const;

function pathsOfShunt({ element }: ShuntPart): readonly (keyof ZeroPaths)[] {
  switch (element.kind) {
    case 'supply':
    case 'generator':
      return element.neutral ? strong : [];
    case 'bank':
    case 'filter':
      return element.connection === 'star-earthed' ? weak : [];
    case 'shunt':
      return element.neutral ? weak : [];
    case 'load': {
      const toNeutral = element.connection === 'L1L2L3' ? element.neutral : element.connection.length === 2;
      if (!toNeutral || element.kW === 0) return [];
      return element.model === 'impedance' ? strong : harmonicOnly;
    }
    default:
      return [];
  }
}

function hasZeroCapacitance({ element }: SeriesPart): boolean {
  return element.kind === 'cable' && element.capacitanceNFPerKm * element.c0OverC1 > 0;
}
