import type { ResultsCheck } from '../engine/types.ts';
import { margin, type Sense, verdictWord } from './margin.ts';
import { sourceText } from './source.ts';
import type { Source, Verdict, Working } from './types.ts';

/** What every verdict names, judged or not. */
export interface Row {
  check: string;
  title: string;
  subject: Verdict['subject'];
  caseId: string;
  unit: string;
  source: Source;
  working: Working[];
  remarks?: string[];
  order?: number;
  /** Parts two verdicts of one check on one subject, e.g. "peak". */
  part?: string;
  screening?: boolean;
  withoutCorrection?: Verdict['withoutCorrection'];
}

export interface JudgedRow extends Row {
  value: number;
  limit: number;
  reference?: number;
  sense?: Sense;
  /** What would mend it; kept off a pass. */
  mend?: string;
}

function keyOf(row: Row): string {
  const parts = [row.check, row.subject.id];
  if (row.part !== undefined) parts.push(row.part);
  else if (row.order !== undefined && Number.isInteger(row.order)) parts.push(String(row.order));
  return parts.join('|');
}

function common(row: Row): Omit<Verdict, 'value' | 'limit' | 'margin' | 'verdict'> {
  return {
    key: keyOf(row),
    check: row.check,
    title: row.title,
    subject: row.subject,
    caseId: row.caseId,
    unit: row.unit,
    screening: row.screening ?? false,
    working: row.working,
    source: row.source,
    remarks: row.remarks ?? [],
    ...(row.order === undefined ? {} : { order: row.order }),
    ...(row.withoutCorrection === undefined ? {} : { withoutCorrection: row.withoutCorrection }),
  };
}

/** A verdict from a value and its limit. */
export function judged(row: JudgedRow): Verdict {
  const screening = row.screening ?? false;
  const marginValue = margin(row.value, row.limit, row.reference, row.sense);
  const verdict = verdictWord(marginValue, screening);
  return {
    ...common(row),
    value: row.value,
    limit: row.limit,
    margin: marginValue,
    verdict,
    ...(verdict === 'pass' || row.mend === undefined ? {} : { mend: row.mend }),
  };
}

/** No verdict: `missing` says in a sentence which data would allow one. A known value is still shown. */
export function unknown(
  row: Row,
  missing: string,
  value: number | null = null,
  limit: number | null = null,
): Verdict {
  return {
    ...common({ ...row, remarks: [missing, ...(row.remarks ?? [])] }),
    value,
    limit,
    margin: null,
    verdict: 'unknown',
    mend: missing,
  };
}

/** Kept without a margin to form: nothing is there for the limit to act on; `why` says so. */
export function keptQuietly(
  row: Row,
  why: string,
  value: number | null = null,
  limit: number | null = null,
): Verdict {
  return {
    ...common({ ...row, remarks: [why, ...(row.remarks ?? [])] }),
    value,
    limit,
    margin: null,
    verdict: 'pass',
  };
}

/** A verdict as the results file writes it (study format §8). */
export function toResultsCheck(verdict: Verdict): ResultsCheck {
  const { check, subject, value, limit, unit, margin: marginValue, verdict: word, source } = verdict;
  return {
    check,
    ...(subject.kind === 'element' ? { element: subject.id } : { bus: subject.id }),
    value,
    limit,
    unit,
    margin: marginValue,
    verdict: word,
    source: sourceText(source),
  };
}
