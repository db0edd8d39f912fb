import type { ResultsCheck } from '../engine/index.ts';
import { margin, type Sense, verdictWord } from './margin.ts';
import { sourceText } from './source.ts';
import type { Source, Verdict, VerdictWord, Working } from './types.ts';

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
  /** Where a check's own rule sets another watch band than the margin of 0.10. */
  watchBelow?: number;
  /** What would mend it; asked for only when it is no pass. */
  mend?: string | (() => string);
}

function keyOf({ check, subject, part, order }: Row): string {
  if (part !== undefined) return `${check}|${subject.id}|${part}`;
  return order !== undefined && Number.isInteger(order)
    ? `${check}|${subject.id}|${order}`
    : `${check}|${subject.id}`;
}

interface Outcome {
  value: number | null;
  limit: number | null;
  margin: number | null;
  verdict: VerdictWord;
  remarks: string[];
  mend?: string | undefined;
}

function build(row: Row, outcome: Outcome): Verdict {
  const verdict: Verdict = {
    key: keyOf(row),
    check: row.check,
    title: row.title,
    subject: row.subject,
    caseId: row.caseId,
    value: outcome.value,
    limit: outcome.limit,
    unit: row.unit,
    margin: outcome.margin,
    verdict: outcome.verdict,
    screening: row.screening ?? false,
    working: row.working,
    source: row.source,
    remarks: outcome.remarks,
  };
  if (row.order !== undefined) verdict.order = row.order;
  if (row.withoutCorrection !== undefined) verdict.withoutCorrection = row.withoutCorrection;
  if (outcome.mend !== undefined) verdict.mend = outcome.mend;
  return verdict;
}

/** A verdict from a value and its limit. */
export function judged(row: JudgedRow): Verdict {
  const { value, limit } = row;
  const marginValue = margin(value, limit, row.reference, row.sense);
  const verdict = verdictWord(marginValue, row.screening, row.watchBelow);
  const mend = verdict === 'pass' ? undefined : typeof row.mend === 'function' ? row.mend() : row.mend;
  return build(row, { value, limit, margin: marginValue, verdict, remarks: row.remarks ?? [], mend });
}

/** No verdict: `missing`, a sentence without its full stop, says which data would allow one. A known value is still shown. */
export function unknown(
  row: Row,
  missing: string,
  value: number | null = null,
  limit: number | null = null,
): Verdict {
  const mend = sentence(missing);
  const remarks = [mend, ...(row.remarks ?? [])];
  return build(row, { value, limit, margin: null, verdict: 'unknown', remarks, mend });
}

const sentence = (words: string): string => `${words.charAt(0).toUpperCase()}${words.slice(1)}.`;

/** Kept without a margin to form: nothing is there for the limit to act on; `why` says so. */
export function keptQuietly(
  row: Row,
  why: string,
  value: number | null = null,
  limit: number | null = null,
): Verdict {
  return build(row, { value, limit, margin: null, verdict: 'pass', remarks: [why, ...(row.remarks ?? [])] });
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
