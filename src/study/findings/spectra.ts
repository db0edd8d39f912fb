import { casesOf, studyInCase } from '../cases.ts';
import { sameData } from '../edits/edit.ts';
import { elementById, elementsOfKind, isOn } from '../lookup.ts';
import { nameOf } from '../names.ts';
import { spectrumOf } from '../spectra/spectrumOf.ts';
import type { Converter, Study } from '../types.ts';
import { formatQuantity } from '../units/formatQuantity.ts';
import { type Said, saidOfPart } from './Said.ts';

/** What the spectra of the converters do not say. */
export function spectrumFindings(study: Study): Said[] {
  return elementsOfKind(study, 'converter').flatMap((converter) => [
    ...scaledSpectrum(study, converter),
    ...declared(converter),
    ...empty(study, converter),
  ]);
}

/** A case that changes kW keeps the spectrum in per cent of I1, so that its amperes scale. */
function scaledSpectrum(study: Study, converter: Converter): Said[] {
  const scaled = casesOf(study).flatMap((item) => {
    const here = elementById(studyInCase(study, item.id), converter.id);
    if (here?.kind !== 'converter' || !isOn(here) || here.kW === converter.kW) return [];
    return sameData(here.spectrum, converter.spectrum)
      ? [`${nameOf(item)} (${formatQuantity(here.kW, 'kW')})`]
      : [];
  });
  if (scaled.length === 0) return [];
  return [
    saidOfPart(converter, 'spectrum', {
      code: 'spectrum-scales',
      severity: 'note',
      text: `its spectrum in per cent of I1 belongs to ${formatQuantity(converter.kW, 'kW')} and is kept in ${scaled.join(', ')}: the amperes scale with I1, while a bridge at part load draws higher percentages`,
      mend: 'give those cases a spectrum measured or stated at their load',
    }),
  ];
}

function declared(converter: Converter): Said[] {
  const said: Said[] = [];
  if (converter.interharmonics) {
    said.push(
      saidOfPart(converter, 'interharmonics', {
        code: 'interharmonics',
        severity: 'warning',
        text: 'it injects interharmonics; whole orders alone are solved and judged',
        mend: 'look on the rail between the orders for a peak at its frequencies, and measure; a resonance there is excited as well',
      }),
    );
  }
  if (converter.spectrumWithBank) {
    said.push(
      saidOfPart(converter, 'spectrumWithBank', {
        code: 'spectrum-with-bank',
        severity: 'warning',
        text: 'its spectrum was measured with capacitors in; they took up or raised part of what the bridge injects',
        mend: 'measure again with the bank out, or take the maker’s spectrum',
      }),
    );
  }
  return said;
}

function empty(study: Study, converter: Converter): Said[] {
  if (spectrumOf(study, converter.spectrum).length > 0) return [];
  return [
    saidOfPart(converter, 'spectrum', {
      code: 'spectrum-empty',
      severity: 'note',
      text: 'its spectrum has no order from 2 to the highest solved; it injects nothing',
      mend: 'choose a spectrum of its kind, or enter its rows',
    }),
  ];
}
