import { useEffect, useState } from 'react';
import { workbench } from '../../store/index.ts';
import { leaveStudy } from './leaveStudy.ts';

function carriesFile(event: DragEvent): boolean {
  return event.dataTransfer?.types.includes('Files') ?? false;
}

/** A dropped item as far as browsers let it be written back to. */
interface HandledItem extends DataTransferItem {
  getAsFileSystemHandle?(): Promise<FileSystemHandle | null>;
}

async function handleOf(item: HandledItem | undefined): Promise<FileSystemFileHandle | undefined> {
  try {
    const handle = await item?.getAsFileSystemHandle?.();
    return handle?.kind === 'file' ? (handle as FileSystemFileHandle) : undefined;
  } catch {
    // Without a handle the file opens all the same; saving then asks where to.
    return undefined;
  }
}

/** Opens a study file dropped anywhere on the window. */
export function DropTarget() {
  const [over, setOver] = useState(false);
  useEffect(() => {
    const drag = (event: DragEvent) => {
      if (!carriesFile(event)) return;
      event.preventDefault();
      setOver(true);
    };
    const leave = (event: DragEvent) => {
      if (event.relatedTarget === null) setOver(false);
    };
    const drop = async (event: DragEvent) => {
      if (!carriesFile(event)) return;
      event.preventDefault();
      setOver(false);
      const file = event.dataTransfer?.files[0];
      if (!file) return;
      // Asked for in the event itself: afterwards the dropped items are gone.
      const handle = handleOf(event.dataTransfer?.items[0]);
      const text = await file.text();
      const known = await handle;
      leaveStudy(() => workbench.getState().openText(text, file.name, known));
    };
    const dropped = (event: DragEvent) => void drop(event);
    window.addEventListener('dragover', drag);
    window.addEventListener('dragleave', leave);
    window.addEventListener('drop', dropped);
    return () => {
      window.removeEventListener('dragover', drag);
      window.removeEventListener('dragleave', leave);
      window.removeEventListener('drop', dropped);
    };
  }, []);
  return over ? <div className="drop-target">Drop the study file to open it</div> : null;
}
