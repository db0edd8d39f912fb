import { useSyncExternalStore } from 'react';
import { useStore } from 'zustand';
import { createStore } from 'zustand/vanilla';
import { type PanelPlaces, panelPlaces } from './panelPlaces.ts';
import { type Panels, readPanels } from './panels.ts';

const KEY = 'varwright.panels';

function kept(): string | null {
  try {
    return localStorage.getItem(KEY);
  } catch {
    // A browser that forbids storage still shows its panels.
    return null;
  }
}

function keep(panels: Panels): void {
  try {
    localStorage.setItem(KEY, JSON.stringify(panels));
  } catch {
    // As above: the panels then last as long as the page.
  }
}

/** The panels of this machine, remembered in the browser and not in the study. */
export const panelStore = createStore<Panels>()(() => readPanels(kept()));
panelStore.subscribe(keep);

export function setPanels(change: Panels): void {
  panelStore.setState(change);
}

/** Forgets every choice: the panels follow the window again. */
export function resetPanels(): void {
  panelStore.setState({}, true);
}

let size = { width: window.innerWidth, height: window.innerHeight };

function readSize(): typeof size {
  if (size.width !== window.innerWidth || size.height !== window.innerHeight)
    size = { width: window.innerWidth, height: window.innerHeight };
  return size;
}

function followSize(changed: () => void): () => void {
  window.addEventListener('resize', changed);
  return () => window.removeEventListener('resize', changed);
}

/** Where the panels stand now, in this window. */
export function usePanelPlaces(): PanelPlaces {
  const panels = useStore(panelStore);
  const window = useSyncExternalStore(followSize, readSize);
  return panelPlaces(panels, window);
}

/** The places as of now, outside components. */
export function currentPlaces(): PanelPlaces {
  return panelPlaces(panelStore.getState(), readSize());
}

export function usePaper(): NonNullable<Panels['paper']> {
  return useStore(panelStore, (panels) => panels.paper ?? 'drawing');
}
