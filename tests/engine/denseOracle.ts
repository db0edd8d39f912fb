import {
  abs,
  add,
  type Complex,
  complex,
  conj,
  divide,
  inv,
  matrix,
  multiply,
  sinh,
  sqrt,
  subtract,
  tanh,
} from 'mathjs';
import { type Study, type StudyElement, spectrumOf, withDefaults } from '../../src/study/index.ts';

/**
 * An independent solution of a small study by dense complex algebra: sequence admittances from the
 * format's formulas, turned into phases by Fortescue's matrix as a matrix product, nodal matrix inverted
 * whole. Nothing of the engine is used. Covers supplies, transformers, cables, couplers, loads, motors,
 * converters and banks in one island whose busbars all have a zero-sequence path.
 */
type C = Complex;
const c = (re: number, im = 0): C => complex(re, im);
const mul = (a: C, b: C): C => multiply(a, b) as C;
const sum = (a: C, b: C): C => add(a, b) as C;
const over = (a: C, b: C): C => divide(a, b) as C;
const polar = (size: number, rad: number): C => complex(size * Math.cos(rad), size * Math.sin(rad));
const a = polar(1, (2 * Math.PI) / 3);
const a2 = mul(a, a);
const F = [
  [c(1), c(1), c(1)],
  [c(1), a2, a],
  [c(1), a, a2],
];
const Finv = inv(matrix(F)).toArray() as C[][];

export interface OracleCase {
  /** Volts by bus, order h − 1, phase. */
  v: C[][][];
}

function inPhases(sequences: readonly [C, C, C]): C[][] {
  const diagonal = sequences.map((y, k) => sequences.map((_, n) => (k === n ? y : c(0))));
  return multiply(multiply(matrix(F), matrix(diagonal)), matrix(Finv)).toArray() as C[][];
}

class Nodal {
  readonly y: C[][];
  constructor(readonly busIds: readonly string[]) {
    const n = 3 * busIds.length;
    this.y = Array.from({ length: n }, () => Array.from({ length: n }, () => c(0)));
  }
  addBlock(row: string, column: string, block: C[][]): void {
    const [r, k] = [3 * this.busIds.indexOf(row), 3 * this.busIds.indexOf(column)];
    for (let p = 0; p < 3; p++)
      for (let q = 0; q < 3; q++) {
        const line = this.y[r + p] as C[];
        line[k + q] = sum(line[k + q] as C, block[p]?.[q] as C);
      }
  }
}

/** Admittances of one part at order h; `power` leaves constant-power parts out, as at the fundamental. */
function stamp(study: Study, element: StudyElement, h: number, power: boolean, into: Nodal): void {
  const omega = 2 * Math.PI * study.frequencyHz;
  const part = withDefaults(element, study) as StudyElement & Record<string, never>;
  const nominal = (id: string): number => study.buses.find((bus) => bus.id === id)?.nominalV ?? Number.NaN;
  const skin = ([s, e]: [number, number]): number => 1 - s + s * h ** e;
  const shunt = (bus: string, y0: C, y1: C, y2 = y1): void => into.addBlock(bus, bus, inPhases([y0, y1, y2]));
  if (element.kind === 'supply') {
    const z = nominal(element.bus) ** 2 / (element.shortCircuitMVA * 1e6);
    const r = z / Math.sqrt(1 + element.xOverR ** 2);
    const y1 = over(c(1), c(r * skin(part.skin as [number, number]), h * r * element.xOverR));
    shunt(element.bus, multiply(y1, 1 / (part.z0OverZ1 as number)) as C, y1);
  } else if (element.kind === 'transformer') {
    const z = ((element.ukPercent / 100) * element.lvV ** 2) / (element.ratedKVA * 1e3);
    const r = (element.loadLossKW * 1e3 * element.lvV ** 2) / (element.ratedKVA * 1e3) ** 2;
    const zh = c(r * skin(part.skin as [number, number]), h * Math.sqrt(z * z - r * r));
    const y = over(c(1), zh);
    const n = (element.hvV * (1 + (part.tapPercent as number) / 100)) / element.lvV;
    const clock = Number(/\d+$/.exec(element.vectorGroup)?.[0]);
    const theta = (clock * Math.PI) / 6;
    const group = element.vectorGroup.replace(/\d+$/, '');
    const z0 = sum(multiply(zh, part.z0OverZ1 as number) as C, c(3 * (part.neutralOhm as number)));
    const y0 = over(c(1), z0);
    const flip = [2, 6, 10].includes(clock) ? 1 : -1;
    const through = group === 'YNyn';
    const lv = through || group.endsWith('n');
    let ym = c(0);
    if ((part.noLoadCurrentPercent as number) > 0) {
      const g = ((part.noLoadLossKW as number) * 1e3) / element.lvV ** 2;
      const size =
        (((part.noLoadCurrentPercent as number) / 100) * element.ratedKVA * 1e3) / element.lvV ** 2;
      ym = c(g, -Math.sqrt(size * size - g * g) / h);
    }
    const scaled = (x: C, k: number): C => multiply(x, k) as C;
    const hv1 = scaled(y, 1 / n ** 2);
    into.addBlock(element.from, element.from, inPhases([through ? scaled(y0, 1 / n ** 2) : c(0), hv1, hv1]));
    into.addBlock(element.to, element.to, inPhases([lv ? y0 : c(0), sum(y, ym), sum(y, ym)]));
    const forward = mul(scaled(y, -1 / n), polar(1, theta));
    const backward = mul(scaled(y, -1 / n), polar(1, -theta));
    const mutual0 = through ? scaled(y0, flip / n) : c(0);
    into.addBlock(element.from, element.to, inPhases([mutual0, forward, backward]));
    into.addBlock(element.to, element.from, inPhases([mutual0, backward, forward]));
  } else if (element.kind === 'cable') {
    const per = (ratioR: number, ratioX: number, ratioC: number): [C, C] => {
      const z = c(
        (element.resistanceOhmPerKm * ratioR * skin(part.skin as [number, number])) / 1e3,
        (h * element.reactanceOhmPerKm * ratioX) / 1e3,
      );
      const yc = c(0, (h * omega * (part.capacitanceNFPerKm as number) * ratioC * 1e-9) / 1e3);
      if (abs(yc) === 0) return [over(c(1), multiply(z, element.lengthM) as C), c(0)];
      const gamma = sqrt(mul(z, yc) as never) as unknown as C;
      const zc = over(z, gamma);
      const gl = multiply(gamma, element.lengthM) as C;
      return [over(c(1), mul(zc, sinh(gl) as C)), over(tanh(multiply(gl, 0.5) as C) as C, zc)];
    };
    const [s1, p1] = per(1, 1, 1);
    const [s0, p0] = per(part.r0OverR1 as number, part.x0OverX1 as number, part.c0OverC1 as number);
    const runs = part.runs as number;
    const at = (s: C, p: C): C => multiply(sum(s, p), runs) as C;
    const own = inPhases([at(s0, p0), at(s1, p1), at(s1, p1)]);
    const mutual = inPhases([multiply(s0, -runs) as C, multiply(s1, -runs) as C, multiply(s1, -runs) as C]);
    into.addBlock(element.from, element.from, own);
    into.addBlock(element.to, element.to, own);
    into.addBlock(element.from, element.to, mutual);
    into.addBlock(element.to, element.from, mutual);
  } else if (element.kind === 'coupler') {
    const y = over(
      c(1),
      c((part.resistanceMOhm as number) / 1e3, (h * (part.reactanceMOhm as number)) / 1e3),
    );
    const minus = multiply(y, -1) as C;
    into.addBlock(element.from, element.from, inPhases([y, y, y]));
    into.addBlock(element.to, element.to, inPhases([y, y, y]));
    into.addBlock(element.from, element.to, inPhases([minus, minus, minus]));
    into.addBlock(element.to, element.from, inPhases([minus, minus, minus]));
  } else if (element.kind === 'load') {
    if (power && (part.model as string) === 'power') return;
    const u = nominal(element.bus);
    const connection = part.connection as string;
    const single = connection.length === 2;
    const p = (element.kW * 1e3) / (single ? (u * u) / 3 : u * u);
    const q = p * Math.tan(Math.acos(element.powerFactor)) * (part.leading ? -1 : 1);
    const y = c(p, q > 0 ? -q / h : -q * h);
    if (connection === 'L1L2L3') {
      shunt(element.bus, part.neutral ? y : c(0), y);
      return;
    }
    const block = [0, 1, 2].map(() => [c(0), c(0), c(0)]);
    const [k, m] = [...connection.matchAll(/\d/g)].map((d) => Number(d[0]) - 1) as [
      number,
      number | undefined,
    ];
    (block[k] as C[])[k] = y;
    if (m !== undefined) {
      (block[m] as C[])[m] = y;
      (block[k] as C[])[m] = multiply(y, -1) as C;
      (block[m] as C[])[k] = multiply(y, -1) as C;
    }
    into.addBlock(element.bus, element.bus, block);
  } else if (element.kind === 'motor') {
    const data = part as unknown as Record<string, number>;
    const s =
      (element.ratedKW * 1e3 * (data.count as number)) /
      ((data.efficiency as number) * (data.powerFactor as number));
    const z = nominal(element.bus) ** 2 / (s * (data.lockedRotorRatio as number));
    const r = z * (data.lockedRotorPowerFactor as number);
    const y = over(c(1), c(r * Math.sqrt(h), h * Math.sqrt(z * z - r * r)));
    shunt(element.bus, c(0), power ? c(0) : y, y);
  } else if (element.kind === 'converter') {
    const y = c(0, h * omega * ((part.filterCapacitanceUF as number) ?? 0) * 1e-6);
    shunt(element.bus, c(0), y);
  } else if (element.kind === 'bank') {
    const kvar = element.steps.reduce((total, step) => total + (step.on === false ? 0 : step.kvar), 0);
    const xc = element.ratedV ** 2 / (kvar * 1e3);
    const xl = ((part.detuningPercent as number) / 100) * xc;
    const r =
      ((part.lossWPerKvar as number) / 1e3) * xc +
      (xl / (part.reactorQ as number)) * skin(part.reactorSkin as [number, number]);
    const y = over(c(1), c(r, h * xl - xc / h));
    shunt(element.bus, (part.connection as string) === 'star-earthed' ? y : c(0), y);
  } else {
    throw new Error(`the oracle knows no ${element.kind}`);
  }
}

function nodal(study: Study, h: number, power: boolean): Nodal {
  const y = new Nodal(study.buses.map(({ id }) => id));
  for (const element of study.elements) if (element.on !== false) stamp(study, element, h, power, y);
  return y;
}

/** Demand currents INTO the part at phase voltages, by the format's §4. */
function demand(study: Study, element: StudyElement, v: readonly C[]): C[] | null {
  const part = withDefaults(element, study) as StudyElement & Record<string, never>;
  const into = (s: C, u: C): C => conj(over(s, u)) as C;
  if (element.kind === 'motor') {
    const data = part as unknown as Record<string, number>;
    const p =
      (element.ratedKW * 1e3 * (data.count as number) * (data.loadPercent as number)) /
      100 /
      (data.efficiency as number);
    const s = c(p, p * Math.tan(Math.acos(data.powerFactor as number)));
    const v1 = multiply(sum(sum(v[0] as C, mul(a, v[1] as C)), mul(a2, v[2] as C)), 1 / 3) as C;
    const i1 = into(multiply(s, 1 / 3) as C, v1);
    return [i1, mul(a2, i1), mul(a, i1)];
  }
  if (element.kind !== 'load' && element.kind !== 'converter') return null;
  if (element.kind === 'load' && (part.model as string) !== 'power') return null;
  const p = element.kW * 1e3;
  const q = Math.abs(p) * Math.tan(Math.acos(element.powerFactor)) * (part.leading ? -1 : 1);
  const s = c(p, q);
  const connection = part.connection as string;
  const none = [c(0), c(0), c(0)];
  if (connection === 'L1L2L3') {
    const third = multiply(s, 1 / 3) as C;
    const wired = element.kind === 'load' ? part.neutral : (part.wires as number) === 4;
    if (wired) return v.map((u) => into(third, u));
    return freed(freed([...v]).map((u) => into(third, u)));
  }
  const [k, m] = [...connection.matchAll(/\d/g)].map((d) => Number(d[0]) - 1) as [number, number | undefined];
  const u = m === undefined ? (v[k] as C) : (subtract(v[k] as C, v[m] as C) as C);
  const i = into(s, u);
  none[k] = i;
  if (m !== undefined) none[m] = multiply(i, -1) as C;
  return none;
}

function freed(x: C[]): C[] {
  const mean = multiply(sum(sum(x[0] as C, x[1] as C), x[2] as C), 1 / 3) as C;
  return x.map((value) => subtract(value, mean) as C);
}

/** Volts at every order, background and converters with their angles together. */
export function solveDense(study: Study): OracleCase {
  const ids = study.buses.map(({ id }) => id);
  const maxOrder = study.maxOrder ?? 50;
  const offset = (element: StudyElement): number => 3 * ids.indexOf((element as { bus: string }).bus);
  const supplies = study.elements.filter((e) => e.kind === 'supply');
  const sourceCurrent = (h: number, emf: (e: (typeof supplies)[number]) => C[] | null): C[] => {
    const x = Array.from({ length: 3 * ids.length }, () => c(0));
    for (const element of supplies) {
      const e = emf(element);
      if (!e) continue;
      const own = new Nodal(ids);
      stamp(study, element, h, false, own);
      const at = offset(element);
      for (let p = 0; p < 3; p++)
        for (let q = 0; q < 3; q++)
          x[at + p] = sum(x[at + p] as C, mul(own.y[at + p]?.[at + q] as C, e[q] as C));
    }
    return x;
  };
  const apply = (inverse: C[][], x: C[]): C[] =>
    inverse.map((row) => row.reduce((total, y, k) => sum(total, mul(y, x[k] as C)), c(0)));
  const inverse1 = inv(matrix(nodal(study, 1, true).y)).toArray() as C[][];
  const at1 = sourceCurrent(1, (e) => {
    const size =
      ((e.setpointPercent ?? 100) / 100) * ((study.buses[ids.indexOf(e.bus)]?.nominalV ?? 0) / Math.sqrt(3));
    return [0, 1, 2].map((k) => polar(size, ((e.angleDeg ?? 0) * Math.PI) / 180 - (2 * Math.PI * k) / 3));
  });
  let v = apply(inverse1, at1);
  const drawn = new Map<string, C[]>();
  for (let round = 0; round < 200; round++) {
    const x = [...at1];
    for (const element of study.elements) {
      if (!('bus' in element)) continue;
      const o = offset(element);
      const i = demand(study, element, v.slice(o, o + 3));
      if (!i) continue;
      drawn.set(element.id, i);
      for (let k = 0; k < 3; k++) x[o + k] = subtract(x[o + k] as C, i[k] as C) as C;
    }
    v = apply(inverse1, x);
  }
  const all: C[][][] = ids.map((_, b) => [v.slice(3 * b, 3 * b + 3)]);
  for (let h = 2; h <= maxOrder; h++) {
    const inverse = inv(matrix(nodal(study, h, false).y)).toArray() as C[][];
    const x = sourceCurrent(h, (e) => {
      const row = e.background?.find((r) => r.h === h);
      if (!row) return null;
      const size = (row.percent / 100) * ((study.buses[ids.indexOf(e.bus)]?.nominalV ?? 0) / Math.sqrt(3));
      const angle = (((row.angleDeg ?? 0) + h * (e.angleDeg ?? 0)) * Math.PI) / 180;
      return [0, 1, 2].map((k) => polar(size, angle - (2 * Math.PI * h * k) / 3));
    });
    for (const element of study.elements) {
      if (element.kind !== 'converter') continue;
      const row = spectrumOf(study, element.spectrum).find((r) => r.h === h);
      if (row) addConverter(element, row, drawn.get(element.id) ?? [], offset(element), x);
    }
    const vh = apply(inverse, x);
    ids.forEach((_, b) => {
      all[b]?.push(vh.slice(3 * b, 3 * b + 3));
    });
  }
  return { v: all };
}

function addConverter(
  element: Extract<StudyElement, { kind: 'converter' }>,
  row: { h: number; percent: number; angleDeg?: number },
  drawn: readonly C[],
  o: number,
  x: C[],
): void {
  const connection = element.connection ?? 'L1L2L3';
  const harmonic = (i: C): C => {
    const size = abs(i) as unknown as number;
    const angle = ((row.angleDeg ?? 0) * Math.PI) / 180 + row.h * Math.atan2(i.im, i.re);
    return polar((size * row.percent) / 100, angle);
  };
  let phases: C[];
  if (connection === 'L1L2L3') {
    phases = drawn.map(harmonic);
    if ((element.wires ?? 3) === 3) phases = freed(phases);
  } else {
    phases = [c(0), c(0), c(0)];
    const [k, m] = [...connection.matchAll(/\d/g)].map((d) => Number(d[0]) - 1) as [
      number,
      number | undefined,
    ];
    phases[k] = harmonic(drawn[k] as C);
    if (m !== undefined) phases[m] = multiply(phases[k] as C, -1) as C;
  }
  for (let k = 0; k < 3; k++) x[o + k] = subtract(x[o + k] as C, phases[k] as C) as C;
}
