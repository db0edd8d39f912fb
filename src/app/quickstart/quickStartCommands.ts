import { workbench } from '../../store/index.ts';
import { newStudy, type Study } from '../../study/index.ts';
import type { Command } from '../commands/command.ts';
import { leaveStudy } from '../files/leaveStudy.ts';
import { setPanels } from '../panels/panelStore.ts';
import { listAssumptions, quickAnswers } from './quickAnswers.ts';

function isEmpty(study: Study | null): boolean {
  return study !== null && study.buses.length === 0 && study.elements.length === 0;
}

/** Goes to the form on the empty paper, by a new study where this one has parts. */
function askQuickStart(study: Study | null): void {
  const ask = () => {
    workbench.getState().setPlace('site');
    quickAnswers.setState(({ asked }) => ({ asked: asked + 1 }));
  };
  if (isEmpty(study)) ask();
  else
    leaveStudy(() => {
      workbench.getState().openStudy(newStudy({ title: 'New study' }));
      ask();
    });
}

export function quickStartCommands(study: Study | null): Command[] {
  return [
    {
      id: 'study.quickStart',
      words: 'Quick start: a site from its bill and its transformer…',
      run: () => askQuickStart(study),
    },
    {
      id: 'study.assumptions',
      words: 'List what is assumed or typical',
      enabled: study !== null && study.elements.length > 0,
      run: () => {
        workbench.getState().setPlace('site');
        setPanels({ notes: 'open' });
        listAssumptions(true);
      },
    },
  ];
}
