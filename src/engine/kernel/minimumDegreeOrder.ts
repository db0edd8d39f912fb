/**
 * Minimum-degree elimination order of a graph: always the node with the fewest neighbours in the graph
 * that is left, ties by the lower number, `lastNode` kept to the end. Returns the nodes in order and, per
 * position, the neighbours still there when the node left: the pattern of its column of L.
 * Tinney and Walker, Proc. IEEE 55 (1967) 1801, scheme 2 (from memory).
 */
export function minimumDegreeOrder(
  nodeCount: number,
  neighbours: readonly Set<number>[],
  lastNode?: number,
): { order: Int32Array; columns: number[][] } {
  const graph = neighbours.map((set) => new Set(set));
  const queue = new DegreeQueue(graph.map((set) => set.size));
  if (lastNode !== undefined) queue.remove(lastNode);
  const order = new Int32Array(nodeCount);
  const columns: number[][] = [];
  for (let k = 0; k < nodeCount; k++) {
    const node = lastNode !== undefined && k === nodeCount - 1 ? lastNode : queue.takeSmallest();
    const rest = [...(graph[node] ?? [])];
    order[k] = node;
    columns.push(rest);
    eliminate(graph, node, rest);
    for (const other of rest) if (other !== lastNode) queue.move(other, graph[other]?.size ?? 0);
  }
  return { order, columns };
}

/** The neighbours of a node that leaves become neighbours of each other. */
function eliminate(graph: Set<number>[], node: number, rest: number[]): void {
  for (const a of rest) {
    const set = graph[a];
    if (!set) continue;
    set.delete(node);
    for (const b of rest) if (b !== a) set.add(b);
  }
}

/** Nodes by degree; a heap per degree gives the lowest number, stale entries are dropped when met. */
class DegreeQueue {
  private readonly degree: number[];
  private readonly heap: number[] = []; // degree · n + node, binary min-heap

  constructor(degrees: number[]) {
    this.degree = [...degrees];
    degrees.forEach((d, node) => {
      this.push(d * degrees.length + node);
    });
  }

  remove(node: number): void {
    this.degree[node] = -1;
  }

  move(node: number, degree: number): void {
    if (this.degree[node] === degree) return;
    this.degree[node] = degree;
    this.push(degree * this.degree.length + node);
  }

  takeSmallest(): number {
    for (;;) {
      const key = this.pop();
      const node = key % this.degree.length;
      if (this.degree[node] !== (key - node) / this.degree.length) continue;
      this.degree[node] = -1;
      return node;
    }
  }

  private push(key: number): void {
    const heap = this.heap;
    let i = heap.length;
    heap.push(key);
    while (i > 0) {
      const up = (i - 1) >> 1;
      if (heap[up]! <= key) break;
      heap[i] = heap[up]!;
      i = up;
    }
    heap[i] = key;
  }

  private pop(): number {
    const heap = this.heap;
    const top = heap[0]!;
    const key = heap.pop()!;
    let i = 0;
    for (let child = 1; child < heap.length; child = 2 * i + 1) {
      if (child + 1 < heap.length && heap[child + 1]! < heap[child]!) child++;
      if (heap[child]! >= key) break;
      heap[i] = heap[child]!;
      i = child;
    }
    if (heap.length > 0) heap[i] = key;
    return top;
  }
}
