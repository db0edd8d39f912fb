import type { Verdict, VerdictWord } from '../checks/index.ts';
import type { ImpedanceEnvelope, WorstResult, WorstVerdict } from '../sizing/index.ts';
import type { Answer, Workbench } from './types.ts';

/** Words for "Undo …"; null where there is nothing to undo. */
export function undoWords({ history }: Workbench): string | null {
  return history.past.at(-1)?.words ?? null;
}

/** Words for "Redo …"; null where nothing was undone. */
export function redoWords({ history }: Workbench): string | null {
  return history.future.at(-1)?.words ?? null;
}

/** Whether the study differs from its file, or was never in one. */
export function isUnsaved({ study, beforePreview, savedStudy }: Workbench): boolean {
  return (beforePreview ?? study) !== savedStudy;
}

/** Whether what is shown was not computed from the study and case on screen. */
export function isStale({ answer, revision, view }: Workbench): boolean {
  return answer === null || answer.revision !== revision || answer.caseId !== view.caseId;
}

/** The answer, where it belongs to the study and case on screen. */
export function freshAnswer(state: Workbench): Answer | null {
  return isStale(state) ? null : state.answer;
}

/** Verdicts of the case on screen, where they belong to the study on screen; the screening rows among them
 * may be older until `isScreened`. */
export function freshVerdicts(state: Workbench): Verdict[] | null {
  const answer = freshAnswer(state);
  return answer && answer.verdictsRevision === answer.revision ? answer.verdicts : null;
}

/** Whether the screening rows among the verdicts belong to the study and case on screen, too. */
export function isScreened(state: Workbench): boolean {
  const answer = freshAnswer(state);
  return answer !== null && answer.screeningRevision === answer.revision;
}

/** Whether the rail's curves belong to the study, case and busbar on screen. */
export function isScanStale(state: Workbench): boolean {
  const scan = freshAnswer(state)?.scan;
  return !scan || scan.revision !== state.revision || scan.bus !== state.view.focusBus;
}

/**
 * How many verdicts of the case on screen, or of all cases, end so; null while not all are known. Screening
 * rows older than the study on screen are not counted.
 */
export function countVerdicts(word: VerdictWord, scope: 'case' | 'all'): (state: Workbench) => number | null {
  return (state) => {
    if (scope === 'case') {
      const screened = isScreened(state);
      const counts = ({ verdict, screening }: Verdict): boolean =>
        verdict === word && (screened || !screening);
      return freshVerdicts(state)?.filter(counts).length ?? null;
    }
    const { allVerdicts, revision } = state;
    if (allVerdicts?.revision !== revision || !allVerdicts.complete) return null;
    return Object.values(allVerdicts.byCase)
      .flat()
      .filter(({ verdict }) => verdict === word).length;
  };
}

/** The worst over states and tolerances, where it was computed from the study on screen. */
export function freshWorst({ worst, revision, worstQuestion }: Workbench): WorstResult | null {
  return worst?.revision === revision && worst.question === worstQuestion ? worst.result : null;
}

/** The band of the impedance on the rail, where it was computed from the study and for the busbar on screen. */
export function freshEnvelope({
  envelope,
  revision,
  worstQuestion,
  view,
}: Workbench): ImpedanceEnvelope | null {
  const fits = envelope?.revision === revision && envelope.question === worstQuestion;
  return fits && envelope.envelope.bus === view.focusBus ? envelope.envelope : null;
}

const byKey = new WeakMap<WorstResult, ReadonlyMap<string, WorstVerdict>>();

/** The worst of each verdict by its key. */
export function worstByKey(result: WorstResult): ReadonlyMap<string, WorstVerdict> {
  const known = byKey.get(result) ?? new Map(result.verdicts.map((verdict) => [verdict.key, verdict]));
  byKey.set(result, known);
  return known;
}
