import type { Command } from '../commands/command.ts';
import { currentPlaces, panelStore, resetPanels, setPanels } from './panelStore.ts';

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
      run: () => setPanels({ outline: !panelStore.getState().outline }),
    },
    { id: 'panel.reset', words: 'Panels: sizes that follow the window', run: resetPanels },
  ];
}
