import {
  ABSENT,
  ampereParts,
  fixedNumber,
  plainNumber,
  type QuantityParts,
  voltParts,
} from '../figure/quantityParts.ts';
import type { PhasorSpectrum } from '../phasor/phasorSpectrum.ts';
import { PHASE_NAMES } from '../phasor/phasorWords.ts';
import { crestFactor } from '../waveform/waveform.ts';
import type { Reading } from './Reading.ts';

/** One labelled number of a reading, with the formula a tooltip gives and words beside it. */
export interface ReadingNumber {
  label: string;
  parts: QuantityParts;
  words?: string | undefined;
  formula: string;
  /** Which line of the note it stands in. */
  row: 1 | 2 | 3;
}

const ABSENT_PARTS: QuantityParts = { number: ABSENT, unit: '' };

/** rms, THD and crest of the pinned quantity, and for a current also powers and power factors. */
export function readingNumbers(reading: Reading): ReadingNumber[] {
  if (reading.absent) return [];
  return reading.pin.quantity === 'voltage' ? voltageNumbers(reading) : currentNumbers(reading);
}

function voltageNumbers(reading: Reading): ReadingNumber[] {
  const { bus } = reading;
  if (!bus) return [];
  return [
    {
      label: 'U',
      row: 1,
      parts: rangeParts(bus.rmsLL, voltParts),
      words: 'line to line',
      formula: 'U = √(Σ U_h²), rms of all orders, line to line',
    },
    {
      label: 'U phase',
      row: 1,
      parts: rangeParts(bus.rmsV, voltParts),
      formula: 'rms of all orders, phase to neutral',
    },
    thdNumber(bus.thdPercent, 'U'),
    crestNumber(reading, reading.voltage),
  ];
}

function currentNumbers(reading: Reading): ReadingNumber[] {
  const { terminal } = reading;
  if (!terminal) return [];
  const numbers: ReadingNumber[] = [
    ...powerFactors(reading),
    thdNumber(terminal.thdPercent, 'I'),
    {
      label: 'I',
      row: 2,
      parts: rangeParts(terminal.rmsA, ampereParts),
      formula: 'I = √(Σ I_h²), rms of all orders',
    },
    crestNumber(reading, reading.current),
  ];
  if (terminal.neutralRmsA > 1e-4 * Math.max(...terminal.rmsA)) {
    numbers.push({
      label: 'I neutral',
      row: 2,
      parts: ampereParts(terminal.neutralRmsA),
      formula: `rms of ${(reading.phaseNames ?? PHASE_NAMES).map((name) => `I_${name}`).join(' + ')} over all orders`,
    });
  }
  return [...numbers, ...powers(reading)];
}

function powerFactors(reading: Reading): ReadingNumber[] {
  const { terminal } = reading;
  if (!terminal) return [];
  const { displacementPF, truePF } = terminal;
  const side = reactiveWords(terminal.kvar * sign(reading));
  return [
    {
      label: 'cos φ',
      row: 1,
      parts:
        displacementPF === null
          ? ABSENT_PARTS
          : { number: fixedNumber(Math.abs(displacementPF), 3), unit: '' },
      ...(displacementPF === null ? {} : { words: side }),
      formula: 'displacement power factor P₁⁺/S₁⁺, fundamental, positive sequence',
    },
    {
      label: 'PF',
      row: 1,
      parts: truePF === null ? ABSENT_PARTS : { number: fixedNumber(Math.abs(truePF), 3), unit: '' },
      formula: 'true power factor P/Sₑ, all orders (IEEE 1459)',
    },
  ];
}

function powers(reading: Reading): ReadingNumber[] {
  const { terminal } = reading;
  if (!terminal) return [];
  const kW = terminal.kW * sign(reading);
  const kvar = terminal.kvar * sign(reading);
  return [
    {
      label: 'P',
      row: 3,
      parts: power(kW, 'W'),
      ...(kW < -1e-9 ? { words: 'feeding in' } : {}),
      formula: 'P = Σ Re(V·I*), fundamental, three phases',
    },
    {
      label: 'Q',
      row: 3,
      parts: power(Math.abs(kvar), 'var'),
      words: reactiveWords(kvar),
      formula: 'Q = Σ Im(V·I*), fundamental; inductive is lagging',
    },
    {
      label: 'S',
      row: 3,
      parts: power(terminal.kVA, 'VA'),
      formula: 'Sₑ = 3·Vₑ·Iₑ, effective apparent power (IEEE 1459)',
    },
  ];
}

function sign(reading: Reading): 1 | -1 {
  return reading.reversed ? -1 : 1;
}

/** "lagging" for inductive, "leading" for capacitive, "" where there is next to none. */
export function reactiveWords(kvar: number): string {
  if (Math.abs(kvar) < 1e-6) return '';
  return kvar > 0 ? 'lagging' : 'leading';
}

/** Kilo- or mega-units from a value in kilo-units. */
export function power(kilo: number, unit: 'W' | 'var' | 'VA'): QuantityParts {
  if (Math.abs(kilo) >= 10_000) return { number: plainNumber(kilo / 1000, 4), unit: `M${unit}` };
  return { number: plainNumber(Math.abs(kilo) < 1e-4 ? 0 : kilo, 3), unit: `k${unit}` };
}

const UNEQUAL = 0.002;

/** One number where the phases agree to 0.2 %, else the smallest and the largest. */
export function rangeParts(
  three: readonly [number, number, number],
  format: (value: number, digits: number) => QuantityParts,
): QuantityParts {
  const low = Math.min(...three);
  const high = Math.max(...three);
  const last = format(high, 4);
  if (high - low <= UNEQUAL * high) return last;
  const first = format(low, 4);
  return first.unit === last.unit
    ? { number: `${first.number} … ${last.number}`, unit: last.unit }
    : { number: `${first.number} ${first.unit} … ${last.number}`, unit: last.unit };
}

/** The worst phase's THD; a reading in which no phase has a fundamental has none. */
export function worstThd(thdPercent: readonly (number | null)[]): number | null {
  const known = thdPercent.filter((value) => value !== null);
  return known.length > 0 ? Math.max(...known) : null;
}

function thdNumber(thdPercent: readonly (number | null)[], letter: 'U' | 'I'): ReadingNumber {
  const worst = worstThd(thdPercent);
  return {
    label: `THD(${letter})`,
    row: letter === 'U' ? 2 : 1,
    parts: worst === null ? ABSENT_PARTS : { number: fixedNumber(worst, 1), unit: '%' },
    formula: `√(Σ_{h≥2} ${letter}_h²)/${letter}₁, worst phase`,
  };
}

function crestNumber(reading: Reading, spectrum: PhasorSpectrum | null): ReadingNumber {
  const formula = 'crest factor: peak/rms of the waveform, √2 for a sine';
  if (reading.summation === 'alpha')
    return { label: 'crest', row: 2, parts: ABSENT_PARTS, words: 'no angles', formula };
  const crests = spectrum ? [0, 1, 2].map((k) => crestFactor(spectrum, k, reading.maxOrder)) : [];
  const known = crests.filter((one) => one !== null);
  if (known.length === 0) return { label: 'crest', row: 2, parts: ABSENT_PARTS, formula };
  const doubtful = reading.anglesUnknown.some(Boolean);
  return {
    label: 'crest',
    row: 2,
    parts: { number: fixedNumber(Math.max(...known), 2), unit: '' },
    ...(doubtful ? { words: 'unknown angles as 0' } : {}),
    formula,
  };
}
