import { createStore } from 'zustand';
import {
  archive,
  type KeptRevision,
  useWorkbench,
  type View,
  type Workbench,
  workbench,
} from '../../store/index.ts';
import { casesOf, checkStudy, restoreStudy, type Study } from '../../study/index.ts';
import { momentWords } from './momentWords.ts';

/** A former state being looked at: shown like a gesture under way, nothing of it is in the study yet. */
interface Looking {
  revision: KeptRevision | null;
  study: Study | null;
  /** Case and busbar looked at before; a former state may lack them. */
  before: Pick<View, 'caseId' | 'focusBus'> | null;
}

export const looking = createStore<Looking>(() => ({ revision: null, study: null, before: null }));

/** The former state on screen; null where the present one is, also after an edit has ended the looking. */
function looked({ study, beforePreview }: Workbench): KeptRevision | null {
  const { revision, study: former } = looking.getState();
  return beforePreview !== null && study === former ? revision : null;
}

export function useLooked(): KeptRevision | null {
  return useWorkbench(looked);
}

function words(revision: KeptRevision): string {
  const when = momentWords(revision.at, Date.now());
  return revision.name ? `${when}, “${revision.name}”` : when;
}

/** Shows a former state on the drawing, solved and judged, without changing the study. */
export async function lookAt(revision: KeptRevision): Promise<void> {
  const kept = await archive.revisionStudy(revision.id);
  const { study, findings } = kept ? checkStudy(kept) : { study: null, findings: [] };
  const { preview, setNotice, view } = workbench.getState();
  if (!study) {
    const title = `The state of ${words(revision)} cannot be read any more.`;
    setNotice({ severity: 'error', title, findings });
    return;
  }
  const { caseId, focusBus } = looked(workbench.getState()) ? (looking.getState().before ?? view) : view;
  looking.setState({ revision, study, before: { caseId, focusBus } });
  preview(restoreStudy(study, words(revision)));
}

export function backToNow(): void {
  if (!looked(workbench.getState())) return;
  const { cancelPreview, setCase, setFocusBus } = workbench.getState();
  const { before } = looking.getState();
  cancelPreview();
  const { study } = workbench.getState();
  if (!study || !before) return;
  if (casesOf(study).some(({ id }) => id === before.caseId)) setCase(before.caseId);
  if (study.buses.some(({ id }) => id === before.focusBus)) setFocusBus(before.focusBus);
}

/** Makes the state looked at the study's, as one step of undo. */
export function goBackToIt(): void {
  const revision = looked(workbench.getState());
  const { study } = looking.getState();
  if (revision && study) workbench.getState().edit(restoreStudy(study, words(revision)));
}
