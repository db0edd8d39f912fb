import { useEffect, useState } from 'react';
import { workbench } from '../../store/index.ts';
import { leaveStudy } from './leaveStudy.ts';

function carriesFile(event: DragEvent): boolean {
  return event.dataTransfer?.types.includes('Files') ?? false;
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
      const text = await file.text();
      leaveStudy(() => workbench.getState().openText(text, file.name));
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
