import type { BusReading, TerminalReading } from '../../engine/index.ts';
import type { PhaseNames, Pin } from '../../study/index.ts';
import type { PhasorSpectrum } from '../phasor/phasorSpectrum.ts';
import type { OrderLimit } from '../spectrum/spectrumBars.ts';

/** All that is shown of one pinned quantity in one case. */
export interface Reading {
  pin: Pin;
  /** e.g. "Intake · current into the site". */
  title: string;
  frequencyHz: number;
  maxOrder: number;
  summation: 'phasor' | 'alpha';
  /** What the three phases are called; absent: L1 L2 L3. */
  phaseNames?: PhaseNames;
  /** Phase-to-neutral voltage at the pin's busbar. */
  voltage: PhasorSpectrum | null;
  /** Current into the part; null for a voltage pin. */
  current: PhasorSpectrum | null;
  /** Judged rms magnitudes of the pinned quantity, index (h − 1)·3 + k. */
  judged: ArrayLike<number> | null;
  /** By order (index h − 1): some angle is not given by the data. */
  anglesUnknown: readonly boolean[];
  bus: BusReading | null;
  terminal: TerminalReading | null;
  /** Show current and powers out of the part, as for a supply that feeds the site. */
  reversed?: boolean;
  limits?: readonly OrderLimit[];
  thdLimit?: number;
  /** Base of a current spectrum other than the fundamental. */
  demandCurrentA?: number;
  /** Why there is nothing to show (not converged, de-energised, part out of service). */
  absent?: string;
}
