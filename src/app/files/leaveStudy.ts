import { createStore } from 'zustand';
import { isUnsaved, workbench } from '../../store/index.ts';

/** What waits for the word of the user: the way to another study. */
interface Leaving {
  go: (() => void) | null;
}

export const leaving = createStore<Leaving>(() => ({ go: null }));

/** Goes to another study at once, or asks first where the open one has changes that are in no file. */
export function leaveStudy(go: () => void): void {
  const state = workbench.getState();
  const atStake = (state.study?.elements.length ?? 0) > 0 && isUnsaved(state);
  if (atStake) leaving.setState({ go });
  else go();
}
