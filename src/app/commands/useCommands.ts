import { useMemo } from 'react';
import { useStore } from 'zustand';
import { redoWords, undoWords, useWorkbench, type Workbench, workbench } from '../../store/index.ts';
import {
  drawnItems,
  drawnOf,
  drawnWords,
  type Study,
  setDrawn,
  setSymbols,
  symbolSetOf,
  symbolSets,
  symbolSetWords,
} from '../../study/index.ts';
import { caseCommands } from '../cases/caseCommands.ts';
import { copyCommands } from '../copy/copyCommands.ts';
import { originCommands } from '../details/originCommands.ts';
import { phaseCommands } from '../details/phaseCommands.ts';
import { fileCommands } from '../files/fileCommands.ts';
import { recentStudies } from '../files/recentStudies.ts';
import { panelCommands } from '../panels/panelCommands.ts';
import { quickStartCommands } from '../quickstart/quickStartCommands.ts';
import { markCommands } from '../site/markTool.ts';
import { statesCommands } from '../states/statesCommands.ts';
import type { Command } from './command.ts';

function historyCommands(undoing: string | null, redoing: string | null): Command[] {
  const { undo, redo } = workbench.getState();
  return [
    {
      id: 'edit.undo',
      words: undoing ? `Undo: ${undoing}` : 'Undo',
      keys: 'Mod+Z',
      enabled: undoing !== null,
      run: undo,
    },
    {
      id: 'edit.redo',
      words: redoing ? `Redo: ${redoing}` : 'Redo',
      keys: 'Mod+Shift+Z',
      enabled: redoing !== null,
      run: redo,
    },
  ];
}

function viewCommands(): Command[] {
  const { setPlace, setReadingMode, setTheme } = workbench.getState();
  return [
    { id: 'place.site', words: 'Go to Site', keys: 'F2', run: () => setPlace('site') },
    { id: 'place.correction', words: 'Go to Correction', keys: 'F3', run: () => setPlace('correction') },
    { id: 'place.sheet', words: 'Go to Sheet', keys: 'F4', run: () => setPlace('sheet') },
    {
      id: 'reading.fundamental',
      words: 'Readings on the drawing: fundamental',
      run: () => setReadingMode('fundamental'),
    },
    {
      id: 'reading.rms',
      words: 'Readings on the drawing: rms of all orders',
      run: () => setReadingMode('rms'),
    },
    {
      id: 'reading.order',
      words: 'Readings on the drawing: order at the handle',
      run: () => setReadingMode('order'),
    },
    { id: 'theme.light', words: 'Light: paper', run: () => setTheme('light') },
    { id: 'theme.dark', words: 'Dark: slate', run: () => setTheme('dark') },
    { id: 'theme.system', words: 'Light or dark as the machine', run: () => setTheme('system') },
  ];
}

/** What the drawing shows and the standard its symbols follow: edits of the study's view. */
function drawnCommands(study: Study): Command[] {
  const { edit } = workbench.getState();
  const shown = drawnOf(study);
  return [
    ...symbolSets.map((symbols) => ({
      id: `symbols.${symbols}`,
      words: `Symbols: ${symbolSetWords[symbols]}`,
      enabled: symbolSetOf(study) !== symbols,
      run: () => edit(setSymbols(study, symbols)),
    })),
    ...drawnItems.map((item) => ({
      id: `drawn.${item}`,
      words: `${shown.has(item) ? 'Hide' : 'Show'} on the drawing: ${drawnWords[item]}`,
      run: () => edit(setDrawn(study, item, !shown.has(item))),
    })),
  ];
}

/** Every command of the page in its present state. */
export function useCommands(openDialog: (dialog: 'details' | 'keys') => void): Command[] {
  const study = useWorkbench((state: Workbench) => state.study);
  const caseId = useWorkbench((state: Workbench) => state.view.caseId);
  const selection = useWorkbench((state: Workbench) => state.view.selection);
  const undoing = useWorkbench(undoWords);
  const redoing = useWorkbench(redoWords);
  const recent = useStore(recentStudies, (state) => state.documents);
  return useMemo(
    () => [
      ...fileCommands(study, recent),
      ...historyCommands(undoing, redoing),
      {
        id: 'study.details',
        words: 'Title, criteria and limits of the study…',
        keys: 'Mod+I',
        enabled: study !== null,
        run: () => openDialog('details'),
      },
      ...quickStartCommands(study),
      ...viewCommands(),
      ...panelCommands(),
      ...(study ? markCommands() : []),
      ...(study ? phaseCommands(study) : []),
      ...(study ? originCommands(study, selection) : []),
      ...(study ? drawnCommands(study) : []),
      ...(study ? caseCommands(study, caseId) : []),
      ...(study ? statesCommands() : []),
      ...(study ? copyCommands(study) : []),
      { id: 'help.keys', words: 'Keys', keys: '?', run: () => openDialog('keys') },
    ],
    [study, caseId, selection, undoing, redoing, recent, openDialog],
  );
}
