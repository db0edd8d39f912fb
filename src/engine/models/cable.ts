import type { Skin } from '../../study/index.ts';
import { type PartLaw, writeInverse } from './PartLaw.ts';
import { skinFactor } from './skinFactor.ts';

export interface CableData {
  lengthM: number;
  resistanceOhmPerKm: number;
  reactanceOhmPerKm: number;
  capacitanceNFPerKm: number;
  r0OverR1: number;
  x0OverX1: number;
  c0OverC1: number;
  runs: number;
  skin: Skin;
}

/**
 * Exact equivalent π per sequence: γ = √(z·yc), series Zc·sinh(γl), shunts tanh(γl/2)/Zc at each end,
 * z = R(h) + jhX and yc = jhωC per length; without capacitance z·l alone. `omega` is 2π·fn, rad/s.
 * Parallel runs multiply the admittances. The skin law acts on both resistances.
 */
export function cableLaw(data: CableData, omega: number): PartLaw {
  const km = data.lengthM / 1e3;
  const r1 = data.resistanceOhmPerKm * km;
  const x1 = data.reactanceOhmPerKm * km;
  const b1 = omega * data.capacitanceNFPerKm * 1e-9 * km;
  const r0 = r1 * data.r0OverR1;
  const x0 = x1 * data.x0OverX1;
  const b0 = b1 * data.c0OverC1;
  const { runs, skin } = data;
  if (b1 === 0)
    return (h, out, at) => {
      const factor = skinFactor(h, skin) / runs;
      const x = h / runs;
      writeInverse(r0 * factor, x0 * x, out, at);
      writeInverse(r1 * factor, x1 * x, out, at + 2);
      for (let k = at; k < at + 4; k++) {
        out[k + 4] = out[k]!;
        out[k + 8] = -out[k]!;
      }
    };
  return (h, out, at) => {
    const factor = skinFactor(h, skin);
    writeLine(r0 * factor, h * x0, h * b0, runs, out, at);
    writeLine(r1 * factor, h * x1, h * b1, runs, out, at + 2);
  };
}

/** One sequence of the π: total series r + jx, total shunt jb, into ff, tt and ft (spaced by four). */
function writeLine(r: number, x: number, b: number, runs: number, out: Float64Array, at: number): void {
  // S = sinh(√w)/√w and T = (cosh(√w) − 1)/w are entire functions of w = (γl)² = (r + jx)·jb.
  const wRe = -x * b;
  const wIm = r * b;
  entireSums(wRe, wIm);
  const zRe = r * sinhc.re - x * sinhc.im;
  const zIm = r * sinhc.im + x * sinhc.re;
  const square = zRe * zRe + zIm * zIm;
  const yRe = (runs * zRe) / square;
  const yIm = (-runs * zIm) / square;
  // tanh(γl/2)/Zc = jb·T/S at each end.
  const size = sinhc.re * sinhc.re + sinhc.im * sinhc.im;
  const qRe = (coshc.re * sinhc.re + coshc.im * sinhc.im) / size;
  const qIm = (coshc.im * sinhc.re - coshc.re * sinhc.im) / size;
  const endRe = yRe - runs * b * qIm;
  const endIm = yIm + runs * b * qRe;
  out[at] = endRe;
  out[at + 1] = endIm;
  out[at + 4] = endRe;
  out[at + 5] = endIm;
  out[at + 8] = -yRe;
  out[at + 9] = -yIm;
}

const sinhc = { re: 1, im: 0 };
const coshc = { re: 0.5, im: 0 };

/** Fills sinhc = sinh(√w)/√w and coshc = (cosh(√w) − 1)/w for w = wRe + j·wIm. */
function entireSums(wRe: number, wIm: number): void {
  if (Math.abs(wRe) + Math.abs(wIm) < 1) sumPowerSeries(wRe, wIm);
  else closedForms(wRe, wIm);
}

/** Σ w^k/(2k + 1)! and Σ w^k/(2k + 2)!; below |w| = 1 ten terms reach double precision. */
function sumPowerSeries(wRe: number, wIm: number): void {
  let termRe = 1;
  let termIm = 0;
  sinhc.re = 1;
  sinhc.im = 0;
  coshc.re = 0.5;
  coshc.im = 0;
  for (let k = 1; k <= 10; k++) {
    const next = (termRe * wRe - termIm * wIm) / (2 * k * (2 * k + 1));
    termIm = (termRe * wIm + termIm * wRe) / (2 * k * (2 * k + 1));
    termRe = next;
    sinhc.re += termRe;
    sinhc.im += termIm;
    coshc.re += termRe / (2 * k + 2);
    coshc.im += termIm / (2 * k + 2);
    if (Math.abs(termRe) + Math.abs(termIm) < 1e-18) return;
  }
}

function closedForms(wRe: number, wIm: number): void {
  const size = Math.hypot(wRe, wIm);
  const a = Math.sqrt((size + wRe) / 2);
  const b = Math.sign(wIm || 1) * Math.sqrt((size - wRe) / 2);
  const shRe = Math.sinh(a) * Math.cos(b);
  const shIm = Math.cosh(a) * Math.sin(b);
  const chRe = Math.cosh(a) * Math.cos(b) - 1;
  const chIm = Math.sinh(a) * Math.sin(b);
  sinhc.re = (shRe * a + shIm * b) / size;
  sinhc.im = (shIm * a - shRe * b) / size;
  coshc.re = (chRe * wRe + chIm * wIm) / (size * size);
  coshc.im = (chIm * wRe - chRe * wIm) / (size * size);
}
