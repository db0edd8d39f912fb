import type { Network } from '../network/Network.ts';
import type { CaseSolution, ComplexArray } from '../types.ts';

/**
 * Collects the groups of one order after another into a CaseSolution's arrays. Per order: `begin`, `add`
 * each group's node voltages and terminal currents, `end`. Phasors add as phasors; magnitudes add to the
 * power `exponent` and are rooted at the end (1: plain sum, the cautious sum of unknown angles).
 */
export class SolutionWriter {
  private readonly network: Network;
  private readonly orders: number;
  private readonly voltage: ComplexArray;
  private readonly current: ComplexArray;
  private readonly lineVoltage: Float64Array;
  private readonly neutralCurrent: Float64Array;
  private readonly judged: CaseSolution['judged'];

  constructor(network: Network) {
    const { buses, terminals, maxOrder } = network;
    const b = 3 * buses.length * maxOrder;
    const t = 3 * terminals.length * maxOrder;
    this.network = network;
    this.orders = maxOrder;
    this.voltage = { re: new Float64Array(b), im: new Float64Array(b) };
    this.current = { re: new Float64Array(t), im: new Float64Array(t) };
    this.lineVoltage = new Float64Array(b);
    this.neutralCurrent = new Float64Array(t / 3);
    this.judged = {
      voltage: new Float64Array(b),
      lineVoltage: new Float64Array(b),
      current: new Float64Array(t),
      neutralCurrent: new Float64Array(t / 3),
      anglesUnknown: new Array<boolean>(maxOrder).fill(false),
    };
  }

  /** Adds one group at order h: `v` six numbers a node, `i` six a terminal. */
  add(h: number, v: Float64Array, i: Float64Array, exponent: number): void {
    const { busOfNode, nodeCount, terminals } = this.network;
    const { voltage, current, judged, orders } = this;
    for (let node = 0; node < nodeCount; node++) {
      const at = (busOfNode[node]! * orders + h - 1) * 3;
      this.addThree(voltage, judged.voltage, at, v, 6 * node, exponent);
      for (let k = 0; k < 3; k++) {
        const a = 6 * node + 2 * k;
        const b = 6 * node + 2 * ((k + 1) % 3);
        judged.lineVoltage[at + k] =
          judged.lineVoltage[at + k]! + powered(v[a]! - v[b]!, v[a + 1]! - v[b + 1]!, exponent);
      }
    }
    for (let t = 0; t < terminals.length; t++) {
      const o = 6 * t;
      this.addThree(current, judged.current, (t * orders + h - 1) * 3, i, o, exponent);
      const n = t * orders + h - 1;
      judged.neutralCurrent[n] =
        judged.neutralCurrent[n]! +
        powered(i[o]! + i[o + 2]! + i[o + 4]!, i[o + 1]! + i[o + 3]! + i[o + 5]!, exponent);
    }
  }

  /**
   * Closes order h: roots the sums; with `magnitudesOnly` (the summation law) the solution carries
   * [magnitude, 0], else line voltages and neutral currents follow from its phasors.
   */
  end(h: number, groups: number, exponent: number, magnitudesOnly: boolean, anglesUnknown: boolean): void {
    const { judged } = this;
    judged.anglesUnknown[h - 1] = anglesUnknown;
    this.forRows(h, this.network.buses.length, (at) => {
      if (exponent !== 1)
        for (const sums of [judged.voltage, judged.lineVoltage]) root(sums, at, 3, exponent);
      this.settle(this.voltage, judged.voltage, at, groups, magnitudesOnly, anglesUnknown);
      for (let k = 0; k < 3; k++) this.lineVoltage[at + k] = judged.lineVoltage[at + k]!;
      if (!magnitudesOnly && groups > 1) this.lineOf(at, anglesUnknown);
    });
    this.forRows(h, this.network.terminals.length, (at) => {
      const n = at / 3;
      if (exponent !== 1) {
        root(judged.current, at, 3, exponent);
        root(judged.neutralCurrent, n, 1, exponent);
      }
      this.settle(this.current, judged.current, at, groups, magnitudesOnly, anglesUnknown);
      this.neutralCurrent[n] = judged.neutralCurrent[n]!;
      if (!magnitudesOnly && groups > 1) this.neutralOf(at, anglesUnknown);
    });
  }

  /** The finished arrays. */
  result(): Pick<CaseSolution, 'voltage' | 'current' | 'lineVoltage' | 'neutralCurrent' | 'judged'> {
    const { voltage, current, lineVoltage, neutralCurrent, judged } = this;
    return { voltage, current, lineVoltage, neutralCurrent, judged };
  }

  private addThree(
    sum: ComplexArray,
    magnitudes: Float64Array,
    at: number,
    x: Float64Array,
    i: number,
    exponent: number,
  ): void {
    for (let k = 0; k < 3; k++) {
      const re = x[i + 2 * k]!;
      const im = x[i + 2 * k + 1]!;
      sum.re[at + k] = sum.re[at + k]! + re;
      sum.im[at + k] = sum.im[at + k]! + im;
      magnitudes[at + k] = magnitudes[at + k]! + powered(re, im, exponent);
    }
  }

  private forRows(h: number, rows: number, visit: (at: number) => void): void {
    for (let row = 0; row < rows; row++) visit((row * this.orders + h - 1) * 3);
  }

  private settle(
    phasor: ComplexArray,
    judged: Float64Array,
    at: number,
    groups: number,
    magnitudesOnly: boolean,
    anglesUnknown: boolean,
  ): void {
    for (let k = at; k < at + 3; k++) {
      if (magnitudesOnly) {
        phasor.re[k] = judged[k]!;
        phasor.im[k] = 0;
      } else if (groups > 1 && !anglesUnknown) {
        judged[k] = Math.sqrt(phasor.re[k]! ** 2 + phasor.im[k]! ** 2);
      }
    }
  }

  private lineOf(at: number, anglesUnknown: boolean): void {
    const { re, im } = this.voltage;
    for (let k = 0; k < 3; k++) {
      const a = at + k;
      const b = at + ((k + 1) % 3);
      this.lineVoltage[a] = Math.sqrt((re[a]! - re[b]!) ** 2 + (im[a]! - im[b]!) ** 2);
      if (!anglesUnknown) this.judged.lineVoltage[a] = this.lineVoltage[a]!;
    }
  }

  private neutralOf(at: number, anglesUnknown: boolean): void {
    const { re, im } = this.current;
    const n = at / 3;
    const sumR = re[at]! + re[at + 1]! + re[at + 2]!;
    const sumI = im[at]! + im[at + 1]! + im[at + 2]!;
    this.neutralCurrent[n] = Math.sqrt(sumR * sumR + sumI * sumI);
    if (!anglesUnknown) this.judged.neutralCurrent[n] = this.neutralCurrent[n]!;
  }
}

function powered(re: number, im: number, exponent: number): number {
  const square = re * re + im * im;
  if (exponent === 2) return square;
  return exponent === 1 ? Math.sqrt(square) : square ** (exponent / 2);
}

function root(sums: Float64Array, at: number, count: number, exponent: number): void {
  for (let k = at; k < at + count; k++)
    sums[k] = exponent === 2 ? Math.sqrt(sums[k]!) : sums[k]! ** (1 / exponent);
}
