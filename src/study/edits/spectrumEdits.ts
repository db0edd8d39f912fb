import { nameOf } from '../names.ts';
import { builtInSpectrum } from '../spectra/builtIn.ts';
import { spectrumById } from '../spectra/spectrumOf.ts';
import type { Edit, HarmonicRow, Spectrum, Study, StudyElement } from '../types.ts';
import { counterOf, freshId, makeEdit, mapById, type Patch, patched, withField } from './edit.ts';

export interface AddSpectrumEdit extends Edit {
  spectrumId: string;
}

/** Adds a spectrum of the study's own, empty or with rows; a copy of a built-in one can be edited. */
export function addSpectrum(study: Study, values: Partial<Omit<Spectrum, 'id'>> = {}): AddSpectrumEdit {
  const id = freshId(study.spectra ?? [], 'spectrum');
  const spectrum: Spectrum = { id, name: `Spectrum ${counterOf(id)}`, orders: [], ...values };
  const edit = makeEdit('spectrum.add', `add spectrum ${nameOf(spectrum)}`, (current) => {
    const spectra = current.spectra ?? [];
    return spectra.some((item) => item.id === id) ? current : { ...current, spectra: [...spectra, spectrum] };
  });
  return { ...edit, spectrumId: id };
}

/** Sets name, rows or origin of one of the study's own spectra. Built-in ones cannot change. */
export function updateSpectrum(study: Study, id: string, patch: Patch): Edit {
  const spectrum = spectrumById(study, id);
  const words = `${'orders' in patch ? 'set the rows of' : 'change'} spectrum ${spectrum ? nameOf(spectrum) : id}`;
  return makeEdit('spectrum.set', words, (current) => {
    if (!current.spectra || builtInSpectrum(id)) return current;
    const spectra = mapById(current.spectra, id, (item) => patched(item, patch, ['id']));
    return spectra === current.spectra ? current : { ...current, spectra };
  });
}

/** Removes a spectrum; parts that used it, in any case, keep its rows as their own. */
export function removeSpectrum(study: Study, id: string): Edit {
  const spectrum = study.spectra?.find((item) => item.id === id);
  return makeEdit('spectrum.remove', `remove spectrum ${spectrum ? nameOf(spectrum) : id}`, (current) => {
    const gone = current.spectra?.find((item) => item.id === id);
    if (!gone || !current.spectra) return current;
    const left = current.spectra.filter((item) => item.id !== id);
    const elements = current.elements.map((element) => inlined(element, id, gone.orders));
    const cases = current.cases?.map((item) => ({
      ...item,
      changes: item.changes.map((change) =>
        change.set.spectrum === id ? { ...change, set: { ...change.set, spectrum: gone.orders } } : change,
      ),
    }));
    const next = { ...current, elements, ...(cases ? { cases } : {}) };
    return withField(next, 'spectra', left.length === 0 ? undefined : left);
  });
}

function inlined(element: StudyElement, id: string, orders: HarmonicRow[]): StudyElement {
  return element.kind === 'converter' && element.spectrum === id ? { ...element, spectrum: orders } : element;
}
