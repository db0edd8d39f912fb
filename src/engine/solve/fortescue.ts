const halfRoot3 = Math.sqrt(3) / 2;

/**
 * [V0 V1 V2] = F⁻¹·[VL1 VL2 VL3]: six interleaved numbers of `x` from `i` into `out` from `o`.
 * F = [[1, 1, 1], [1, a², a], [1, a, a²]], a = 1∠120°. Fortescue, Trans. AIEE 37 (1918) 1027 (from memory).
 */
export function toSequences(x: Float64Array, i: number, out: Float64Array, o: number): void {
  const ar = x[i]!;
  const ai = x[i + 1]!;
  const sumR = x[i + 2]! + x[i + 4]!;
  const sumI = x[i + 3]! + x[i + 5]!;
  const turnR = halfRoot3 * (x[i + 2]! - x[i + 4]!);
  const turnI = halfRoot3 * (x[i + 3]! - x[i + 5]!);
  out[o] = (ar + sumR) / 3;
  out[o + 1] = (ai + sumI) / 3;
  out[o + 2] = (ar - sumR / 2 - turnI) / 3;
  out[o + 3] = (ai - sumI / 2 + turnR) / 3;
  out[o + 4] = (ar - sumR / 2 + turnI) / 3;
  out[o + 5] = (ai - sumI / 2 - turnR) / 3;
}

/** [VL1 VL2 VL3] += F·[V0 V1 V2]: six interleaved numbers of `s` from `i` onto `out` from `o`. */
export function addPhases(s: Float64Array, i: number, out: Float64Array, o: number): void {
  const zeroR = s[i]!;
  const zeroI = s[i + 1]!;
  const sumR = s[i + 2]! + s[i + 4]!;
  const sumI = s[i + 3]! + s[i + 5]!;
  const turnR = halfRoot3 * (s[i + 2]! - s[i + 4]!);
  const turnI = halfRoot3 * (s[i + 3]! - s[i + 5]!);
  out[o] = out[o]! + zeroR + sumR;
  out[o + 1] = out[o + 1]! + zeroI + sumI;
  out[o + 2] = out[o + 2]! + zeroR - sumR / 2 + turnI;
  out[o + 3] = out[o + 3]! + zeroI - sumI / 2 - turnR;
  out[o + 4] = out[o + 4]! + zeroR - sumR / 2 - turnI;
  out[o + 5] = out[o + 5]! + zeroI - sumI / 2 + turnR;
}
