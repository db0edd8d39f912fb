export { type Assumption, assumptionsOf } from './assumptionsOf.ts';
export { type Items, withBelow } from './below.ts';
export { canonicalJson, canonicalValue } from './canonicalJson.ts';
export { type CaseDifference, caseDifferences, differencesBetween } from './caseDifferences.ts';
export {
  addCaseByRecipe,
  type CaseRecipe,
  caseRecipes,
  type RecipeGroup,
  usualLightPercent,
} from './caseRecipes.ts';
export { baseStateId, casesOf, isBaseCase, type ResolvedCase, studyInCase, withBaseState } from './cases.ts';
export { clipItems } from './clip/clipItems.ts';
export { clipText, type PartsClip } from './clip/PartsClip.ts';
export { type PasteEdit, pasteClip } from './clip/pasteClip.ts';
export { type ClipOutcome, readClip } from './clip/readClip.ts';
export { counted, countedTogether } from './counted.ts';
export { drawnItems, drawnOf, drawnWords, symbolSetOf, symbolSets, symbolSetWords } from './drawn.ts';
export { type AddBusEdit, type AddPartEdit, type AddPartOptions, addBus, addPart } from './edits/addParts.ts';
export { addPin, removePin, reorderAlong, setPins } from './edits/arrange.ts';
export {
  type AddCaseEdit,
  addCase,
  duplicateCase,
  moveCase,
  removeCase,
  resetCase,
  updateCase,
} from './edits/caseEdits.ts';
export { type CopyEdit, duplicateParts } from './edits/copyParts.ts';
export { setDrawn, setSymbols } from './edits/drawnEdits.ts';
export { joinEdits, makeEdit, type Patch, sameData } from './edits/edit.ts';
export { errorsAfter } from './edits/errorsAfter.ts';
export { importParts, partsHangingFrom } from './edits/importParts.ts';
export { addMark, type MarkEdit, moveMark, removeMark, setMarkText } from './edits/marks.ts';
export {
  alongWith,
  busesLosingFeed,
  type End,
  type Move,
  moveEnd,
  moveObstacle,
  moveParts,
} from './edits/moveParts.ts';
export {
  confirmTypical,
  type OriginTally,
  originOf,
  originPath,
  originsOf,
  originTally,
  setOrigin,
} from './edits/origins.ts';
export { setPhaseColours, setPhaseLabels } from './edits/phaseEdits.ts';
export {
  type Chosen,
  type Removal,
  removalOf,
  removalWords,
  removeBus,
  removeItems,
  removeParts,
} from './edits/removeParts.ts';
export { replaceObstacle, replacePart } from './edits/replacePart.ts';
export { restoreStudy } from './edits/restoreStudy.ts';
export { setField } from './edits/setField.ts';
export { type RowChange, type SetTableOptions, setTable } from './edits/setTable.ts';
export { type AddSpectrumEdit, addSpectrum, removeSpectrum, updateSpectrum } from './edits/spectrumEdits.ts';
export {
  resetInCase,
  type UpdateOptions,
  updateBus,
  updateElement,
  updateGroup,
  updateStudy,
} from './edits/updates.ts';
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
export { hintOf } from './fields/hintOf.ts';
export { isInside } from './fields/isInside.ts';
export { takesOrigin } from './fields/takesOrigin.ts';
export { valueWords } from './fields/valueWords.ts';
export { fedBuses } from './findings/feeding.ts';
export { siteFindings } from './findings/siteFindings.ts';
export { fingerprint } from './fingerprint.ts';
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
export { markKinds, markName, marksOf } from './marksOf.ts';
export { busName, elementName, fullNameOf, kindsWords, kindWords, nameOf, shortKindWords } from './names.ts';
export { type PartPlace, typicalValues } from './newPart.ts';
export { newStudy } from './newStudy.ts';
export {
  connectionWords,
  inPhaseNames,
  type PhaseNames,
  phaseColourSets,
  phaseColoursOf,
  phaseLabelSets,
  phaseNamesOf,
} from './phases.ts';
export { type AnswerKey, answerFields } from './quickStart/answerFields.ts';
export { type AnswerIssue, answerIssues } from './quickStart/answerIssues.ts';
export { type DrawnSite, drawSite } from './quickStart/drawSite.ts';
export { type DriveKind, driveKinds } from './quickStart/driveKinds.ts';
export { quickStartEdit } from './quickStart/quickStartEdit.ts';
export { figuresOf, type SiteAnswers, type SiteFigures } from './quickStart/SiteAnswers.ts';
export { type SystemId, siteSystems } from './quickStart/siteSystems.ts';
export { withTyped } from './quickStart/withTyped.ts';
export {
  type BuiltInSpectrum,
  builtInSpectra,
  builtInSpectrum,
  type SpectrumProvenance,
} from './spectra/builtIn.ts';
export { isHarmonicRows, spectrumById, spectrumOf } from './spectra/spectrumOf.ts';
export {
  arrangeRows,
  matchesOrigin,
  type OriginFilter,
  type RowFilter,
  type RowOrder,
} from './table/arrangeRows.ts';
export { type CellStyle, cellText } from './table/cellText.ts';
export { type CellReading, type ReadCell, readCell } from './table/readCell.ts';
export {
  type Paste,
  type PasteChoices,
  type PastedCell,
  type PastedColumn,
  type PastedRow,
  type PastePlace,
  readPaste,
} from './table/readPaste.ts';
export {
  columnValue,
  type TableColumn,
  type TableOwner,
  type TableRecord,
  tableColumns,
  tableRecords,
} from './table/tableColumns.ts';
export { type TablePaste, tablePaste } from './table/tablePaste.ts';
export { tabularText } from './table/tabularText.ts';
export type * from './types.ts';
export { setTypical } from './typical/setTypical.ts';
export type { Typical } from './typical/Typical.ts';
export { type BankValues, typicalBank, usualDetunings } from './typical/typicalBank.ts';
export {
  type CableLaying,
  type CableValues,
  type Conductor,
  cableSizes,
  typicalCable,
} from './typical/typicalCable.ts';
export {
  type ConverterBuild,
  type ConverterValues,
  converterTypes,
  typicalConverter,
} from './typical/typicalConverter.ts';
export { type FilterValues, filteredOrders, typicalFilter } from './typical/typicalFilter.ts';
export {
  type GeneratorBuild,
  type GeneratorValues,
  generatorReactances,
  typicalGenerator,
} from './typical/typicalGenerator.ts';
export { type MotorChoice, type MotorValues, typicalMotor } from './typical/typicalMotor.ts';
export { stepSizes, typicalSteps, usualSplits } from './typical/typicalSteps.ts';
export { type NetworkBuild, networkBuilds, typicalSupply } from './typical/typicalSupply.ts';
export {
  type TransformerChoice,
  type TransformerValues,
  typicalTransformer,
} from './typical/typicalTransformer.ts';
export {
  editText,
  formatNumber,
  formatQuantity,
  minusSign,
  type NumberStyle,
  thinSpace,
} from './units/formatQuantity.ts';
export { type ParsedQuantity, parseQuantity } from './units/parseQuantity.ts';
export { parseRows } from './units/parseRows.ts';
export { parseSteps, stepsFromLines, stepsText } from './units/parseSteps.ts';
export type { DecimalMark } from './units/readNumber.ts';
export { type ReadQuantity, readQuantity } from './units/readQuantity.ts';
export { understoodAs } from './units/understoodAs.ts';
export type { Unit } from './units/unit.ts';
export { allowedOf } from './validate/allowed.ts';
export { checkStudy, type ReadOutcome } from './validate/checkStudy.ts';
export { readStudy } from './validate/readStudy.ts';
export { parseVectorGroup, type VectorGroup } from './vectorGroup.ts';
export { defaultOf, type Resolved, type ResolvedElement, withDefaults } from './withDefaults.ts';
export { writeStudy } from './writeStudy.ts';
