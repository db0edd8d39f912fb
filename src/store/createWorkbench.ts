import { createStore, type StoreApi } from 'zustand/vanilla';
import { defaultFamilies, defaultTolerances } from '../sizing/index.ts';
import { type Files, fileActions } from './fileActions.ts';
import { emptyView } from './fitView.ts';
import { noHistory } from './history.ts';
import { studyActions } from './studyActions.ts';
import type { Workbench, WorkbenchState } from './types.ts';
import { viewActions } from './viewActions.ts';

export type WorkbenchStore = StoreApi<Workbench>;

const emptyTable: WorkbenchState = {
  study: null,
  revision: 0,
  openedRevision: 0,
  documentId: '',
  lastEdit: null,
  history: noHistory,
  beforePreview: null,
  fileName: null,
  fileHandle: null,
  savedStudy: null,
  importWarnings: [],
  readOnly: false,
  keptProblem: null,
  view: emptyView(),
  answer: null,
  probe: null,
  allVerdicts: null,
  worstQuestion: { families: defaultFamilies, tolerances: defaultTolerances },
  worst: null,
  envelope: null,
  status: { solving: false, workerMessage: null },
  notice: null,
  said: null,
};

/** A workbench without a study. It computes nothing by itself: followStudy does, autosave keeps it. */
export function createWorkbench(files: Files): WorkbenchStore {
  return createStore<Workbench>()((set, get) => ({
    ...emptyTable,
    ...studyActions(set, get),
    ...viewActions(set),
    ...fileActions(set, get, files),
  }));
}
