import type { Edit } from '../../study/index.ts';
import type { Point } from '../layout/index.ts';
import type { Subject } from '../subject.ts';

/** What letting go here would do. Without an edit the words say why nothing happens. */
export interface DropOutcome {
  words: string;
  /** It was meant, and may not be. */
  refused?: boolean;
  edit?: Edit;
  /** The busbar that lights. */
  bus?: string;
  /** The part whose place is taken. */
  replaces?: string;
  /** Where along the busbar the part would touch it, drawing px. */
  mark?: Point;
  /** Selected afterwards. */
  select?: readonly Subject[];
}

/** A plan that is meant and impossible. */
export function notPossible(reason: string, bus?: string): DropOutcome {
  return { words: `not possible: ${reason}`, refused: true, ...(bus === undefined ? {} : { bus }) };
}
