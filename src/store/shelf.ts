import { type DBSchema, type IDBPDatabase, openDB } from 'idb';
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
}

interface Schema extends DBSchema {
  studies: { key: string; value: KeptStudy; indexes: { keptAt: number } };
  views: { key: string; value: KeptView };
}

const slotsKept = 6;

function open(closed: () => void): Promise<IDBPDatabase<Schema>> {
  return openDB<Schema>('varwright', 1, {
    upgrade(database) {
      database.createObjectStore('studies', { keyPath: 'slot' }).createIndex('keptAt', 'keptAt');
      database.createObjectStore('views', { keyPath: 'slot' });
    },
    // A newer version of the page in another tab waits for this connection to go.
    blocking(_current, _blocked, event) {
      (event.target as IDBDatabase).close();
      closed();
    },
    terminated: closed,
  });
}

/** The shelf in the browser's IndexedDB, opened on first use and again after it was closed. */
export function browserShelf(): Shelf {
  let opened: Promise<IDBPDatabase<Schema>> | null = null;
  const forget = (): void => {
    opened = null;
  };

  async function database(): Promise<IDBPDatabase<Schema>> {
    opened ??= open(forget);
    try {
      return await opened;
    } catch (error) {
      forget();
      throw error;
    }
  }

  async function dropOldest(): Promise<void> {
    const transaction = (await database()).transaction(['studies', 'views'], 'readwrite');
    const slots = await transaction.objectStore('studies').index('keptAt').getAllKeys();
    for (const slot of slots.slice(0, -slotsKept)) {
      await transaction.objectStore('studies').delete(slot);
      await transaction.objectStore('views').delete(slot);
    }
    await transaction.done;
  }

  return {
    async putStudy(kept) {
      await (await database()).put('studies', kept);
      await dropOldest();
    },
    async putView(kept) {
      await (await database()).put('views', kept);
    },
    async get(slot) {
      const transaction = (await database()).transaction(['studies', 'views']);
      const studies = transaction.objectStore('studies');
      const newest = (await studies.index('keptAt').openCursor(null, 'prev'))?.value;
      const study = (await studies.get(slot)) ?? newest;
      if (!study) return null;
      const kept = await transaction.objectStore('views').get(study.slot);
      return { study, view: kept?.view ?? null };
    },
  };
}
