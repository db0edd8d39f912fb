import { useStore } from 'zustand';
import { createStore } from 'zustand/vanilla';
import { markWords } from '../../drawing/index.ts';
import { workbench } from '../../store/index.ts';
import { type MarkKind, markKinds } from '../../study/index.ts';
import type { Command } from '../commands/command.ts';
import { setPanels } from '../panels/panelStore.ts';

/** The mark that is placed next; null for none. */
const markTool = createStore<{ kind: MarkKind | null }>()(() => ({ kind: null }));

export function armMark(kind: MarkKind | null): void {
  markTool.setState({ kind });
}

export function useMarkTool(): MarkKind | null {
  return useStore(markTool, ({ kind }) => kind);
}

/** Takes the reviewer's pen for each kind of mark. */
export function markCommands(): Command[] {
  return markKinds.map((kind) => ({
    id: `mark.${kind}`,
    words: `Mark: ${markWords[kind].tool.toLowerCase()}`,
    run: () => {
      workbench.getState().setPlace('site');
      setPanels({ paper: 'drawing' });
      armMark(kind);
    },
  }));
}
