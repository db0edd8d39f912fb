import { cellOf, type FigureValues } from '../figure/FigureValues.ts';
import type { PhasorSpectrum } from '../phasor/phasorSpectrum.ts';
import { PHASE_NAMES, type PhaseNames } from '../phasor/phasorWords.ts';
import { samplesPerPeriod, waveform } from './waveform.ts';

interface WaveValueInputs {
  voltage: PhasorSpectrum | null;
  current: PhasorSpectrum | null;
  frequencyHz: number;
  maxOrder: number;
  names?: PhaseNames | undefined;
}

/** Samples of one period, all orders, all phases: milliseconds, volts phase to neutral, amperes. */
export function waveValues(inputs: WaveValueInputs): FigureValues {
  const { frequencyHz, maxOrder, names = PHASE_NAMES } = inputs;
  const samples = samplesPerPeriod(maxOrder);
  const columns = (['voltage', 'current'] as const).flatMap((quantity) => {
    const spectrum = inputs[quantity];
    if (!spectrum) return [];
    const head = quantity === 'voltage' ? ['u', 'V'] : ['i', 'A'];
    return names.map((name, phase) => ({
      head: `${head[0]} ${name}, ${head[1]}`,
      values: waveform(spectrum, phase, maxOrder, samples),
    }));
  });
  return [
    ['t, ms', ...columns.map(({ head }) => head)],
    ...Array.from({ length: samples + 1 }, (_, n) => [
      cellOf((n * 1000) / (samples * frequencyHz)),
      ...columns.map(({ values }) => cellOf(values[n])),
    ]),
  ];
}
