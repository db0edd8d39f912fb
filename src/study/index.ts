export { applySet, casesOf, isBaseCase, type ResolvedCase, studyInCase } from './cases.ts';
export type {
  BooleanField,
  BusRefField,
  Choice,
  ChoiceField,
  DefaultContext,
  Field,
  FieldType,
  GroupField,
  ListField,
  NumberField,
  OpaqueField,
  PairField,
  TextField,
} from './fields/Field.ts';
export { elementKinds, type FieldOwner, fieldOf, fieldsOf, seriesKinds } from './fields/fieldsOf.ts';
export {
  busById,
  busesOf,
  elementById,
  elementsAt,
  elementsOfKind,
  homeBusOf,
  isOn,
  isSeries,
} from './lookup.ts';
export { currentVersion } from './migrate.ts';
export { busName, elementName, fullNameOf, kindWords, nameOf } from './names.ts';
export {
  type BuiltInSpectrum,
  builtInSpectra,
  builtInSpectrum,
  type SpectrumProvenance,
} from './spectra/builtIn.ts';
export { isHarmonicRows, spectrumById, spectrumOf } from './spectra/spectrumOf.ts';
export type * from './types.ts';
export type { Unit } from './units/unit.ts';
export { allowedOf } from './validate/allowed.ts';
export { checkStudy, type ReadOutcome } from './validate/checkStudy.ts';
export { readStudy } from './validate/readStudy.ts';
export { parseVectorGroup, type VectorGroup } from './vectorGroup.ts';
export { defaultOf, type Resolved, type ResolvedElement, withDefaults } from './withDefaults.ts';
