import type { Edit, Study } from '../study/index.ts';
import { fitView, openingView } from './fitView.ts';
import { freshId } from './freshId.ts';
import { noHistory, record, stepBack, stepForward } from './history.ts';
import { togglePinEdit } from './togglePinEdit.ts';
import type { Notice, Workbench, WorkbenchActions, WorkbenchState } from './types.ts';

type Set = (change: (state: Workbench) => Partial<WorkbenchState>) => void;
type Get = () => Workbench;
type StudyActions = Pick<
  WorkbenchActions,
  'openStudy' | 'makeCopy' | 'edit' | 'preview' | 'cancelPreview' | 'undo' | 'redo' | 'togglePin'
>;

type Change = (state: WorkbenchState) => Partial<WorkbenchState>;

/** What changes together whenever the study does: every door to the study goes through here. */
function withStudy(state: WorkbenchState, study: Study): Partial<WorkbenchState> {
  return { study, revision: state.revision + 1, view: fitView(state.view, study) };
}

function editOf(state: WorkbenchState, edit: Edit, said: string | null): Partial<WorkbenchState> {
  const before = state.beforePreview ?? state.study;
  if (!before) return {};
  const after = edit.apply(before);
  // The end of a gesture counts as a change also where it ends as it began: what waited for it goes on.
  const still = after === state.study && !state.beforePreview;
  const settled = { ...(still ? {} : withStudy(state, after)), beforePreview: null };
  if (after === before) return settled;
  return {
    ...settled,
    said,
    lastEdit: edit.words,
    history: record(state.history, before, edit.label, edit.words),
  };
}

function previewOf(state: WorkbenchState, edit: Edit): Partial<WorkbenchState> {
  const before = state.beforePreview ?? state.study;
  if (!before) return {};
  const shown = edit.apply(before);
  if (shown === state.study) return {};
  return { ...withStudy(state, shown), beforePreview: before };
}

function cancelled(state: WorkbenchState): Partial<WorkbenchState> {
  const { beforePreview } = state;
  if (!beforePreview) return {};
  return { ...withStudy(state, beforePreview), beforePreview: null };
}

function stepped(state: WorkbenchState, step: typeof stepBack): Partial<WorkbenchState> {
  const undoing = step === stepBack;
  const settled = { ...state, ...cancelled(state) };
  const { study } = settled;
  const moved = study && step(settled.history, study);
  if (!moved) return cancelled(state);
  const words = (undoing ? settled.history.past : settled.history.future).at(-1)?.words ?? '';
  return {
    ...withStudy(settled, moved.study),
    said: `${undoing ? 'Undone' : 'Done again'}: ${words}`,
    beforePreview: null,
    history: moved.history,
    lastEdit: moved.history.past.at(-1)?.words ?? null,
  };
}

/** A change of the study, or the words that it cannot be changed here while another tab works on it. */
function unlessReadOnly(change: Change): Change {
  return (state) => (state.readOnly ? { notice: onlyLooking } : change(state));
}

const onlyLooking: Notice = {
  severity: 'info',
  title: 'Nothing was changed: another tab works on this study, and this one only looks at it.',
  findings: [],
};

function opened(
  state: WorkbenchState,
  study: Study,
  fileName: string | null,
  documentId = freshId(),
): Partial<WorkbenchState> {
  return {
    study,
    revision: state.revision + 1,
    openedRevision: state.revision + 1,
    documentId,
    lastEdit: null,
    said: null,
    history: noHistory,
    beforePreview: null,
    fileName,
    fileHandle: null,
    savedStudy: fileName === null ? null : study,
    importWarnings: [],
    readOnly: false,
    notice: null,
    view: openingView(study, state.view),
    answer: null,
    probe: null,
    allVerdicts: null,
    worst: null,
    envelope: null,
  };
}

export function studyActions(set: Set, get: Get): StudyActions {
  return {
    openStudy: (study, fileName = null, documentId) =>
      set((state) => opened(state, study, fileName, documentId)),
    makeCopy: () =>
      set((state) => {
        const study = state.beforePreview ?? state.study;
        return study ? opened(state, { ...study, title: `${study.title}, copy` }, null) : {};
      }),
    edit: (edit, said) => set(unlessReadOnly((state) => editOf(state, edit, said ?? null))),
    preview: (edit) => set((state) => (state.readOnly ? {} : previewOf(state, edit))),
    cancelPreview: () => set(cancelled),
    undo: () => set(unlessReadOnly((state) => stepped(state, stepBack))),
    redo: () => set(unlessReadOnly((state) => stepped(state, stepForward))),
    togglePin: (pin) => {
      const { study, edit } = get();
      if (study) edit(togglePinEdit(study, pin));
    },
  };
}
