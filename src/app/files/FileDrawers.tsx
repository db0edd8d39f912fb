import { useStore } from 'zustand';
import { EarlierStates } from './EarlierStates.tsx';
import { fileDrawer } from './fileDrawer.ts';
import { ImportParts } from './ImportParts.tsx';
import './files.css';

/** The sheet that is open beside the place, if any. */
export function FileDrawers() {
  const open = useStore(fileDrawer, (state) => state.open);
  if (open?.kind === 'states') return <EarlierStates />;
  if (open?.kind === 'import') return <ImportParts from={open.from} />;
  return null;
}
