/** What a check yields. */

export type Provenance = 'published' | 'second-hand' | 'memory' | 'practice';

export interface Source {
  /** e.g. "IEC 60831-1". Common practice names itself: "common practice". */
  document: string;
  edition?: string;
  clause?: string;
  provenance: Provenance;
}

export type VerdictWord = 'pass' | 'watch' | 'fail' | 'unknown';

/** One line of "equation with the numbers put in", plain text with the trade's symbols. */
export interface Working {
  /** e.g. "I_rms / I_N = √(Σ I_h²) / I_N". */
  equation: string;
  /** e.g. "933 A / 541 A = 1.72". */
  numbers: string;
}

export interface Verdict {
  /** Stable over edits: check, subject, and order where it has one, joined by "|". */
  key: string;
  check: string;
  /** Short trade words: "bank current", "5th harmonic voltage". */
  title: string;
  subject: { kind: 'element' | 'bus'; id: string };
  caseId: string;
  value: number | null;
  limit: number | null;
  unit: string;
  /** (limit − value)/(limit − reference), sign turned for lower limits; null where unknown. */
  margin: number | null;
  verdict: VerdictWord;
  /** A screening rule: never fails, never enters a worst margin. */
  screening: boolean;
  working: Working[];
  source: Source;
  /** Harmonic order the verdict speaks of, real-valued for a resonance. */
  order?: number;
  /** Missing data (unknown), unknown angles, screening, conservatisms: sentences. */
  remarks: string[];
  /** For bus and order verdicts: the same check with every bank and filter out of service. */
  withoutCorrection?: { value: number | null; verdict: VerdictWord };
  /** What would mend it, in words; absent on a pass. */
  mend?: string;
}
