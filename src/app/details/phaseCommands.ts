import { workbench } from '../../store/index.ts';
import {
  type PhaseLabels,
  phaseColourSets,
  phaseLabelSets,
  type Study,
  setPhaseColours,
  setPhaseLabels,
} from '../../study/index.ts';
import type { Command } from '../commands/command.ts';

/** Names and colours of the phases by their words. */
export function phaseCommands(study: Study): Command[] {
  const { edit } = workbench.getState();
  const labels = Object.keys(phaseLabelSets) as PhaseLabels[];
  return [
    ...labels.map((id) => ({
      id: `phases.${id}`,
      words: `Phases: called ${phaseLabelSets[id].join(' ')}`,
      run: () => edit(setPhaseLabels(study, id)),
    })),
    ...phaseColourSets.map(({ id, label }) => ({
      id: `phases.${id}`,
      words: `Phases: drawn ${label}`,
      run: () => edit(setPhaseColours(study, id)),
    })),
  ];
}
