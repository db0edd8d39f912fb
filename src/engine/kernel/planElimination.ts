import type { EliminationPlan } from './EliminationPlan.ts';
import { minimumDegreeOrder } from './minimumDegreeOrder.ts';

/**
 * Elimination plan of the graph on `nodeCount` nodes with the given edges (pairs of nodes, repeated and
 * self pairs allowed), in minimum-degree order with `lastNode` eliminated last. Islands are allowed.
 * RangeError for a node outside 0 … nodeCount − 1. The plan depends on the pattern alone: keep it per
 * topology and last node, it serves every frequency and every value edit.
 */
export function planElimination(nodeCount: number, edges: Int32Array, lastNode?: number): EliminationPlan {
  const neighbours = neighbourSets(nodeCount, edges);
  if (lastNode !== undefined) checkNode(lastNode, nodeCount);
  const { order, columns } = minimumDegreeOrder(nodeCount, neighbours, lastNode);
  const position = new Int32Array(nodeCount);
  order.forEach((node, k) => {
    position[node] = k;
  });
  const columnStart = new Int32Array(nodeCount + 1);
  columns.forEach((rows, k) => {
    columnStart[k + 1] = columnStart[k]! + rows.length;
  });
  const slotCount = columnStart[nodeCount]!;
  const rowPosition = new Int32Array(slotCount);
  columns.forEach((rows, k) => {
    rowPosition.set(Int32Array.from(rows, (node) => position[node]!).sort(), columnStart[k]);
  });
  const slotAt = (row: number, column: number) => findSlot(columnStart, rowPosition, row, column);
  return {
    nodeCount,
    slotCount,
    order,
    position,
    columnStart,
    rowPosition,
    updateTarget: updateTargets(columnStart, rowPosition, slotAt),
    diagonalSlot: (node) => position[checkNode(node, nodeCount)]!,
    offDiagonalSlot: (i, j) => {
      const p = position[checkNode(i, nodeCount)]!;
      const q = position[checkNode(j, nodeCount)]!;
      const slot = p === q ? -1 : slotAt(Math.max(p, q), Math.min(p, q));
      if (slot < 0) throw new RangeError(`no pair (${i}, ${j}) in the plan's pattern`);
      return slot;
    },
    isTransposed: (i, j) => position[checkNode(i, nodeCount)]! < position[checkNode(j, nodeCount)]!,
  };
}

function checkNode(node: number, nodeCount: number): number {
  if (!Number.isInteger(node) || node < 0 || node >= nodeCount)
    throw new RangeError(`node ${node} is outside 0 … ${nodeCount - 1}`);
  return node;
}

function neighbourSets(nodeCount: number, edges: Int32Array): Set<number>[] {
  if (edges.length % 2 !== 0) throw new RangeError(`edges hold ${edges.length} numbers, not pairs`);
  const sets = Array.from({ length: nodeCount }, () => new Set<number>());
  for (let e = 0; e < edges.length; e += 2) {
    const i = checkNode(edges[e]!, nodeCount);
    const j = checkNode(edges[e + 1]!, nodeCount);
    if (i === j) continue;
    sets[i]?.add(j);
    sets[j]?.add(i);
  }
  return sets;
}

/** Binary search of a row in a column; −1 when absent. */
function findSlot(columnStart: Int32Array, rowPosition: Int32Array, row: number, column: number): number {
  let low = columnStart[column]!;
  let high = columnStart[column + 1]! - 1;
  while (low <= high) {
    const mid = (low + high) >> 1;
    const found = rowPosition[mid]!;
    if (found === row) return mid;
    if (found < row) low = mid + 1;
    else high = mid - 1;
  }
  return -1;
}

function updateTargets(
  columnStart: Int32Array,
  rowPosition: Int32Array,
  slotAt: (row: number, column: number) => number,
): Int32Array {
  const targets: number[] = [];
  for (let k = 0; k + 1 < columnStart.length; k++) {
    const end = columnStart[k + 1]!;
    for (let b = columnStart[k]!; b < end; b++) {
      targets.push(rowPosition[b]!);
      for (let a = b + 1; a < end; a++) targets.push(slotAt(rowPosition[a]!, rowPosition[b]!));
    }
  }
  return Int32Array.from(targets);
}
