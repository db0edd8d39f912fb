import { workbench } from '../../store/index.ts';
import type { Command } from '../commands/command.ts';
import { currentPlaces, panelStore, resetPanels, setPanels } from './panelStore.ts';

/** The list or the table on the paper, in the place of Site; the drawing where it lay there already. */
function turnPaper(paper: 'list' | 'table'): void {
  workbench.getState().setPlace('site');
  setPanels({ paper: panelStore.getState().paper === paper ? 'drawing' : paper });
}

/** What can be done with the panels; each command turns over what is on screen when it runs. */
export function panelCommands(): Command[] {
  return [
    {
      id: 'panel.notes',
      words: 'Notes: column or letters alone',
      keys: 'F9',
      run: () => setPanels({ notes: currentPlaces().notes.show === 'open' ? 'letters' : 'open' }),
    },
    {
      id: 'panel.rail',
      words: 'Rail: landscape or strip alone',
      keys: 'Shift+F9',
      run: () => setPanels({ rail: currentPlaces().rail.show === 'open' ? 'strip' : 'open' }),
    },
    {
      id: 'panel.tray',
      words: 'Tray: words or symbols alone',
      run: () => setPanels({ tray: currentPlaces().tray.show === 'words' ? 'symbols' : 'words' }),
    },
    {
      id: 'panel.outline',
      words: 'Site as a drawing or as a list',
      keys: 'F10',
      run: () => turnPaper('list'),
    },
    {
      id: 'panel.table',
      words: 'Data as a table, or the drawing',
      keys: 'F7',
      run: () => turnPaper('table'),
    },
    { id: 'panel.reset', words: 'Panels: sizes that follow the window', run: resetPanels },
  ];
}
