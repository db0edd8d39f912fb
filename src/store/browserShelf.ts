import type { Database } from './database.ts';
import type { Shelf } from './shelf.ts';

const slotsKept = 8;

/** The shelf in the browser's IndexedDB. */
export function browserShelf(database: () => Promise<Database>): Shelf {
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
    async newestOf(documentId) {
      const kept = await (await database()).getAll('studies');
      const own = kept.filter((one) => one.documentId === documentId);
      return own.toSorted((a, b) => b.keptAt - a.keptAt)[0] ?? null;
    },
  };
}
