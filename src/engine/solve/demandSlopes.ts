import type { Demand, ShuntPart } from '../network/Network.ts';

/**
 * Adds share·D of a constant-power part, dI = D·conj(dV), to a 3 × 3 complex block (row by row from `o`):
 * the slope of conj(S/u) is −conj(S)/conj(u)², taken through the part's form as in demandCurrents.
 */
export function addDemandSlopes(
  part: ShuntPart,
  demand: Demand,
  share: number,
  v: Float64Array,
  block: Float64Array,
  o: number,
): void {
  const i = 6 * part.node;
  const { p, q } = part.phases;
  const third = { active: (share * demand.active) / 3, reactive: (share * demand.reactive) / 3 };
  const whole = { active: share * demand.active, reactive: share * demand.reactive };
  switch (demand.form) {
    case 'wye':
      for (let k = 0; k < 3; k++) add(block, o, k, k, slope(third, v[i + 2 * k]!, v[i + 2 * k + 1]!));
      return;
    case 'three-wire':
      addThreeWire(third, v, i, block, o);
      return;
    case 'single':
      add(block, o, p, p, slope(whole, v[i + 2 * p]!, v[i + 2 * p + 1]!));
      return;
    case 'pair': {
      const g = slope(whole, v[i + 2 * p]! - v[i + 2 * q]!, v[i + 2 * p + 1]! - v[i + 2 * q + 1]!);
      const minus = { re: -g.re, im: -g.im };
      add(block, o, p, p, g);
      add(block, o, q, q, g);
      add(block, o, p, q, minus);
      add(block, o, q, p, minus);
      return;
    }
    case 'motor':
      addMotor(third, v, i, block, o);
  }
}

interface Power {
  active: number;
  reactive: number;
}

interface Pair {
  re: number;
  im: number;
}

/** −conj(S)/conj(u)². */
function slope({ active, reactive }: Power, re: number, im: number): Pair {
  // 1/conj(u)² = u²/|u|⁴.
  const quad = (re * re + im * im) ** 2;
  const a = (re * re - im * im) / quad;
  const b = (2 * re * im) / quad;
  return { re: -(active * a + reactive * b), im: -(active * b - reactive * a) };
}

/** P·diag(g)·P with P = 1 − mean. */
function addThreeWire(third: Power, v: Float64Array, i: number, block: Float64Array, o: number): void {
  const meanR = (v[i]! + v[i + 2]! + v[i + 4]!) / 3;
  const meanI = (v[i + 1]! + v[i + 3]! + v[i + 5]!) / 3;
  for (let k = 0; k < 3; k++) {
    const g = slope(third, v[i + 2 * k]! - meanR, v[i + 2 * k + 1]! - meanI);
    for (let row = 0; row < 3; row++)
      for (let column = 0; column < 3; column++) {
        const weight = ((row === k ? 1 : 0) - 1 / 3) * ((column === k ? 1 : 0) - 1 / 3);
        add(block, o, row, column, { re: weight * g.re, im: weight * g.im });
      }
  }
}

/** D_kj = a^(−k)·g·a^(−j)/3, g taken at V1. */
function addMotor(third: Power, v: Float64Array, i: number, block: Float64Array, o: number): void {
  let re = 0;
  let im = 0;
  for (let k = 0; k < 3; k++) {
    const c = Math.cos((2 * Math.PI * k) / 3);
    const s = Math.sin((2 * Math.PI * k) / 3);
    re += (v[i + 2 * k]! * c - v[i + 2 * k + 1]! * s) / 3;
    im += (v[i + 2 * k]! * s + v[i + 2 * k + 1]! * c) / 3;
  }
  const g = slope(third, re, im);
  for (let row = 0; row < 3; row++)
    for (let column = 0; column < 3; column++) {
      const c = Math.cos((2 * Math.PI * (row + column)) / 3) / 3;
      const s = -Math.sin((2 * Math.PI * (row + column)) / 3) / 3;
      add(block, o, row, column, { re: g.re * c - g.im * s, im: g.re * s + g.im * c });
    }
}

function add(block: Float64Array, o: number, row: number, column: number, g: Pair): void {
  const at = o + 6 * row + 2 * column;
  block[at] = block[at]! + g.re;
  block[at + 1] = block[at + 1]! + g.im;
}
