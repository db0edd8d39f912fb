import { line } from 'd3';
import type { PhasorSpectrum } from '../phasor/phasorSpectrum.ts';
import { highestOrder, peakValue, samplesPerPeriod, type WaveContent, waveform } from './waveform.ts';

export type WavePhases = 'L1' | 'L2' | 'L3' | 'all';

export interface WaveSettings {
  content: WaveContent;
  periods: 1 | 2;
  phases: WavePhases;
}

export interface WaveInputs {
  /** rms phase-to-neutral volts by order, or null. */
  voltage: PhasorSpectrum | null;
  /** rms amperes by order, or null. */
  current: PhasorSpectrum | null;
  maxOrder: number;
  settings: WaveSettings;
}

export interface WaveLayout {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

export interface WaveCurve {
  quantity: 'voltage' | 'current';
  phase: number;
  path: string;
}

/** Placed curves of a waveform picture and the peak each scale stands for. */
export interface WaveModel {
  curves: WaveCurve[];
  peakV: number;
  peakA: number;
  highest: number;
}

const PHASE_LISTS: Record<WavePhases, readonly number[]> = { L1: [0], L2: [1], L3: [2], all: [0, 1, 2] };
const REACH = 0.95;

/** Curves of v(t) and i(t) with separate scales, both centred on the middle line. */
export function waveModel(inputs: WaveInputs, layout: WaveLayout): WaveModel {
  const highest = highestOrder(inputs.settings.content, inputs.maxOrder);
  const voltage = drawnQuantity(inputs, 'voltage', highest, layout);
  const current = drawnQuantity(inputs, 'current', highest, layout);
  return {
    curves: [...voltage.curves, ...current.curves],
    peakV: voltage.peak,
    peakA: current.peak,
    highest,
  };
}

function drawnQuantity(
  inputs: WaveInputs,
  quantity: 'voltage' | 'current',
  highest: number,
  layout: WaveLayout,
): { curves: WaveCurve[]; peak: number } {
  const spectrum = inputs[quantity];
  if (!spectrum) return { curves: [], peak: 0 };
  const { periods, phases } = inputs.settings;
  const samples = samplesPerPeriod(highest);
  const waves = PHASE_LISTS[phases].map((phase) => ({
    phase,
    values: waveform(spectrum, phase, highest, samples),
  }));
  const peak = Math.max(...waves.map((wave) => peakValue(wave.values)));
  if (!(peak > 0)) return { curves: [], peak: 0 };
  const curves = waves.map(({ phase, values }) => ({
    quantity,
    phase,
    path: wavePath(values, periods, peak, layout),
  }));
  return { curves, peak };
}

function wavePath(values: Float64Array, periods: number, peak: number, layout: WaveLayout): string {
  const samples = values.length - 1;
  const step = (layout.right - layout.left) / (samples * periods);
  const middle = (layout.top + layout.bottom) / 2;
  const perUnit = (((layout.bottom - layout.top) / 2) * REACH) / peak;
  const path = line<number>()
    .x((n) => layout.left + n * step)
    .y((n) => middle - (values[n % samples] ?? 0) * perUnit)
    .digits(2);
  return path(Array.from({ length: samples * periods + 1 }, (_, n) => n)) ?? '';
}
