import type { StudyCase } from '../../study/index.ts';

/** An operating state: a case of its own, made from one of the study's by the families chosen. */
export interface StudyState extends StudyCase {
  name: string;
  /** The case it is made from. */
  from: string;
  /** What it changes on that case, in words: "Bank C1 at 160 kvar", "coupler Q1 closed". Empty for the case itself. */
  words: string[];
  /** Whether a bank has other steps on than in the case. */
  stepsMoved: boolean;
}
