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

/** Words that cost time to write are written when they are first read. */
export type Lazy<T> = T | (() => T);

export interface LazyRow extends Omit<Row, 'working' | 'remarks'> {
  working: Lazy<Working[]>;
  remarks?: Lazy<string[]>;
}

export interface JudgedRow extends LazyRow {
  value: number;
  limit: number;
  reference?: number;
  sense?: Sense;
  /** Where a check's own rule sets another watch band than the margin of 0.10. */
  watchBelow?: number;
  /** What would mend it; asked for only when it is no pass. */
  mend?: Lazy<string>;
}

function keyOf({ check, subject, part, order }: Pick<Row, 'check' | 'subject' | 'part' | 'order'>): string {
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
  remarks: Lazy<string[]>;
  mend?: Lazy<string> | undefined;
}

/**
 * Working, remarks and mend are own accessors, written once at the first reading: a search that only wants
 * margins never pays for words. Cloning and JSON read them like plain fields.
 */
function build(row: LazyRow, outcome: Outcome): Verdict {
  const working = writtenOnce(row.working);
  const remarks = writtenOnce(outcome.remarks);
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
    source: row.source,
    get working() {
      return working();
    },
    get remarks() {
      return remarks();
    },
  };
  if (row.order !== undefined) verdict.order = row.order;
  if (row.withoutCorrection !== undefined) verdict.withoutCorrection = row.withoutCorrection;
  if (outcome.mend === undefined) return verdict;
  const get = writtenOnce(outcome.mend);
  return Object.defineProperty(verdict, 'mend', { get, enumerable: true, configurable: true });
}

const written = <T extends string | unknown[]>(words: Lazy<T>): T =>
  typeof words === 'function' ? words() : words;

function writtenOnce<T extends string | unknown[]>(words: Lazy<T>): () => T {
  let kept: T | undefined;
  return () => {
    kept ??= written(words);
    return kept;
  };
}

/** A verdict from a value and its limit. */
export function judged(row: JudgedRow): Verdict {
  const { value, limit } = row;
  const marginValue = margin(value, limit, row.reference, row.sense);
  const verdict = verdictWord(marginValue, row.screening, row.watchBelow);
  const mend = verdict === 'pass' ? undefined : row.mend;
  return build(row, { value, limit, margin: marginValue, verdict, remarks: row.remarks ?? [], mend });
}

/** No verdict: `missing`, a sentence without its full stop, says which data would allow one. A known value is still shown. */
export function unknown(
  row: LazyRow,
  missing: string,
  value: number | null = null,
  limit: number | null = null,
): Verdict {
  const mend = sentence(missing);
  const remarks = (): string[] => [mend, ...written(row.remarks ?? [])];
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
