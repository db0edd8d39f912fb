import { workbench } from '../../store/index.ts';
import type { Command } from '../commands/command.ts';

/** The way to states and tolerances. */
export function statesCommands(): Command[] {
  return [
    {
      id: 'states.list',
      words: 'States and tolerances: the worst of all',
      keys: '%',
      run: () => {
        const { view, setMargin, setPlace } = workbench.getState();
        setPlace('site');
        setMargin(view.margin === 'states' && view.place === 'site' ? null : 'states');
      },
    },
  ];
}
