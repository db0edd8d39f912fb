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
    line[0] = r0 * factor;
    line[1] = h * x0;
    line[2] = h * b0;
    writeLine(runs, out, at);
    line[0] = r1 * factor;
    line[1] = h * x1;
    line[2] = h * b1;
    writeLine(runs, out, at + 2);
  };
}

/** r, x, b of the line being written; in a typed array, as plain numbers would be boxed at each call. */
const line = new Float64Array(3);

/** One sequence of the π: total series r + jx, total shunt jb, into ff, tt and ft (spaced by four). */
function writeLine(runs: number, out: Float64Array, at: number): void {
  const r = line[0]!;
  const x = line[1]!;
  const b = line[2]!;
  // S = sinh(√w)/√w and T = (cosh(√w) − 1)/w are entire functions of w = (γl)² = (r + jx)·jb.
  sums[0] = -x * b;
  sums[1] = r * b;
  entireSums();
  const sRe = sums[0]!;
  const sIm = sums[1]!;
  const tRe = sums[2]!;
  const tIm = sums[3]!;
  const zRe = r * sRe - x * sIm;
  const zIm = r * sIm + x * sRe;
  const square = zRe * zRe + zIm * zIm;
  const share = runs / square;
  const yRe = zRe * share;
  const yIm = -zIm * share;
  // tanh(γl/2)/Zc = jb·T/S at each end.
  const end = (runs * b) / (sRe * sRe + sIm * sIm);
  const endRe = yRe - end * (tIm * sRe - tRe * sIm);
  const endIm = yIm + end * (tRe * sRe + tIm * sIm);
  out[at] = endRe;
  out[at + 1] = endIm;
  out[at + 4] = endRe;
  out[at + 5] = endIm;
  out[at + 8] = -yRe;
  out[at + 9] = -yIm;
}

/** In: w as re, im. Out: S = sinh(√w)/√w and T = (cosh(√w) − 1)/w as re, im, re, im. */
const sums = new Float64Array(4);

function entireSums(): void {
  const wRe = sums[0]!;
  const wIm = sums[1]!;
  const size = Math.abs(wRe) + Math.abs(wIm);
  if (size < 1e-3) sumFourTerms();
  else if (size < 1) sumPowerSeries(wRe, wIm);
  else closedForms(wRe, wIm);
}

/**
 * S = 1 + w/6·(1 + w/20·(1 + w/42)), T = ½·(1 + w/12·(1 + w/30·(1 + w/56))): short lines at ordinary
 * frequencies. Below |w| = 1e-3 the first term left out, w⁴/9!, is under 3e-18.
 */
function sumFourTerms(): void {
  const wRe = sums[0]!;
  const wIm = sums[1]!;
  let re = 1 + wRe * (1 / 42);
  let im = wIm * (1 / 42);
  let next = 1 + (re * wRe - im * wIm) * (1 / 20);
  im = (re * wIm + im * wRe) * (1 / 20);
  re = next;
  sums[0] = 1 + (re * wRe - im * wIm) * (1 / 6);
  sums[1] = (re * wIm + im * wRe) * (1 / 6);
  re = 1 + wRe * (1 / 56);
  im = wIm * (1 / 56);
  next = 1 + (re * wRe - im * wIm) * (1 / 30);
  im = (re * wIm + im * wRe) * (1 / 30);
  re = next;
  sums[2] = 0.5 + (re * wRe - im * wIm) * (1 / 24);
  sums[3] = (re * wIm + im * wRe) * (1 / 24);
}

/** Σ w^k/(2k + 1)! and Σ w^k/(2k + 2)!; below |w| = 1 ten terms reach double precision. */
function sumPowerSeries(wRe: number, wIm: number): void {
  let termRe = 1;
  let termIm = 0;
  sums[0] = 1;
  sums[1] = 0;
  sums[2] = 0.5;
  sums[3] = 0;
  for (let k = 1; k <= 10; k++) {
    const next = (termRe * wRe - termIm * wIm) / (2 * k * (2 * k + 1));
    termIm = (termRe * wIm + termIm * wRe) / (2 * k * (2 * k + 1));
    termRe = next;
    sums[0] = sums[0]! + termRe;
    sums[1] = sums[1]! + termIm;
    sums[2] = sums[2]! + termRe / (2 * k + 2);
    sums[3] = sums[3]! + termIm / (2 * k + 2);
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
  sums[0] = (shRe * a + shIm * b) / size;
  sums[1] = (shIm * a - shRe * b) / size;
  sums[2] = (chRe * wRe + chIm * wIm) / (size * size);
  sums[3] = (chIm * wRe - chRe * wIm) / (size * size);
}
