import { createStore } from 'zustand';
import { workbench } from '../../store/index.ts';
import { type Chosen, removalOf, removeItems } from '../../study/index.ts';

/** What waits for the word of the user: parts and busbars whose removal takes others along. */
interface Removing {
  chosen: Chosen | null;
}

export const removing = createStore<Removing>(() => ({ chosen: null }));

/** Removes parts and busbars at once, or asks first where more than was chosen hangs from them. */
export function removeChosen(chosen: Chosen): void {
  const { study } = workbench.getState();
  if (!study) return;
  const { below } = removalOf(study, chosen);
  if (below.parts + below.buses > 0) removing.setState({ chosen });
  else removeNow(chosen);
}

export function removeNow(chosen: Chosen): void {
  const { study, edit, select } = workbench.getState();
  removing.setState({ chosen: null });
  if (!study) return;
  edit(removeItems(study, chosen));
  select([]);
}
