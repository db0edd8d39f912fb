import Complex from 'complex.js';
import type { Study } from '../../study/index.ts';
import { compileNetwork } from '../network/compileNetwork.ts';
import type { Network } from '../network/Network.ts';
import { addPhases } from '../solve/fortescue.ts';
import { PhaseSolver } from '../solve/PhaseSolver.ts';
import {
  type Coefficient,
  type PartAdmittance,
  seriesAdmittance,
  shuntAdmittance,
} from './PartAdmittance.ts';
import { type PartParameter, parametersOf } from './parameters.ts';

/** Which driving-point impedance: busbar id and sequence, in the harmonic model of the scans. */
export interface DrivingPointAt {
  bus: string;
  sequence: 'positive' | 'zero';
  /** Ids of parts left out, as in a scan without the correction. */
  without?: ReadonlySet<string>;
}

/** One part and one of its parameters, ready to be differentiated. */
export interface Varied extends PartParameter {
  element: string;
  admittance: PartAdmittance;
}

/**
 * Driving-point impedance Z = ℓᵀ·Y⁻¹·r of one busbar and its derivatives by adjoint: with v = Y⁻¹·r and
 * w = Y⁻¹·ℓ (Y is symmetric), ∂Z/∂p = −wᵀ·(∂Y/∂p)·v. r injects one ampere of the sequence, ℓ reads its
 * voltage; in sequence coordinates w = z_k = v, the k-th column of the impedance matrix.
 */
export class DrivingPoint {
  readonly network: Network;
  private readonly solver: PhaseSolver;
  private readonly node: number;
  private readonly sequence: 0 | 1;
  private h = 1;
  /** v, w and, after `differentiate`, ∂v/∂h and ∂w/∂h; six numbers a node. */
  private v: Float64Array = new Float64Array();
  private w: Float64Array = new Float64Array();
  private vh: Float64Array = new Float64Array();
  private wh: Float64Array = new Float64Array();
  private parts: PartAdmittance[] = [];
  private readonly scratch: Float64Array;

  constructor(study: Study, caseId: string, { bus, sequence, without }: DrivingPointAt) {
    this.network = compileNetwork(study, caseId, { without });
    const index = this.network.buses.findIndex(({ id }) => id === bus);
    if (index < 0) throw new RangeError(`no bus "${bus}" in the study`);
    this.node = this.network.nodeOfBus[index]!;
    this.sequence = sequence === 'zero' ? 0 : 1;
    this.solver = new PhaseSolver(this.network);
    this.scratch = new Float64Array(6 * this.network.nodeCount);
  }

  /** Why there is no impedance here, or undefined. */
  get fault(): string | undefined {
    if (this.node < 0) return 'the busbar has no path to a source';
    if (this.sequence === 0 && this.network.zeroPaths.harmonic[this.node] === 0)
      return 'the busbar has no zero-sequence path';
    return undefined;
  }

  /** Z at order h, ohms; prepares the derivatives by parameters. */
  impedance(h: number): Complex {
    this.h = h;
    this.solver.prepare(h, 'harmonic');
    this.v = this.unit(this.sequence, 1);
    this.w = this.unit(this.sequence === 0 ? 0 : 2, 1 / 3);
    this.solver.solve(this.v);
    this.solver.solve(this.w);
    const left = this.unit(this.sequence === 0 ? 0 : 2, 1 / 3);
    return dot(left, this.v);
  }

  /** ∂Z/∂h and ∂²Z/∂h²; prepares the mixed derivatives. */
  differentiate(): { first: Complex; second: Complex } {
    this.parts = this.allParts();
    const slope = this.product(1, this.v);
    this.vh = slope.map((x) => -x);
    this.wh = this.product(1, this.w).map((x) => -x);
    this.solver.solve(this.vh);
    this.solver.solve(this.wh);
    const second = dot(this.w, this.product(2, this.v)).mul(-2);
    return {
      first: dot(this.w, slope).neg(),
      second: second.sub(dot(this.w, this.product(1, this.vh)).mul(2)),
    };
  }

  /** Every parameter of every part in service, in study order, at the order of the last `impedance`. */
  varied(): Varied[] {
    const order = new Map(this.network.study.elements.map(({ id }, k) => [id, k]));
    const found: Varied[] = [];
    for (const part of this.network.shunts)
      if (part.node >= 0 && part.law)
        for (const parameter of parametersOf(part.element))
          found.push({
            ...parameter,
            element: part.element.id,
            admittance: this.shunt(part, parameter.field),
          });
    for (const part of this.network.series)
      if (part.from >= 0)
        for (const parameter of parametersOf(part.element))
          found.push({
            ...parameter,
            element: part.element.id,
            admittance: this.seriesPart(part, parameter.field),
          });
    return found.sort((a, b) => order.get(a.element)! - order.get(b.element)!);
  }

  /** ∂Z/∂p, ohms per unit of the parameter. */
  byParameter({ admittance }: Varied): Complex {
    return this.form(admittance, 3, this.w, this.v).neg();
  }

  /** ∂²Z/∂h∂p, after `differentiate`. */
  byOrderAndParameter({ admittance }: Varied): Complex {
    return this.form(admittance, 4, this.w, this.v)
      .add(this.form(admittance, 3, this.wh, this.v))
      .add(this.form(admittance, 3, this.w, this.vh))
      .neg();
  }

  private shunt(part: Network['shunts'][number], varied?: string): PartAdmittance {
    const nominalV = this.network.buses[part.bus]!.nominalV;
    return shuntAdmittance(part, this.h, this.omega, nominalV, varied);
  }

  private seriesPart(part: Network['series'][number], varied?: string): PartAdmittance {
    return seriesAdmittance(part, this.h, this.omega, varied);
  }

  private get omega(): number {
    return 2 * Math.PI * this.network.frequencyHz;
  }

  private allParts(): PartAdmittance[] {
    return [
      ...this.network.shunts.filter(({ node, law }) => node >= 0 && law).map((part) => this.shunt(part)),
      ...this.network.series.filter(({ from }) => from >= 0).map((part) => this.seriesPart(part)),
    ];
  }

  /** `size` amperes of one sequence at the busbar. */
  private unit(sequence: 0 | 1 | 2, size: number): Float64Array {
    const x = new Float64Array(6 * this.network.nodeCount);
    const six = new Float64Array(6);
    six[2 * sequence] = size;
    addPhases(six, 0, x, 6 * this.node);
    return x;
  }

  /** Y_c·x of the whole network. */
  private product(c: Coefficient, x: Float64Array): Float64Array {
    const out = new Float64Array(x.length);
    for (const part of this.parts) part.addProduct(c, 1, x, out);
    return out;
  }

  /** wᵀ·Y_c·v of one part. */
  private form(part: PartAdmittance, c: Coefficient, w: Float64Array, v: Float64Array): Complex {
    const out = this.scratch;
    for (const node of part.nodes) out.fill(0, 6 * node, 6 * node + 6);
    part.addProduct(c, 1, v, out);
    return part.nodes.reduce(
      (sum, node) => sum.add(dot(w.subarray(6 * node, 6 * node + 6), out.subarray(6 * node, 6 * node + 6))),
      new Complex(0),
    );
  }
}

/** Σ a·b, no conjugate. */
function dot(a: Float64Array, b: Float64Array): Complex {
  let re = 0;
  let im = 0;
  for (let i = 0; i < a.length; i += 2) {
    re += a[i]! * b[i]! - a[i + 1]! * b[i + 1]!;
    im += a[i]! * b[i + 1]! + a[i + 1]! * b[i]!;
  }
  return new Complex(re, im);
}
