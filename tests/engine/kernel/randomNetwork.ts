/** Seeded numbers in [0, 1): mulberry32, public domain (from memory). */
export function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

/** A radial tree of busbars with a tie for every fourth one. */
export function meshedEdges(nodeCount: number, random: () => number): Int32Array {
  const edges: number[] = [];
  for (let i = 1; i < nodeCount; i++) edges.push(Math.floor(random() * i), i);
  for (let i = 0; i < nodeCount / 4; i++)
    edges.push(Math.floor(random() * nodeCount), Math.floor(random() * nodeCount));
  return Int32Array.from(edges);
}

interface Stampable {
  addDiagonalBlock(node: number, re9: ArrayLike<number>, im9: ArrayLike<number>): void;
  addOffDiagonalBlock(i: number, j: number, re9: ArrayLike<number>, im9: ArrayLike<number>): void;
}

/**
 * Stamps a passive three-phase network: every edge a series impedance of unequal, coupled phases, every
 * node an unequal shunt, inductive or capacitive. Admittances spread over three decades.
 */
export function stampNetwork(matrix: Stampable, nodeCount: number, edges: Int32Array, seed: number): void {
  const random = seededRandom(seed);
  for (let i = 0; i < nodeCount; i++) {
    const [re, im] = phaseBlock(random, 0.1 + random());
    matrix.addDiagonalBlock(i, re, im);
  }
  for (let e = 0; e < edges.length; e += 2) {
    const i = edges[e]!;
    const j = edges[e + 1]!;
    const [re, im] = phaseBlock(random, 10 ** (3 * random()));
    if (i === j) continue;
    matrix.addDiagonalBlock(i, re, im);
    matrix.addDiagonalBlock(j, re, im);
    matrix.addOffDiagonalBlock(i, j, re.map(negative), im.map(negative));
  }
}

function negative(x: number): number {
  return -x;
}

/** A symmetric, passive 3 × 3 admittance of about the given size. */
function phaseBlock(random: () => number, size: number): [number[], number[]] {
  const reactive = random() < 0.7 ? -1 : 1;
  const re = new Array<number>(9).fill(0);
  const im = new Array<number>(9).fill(0);
  for (let r = 0; r < 3; r++)
    for (let c = 0; c <= r; c++) {
      const g = size * (r === c ? 0.2 + 0.1 * random() : -0.05 * random());
      const b = reactive * size * (r === c ? 1 + random() : -0.3 * random());
      re[3 * r + c] = re[3 * c + r] = g;
      im[3 * r + c] = im[3 * c + r] = b;
    }
  return [re, im];
}

/** Seeded right-hand side, interleaved complex. */
export function randomVector(length: number, seed: number): Float64Array {
  const random = seededRandom(seed);
  return Float64Array.from({ length }, () => 2 * random() - 1);
}
