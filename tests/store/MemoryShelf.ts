import type { KeptStudy, KeptView, Shelf, View } from '../../src/store/index.ts';

/** A shelf in memory. Like the browser's it keeps copies, in which what was shared stays shared. */
export class MemoryShelf implements Shelf {
  readonly studies = new Map<string, KeptStudy>();
  readonly views = new Map<string, KeptView>();
  studyWrites = 0;
  refuse: Error | null = null;

  putStudy = async (kept: KeptStudy): Promise<void> => {
    if (this.refuse) throw this.refuse;
    this.studyWrites += 1;
    this.studies.set(kept.slot, structuredClone(kept));
  };

  putView = async (kept: KeptView): Promise<void> => {
    if (this.refuse) throw this.refuse;
    this.views.set(kept.slot, structuredClone(kept));
  };

  newestOf = async (documentId: string): Promise<KeptStudy | null> => {
    if (this.refuse) throw this.refuse;
    const own = [...this.studies.values()].filter((kept) => kept.documentId === documentId);
    const newest = own.sort((a, b) => b.keptAt - a.keptAt)[0];
    return newest ? structuredClone(newest) : null;
  };

  get = async (slot: string): Promise<{ study: KeptStudy; view: View | null } | null> => {
    if (this.refuse) throw this.refuse;
    const newest = [...this.studies.values()].sort((a, b) => b.keptAt - a.keptAt)[0];
    const study = this.studies.get(slot) ?? newest;
    return study ? structuredClone({ study, view: this.views.get(study.slot)?.view ?? null }) : null;
  };
}
