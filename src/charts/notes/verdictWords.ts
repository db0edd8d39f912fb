import type { Provenance, Source, Verdict, VerdictWord } from '../../checks/index.ts';
import { ABSENT, plainNumber } from '../figure/quantityParts.ts';

export const VERDICT_MARKS: Record<VerdictWord, string> = { pass: '✓', watch: '!', fail: '✕', unknown: '?' };

export const VERDICT_WORDS: Record<VerdictWord, string> = {
  pass: 'passes',
  watch: 'watch',
  fail: 'fails',
  unknown: 'no verdict',
};

export const PROVENANCE_WORDS: Record<Provenance, string> = {
  published: 'read in the source',
  'second-hand': 'second-hand: read in a text quoting it',
  memory: 'from memory: check against the edition in force',
  practice: 'common practice, no published source',
};

/** Three significant digits; zeros at the end are dropped, from a ratio only beyond its second decimal. */
function threeDigits(value: number, unit: string): string {
  const [whole = '', fraction = ''] = plainNumber(value, 3).split('.');
  const kept = fraction.replace(/0+$/, '');
  const shown = unit === '' ? kept.padEnd(Math.min(2, fraction.length), '0') : kept;
  return shown === '' ? whole : `${whole}.${shown}`;
}

/** "1.72", "19.4 %", "—". */
export function verdictValue(value: number | null, unit: string): string {
  if (value === null) return ABSENT;
  return unit === '' ? threeDigits(value, unit) : `${threeDigits(value, unit)} ${unit}`;
}

/** The limit alike; "none" where there is none. */
export function limitValue(limit: number | null, unit: string): string {
  return limit === null ? 'none' : verdictValue(limit, unit);
}

/** "Bank C1 · current 1.72, limit 1.30". */
export function verdictHeadline(verdict: Verdict, subjectName: string): string {
  const subject = `${subjectName} · ${verdict.title}`;
  if (verdict.value === null) return subject;
  const limit = verdict.limit === null ? '' : `, limit ${limitValue(verdict.limit, verdict.unit)}`;
  return `${subject} ${verdictValue(verdict.value, verdict.unit)}${limit}`;
}

/** "1.72 / 1.30", "19.4 / 5 %": value and limit where a line has little room; "" without a value. */
export function valueAgainstLimit({ value, limit, unit }: Pick<Verdict, 'value' | 'limit' | 'unit'>): string {
  if (value === null) return '';
  if (limit === null) return verdictValue(value, unit);
  return `${threeDigits(value, unit)} / ${verdictValue(limit, unit)}`;
}

/** "+0.23", "−3.62", "not known". */
export function marginWords(margin: number | null): string {
  if (margin === null) return 'not known';
  const number = plainNumber(margin, margin !== 0 && Math.abs(margin) < 1 ? 2 : 3);
  return margin > 0 ? `+${number}` : number;
}

/** "IEC 60831-1:2014, clause 21 (second-hand: read in a text quoting it)". */
export function sourceWords(source: Source): string {
  if (source.provenance === 'practice' && source.document.toLowerCase() === 'common practice')
    return 'common practice';
  const document = source.edition ? `${source.document}:${source.edition}` : source.document;
  const clause = source.clause ? `, ${source.clause}` : '';
  return `${document}${clause} (${PROVENANCE_WORDS[source.provenance]})`;
}

/** "Without the correction: 3.1 %, passes." */
export function withoutCorrectionWords(verdict: Verdict): string | null {
  const without = verdict.withoutCorrection;
  if (!without) return null;
  return `Without the correction: ${verdictValue(without.value, verdict.unit)}, ${VERDICT_WORDS[without.verdict]}.`;
}

const SHORT_PROVENANCE: Record<Provenance, string | null> = {
  published: null,
  'second-hand': 'second-hand',
  memory: 'from memory',
  practice: 'practice',
};

/** The same where room is short: "IEC 60831-1:2014, clause 21 (second-hand)". */
export function shortSourceWords(source: Source): string {
  const [document = ''] = sourceWords(source).split(' (');
  const provenance = document === 'common practice' ? null : SHORT_PROVENANCE[source.provenance];
  return provenance ? `${document} (${provenance})` : document;
}

/** The case, or the state and tolerance point, in which a check ends worst of all. */
export interface WorstCase {
  /** Of the case or state. */
  caseName: string;
  /** The tolerance point in words, where states and tolerances were searched. */
  point?: string;
  value: number | null;
  verdict: VerdictWord;
  /** It is the case on screen. */
  here: boolean;
}

/**
 * "Worst of all cases: 1.94 in Night shift, fails.", "No case is worse than this one.", or, searched:
 * "Worst of all states and tolerances: 1.94, fails, in Night shift, Bank C1 off; frequency +1 %."
 */
export function worstWords({ unit }: Pick<Verdict, 'unit'>, worst: WorstCase): string {
  const value = verdictValue(worst.value, unit);
  const word = VERDICT_WORDS[worst.verdict];
  if (worst.point !== undefined)
    return worst.here
      ? 'No state and no tolerance searched is worse than this.'
      : `Worst of all states and tolerances: ${value}, ${word}, in ${worst.caseName}; ${worst.point}.`;
  if (worst.here) return 'No case is worse than this one.';
  return `Worst of all cases: ${value} in ${worst.caseName}, ${word}.`;
}
