import type { Archive, KeptDocument, KeptRevision } from '../../src/store/index.ts';
import type { Study } from '../../src/study/index.ts';

const newestFirst = (a: { at: number }, b: { at: number }): number => b.at - a.at;

/** An archive in memory that keeps copies, as the browser's does. */
export class MemoryArchive implements Archive {
  readonly heads = new Map<string, KeptRevision>();
  readonly studies = new Map<string, Study>();
  readonly known = new Map<string, KeptDocument>();
  /** Thrown by the next writes while there is one. */
  refuse: Error | null = null;
  /** The storage is full while more states than this are kept. */
  room = Number.POSITIVE_INFINITY;

  putRevision = async (revision: KeptRevision, study: Study): Promise<void> => {
    if (this.refuse) throw this.refuse;
    if (this.heads.size >= this.room) throw Object.assign(new Error('full'), { name: 'QuotaExceededError' });
    this.heads.set(revision.id, revision);
    this.studies.set(revision.id, structuredClone(study));
  };

  revisions = async (documentId: string): Promise<KeptRevision[]> =>
    [...this.heads.values()].filter((one) => one.documentId === documentId).sort(newestFirst);

  revisionStudy = async (id: string): Promise<Study | null> => this.studies.get(id) ?? null;

  nameRevision = async (id: string, name: string | null): Promise<void> => {
    const head = this.heads.get(id);
    if (head) this.heads.set(id, { ...head, name });
  };

  dropRevisions = async (ids: readonly string[]): Promise<void> => {
    for (const id of ids) {
      this.heads.delete(id);
      this.studies.delete(id);
    }
  };

  putDocument = async (document: KeptDocument): Promise<void> => {
    if (this.refuse) throw this.refuse;
    this.known.set(document.documentId, document);
  };

  documents = async (): Promise<KeptDocument[]> => [...this.known.values()].sort(newestFirst);

  dropDocument = async (documentId: string): Promise<void> => {
    await this.dropRevisions((await this.revisions(documentId)).map(({ id }) => id));
    this.known.delete(documentId);
  };
}
