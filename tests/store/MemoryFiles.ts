import type { Files, OpenedFile } from '../../src/store/index.ts';

/** File dialogs answered by the test. */
export class MemoryFiles implements Files {
  /** What the next open dialog gives; null: the user changes their mind; an Error: it cannot be read. */
  next: OpenedFile | Error | null = null;
  saved: { text: string; name: string; handle: FileSystemFileHandle | null }[] = [];
  refuse: Error | null = null;

  open = async (): Promise<OpenedFile | null> => {
    if (this.next instanceof Error) throw this.next;
    return this.next;
  };

  save: Files['save'] = async (text, name, handle) => {
    if (this.refuse) throw this.refuse;
    this.saved.push({ text, name, handle });
    return { name, handle };
  };
}
