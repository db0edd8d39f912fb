import type { CaseSolution } from '../engine/index.ts';
import { elementById, type Pin, type Study } from '../study/index.ts';

/** rms phasors and judged magnitudes of three phases by order: index (h − 1)·3 + k. */
export interface PinSpectrum {
  re: Float64Array;
  im: Float64Array;
  judged: Float64Array;
}

export interface PinSpectra {
  /** Phase-to-neutral volts at the pin's busbar. */
  voltage: PinSpectrum;
  /** Amperes; out of a supply or generator, into every other part. Absent for a voltage pin. */
  current?: PinSpectrum;
}

function cut(
  array: { re: Float64Array; im: Float64Array },
  judged: Float64Array,
  place: number,
  maxOrder: number,
  sign: 1 | -1,
): PinSpectrum {
  const [from, to] = [place * maxOrder * 3, (place + 1) * maxOrder * 3];
  return {
    re: array.re.slice(from, to).map((value) => sign * value),
    im: array.im.slice(from, to).map((value) => sign * value),
    judged: judged.slice(from, to),
  };
}

/** What a pin watches, cut out of a solution; undefined where the case does not have it. */
export function pinSpectra(study: Study, solution: CaseSolution, pin: Pin): PinSpectra | undefined {
  const bus = solution.buses.indexOf(pin.bus);
  if (bus < 0 || solution.deenergised.includes(pin.bus)) return undefined;
  const { maxOrder, judged } = solution;
  const voltage = cut(solution.voltage, judged.voltage, bus, maxOrder, 1);
  if (pin.quantity === 'voltage') return { voltage };
  const place = solution.terminals.findIndex(
    ({ element, bus: at }) => element === pin.element && at === pin.bus,
  );
  if (place < 0) return undefined;
  const kind = elementById(study, pin.element)?.kind;
  const sign = kind === 'supply' || kind === 'generator' ? -1 : 1;
  return { voltage, current: cut(solution.current, judged.current, place, maxOrder, sign) };
}

/** "L1" where the three phases carry the same, else all three. */
export function phasesToDraw(spectrum: PinSpectrum): 'L1' | 'all' {
  const rms = [0, 1, 2].map((k) => Math.hypot(...spectrum.judged.filter((_, index) => index % 3 === k)));
  const [least, most] = [Math.min(...rms), Math.max(...rms)];
  return most - least <= 0.02 * most ? 'L1' : 'all';
}
