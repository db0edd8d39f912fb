import type { WorkbenchStore } from './createWorkbench.ts';
import type { Workbench } from './types.ts';

/** What tabs say to each other. `reply`: an answer to a greeting, not to be answered again. */
export interface TabMessage {
  tab: string;
  slot: string;
  documentId: string;
  fileName: string | null;
  title: string;
  reply: boolean;
}

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
}

/**
 * Tells the user when the same study is open in another tab: changes of one are not seen by the other, and
 * a file saved by one replaces what the other saved. Every opening is announced; who has it too answers.
 */
export function watchTabs(store: WorkbenchStore, channel: TabChannel, options: TabOptions): () => void {
  const { tab, slot, takeFreshSlot } = options;

  function say(reply: boolean): void {
    const { study, documentId, fileName } = store.getState();
    if (!study) return;
    channel.postMessage({ tab, slot: slot(), documentId, fileName, title: study.title, reply });
  }

  channel.onmessage = ({ data }) => {
    if (data.tab === tab) return;
    if (data.slot === slot() && data.reply) takeFreshSlot();
    if (!isSameStudy(store.getState(), data)) {
      if (data.slot === slot() && !data.reply) say(true);
      return;
    }
    store.getState().setNotice({
      severity: 'warning',
      title: `“${data.title}” is also open in another tab; what is changed there is not seen here.`,
      findings: [],
    });
    if (!data.reply) say(true);
  };

  say(false);
  const unsubscribe = store.subscribe((now, before) => {
    if (now.documentId !== before.documentId || now.fileName !== before.fileName) say(false);
  });
  return () => {
    unsubscribe();
    channel.close();
  };
}

function isSameStudy({ study, documentId, fileName }: Workbench, other: TabMessage): boolean {
  if (!study) return false;
  if (documentId === other.documentId) return true;
  return fileName !== null && fileName === other.fileName && study.title === other.title;
}
