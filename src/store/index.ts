export type { Archive, KeptDocument, KeptRevision } from './archive.ts';
export { type Autosave, type AutosaveOptions, autosave } from './autosave.ts';
export { browserFiles } from './browserFiles.ts';
export { createWorkbench, type WorkbenchStore } from './createWorkbench.ts';
export { type Files, type OpenedFile, refusal } from './fileActions.ts';
export { type FollowOptions, followStudy } from './followStudy.ts';
export type { History, Revision } from './history.ts';
export { type KeepRevisionsOptions, keepRevisions, type RevisionKeeper } from './keepRevisions.ts';
export { openRecent as openRecentOf } from './openRecent.ts';
export { restore } from './restore.ts';
export {
  countVerdicts,
  freshAnswer,
  freshEnvelope,
  freshVerdicts,
  freshWorst,
  isScanStale,
  isScreened,
  isStale,
  isUnsaved,
  redoWords,
  undoWords,
  worstByKey,
} from './selectors.ts';
export type { KeptStudy, KeptView, Shelf } from './shelf.ts';
export { revisionsToDrop } from './thinRevisions.ts';
export { samePin } from './togglePinEdit.ts';
export type {
  AllVerdicts,
  Answer,
  ComparedCases,
  Margin,
  Notice,
  Place,
  ProbeAnswer,
  ReadingMode,
  ScanAnswer,
  Status,
  Theme,
  View,
  WaveOrders,
  Workbench,
  WorkbenchActions,
  WorkbenchState,
  WorstAnswer,
} from './types.ts';
export {
  archive,
  archiveNow,
  keepStateAs,
  openRecent,
  pageComputation,
  startWorkbench,
  useWorkbench,
  workbench,
  workHere,
} from './useWorkbench.ts';
export { type TabChannel, type TabMessage, type TabOptions, type TabWatch, watchTabs } from './watchTabs.ts';
