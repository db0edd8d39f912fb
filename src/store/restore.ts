import { checkStudy, type Study } from '../study/index.ts';
import type { WorkbenchStore } from './createWorkbench.ts';
import { fitView } from './fitView.ts';
import { type History, noHistory, type Revision } from './history.ts';
import type { KeptStudy, Shelf } from './shelf.ts';
import type { View } from './types.ts';

const answerWithinMs = 4000;

/**
 * Puts the kept workbench back on the table, once its study has passed the same reading as a file. The
 * history follows step by step behind it, each study read likewise, back to the first that does not pass.
 * Resolves, once the study is there, to whether there was one. Never rejects: a failure becomes a notice.
 */
export async function restore(
  store: WorkbenchStore,
  shelf: Shelf,
  slot: string,
): Promise<{ restored: boolean; history: Promise<void> }> {
  const nothing = { restored: false, history: Promise.resolve() };
  try {
    const kept = await inTime(shelf.get(slot));
    if (!kept) return nothing;
    const { study, findings } = checkStudy(kept.study.study);
    if (!study) {
      const title = 'The study kept in this browser cannot be read any more.';
      store.setState({ notice: { severity: 'error', title, findings } });
      return nothing;
    }
    putKept(store, kept.study, kept.view);
    return { restored: true, history: putHistoryBack(store, kept.study) };
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    const title = `What was kept in this browser cannot be reached (${reason}).`;
    store.setState({ notice: { severity: 'warning', title, findings: [] } });
    return nothing;
  }
}

/** Puts a kept study on the table under its own document, with the view it is to be looked at with. */
export function putKept(store: WorkbenchStore, kept: KeptStudy, view: View | null): void {
  const { study, documentId, lastEdit, fileName, fileHandle, savedStudy, importWarnings } = kept;
  store.getState().openStudy(study, fileName, documentId);
  store.setState((state) => ({
    lastEdit,
    fileHandle,
    savedStudy,
    importWarnings,
    // Fields a later version adds to the view keep their first value.
    view: view ? fitView({ ...state.view, ...view, openSlip: null }, study) : state.view,
  }));
}

/** Puts the kept history behind a study that putKept has put on the table. */
export async function putHistoryBack(store: WorkbenchStore, { history, study }: KeptStudy): Promise<void> {
  const { openedRevision } = store.getState();
  const past = await readable(history.past);
  const future = await readable(history.future);
  store.setState((state) => {
    if (state.openedRevision !== openedRevision) return {};
    const untouched = state.study === study && state.history === noHistory;
    return {
      history: {
        past: [...past, ...state.history.past],
        future: untouched ? future : state.history.future,
      } satisfies History,
    };
  });
}

/** The revisions from the one nearest the present back to the first that cannot be read. */
async function readable(revisions: readonly Revision[]): Promise<Revision[]> {
  const good: Revision[] = [];
  for (const revision of revisions.toReversed()) {
    await pause();
    if (!isReadable(revision.study)) break;
    good.unshift(revision);
  }
  return good;
}

function isReadable(study: Study): boolean {
  return checkStudy(study).study !== null;
}

/** Storage that never answers must not keep the page from starting. */
async function inTime<T>(work: Promise<T>): Promise<T> {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const tooLate = new Promise<never>((_resolve, reject) => {
    timer = setTimeout(() => reject(new Error('its storage does not answer')), answerWithinMs);
  });
  try {
    return await Promise.race([work, tooLate]);
  } finally {
    clearTimeout(timer);
  }
}

/** Lets the page paint and answer between two readings. */
function pause(): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, 0));
}
