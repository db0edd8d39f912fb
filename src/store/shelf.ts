import type { Finding, Study } from '../study/index.ts';
import type { History } from './history.ts';
import type { View } from './types.ts';

/**
 * What is kept of one tab's workbench. One value, so that the studies of the history share on disk the
 * parts they share in memory, and are all of the same moment.
 */
export interface KeptStudy {
  slot: string;
  /** Milliseconds since 1970. */
  keptAt: number;
  documentId: string;
  study: Study;
  history: History;
  lastEdit: string | null;
  fileName: string | null;
  fileHandle: FileSystemFileHandle | null;
  savedStudy: Study | null;
  importWarnings: Finding[];
}

export interface KeptView {
  slot: string;
  view: View;
}

/** Where workbenches are kept between sessions. Every method rejects with the reason where it cannot. */
export interface Shelf {
  putStudy(kept: KeptStudy): Promise<void>;
  putView(kept: KeptView): Promise<void>;
  /** What the slot keeps, else the newest of any slot; null where nothing is kept. */
  get(slot: string): Promise<{ study: KeptStudy; view: View | null } | null>;
  /** The newest state any tab keeps of a document. */
  newestOf(documentId: string): Promise<KeptStudy | null>;
}
