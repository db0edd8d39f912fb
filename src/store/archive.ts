import type { Study } from '../study/index.ts';

/** A study this browser has seen, for the list of recent ones. */
export interface KeptDocument {
  documentId: string;
  title: string;
  site: string;
  /** Null: never in a file. */
  fileName: string | null;
  /** Null where the browser has none to give, or the study came by another way. */
  fileHandle: FileSystemFileHandle | null;
  /** When it last changed or was opened; milliseconds since 1970. */
  at: number;
  parts: number;
  /** Whether its last state is that of its file. */
  inFile: boolean;
}

/** A former state of a document, without the study itself. */
export interface KeptRevision {
  id: string;
  documentId: string;
  /** Milliseconds since 1970. */
  at: number;
  /** What led to it, in the words of the edit. */
  words: string;
  /** A name the user gave; such a state is never thinned out. */
  name: string | null;
  parts: number;
  buses: number;
}

/** Former states and recent studies. Every method rejects with the reason where it cannot. */
export interface Archive {
  putRevision(revision: KeptRevision, study: Study): Promise<void>;
  /** Newest first. */
  revisions(documentId: string): Promise<KeptRevision[]>;
  revisionStudy(id: string): Promise<Study | null>;
  nameRevision(id: string, name: string | null): Promise<void>;
  dropRevisions(ids: readonly string[]): Promise<void>;
  putDocument(document: KeptDocument): Promise<void>;
  /** Newest first. */
  documents(): Promise<KeptDocument[]>;
  /** Forgets a document with its former states. */
  dropDocument(documentId: string): Promise<void>;
}
