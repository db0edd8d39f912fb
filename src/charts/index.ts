export { FigureMenu } from './figure/FigureMenu.tsx';
export type { FigureValues } from './figure/FigureValues.ts';
export { FoldMark } from './figure/FoldMark.tsx';
export { type FigureInk, PAPER_INK, PRINT_INK } from './figure/figureInk.ts';
export { phaseInk } from './figure/phaseInk.ts';
export type { NoteState } from './notes/NoteFrame.tsx';
export { NotesColumn } from './notes/NotesColumn.tsx';
export type { NotesColumnProps } from './notes/NotesColumnProps.ts';
export { NotesLetters, type NotesLettersProps } from './notes/NotesLetters.tsx';
export { PICTURE_WAYS, type PictureWay, type ReadingPicture } from './notes/noteActions.ts';
export { type NoteSubject, noteLetters, pinKey, pinSubject, subjectKey } from './notes/noteLetters.ts';
export { readingText, verdictText } from './notes/noteText.ts';
export type { Reading } from './notes/Reading.ts';
export { ReadingNote, type ReadingNoteProps } from './notes/ReadingNote.tsx';
export { type ReadingNumber, readingNumbers } from './notes/readingNumbers.ts';
export { VerdictMark } from './notes/VerdictMark.tsx';
export { VerdictNote, type VerdictNoteProps } from './notes/VerdictNote.tsx';
export { byMargin, verdictCounts } from './notes/verdictOrder.ts';
export type { WorstCase } from './notes/verdictWords.ts';
export {
  marginWords,
  sourceWords,
  VERDICT_MARKS,
  VERDICT_WORDS,
  verdictHeadline,
} from './notes/verdictWords.ts';
export type { LitPhasor } from './phasor/PhasorDrawing.tsx';
export { PhasorFigure, type PhasorFigureProps } from './phasor/PhasorFigure.tsx';
export { PhasorView, type PhasorViewProps } from './phasor/PhasorView.tsx';
export { phaseAngle, phaseAngleWords } from './phasor/phaseAngle.ts';
export { PHASE_DASHES } from './phasor/phasorGeometry.ts';
export {
  type Phasor,
  type PhasorSpectrum,
  phasorSpectrum,
  phasorsAt,
  reversedSpectrum,
  type ThreePhasors,
} from './phasor/phasorSpectrum.ts';
export { phasorValues } from './phasor/phasorValues.ts';
export { FrequencyRail, type FrequencyRailProps } from './rail/FrequencyRail.tsx';
export { ImpedancePair, type ImpedancePairProps } from './rail/ImpedancePair.tsx';
export type { Injection } from './rail/injections.ts';
export type { OrderDomain } from './rail/orderAxis.ts';
export { RailFigure, type RailFigureProps } from './rail/RailFigure.tsx';
export type { PeakVerdict, RailBand, RailScan } from './rail/railModel.ts';
export { railValues } from './rail/railValues.ts';
export type { Probe } from './rail/railWords.ts';
export { SpectrumFigure, type SpectrumFigureProps } from './spectrum/SpectrumFigure.tsx';
export { SpectrumView, type SpectrumViewProps } from './spectrum/SpectrumView.tsx';
export { type OrderLimit, type SpectrumBar, spectrumBars } from './spectrum/spectrumBars.ts';
export { spectrumValues } from './spectrum/spectrumValues.ts';
export { WaveformFigure, type WaveformFigureProps } from './waveform/WaveformFigure.tsx';
export { WaveformView, type WaveformViewProps } from './waveform/WaveformView.tsx';
export { crestFactor, type WaveContent, waveform } from './waveform/waveform.ts';
export type { WavePhases, WaveSettings } from './waveform/waveModel.ts';
export { waveValues } from './waveform/waveValues.ts';
