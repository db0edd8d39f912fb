import type { HarmonicRow, Spectrum, Study } from '../types.ts';
import { builtInSpectrum } from './builtIn.ts';

/**
 * The rows a converter's or a filter study's spectrum reference stands for: its own rows, a spectrum of the
 * study, or a built-in one. Rows at h = 1 and above the study's maxOrder are left out. An absent angle stays
 * absent. Throws RangeError for an id nobody knows (a checked study has none).
 */
export function spectrumOf(study: Study, reference: string | readonly HarmonicRow[]): HarmonicRow[] {
  const maxOrder = study.maxOrder ?? 50;
  return rowsOf(study, reference).filter((row) => row.h >= 2 && row.h <= maxOrder);
}

function rowsOf(study: Study, reference: string | readonly HarmonicRow[]): readonly HarmonicRow[] {
  if (typeof reference !== 'string') return reference;
  const spectrum = spectrumById(study, reference);
  if (!spectrum) throw new RangeError(`no spectrum "${reference}" in the study or among the built-in ones`);
  return spectrum.orders;
}

/** The spectrum of that id, built in or the study's own, or undefined. */
export function spectrumById(study: Study, id: string): Spectrum | undefined {
  return builtInSpectrum(id) ?? study.spectra?.find((item) => item.id === id);
}

/** Whether a value is a list of harmonic rows, as a spectrum or background field holds. */
export function isHarmonicRows(value: unknown): value is HarmonicRow[] {
  return (
    Array.isArray(value) &&
    value.every((row) => typeof row === 'object' && row !== null && 'h' in row && 'percent' in row)
  );
}
