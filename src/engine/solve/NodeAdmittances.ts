import type { Network, Role, SeriesPart, ShuntPart } from '../network/Network.ts';

/**
 * Sequence admittances of a network at one order: every law evaluated into `network.values`, the parts
 * that load the phases alike summed per node. Both solvers stamp from here. Nothing is allocated per order.
 *
 * `diagonal`: per node y0 re, im, y1 re, im (y2 = y1), the zero-sequence tie of nodes without a path
 * included: of the size of the node's own positive-sequence admittances, as no current enters it.
 */
export class NodeAdmittances {
  readonly network: Network;
  readonly diagonal: Float64Array;
  /** Series parts between energised nodes. */
  readonly series: readonly SeriesPart[];
  private readonly balanced: Record<Role, ShuntPart[]>;
  private readonly unbalanced: Record<Role, ShuntPart[]>;
  private readonly motors: readonly ShuntPart[];
  private readonly untied: Record<Role, Int32Array>;
  private readonly size: Float64Array;

  constructor(network: Network) {
    this.network = network;
    this.diagonal = new Float64Array(4 * network.nodeCount);
    this.size = new Float64Array(network.nodeCount);
    this.series = network.series.filter(({ from }) => from >= 0);
    const live = network.shunts.filter(({ node, law }) => node >= 0 && law);
    const atFundamental = live.filter(({ atFundamental }) => atFundamental === 'all');
    const alike = ({ phases }: ShuntPart): boolean => phases.p < 0;
    const single = (part: ShuntPart): boolean => !alike(part);
    this.balanced = { fundamental: atFundamental.filter(alike), harmonic: live.filter(alike) };
    this.unbalanced = { fundamental: atFundamental.filter(single), harmonic: live.filter(single) };
    this.motors = live.filter(({ atFundamental }) => atFundamental === 'negative');
    const { fundamental, harmonic } = network.zeroPaths;
    this.untied = { fundamental: nodesWithout(fundamental), harmonic: nodesWithout(harmonic) };
  }

  /** Parts of single phases or pairs, to be stamped in phase coordinates. */
  unbalancedParts(role: Role): readonly ShuntPart[] {
    return this.unbalanced[role];
  }

  /** Parts with an admittance in the negative sequence alone: motors at the fundamental. */
  negativeParts(role: Role): readonly ShuntPart[] {
    return role === 'fundamental' ? this.motors : [];
  }

  /** At order h of the actual fundamental, which stands `frequencyFactor` times above the rated one. */
  evaluate(order: number, role: Role): void {
    const { values, frequencyFactor } = this.network;
    const h = order * frequencyFactor;
    const diagonal = this.diagonal;
    diagonal.fill(0);
    for (const part of this.unbalanced[role]) part.law?.(h, values, part.at);
    for (const part of this.negativeParts(role)) part.law?.(h, values, part.at);
    for (const part of this.balanced[role]) {
      part.law?.(h, values, part.at);
      addFour(values, part.at, diagonal, 4 * part.node);
    }
    for (const part of this.series) {
      part.law(h, values, part.at);
      addFour(values, part.at, diagonal, 4 * part.from);
      addFour(values, part.at + 4, diagonal, 4 * part.to);
    }
    if (this.untied[role].length > 0) this.tie(role);
  }

  private tie(role: Role): void {
    const { values } = this.network;
    const size = this.size;
    size.fill(0);
    const grow = (node: number, at: number): void => {
      size[node] = size[node]! + Math.abs(values[at]!) + Math.abs(values[at + 1]!);
    };
    for (const part of this.balanced[role]) grow(part.node, part.at + 2);
    for (const part of this.series) {
      grow(part.from, part.at + 2);
      grow(part.to, part.at + 6);
    }
    for (const node of this.untied[role]) this.diagonal[4 * node] = this.diagonal[4 * node]! + size[node]!;
  }
}

function nodesWithout(path: Uint8Array): Int32Array {
  return Int32Array.from([...path.keys()].filter((node) => path[node] === 0));
}

function addFour(values: Float64Array, at: number, out: Float64Array, o: number): void {
  out[o] = out[o]! + values[at]!;
  out[o + 1] = out[o + 1]! + values[at + 1]!;
  out[o + 2] = out[o + 2]! + values[at + 2]!;
  out[o + 3] = out[o + 3]! + values[at + 3]!;
}
