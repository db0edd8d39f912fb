import { createStore } from 'zustand';
import type { Study } from '../../study/index.ts';

/** What stands beside the place at the right: former states, parts of another study, or nothing. */
export type FileDrawer = { kind: 'states' } | { kind: 'import'; from: Study } | null;

export const fileDrawer = createStore<{ open: FileDrawer }>(() => ({ open: null }));

export function openDrawer(open: FileDrawer): void {
  fileDrawer.setState({ open });
}

export function closeDrawer(): void {
  fileDrawer.setState({ open: null });
}
