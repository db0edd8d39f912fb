import { type DBSchema, type IDBPDatabase, openDB } from 'idb';
import type { Study } from '../study/index.ts';
import type { KeptDocument, KeptRevision } from './archive.ts';
import type { KeptStudy, KeptView } from './shelf.ts';

interface Schema extends DBSchema {
  studies: { key: string; value: KeptStudy; indexes: { keptAt: number } };
  views: { key: string; value: KeptView };
  documents: { key: string; value: KeptDocument };
  revisions: { key: string; value: KeptRevision; indexes: { documentId: string } };
  /** Apart from their heads, so that a list of revisions reads no studies. */
  revisionStudies: { key: string; value: { id: string; study: Study } };
}

export type Database = IDBPDatabase<Schema>;

function open(closed: () => void): Promise<Database> {
  return openDB<Schema>('varwright', 2, {
    upgrade(database, from) {
      if (from < 1) {
        database.createObjectStore('studies', { keyPath: 'slot' }).createIndex('keptAt', 'keptAt');
        database.createObjectStore('views', { keyPath: 'slot' });
      }
      if (from < 2) {
        database.createObjectStore('documents', { keyPath: 'documentId' });
        const revisions = database.createObjectStore('revisions', { keyPath: 'id' });
        revisions.createIndex('documentId', 'documentId');
        database.createObjectStore('revisionStudies', { keyPath: 'id' });
      }
    },
    // A newer version of the page in another tab waits for this connection to go.
    blocking(_current, _blocked, event) {
      (event.target as IDBDatabase).close();
      closed();
    },
    terminated: closed,
  });
}

/** The browser's IndexedDB, opened on first use and again after it was closed. */
export function browserDatabase(): () => Promise<Database> {
  let opened: Promise<Database> | null = null;
  const forget = (): void => {
    opened = null;
  };
  return async () => {
    opened ??= open(forget);
    try {
      return await opened;
    } catch (error) {
      forget();
      throw error;
    }
  };
}
