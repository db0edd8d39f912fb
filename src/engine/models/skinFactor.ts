import type { Skin } from '../../study/index.ts';

/**
 * R(h)/R = (1 − s) + s·h^e with skin [s, e]; h real, e free. The usual exponents avoid Math.pow,
 * which costs as much as the rest of a part's law.
 */
export function skinFactor(h: number, skin: Skin): number {
  const s = skin[0];
  return s === 0 ? 1 : 1 - s + s * power(h, skin[1]);
}

function power(h: number, e: number): number {
  switch (e) {
    case 0.5:
      return Math.sqrt(h);
    case 1:
      return h;
    case 1.5:
      return h * Math.sqrt(h);
    case 2:
      return h * h;
    default:
      return h ** e;
  }
}
