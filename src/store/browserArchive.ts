import type { Archive } from './archive.ts';
import type { Database } from './database.ts';

const both = ['revisions', 'revisionStudies'] as const;

function newestFirst(a: { at: number }, b: { at: number }): number {
  return b.at - a.at;
}

/** The archive in the browser's IndexedDB. */
export function browserArchive(database: () => Promise<Database>): Archive {
  async function drop(ids: readonly string[]): Promise<void> {
    const transaction = (await database()).transaction(both, 'readwrite');
    for (const id of ids) {
      await transaction.objectStore('revisions').delete(id);
      await transaction.objectStore('revisionStudies').delete(id);
    }
    await transaction.done;
  }

  return {
    async putRevision(revision, study) {
      const transaction = (await database()).transaction(both, 'readwrite');
      await Promise.all([
        transaction.objectStore('revisions').put(revision),
        transaction.objectStore('revisionStudies').put({ id: revision.id, study }),
        transaction.done,
      ]);
    },
    async revisions(documentId) {
      const own = await (await database()).getAllFromIndex('revisions', 'documentId', documentId);
      return own.toSorted(newestFirst);
    },
    async revisionStudy(id) {
      return (await (await database()).get('revisionStudies', id))?.study ?? null;
    },
    async nameRevision(id, name) {
      const transaction = (await database()).transaction('revisions', 'readwrite');
      const revision = await transaction.store.get(id);
      if (revision) await transaction.store.put({ ...revision, name });
      await transaction.done;
    },
    dropRevisions: drop,
    async putDocument(document) {
      await (await database()).put('documents', document);
    },
    async documents() {
      return (await (await database()).getAll('documents')).toSorted(newestFirst);
    },
    async dropDocument(documentId) {
      const own = await (await database()).getAllKeysFromIndex('revisions', 'documentId', documentId);
      await drop(own);
      await (await database()).delete('documents', documentId);
    },
  };
}
