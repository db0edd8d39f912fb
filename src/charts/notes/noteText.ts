import type { Verdict } from '../../checks/index.ts';
import { joinParts } from '../figure/quantityParts.ts';
import { phasorsAt } from '../phasor/phasorSpectrum.ts';
import { phasorSummary } from '../phasor/phasorWords.ts';
import type { Reading } from './Reading.ts';
import { readingNumbers } from './readingNumbers.ts';
import {
  limitValue,
  marginWords,
  sourceWords,
  VERDICT_WORDS,
  verdictHeadline,
  verdictValue,
  withoutCorrectionWords,
} from './verdictWords.ts';

/** A reading as plain text, one number a line, tab between label and value, for pasting elsewhere. */
export function readingText(reading: Reading, letter: string): string {
  const head = `${letter ? `${letter}  ` : ''}${reading.title}`;
  if (reading.absent) return `${head}\n${reading.absent}`;
  const numbers = readingNumbers(reading).map(
    (one) => `${one.label}\t${joinParts(one.parts)}${one.words ? ` ${one.words}` : ''}`,
  );
  const voltage = reading.voltage && phasorsAt(reading.voltage, 1);
  const current = reading.current && phasorsAt(reading.current, 1);
  return [head, ...numbers, phasorSummary(voltage, current, 1, reading.phaseNames)].join('\n');
}

/** A verdict as plain text: headline, verdict, value and limit, working, source, remarks, mend. */
export function verdictText(verdict: Verdict, subjectName: string, caseName: string | undefined): string {
  const lines = [
    `${VERDICT_WORDS[verdict.verdict]}: ${verdictHeadline(verdict, subjectName)}`,
    ...(caseName ? [`case\t${caseName}`] : []),
    `value\t${verdictValue(verdict.value, verdict.unit)}`,
    `limit\t${limitValue(verdict.limit, verdict.unit)}`,
    `margin\t${marginWords(verdict.margin)}`,
    ...verdict.working.flatMap((working) => [working.equation, working.numbers]),
    `source\t${sourceWords(verdict.source)}`,
    ...verdict.remarks,
    withoutCorrectionWords(verdict),
    verdict.mend ? `mend\t${verdict.mend}` : null,
  ];
  return lines.filter((line) => line !== null && line !== '').join('\n');
}
