import { keptStudy } from './autosave.ts';
import type { WorkbenchStore } from './createWorkbench.ts';
import { putHistoryBack, putKept } from './restore.ts';
import type { KeptStudy, Shelf } from './shelf.ts';
import type { Workbench } from './types.ts';

/** What tabs say to each other. */
export type TabMessage = { tab: string; documentId: string } & (
  | {
      /** A study was opened here; or, as a reply that is not to be answered again, it is open here too. */
      say: 'here';
      reply: boolean;
      slot: string;
      fileName: string | null;
      title: string;
      /** False where it is only looked at. */
      working: boolean;
    }
  /** The user wants to work on it in this tab. */
  | { say: 'ask' }
  /** The study as it stands, for the tab that asked; the sender only looks from now on. */
  | { say: 'yield'; kept: KeptStudy | null }
  | { say: 'leave' }
);

/** What is needed of a BroadcastChannel. */
export interface TabChannel {
  postMessage(message: TabMessage): void;
  onmessage: ((event: MessageEvent<TabMessage>) => void) | null;
  close(): void;
}

export interface TabOptions {
  tab: string;
  slot: () => string;
  /** Another tab holds this tab's place on the shelf (a duplicated tab): take another one. */
  takeFreshSlot: () => void;
  shelf: Pick<Shelf, 'newestOf'>;
  /** How long a tab that is asked may take; after that it is taken as gone. */
  yieldWithinMs?: number;
}

export interface TabWatch {
  /** Goes on with the study here: with what the other tab has of it, and that tab only looks then. */
  takeOver(): Promise<void>;
  /** Says that this tab goes, and that it is there again (a page kept for going back to). */
  leave(): void;
  greet(): void;
  stop(): void;
}

/**
 * One study, one tab that works on it. Every opening is announced:
 *
 *   newcomer ── here ──► others;  a tab working on the same document ── here (reply) ──► newcomer only looks
 *   newcomer ── ask ──► working tab ── yield with its study ──► newcomer works, the other only looks
 *
 * Two documents of one file name and title are left to work side by side, but both users are told.
 */
export function watchTabs(store: WorkbenchStore, channel: TabChannel, options: TabOptions): TabWatch {
  const { tab, slot, takeFreshSlot, shelf, yieldWithinMs = 600 } = options;
  let answer: ((kept: KeptStudy | null) => void) | null = null;

  function here(reply: boolean): void {
    const { study, documentId, fileName, readOnly } = store.getState();
    if (!study) return;
    const { title } = study;
    channel.postMessage({
      say: 'here',
      tab,
      documentId,
      slot: slot(),
      fileName,
      title,
      reply,
      working: !readOnly,
    });
  }

  function heardHere(message: Extract<TabMessage, { say: 'here' }>): void {
    const state = store.getState();
    const sameSlot = message.slot === slot();
    if (sameSlot && message.reply) takeFreshSlot();
    const same = likeness(state, message);
    if (same === 'document' && message.reply && message.working)
      store.setState({ readOnly: true, notice: null });
    else if (same === 'document' && !message.reply && !state.readOnly)
      state.setNotice(openedElsewhere(message.title));
    else if (same === 'file') state.setNotice(alsoOpen(message.title));
    if (!message.reply && (same !== null || sameSlot)) here(true);
  }

  function yieldStudy(): void {
    const { documentId, readOnly, cancelPreview, setNotice, study } = store.getState();
    if (readOnly || !study) return;
    cancelPreview();
    const kept = keptStudy(store.getState(), slot(), Date.now());
    post({ say: 'yield', tab, documentId, kept });
    store.setState({ readOnly: true });
    setNotice(takenOver(study.title));
  }

  /** A file handle that cannot be sent must not keep the study from its tab. */
  function post(message: Extract<TabMessage, { say: 'yield' }>): void {
    try {
      channel.postMessage(message);
    } catch {
      channel.postMessage({ ...message, kept: message.kept && { ...message.kept, fileHandle: null } });
    }
  }

  channel.onmessage = ({ data }) => {
    if (data.tab === tab) return;
    if (data.say === 'here') heardHere(data);
    else if (data.documentId !== store.getState().documentId) return;
    else if (data.say === 'ask') yieldStudy();
    else if (data.say === 'yield') answer?.(data.kept);
    else if (data.say === 'leave' && store.getState().readOnly) store.getState().setNotice(otherGone);
  };

  here(false);
  const unsubscribe = store.subscribe((now, before) => {
    if (now.documentId !== before.documentId || now.fileName !== before.fileName) here(false);
  });
  const leave = (): void =>
    channel.postMessage({ say: 'leave', tab, documentId: store.getState().documentId });

  return {
    takeOver: async () => {
      const { documentId, readOnly, view } = store.getState();
      if (!readOnly) return;
      const given = new Promise<KeptStudy | null>((resolve) => {
        answer = resolve;
        setTimeout(() => resolve(null), yieldWithinMs);
      });
      channel.postMessage({ say: 'ask', tab, documentId });
      const kept = (await given) ?? (await shelf.newestOf(documentId).catch(() => null));
      answer = null;
      if (store.getState().documentId !== documentId) return;
      if (kept) putKept(store, kept, view);
      store.setState({ readOnly: false, notice: null });
      if (kept) await putHistoryBack(store, kept);
    },
    leave,
    greet: () => here(false),
    stop: () => {
      unsubscribe();
      leave();
      channel.close();
    },
  };
}

/** Whether another tab has the very document open, or another of the same file name and title. */
function likeness(
  { study, documentId, fileName }: Workbench,
  other: { documentId: string; fileName: string | null; title: string },
): 'document' | 'file' | null {
  if (!study) return null;
  if (documentId === other.documentId) return 'document';
  const sameFile = fileName !== null && fileName === other.fileName && study.title === other.title;
  return sameFile ? 'file' : null;
}

function openedElsewhere(title: string) {
  const words = `“${title}” was opened in another tab, too. That tab only looks at it; this one goes on.`;
  return { severity: 'info' as const, title: words, findings: [] };
}

function alsoOpen(title: string) {
  const words = `“${title}” is also open in another tab; what is changed there is not seen here.`;
  return { severity: 'warning' as const, title: words, findings: [] };
}

function takenOver(title: string) {
  const words = `“${title}” was taken over by another tab with everything done here.`;
  return { severity: 'info' as const, title: words, findings: [] };
}

const otherGone = {
  severity: 'info' as const,
  title: 'The other tab is closed. Work here to go on with what it left.',
  findings: [],
};
