import { isSeries, type ResolvedElement } from '../../study/index.ts';

export interface Islands {
  nodeOfBus: Int32Array;
  busOfNode: Int32Array;
}

/** Buses with a path of series parts in service to a supply or generator; node numbers in bus order. */
export function findIslands(busIds: readonly string[], parts: readonly ResolvedElement[]): Islands {
  const indexOf = new Map(busIds.map((id, k) => [id, k]));
  const group = new DisjointSets(busIds.length);
  const at = (id: string): number => {
    const k = indexOf.get(id);
    if (k === undefined) throw new RangeError(`no busbar "${id}" in the study`);
    return k;
  };
  for (const part of parts) if (isSeries(part)) group.join(at(part.from), at(part.to));
  const live = new Set<number>();
  for (const part of parts)
    if (part.kind === 'supply' || part.kind === 'generator') live.add(group.find(at(part.bus)));
  const nodeOfBus = new Int32Array(busIds.length).fill(-1);
  const busOfNode: number[] = [];
  busIds.forEach((_, k) => {
    if (!live.has(group.find(k))) return;
    nodeOfBus[k] = busOfNode.length;
    busOfNode.push(k);
  });
  return { nodeOfBus, busOfNode: Int32Array.from(busOfNode) };
}

/** Union-find over 0 … n − 1. */
export class DisjointSets {
  private readonly parent: Int32Array;

  constructor(size: number) {
    this.parent = Int32Array.from({ length: size }, (_, k) => k);
  }

  find(k: number): number {
    let root = k;
    while (this.parent[root] !== root) root = this.parent[root] as number;
    for (let at = k; at !== root; ) {
      const next = this.parent[at] as number;
      this.parent[at] = root;
      at = next;
    }
    return root;
  }

  join(a: number, b: number): void {
    this.parent[this.find(a)] = this.find(b);
  }
}
