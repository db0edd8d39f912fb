import type { Network } from '../network/Network.ts';
import type { CaseSolution, ComplexArray } from '../types.ts';
import { OrderSums, powered } from './OrderSums.ts';

/** Orders written together: a row's orders lie together in the solution, and a lone one would waste its cache line. */
const ORDERS_AT_ONCE = 8;

/** How an order closes: which sums the solution carries and which the checks judge. */
interface Closing {
  groups: number;
  /** The summation law: the solution carries [magnitude, 0]. */
  magnitudesOnly: boolean;
  anglesUnknown: boolean;
}

/**
 * Collects the groups of one order after another into a CaseSolution's arrays. Per order: `add` each group's
 * node voltages and terminal currents, then `end`. Phasors add as phasors; magnitudes add to the power
 * `exponent` and are rooted at the end (1: plain sum, the cautious sum of unknown angles). The sums of an
 * order lie together; they are written into the solution's arrays a few orders at a time.
 */
export class SolutionWriter {
  private readonly network: Network;
  private readonly orders: number;
  private readonly volts: readonly OrderSums[];
  private readonly amperes: readonly OrderSums[];
  /** Orders closed and not yet written; the next one adds into the sums of this place. */
  private readonly closed: { h: number; closing: Closing }[] = [];
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
    const sums = (rows: number, acrossPerRow: number) =>
      Array.from({ length: ORDERS_AT_ONCE }, () => new OrderSums(rows, acrossPerRow));
    this.volts = sums(buses.length, 3);
    this.amperes = sums(terminals.length, 1);
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

  /** Adds one group: `v` six numbers a node, `i` six a terminal. */
  add(v: Float64Array, i: Float64Array, exponent: number): void {
    const { busOfNode, nodeCount, terminals } = this.network;
    const volts = this.volts[this.closed.length]!;
    const amperes = this.amperes[this.closed.length]!;
    for (let node = 0; node < nodeCount; node++) {
      const at = 3 * busOfNode[node]!;
      volts.addThree(at, v, 6 * node, exponent);
      for (let k = 0; k < 3; k++) {
        const a = 6 * node + 2 * k;
        const b = 6 * node + 2 * ((k + 1) % 3);
        volts.across[at + k] =
          volts.across[at + k]! + powered(v[a]! - v[b]!, v[a + 1]! - v[b + 1]!, exponent);
      }
    }
    for (let t = 0, o = 0; t < terminals.length; t++, o += 6) {
      amperes.addThree(3 * t, i, o, exponent);
      amperes.across[t] =
        amperes.across[t]! +
        powered(i[o]! + i[o + 2]! + i[o + 4]!, i[o + 1]! + i[o + 3]! + i[o + 5]!, exponent);
    }
  }

  /** Closes order h and begins the next: roots the sums of its magnitudes. */
  end(h: number, exponent: number, closing: Closing): void {
    this.judged.anglesUnknown[h - 1] = closing.anglesUnknown;
    this.volts[this.closed.length]!.root(exponent);
    this.amperes[this.closed.length]!.root(exponent);
    this.closed.push({ h, closing });
    if (this.closed.length === ORDERS_AT_ONCE) this.write();
  }

  /** The finished arrays. */
  result(): Pick<CaseSolution, 'voltage' | 'current' | 'lineVoltage' | 'neutralCurrent' | 'judged'> {
    this.write();
    const { voltage, current, lineVoltage, neutralCurrent, judged } = this;
    return { voltage, current, lineVoltage, neutralCurrent, judged };
  }

  private write(): void {
    const { closed, volts, amperes } = this;
    for (let bus = 0; bus < this.network.buses.length; bus++)
      for (let c = 0; c < closed.length; c++) this.writeBus(bus, closed[c]!.h, closed[c]!.closing, volts[c]!);
    for (let t = 0; t < this.network.terminals.length; t++)
      for (let c = 0; c < closed.length; c++)
        this.writeTerminal(t, closed[c]!.h, closed[c]!.closing, amperes[c]!);
    for (let c = 0; c < closed.length; c++) {
      volts[c]!.clear();
      amperes[c]!.clear();
    }
    closed.length = 0;
  }

  /** Line voltages follow from the phasors where more than one group was added, else from the one group. */
  private writeBus(bus: number, h: number, closing: Closing, sums: OrderSums): void {
    const { re, im, across } = sums;
    const phasors = addsPhasors(closing);
    const from = 3 * bus;
    const at = (bus * this.orders + h - 1) * 3;
    this.writeThree(this.voltage, this.judged.voltage, sums, from, at, closing);
    for (let k = 0; k < 3; k++) {
      const b = from + ((k + 1) % 3);
      const own = across[from + k]!;
      const line = phasors ? Math.sqrt((re[from + k]! - re[b]!) ** 2 + (im[from + k]! - im[b]!) ** 2) : own;
      this.lineVoltage[at + k] = line;
      this.judged.lineVoltage[at + k] = phasors && !closing.anglesUnknown ? line : own;
    }
  }

  private writeTerminal(terminal: number, h: number, closing: Closing, sums: OrderSums): void {
    const { re, im, across } = sums;
    const phasors = addsPhasors(closing);
    const from = 3 * terminal;
    const n = terminal * this.orders + h - 1;
    this.writeThree(this.current, this.judged.current, sums, from, 3 * n, closing);
    const sumR = re[from]! + re[from + 1]! + re[from + 2]!;
    const sumI = im[from]! + im[from + 1]! + im[from + 2]!;
    const own = across[terminal]!;
    const neutral = phasors ? Math.sqrt(sumR * sumR + sumI * sumI) : own;
    this.neutralCurrent[n] = neutral;
    this.judged.neutralCurrent[n] = phasors && !closing.anglesUnknown ? neutral : own;
  }

  private writeThree(
    phasor: ComplexArray,
    judged: Float64Array,
    sums: OrderSums,
    from: number,
    at: number,
    closing: Closing,
  ): void {
    const { magnitudesOnly, anglesUnknown } = closing;
    const together = addsPhasors(closing) && !anglesUnknown;
    for (let k = 0; k < 3; k++) {
      const re = sums.re[from + k]!;
      const im = sums.im[from + k]!;
      const magnitude = sums.magnitude[from + k]!;
      phasor.re[at + k] = magnitudesOnly ? magnitude : re;
      phasor.im[at + k] = magnitudesOnly ? 0 : im;
      judged[at + k] = together ? Math.sqrt(re * re + im * im) : magnitude;
    }
  }
}

function addsPhasors({ groups, magnitudesOnly }: Closing): boolean {
  return groups > 1 && !magnitudesOnly;
}
